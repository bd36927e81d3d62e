import express, { Router, type NextFunction, type Request, type Response } from 'express';
import { z } from 'zod';
import { movableNow, readControl, updateControl, WEBHOOK_MODES, type ControlSettings } from './control-settings.ts';
import { Fault } from './errors.ts';
import { complain } from './log.ts';
import { emptySchema, SCHEMA, takeTurn } from './schema.ts';
import type { Service } from './service.ts';
import { advanceTestClock, moveClock } from './timeline.ts';
import { FLUSH_ORDERS } from './webhooks.ts';

const seconds = z.int().min(0);
const clockBody = z.union([z.strictObject({ now: seconds }), z.strictObject({ by: seconds })]);
const advanceBody = z.strictObject({ test_clock: z.string().optional(), to: seconds });
const faultBody = z.strictObject({
  prefix: z.string().startsWith('/v1/'),
  times: z.int().min(1).default(1),
  status: z.int().min(400).max(599).optional(),
  timeoutMs: z.int().min(0).max(120_000).optional(),
  when: z.enum(['before', 'after']).default('before'),
});
const webhooksBody = z.strictObject({
  mode: z.enum(WEBHOOK_MODES).default('deliver'),
  delayMs: z.int().min(0).max(600_000).default(0),
});
const flushBody = z.strictObject({ order: z.enum(FLUSH_ORDERS).default('created') });
const dunningBody = z.strictObject({
  retryDays: z.array(z.int().min(1).max(60)).max(8).default([3, 5, 7]),
  afterwards: z.enum(['canceled', 'unpaid', 'past_due']).default('canceled'),
});

interface EventSummary {
  id: string;
  type: string;
  created: number;
  object: string;
  attempts: number;
  delivered: boolean;
}

async function summaries({ db }: Service): Promise<EventSummary[]> {
  return db
    .withSchema(SCHEMA)
    .table('events')
    .orderBy('seq', 'desc')
    .select(
      'id',
      db.raw("data ->> 'type' as type"),
      db.raw("(data ->> 'created')::float8 as created"),
      db.raw("data #>> '{data,object,id}' as object"),
      'attempts',
      db.raw('delivered_at is not null as delivered'),
    );
}

async function setControl(
  service: Service,
  change: (before: ControlSettings) => Partial<ControlSettings>,
): Promise<ControlSettings> {
  return service.db.transaction(async (trx) => {
    await takeTurn(trx);
    return updateControl(trx, change(await readControl(trx)));
  });
}

function refuse(error: unknown, _req: Request, res: Response, _next: NextFunction): void {
  if (error instanceof z.ZodError) {
    res.status(400).json({ error: { message: z.prettifyError(error) } });
    return;
  }
  if (error instanceof Fault) {
    res.status(error.status).json({ error: error.body });
    return;
  }
  complain('control', error);
  res.status(500).json({ error: { message: 'The payment fake failed; see its log.' } });
}

/** What a test may do to the fake that nobody can do to the real thing. JSON in, JSON out; no form can reach it. */
export function controlRouter(service: Service): Router {
  const { db, origin, deliverer } = service;
  const router = Router();
  router.use((req, res, next) => {
    if (req.method !== 'POST' || req.is('application/json') || req.get('content-length') === undefined) return next();
    res.status(415).json({ error: { message: 'Send JSON.' } });
  });
  router.use(express.json());

  router.post('/reset', async (_req, res) => {
    await db.transaction(async (trx) => {
      await takeTurn(trx);
      await emptySchema(trx);
    });
    res.json({ reset: true });
  });

  router.get('/clock', async (_req, res) => {
    res.json({ now: movableNow(await readControl(db)) });
  });

  router.post('/clock', async (req, res) => {
    const wanted = clockBody.parse(req.body);
    const now = await moveClock(db, origin, (before) => ('now' in wanted ? wanted.now : before + wanted.by));
    deliverer.wake();
    res.json({ now });
  });

  router.post('/advance', async (req, res) => {
    const { test_clock: clock, to } = advanceBody.parse(req.body);
    const advanced = clock
      ? await advanceTestClock(db, origin, clock, to)
      : { now: await moveClock(db, origin, () => to) };
    deliverer.wake();
    res.json(advanced);
  });

  router.post('/faults', async (req, res) => {
    const fault = faultBody.parse(req.body);
    const { faults } = await setControl(service, (before) => ({ faults: [...before.faults, fault] }));
    res.json({ faults });
  });

  router.post('/dunning', async (req, res) => {
    const dunning = dunningBody.parse(req.body);
    await setControl(service, () => ({ dunning }));
    res.json(dunning);
  });

  router.post('/webhooks', async (req, res) => {
    const webhooks = webhooksBody.parse(req.body);
    await setControl(service, () => ({ webhooks }));
    deliverer.wake();
    res.json(webhooks);
  });

  router.post('/webhooks/flush', async (req, res) => {
    const { order } = flushBody.parse(req.body ?? {});
    res.json({ deliveries: await deliverer.flush(order) });
  });

  router.get('/events', async (_req, res) => {
    res.json({ events: await summaries(service) });
  });

  router.post('/events/:id/redeliver', async (req, res) => {
    res.json(await deliverer.redeliver(req.params.id));
  });

  router.use((_req, res) => {
    res.status(404).json({ error: { message: 'The control plane has no such call.' } });
  });
  router.use(refuse);
  return router;
}
