import { mkdtemp, rm, writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buildWhenStale } from '../../server/launch/build.mjs';
import { startCluster } from '../../server/launch/cluster.mjs';
import { freePorts } from '../../server/launch/ports.mjs';
import { startProduct } from '../../server/launch/product.mjs';

/** Starts the whole product for the browser tests: its own database, data folder and ports, the demonstration seeded. */
export default async function setUp(): Promise<() => Promise<void>> {
  const dataDir = await mkdtemp(join(tmpdir(), 'steep-e2e-'));
  await buildWhenStale();
  const cluster = await startCluster(dataDir, { fsync: false });
  const [port] = await freePorts(1);
  const product = await startProduct({
    port: port!,
    dataDir,
    databaseUrl: cluster.url,
    onDeath: (sentence) => process.stderr.write(`${sentence}\n`),
  });
  // Workers read their own environment: what they need to know of the house goes through it.
  process.env.E2E_URL = `http://127.0.0.1:${port}`;
  process.env.E2E_STRIPE = product.env.STRIPE_API_BASE;
  process.env.E2E_LETTERS = product.env.LETTERS_URL;
  await writeFile(join(dataDir, 'house.json'), JSON.stringify({ url: process.env.E2E_URL }));
  return async () => {
    await product.stop();
    await cluster.stop();
    await rm(dataDir, { recursive: true, force: true });
    if (!cluster.folder.startsWith(dataDir)) await rm(cluster.folder, { recursive: true, force: true });
  };
}
