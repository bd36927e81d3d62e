import type { Stripe } from 'stripe';
import type { Currency } from '../../shared/contracts/imprint.ts';
import { currency } from '../../shared/contracts/imprint.ts';
import { paymentInterval, subscriptionState, type SubscriptionState } from '../../shared/contracts/membership.ts';
import type { MembershipRow, ReceiptRow } from '../memberships/memberships.rows.ts';
import type { TierRow } from '../tiers/tiers.queries.ts';
import { idOf, toInstant } from './call-stripe.ts';

/** What the payment service says of one customer. */
export interface Truth {
  subscriptions: Stripe.Subscription[];
  invoices: Stripe.Invoice[];
}

/** A subscription to one of our tiers in our own words, with what the letters need. */
export interface ReadSubscription extends Omit<MembershipRow, 'person_id' | 'converged_at'> {
  tier: TierRow;
  /** When the ending was asked for; null while it renews. */
  endAskedAt: Date | null;
  /** The invoice whose payment failed and is still open. */
  failedInvoice: string | null;
}

/** How much a state counts when a customer has several subscriptions: what opens comes first. */
const STANDING: Record<SubscriptionState, number> = {
  active: 0,
  trialing: 0,
  past_due: 1,
  paused: 2,
  unpaid: 2,
  canceled: 3,
  incomplete: 4,
  incomplete_expired: 5,
};

/**
 * The subscription that counts as the membership: the best state, then the highest tier, then the latest period. One
 * whose first payment never came is none. Subscriptions to anything but a tier are left out.
 */
export function pickSubscription(truth: Truth, tiers: readonly TierRow[]): ReadSubscription | null {
  const ours = truth.subscriptions
    .flatMap((subscription) => readSubscription(subscription, truth.invoices, tiers) ?? [])
    .filter(({ state }) => state !== 'incomplete_expired');
  return ours.sort(byStanding)[0] ?? null;
}

function byStanding(a: ReadSubscription, b: ReadSubscription): number {
  if (a.state !== b.state && STANDING[a.state] !== STANDING[b.state]) return STANDING[a.state] - STANDING[b.state];
  const byRank = a.state === 'canceled' ? 0 : b.tier.rank - a.tier.rank;
  return byRank || b.period_end.getTime() - a.period_end.getTime();
}

function readSubscription(
  subscription: Stripe.Subscription,
  allInvoices: readonly Stripe.Invoice[],
  tiers: readonly TierRow[],
): ReadSubscription | null {
  const item = subscription.items.data[0];
  const tier = item && tierOfProduct(tiers, idOf(item.price.product));
  const state = subscriptionState.safeParse(subscription.status);
  const interval = paymentInterval.safeParse(item?.price.recurring?.interval);
  const money = toCurrency(subscription.currency);
  if (!item || !tier || !state.success || !interval.success || !money) return null;

  const invoices = allInvoices.filter((invoice) => subscriptionOf(invoice) === subscription.id);
  const endsAt = endOf(subscription, item);
  return {
    tier,
    tier_id: tier.id,
    stripe_subscription: subscription.id,
    state: state.data,
    payment_interval: interval.data,
    price: item.price.unit_amount ?? 0,
    currency: money,
    period_end: toInstant(item.current_period_end),
    paid_until: paidUntil(invoices),
    ends_at: endsAt === null ? null : toInstant(endsAt),
    past_due_since: state.data === 'past_due' ? toInstant(unpaidSince(invoices) ?? item.current_period_start) : null,
    endAskedAt: endsAt === null ? null : toInstant(subscription.canceled_at ?? endsAt),
    failedInvoice: state.data === 'past_due' ? lastFailed(invoices) : null,
  };
}

/** An ending is told as a date, as a flag on the period, or, once it has come, as the moment it came. */
function endOf(subscription: Stripe.Subscription, item: Stripe.SubscriptionItem): number | null {
  const { ended_at: ended, cancel_at: cancelAt, cancel_at_period_end: atPeriodEnd } = subscription;
  return ended ?? cancelAt ?? (atPeriodEnd ? item.current_period_end : null);
}

function paidUntil(invoices: readonly Stripe.Invoice[]): Date | null {
  const ends = invoices.filter(({ status }) => status === 'paid').flatMap((invoice) => periodsOf(invoice, 'end'));
  return ends.length > 0 ? toInstant(Math.max(...ends)) : null;
}

/** Several periods may be unpaid: the debt began with the first. */
function unpaidSince(invoices: readonly Stripe.Invoice[]): number | null {
  const starts = invoices.filter(isOwed).flatMap((invoice) => periodsOf(invoice, 'start'));
  return starts.length > 0 ? Math.min(...starts) : null;
}

function isOwed({ status }: Stripe.Invoice): boolean {
  return status === 'open' || status === 'uncollectible';
}

/** Credits for a part of a period are no period of their own. */
function periodsOf(invoice: Stripe.Invoice, edge: 'start' | 'end'): number[] {
  return invoice.lines.data.filter(({ amount }) => amount >= 0).map(({ period }) => period[edge]);
}

function lastFailed(invoices: readonly Stripe.Invoice[]): string | null {
  const failed = invoices.filter((invoice) => isOwed(invoice) && invoice.attempt_count > 0);
  return failed.sort((a, b) => b.created - a.created)[0]?.id ?? null;
}

/** The receipts of every paid invoice for one of our tiers; one over nothing, as for a trial, is none. */
export function readReceipts({ invoices }: Truth, tiers: readonly TierRow[]): Omit<ReceiptRow, 'person_id'>[] {
  return invoices.flatMap((invoice) => {
    const products = invoice.lines.data.map((line) => line.pricing?.price_details?.product);
    const tier = products.map((product) => tierOfProduct(tiers, product ?? null)).findLast((found) => found);
    const money = toCurrency(invoice.currency);
    if (invoice.status !== 'paid' || invoice.amount_paid === 0 || !tier || !money) return [];
    return {
      stripe_invoice: invoice.id,
      number: invoice.number ?? invoice.id,
      amount: invoice.amount_paid,
      currency: money,
      tier_name: tier.name,
      href: invoice.hosted_invoice_url ?? null,
      paid_at: toInstant(invoice.status_transitions.paid_at ?? invoice.created),
    };
  });
}

function tierOfProduct(tiers: readonly TierRow[], product: string | null): TierRow | undefined {
  return tiers.find((tier) => product !== null && tier.stripe_product === product);
}

function subscriptionOf(invoice: Stripe.Invoice): string | null {
  return idOf(invoice.parent?.subscription_details?.subscription);
}

function toCurrency(code: string): Currency | null {
  return currency.safeParse(code.toUpperCase()).data ?? null;
}
