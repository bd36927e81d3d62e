import { startCatcher } from './catcher.ts';
import { readCatcherSettings } from './settings.ts';

function complain(error: unknown): void {
  process.stderr.write(`mail catcher: ${error instanceof Error ? error.message : String(error)}\n`);
}

try {
  const catcher = await startCatcher(readCatcherSettings(process.env));
  let ending = false;
  const stop = (): void => {
    if (ending) return;
    ending = true;
    catcher.close().then(
      () => process.exit(0),
      (error: unknown) => {
        complain(error);
        process.exit(1);
      },
    );
  };
  process.once('SIGTERM', stop);
  process.once('SIGINT', stop);
  // Whoever started it was killed.
  process.once('disconnect', stop);
  process.send?.('ready');
} catch (error) {
  complain(error);
  process.exit(1);
}
