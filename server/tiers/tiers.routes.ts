import { z } from 'zod';
import { id } from '../../shared/contracts/primitives.ts';
import { tierDraft, tierLadder, tierList, tierView } from '../../shared/contracts/tiers.ts';
import { defineRoute, type Route } from '../http/registry.ts';
import { closeTier, listTiers, makeTier, saveTier, viewLadder } from './tiers.service.ts';

const byId = z.object({ id });

export const tierRoutes: Route[] = [
  defineRoute({
    id: 'listTiers',
    method: 'get',
    path: '/api/tiers',
    access: 'anyone',
    summary: 'The ladder of tiers that can be joined, lowest first.',
    answer: tierLadder,
    handler: ({ ctx }) => viewLadder(ctx),
  }),
  defineRoute({
    id: 'listOfficeTiers',
    method: 'get',
    path: '/api/office/tiers',
    access: 'admin',
    summary: 'Every tier, with its members and whether the payment service knows it.',
    answer: tierList,
    handler: async ({ ctx }) => ({ tiers: await listTiers(ctx.db) }),
  }),
  defineRoute({
    id: 'makeTier',
    method: 'post',
    path: '/api/office/tiers',
    access: 'admin',
    summary: 'Opens a tier for sale.',
    body: tierDraft,
    answer: tierView,
    status: 201,
    versioned: 'answer',
    handler: ({ ctx, body }) => makeTier(ctx, body),
  }),
  defineRoute({
    id: 'saveTier',
    method: 'put',
    path: '/api/office/tiers/:id',
    access: 'admin',
    summary: 'Changes a tier; members keep the price they joined at.',
    params: byId,
    body: tierDraft,
    answer: tierView,
    versioned: 'required',
    handler: ({ ctx, params, body, expected }) => saveTier(ctx, { id: params.id, draft: body, expected }),
  }),
  defineRoute({
    id: 'closeTier',
    method: 'post',
    path: '/api/office/tiers/:id/close',
    access: 'admin',
    summary: 'Closes a tier to new members; those who hold it keep it.',
    params: byId,
    answer: tierView,
    versioned: 'answer',
    handler: ({ ctx, params }) => closeTier(ctx, params.id),
  }),
];
