import type { Knex } from 'knex';
import type { RecipeDocument } from '../../shared/contracts/recipe-document.ts';
import { upgradeRecipeDocument } from '../../shared/contracts/recipe-upgrades.ts';
import { componentIdsOf } from '../../shared/engine/components.ts';

/** Any number will do, as long as it is always the same one. */
const COMPONENT_GRAPH = 748_113_001;

/**
 * Makes transactions that change which recipe uses which, or several recipes at once, take their turns. Without it two saves,
 * each sound by itself, could close a ring together. Taken before any recipe's row, so that two of them never wait for each other.
 */
export async function lockComponentGraph(trx: Knex): Promise<void> {
  await trx.raw('select pg_advisory_xact_lock(?)', [COMPONENT_GRAPH]);
}

/** The current documents of everything these documents are made of, down to any depth, by recipe id. */
export async function loadComponentClosure(
  db: Knex,
  documents: readonly Pick<RecipeDocument, 'sections'>[],
): Promise<Map<string, RecipeDocument>> {
  const used = [...new Set(documents.flatMap(componentIdsOf))];
  if (used.length === 0) return new Map();
  const { rows } = await db.raw<{ rows: { id: string; document: unknown }[] }>(
    `with recursive closure (id) as (
      select unnest(?::uuid[])
      union
      select recipe_components.component_id
      from closure
      join recipe_components on recipe_components.recipe_id = closure.id
    )
    select recipes.id, revisions.document
    from closure
    join recipes on recipes.id = closure.id
    join revisions on revisions.recipe_id = recipes.id and revisions.number = recipes.revision`,
    [used],
  );
  return new Map(rows.map(({ id, document }) => [id, upgradeRecipeDocument(document)]));
}

/** The ids of every recipe that is made with this one, directly or through others. */
export async function findUsersOf(db: Knex, id: string): Promise<string[]> {
  const { rows } = await db.raw<{ rows: { id: string }[] }>(
    `with recursive users (id) as (
      select recipe_components.recipe_id from recipe_components where recipe_components.component_id = ?
      union
      select recipe_components.recipe_id
      from users
      join recipe_components on recipe_components.component_id = users.id
    )
    select users.id from users`,
    [id],
  );
  return rows.map((row) => row.id);
}

/** Writes down which recipes a recipe's current revision uses. */
export async function replaceComponents(db: Knex, recipeId: string, document: RecipeDocument): Promise<void> {
  const used = componentIdsOf(document);
  await db('recipe_components').where({ recipe_id: recipeId }).whereNotIn('component_id', used).delete();
  if (used.length === 0) return;
  await db('recipe_components')
    .insert(used.map((id) => ({ recipe_id: recipeId, component_id: id })))
    .onConflict(['recipe_id', 'component_id'])
    .ignore();
}
