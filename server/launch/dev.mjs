/* `npm run dev`: the same house from its sources; the client by Vite with hot reload, the server restarted on change. */
import { spawn } from 'node:child_process';
import { resolve } from 'node:path';
import { installFromDebian } from './debian.mjs';
import { installDependencies } from './dependencies.mjs';
import { inRoot, ROOT } from './paths.mjs';
import { freePorts, requireFreePort } from './ports.mjs';
import { untilEnded } from './until-ended.mjs';

untilEnded(async ({ closing, end }) => {
  const port = Number(process.env.PORT ?? 8080);
  const dataDir = resolve(process.env.DATA_DIR ?? inRoot('.data'));
  const given = process.env.DATABASE_URL;

  await requireFreePort(port);
  await installDependencies();
  if (!given) await installFromDebian(['postgres']);
  const [{ startCluster }, { startProduct }] = await Promise.all([import('./cluster.mjs'), import('./product.mjs')]);
  const cluster = given ? null : await startCluster(dataDir);
  if (cluster) closing.push(cluster.stop);
  const [apiPort] = await freePorts(1);
  const execArgv = ['--import', 'tsx'];
  const product = await startProduct({
    port: /** @type {number} */ (apiPort),
    publicUrl: `http://127.0.0.1:${port}`,
    dataDir,
    databaseUrl: given ?? cluster?.url ?? '',
    onDeath: end,
    source: { execArgv, server: ['--watch', ...execArgv] },
  });
  closing.push(product.stop);

  const vite = spawn(
    process.execPath,
    [inRoot('node_modules', 'vite', 'bin', 'vite.js'), '--port', String(port), '--strictPort'],
    {
      cwd: ROOT,
      detached: true,
      stdio: ['ignore', 'inherit', 'inherit'],
      env: { ...process.env, API_URL: `http://127.0.0.1:${apiPort}` },
    },
  );
  vite.once('exit', () => end('Vite has ended.'));
  closing.push(async () => {
    if (vite.exitCode !== null || vite.signalCode !== null) return;
    await new Promise((resolve) => {
      vite.once('exit', resolve);
      vite.kill('SIGTERM');
    });
  });
});
