import { mkdtemp, rm } from 'node:fs/promises';
import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { runMigrations } from 'graphile-worker';
import supertest from 'supertest';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { makeApp, type App } from '../../server/app.ts';
import { makeContext, type AppContext } from '../../server/context.ts';
import { startCluster } from '../../server/launch/cluster.mjs';
import { loadReferenceData } from '../../seeds/reference.ts';
import { testSettings } from '../support/api.ts';

type Cluster = Awaited<ReturnType<typeof startCluster>>;

let folder: string;
let cluster: Cluster;
let ctx: AppContext;
let app: App;
let server: Server;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'steep-outage-'));
  cluster = await startCluster(folder, { fsync: false });
  ctx = makeContext(testSettings({ DATABASE_URL: cluster.url, DATA_DIR: folder }));
  app = makeApp(ctx);
  server = await new Promise((resolve) => {
    const listening = app.express.listen(0, '127.0.0.1', () => resolve(listening));
  });
});
afterAll(async () => {
  server.close();
  await app.close();
  await ctx.db.destroy();
  await cluster.stop();
  await rm(folder, { recursive: true, force: true });
  if (!cluster.folder.startsWith(folder)) await rm(cluster.folder, { recursive: true, force: true });
});

const ask = (path: string) => supertest(`http://127.0.0.1:${(server.address() as AddressInfo).port}`).get(path);

it('answers 503 before its migrations, 200 after them, 503 while the database is away, and serves again by itself', async () => {
  expect((await ask('/healthz')).status).toBe(503);
  await ctx.db.migrate.latest();
  await runMigrations({ connectionString: cluster.url });
  await loadReferenceData(ctx.db);
  expect((await ask('/healthz')).status).toBe(200);
  expect((await ask('/api/imprint')).status).toBe(200);

  const port = Number(new URL(cluster.url).port);
  await cluster.stop();
  const away = await ask('/api/imprint');
  expect([away.status, away.body.code]).toEqual([503, 'server.unready']);
  expect(away.headers['retry-after']).toBeDefined();
  expect((await ask('/healthz')).status).toBe(503);

  cluster = await startCluster(folder, { fsync: false, port });
  expect((await ask('/healthz')).status).toBe(200);
  expect((await ask('/api/imprint')).status).toBe(200);
});
