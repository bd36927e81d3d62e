import { startFake } from './fake.ts';
import { complain } from './log.ts';
import { readFakeSettings } from './settings.ts';

try {
  const fake = await startFake(readFakeSettings(process.env));
  const stop = (): void => {
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
  process.send?.('ready');
} catch (error) {
  complain('start', error instanceof Error ? error.message : error);
  process.exit(1);
}
