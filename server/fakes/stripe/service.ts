import type { Knex } from 'knex';
import { movableNow, readControl } from './control-settings.ts';
import { takeTurn } from './schema.ts';
import type { Deliverer } from './webhooks.ts';
import type { Work } from './work.ts';

/** What every part of the running fake shares. */
export interface Service {
  db: Knex;
  origin: string;
  deliverer: Deliverer;
  /** Acts out what is due without waiting for the next second. */
  tickSoon: () => void;
}

/** Runs one change in a transaction, one at a time, and has its events delivered once it is committed. */
export async function inTurn<T>(
  service: Service,
  request: Work['request'],
  run: (work: Work) => Promise<T>,
): Promise<T> {
  const result = await service.db.transaction(async (trx) => {
    await takeTurn(trx);
    return run(await workOn(trx, service, request));
  });
  service.deliverer.wake();
  return result;
}

/** Reads in one transaction, without waiting for changes under way. */
export async function reading<T>(
  service: Service,
  request: Work['request'],
  run: (work: Work) => Promise<T>,
): Promise<T> {
  return service.db.transaction(async (trx) => run(await workOn(trx, service, request)), {
    isolationLevel: 'repeatable read',
  });
}

async function workOn(trx: Knex.Transaction, { origin }: Service, request: Work['request']): Promise<Work> {
  const control = await readControl(trx);
  return { db: trx, now: movableNow(control), dunning: control.dunning, request, origin };
}
