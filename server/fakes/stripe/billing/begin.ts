import { periodEnd } from '../calendar.ts';
import { emit } from '../events.ts';
import { newId } from '../ids.ts';
import { change, create, instantOf, readKept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';
import { collect, type Collected, type Presence } from './collect.ts';
import { redeem, type TakenDiscount } from './discounts.ts';
import { finalizeInvoice } from './invoices.ts';
import { billPeriod } from './period-invoice.ts';
import { intervalOf } from './prices.ts';

export interface Beginning {
  customer: Kinds['customer'];
  items: { id?: string; price: Kinds['price']; quantity: number }[];
  method: string | null;
  trialEnd: number | null;
  metadata: Record<string, string>;
  description: string | null;
  discounts: TakenDiscount[];
  session: string | null;
  presence: Presence;
  /** Whether the first invoice is charged at once or waits, the subscription staying incomplete. */
  charge: boolean;
}

export interface Begun {
  subscription: Kinds['subscription'];
  invoice: Kinds['invoice'];
  first: Collected | null;
}

/** Starts a subscription and bills its first period; without a trial it is active once that is paid. */
export async function beginSubscription(work: Work, beginning: Beginning): Promise<Begun> {
  const now = await instantOf(work, beginning.customer);
  const fresh = newSubscription(beginning, now);
  await create(work, 'subscription', fresh);

  const target = { customer: beginning.customer.id, subscription: fresh.id, session: beginning.session, now };
  const discounts: string[] = [];
  for (const taken of beginning.discounts) discounts.push(await redeem(work, taken, target));

  const billed = await billPeriod(work, { data: { ...fresh, discounts }, hidden: {} }, 'subscription_create');
  await change(work, { data: fresh, hidden: {} }, billed.subscription);
  await emit(work, 'customer.subscription.created', now, billed.subscription);

  const invoice = await finalizeInvoice(work, billed.invoice.id);
  const first =
    invoice.status === 'open' && beginning.charge
      ? await collect(work, invoice.id, { presence: beginning.presence })
      : null;
  const subscription = (await readKept(work.db, 'subscription', fresh.id)).data;
  return { subscription, invoice: first?.invoice ?? invoice, first };
}

function newSubscription(beginning: Beginning, now: number): Kinds['subscription'] {
  const id = newId('sub');
  const { customer, items, trialEnd } = beginning;
  const [first] = items;
  if (!first) throw new Error('A subscription needs an item.');
  const anchor = trialEnd ?? now;
  const end = trialEnd ?? periodEnd(anchor, now, intervalOf(first.price));
  return {
    id,
    object: 'subscription',
    application: null,
    application_fee_percent: null,
    automatic_tax: { disabled_reason: null, enabled: false, liability: null },
    billing_cycle_anchor: anchor,
    billing_cycle_anchor_config: null,
    billing_mode: { flexible: { proration_discounts: 'included' }, type: 'flexible' },
    billing_schedules: [],
    billing_thresholds: null,
    cancel_at: null,
    cancel_at_period_end: false,
    canceled_at: null,
    cancellation_details: { comment: null, feedback: null, feedback_option: null, reason: null },
    collection_method: 'charge_automatically',
    created: now,
    currency: first.price.currency,
    customer: customer.id,
    customer_account: null,
    days_until_due: null,
    default_payment_method: beginning.method,
    default_source: null,
    default_tax_rates: [],
    description: beginning.description,
    discounts: [],
    ended_at: null,
    invoice_settings: {
      account_tax_ids: null,
      custom_fields: null,
      description: null,
      footer: null,
      issuer: { type: 'self' },
    },
    items: {
      object: 'list',
      data: items.map((item) => newItem(id, item, { start: now, end }, now)),
      has_more: false,
      url: `/v1/subscription_items?subscription=${id}`,
    },
    latest_invoice: null,
    livemode: false,
    managed_payments: null,
    metadata: beginning.metadata,
    next_pending_invoice_item_invoice: null,
    on_behalf_of: null,
    pause_collection: null,
    payment_settings: { payment_method_options: null, payment_method_types: null, save_default_payment_method: 'off' },
    pending_invoice_item_interval: null,
    pending_setup_intent: null,
    pending_update: null,
    schedule: null,
    start_date: now,
    status: trialEnd === null ? 'incomplete' : 'trialing',
    test_clock: customer.test_clock ?? null,
    transfer_data: null,
    trial_end: trialEnd,
    trial_settings: { end_behavior: { billing_cycle_anchor: null, missing_payment_method: 'create_invoice' } },
    trial_start: trialEnd === null ? null : now,
  };
}

type Item = Kinds['subscription']['items']['data'][number];

function newItem(
  subscription: string,
  { id, price, quantity }: Beginning['items'][number],
  period: { start: number; end: number },
  created: number,
): Item {
  return {
    id: id ?? newId('si'),
    object: 'subscription_item',
    billing_thresholds: null,
    created,
    current_period_end: period.end,
    current_period_start: period.start,
    current_trial: null,
    discounts: [],
    metadata: {},
    plan: planOf(price),
    price,
    quantity,
    subscription,
    tax_rates: [],
  };
}

/** The older form of a price that subscription items still carry beside it. */
export function planOf(price: Kinds['price']): Item['plan'] {
  return {
    id: price.id,
    object: 'plan',
    active: price.active,
    amount: price.unit_amount,
    amount_decimal: price.unit_amount_decimal,
    billing_scheme: 'per_unit',
    created: price.created,
    currency: price.currency,
    interval: price.recurring?.interval ?? 'month',
    interval_count: price.recurring?.interval_count ?? 1,
    livemode: false,
    metadata: price.metadata,
    meter: null,
    nickname: price.nickname,
    product: price.product,
    tiers_mode: null,
    transform_usage: null,
    trial_period_days: null,
    usage_type: 'licensed',
  };
}
