import type { Knex } from 'knex';
import { createHmac } from 'node:crypto';
import { readControl } from './control-settings.ts';
import { missing } from './errors.ts';
import { complain } from './log.ts';
import { SCHEMA } from './schema.ts';
import type { FakeSettings } from './settings.ts';
import type { WireEvent } from './wire.ts';

const POLL_MS = 500;
const ANSWER_MS = 10_000;
const LONGEST_PAUSE = 3600;
/** While shuffling, events are gathered this long so that there is something to shuffle. */
const GATHER_MS = 400;

interface EventRow {
  id: string;
  data: WireEvent;
  attempts: number;
}

export const FLUSH_ORDERS = ['created', 'reversed', 'shuffled'] as const;
export type FlushOrder = (typeof FLUSH_ORDERS)[number];

export interface Delivery {
  id: string;
  /** The endpoint's HTTP status; null when it gave no answer. */
  status: number | null;
}

export interface Deliverer {
  /** Something was committed: look now. */
  wake: () => void;
  /** Sends all that is not delivered yet, held or not, due or not. */
  flush: (order: FlushOrder) => Promise<Delivery[]>;
  /** Sends one event again under the same id. */
  redeliver: (id: string) => Promise<Delivery>;
  stop: () => Promise<void>;
}

/** `Stripe-Signature`: HMAC-SHA256 of `timestamp.body` under the endpoint's secret, scheme v1. */
export function signatureHeader(body: string, secret: string, seconds: number): string {
  const signature = createHmac('sha256', secret).update(`${seconds}.${body}`).digest('hex');
  return `t=${seconds},v1=${signature}`;
}

function inOrder(rows: EventRow[], order: FlushOrder): EventRow[] {
  if (order === 'reversed') return [...rows].reverse();
  if (order === 'created') return rows;
  return rows
    .map((row) => ({ row, place: Math.random() }))
    .sort((a, b) => a.place - b.place)
    .map(({ row }) => row);
}

function events(db: Knex) {
  return db.withSchema(SCHEMA).table('events');
}

async function send({ url, secret }: FakeSettings['webhook'], event: WireEvent): Promise<number | null> {
  const body = JSON.stringify(event);
  // Signed with real time at every attempt: the receiver checks the age of the signature.
  const signature = signatureHeader(body, secret, Math.floor(Date.now() / 1000));
  try {
    const response = await fetch(url, {
      method: 'POST',
      headers: { 'content-type': 'application/json; charset=utf-8', 'stripe-signature': signature },
      body,
      redirect: 'manual',
      signal: AbortSignal.timeout(ANSWER_MS),
    });
    await response.arrayBuffer();
    return response.status;
  } catch {
    return null;
  }
}

/** Notes an attempt: delivered, to be tried again after a doubling pause, or given up after three days. */
async function noteAttempt(db: Knex, id: string, delivered: boolean): Promise<void> {
  if (delivered) {
    await db.raw(
      `update ${SCHEMA}.events
       set attempts = attempts + 1, delivered_at = coalesce(delivered_at, now()), next_attempt_at = null,
           data = jsonb_set(data, '{pending_webhooks}', '0')
       where id = ?`,
      [id],
    );
    return;
  }
  await db.raw(
    `update ${SCHEMA}.events
     set attempts = attempts + 1,
         next_attempt_at = case
           when delivered_at is not null or recorded_at < now() - interval '3 days' then null
           else now() + least(power(2, least(attempts, 20)), ?) * interval '1 second'
         end
     where id = ?`,
    [LONGEST_PAUSE, id],
  );
}

/** Starts delivering events to the endpoint: at least once, retried until it answers 2xx. */
export function startDeliverer(db: Knex, webhook: FakeSettings['webhook']): Deliverer {
  let stopped = false;
  let timer: NodeJS.Timeout | undefined;
  let running: Promise<void> = Promise.resolve();

  async function deliver(row: EventRow): Promise<Delivery> {
    const status = await send(webhook, row.data);
    await noteAttempt(db, row.id, status !== null && status >= 200 && status < 300);
    return { id: row.id, status };
  }

  async function pass(): Promise<void> {
    const { mode, delayMs } = (await readControl(db)).webhooks;
    if (mode === 'hold') return;
    const age = mode === 'shuffle' ? Math.max(delayMs, GATHER_MS) : delayMs;
    const rows = await events(db)
      .where('next_attempt_at', '<=', db.raw('now()'))
      .where('recorded_at', '<=', db.raw("now() - ? * interval '1 millisecond'", [age]))
      .orderBy('seq')
      .limit(100)
      .select<EventRow[]>('id', 'data', 'attempts');
    for (const row of inOrder(rows, mode === 'shuffle' ? 'shuffled' : 'created')) {
      if (stopped) return;
      await deliver(row);
      if (mode === 'duplicate') await deliver(row);
    }
  }

  function run(): void {
    clearTimeout(timer);
    running = running
      .then(() => (stopped ? undefined : pass()))
      .catch((error: unknown) => {
        if (!stopped) complain('webhooks', error);
      })
      .then(() => {
        clearTimeout(timer);
        if (!stopped) timer = setTimeout(run, POLL_MS);
      });
  }
  run();

  return {
    wake: run,
    async flush(order) {
      const rows = await events(db)
        .whereNull('delivered_at')
        .orderBy('seq')
        .select<EventRow[]>('id', 'data', 'attempts');
      const deliveries: Delivery[] = [];
      for (const row of inOrder(rows, order)) deliveries.push(await deliver(row));
      return deliveries;
    },
    async redeliver(id) {
      const row = await events(db).where({ id }).first<EventRow | undefined>('id', 'data', 'attempts');
      if (!row) throw missing('event', id);
      return deliver(row);
    },
    async stop() {
      stopped = true;
      clearTimeout(timer);
      await running;
    },
  };
}
