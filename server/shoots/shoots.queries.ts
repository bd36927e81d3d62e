import type { Knex } from 'knex';
import type { RecipeState } from '../../shared/contracts/words.ts';
import type { ShootRow } from './shoots.rows.ts';

export interface ShootListRow extends Omit<ShootRow, 'cues' | 'warnings' | 'notes_text'> {
  cue_count: number;
  recipe_count: number;
}

/** Shoots, the last filmed first, without their notes. */
export async function findShoots(db: Knex): Promise<ShootListRow[]> {
  return db('shoots')
    .orderBy([
      { column: 'shoots.shot_on', order: 'desc' },
      { column: 'shoots.created_at', order: 'desc' },
    ])
    .select<ShootListRow[]>(
      'shoots.id',
      'shoots.title',
      'shoots.video_url',
      'shoots.version',
      'shoots.created_at',
      db.raw('shoots.shot_on::text as shot_on'),
      db.raw('jsonb_array_length(shoots.cues) as cue_count'),
      db.raw('(select count(*)::int from recipes where recipes.shoot_id = shoots.id) as recipe_count'),
    );
}

export async function findShoot(db: Knex, id: string): Promise<ShootRow | undefined> {
  return db('shoots').where({ id }).first<ShootRow | undefined>('shoots.*', db.raw('shoots.shot_on::text as shot_on'));
}

export async function insertShoot(
  db: Knex,
  values: Pick<ShootRow, 'title' | 'shot_on' | 'video_url' | 'created_by'>,
): Promise<string> {
  const [row] = await db('shoots').insert(values).returning('id');
  return row!.id;
}

/** Changes a shoot if it is still at the expected version; says whether it was. */
export async function updateShoot(
  db: Knex,
  { id, expected, values }: { id: string; expected: number; values: Partial<ShootRow> },
): Promise<boolean> {
  const changed = await db('shoots')
    .where({ id, version: expected })
    .update({ ...asStored(values), version: expected + 1 });
  return changed === 1;
}

/** The driver would write a list as an array of PostgreSQL; these columns hold JSON. */
function asStored({ cues, warnings, ...same }: Partial<ShootRow>): Partial<ShootRow> {
  return {
    ...same,
    ...(cues && { cues: JSON.stringify(cues) as never }),
    ...(warnings && { warnings: JSON.stringify(warnings) as never }),
  };
}

export interface ShootRecipeRow {
  id: string;
  title: string;
  state: RecipeState;
}

/** The recipes that were begun from a shoot, by title. */
export async function findRecipesOf(db: Knex, shootId: string): Promise<ShootRecipeRow[]> {
  return db('recipes').where({ shoot_id: shootId }).orderBy('title').select('id', 'title', 'state');
}
