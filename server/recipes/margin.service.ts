import type { Knex } from 'knex';
import type { RecipeQueryRow as RecipeQueryView } from '../../shared/contracts/recipes.ts';
import type { AppContext } from '../context.ts';
import { roleMissing } from '../http/http.errors.ts';
import { hasRole, type Viewer } from '../http/viewer.ts';
import { findQueries, findQuery, insertQuery, lockQuery, updateQuery, type NamedQueryRow } from './margin.queries.ts';
import { queryNotFound, queryStateRefused, recipeNotFound } from './recipes.errors.ts';
import { findWorkingCopy, lockRecipe } from './recipes.queries.ts';
import type { RecipeQueryRow } from './recipes.rows.ts';

export async function listQueries(db: Knex, recipeId: string): Promise<RecipeQueryView[]> {
  if (!(await findWorkingCopy(db, recipeId))) throw recipeNotFound();
  return (await findQueries(db, recipeId)).map(toView);
}

/** Writes a question into the margin of a recipe. */
export async function raiseQuery(
  { db, now }: AppContext,
  { recipeId, question, personId }: { recipeId: string; question: string; personId: string },
): Promise<RecipeQueryView> {
  return db.transaction(async (trx) => {
    // Holding the recipe's row lets nobody clear it while the question is being written down.
    if (!(await lockRecipe(trx, recipeId))) throw recipeNotFound();
    return readQuery(
      trx,
      await insertQuery(trx, { recipe_id: recipeId, question, asked_by: personId, asked_at: now() }),
    );
  });
}

/** Answers a query, or answers it better; a closed one stays as it is. */
export async function answerQuery(
  { db, now }: AppContext,
  { id, answer, personId }: { id: string; answer: string; personId: string },
): Promise<RecipeQueryView> {
  return changing(db, id, { state: 'answered', answer, answered_by: personId, answered_at: now() });
}

/** Closes a query, answered or not; that is the editor's or the admin's to do. */
export async function closeQuery({ db }: AppContext, id: string, viewer: Viewer): Promise<RecipeQueryView> {
  if (!hasRole(viewer, 'editor', 'admin')) throw roleMissing();
  return changing(db, id, { state: 'closed' });
}

async function changing(db: Knex, id: string, values: Partial<RecipeQueryRow>): Promise<RecipeQueryView> {
  return db.transaction(async (trx) => {
    const query = await lockQuery(trx, id);
    if (!query) throw queryNotFound();
    if (query.state === 'closed') throw queryStateRefused();
    await updateQuery(trx, id, values);
    return readQuery(trx, id);
  });
}

async function readQuery(db: Knex, id: string): Promise<RecipeQueryView> {
  const row = await findQuery(db, id);
  if (!row) throw queryNotFound();
  return toView(row);
}

function toView(row: NamedQueryRow): RecipeQueryView {
  const { id, state, question, answer } = row;
  return {
    ...{ id, state, question, answer },
    askedBy: row.asked_by_name,
    askedAt: row.asked_at.toISOString(),
    answeredBy: row.answered_by_name,
    answeredAt: row.answered_at?.toISOString() ?? null,
  };
}
