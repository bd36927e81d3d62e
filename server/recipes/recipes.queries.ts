import type { Knex } from 'knex';
import type { z } from 'zod';
import { upgradeRecipeDocument } from '../../shared/contracts/recipe-upgrades.ts';
import type { RecipeDocument } from '../../shared/contracts/recipe-document.ts';
import type { recipeQuery } from '../../shared/contracts/recipes.ts';
import type { RecipeState } from '../../shared/contracts/words.ts';
import { isForeignKeyViolation, isUniqueViolation } from '../db/constraints.ts';
import { requestInvalid } from '../http/http.errors.ts';
import { recipeSlugTaken } from './recipes.errors.ts';
import type { RecipeRow, RevisionRow } from './recipes.rows.ts';

export interface RecipeListRow extends Omit<RecipeRow, 'figures'> {
  open_queries: number;
}

/** Recipes last saved first; `find` matches the beginnings of words of the title. */
export async function findRecipes(
  db: Knex,
  { kind, state, find }: z.output<typeof recipeQuery>,
): Promise<RecipeListRow[]> {
  return db('recipes')
    .modify((recipes) => {
      if (kind) void recipes.where('recipes.kind', kind);
      if (state) void recipes.where('recipes.state', state);
      if (find) void recipes.whereRaw(`recipes.search @@ to_tsquery('simple', ?)`, [toPrefixQuery(find)]);
    })
    .orderBy([{ column: 'recipes.updated_at', order: 'desc' }, 'recipes.id'])
    .select<RecipeListRow[]>(
      'recipes.id',
      'recipes.slug',
      'recipes.title',
      'recipes.kind',
      'recipes.state',
      'recipes.revision',
      'recipes.missing',
      'recipes.version',
      'recipes.updated_at',
      db.raw(
        `(select count(*)::int from recipe_queries
          where recipe_queries.recipe_id = recipes.id and recipe_queries.state = 'open') as open_queries`,
      ),
    );
}

function toPrefixQuery(find: string): string {
  return (find.match(/[\p{L}\p{N}]+/gu) ?? []).map((word) => `'${word}':*`).join(' & ');
}

/** A working copy with the text of its current revision and the names a page shows beside it. */
export interface WorkingCopyRow extends RecipeRow {
  document: unknown;
  saved_by_name: string;
  shoot_title: string | null;
}

export async function findWorkingCopy(db: Knex, id: string): Promise<WorkingCopyRow | undefined> {
  return db('recipes')
    .join('revisions', (on) => on.on('revisions.recipe_id', 'recipes.id').andOn('revisions.number', 'recipes.revision'))
    .join('people', 'people.id', 'revisions.saved_by')
    .leftJoin('shoots', 'shoots.id', 'recipes.shoot_id')
    .where('recipes.id', id)
    .first<WorkingCopyRow | undefined>(
      'recipes.*',
      'revisions.document',
      'people.name as saved_by_name',
      'shoots.title as shoot_title',
    );
}

/** Takes the recipe's row for this transaction; references to it from other recipes are still let through. */
export async function lockRecipe(db: Knex, id: string): Promise<RecipeRow | undefined> {
  return db('recipes').where({ id }).forNoKeyUpdate().first();
}

export async function insertRecipe(
  db: Knex,
  values: Omit<RecipeRow, 'id' | 'version' | 'created_at' | 'withdrawn_at'> & Partial<RecipeRow>,
): Promise<RecipeRow> {
  try {
    const [row] = await db('recipes').insert(values).returning('*');
    return row!;
  } catch (error) {
    if (isUniqueViolation(error, 'recipes_slug_key'))
      throw recipeSlugTaken({ detail: values.slug, context: { slug: values.slug } }, error);
    if (isForeignKeyViolation(error, 'recipes_shoot_fkey'))
      throw requestInvalid({ faults: [{ path: 'shootId', message: 'There is no such shoot.' }] }, error);
    throw error;
  }
}

/** Changes a working copy, which gives it its next version. */
export async function updateRecipe(db: Knex, id: string, values: Partial<RecipeRow>): Promise<void> {
  await db('recipes')
    .where({ id })
    .update({ ...values, version: db.raw('version + 1') as unknown as number });
}

/** Keeps what is worked out from a text, without touching the version that people edit against. */
export async function updateDerived(
  db: Knex,
  id: string,
  values: Partial<Pick<RecipeRow, 'figures' | 'missing'>>,
): Promise<void> {
  await db('recipes').where({ id }).update(values);
}

/** Puts recipes into a state, whatever the path says: for what releases and issues them. */
export async function setRecipeStates(db: Knex, ids: readonly string[], state: RecipeState): Promise<void> {
  await db('recipes')
    .whereIn('id', [...ids])
    .update({ state, version: db.raw('version + 1') as unknown as number });
}

/** Slugs that a new recipe with this slug would have to avoid: itself and its numbered ones. */
export async function findSlugsLike(db: Knex, slug: string): Promise<string[]> {
  return db('recipes')
    .where({ slug })
    .orWhereRaw('slug ~ ?', [`^${slug}-[0-9]+$`])
    .pluck('slug');
}

export async function insertRevision(db: Knex, values: RevisionRow): Promise<void> {
  await db('revisions').insert(values);
}

export interface SavedRevisionRow extends RevisionRow {
  saved_by_name: string;
}

/** What was saved, last first, without the texts. */
export async function findRevisions(db: Knex, recipeId: string): Promise<Omit<SavedRevisionRow, 'document'>[]> {
  return db('revisions')
    .join('people', 'people.id', 'revisions.saved_by')
    .where('revisions.recipe_id', recipeId)
    .orderBy('revisions.number', 'desc')
    .select<Omit<SavedRevisionRow, 'document'>[]>(
      'revisions.recipe_id',
      'revisions.number',
      'revisions.note',
      'revisions.saved_by',
      'revisions.saved_at',
      'people.name as saved_by_name',
    );
}

export async function findRevision(db: Knex, recipeId: string, number: number): Promise<SavedRevisionRow | undefined> {
  return db('revisions')
    .join('people', 'people.id', 'revisions.saved_by')
    .where('revisions.recipe_id', recipeId)
    .where('revisions.number', number)
    .first<SavedRevisionRow | undefined>('revisions.*', 'people.name as saved_by_name');
}

export interface CurrentDocument {
  recipe: RecipeRow;
  document: RecipeDocument;
}

/** The working copies of these recipes as they stand, by id; unknown ids are left out. */
export async function findCurrentDocuments(db: Knex, ids: readonly string[]): Promise<Map<string, CurrentDocument>> {
  if (ids.length === 0) return new Map();
  const rows = await db('recipes')
    .join('revisions', (on) => on.on('revisions.recipe_id', 'recipes.id').andOn('revisions.number', 'recipes.revision'))
    .whereIn('recipes.id', [...ids])
    .select<(RecipeRow & { document: unknown })[]>('recipes.*', 'revisions.document');
  return new Map(
    rows.map(({ document, ...recipe }) => [recipe.id, { recipe, document: upgradeRecipeDocument(document) }]),
  );
}
