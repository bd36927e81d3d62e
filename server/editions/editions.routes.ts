import { z } from 'zod';
import { editionIssue, editionList, editionRow, leafRelease } from '../../shared/contracts/editions.ts';
import { id } from '../../shared/contracts/primitives.ts';
import { defineRoute, type Route } from '../http/registry.ts';
import { issueEdition, listEditions, readEdition, releaseLeaf, startPressing } from './editions.service.ts';

const byId = z.object({ id });

export const editionRoutes: Route[] = [
  defineRoute({
    id: 'listEditions',
    method: 'get',
    path: '/api/bindery/books/:id/editions',
    access: 'staff',
    summary: 'Editions and leaves of a book, newest first.',
    params: byId,
    answer: editionList,
    handler: async ({ ctx, params }) => ({ editions: await listEditions(ctx.db, params.id) }),
  }),
  defineRoute({
    id: 'pressEdition',
    method: 'post',
    path: '/api/bindery/books/:id/editions',
    access: 'staff',
    summary: 'Begins to press an edition; the answer says how to follow it.',
    params: byId,
    answer: editionRow,
    status: 202,
    handler: ({ ctx, viewer, params }) => startPressing(ctx, params.id, viewer.person!.id),
  }),
  defineRoute({
    id: 'readEdition',
    method: 'get',
    path: '/api/bindery/editions/:id',
    access: 'staff',
    summary: 'An edition and how far its pressing is.',
    params: byId,
    answer: editionRow,
    handler: ({ ctx, params }) => readEdition(ctx.db, params.id),
  }),
  defineRoute({
    id: 'issueEdition',
    method: 'post',
    path: '/api/bindery/editions/:id/issue',
    access: 'issuer',
    summary: 'Issues a pressed edition to its readers.',
    params: byId,
    body: editionIssue,
    answer: editionRow,
    handler: ({ ctx, viewer, params, body }) =>
      issueEdition(ctx, { id: params.id, personId: viewer.person!.id, opens: body.opens }),
  }),
  defineRoute({
    id: 'releaseLeaf',
    method: 'post',
    path: '/api/recipes/:id/leaf',
    access: 'issuer',
    summary: 'Releases one cleared recipe of a book as a leaf.',
    params: byId,
    body: leafRelease,
    answer: editionRow,
    status: 201,
    handler: ({ ctx, viewer, params, body }) =>
      releaseLeaf(ctx, { recipeId: params.id, bookId: body.bookId, personId: viewer.person!.id }),
  }),
];
