import { Fault, invalid } from '../errors.ts';
import { given, mergeMetadata } from '../params.ts';
import { change, instantOf, read, readKept, type Kept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';
import { cancellationDetails, withEnding } from './cancel.ts';
import { collect } from './collect.ts';
import { readDiscount, redeem, type DiscountChoice } from './discounts.ts';
import { finalizeInvoice } from './invoices.ts';
import { billPeriod } from './period-invoice.ts';
import { renew } from './renew.ts';
import { planSwitch, type ItemChange, type Proration } from './switch.ts';

export interface SubscriptionUpdate {
  ending?: 'period_end' | number | null | undefined;
  cancellation_details?: { comment?: string | null | undefined; feedback?: string | null | undefined } | undefined;
  default_payment_method?: string | undefined;
  description?: string | null | undefined;
  discounts?: DiscountChoice[] | null | undefined;
  items?: ItemChange[] | undefined;
  metadata?: Record<string, string> | null | undefined;
  payment_behavior?: 'allow_incomplete' | 'error_if_incomplete' | undefined;
  proration_behavior?: Proration | undefined;
  trial_end?: 'now' | undefined;
}

async function newDiscounts(
  work: Work,
  { data }: Kept<'subscription'>,
  choices: DiscountChoice[],
  now: number,
): Promise<string[]> {
  const ids: string[] = [];
  for (const choice of choices) {
    if (choice.discount) {
      ids.push((await read(work.db, 'discount', choice.discount, 'discounts')).id);
      continue;
    }
    const taken = await readDiscount(work.db, choice, { customer: data.customer, now });
    ids.push(await redeem(work, taken, { customer: data.customer, subscription: data.id, session: null, now }));
  }
  return ids;
}

/** Changes a running subscription and bills at once what the change makes due at once. */
export async function applyUpdate(
  work: Work,
  kept: Kept<'subscription'>,
  update: SubscriptionUpdate,
): Promise<Kinds['subscription']> {
  const { data: before, hidden } = kept;
  if (before.ended_at !== null) {
    throw invalid(
      'A canceled subscription can only update its cancellation_details and metadata.',
      'id',
      'invalid_canceled_subscription_fields',
    );
  }
  const now = await instantOf(work, before);
  let after: Kinds['subscription'] = {
    ...before,
    ...given({ description: update.description, default_payment_method: update.default_payment_method }),
    cancellation_details: { ...cancellationDetails(before), ...given(update.cancellation_details ?? {}) },
    metadata: mergeMetadata(before.metadata, update.metadata),
  };
  if (update.ending !== undefined) after = withEnding(after, update.ending, now);
  if (update.discounts !== undefined) after.discounts = await newDiscounts(work, kept, update.discounts ?? [], now);

  const proration = update.proration_behavior ?? 'create_prorations';
  const switched = await planSwitch(work, { data: after, hidden }, update.items ?? [], { proration, now });
  const next = { ...hidden, pendingLines: switched.pendingLines };
  await change(work, kept, switched.subscription, { hidden: next, event: 'customer.subscription.updated' });

  if (update.trial_end === 'now' && before.status === 'trialing') await endTrial(work, before.id, now);
  if (update.items && switched.invoiceNow) await billNow(work, before.id, switched.newPeriod, update.payment_behavior);
  return read(work.db, 'subscription', before.id);
}

/** Bills the new period, or only what the change made due, and collects it. */
async function billNow(
  work: Work,
  id: string,
  whole: boolean,
  behaviour: SubscriptionUpdate['payment_behavior'],
): Promise<void> {
  const kept = await readKept(work.db, 'subscription', id);
  if (!whole && (kept.hidden.pendingLines ?? []).length === 0) return;
  const billed = await billPeriod(work, kept, 'subscription_update', whole);
  const hidden = { ...kept.hidden, pendingLines: [] };
  await change(work, kept, billed.subscription, { hidden, event: 'customer.subscription.updated' });
  await finishNow(work, billed.invoice.id, behaviour);
}

async function endTrial(work: Work, id: string, now: number): Promise<void> {
  const kept = await readKept(work.db, 'subscription', id);
  const items = kept.data.items.data.map((item) => ({ ...item, current_period_end: now }));
  const ended = { ...kept.data, billing_cycle_anchor: now, trial_end: now, items: { ...kept.data.items, data: items } };
  await renew(work, { data: ended, hidden: kept.hidden });
  const renewed = await read(work.db, 'subscription', id);
  if (renewed.latest_invoice) await finishNow(work, renewed.latest_invoice, undefined);
}

async function finishNow(
  work: Work,
  invoiceId: string,
  behaviour: SubscriptionUpdate['payment_behavior'],
): Promise<void> {
  const invoice = await finalizeInvoice(work, invoiceId);
  if (invoice.status !== 'open') return;
  const { failure } = await collect(work, invoice.id, { presence: 'away' });
  if (failure && behaviour === 'error_if_incomplete') throw new Fault(402, { type: 'card_error', ...failure });
}
