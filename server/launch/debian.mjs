import { existsSync } from 'node:fs';
import { run } from './run.mjs';
import { say, Sentence } from './say.mjs';

/** @typedef {{ file: string, packages: string[], what: string }} Need */

/** What the product and its tests use from Debian: a file that shows it is there, and the packages that bring it. */
export const NEEDS = /** @type {const} @satisfies {Record<string, Need>} */ ({
  postgres: { file: '/usr/lib/postgresql/15/bin/postgres', packages: ['postgresql-15'], what: 'PostgreSQL 15' },
  chromium: { file: '/usr/bin/chromium', packages: ['chromium'], what: 'Chromium' },
  java: { file: '/usr/bin/java', packages: ['default-jre-headless'], what: 'a Java runtime' },
  epubcheck: { file: '/usr/share/java/epubcheck.jar', packages: ['epubcheck'], what: 'epubcheck' },
});

/**
 * Installs by apt what is missing, where this user may; else says exactly what to install.
 * @param {Array<keyof typeof NEEDS>} names
 */
export async function installFromDebian(names) {
  const missing = names.map((name) => NEEDS[name]).filter((need) => !existsSync(need.file));
  if (missing.length === 0) return;
  const what = missing.map((need) => need.what).join(', ');
  const packages = missing.flatMap((need) => need.packages);
  if (process.getuid?.() !== 0)
    throw new Sentence(
      `${what} is missing. Install it as root: apt-get install -y --no-install-recommends ${packages.join(' ')}`,
    );
  say(`Installing ${what} from Debian (once) …`);
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const apt = ['-o', 'DPkg::Lock::Timeout=300', '-qq'];
  await run('apt-get', [...apt, 'update'], { env, allowFailure: true });
  await run('apt-get', [...apt, 'install', '-y', '--no-install-recommends', ...packages], { env });
  const still = missing.filter((need) => !existsSync(need.file));
  if (still.length > 0) throw new Sentence(`apt-get did not bring ${still.map((need) => need.file).join(', ')}.`);
}
