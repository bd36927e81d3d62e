/* `npm start`: from a Debian machine with only Node and npm to the open house. */
import { resolve } from 'node:path';
import { installFromDebian } from './debian.mjs';
import { installDependencies } from './dependencies.mjs';
import { inRoot } from './paths.mjs';
import { requireFreePort } from './ports.mjs';
import { say } from './say.mjs';
import { untilEnded } from './until-ended.mjs';

untilEnded(async ({ closing, end }) => {
  const port = Number(process.env.PORT ?? 8080);
  const dataDir = resolve(process.env.DATA_DIR ?? inRoot('.data'));
  const given = process.env.DATABASE_URL;

  await requireFreePort(port);
  await installDependencies();
  if (!given) await installFromDebian(['postgres']);
  // Only now are there packages to import.
  const [{ startCluster }, { buildWhenStale }, { startProduct }] = await Promise.all([
    import('./cluster.mjs'),
    import('./build.mjs'),
    import('./product.mjs'),
  ]);
  const starting = given ? null : startCluster(dataDir);
  closing.push(async () => (await starting?.catch(() => null))?.stop());
  const [cluster] = await Promise.all([starting, buildWhenStale()]);
  if (cluster && !cluster.folder.startsWith(dataDir)) say(`The database lives in ${cluster.folder}.`);
  const product = await startProduct({ port, dataDir, databaseUrl: given ?? cluster?.url ?? '', onDeath: end });
  closing.push(product.stop);
  process.stdout.write(
    `Steep & Bind is open at http://127.0.0.1:${port} (demonstration; its letters at /demo/letters). Ctrl-C closes it.\n`,
  );
});
