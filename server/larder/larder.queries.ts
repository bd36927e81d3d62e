import type { Knex } from 'knex';
import type { LarderItem } from '../../shared/contracts/larder.ts';

interface LarderRow {
  id: string;
  name: string;
  item: LarderItem;
}

declare module 'knex/types/tables.js' {
  interface Tables {
    larder_items: LarderRow;
  }
}

/** The whole ingredient catalogue, by name. */
export async function findLarder(db: Knex): Promise<LarderItem[]> {
  const rows = await db('larder_items').orderBy('name').select('item');
  return rows.map((row) => row.item);
}

/** The entries with these ids; unknown ids are left out. */
export async function findLarderItems(db: Knex, ids: readonly string[]): Promise<Map<string, LarderItem>> {
  if (ids.length === 0) return new Map();
  const rows = await db('larder_items')
    .whereIn('id', [...ids])
    .select('id', 'item');
  return new Map(rows.map((row) => [row.id, row.item]));
}
