import { randomInt } from 'node:crypto';

const ALPHABET = '0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz';

/** A new id such as `cus_4bK…`: the prefix tells what it names, the rest is chance. */
export function newId(prefix: string, length = 24): string {
  return `${prefix}_${Array.from({ length }, () => ALPHABET[randomInt(ALPHABET.length)]).join('')}`;
}
