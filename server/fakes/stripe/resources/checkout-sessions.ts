import type { Stripe } from 'stripe';
import { z } from 'zod';
import { expireCheckout } from '../billing/act.ts';
import { amountOff, readDiscount } from '../billing/discounts.ts';
import { amountOf, readRecurringPrice } from '../billing/prices.ts';
import { invalid } from '../errors.ts';
import type { CheckoutPlan } from '../hidden.ts';
import { newId } from '../ids.ts';
import { count, flag, mergeMetadata, metadata, paging, range, shape, text } from '../params.ts';
import { onlyExpand, route } from '../route.ts';
import { change, create, listOf, read, readKept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';
import { lineItemsOf } from './line-items.ts';

const SESSION_LIFE = { least: 30 * 60, most: 24 * 3600 };

const createParams = shape<Stripe.Checkout.SessionCreateParams>()({
  mode: z.literal('subscription', 'the fake acts out subscriptions only'),
  line_items: z.array(z.strictObject({ price: text, quantity: count.optional() })).min(1),
  success_url: z.url(),
  cancel_url: z.url().optional(),
  allow_promotion_codes: flag.optional(),
  billing_address_collection: z.enum(['auto', 'required']).optional(),
  client_reference_id: z.string().max(200).optional(),
  customer: text.optional(),
  customer_email: text.optional(),
  custom_text: z.strictObject({ submit: z.strictObject({ message: text }).optional() }).optional(),
  discounts: z
    .array(z.strictObject({ coupon: text.optional(), promotion_code: text.optional() }))
    .max(1)
    .optional(),
  expires_at: count.optional(),
  locale: z.enum(['auto', 'en', 'en-GB']).optional(),
  metadata: metadata.optional(),
  payment_method_collection: z.literal('always').optional(),
  subscription_data: z
    .strictObject({
      description: text.optional(),
      metadata: metadata.optional(),
      trial_end: count.optional(),
      trial_period_days: count.optional(),
    })
    .optional(),
  ui_mode: z.literal('hosted_page', 'the fake serves the hosted page only').optional(),
});
type CreateParams = z.output<typeof createParams>;

const updateParams = shape<Stripe.Checkout.SessionUpdateParams>()({ metadata: metadata.optional() });
const linesParams = shape<Stripe.Checkout.SessionListLineItemsParams>()(paging);
const listParams = shape<Stripe.Checkout.SessionListParams>()({
  ...paging,
  created: range.optional(),
  customer: text.optional(),
  status: z.enum(['complete', 'expired', 'open']).optional(),
  subscription: text.optional(),
});

async function planOf(work: Work, params: CreateParams): Promise<{ plan: CheckoutPlan; prices: Kinds['price'][] }> {
  const items: CheckoutPlan['items'] = [];
  const prices: Kinds['price'][] = [];
  for (const [i, item] of params.line_items.entries()) {
    const price = await readRecurringPrice(work.db, item.price, `line_items[${i}][price]`);
    prices.push(price);
    items.push({ id: newId('li'), price: price.id, quantity: item.quantity ?? 1 });
  }
  if (new Set(prices.map((price) => price.currency)).size > 1) {
    throw invalid('All prices on a Checkout Session must have the same currency.', 'line_items');
  }
  const data = params.subscription_data;
  if (data?.trial_end !== undefined && data.trial_period_days !== undefined) {
    throw invalid('Pass either trial_end or trial_period_days.', 'subscription_data[trial_end]');
  }
  const plan = {
    items,
    metadata: mergeMetadata(null, data?.metadata),
    description: data?.description ?? null,
    trialDays: data?.trial_period_days || null,
    trialEnd: data?.trial_end ?? null,
  };
  return { plan, prices };
}

function expiryOf({ expires_at: wanted }: CreateParams, now: number): number {
  if (wanted === undefined) return now + SESSION_LIFE.most;
  // A minute of grace: the caller reckoned from its own clock.
  if (wanted < now + SESSION_LIFE.least - 60 || wanted > now + SESSION_LIFE.most + 60) {
    throw invalid('The expires_at timestamp must be between 30 minutes and 24 hours from now.', 'expires_at');
  }
  return wanted;
}

function newSession(work: Work, params: CreateParams, money: { currency: string; subtotal: number; off: number }) {
  const id = newId('cs_test', 58);
  const session: Kinds['checkout.session'] = {
    id,
    object: 'checkout.session',
    adaptive_pricing: null,
    after_expiration: null,
    allow_promotion_codes: params.allow_promotion_codes ?? null,
    allowed_payment_method_types: null,
    amount_subtotal: money.subtotal,
    amount_total: money.subtotal - money.off,
    automatic_tax: { enabled: false, liability: null, provider: null, status: null },
    billing_address_collection: params.billing_address_collection ?? null,
    cancel_url: params.cancel_url ?? null,
    client_reference_id: params.client_reference_id ?? null,
    client_secret: null,
    collected_information: null,
    consent: null,
    consent_collection: null,
    created: work.now,
    currency: money.currency,
    currency_conversion: null,
    custom_fields: [],
    custom_text: {
      after_submit: null,
      shipping_address: null,
      submit: params.custom_text?.submit ?? null,
      terms_of_service_acceptance: null,
    },
    customer: params.customer ?? null,
    customer_account: null,
    customer_creation: params.customer ? null : 'always',
    customer_details: null,
    customer_email: params.customer_email ?? null,
    discounts: (params.discounts ?? []).map(({ coupon, promotion_code: code }) => ({
      coupon: coupon ?? null,
      promotion_code: code ?? null,
    })),
    expires_at: expiryOf(params, work.now),
    integration_identifier: null,
    invoice: null,
    invoice_creation: null,
    livemode: false,
    locale: params.locale ?? null,
    managed_payments: null,
    metadata: mergeMetadata(null, params.metadata),
    mode: 'subscription',
    origin_context: null,
    payment_intent: null,
    payment_link: null,
    payment_method_collection: 'always',
    payment_method_configuration_details: null,
    payment_method_options: { card: { request_three_d_secure: 'automatic' } },
    payment_method_types: ['card'],
    payment_status: 'unpaid',
    permissions: null,
    phone_number_collection: { enabled: false },
    recovered_from: null,
    saved_payment_method_options: {
      allow_redisplay_filters: ['always'],
      payment_method_remove: 'disabled',
      payment_method_save: null,
    },
    setup_intent: null,
    shipping_address_collection: null,
    shipping_cost: null,
    shipping_options: [],
    status: 'open',
    submit_type: null,
    subscription: null,
    success_url: params.success_url,
    total_details: { amount_discount: money.off, amount_shipping: 0, amount_tax: 0 },
    ui_mode: 'hosted_page',
    url: `${work.origin}/checkout/${id}`,
    wallet_options: null,
  };
  return session;
}

export const checkoutSessionRoutes = [
  route('post', '/checkout/sessions', createParams, async (work, params) => {
    if (params.customer && params.customer_email) {
      throw invalid('You may only specify one of these parameters: customer, customer_email.', 'customer');
    }
    if (params.allow_promotion_codes && params.discounts) {
      throw invalid('You may only specify one of these parameters: allow_promotion_codes, discounts.', 'discounts');
    }
    if (params.customer) await read(work.db, 'customer', params.customer, 'customer');
    const { plan, prices } = await planOf(work, params);
    const trial = plan.trialDays !== null || plan.trialEnd !== null;
    const sum = prices.reduce((total, price, i) => total + amountOf(price, plan.items[i]?.quantity ?? 1), 0);
    const subtotal = trial ? 0 : sum;
    const [choice] = params.discounts ?? [];
    const taken = choice && (await readDiscount(work.db, choice, { customer: params.customer ?? null, now: work.now }));
    const off = taken ? amountOff(taken.coupon, subtotal) : 0;
    const session = newSession(work, params, { currency: prices[0]?.currency ?? '', subtotal, off });
    return create(work, 'checkout.session', session, { hidden: { plan } });
  }),

  route('get', '/checkout/sessions/:id', onlyExpand, async (work, _params, { id }) =>
    read(work.db, 'checkout.session', id),
  ),

  route('post', '/checkout/sessions/:id', updateParams, async (work, params, { id }) => {
    const kept = await readKept(work.db, 'checkout.session', id);
    return change(work, kept, { ...kept.data, metadata: mergeMetadata(kept.data.metadata, params.metadata) });
  }),

  route('post', '/checkout/sessions/:id/expire', onlyExpand, async (work, _params, { id }) => {
    const kept = await readKept(work.db, 'checkout.session', id);
    if (kept.data.status !== 'open') {
      throw invalid(
        `Only Checkout Sessions with a status in ["open"] can be expired. This one is ${kept.data.status ?? ''}.`,
        'id',
      );
    }
    return expireCheckout(work, kept);
  }),

  route('get', '/checkout/sessions/:id/line_items', linesParams, async (work, _params, { id }) =>
    lineItemsOf(work.db, await readKept(work.db, 'checkout.session', id)),
  ),

  route(
    'get',
    '/checkout/sessions',
    listParams,
    async (work, { created, customer, status, subscription, ...cursors }) =>
      listOf(work.db, 'checkout.session', '/v1/checkout/sessions', {
        paging: cursors,
        created,
        equal: { customer, status, subscription },
      }),
  ),
];
