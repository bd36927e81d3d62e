import { z } from 'zod';
import { currency } from './imprint.ts';
import { id, instant } from './primitives.ts';

/** States of a subscription as the payment service publishes them. */
export const SUBSCRIPTION_STATES = [
  'incomplete',
  'incomplete_expired',
  'trialing',
  'active',
  'past_due',
  'canceled',
  'unpaid',
  'paused',
] as const;
export const subscriptionState = z.enum(SUBSCRIPTION_STATES);
export type SubscriptionState = z.infer<typeof subscriptionState>;

export const paymentInterval = z.enum(['month', 'year']);
export type PaymentInterval = z.infer<typeof paymentInterval>;

/** A member's relation to the house, as the account page shows it. */
export const membershipView = z.object({
  tier: z.object({ id, rank: z.int(), name: z.string() }),
  state: subscriptionState,
  interval: paymentInterval,
  /** Minor units a period. */
  price: z.int(),
  currency,
  /** End of the paid period: the next renewal, or the end when `endsThen`. */
  periodEnd: instant,
  endsThen: z.boolean(),
  /** Whether it opens its tier at this moment. */
  opens: z.boolean(),
});
export type MembershipView = z.infer<typeof membershipView>;

export const receipt = z.object({
  id: z.string(),
  number: z.string(),
  paidAt: instant,
  amount: z.int(),
  currency,
  tierName: z.string(),
  href: z.string().nullable(),
});
export type Receipt = z.infer<typeof receipt>;

export const accountView = z.object({ membership: membershipView.nullable(), receipts: z.array(receipt) });
export type AccountView = z.infer<typeof accountView>;

/** Where to go back to: a path of this site. */
export const returnPath = z
  .string()
  .max(300)
  .regex(/^\/(?![/\\])[^\s\\]*$/, 'Only a path of this site.');

export const checkoutStart = z.strictObject({ tierId: id, interval: paymentInterval, returnTo: returnPath });
export const checkoutStarted = z.object({ href: z.string() });
/** `paid` once the membership opens; `waiting` while the payment service has not finished. */
export const checkoutReturn = z.strictObject({ session: z.string().min(1).max(200) });
export const checkoutOutcome = z.object({ outcome: z.enum(['paid', 'waiting', 'open']), returnTo: returnPath });
