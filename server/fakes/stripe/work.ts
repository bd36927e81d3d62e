import type { Knex } from 'knex';
import type { ControlSettings } from './control-settings.ts';

/** One change under way: its transaction and what it needs to know. State and events are committed together. */
export interface Work {
  db: Knex.Transaction;
  /** Seconds on the movable clock; customers on a test clock have their own time (`instantOf`). */
  now: number;
  dunning: ControlSettings['dunning'];
  request: { id: string | null; idempotency_key: string | null };
  /** Where the fake's own pages are, without a slash at the end. */
  origin: string;
}

/** Work that no request asked for: renewals, retries, expiries. */
export const NO_REQUEST: Work['request'] = { id: null, idempotency_key: null };
