import type { Knex } from 'knex';
import type { PlateRow } from './plates.rows.ts';

export async function findPlates(db: Knex, ids: readonly string[]): Promise<PlateRow[]> {
  if (ids.length === 0) return [];
  return db('plates').whereIn('id', [...ids]);
}

/** All plates, newest first; of one shoot where it is named. */
export async function findAllPlates(db: Knex, shootId?: string): Promise<PlateRow[]> {
  return db('plates')
    .modify((plates) => {
      if (shootId) void plates.where({ shoot_id: shootId });
    })
    .orderBy([{ column: 'created_at', order: 'desc' }, 'id']);
}

export async function findPlate(db: Knex, id: string): Promise<PlateRow | undefined> {
  return db('plates').where({ id }).first();
}

export async function insertPlate(
  db: Knex,
  values: Pick<PlateRow, 'original_hash' | 'original_name' | 'width' | 'height' | 'created_by'> & Partial<PlateRow>,
): Promise<PlateRow> {
  const [row] = await db('plates').insert(values).returning('*');
  return row!;
}

export async function updatePlate(db: Knex, id: string, values: Partial<PlateRow>): Promise<void> {
  await db('plates').where({ id }).update(values);
}

export async function updatePlateWords(
  db: Knex,
  { id, expected, values }: { id: string; expected: number; values: Partial<PlateRow> },
): Promise<PlateRow | undefined> {
  const [row] = await db('plates')
    .where({ id, version: expected })
    .update({ ...values, version: expected + 1 })
    .returning('*');
  return row;
}

export async function deletePlate(db: Knex, id: string): Promise<void> {
  await db('plates').where({ id }).delete();
}

/** Whether a plate stands on a cover or in a current revision. */
export async function isPlateUsed(db: Knex, id: string): Promise<boolean> {
  const { rows } = await db.raw<{ rows: { used: boolean }[] }>(
    `select exists (select 1 from books where books.cover_plate_id = :id)
      or exists (
        select 1 from recipes
        join revisions on revisions.recipe_id = recipes.id and revisions.number = recipes.revision
        where revisions.document ->> 'leadPlateId' = :id::text
          or revisions.document -> 'steps' @> jsonb_build_array(jsonb_build_object('plateId', :id::text))) as used`,
    { id },
  );
  return rows[0]?.used === true;
}
