import { larderList } from '../../shared/contracts/larder.ts';
import { defineRoute, type Route } from '../http/registry.ts';
import { findLarder } from './larder.queries.ts';

export const larderRoutes: Route[] = [
  defineRoute({
    id: 'listLarder',
    method: 'get',
    path: '/api/larder',
    access: 'staff',
    summary: 'The ingredient catalogue with its sources.',
    answer: larderList,
    handler: async ({ ctx }) => ({ items: await findLarder(ctx.db) }),
  }),
];
