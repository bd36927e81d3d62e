/* `npm run bench`: ratios against floors measured in the same run; JSON rows on stdout, one a line. */
import { spawn } from 'node:child_process';
import { installFromDebian } from './debian.mjs';
import { installDependencies } from './dependencies.mjs';
import { ROOT } from './paths.mjs';
import { runMain } from './say.mjs';

runMain(async () => {
  await installDependencies();
  await installFromDebian(['postgres', 'chromium']);
  const child = spawn(process.execPath, ['--import', 'tsx', 'tests/bench/run.ts'], {
    cwd: ROOT,
    stdio: ['ignore', 1, 2],
  });
  child.once('exit', (code) => {
    process.exitCode = code ?? 1;
  });
});
