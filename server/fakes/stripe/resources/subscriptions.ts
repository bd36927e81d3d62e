import type { Stripe } from 'stripe';
import { z } from 'zod';
import { beginSubscription } from '../billing/begin.ts';
import { endSubscription, withEnding } from '../billing/cancel.ts';
import { readDiscount } from '../billing/discounts.ts';
import { readRecurringPrice } from '../billing/prices.ts';
import { applyUpdate } from '../billing/update.ts';
import { DAY, periodOf } from '../due.ts';
import { Fault, invalid } from '../errors.ts';
import { count, emptyable, flag, mergeMetadata, metadata, paging, range, shape, text } from '../params.ts';
import { onlyExpand, route } from '../route.ts';
import { change, instantOf, listOf, read, readKept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';

const quantity = count.refine((value) => value >= 1, 'must be at least 1').optional();
const discountChoice = z.strictObject({
  coupon: text.optional(),
  promotion_code: text.optional(),
  discount: text.optional(),
});
const comment = z.strictObject({
  comment: emptyable(text).optional(),
  feedback: emptyable(
    z.enum([
      'customer_service',
      'low_quality',
      'missing_features',
      'other',
      'switched_service',
      'too_complex',
      'too_expensive',
      'unused',
    ]),
  ).optional(),
});
const cancelAt = z.union([count, z.enum(['min_period_end', 'max_period_end'])]);

const createParams = shape<Stripe.SubscriptionCreateParams>()({
  customer: text,
  items: z.array(z.strictObject({ price: text, quantity })).min(1),
  cancel_at: cancelAt.optional(),
  cancel_at_period_end: flag.optional(),
  collection_method: z.literal('charge_automatically').optional(),
  default_payment_method: text.optional(),
  description: text.optional(),
  discounts: emptyable(z.array(discountChoice)).optional(),
  metadata: metadata.optional(),
  off_session: flag.optional(),
  payment_behavior: z.enum(['allow_incomplete', 'default_incomplete', 'error_if_incomplete']).optional(),
  proration_behavior: z.enum(['always_invoice', 'create_prorations', 'none']).optional(),
  trial_end: z.union([z.literal('now'), count]).optional(),
  trial_period_days: count.optional(),
});

const updateParams = shape<Stripe.SubscriptionUpdateParams>()({
  cancel_at: emptyable(cancelAt).optional(),
  cancel_at_period_end: flag.optional(),
  cancellation_details: comment.optional(),
  default_payment_method: text.optional(),
  description: emptyable(text).optional(),
  discounts: emptyable(z.array(discountChoice)).optional(),
  items: z.array(z.strictObject({ id: text, price: text.optional(), quantity })).optional(),
  metadata: metadata.optional(),
  off_session: flag.optional(),
  payment_behavior: z.enum(['allow_incomplete', 'error_if_incomplete']).optional(),
  proration_behavior: z.enum(['always_invoice', 'create_prorations', 'none']).optional(),
  trial_end: z.literal('now').optional(),
});
export type UpdateParams = z.output<typeof updateParams>;

const cancelParams = shape<Stripe.SubscriptionCancelParams>()({
  cancellation_details: comment.optional(),
  invoice_now: z.literal('false').optional(),
  prorate: z.literal('false').optional(),
});

const listParams = shape<Stripe.SubscriptionListParams>()({
  ...paging,
  created: range.optional(),
  customer: text.optional(),
  price: text.optional(),
  status: z
    .enum([
      'active',
      'all',
      'canceled',
      'ended',
      'incomplete',
      'incomplete_expired',
      'past_due',
      'paused',
      'trialing',
      'unpaid',
    ])
    .optional(),
  test_clock: text.optional(),
});

async function readOwnMethod(work: Work, id: string | undefined, customer: string): Promise<string | null> {
  if (!id) return null;
  const method = await read(work.db, 'payment_method', id, 'default_payment_method');
  if (method.customer !== customer) {
    throw invalid('The customer does not have a payment method with this id attached.', 'default_payment_method');
  }
  return id;
}

/** The instant that `cancel_at` means. */
export function endingOf(
  subscription: Kinds['subscription'],
  wanted: { cancel_at?: z.output<typeof cancelAt> | null | undefined; cancel_at_period_end?: boolean | undefined },
): 'period_end' | number | null | undefined {
  if (wanted.cancel_at !== undefined && wanted.cancel_at_period_end !== undefined) {
    throw invalid('Pass either cancel_at or cancel_at_period_end.', 'cancel_at');
  }
  if (wanted.cancel_at_period_end !== undefined) return wanted.cancel_at_period_end ? 'period_end' : null;
  return typeof wanted.cancel_at === 'string' ? periodOf(subscription).end : wanted.cancel_at;
}

function trialEndOf(
  { trial_end: end, trial_period_days: days }: z.output<typeof createParams>,
  now: number,
): number | null {
  if (end !== undefined && days !== undefined)
    throw invalid('Pass either trial_end or trial_period_days.', 'trial_end');
  if (typeof end === 'number' && end <= now) throw invalid('trial_end must be in the future.', 'trial_end');
  if (typeof end === 'number') return end;
  return days ? now + days * DAY : null;
}

export const subscriptionRoutes = [
  route('post', '/subscriptions', createParams, async (work, params) => {
    const customer = await read(work.db, 'customer', params.customer, 'customer');
    const now = await instantOf(work, customer);
    const method = await readOwnMethod(work, params.default_payment_method, customer.id);
    const trialEnd = trialEndOf(params, now);
    const behaviour = params.payment_behavior ?? 'allow_incomplete';
    if (
      !method &&
      !customer.invoice_settings.default_payment_method &&
      behaviour !== 'default_incomplete' &&
      !trialEnd
    ) {
      throw invalid(
        'This customer has no attached payment source or default payment method. Please consider adding a default payment method.',
        'customer',
        'resource_missing',
      );
    }
    const items = [];
    for (const [i, item] of params.items.entries()) {
      items.push({
        price: await readRecurringPrice(work.db, item.price, `items[${i}][price]`),
        quantity: item.quantity ?? 1,
      });
    }
    const discounts = [];
    for (const choice of params.discounts ?? [])
      discounts.push(await readDiscount(work.db, choice, { customer: customer.id, now }));

    const begun = await beginSubscription(work, {
      customer,
      items,
      method,
      trialEnd,
      metadata: mergeMetadata(null, params.metadata),
      description: params.description ?? null,
      discounts,
      session: null,
      presence: params.off_session ? 'away' : 'present',
      charge: behaviour !== 'default_incomplete',
    });
    if (begun.first?.failure && behaviour === 'error_if_incomplete') {
      throw new Fault(402, { type: 'card_error', ...begun.first.failure });
    }
    const ending = endingOf(begun.subscription, params);
    if (ending === undefined || ending === null) return begun.subscription;
    const kept = await readKept(work.db, 'subscription', begun.subscription.id);
    return change(work, kept, withEnding(kept.data, ending, now), { event: 'customer.subscription.updated' });
  }),

  route('get', '/subscriptions/:id', onlyExpand, async (work, _params, { id }) => read(work.db, 'subscription', id)),

  route('post', '/subscriptions/:id', updateParams, async (work, params, { id }) => {
    const kept = await readKept(work.db, 'subscription', id);
    if (params.default_payment_method) await readOwnMethod(work, params.default_payment_method, kept.data.customer);
    return applyUpdate(work, kept, { ...params, ending: endingOf(kept.data, params) });
  }),

  route('delete', '/subscriptions/:id', cancelParams, async (work, params, { id }) => {
    const kept = await readKept(work.db, 'subscription', id);
    if (kept.data.ended_at !== null)
      throw new Fault(404, {
        type: 'invalid_request_error',
        code: 'resource_missing',
        message: `No such subscription: '${id}'`,
        param: 'id',
      });
    const { comment: said = null, feedback = null } = params.cancellation_details ?? {};
    return endSubscription(work, kept, 'cancellation_requested', { comment: said, feedback });
  }),

  route(
    'get',
    '/subscriptions',
    listParams,
    async (work, { created, customer, price, status, test_clock: clock, ...cursors }) =>
      listOf(work.db, 'subscription', '/v1/subscriptions', {
        paging: cursors,
        created,
        equal: { customer, test_clock: clock },
        refine: (query) => {
          if (status === undefined) void query.whereRaw("data ->> 'status' <> 'canceled'");
          else if (status === 'ended') void query.whereRaw("data ->> 'status' in ('canceled', 'incomplete_expired')");
          else if (status !== 'all') void query.whereRaw("data ->> 'status' = ?", [status]);
          if (price)
            void query.whereRaw("data #> '{items,data}' @> ?::jsonb", [JSON.stringify([{ price: { id: price } }])]);
        },
      }),
  ),
];
