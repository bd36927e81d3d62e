import { periodOf } from '../due.ts';
import { all, change, instantOf, type Kept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';

export type EndReason = 'cancellation_requested' | 'payment_failed';

/** Ends a subscription now. Its open invoices stay open and are no longer collected by themselves. */
export async function endSubscription(
  work: Work,
  kept: Kept<'subscription'>,
  reason: EndReason,
  details: { comment?: string | null; feedback?: string | null } = {},
): Promise<Kinds['subscription']> {
  const now = await instantOf(work, kept.data);
  for (const invoice of await all(work.db, 'invoice', { customer: kept.data.customer })) {
    const mine = invoice.data.parent?.subscription_details?.subscription === kept.data.id;
    if (!mine || (invoice.data.status !== 'open' && invoice.data.status !== 'draft')) continue;
    const stopped = {
      ...invoice.data,
      auto_advance: false,
      automatically_finalizes_at: null,
      next_payment_attempt: null,
    };
    await change(work, invoice, stopped, { event: 'invoice.updated' });
  }
  return change(
    work,
    kept,
    {
      ...kept.data,
      canceled_at: kept.data.canceled_at ?? now,
      cancellation_details: { ...cancellationDetails(kept.data), ...details, reason },
      ended_at: now,
      status: 'canceled',
    },
    { event: 'customer.subscription.deleted' },
  );
}

export function cancellationDetails(subscription: Kinds['subscription']) {
  return subscription.cancellation_details ?? { comment: null, feedback: null, feedback_option: null, reason: null };
}

/**
 * When a subscription is set to end. `period_end` sets both the flag and the date; a bare date sets only
 * the date, which is what the portal does under flexible billing; null takes the ending back.
 */
export function withEnding(
  subscription: Kinds['subscription'],
  ending: 'period_end' | number | null,
  now: number,
): Kinds['subscription'] {
  const cancelAt = ending === 'period_end' ? periodOf(subscription).end : ending;
  return {
    ...subscription,
    cancel_at: cancelAt,
    cancel_at_period_end: ending === 'period_end',
    canceled_at: cancelAt === null ? null : now,
    cancellation_details: {
      ...cancellationDetails(subscription),
      reason: cancelAt === null ? null : 'cancellation_requested',
    },
  };
}
