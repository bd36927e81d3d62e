import { periodEnd } from '../calendar.ts';
import { periodOf } from '../due.ts';
import { all, change, instantOf, type Kept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';
import { billPeriod } from './period-invoice.ts';
import { intervalOf } from './prices.ts';
import { voidInvoice } from './invoices.ts';

/** The subscription in its next period; a trial that ends becomes a paid period. */
export function inNextPeriod(subscription: Kinds['subscription']): Kinds['subscription'] {
  const { end: start } = periodOf(subscription);
  const [item] = subscription.items.data;
  if (!item) throw new Error(`Subscription ${subscription.id} has no items.`);
  const end = periodEnd(subscription.billing_cycle_anchor, start, intervalOf(item.price));
  return {
    ...subscription,
    status: subscription.status === 'trialing' ? 'active' : subscription.status,
    items: {
      ...subscription.items,
      data: subscription.items.data.map((each) => ({ ...each, current_period_start: start, current_period_end: end })),
    },
  };
}

/** Moves a subscription into its next period and drafts the invoice for it, charged an hour later. */
export async function renew(work: Work, kept: Kept<'subscription'>): Promise<void> {
  const next = { data: inNextPeriod(kept.data), hidden: kept.hidden };
  const billed = await billPeriod(work, next, 'subscription_cycle');
  const hidden = { ...kept.hidden, pendingLines: [] };
  await change(work, kept, billed.subscription, { hidden, event: 'customer.subscription.updated' });

  if (kept.data.status === 'unpaid') {
    const held = {
      ...billed.invoice,
      auto_advance: false,
      automatically_finalizes_at: null,
      next_payment_attempt: null,
    };
    await change(work, { data: billed.invoice, hidden: {} }, held, { event: 'invoice.updated' });
  }
}

/** A first payment that never came: the subscription expires and its invoice is void. */
export async function expireIncomplete(work: Work, kept: Kept<'subscription'>): Promise<void> {
  const invoices = await all(work.db, 'invoice', { customer: kept.data.customer, status: 'open' });
  const own = invoices.find(({ data }) => data.id === kept.data.latest_invoice);
  if (own) await voidInvoice(work, own);
  const after: Kinds['subscription'] = {
    ...kept.data,
    status: 'incomplete_expired',
    ended_at: await instantOf(work, kept.data),
  };
  await change(work, kept, after, { event: 'customer.subscription.updated' });
}
