import type { Knex } from 'knex';
import type { Currency } from '../../shared/contracts/imprint.ts';
import type { TierView } from '../../shared/contracts/tiers.ts';

export interface TierRow {
  id: string;
  rank: number;
  name: string;
  description: string;
  perks: string[];
  monthly: number;
  yearly: number;
  currency: Currency;
  stripe_product: string | null;
  stripe_monthly_price: string | null;
  stripe_yearly_price: string | null;
  sync: TierView['sync'];
  sync_fault: string | null;
  closed_at: Date | null;
  version: number;
  created_at: Date;
}

declare module 'knex/types/tables.js' {
  interface Tables {
    tiers: TierRow;
  }
}

/** Tiers that can be joined, lowest first. */
export async function findOpenTiers(db: Knex): Promise<TierRow[]> {
  return db('tiers').whereNull('closed_at').orderBy('rank');
}

export async function hasOpenTiers(db: Knex): Promise<boolean> {
  return (await db('tiers').whereNull('closed_at').first('id')) !== undefined;
}
