import {
  accountView,
  checkoutOutcome,
  checkoutStarted,
  type AccountView,
  type PaymentInterval,
} from '@shared/contracts/membership.ts';
import type { z } from 'zod';
import { request } from './request.ts';

export type CheckoutOutcome = z.infer<typeof checkoutOutcome>;

/** Opens the payment service's page for a tier and says where it is; `returnTo` is a path of this site. */
export async function startCheckout(wish: {
  tierId: string;
  interval: PaymentInterval;
  returnTo: string;
}): Promise<string> {
  return (await request('POST', '/api/checkout', checkoutStarted, { body: wish })).data.href;
}

/** What became of the page that one comes back from. */
export async function finishCheckout(session: string): Promise<CheckoutOutcome> {
  return (await request('POST', '/api/checkout/return', checkoutOutcome, { body: { session } })).data;
}

export async function fetchAccount(): Promise<AccountView> {
  return (await request('GET', '/api/account', accountView)).data;
}

/** Lets the membership end with the paid period. */
export async function cancelMembership(): Promise<AccountView> {
  return (await request('POST', '/api/account/membership/cancel', accountView)).data;
}

export async function resumeMembership(): Promise<AccountView> {
  return (await request('POST', '/api/account/membership/resume', accountView)).data;
}

/** Opens the payment service's page for the own card and says where it is. */
export async function startCardChange(): Promise<string> {
  return (await request('POST', '/api/account/card', checkoutStarted)).data.href;
}
