import type { Knex } from 'knex';
import type { z } from 'zod';
import { emptyRecipeDocument, type RecipeDocument } from '../../shared/contracts/recipe-document.ts';
import { upgradeRecipeDocument } from '../../shared/contracts/recipe-upgrades.ts';
import type {
  RecipeRow as RecipeListed,
  RecipeSave,
  RecipeStart,
  RecipeView,
  recipeQuery,
} from '../../shared/contracts/recipes.ts';
import type { AppContext } from '../context.ts';
import { versionConflict } from '../http/http.errors.ts';
import type { Viewer } from '../http/viewer.ts';
import { lockComponentGraph } from './component-closure.ts';
import { transitionsFor } from './path.ts';
import { recipeNotFound } from './recipes.errors.ts';
import {
  findRecipes,
  findWorkingCopy,
  lockRecipe,
  type RecipeListRow,
  type WorkingCopyRow,
} from './recipes.queries.ts';
import type { RecipeRow } from './recipes.rows.ts';
import { checkReferences } from './references.ts';
import { insertNextRevision, insertRecipeWithRevision } from './revise.ts';
import { findFreeSlug } from './slugs.ts';

const LONGEST_TITLE = 160;

export async function listRecipes(db: Knex, query: z.output<typeof recipeQuery>): Promise<RecipeListed[]> {
  return (await findRecipes(db, query)).map(toListed);
}

/** The working copy as this person may edit it. */
export async function readRecipe(db: Knex, id: string, viewer: Viewer): Promise<RecipeView> {
  const row = await findWorkingCopy(db, id);
  if (!row) throw recipeNotFound();
  return toView(row, viewer);
}

/** Begins a working copy: blank, from a shoot's notes, or as a copy of another recipe. */
export async function startRecipe({ db, now }: AppContext, start: RecipeStart, viewer: Viewer): Promise<RecipeView> {
  return db.transaction(async (trx) => {
    await lockComponentGraph(trx);
    const { document, shootId, note } = await beginningOf(trx, start);
    const id = crypto.randomUUID();
    await checkReferences(trx, id, document);
    const slug = await findFreeSlug(trx, document.title);
    const personId = viewer.person!.id;
    await insertRecipeWithRevision(trx, { id, slug, document, shootId, note, personId, now: now() });
    return readRecipe(trx, id, viewer);
  });
}

interface Beginning {
  document: RecipeDocument;
  shootId: string | null;
  note: string;
}

async function beginningOf(db: Knex, start: RecipeStart): Promise<Beginning> {
  switch (start.from) {
    case 'blank':
      return { document: emptyRecipeDocument(start.title, start.kind), shootId: null, note: '' };
    case 'shoot':
      return { document: start.document, shootId: start.shootId, note: '' };
    case 'copy': {
      const original = await findWorkingCopy(db, start.recipeId);
      if (!original) throw recipeNotFound();
      const document = upgradeRecipeDocument(original.document);
      return {
        document: { ...document, title: titleOfCopy(document.title) },
        shootId: original.shoot_id,
        note: `Copied from ${original.title}, revision ${original.revision}`,
      };
    }
  }
}

function titleOfCopy(title: string): string {
  const mark = ' (copy)';
  return title.slice(0, LONGEST_TITLE - mark.length).trimEnd() + mark;
}

/** Saves a working copy as its next revision; what was cleared or out is a draft again. */
export async function saveRecipe(
  ctx: AppContext,
  { id, save, expected, viewer }: { id: string; save: RecipeSave; expected: number; viewer: Viewer },
): Promise<RecipeView> {
  return revising(ctx, { id, expected, viewer }, async () => save);
}

/** Holds the recipe while its next revision is made; the text is checked whoever it comes from. */
export async function revising(
  { db, now }: AppContext,
  { id, expected, viewer }: { id: string; expected: number; viewer: Viewer },
  nextText: (trx: Knex) => Promise<RecipeSave>,
): Promise<RecipeView> {
  return db.transaction(async (trx) => {
    await lockComponentGraph(trx);
    const recipe = await holdRecipe(trx, id, expected);
    const { document, note } = await nextText(trx);
    await checkReferences(trx, id, document);
    await insertNextRevision(trx, recipe, { document, note, personId: viewer.person!.id, now: now() });
    return readRecipe(trx, id, viewer);
  });
}

/** Takes the recipe's row, and refuses with what stands there now when somebody else changed it first. */
export async function holdRecipe(trx: Knex, id: string, expected: number): Promise<RecipeRow> {
  const recipe = await lockRecipe(trx, id);
  if (!recipe) throw recipeNotFound();
  if (recipe.version === expected) return recipe;
  const current = await findWorkingCopy(trx, id);
  throw versionConflict({
    context: {
      version: recipe.version,
      revision: recipe.revision,
      state: recipe.state,
      savedBy: current!.saved_by_name,
      savedAt: recipe.updated_at.toISOString(),
    },
  });
}

function toListed(row: RecipeListRow): RecipeListed {
  const { id, slug, title, kind, state, revision, version, missing } = row;
  return {
    ...{ id, slug, title, kind, state, revision, version, missing },
    openQueries: row.open_queries,
    updatedAt: row.updated_at.toISOString(),
  };
}

function toView(row: WorkingCopyRow, viewer: Viewer): RecipeView {
  const { id, slug, state, version, revision, figures, missing } = row;
  return {
    ...{ id, slug, state, version, revision, figures, missing },
    document: upgradeRecipeDocument(row.document),
    shoot: row.shoot_id === null ? null : { id: row.shoot_id, title: row.shoot_title ?? '' },
    transitions: transitionsFor(state, viewer.person?.roles ?? []),
    updatedAt: row.updated_at.toISOString(),
    updatedBy: row.saved_by_name,
  };
}
