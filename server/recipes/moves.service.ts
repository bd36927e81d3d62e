import type { Knex } from 'knex';
import { upgradeRecipeDocument } from '../../shared/contracts/recipe-upgrades.ts';
import type { MissingCode, RecipeView } from '../../shared/contracts/recipes.ts';
import type { RecipeState } from '../../shared/contracts/words.ts';
import type { AppContext } from '../context.ts';
import { roleMissing } from '../http/http.errors.ts';
import { hasRole, type Viewer } from '../http/viewer.ts';
import { readMissing } from './derived.ts';
import { findOpenQuestions } from './margin.queries.ts';
import { rolesFor } from './path.ts';
import { queriesOpen, recipeIncomplete, transitionRefused } from './recipes.errors.ts';
import { findWorkingCopy, updateRecipe } from './recipes.queries.ts';
import type { RecipeRow } from './recipes.rows.ts';
import { holdRecipe, readRecipe } from './recipes.service.ts';

/** Sends a recipe along its path; clearing asks that no query is open and nothing required is missing. */
export async function moveRecipe(
  { db, now }: AppContext,
  { id, to, expected, viewer }: { id: string; to: RecipeState; expected: number; viewer: Viewer },
): Promise<RecipeView> {
  return db.transaction(async (trx) => {
    const recipe = await holdRecipe(trx, id, expected);
    const roles = rolesFor(recipe.state, to);
    if (roles.length === 0) throw transitionRefused({ context: { from: recipe.state, to } });
    if (!hasRole(viewer, ...roles)) throw roleMissing();
    if (to === 'cleared') await refuseUnready(trx, recipe);
    await updateRecipe(trx, id, { state: to, ...(to === 'withdrawn' ? { withdrawn_at: now() } : {}) });
    return readRecipe(trx, id, viewer);
  });
}

async function refuseUnready(trx: Knex, { id }: RecipeRow): Promise<void> {
  const questions = await findOpenQuestions(trx, id);
  if (questions.length > 0) throw queriesOpen({ context: { questions } });

  const { document } = (await findWorkingCopy(trx, id))!;
  const missing = await readMissing(trx, upgradeRecipeDocument(document));
  if (missing.length === 0) return;
  const faults = missing.map((code) => ({ path: FIELDS[code], message: REASONS[code] }));
  throw recipeIncomplete({ faults, context: { missing } });
}

const FIELDS: Readonly<Record<MissingCode, string>> = {
  title: 'document.title',
  headnote: 'document.headnote',
  lines: 'document.sections',
  amounts: 'document.sections',
  steps: 'document.steps',
  yield: 'document.yield',
  keeping: 'document.keeping',
  'lead-plate': 'document.leadPlateId',
  'lead-plate-alt': 'document.leadPlateId',
};

const REASONS: Readonly<Record<MissingCode, string>> = {
  title: 'Give the recipe a title.',
  headnote: 'Write a headnote.',
  lines: 'Say what goes in.',
  amounts: 'A line has no amount and is not to taste.',
  steps: 'Write at least one step.',
  yield: 'Say how much it makes.',
  keeping: 'Say how it keeps.',
  'lead-plate': 'Choose a lead plate.',
  'lead-plate-alt': 'Describe the lead plate in its alt text.',
};
