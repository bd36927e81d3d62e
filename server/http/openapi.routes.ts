import { z } from 'zod';
import { describeApi } from './openapi.ts';
import { defineRoute, type Route } from './registry.ts';

export const descriptionRoutes: Route[] = [
  defineRoute({
    id: 'describeApi',
    method: 'get',
    path: '/api/openapi.json',
    access: 'anyone',
    summary: 'This description (OpenAPI 3.1).',
    answer: z.record(z.string(), z.unknown()),
    handler: async ({ request }) => describeApi(request.app.locals.routes),
  }),
];
