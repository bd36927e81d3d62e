import type { Knex } from 'knex';

export interface StripeEventRow {
  id: string;
  type: string;
  stripe_customer: string | null;
  received_at: Date;
  converged_at: Date | null;
}

declare module 'knex/types/tables.js' {
  interface Tables {
    stripe_events: StripeEventRow;
  }
}

/** Records an event; false when it was recorded before. */
export async function insertEvent(
  db: Knex,
  values: Pick<StripeEventRow, 'id' | 'type' | 'stripe_customer'>,
): Promise<boolean> {
  const rows = await db('stripe_events').insert(values).onConflict('id').ignore().returning('id');
  return rows.length > 0;
}

/** Events of a customer that nothing was made of yet. */
export async function findWaitingEvents(db: Knex, stripeCustomer: string): Promise<string[]> {
  return db('stripe_events').where({ stripe_customer: stripeCustomer, converged_at: null }).pluck('id');
}

export async function markConverged(db: Knex, ids: string[], at: Date): Promise<void> {
  await db('stripe_events').whereIn('id', ids).update({ converged_at: at });
}
