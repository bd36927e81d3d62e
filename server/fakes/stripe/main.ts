import { startFake } from './fake.ts';
import { complain } from './log.ts';
import { readFakeSettings } from './settings.ts';

try {
  const fake = await startFake(readFakeSettings(process.env));
  let ending = false;
  const stop = (): void => {
    if (ending) return;
    ending = true;
    fake.close().then(
      () => process.exit(0),
      (error: unknown) => {
        complain('stop', error);
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
  complain('start', error instanceof Error ? error.message : error);
  process.exit(1);
}
