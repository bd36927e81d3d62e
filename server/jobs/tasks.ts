import type { Task, TaskList } from 'graphile-worker';
import type { AppContext } from '../context.ts';
import type { JobName, JobPayloads } from './jobs.ts';

type Job<N extends JobName> = (ctx: AppContext, payload: JobPayloads[N]) => Promise<void>;
type Jobs = { [N in JobName]: Job<N> };

/** Which function does which job. */
const jobs: Partial<Jobs> = {};

/** Nightly reconciliation, and a sweep for work that a killed process left behind. */
export const SCHEDULE = ['15 3 * * * reconcile-payments', '*/10 * * * * sweep-stale'].join('\n');

export function makeTasks(ctx: AppContext): TaskList {
  return Object.fromEntries(
    Object.entries(jobs).map(([name, job]) => [
      name,
      ((payload) => (job as Job<JobName>)(ctx, payload as never)) as Task,
    ]),
  );
}
