/* `npm test`: everything that proves the product, from nothing; ends with one line of the real counts. */
import { spawn } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { closingLine, countPlaywright, countVitest } from './counts.mjs';
import { installFromDebian } from './debian.mjs';
import { installDependencies } from './dependencies.mjs';
import { ROOT } from './paths.mjs';
import { runMain, say } from './say.mjs';

runMain(async () => {
  await installDependencies();
  await installFromDebian(['postgres', 'chromium', 'java', 'epubcheck']);
  const reports = mkdtempSync(join(tmpdir(), 'steep-reports-'));
  const report = (/** @type {string} */ name) => join(reports, `${name}.json`);
  try {
    // Types and lint take one core while the tests that wait for a database take the other.
    const [types, lint] = await Promise.all([
      step('types', 'npm', ['run', '--silent', 'types']).then(async (typesOk) => {
        return [typesOk, await step('lint', 'npm', ['run', '--silent', 'lint'])];
      }),
      step('unit and API tests', 'npx', [
        'vitest',
        'run',
        '--reporter=default',
        '--reporter=json',
        `--outputFile.json=${report('vitest')}`,
      ]),
    ]).then(([checks]) => checks);
    await step('browser tests', 'npx', ['playwright', 'test'], { E2E_REPORT: report('playwright') });
    const counts = [
      { name: 'types', passed: types ? 1 : 0, failed: types ? 0 : 1, ran: true },
      { name: 'lint', passed: lint ? 1 : 0, failed: lint ? 0 : 1, ran: true },
      countVitest('unit and API', report('vitest')),
      countPlaywright('browser', report('playwright')),
    ];
    for (const { name, passed, failed, ran } of counts)
      say(`${name}: ${ran ? `${passed} passed, ${failed} failed` : 'did not run'}`);
    process.stdout.write(`${closingLine(counts)}\n`);
    process.exitCode = counts.some(({ failed }) => failed > 0) ? 1 : 0;
  } finally {
    rmSync(reports, { recursive: true, force: true });
  }
});

/**
 * Runs one step with its output on stderr; whether it ended well.
 * @param {string} name
 * @param {string} command
 * @param {string[]} args
 * @param {NodeJS.ProcessEnv} [env]
 * @returns {Promise<boolean>}
 */
function step(name, command, args, env = {}) {
  say(`— ${name}`);
  return new Promise((resolve) => {
    const child = spawn(command, args, { cwd: ROOT, env: { ...process.env, ...env }, stdio: ['ignore', 2, 2] });
    child.once('error', () => resolve(false));
    child.once('exit', (code) => {
      if (code !== 0) say(`— ${name}: failed`);
      resolve(code === 0);
    });
  });
}
