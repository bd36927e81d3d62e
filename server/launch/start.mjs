/* `npm start`: from a Debian machine with only Node and npm to the open house. */
import { resolve } from 'node:path';
import { installDependencies } from './dependencies.mjs';
import { installFromDebian } from './debian.mjs';
import { inRoot } from './paths.mjs';
import { requireFreePort } from './ports.mjs';
import { runMain, say } from './say.mjs';
import { untilEnded } from './until-ended.mjs';

runMain(async () => {
  const port = Number(process.env.PORT ?? 8080);
  const dataDir = resolve(process.env.DATA_DIR ?? inRoot('.data'));
  /** @type {Array<() => Promise<void>>} */
  const closing = [];
  const end = untilEnded(async () => {
    for (const close of closing.reverse()) await close();
  });

  await requireFreePort(port);
  await installDependencies();
  const given = process.env.DATABASE_URL;
  if (!given) await installFromDebian(['postgres']);
  // Only now are there packages to import.
  const [{ startCluster }, { buildWhenStale }, { startProduct }] = await Promise.all([
    import('./cluster.mjs'),
    import('./build.mjs'),
    import('./product.mjs'),
  ]);
  const [cluster] = await Promise.all([given ? null : startCluster(dataDir), buildWhenStale()]);
  if (cluster) closing.push(cluster.stop);
  if (cluster && !cluster.folder.startsWith(dataDir)) say(`The database lives in ${cluster.folder}.`);
  const product = await startProduct({ port, dataDir, databaseUrl: given ?? cluster?.url ?? '', onDeath: end });
  closing.push(product.stop);
  process.stdout.write(
    `Steep & Bind is open at http://127.0.0.1:${port} (demonstration; its letters at /demo/letters). Ctrl-C closes it.\n`,
  );
});
