import { z } from 'zod';
import { id } from '../../shared/contracts/primitives.ts';
import { queryAnswer, queryRaise, recipeQueryList, recipeQueryRow } from '../../shared/contracts/recipes.ts';
import { defineRoute, type Route } from '../http/registry.ts';
import { answerQuery, closeQuery, listQueries, raiseQuery } from './margin.service.ts';

const byId = z.object({ id });

/** Queries in the margin of a recipe. */
export const marginRoutes: Route[] = [
  defineRoute({
    id: 'listRecipeQueries',
    method: 'get',
    path: '/api/recipes/:id/queries',
    access: 'staff',
    summary: 'The queries in the margin of a recipe, first asked first.',
    params: byId,
    answer: recipeQueryList,
    handler: async ({ ctx, params }) => ({ queries: await listQueries(ctx.db, params.id) }),
  }),
  defineRoute({
    id: 'raiseQuery',
    method: 'post',
    path: '/api/recipes/:id/queries',
    access: 'staff',
    summary: 'Asks a question in the margin; while it is open the recipe cannot be cleared.',
    params: byId,
    body: queryRaise,
    answer: recipeQueryRow,
    status: 201,
    handler: ({ ctx, viewer, params, body }) =>
      raiseQuery(ctx, { recipeId: params.id, question: body.question, personId: viewer.person!.id }),
  }),
  defineRoute({
    id: 'answerQuery',
    method: 'post',
    path: '/api/queries/:id/answer',
    access: 'staff',
    summary: 'Answers a query.',
    params: byId,
    body: queryAnswer,
    answer: recipeQueryRow,
    handler: ({ ctx, viewer, params, body }) =>
      answerQuery(ctx, { id: params.id, answer: body.answer, personId: viewer.person!.id }),
  }),
  defineRoute({
    id: 'closeQuery',
    method: 'post',
    path: '/api/queries/:id/close',
    access: 'staff',
    summary: 'Closes a query, answered or not; editor or admin.',
    params: byId,
    answer: recipeQueryRow,
    handler: ({ ctx, viewer, params }) => closeQuery(ctx, params.id, viewer),
  }),
];
