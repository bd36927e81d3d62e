import { EventEmitter } from 'node:events';
import type { WorkerEvents } from 'graphile-worker';
import pg from 'pg';
import type { Logger } from 'pino';

const SWEEP_EVERY_MS = 15_000;

/**
 * Gives the jobs of killed workers back soon. Every worker holds an advisory lock named after itself for as long as it
 * lives; a worker that holds jobs but whose lock is free is dead. (Left alone, its jobs would wait four hours.)
 */
export async function watchWorkers(
  url: string,
  log: Logger,
): Promise<{ events: WorkerEvents; stop: () => Promise<void> }> {
  const client = new pg.Client({ connectionString: url });
  client.on('error', (error) => log.warn({ err: error }, 'the watch over workers lost its connection'));
  await client.connect();

  const ours = new Set<string>();
  const events: WorkerEvents = new EventEmitter();
  events.on('worker:create', ({ worker: { workerId } }) => {
    ours.add(workerId);
    client.query('select pg_advisory_lock(hashtextextended($1, 0))', [workerId]).catch((error: unknown) => {
      log.warn({ err: error }, 'a worker could not be registered');
    });
  });

  const sweep = async () => {
    const { rows } = await client.query<{ locked_by: string }>(
      'select distinct locked_by from graphile_worker.jobs where locked_by is not null',
    );
    for (const { locked_by: workerId } of rows) {
      if (ours.has(workerId) || !(await isDead(client, workerId))) continue;
      log.warn({ workerId }, 'giving back the jobs of a worker that was killed');
      await client.query('select graphile_worker.force_unlock_workers($1::text[])', [[workerId]]);
    }
  };
  await sweep();
  const timer = setInterval(() => {
    sweep().catch((error: unknown) => log.warn({ err: error }, 'the sweep for killed workers failed'));
  }, SWEEP_EVERY_MS);

  return {
    events,
    stop: async () => {
      clearInterval(timer);
      await client.end();
    },
  };
}

async function isDead(client: pg.Client, workerId: string): Promise<boolean> {
  const { rows } = await client.query<{ free: boolean }>(
    'select pg_try_advisory_lock(hashtextextended($1, 0)) as free',
    [workerId],
  );
  if (!rows[0]?.free) return false;
  await client.query('select pg_advisory_unlock(hashtextextended($1, 0))', [workerId]);
  return true;
}
