import { checkoutOutcome, checkoutReturn, checkoutStart, checkoutStarted } from '../../shared/contracts/membership.ts';
import { DONE, done } from '../../shared/contracts/primitives.ts';
import { defineRoute, type Route } from '../http/registry.ts';
import { finishCheckout, startCheckout } from './checkout.service.ts';
import { receiveEvent } from './events.service.ts';

export const paymentRoutes: Route[] = [
  defineRoute({
    id: 'startCheckout',
    method: 'post',
    path: '/api/checkout',
    access: 'account',
    summary: 'Opens the payment service’s page for a tier.',
    body: checkoutStart,
    answer: checkoutStarted,
    handler: ({ ctx, viewer, body }) => startCheckout(ctx, viewer.person!, body),
  }),
  defineRoute({
    id: 'finishCheckout',
    method: 'post',
    path: '/api/checkout/return',
    access: 'account',
    summary: 'Says what became of the page one comes back from, and where to go on.',
    body: checkoutReturn,
    answer: checkoutOutcome,
    handler: ({ ctx, viewer, body }) => finishCheckout(ctx, viewer.person!, body.session),
  }),
  defineRoute({
    id: 'receivePaymentEvent',
    method: 'post',
    path: '/api/stripe/webhook',
    access: 'signed',
    summary: 'Takes signed messages of the payment service.',
    rawBody: true,
    answer: done,
    handler: async ({ ctx, request }) => {
      await receiveEvent(ctx, request.body, request.get('stripe-signature'));
      return DONE;
    },
  }),
];
