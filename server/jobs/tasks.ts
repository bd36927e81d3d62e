import type { Task, TaskList } from 'graphile-worker';
import type { AppContext } from '../context.ts';
import { joinDemoMembers } from '../demo/demo-members.job.ts';
import { pressEdition } from '../editions/press.job.ts';
import { sendLetter } from '../letters/send-letter.job.ts';
import { convergeCustomer, reconcilePayments } from '../payments/reconcile.job.ts';
import { syncTier } from '../payments/sync-tier.job.ts';
import { preparePlate } from '../plates/prepare.job.ts';
import type { JobName, JobPayloads } from './jobs.ts';

/** Which try this is, for jobs that tell somebody when the last one has failed. */
export interface JobAttempt {
  last: boolean;
}

type Job<N extends JobName> = (ctx: AppContext, payload: JobPayloads[N], attempt: JobAttempt) => Promise<void>;
type Jobs = { [N in JobName]: Job<N> };

/** Which function does which job. */
const jobs: Jobs = {
  'send-letter': sendLetter,
  'prepare-plate': preparePlate,
  'press-edition': pressEdition,
  'sync-tier': syncTier,
  'converge-customer': convergeCustomer,
  'reconcile-payments': reconcilePayments,
  'join-demo-members': joinDemoMembers,
};

/** The nightly reconciliation with the payment service. */
export const SCHEDULE = '15 3 * * * reconcile-payments';

export function makeTasks(ctx: AppContext): TaskList {
  return Object.fromEntries(
    Object.entries(jobs).map(([name, job]) => [
      name,
      ((payload, { job: { attempts, max_attempts: most } }) =>
        (job as Job<JobName>)(ctx, payload as never, { last: attempts >= most })) as Task,
    ]),
  );
}
