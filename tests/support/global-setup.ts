import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { runMigrations } from 'graphile-worker';
import type { TestProject } from 'vitest/node';
import { loadReferenceData } from '../../seeds/reference.ts';
import { openDatabase } from '../../server/db/connection.ts';
import { startCluster } from '../../server/launch/cluster.mjs';

declare module 'vitest' {
  interface ProvidedContext {
    /** Where databases are made: the address of the maintenance database. */
    maintenanceUrl: string;
  }
}

/** The database that every test file's own one is copied from. */
export const TEMPLATE = 'steep';

/** Starts a cluster without fsync and brings one template database to the present shape; copies of it are cheap. */
export default async function setUp(project: TestProject): Promise<() => Promise<void>> {
  const folder = await mkdtemp(join(tmpdir(), 'steep-tests-'));
  const cluster = await startCluster(folder, { fsync: false });
  const db = openDatabase(cluster.url);
  await db.migrate.latest();
  await runMigrations({ connectionString: cluster.url });
  await loadReferenceData(db);
  await db.destroy();
  project.provide('maintenanceUrl', cluster.urlOf('postgres'));
  return async () => {
    await cluster.stop();
    await rm(folder, { recursive: true, force: true });
    if (!cluster.folder.startsWith(folder)) await rm(cluster.folder, { recursive: true, force: true });
  };
}
