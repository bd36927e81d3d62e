import { createHash, randomBytes } from 'node:crypto';
import type { Knex } from 'knex';
import { deleteToken, deleteTokensOf, insertToken } from './people.queries.ts';
import { tokenInvalid } from './people.errors.ts';
import type { PersonTokenRow } from './people.rows.ts';

const HOURS = { verify: 72, reset: 2, 'change-email': 24 } as const;
type Purpose = PersonTokenRow['purpose'];

/** Makes a link's secret; only its hash is kept, and an older one for the same purpose stops working. */
export async function makeToken(
  db: Knex,
  {
    personId,
    purpose,
    now,
    newEmail = null,
  }: { personId: string; purpose: Purpose; now: Date; newEmail?: string | null },
): Promise<string> {
  const token = randomBytes(32).toString('base64url');
  await deleteTokensOf(db, personId, purpose);
  await insertToken(db, {
    token_hash: hashToken(token),
    person_id: personId,
    purpose,
    new_email: newEmail,
    expires_at: new Date(now.getTime() + HOURS[purpose] * 3_600_000),
  });
  return token;
}

/** Uses a token up; refuses one that is unknown, used or too old. */
export async function useToken(db: Knex, token: string, purpose: Purpose, now: Date): Promise<PersonTokenRow> {
  const row = await deleteToken(db, { tokenHash: hashToken(token), purpose, now });
  if (!row) throw tokenInvalid();
  return row;
}

function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}
