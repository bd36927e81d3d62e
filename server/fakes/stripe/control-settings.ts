import type { Knex } from 'knex';
import { SCHEMA } from './schema.ts';

export const WEBHOOK_MODES = ['deliver', 'hold', 'shuffle', 'duplicate'] as const;
export type WebhookMode = (typeof WEBHOOK_MODES)[number];

export interface InjectedFault {
  prefix: string;
  times: number;
  /** The HTTP status to answer; without one the connection is cut after `timeoutMs`. */
  status?: number | undefined;
  timeoutMs?: number | undefined;
  /** `after`: the request is acted out and only its answer is lost. */
  when: 'before' | 'after';
}

/** What the control plane has set. Kept with the rest of the state, so that a restart changes nothing. */
export interface ControlSettings {
  /** Seconds by which the movable clock runs ahead of real time. */
  clockOffset: number;
  webhooks: { mode: WebhookMode; delayMs: number };
  faults: InjectedFault[];
  dunning: {
    /** Days between a failed attempt and the next; when they are used up, `afterwards` happens. */
    retryDays: number[];
    afterwards: 'canceled' | 'unpaid' | 'past_due';
  };
}

const DEFAULTS: ControlSettings = {
  clockOffset: 0,
  webhooks: { mode: 'deliver', delayMs: 0 },
  faults: [],
  dunning: { retryDays: [3, 5, 7], afterwards: 'canceled' },
};

export async function readControl(db: Knex): Promise<ControlSettings> {
  const row = await db
    .withSchema(SCHEMA)
    .from('control')
    .first<{ settings: Partial<ControlSettings> } | undefined>('settings');
  return { ...DEFAULTS, ...row?.settings };
}

export async function updateControl(db: Knex, change: Partial<ControlSettings>): Promise<ControlSettings> {
  const settings = { ...(await readControl(db)), ...change };
  await db
    .withSchema(SCHEMA)
    .into('control')
    .insert({ id: 1, settings: JSON.stringify(settings) })
    .onConflict('id')
    .merge();
  return settings;
}

/** Seconds on the movable clock that everything outside a test clock follows. */
export function movableNow(settings: ControlSettings): number {
  return Math.floor(Date.now() / 1000) + settings.clockOffset;
}
