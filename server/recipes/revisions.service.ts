import type { Knex } from 'knex';
import type { z } from 'zod';
import { upgradeRecipeDocument } from '../../shared/contracts/recipe-upgrades.ts';
import type { RecipeView, RevisionRow as RevisionListed, revisionView } from '../../shared/contracts/recipes.ts';
import type { AppContext } from '../context.ts';
import type { Viewer } from '../http/viewer.ts';
import { recipeNotFound, revisionNotFound } from './recipes.errors.ts';
import { findRevision, findRevisions, type SavedRevisionRow } from './recipes.queries.ts';
import { revising } from './recipes.service.ts';

/** Everything that was ever saved of a recipe, last first. */
export async function listRevisions(db: Knex, recipeId: string): Promise<RevisionListed[]> {
  const rows = await findRevisions(db, recipeId);
  if (rows.length === 0) throw recipeNotFound();
  return rows.map(toListed);
}

export async function readRevision(db: Knex, recipeId: string, number: number): Promise<z.output<typeof revisionView>> {
  const row = await findRevision(db, recipeId, number);
  if (!row) throw revisionNotFound();
  return { ...toListed(row), document: upgradeRecipeDocument(row.document) };
}

/** Makes an earlier text the next revision; what came between stays in the history. */
export async function restoreRevision(
  ctx: AppContext,
  { id, number, expected, viewer }: { id: string; number: number; expected: number; viewer: Viewer },
): Promise<RecipeView> {
  return revising(ctx, { id, expected, viewer }, async (trx) => {
    const { document } = await readRevision(trx, id, number);
    return { document, note: `Restored from revision ${number}` };
  });
}

function toListed(row: Omit<SavedRevisionRow, 'document'>): RevisionListed {
  return { number: row.number, note: row.note, savedBy: row.saved_by_name, savedAt: row.saved_at.toISOString() };
}
