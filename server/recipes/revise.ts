import type { Knex } from 'knex';
import type { Figures } from '../../shared/contracts/figures.ts';
import type { RecipeDocument } from '../../shared/contracts/recipe-document.ts';
import type { RecipeState } from '../../shared/contracts/words.ts';
import { replaceComponents } from './component-closure.ts';
import { derive, refreshUsersOf } from './derived.ts';
import { stateAfterSave } from './path.ts';
import { insertRecipe, insertRevision, updateRecipe } from './recipes.queries.ts';
import type { RecipeRow } from './recipes.rows.ts';

export interface NewRecipe {
  document: RecipeDocument;
  slug: string;
  personId: string;
  now: Date;
  note?: string;
  shootId?: string | null;
  /** What the demo knows beforehand. */
  id?: string;
  state?: RecipeState;
  figures?: Figures;
}

/**
 * Puts a recipe in with its first revision; the recipes it is made of must be there already. Nothing is checked: see
 * `checkReferences`.
 */
export async function insertRecipeWithRevision(db: Knex, recipe: NewRecipe): Promise<RecipeRow> {
  const { document, slug, personId, now, note = '', shootId = null, id, state = 'draft', figures } = recipe;
  const derived = await derive(db, document);
  const row = await insertRecipe(db, {
    ...(id === undefined ? {} : { id }),
    slug,
    title: document.title,
    kind: document.kind,
    state,
    revision: 1,
    figures: figures ?? derived.figures,
    missing: derived.missing,
    shoot_id: shootId,
    created_at: now,
    updated_at: now,
  });
  await insertRevision(db, { recipe_id: row.id, number: 1, document, note, saved_by: personId, saved_at: now });
  await replaceComponents(db, row.id, document);
  return row;
}

/** Makes a text the next revision of a recipe whose row this transaction holds. */
export async function insertNextRevision(
  trx: Knex,
  { id, revision, state }: RecipeRow,
  { document, note, personId, now }: { document: RecipeDocument; note: string; personId: string; now: Date },
): Promise<void> {
  const number = revision + 1;
  await insertRevision(trx, { recipe_id: id, number, document, note, saved_by: personId, saved_at: now });
  await replaceComponents(trx, id, document);
  await updateRecipe(trx, id, {
    ...(await derive(trx, document)),
    title: document.title,
    kind: document.kind,
    state: stateAfterSave(state),
    revision: number,
    updated_at: now,
  });
  await refreshUsersOf(trx, id);
}
