import type { Stripe } from 'stripe';
import { z } from 'zod';
import { behaviourOf, newCardMethod, testMethodNumber } from '../cards.ts';
import { Fault, invalid } from '../errors.ts';
import { count, mergeMetadata, metadata, paging, shape, text } from '../params.ts';
import { onlyExpand, route } from '../route.ts';
import { all, change, create, instantOf, listOf, read, readKept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';

const createParams = shape<Stripe.PaymentMethodCreateParams>()({
  type: z.literal('card', 'the fake takes cards only'),
  card: z.strictObject({ number: text, exp_month: count, exp_year: count, cvc: text.optional() }),
  billing_details: z.strictObject({ name: text.optional(), email: text.optional() }).optional(),
  metadata: metadata.optional(),
});
const attachParams = shape<Stripe.PaymentMethodAttachParams>()({ customer: text });
const updateParams = shape<Stripe.PaymentMethodUpdateParams>()({ metadata: metadata.optional() });
const listParams = shape<Stripe.PaymentMethodListParams>()({
  ...paging,
  customer: text.optional(),
  type: z.literal('card').optional(),
});
const ofCustomerParams = shape<Stripe.CustomerListPaymentMethodsParams>()({
  ...paging,
  type: z.literal('card').optional(),
});

/** The payment method behind an id; a ready-made test id makes a new one. */
async function methodNamed(work: Work, id: string, now: number): Promise<string> {
  const number = testMethodNumber(id);
  if (!number) return id;
  const entry = {
    number,
    expMonth: 12,
    expYear: new Date(now * 1000).getUTCFullYear() + 5,
    cvc: '123',
    name: null,
    email: null,
  };
  const method = newCardMethod(entry, now);
  await create(work, 'payment_method', method, { hidden: { card: behaviourOf(number) } });
  return method.id;
}

/** Attaches a card to a customer; a card that declines at once cannot be attached. */
export async function attach(work: Work, id: string, customer: string): Promise<Kinds['payment_method']> {
  const now = await instantOf(work, await read(work.db, 'customer', customer, 'customer'));
  const kept = await readKept(work.db, 'payment_method', await methodNamed(work, id, now));
  if (kept.data.customer === customer) return kept.data;
  if (kept.data.customer !== null) {
    throw invalid('The payment method you provided has already been attached to a customer.', 'payment_method');
  }
  const { decline } = kept.hidden.card ?? {};
  if (decline) throw new Fault(402, { type: 'card_error', ...decline });
  return change(work, kept, { ...kept.data, customer }, { event: 'payment_method.attached' });
}

/** Nothing is charged to a card that was taken away. */
async function forget(work: Work, { id, customer }: Kinds['payment_method']): Promise<void> {
  if (customer === null) return;
  const owner = await readKept(work.db, 'customer', customer);
  if (owner.data.invoice_settings.default_payment_method === id) {
    const settings = { ...owner.data.invoice_settings, default_payment_method: null };
    await change(work, owner, { ...owner.data, invoice_settings: settings }, { event: 'customer.updated' });
  }
  for (const kept of await all(work.db, 'subscription', { customer, default_payment_method: id })) {
    await change(
      work,
      kept,
      { ...kept.data, default_payment_method: null },
      { event: 'customer.subscription.updated' },
    );
  }
}

export const paymentMethodRoutes = [
  route('post', '/payment_methods', createParams, async (work, { card, billing_details: billing, metadata: data }) => {
    const entry = {
      number: card.number.replaceAll(/\s/g, ''),
      expMonth: card.exp_month,
      expYear: card.exp_year,
      cvc: card.cvc ?? '',
    };
    const method = newCardMethod({ ...entry, name: billing?.name ?? null, email: billing?.email ?? null }, work.now);
    const behaviour = behaviourOf(entry.number);
    if (behaviour.decline?.code === 'incorrect_number')
      throw new Fault(402, { type: 'card_error', ...behaviour.decline });
    const kept = { ...method, metadata: mergeMetadata(null, data) };
    return create(work, 'payment_method', kept, { hidden: { card: behaviour } });
  }),

  route('get', '/payment_methods/:id', onlyExpand, async (work, _params, { id }) =>
    read(work.db, 'payment_method', id),
  ),

  route('post', '/payment_methods/:id', updateParams, async (work, params, { id }) => {
    const kept = await readKept(work.db, 'payment_method', id);
    const after = { ...kept.data, metadata: mergeMetadata(kept.data.metadata, params.metadata) };
    return change(work, kept, after, { event: 'payment_method.updated' });
  }),

  route('post', '/payment_methods/:id/attach', attachParams, async (work, { customer }, { id }) =>
    attach(work, id, customer),
  ),

  route('post', '/payment_methods/:id/detach', onlyExpand, async (work, _params, { id }) => {
    const kept = await readKept(work.db, 'payment_method', id);
    await forget(work, kept.data);
    return change(work, kept, { ...kept.data, customer: null }, { event: 'payment_method.detached' });
  }),

  route('get', '/payment_methods', listParams, async (work, { customer, type, ...cursors }) =>
    listOf(work.db, 'payment_method', '/v1/payment_methods', { paging: cursors, equal: { customer, type } }),
  ),

  route('get', '/customers/:id/payment_methods', ofCustomerParams, async (work, { type, ...cursors }, { id }, url) => {
    await read(work.db, 'customer', id, 'customer');
    return listOf(work.db, 'payment_method', url, { paging: cursors, equal: { customer: id, type } });
  }),
];
