import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { createHash } from 'node:crypto';
import { dirname, join, relative } from 'node:path';
import { inRoot, ROOT } from './paths.mjs';
import { run } from './run.mjs';
import { say } from './say.mjs';

const CLIENT_SOURCES = ['src', 'shared', 'public', 'index.html', 'vite.config.ts', 'package-lock.json'];
const SERVER_SOURCES = [
  'server',
  'shared',
  'migrations',
  'seeds',
  'tsconfig.base.json',
  'tsconfig.server.json',
  'package-lock.json',
];

/** Builds client and server where their sources are newer than what was built last, both at once. */
export async function buildWhenStale() {
  await Promise.all([
    buildOne('client', CLIENT_SOURCES, () => run('npx', ['vite', 'build', '--logLevel', 'warn'])),
    buildOne('server', SERVER_SOURCES, () => {
      for (const folder of ['server', 'shared', 'migrations', 'seeds'])
        rmSync(inRoot('dist', folder), { recursive: true, force: true });
      rmSync(inRoot('dist', 'server.tsbuildinfo'), { force: true });
      return run('npx', ['tsc', '-p', 'tsconfig.server.json']);
    }),
  ]);
}

/**
 * @param {string} name
 * @param {string[]} sources
 * @param {() => Promise<unknown>} build
 */
async function buildOne(name, sources, build) {
  const stamp = inRoot('dist', `.${name}-sources`);
  const now = fingerprint(sources.map((source) => inRoot(source)));
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === now) return;
  say(`Building the ${name} …`);
  await build();
  mkdirSync(dirname(stamp), { recursive: true });
  writeFileSync(stamp, now);
}

/**
 * Names, sizes and times of every file: changes when a source does, in either direction of time.
 * @param {string[]} paths
 */
export function fingerprint(paths) {
  const hash = createHash('sha256');
  for (const path of paths.flatMap(filesBelow).sort()) {
    const { size, mtimeMs } = statSync(path);
    hash.update(`${relative(ROOT, path)} ${size} ${mtimeMs}\n`);
  }
  return hash.digest('hex');
}

/**
 * @param {string} path
 * @returns {string[]}
 */
function filesBelow(path) {
  if (!existsSync(path)) return [];
  if (!statSync(path).isDirectory()) return [path];
  return readdirSync(path).flatMap((name) => filesBelow(join(path, name)));
}
