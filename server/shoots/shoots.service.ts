import type { Knex } from 'knex';
import type { ShootDraft, ShootRow as ShootListed, ShootView } from '../../shared/contracts/shoots.ts';
import { versionConflict } from '../http/http.errors.ts';
import { shootNotFound } from './shoots.errors.ts';
import { findRecipesOf, findShoot, findShoots, insertShoot, updateShoot } from './shoots.queries.ts';
import type { ShootRow } from './shoots.rows.ts';

export async function listShoots(db: Knex): Promise<ShootListed[]> {
  return (await findShoots(db)).map((row) => ({
    ...toDraft(row),
    id: row.id,
    version: row.version,
    cueCount: row.cue_count,
    recipeCount: row.recipe_count,
    createdAt: row.created_at.toISOString(),
  }));
}

export async function readShootRow(db: Knex, id: string): Promise<ShootRow> {
  const row = await findShoot(db, id);
  if (!row) throw shootNotFound();
  return row;
}

/** A shoot with its notes and the recipes that were begun from it. */
export async function readShoot(db: Knex, id: string): Promise<ShootView> {
  const row = await readShootRow(db, id);
  return { ...toDraft(row), id, version: row.version, notes: toNotes(row), recipes: await findRecipesOf(db, id) };
}

export async function makeShoot(db: Knex, draft: ShootDraft, personId: string): Promise<ShootView> {
  return readShoot(db, await insertShoot(db, { ...toRow(draft), created_by: personId }));
}

export async function saveShoot(db: Knex, id: string, draft: ShootDraft, expected: number): Promise<ShootView> {
  return changeShoot(db, { id, expected, values: toRow(draft) });
}

/** Changes a shoot unless somebody else did since `expected`. */
export async function changeShoot(
  db: Knex,
  change: { id: string; expected: number; values: Partial<ShootRow> },
): Promise<ShootView> {
  return db.transaction(async (trx) => {
    const changed = await updateShoot(trx, change);
    const shoot = await readShoot(trx, change.id);
    if (!changed) throw versionConflict({ context: { version: shoot.version } });
    return shoot;
  });
}

function toDraft(row: Pick<ShootRow, 'title' | 'shot_on' | 'video_url'>): ShootDraft {
  return { title: row.title, shotOn: row.shot_on, videoUrl: row.video_url };
}

function toRow({ title, shotOn, videoUrl }: ShootDraft): Pick<ShootRow, 'title' | 'shot_on' | 'video_url'> {
  return { title, shot_on: shotOn, video_url: videoUrl };
}

function toNotes({ notes_name: name, notes_format: format, cues, warnings }: ShootRow): ShootView['notes'] {
  return name === null || format === null ? null : { name, format, cues, warnings };
}
