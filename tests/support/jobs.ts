import { Logger, runOnce } from 'graphile-worker';
import { makeTasks } from '../../server/jobs/tasks.ts';
import type { TestApi } from './api.ts';

const silent = new Logger(() => () => undefined);

/** Does every job that waits now, as the worker would; one that fails waits for its next try. */
export async function runJobs({ ctx, url }: Pick<TestApi, 'ctx' | 'url'>): Promise<void> {
  await runOnce({ connectionString: url, taskList: makeTasks(ctx), logger: silent, noHandleSignals: true });
}
