import { z } from 'zod';
import { accountView, checkoutStarted } from '../../shared/contracts/membership.ts';
import { id } from '../../shared/contracts/primitives.ts';
import { defineRoute, type Route } from '../http/registry.ts';
import {
  cancelMembership,
  convergeMember,
  resumeMembership,
  startCardChange,
  viewAccount,
} from './memberships.service.ts';

export const membershipRoutes: Route[] = [
  defineRoute({
    id: 'readAccount',
    method: 'get',
    path: '/api/account',
    access: 'account',
    summary: 'The own membership and receipts.',
    answer: accountView,
    handler: ({ ctx, viewer }) => viewAccount(ctx, viewer.person!.id),
  }),
  defineRoute({
    id: 'cancelMembership',
    method: 'post',
    path: '/api/account/membership/cancel',
    access: 'account',
    summary: 'Lets the own membership end with the paid period.',
    answer: accountView,
    handler: ({ ctx, viewer }) => cancelMembership(ctx, viewer.person!.id),
  }),
  defineRoute({
    id: 'resumeMembership',
    method: 'post',
    path: '/api/account/membership/resume',
    access: 'account',
    summary: 'Takes the own cancellation back while the membership still runs.',
    answer: accountView,
    handler: ({ ctx, viewer }) => resumeMembership(ctx, viewer.person!.id),
  }),
  defineRoute({
    id: 'changeCard',
    method: 'post',
    path: '/api/account/card',
    access: 'account',
    summary: 'Opens the payment service’s page for the own card.',
    answer: checkoutStarted,
    handler: ({ ctx, viewer }) => startCardChange(ctx, viewer.person!.id),
  }),
  defineRoute({
    id: 'convergeMember',
    method: 'post',
    path: '/api/office/members/:personId/converge',
    access: 'admin',
    summary: 'Fetches what the payment service knows of a member now.',
    params: z.object({ personId: id }),
    answer: accountView,
    handler: ({ ctx, params }) => convergeMember(ctx, params.personId),
  }),
];
