import type { Knex } from 'knex';
import { createHash } from 'node:crypto';
import { Fault } from './errors.ts';
import { SCHEMA } from './schema.ts';

export interface RememberedAnswer {
  status: number;
  body: object;
}

interface Row {
  request: string;
  status: number | null;
  body: object | null;
}

function remembered(db: Knex) {
  return db.withSchema(SCHEMA).table('idempotency');
}

/**
 * Claims a key for one request. Returns the answer to repeat when the same request was answered before;
 * refuses another request under the same key, and one that arrives while the first is still at work.
 */
export async function claimKey(
  db: Knex,
  key: string,
  path: string,
  body: string,
): Promise<RememberedAnswer | undefined> {
  const request = createHash('sha256').update(`${path}\n${body}`).digest('hex');
  const claimed = await remembered(db).insert({ key, request }).onConflict('key').ignore().returning('key');
  if (claimed.length > 0) return undefined;

  const row = await remembered(db).where({ key }).first<Row | undefined>('request', 'status', 'body');
  if (row && row.request !== request) {
    throw new Fault(400, {
      type: 'idempotency_error',
      message: `Keys for idempotent requests can only be used with the same parameters they were first used with. Try using a key other than '${key}' if you meant to execute a different request.`,
    });
  }
  if (!row || row.status === null || row.body === null) {
    throw new Fault(409, {
      type: 'invalid_request_error',
      code: 'idempotency_key_in_use',
      message: `There is currently another in-progress request using this Idempotent Key: ${key}.`,
    });
  }
  return { status: row.status, body: row.body };
}

export async function rememberAnswer(db: Knex, key: string, { status, body }: RememberedAnswer): Promise<void> {
  await remembered(db)
    .where({ key })
    .update({ status, body: JSON.stringify(body) });
}

/** Gives a key back after a refusal that changed nothing, so that a mended request may use it. */
export async function releaseKey(db: Knex, key: string): Promise<void> {
  await remembered(db).where({ key }).whereNull('status').delete();
}

export async function forgetOldKeys(db: Knex): Promise<void> {
  await remembered(db).whereRaw("recorded_at < now() - interval '1 day'").delete();
}
