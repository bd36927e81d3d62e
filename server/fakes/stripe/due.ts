import type { Hidden } from './hidden.ts';
import type { Kind, Kinds } from './wire.ts';

export const DAY = 86_400;
export const INCOMPLETE_LIFE = 23 * 3600;
export const TRIAL_NOTICE = 3 * DAY;

const RUNNING = ['active', 'past_due', 'trialing', 'unpaid'];

/** The end of the current period; items of one subscription share it here. */
export function periodOf(subscription: Kinds['subscription']): { start: number; end: number } {
  const [item] = subscription.items.data;
  if (!item) throw new Error(`Subscription ${subscription.id} has no items.`);
  return { start: item.current_period_start, end: item.current_period_end };
}

function subscriptionDue(subscription: Kinds['subscription'], hidden: Hidden): number | null {
  if (subscription.status === 'incomplete') return subscription.created + INCOMPLETE_LIFE;
  if (!RUNNING.includes(subscription.status)) return null;

  const times = [periodOf(subscription).end];
  if (subscription.cancel_at !== null) times.push(subscription.cancel_at);
  if (subscription.status === 'trialing' && subscription.trial_end !== null && !hidden.trialNoticeSent) {
    times.push(Math.max(subscription.created, subscription.trial_end - TRIAL_NOTICE));
  }
  return Math.min(...times);
}

function invoiceDue(invoice: Kinds['invoice']): number | null {
  if (!invoice.auto_advance) return null;
  if (invoice.status === 'draft') return invoice.automatically_finalizes_at;
  return invoice.status === 'open' ? invoice.next_payment_attempt : null;
}

/** When an object next needs attention, in seconds on its timeline; null when time alone changes nothing. */
export function dueAt(data: Kinds[Kind], hidden: Hidden): number | null {
  switch (data.object) {
    case 'subscription':
      return subscriptionDue(data, hidden);
    case 'invoice':
      return invoiceDue(data);
    case 'checkout.session':
      return data.status === 'open' ? data.expires_at : null;
    default:
      return null;
  }
}
