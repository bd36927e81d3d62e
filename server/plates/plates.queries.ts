import type { Knex } from 'knex';
import type { PlateRow } from './plates.rows.ts';

export async function findPlates(db: Knex, ids: readonly string[]): Promise<PlateRow[]> {
  if (ids.length === 0) return [];
  return db('plates').whereIn('id', [...ids]);
}

export async function findPlate(db: Knex, id: string): Promise<PlateRow | undefined> {
  return db('plates').where({ id }).first();
}
