import type { Knex } from 'knex';
import type { JobPayloads, JobName } from './jobs.ts';

interface JobOptions {
  /** Jobs of one key are one job: a second one replaces the first while it waits. */
  key?: string;
  /** Jobs of one queue run one after the other. */
  queue?: string;
  maxAttempts?: number;
}

/** Enqueues a job in the caller's transaction: it exists if, and only if, the transaction commits. */
export async function addJob<N extends JobName>(
  db: Knex,
  name: N,
  payload: JobPayloads[N],
  { key, queue, maxAttempts }: JobOptions = {},
): Promise<void> {
  await db.raw(
    `select graphile_worker.add_job(
      identifier => ?::text, payload => ?::json, queue_name => ?::text, job_key => ?::text, max_attempts => ?::integer)`,
    [name, JSON.stringify(payload), queue ?? null, key ?? null, maxAttempts ?? 25],
  );
}
