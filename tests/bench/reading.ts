import { fork } from 'node:child_process';
import autocannon from 'autocannon';
import { DEMO_PASSWORD } from '../../server/demo/accounts.ts';
import { freePorts } from '../../server/launch/ports.mjs';
import { inRoot } from '../../server/launch/paths.mjs';
import type { House, Row } from './run.ts';

const ROUNDS = 3;
const RECIPE = '/api/reading/slack-water/whitecap-sour';

/**
 * A gated recipe read by a member over HTTP, against a bare Express route that does as many indexed queries and sends
 * the same bytes; also shown against a single query.
 */
export async function* benchReading(house: House): AsyncGenerator<Row> {
  const cookie = await signInAsMember(house.url);
  const answer = await fetch(house.url + RECIPE, { headers: { cookie } });
  const body = await answer.text();
  if (!body.startsWith('{"view":"open"')) throw new Error('The member was not let in: nothing to measure.');

  const [three, one] = await Promise.all([3, 1].map((queries) => startBare(house, { body, queries })));
  const sums = { read: 0, three: 0, one: 0 };
  try {
    // In turns, so that whatever else the machine does meets all of them alike.
    for (let round = 0; round < ROUNDS; round += 1) {
      sums.read += await throughput(house.url + RECIPE, cookie);
      sums.three += await throughput(three!.url, '');
      sums.one += await throughput(one!.url, '');
    }
  } finally {
    three!.stop();
    one!.stop();
  }
  const { read, three: bare, one: single } = sums;
  const ratio = read / bare;
  yield {
    name: 'gated recipe read over HTTP, share of the throughput of a bare route with as many indexed queries',
    value: round(ratio),
    unit: 'ratio',
    goal: '>= 0.6',
    met: ratio >= 0.6,
    detail: {
      readsPerSecond: Math.round(read / ROUNDS),
      bareWithThreeQueriesPerSecond: Math.round(bare / ROUNDS),
      bareWithOneQueryPerSecond: Math.round(single / ROUNDS),
      shareOfOneQuery: round(read / single),
      bytes: body.length,
    },
  };
}

/** Waits until the demonstration's members have joined, which their jobs do after the first start. */
async function signInAsMember(url: string): Promise<string> {
  for (let tries = 0; tries < 60; tries += 1) {
    const answer = await fetch(`${url}/api/session`, {
      method: 'POST',
      headers: { 'content-type': 'application/json' },
      body: JSON.stringify({ email: 'clothbound@demo.example', password: DEMO_PASSWORD }),
    });
    const { tier } = (await answer.json()) as { tier: unknown };
    if (tier) return answer.headers.getSetCookie()[0]!.split(';')[0]!;
    await new Promise((resolve) => setTimeout(resolve, 1000));
  }
  throw new Error('The demonstration’s member has not joined within a minute.');
}

async function startBare(
  house: House,
  { body, queries }: { body: string; queries: number },
): Promise<{ url: string; stop: () => void }> {
  const [port] = await freePorts(1);
  const env = {
    ...process.env,
    NODE_ENV: 'production',
    DATABASE_URL: house.databaseUrl,
    PORT: String(port),
    QUERIES: String(queries),
  };
  const child = fork(inRoot('tests/bench/bare-server.mjs'), [], { env });
  await new Promise((resolve) => child.once('message', resolve));
  child.send({ body });
  await new Promise((resolve) => child.once('message', resolve));
  return { url: `http://127.0.0.1:${port}/`, stop: () => child.kill() };
}

/** Requests a second over ten connections, after a warm-up. */
async function throughput(url: string, cookie: string): Promise<number> {
  const options = { url, connections: 10, headers: cookie ? { cookie } : {} };
  await autocannon({ ...options, duration: 2 });
  const { requests, non2xx } = await autocannon({ ...options, duration: 5 });
  if (non2xx > 0) throw new Error(`${non2xx} answers were no good ones.`);
  return requests.average;
}

const round = (value: number) => Math.round(value * 1000) / 1000;
