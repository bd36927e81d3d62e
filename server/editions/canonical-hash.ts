import canonicalize from 'canonicalize';
import { sha256 } from '../files/file-store.ts';

/** SHA-256 over the canonical form of a JSON value (RFC 8785): equal content gives an equal hash. */
export function canonicalHash(value: unknown): string {
  const text = canonicalize(value);
  if (text === undefined) throw new Error('Only a JSON value has a canonical form.');
  return sha256(text);
}
