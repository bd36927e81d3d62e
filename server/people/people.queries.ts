import type { Knex } from 'knex';
import { isUniqueViolation } from '../db/constraints.ts';
import { emailTaken } from './people.errors.ts';
import type { PersonRow, PersonTokenRow } from './people.rows.ts';

export async function findPersonByEmail(db: Knex, email: string): Promise<PersonRow | undefined> {
  return db('people').where({ email: email.trim().toLowerCase() }).first();
}

export async function findPerson(db: Knex, id: string): Promise<PersonRow | undefined> {
  return db('people').where({ id }).first();
}

export async function insertPerson(
  db: Knex,
  values: Pick<PersonRow, 'email' | 'name' | 'password_hash'> & Partial<PersonRow>,
): Promise<PersonRow> {
  try {
    const [row] = await db('people').insert(values).returning('*');
    return row!;
  } catch (error) {
    if (isUniqueViolation(error, 'people_email_key')) throw emailTaken({}, error);
    throw error;
  }
}

export async function updatePerson(db: Knex, id: string, values: Partial<PersonRow>): Promise<PersonRow | undefined> {
  try {
    const [row] = await db('people')
      .where({ id })
      .update({ ...values, version: db.raw('version + 1') as unknown as number })
      .returning('*');
    return row;
  } catch (error) {
    if (isUniqueViolation(error, 'people_email_key')) throw emailTaken({}, error);
    throw error;
  }
}

export async function insertToken(db: Knex, values: Omit<PersonTokenRow, 'created_at'>): Promise<void> {
  await db('people_tokens').insert(values);
}

/** Takes a token out of use and returns it; a second taker gets nothing. */
export async function deleteToken(
  db: Knex,
  { tokenHash, purpose, now }: { tokenHash: string; purpose: PersonTokenRow['purpose']; now: Date },
): Promise<PersonTokenRow | undefined> {
  const [row] = await db('people_tokens')
    .where({ token_hash: tokenHash, purpose })
    .andWhere('expires_at', '>', now)
    .delete()
    .returning('*');
  return row;
}

export async function deleteTokensOf(db: Knex, personId: string, purpose: PersonTokenRow['purpose']): Promise<void> {
  await db('people_tokens').where({ person_id: personId, purpose }).delete();
}

/** Ends every session of a person, but for the one that is kept. */
export async function deleteSessionsOf(db: Knex, personId: string, keepSid: string | null): Promise<void> {
  await db('sessions')
    .whereRaw(`sess #>> '{passport,user}' = ?`, [personId])
    .andWhereRaw('sid is distinct from ?', [keepSid])
    .delete();
}
