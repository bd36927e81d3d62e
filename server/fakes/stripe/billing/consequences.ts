import { change, readKept } from '../store.ts';
import type { Kept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';
import { endSubscription } from './cancel.ts';

async function keptSubscription(work: Work, invoice: Kinds['invoice']): Promise<Kept<'subscription'> | undefined> {
  const id = invoice.parent?.subscription_details?.subscription;
  return id === undefined ? undefined : readKept(work.db, 'subscription', id);
}

/** A paid latest invoice brings a subscription back to `active`. */
export async function onInvoicePaid(work: Work, invoice: Kinds['invoice']): Promise<void> {
  const kept = await keptSubscription(work, invoice);
  if (!kept || kept.data.latest_invoice !== invoice.id) return;
  if (!['past_due', 'unpaid', 'incomplete'].includes(kept.data.status)) return;
  await change(work, kept, { ...kept.data, status: 'active' }, { event: 'customer.subscription.updated' });
}

/** A failed attempt makes a running subscription `past_due`; one that never started stays `incomplete`. */
export async function onPaymentFailed(work: Work, invoice: Kinds['invoice']): Promise<void> {
  const kept = await keptSubscription(work, invoice);
  if (kept?.data.status !== 'active') return;
  await change(work, kept, { ...kept.data, status: 'past_due' }, { event: 'customer.subscription.updated' });
}

/** When every attempt has failed, the subscription ends, stays unpaid, or stays past due, as set. */
export async function endAfterLastAttempt(work: Work, invoice: Kinds['invoice']): Promise<void> {
  const kept = await keptSubscription(work, invoice);
  if (kept?.data.status !== 'past_due') return;
  const { afterwards } = work.dunning;
  if (afterwards === 'canceled') await endSubscription(work, kept, 'payment_failed');
  if (afterwards === 'unpaid') {
    await change(work, kept, { ...kept.data, status: 'unpaid' }, { event: 'customer.subscription.updated' });
  }
}
