import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { inRoot } from './paths.mjs';
import { run } from './run.mjs';
import { say } from './say.mjs';

/**
 * Whether node_modules is missing or was installed from another lock file than the present one.
 * @param {string} lockFile
 * @param {string} stampFile
 */
export function areDependenciesStale(lockFile, stampFile) {
  return !existsSync(stampFile) || readFileSync(stampFile, 'utf8').trim() !== hashOf(lockFile);
}

/** Installs the locked packages when they are missing or stale. */
export async function installDependencies() {
  const lock = inRoot('package-lock.json');
  const stamp = inRoot('node_modules', '.installed-lock');
  if (!areDependenciesStale(lock, stamp)) return;
  say('Installing the packages of package-lock.json (once, about a minute) …');
  await run('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error']);
  writeFileSync(stamp, `${hashOf(lock)}\n`);
}

/** @param {string} file */
function hashOf(file) {
  return createHash('sha256').update(readFileSync(file)).digest('hex');
}
