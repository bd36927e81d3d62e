import { periodOf, TRIAL_NOTICE } from '../due.ts';
import { emit } from '../events.ts';
import { change, instantOf, readKept, type Kept } from '../store.ts';
import type { Kind } from '../wire.ts';
import type { Work } from '../work.ts';
import { endSubscription } from './cancel.ts';
import { collect } from './collect.ts';
import { finalizeInvoice } from './invoices.ts';
import { expireIncomplete, renew } from './renew.ts';

/** Does what is due for an object at the present instant of its timeline. */
export async function act(work: Work, kind: Kind, id: string): Promise<void> {
  if (kind === 'subscription') return actOnSubscription(work, await readKept(work.db, kind, id));
  if (kind === 'invoice') return actOnInvoice(work, await readKept(work.db, kind, id));
  if (kind === 'checkout.session') {
    await expireCheckout(work, await readKept(work.db, kind, id));
    return;
  }
  throw new Error(`Nothing falls due for a ${kind}.`);
}

async function actOnSubscription(work: Work, kept: Kept<'subscription'>): Promise<void> {
  const { data: subscription, hidden } = kept;
  const now = await instantOf(work, subscription);
  if (subscription.status === 'incomplete') return expireIncomplete(work, kept);
  if (subscription.cancel_at !== null && subscription.cancel_at <= now) {
    await endSubscription(work, kept, 'cancellation_requested');
    return;
  }
  const { end } = periodOf(subscription);
  if (end <= now) return renew(work, kept);
  if (subscription.status === 'trialing' && end - TRIAL_NOTICE <= now) {
    await change(work, kept, subscription, { hidden: { ...hidden, trialNoticeSent: true } });
    await emit(work, 'customer.subscription.trial_will_end', now, subscription);
  }
}

async function actOnInvoice(work: Work, kept: Kept<'invoice'>): Promise<void> {
  const invoice = kept.data.status === 'draft' ? await finalizeInvoice(work, kept.data.id) : kept.data;
  if (invoice.status === 'open') await collect(work, invoice.id, { presence: 'away' });
}

/** An unpaid checkout page closes. */
export async function expireCheckout(work: Work, kept: Kept<'checkout.session'>) {
  const after = { ...kept.data, status: 'expired' as const, url: null };
  return change(work, kept, after, { event: 'checkout.session.expired' });
}
