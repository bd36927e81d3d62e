import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buildWhenStale } from '../../server/launch/build.mjs';
import { startCluster } from '../../server/launch/cluster.mjs';
import { freePorts } from '../../server/launch/ports.mjs';
import { startProduct } from '../../server/launch/product.mjs';
import { benchPlates } from './plates.ts';
import { benchPressing } from './pressing.ts';
import { benchReading } from './reading.ts';
import { benchScript } from './script.ts';

/** One measured row: what was measured, against what, the goal, and whether it is met. */
export interface Row {
  name: string;
  value: number;
  unit: string;
  goal: string;
  met: boolean;
  detail: Record<string, number>;
}

async function main(): Promise<void> {
  const dataDir = await mkdtemp(join(tmpdir(), 'steep-bench-'));
  await buildWhenStale();
  const cluster = await startCluster(dataDir);
  const [port] = await freePorts(1);
  const product = await startProduct({
    port: port!,
    dataDir,
    databaseUrl: cluster.url,
    onDeath: (sentence) => process.stderr.write(`${sentence}\n`),
  });
  const house = { url: `http://127.0.0.1:${port}`, databaseUrl: cluster.url, dataDir };
  try {
    const rows: AsyncIterable<Row>[] = [
      benchReading(house),
      benchScript(house),
      benchPlates(house),
      benchPressing(house),
    ];
    for (const measured of rows) for await (const row of measured) process.stdout.write(`${JSON.stringify(row)}\n`);
  } finally {
    await product.stop();
    await cluster.stop();
    await rm(dataDir, { recursive: true, force: true });
    if (!cluster.folder.startsWith(dataDir)) await rm(cluster.folder, { recursive: true, force: true });
  }
}

export interface House {
  url: string;
  databaseUrl: string;
  dataDir: string;
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
  process.exit(1);
});
