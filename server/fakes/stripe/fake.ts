import express from 'express';
import knex from 'knex';
import { once } from 'node:events';
import type { AddressInfo } from 'node:net';
import { controlRouter } from './control.ts';
import { apiRouter } from './http.ts';
import { forgetOldKeys } from './idempotency.ts';
import { complain } from './log.ts';
import { pageRouter } from './pages/routes.ts';
import { createSchema } from './schema.ts';
import type { Service } from './service.ts';
import { isLoopback, type FakeSettings } from './settings.ts';
import { tick } from './timeline.ts';
import { startDeliverer } from './webhooks.ts';

const TICK_MS = 1000;

export interface RunningFake {
  port: number;
  /** Where its pages and control plane are, such as `http://127.0.0.1:4242`. */
  origin: string;
  close: () => Promise<void>;
}

/** Starts the fake on 127.0.0.1 and resolves once it listens. */
export async function startFake(settings: FakeSettings): Promise<RunningFake> {
  const db = knex({ client: 'pg', connection: settings.databaseUrl, pool: { min: 0, max: 6 } });
  await createSchema(db);

  const app = express();
  app.disable('x-powered-by');
  // A page of the web that resolves its own name to this machine gets nothing.
  app.use((req, res, next) => {
    if (isLoopback(req.get('host') ?? '')) return next();
    res
      .status(421)
      .json({ error: { type: 'invalid_request_error', message: 'The payment fake answers this machine only.' } });
  });
  const server = app.listen(settings.port, '127.0.0.1');
  await once(server, 'listening');
  const { port } = server.address() as AddressInfo;
  const origin = `http://127.0.0.1:${port}`;

  const deliverer = startDeliverer(db, settings.webhook);
  let ticking: Promise<void> | undefined;
  const tickSoon = (): void => {
    ticking ??= tick(db, origin)
      .then(() => forgetOldKeys(db))
      .then(() => deliverer.wake())
      .catch((error: unknown) => complain('clock', error))
      .finally(() => (ticking = undefined));
  };
  const ticker = setInterval(tickSoon, TICK_MS);

  const service: Service = { db, origin, deliverer, tickSoon };
  app.get('/healthz', (_req, res) => void res.json({ ok: true }));
  app.use('/v1', apiRouter(service));
  app.use('/control', controlRouter(service));
  app.use(pageRouter(service));

  return {
    port,
    origin,
    async close() {
      clearInterval(ticker);
      server.close();
      server.closeAllConnections();
      await ticking;
      await deliverer.stop();
      await db.destroy();
    },
  };
}
