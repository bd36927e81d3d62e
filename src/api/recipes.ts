import {
  recipeList,
  recipeQueryList,
  recipeQueryRow,
  recipeView,
  revisionList,
  revisionView,
  type RecipeQueryRow,
  type RecipeRow,
  type RecipeStart,
  type RecipeView,
  type RevisionRow,
} from '@shared/contracts/recipes.ts';
import type { RecipeDocument } from '@shared/contracts/recipe-document.ts';
import type { RecipeKind, RecipeState } from '@shared/contracts/words.ts';
import { entityTag } from './entity-tag.ts';
import { request } from './request.ts';

export interface RecipeFilter {
  kind?: RecipeKind | undefined;
  state?: RecipeState | undefined;
  /** Words of the title. */
  find?: string | undefined;
}

/** A working copy by its id, and the version that a change must name. */
interface AtVersion {
  id: string;
  version: number;
}

/** The working copies, last saved first. */
export async function fetchRecipes(filter: RecipeFilter = {}): Promise<RecipeRow[]> {
  return (await request('GET', '/api/recipes', recipeList, { query: { ...filter } })).data.recipes;
}

/** Begins a recipe: blank, from a shoot's notes, or as a copy. */
export async function startRecipe(start: RecipeStart): Promise<RecipeView> {
  return (await request('POST', '/api/recipes', recipeView, { body: start })).data;
}

export async function fetchRecipe(id: string): Promise<RecipeView> {
  return (await request('GET', `/api/recipes/${id}`, recipeView)).data;
}

/** Saves the whole document as the next revision; refused with `request.version_conflict` when others saved first. */
export async function saveRecipe({ id, version }: AtVersion, document: RecipeDocument): Promise<RecipeView> {
  const options = { body: { document }, ifMatch: entityTag(version) };
  return (await request('PUT', `/api/recipes/${id}`, recipeView, options)).data;
}

export async function moveRecipe({ id, version }: AtVersion, to: RecipeState): Promise<RecipeView> {
  const options = { body: { to }, ifMatch: entityTag(version) };
  return (await request('POST', `/api/recipes/${id}/state`, recipeView, options)).data;
}

export async function fetchRevisions(id: string): Promise<RevisionRow[]> {
  return (await request('GET', `/api/recipes/${id}/revisions`, revisionList)).data.revisions;
}

export async function fetchRevision(id: string, number: number): Promise<RevisionRow & { document: RecipeDocument }> {
  return (await request('GET', `/api/recipes/${id}/revisions/${number}`, revisionView)).data;
}

/** Makes an earlier text the next revision. */
export async function restoreRevision({ id, version }: AtVersion, number: number): Promise<RecipeView> {
  const options = { ifMatch: entityTag(version) };
  return (await request('POST', `/api/recipes/${id}/revisions/${number}/restore`, recipeView, options)).data;
}

export async function fetchQueries(recipeId: string): Promise<RecipeQueryRow[]> {
  return (await request('GET', `/api/recipes/${recipeId}/queries`, recipeQueryList)).data.queries;
}

export async function raiseQuery(recipeId: string, question: string): Promise<RecipeQueryRow> {
  return (await request('POST', `/api/recipes/${recipeId}/queries`, recipeQueryRow, { body: { question } })).data;
}

export async function answerQuery(id: string, answer: string): Promise<RecipeQueryRow> {
  return (await request('POST', `/api/queries/${id}/answer`, recipeQueryRow, { body: { answer } })).data;
}

export async function closeQuery(id: string): Promise<RecipeQueryRow> {
  return (await request('POST', `/api/queries/${id}/close`, recipeQueryRow)).data;
}
