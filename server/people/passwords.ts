import { hash, verify } from '@node-rs/argon2';

/** Argon2id with the first parameters of RFC 9106's low-memory recommendation, rounded to OWASP's 19 MiB, 2 passes. */
const PARAMETERS = { memoryCost: 19_456, timeCost: 2, parallelism: 1 };

/** A hash of no password, so that an unknown address costs as much time as a wrong password. */
const nobody = hash('nobody has this password', PARAMETERS);

export function hashPassword(password: string): Promise<string> {
  return hash(password, PARAMETERS);
}

/** Whether the password belongs to the hash; without a hash always false, in the same time. */
export async function verifyPassword(stored: string | undefined, password: string): Promise<boolean> {
  const matches = await verify(stored ?? (await nobody), password);
  return stored !== undefined && matches;
}
