import type { Knex } from 'knex';
import { periodOf } from '../due.ts';
import { instantOf, read, type Kept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';
import { discountsAt } from './discounts.ts';
import { composeInvoice, draftInvoice, type InvoiceSource } from './invoices.ts';
import { itemLine, pendingLine, type Line } from './lines.ts';

type Reason = InvoiceSource['reason'];

async function periodLines(db: Knex, subscription: Kinds['subscription']): Promise<Line[]> {
  const products = await Promise.all(subscription.items.data.map((item) => read(db, 'product', item.price.product)));
  return subscription.items.data.map((item, i) =>
    itemLine({
      subscription,
      item,
      productName: products[i]?.name ?? item.price.product,
      period: periodOf(subscription),
      free: subscription.status === 'trialing',
    }),
  );
}

/** What the current period of a subscription costs, with what was waiting for an invoice. */
async function sourceOf(
  work: Work,
  kept: Kept<'subscription'>,
  reason: Reason,
  whole: boolean,
): Promise<InvoiceSource> {
  const { data: subscription, hidden } = kept;
  const now = await instantOf(work, subscription);
  const waiting = (hidden.pendingLines ?? []).map((line) => pendingLine(subscription, line));
  return {
    customer: await read(work.db, 'customer', subscription.customer),
    subscription,
    lines: whole ? [...waiting, ...(await periodLines(work.db, subscription))] : waiting,
    discounts: await discountsAt(work.db, subscription.discounts, now),
    reason,
    period: periodOf(subscription),
    now,
  };
}

export interface Billed {
  subscription: Kinds['subscription'];
  invoice: Kinds['invoice'];
}

/**
 * Drafts the invoice for the period the subscription is in (`whole`), or only for what was waiting.
 * The returned subscription names it and has lost its one-time discounts; keeping it is the caller's.
 */
export async function billPeriod(
  work: Work,
  kept: Kept<'subscription'>,
  reason: Reason,
  whole = true,
): Promise<Billed> {
  const source = await sourceOf(work, kept, reason, whole);
  const draft = await draftInvoice(work, source);
  const spent = source.discounts.filter(({ coupon }) => coupon.duration === 'once').map(({ id }) => id);
  const discounts = kept.data.discounts.filter((id) => !spent.includes(id));
  return { invoice: draft, subscription: { ...kept.data, discounts, latest_invoice: draft.id } };
}

/** The invoice that `billPeriod` would draft. */
export async function previewPeriod(work: Work, kept: Kept<'subscription'>, whole = true): Promise<Kinds['invoice']> {
  return composeInvoice(await sourceOf(work, kept, 'upcoming', whole));
}
