/* The whole demonstration as processes: what `npm start`, `npm run dev`, the browser tests and the bench share. */
import { mkdirSync } from 'node:fs';
import { inRoot } from './paths.mjs';
import { freePorts } from './ports.mjs';
import { makeHouse } from './processes.mjs';
import { run } from './run.mjs';
import { readSecrets } from './secrets.mjs';

/**
 * @typedef {object} ProductOptions
 * @property {number} port
 * @property {string} dataDir
 * @property {string} databaseUrl
 * @property {(sentence: string) => void} onDeath
 * @property {string} [publicUrl] where people reach it; the server's own address unless told
 * @property {{ execArgv: string[], server: string[] }} [source] runs the sources with these Node arguments instead of what was built
 */

/**
 * Migrates, seeds an empty database, and starts fakes, worker and server.
 * @param {ProductOptions} options
 */
export async function startProduct({
  port,
  dataDir,
  databaseUrl,
  onDeath,
  publicUrl = `http://127.0.0.1:${port}`,
  source,
}) {
  mkdirSync(dataDir, { recursive: true });
  const secrets = readSecrets(dataDir);
  const [stripePort, smtpPort, lettersPort] = await freePorts(3);
  const env = {
    ...process.env,
    NODE_ENV: 'production',
    MODE: 'demo',
    PORT: String(port),
    DATA_DIR: dataDir,
    DATABASE_URL: databaseUrl,
    PUBLIC_URL: publicUrl,
    SESSION_SECRET: secrets.session,
    STRIPE_SECRET_KEY: secrets.stripeKey,
    STRIPE_WEBHOOK_SECRET: secrets.webhook,
    STRIPE_API_BASE: `http://127.0.0.1:${stripePort}`,
    SMTP_URL: `smtp://127.0.0.1:${smtpPort}`,
    LETTERS_URL: `http://127.0.0.1:${lettersPort}`,
    FAKE_STRIPE_PORT: String(stripePort),
    FAKE_SMTP_PORT: String(smtpPort),
    FAKE_SMTP_HTTP_PORT: String(lettersPort),
    WEBHOOK_URL: `http://127.0.0.1:${port}/api/stripe/webhook`,
  };
  const moduleOf = (/** @type {string} */ name) =>
    source ? inRoot('server', `${name}.ts`) : inRoot('dist', 'server', `${name}.js`);
  const execArgv = source?.execArgv ?? ['--enable-source-maps'];

  await run(process.execPath, [...(source?.execArgv ?? []), moduleOf('launch/migrate'), '--demo'], { env, show: true });
  const house = makeHouse(onDeath);
  const part = (/** @type {string} */ name, /** @type {string} */ module, args = execArgv) =>
    house.start({ name, module: moduleOf(module), env, execArgv: args });
  try {
    await Promise.all([
      part('payment fake', 'fakes/stripe/main'),
      part('mail catcher', 'fakes/smtp/main'),
      part('worker', 'worker', source?.server),
      part('server', 'main', source?.server),
    ]);
  } catch (error) {
    await house.stop();
    throw error;
  }
  return { env, stop: house.stop };
}
