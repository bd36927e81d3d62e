import { run } from 'graphile-worker';
import { makeContext } from './context.ts';
import { watchWorkers } from './jobs/dead-workers.ts';
import { makeTasks, SCHEDULE } from './jobs/tasks.ts';
import { readSettings } from './settings.ts';

/** Starts the process that does the jobs; ends cleanly on SIGTERM and SIGINT, giving back what it had begun. */
async function main(): Promise<void> {
  const settings = readSettings();
  const ctx = makeContext(settings);
  const watch = await watchWorkers(settings.database.url, ctx.log);
  const runner = await run({
    connectionString: settings.database.url,
    taskList: makeTasks(ctx),
    concurrency: 2,
    pollInterval: 1000,
    noHandleSignals: true,
    crontab: SCHEDULE,
    events: watch.events,
  });
  process.send?.('ready');

  let ending = false;
  const end = () => {
    if (ending) return;
    ending = true;
    void runner
      .stop()
      .then(() => Promise.all([watch.stop(), ctx.db.destroy()]))
      .finally(() => process.exit(0));
  };
  process.once('SIGTERM', end);
  process.once('SIGINT', end);
  process.once('disconnect', end);
  await runner.promise;
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
