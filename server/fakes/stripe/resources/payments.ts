import type { Stripe } from 'stripe';
import { z } from 'zod';
import { invalid } from '../errors.ts';
import { emit } from '../events.ts';
import { newId } from '../ids.ts';
import { count, mergeMetadata, metadata, paging, range, shape, text } from '../params.ts';
import { onlyExpand, route } from '../route.ts';
import { change, create, instantOf, listOf, read, readKept, type Kept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';

const intentList = shape<Stripe.PaymentIntentListParams>()({
  ...paging,
  created: range.optional(),
  customer: text.optional(),
});
const chargeList = shape<Stripe.ChargeListParams>()({
  ...paging,
  created: range.optional(),
  customer: text.optional(),
  payment_intent: text.optional(),
});
const refundParams = shape<Stripe.RefundCreateParams>()({
  amount: count.refine((value) => value >= 1, 'must be at least 1').optional(),
  charge: text.optional(),
  metadata: metadata.optional(),
  payment_intent: text.optional(),
  reason: z.enum(['duplicate', 'fraudulent', 'requested_by_customer']).optional(),
});
const refundUpdate = shape<Stripe.RefundUpdateParams>()({ metadata: metadata.optional() });
const refundList = shape<Stripe.RefundListParams>()({
  ...paging,
  charge: text.optional(),
  created: range.optional(),
  payment_intent: text.optional(),
});

/** The charge that took the money, by itself or by its payment intent. */
async function chargeToRefund(work: Work, params: z.output<typeof refundParams>): Promise<Kept<'charge'>> {
  if (params.charge) return readKept(work.db, 'charge', params.charge, 'charge');
  if (!params.payment_intent) {
    throw invalid('One of charge or payment_intent must be passed.', 'charge', 'parameter_missing');
  }
  const intent = await read(work.db, 'payment_intent', params.payment_intent, 'payment_intent');
  if (intent.status !== 'succeeded' || !intent.latest_charge) {
    throw invalid('This PaymentIntent does not have a successful charge to refund.', 'payment_intent');
  }
  return readKept(work.db, 'charge', intent.latest_charge);
}

function newRefund(
  charge: Kinds['charge'],
  params: z.output<typeof refundParams>,
  amount: number,
  created: number,
): Kinds['refund'] {
  return {
    id: newId('re'),
    object: 'refund',
    amount,
    balance_transaction: null,
    charge: charge.id,
    created,
    currency: charge.currency,
    customer: charge.customer,
    customer_account: null,
    destination_details: { card: { type: 'refund' }, type: 'card' },
    metadata: mergeMetadata(null, params.metadata),
    payment_intent: charge.payment_intent,
    payment_method: charge.payment_method,
    reason: params.reason ?? null,
    receipt_number: null,
    source_transfer_reversal: null,
    status: 'succeeded',
    transfer_reversal: null,
  };
}

export const paymentRoutes = [
  route('get', '/payment_intents/:id', onlyExpand, async (work, _params, { id }) =>
    read(work.db, 'payment_intent', id),
  ),

  route('get', '/payment_intents', intentList, async (work, { created, customer, ...cursors }) =>
    listOf(work.db, 'payment_intent', '/v1/payment_intents', { paging: cursors, created, equal: { customer } }),
  ),

  route('get', '/charges/:id', onlyExpand, async (work, _params, { id }) => read(work.db, 'charge', id)),

  route('get', '/charges', chargeList, async (work, { created, customer, payment_intent: intent, ...cursors }) =>
    listOf(work.db, 'charge', '/v1/charges', { paging: cursors, created, equal: { customer, payment_intent: intent } }),
  ),

  // A refund gives money back and nothing else: the subscription goes on.
  route('post', '/refunds', refundParams, async (work, params) => {
    const kept = await chargeToRefund(work, params);
    const { data: charge } = kept;
    if (!charge.paid) throw invalid('This charge has not been paid.', 'charge', 'charge_not_refundable');
    if (charge.refunded)
      throw invalid(`Charge ${charge.id} has already been refunded.`, 'charge', 'charge_already_refunded');
    const left = charge.amount_captured - charge.amount_refunded;
    const amount = params.amount ?? left;
    if (amount > left) {
      throw invalid(`Refund amount (${amount}) is greater than unrefunded amount on charge (${left}).`, 'amount');
    }
    const now = charge.customer ? await instantOf(work, await read(work.db, 'customer', charge.customer)) : work.now;
    const refund = newRefund(charge, params, amount, now);
    await create(work, 'refund', refund);
    const refunded = charge.amount_refunded + amount;
    const after = { ...charge, amount_refunded: refunded, refunded: refunded === charge.amount_captured };
    await change(work, kept, after, { event: 'charge.refunded' });
    await emit(work, 'refund.created', now, refund);
    return refund;
  }),

  route('get', '/refunds/:id', onlyExpand, async (work, _params, { id }) => read(work.db, 'refund', id)),

  route('post', '/refunds/:id', refundUpdate, async (work, params, { id }) => {
    const kept = await readKept(work.db, 'refund', id);
    const after = { ...kept.data, metadata: mergeMetadata(kept.data.metadata, params.metadata) };
    return change(work, kept, after, { event: 'refund.updated' });
  }),

  route('get', '/refunds', refundList, async (work, { charge, created, payment_intent: intent, ...cursors }) =>
    listOf(work.db, 'refund', '/v1/refunds', { paging: cursors, created, equal: { charge, payment_intent: intent } }),
  ),
];
