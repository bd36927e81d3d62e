import { z } from 'zod';
import { id } from '../../shared/contracts/primitives.ts';
import {
  recipeList,
  recipeMove,
  recipeQuery,
  recipeSave,
  recipeStart,
  recipeView,
  revisionList,
  revisionView,
} from '../../shared/contracts/recipes.ts';
import { defineRoute, type Route } from '../http/registry.ts';
import { marginRoutes } from './margin.routes.ts';
import { moveRecipe } from './moves.service.ts';
import { listRecipes, readRecipe, saveRecipe, startRecipe } from './recipes.service.ts';
import { listRevisions, readRevision, restoreRevision } from './revisions.service.ts';

const byId = z.object({ id });
const byRevision = z.object({ id, number: z.coerce.number().int().min(1).max(2_147_483_647) });
/** A recipe of two thousand lines. */
const DOCUMENT_LIMIT = 4 * 1024 * 1024;

export const recipeRoutes: Route[] = [
  defineRoute({
    id: 'listRecipes',
    method: 'get',
    path: '/api/recipes',
    access: 'staff',
    summary: 'The working copies, last saved first, by kind, state and words of the title.',
    query: recipeQuery,
    answer: recipeList,
    handler: async ({ ctx, query }) => {
      const recipes = await listRecipes(ctx.db, query);
      return { recipes, total: recipes.length };
    },
  }),
  defineRoute({
    id: 'startRecipe',
    method: 'post',
    path: '/api/recipes',
    access: 'staff',
    summary: "Begins a recipe: blank, from a shoot's notes, or as a copy of another.",
    body: recipeStart,
    bodyLimit: DOCUMENT_LIMIT,
    answer: recipeView,
    status: 201,
    versioned: 'answer',
    handler: ({ ctx, viewer, body }) => startRecipe(ctx, body, viewer),
  }),
  defineRoute({
    id: 'readRecipe',
    method: 'get',
    path: '/api/recipes/:id',
    access: 'staff',
    summary: 'A working copy with its figures, what it lacks and where it may go next.',
    params: byId,
    answer: recipeView,
    versioned: 'answer',
    handler: ({ ctx, viewer, params }) => readRecipe(ctx.db, params.id, viewer),
  }),
  defineRoute({
    id: 'saveRecipe',
    method: 'put',
    path: '/api/recipes/:id',
    access: 'staff',
    summary: 'Saves the whole document as the next revision; a cleared or released recipe is a draft again.',
    params: byId,
    body: recipeSave,
    bodyLimit: DOCUMENT_LIMIT,
    answer: recipeView,
    versioned: 'required',
    handler: ({ ctx, viewer, params, body, expected }) =>
      saveRecipe(ctx, { id: params.id, save: body, expected, viewer }),
  }),
  defineRoute({
    id: 'listRevisions',
    method: 'get',
    path: '/api/recipes/:id/revisions',
    access: 'staff',
    summary: 'Everything that was saved of a recipe, last first.',
    params: byId,
    answer: revisionList,
    handler: async ({ ctx, params }) => ({ revisions: await listRevisions(ctx.db, params.id) }),
  }),
  defineRoute({
    id: 'readRevision',
    method: 'get',
    path: '/api/recipes/:id/revisions/:number',
    access: 'staff',
    summary: 'One revision with its text.',
    params: byRevision,
    answer: revisionView,
    handler: ({ ctx, params }) => readRevision(ctx.db, params.id, params.number),
  }),
  defineRoute({
    id: 'restoreRevision',
    method: 'post',
    path: '/api/recipes/:id/revisions/:number/restore',
    access: 'staff',
    summary: 'Makes an earlier text the next revision.',
    params: byRevision,
    answer: recipeView,
    versioned: 'required',
    handler: ({ ctx, viewer, params, expected }) => restoreRevision(ctx, { ...params, expected, viewer }),
  }),
  defineRoute({
    id: 'moveRecipe',
    method: 'post',
    path: '/api/recipes/:id/state',
    access: 'staff',
    summary: 'Sends a recipe along its path: on trial, with editor, cleared, withdrawn, back to draft.',
    params: byId,
    body: recipeMove,
    answer: recipeView,
    versioned: 'required',
    handler: ({ ctx, viewer, params, body, expected }) =>
      moveRecipe(ctx, { id: params.id, to: body.to, expected, viewer }),
  }),
  ...marginRoutes,
];
