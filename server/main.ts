import { makeApp } from './app.ts';
import { makeContext } from './context.ts';
import { readSettings } from './settings.ts';

/** Starts the web process; ends cleanly on SIGTERM and SIGINT. */
function main(): void {
  const settings = readSettings();
  const ctx = makeContext(settings);
  const app = makeApp(ctx);
  const server = app.express.listen(settings.http.port, settings.http.host, (error?: Error) => {
    if (error) return stopWith(error);
    ctx.log.info({ port: settings.http.port }, 'listening');
    process.send?.('ready');
  });

  let ending = false;
  const end = () => {
    if (ending) return;
    ending = true;
    server.close(() => {
      void Promise.all([app.close(), ctx.db.destroy()]).finally(() => process.exit(0));
    });
    server.closeIdleConnections();
    setTimeout(() => server.closeAllConnections(), 2000).unref();
  };
  process.once('SIGTERM', end);
  process.once('SIGINT', end);
  process.once('disconnect', end);
}

function stopWith(error: unknown): void {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
}

try {
  main();
} catch (error) {
  stopWith(error);
}
