import { execFile } from 'node:child_process';
import { mkdtemp, rm, utimes, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { promisify } from 'node:util';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { fingerprint } from '../../../server/launch/build.mjs';
import { closingLine, countPlaywright, countVitest } from '../../../server/launch/counts.mjs';
import { areDependenciesStale } from '../../../server/launch/dependencies.mjs';
import { freePorts, requireFreePort } from '../../../server/launch/ports.mjs';
import { verifyPassword } from '../../../server/people/passwords.ts';
import { useDatabase } from '../../support/database.ts';
import { createServer } from 'node:net';

let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'steep-launch-'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

async function file(name: string, content: string): Promise<string> {
  const path = join(folder, name);
  await writeFile(path, content);
  return path;
}

describe('the closing line', () => {
  it('sums the real counts of both runners', async () => {
    const vitest = await file(
      'vitest.json',
      JSON.stringify({
        numPassedTests: 40,
        numFailedTests: 1,
        // A file that could not be loaded counts as a failure though it holds no failed test.
        testResults: [
          { status: 'failed', assertionResults: [] },
          { status: 'failed', assertionResults: [{}] },
        ],
      }),
    );
    const playwright = await file(
      'pw.json',
      JSON.stringify({ stats: { expected: 5, unexpected: 1, flaky: 1 }, errors: [] }),
    );
    const counts = [countVitest('unit', vitest), countPlaywright('browser', playwright)];
    expect(closingLine(counts)).toBe('tests: 45 passed, 4 failed');
  });

  it.each([
    ['no report', null],
    ['a report of nothing', JSON.stringify({ numPassedTests: 0, numFailedTests: 0, testResults: [] })],
    ['a torn report', '{'],
  ])('takes %s for a failure', async (_name, content) => {
    const path = content === null ? join(folder, 'none.json') : await file('odd.json', content);
    expect(countVitest('unit', path)).toMatchObject({ passed: 0, failed: 1, ran: false });
  });
});

describe('what is stale', () => {
  it('are packages without a stamp, or with that of another lock file', async () => {
    const lock = await file('lock.json', '{"a":1}');
    const stamp = join(folder, 'stamp');
    expect(areDependenciesStale(lock, stamp)).toBe(true);
    await writeFile(stamp, '015abd7f5cc57a2dd94b7590f04ad8084273905ee33ec5cebeae62276a97f862\n');
    expect(areDependenciesStale(lock, stamp)).toBe(false);
    await writeFile(lock, '{"a":2}');
    expect(areDependenciesStale(lock, stamp)).toBe(true);
  });

  it('is a build whose sources changed, also to an older time', async () => {
    const source = await file('source.ts', 'export {}');
    const before = fingerprint([source]);
    expect(fingerprint([source])).toBe(before);
    await utimes(source, new Date(0), new Date(0));
    expect(fingerprint([source])).not.toBe(before);
  });
});

it('a port that is taken is told in a sentence that says what to do', async () => {
  const [port] = await freePorts(1);
  const server = createServer().listen(port, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  try {
    await expect(requireFreePort(port!)).rejects.toThrow(`PORT=${port! + 1} npm start`);
  } finally {
    server.close();
  }
});

describe('the first admin', () => {
  const database = useDatabase();
  const run = (...args: string[]) => {
    const started = promisify(execFile)(
      process.execPath,
      ['--import', 'tsx', 'server/launch/first-admin.ts', ...args],
      { env: { ...process.env, DATABASE_URL: database.url } },
    );
    started.child.stdin?.end('a password of length\n');
    return started;
  };

  it('is made by a command, once, with the password that was typed', async () => {
    await run('Press@House.example', 'Ada', 'Low');
    const admin = await database.db('people').first();
    expect(admin).toMatchObject({ email: 'press@house.example', name: 'Ada Low', roles: ['admin'] });
    expect(await verifyPassword(admin!.password_hash, 'a password of length')).toBe(true);
    await expect(run('second@house.example', 'Bo')).rejects.toThrow('There is an admin already');
  });

  it('is refused without an address', async () => {
    await expect(run('nobody', 'Bo')).rejects.toThrow('This is not an e-mail address.');
  });
});
