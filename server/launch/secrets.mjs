import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/**
 * The secrets of a demonstration, made once and kept with its data, readable by its user only.
 * @param {string} dataDir
 * @returns {{ session: string, stripeKey: string, webhook: string }}
 */
export function readSecrets(dataDir) {
  const file = join(dataDir, 'secrets.json');
  if (!existsSync(file)) {
    mkdirSync(dataDir, { recursive: true });
    const secret = () => randomBytes(32).toString('hex');
    const made = { session: secret(), stripeKey: `sk_test_${secret()}`, webhook: `whsec_${secret()}` };
    writeFileSync(file, JSON.stringify(made), { mode: 0o600 });
  }
  return JSON.parse(readFileSync(file, 'utf8'));
}
