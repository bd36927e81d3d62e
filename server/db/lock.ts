import { setTimeout as wait } from 'node:timers/promises';
import type { Knex } from 'knex';
import { serverUnready } from '../http/http.errors.ts';

const POLL_MS = 40;
const PATIENCE_MS = 60_000;

/**
 * Runs a piece of work while nobody else, in whichever process, runs one under the same name; its transaction commits
 * with the lock's end. Those who wait hold no connection, so that many of them cannot starve the one who works.
 */
export async function withLock<T>(db: Knex, name: string, work: (trx: Knex.Transaction) => Promise<T>): Promise<T> {
  const deadline = Date.now() + PATIENCE_MS;
  for (;;) {
    const outcome = await db.transaction(async (trx) => {
      const { rows } = await trx.raw<{ rows: { held: boolean }[] }>(
        'select pg_try_advisory_xact_lock(hashtextextended(?, 0)) as held',
        [name],
      );
      return rows[0]?.held ? { value: await work(trx) } : null;
    });
    if (outcome) return outcome.value;
    if (Date.now() > deadline) throw serverUnready({ headers: { 'Retry-After': '5' } });
    await wait(POLL_MS);
  }
}
