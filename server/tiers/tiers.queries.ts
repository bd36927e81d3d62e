import type { Knex } from 'knex';
import type { Access } from '../../shared/contracts/access.ts';
import type { Currency } from '../../shared/contracts/imprint.ts';
import type { TierView } from '../../shared/contracts/tiers.ts';
import { isUniqueViolation } from '../db/constraints.ts';
import { rankTaken } from './tiers.errors.ts';

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

/** Every tier: those that can be joined, lowest first, then the closed ones. */
export async function findTiers(db: Knex): Promise<TierRow[]> {
  return db('tiers').orderByRaw('closed_at is not null, rank, created_at');
}

export async function findTier(db: Knex, id: string): Promise<TierRow | undefined> {
  return db('tiers').where({ id }).first();
}

export async function hasOpenTiers(db: Knex): Promise<boolean> {
  return (await db('tiers').whereNull('closed_at').first('id')) !== undefined;
}

export async function insertTier(
  db: Knex,
  values: Pick<TierRow, 'rank' | 'name' | 'description' | 'perks' | 'monthly' | 'yearly' | 'currency'>,
): Promise<TierRow> {
  const [row] = await orRankTaken(db('tiers').insert(values).returning('*'));
  return row!;
}

/** Changes a tier that still has the expected version. */
export async function updateTier(
  db: Knex,
  { id, expected }: { id: string; expected: number },
  values: Partial<TierRow>,
): Promise<TierRow | undefined> {
  const [row] = await orRankTaken(
    db('tiers')
      .where({ id, version: expected })
      .update({ ...values, version: expected + 1 })
      .returning('*'),
  );
  return row;
}

async function orRankTaken<T>(statement: PromiseLike<T>): Promise<T> {
  try {
    return await statement;
  } catch (error) {
    if (!isUniqueViolation(error, 'tiers_rank_key')) throw error;
    throw rankTaken({ faults: [{ path: 'rank', message: 'Another tier already has this rank.' }] }, error);
  }
}

/** How many people hold each tier now; one whose payment is late counts. */
export async function countMembers(db: Knex): Promise<Map<string, number>> {
  const rows = await db('memberships')
    .whereIn('state', ['trialing', 'active', 'past_due'])
    .groupBy('tier_id')
    .select<{ tier_id: string; members: string }[]>('tier_id', db.raw('count(*) as members'));
  return new Map(rows.map((row) => [row.tier_id, Number(row.members)]));
}

export interface BoundEntryRow {
  recipe_id: string;
  access: Access;
  opens: { rank: number; at: string }[];
  withdrawn: boolean;
}

/** What the gate asks for, of every recipe in the last issued edition of each book. */
export async function findIssuedEntries(db: Knex): Promise<BoundEntryRow[]> {
  const { rows } = await db.raw<{ rows: BoundEntryRow[] }>(
    `select bound_recipes.recipe_id, bound_recipes.access, latest.opens, recipes.state = 'withdrawn' as withdrawn
    from (
      select distinct on (editions.book_id) editions.id, editions.opens
      from editions
      where editions.state = 'issued' and editions.kind = 'edition'
      order by editions.book_id, editions.issued_at desc
    ) latest
    join bound_recipes on bound_recipes.edition_id = latest.id
    join recipes on recipes.id = bound_recipes.recipe_id`,
  );
  return rows;
}
