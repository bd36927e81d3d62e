import type { Knex } from 'knex';
import type { RecipeQueryRow } from './recipes.rows.ts';

/** A query with the names of who asked and who answered. */
export interface NamedQueryRow extends RecipeQueryRow {
  asked_by_name: string;
  answered_by_name: string | null;
}

function namedQueries(db: Knex) {
  return db('recipe_queries')
    .join('people as asker', 'asker.id', 'recipe_queries.asked_by')
    .leftJoin('people as answerer', 'answerer.id', 'recipe_queries.answered_by')
    .select<NamedQueryRow[]>('recipe_queries.*', 'asker.name as asked_by_name', 'answerer.name as answered_by_name');
}

/** The queries in the margin of a recipe, first asked first. */
export async function findQueries(db: Knex, recipeId: string): Promise<NamedQueryRow[]> {
  return namedQueries(db)
    .where('recipe_queries.recipe_id', recipeId)
    .orderBy(['recipe_queries.asked_at', 'recipe_queries.id']);
}

export async function findQuery(db: Knex, id: string): Promise<NamedQueryRow | undefined> {
  const [row] = await namedQueries(db).where('recipe_queries.id', id);
  return row;
}

export async function findOpenQuestions(db: Knex, recipeId: string): Promise<string[]> {
  return db('recipe_queries').where({ recipe_id: recipeId, state: 'open' }).orderBy('asked_at').pluck('question');
}

export async function lockQuery(db: Knex, id: string): Promise<RecipeQueryRow | undefined> {
  return db('recipe_queries').where({ id }).forUpdate().first();
}

export async function insertQuery(
  db: Knex,
  values: Pick<RecipeQueryRow, 'recipe_id' | 'question' | 'asked_by' | 'asked_at'>,
): Promise<string> {
  const [row] = await db('recipe_queries').insert(values).returning('id');
  return row!.id;
}

export async function updateQuery(db: Knex, id: string, values: Partial<RecipeQueryRow>): Promise<void> {
  await db('recipe_queries').where({ id }).update(values);
}
