import type { Stripe } from 'stripe';
import { z } from 'zod';
import { endSubscription } from '../billing/cancel.ts';
import { invalid } from '../errors.ts';
import { emit } from '../events.ts';
import { newId } from '../ids.ts';
import { emptyable, given, mergeMetadata, metadata, paging, range, shape, text, whole } from '../params.ts';
import { onlyExpand, route } from '../route.ts';
import { all, change, create, instantOf, listOf, read, readKept, remove } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';
import { attach } from './payment-methods.ts';

const email = z
  .string()
  .max(512)
  .regex(/^[^\s@]+@[^\s@]+\.[^\s@]+$/, 'must be an e-mail address');
const line = emptyable(text).optional();
const address = emptyable(
  z.strictObject({ city: line, country: line, line1: line, line2: line, postal_code: line, state: line }),
);
const invoiceSettings = z.strictObject({ default_payment_method: emptyable(text).optional(), footer: text.optional() });

const common = {
  address: address.optional(),
  balance: whole.optional(),
  description: emptyable(text).optional(),
  invoice_settings: invoiceSettings.optional(),
  metadata: metadata.optional(),
  name: emptyable(text).optional(),
  phone: emptyable(text).optional(),
  preferred_locales: z.array(text).optional(),
};

const createParams = shape<Stripe.CustomerCreateParams>()({
  ...common,
  email: email.optional(),
  payment_method: text.optional(),
  test_clock: text.optional(),
});
const updateParams = shape<Stripe.CustomerUpdateParams>()({ ...common, email: emptyable(email).optional() });
const listParams = shape<Stripe.CustomerListParams>()({
  ...paging,
  created: range.optional(),
  email: text.optional(),
  test_clock: text.optional(),
});

interface Fields {
  address?: z.output<typeof address> | undefined;
  balance?: number | undefined;
  description?: string | null | undefined;
  email?: string | null | undefined;
  name?: string | null | undefined;
  phone?: string | null | undefined;
  preferred_locales?: string[] | undefined;
}

function fieldsOf({ address: place, balance, description, email: mail, name, phone, preferred_locales }: Fields) {
  const empty = { city: null, country: null, line1: null, line2: null, postal_code: null, state: null };
  return {
    ...given({ balance, description, email: mail, name, phone, preferred_locales }),
    ...(place === undefined ? {} : { address: place && { ...empty, ...given(place) } }),
  };
}

/** A customer with nothing but what is given. */
export function newCustomer(fields: Fields & { test_clock?: string | null }, created: number): Kinds['customer'] {
  return {
    id: newId('cus', 14),
    object: 'customer',
    address: null,
    balance: 0,
    created,
    currency: null,
    customer_account: null,
    default_source: null,
    delinquent: false,
    description: null,
    email: null,
    invoice_prefix: newId('x', 8).slice(2).toUpperCase(),
    invoice_settings: { custom_fields: null, default_payment_method: null, footer: null, rendering_options: null },
    livemode: false,
    metadata: {},
    name: null,
    next_invoice_sequence: 1,
    phone: null,
    preferred_locales: [],
    shipping: null,
    tax_exempt: 'none',
    test_clock: fields.test_clock ?? null,
    ...fieldsOf(fields),
  };
}

async function settingsOf(
  work: Work,
  customer: Kinds['customer'],
  change: z.output<typeof invoiceSettings> | undefined,
) {
  const method = change?.default_payment_method;
  if (method) {
    const { customer: owner } = await read(
      work.db,
      'payment_method',
      method,
      'invoice_settings[default_payment_method]',
    );
    if (owner !== customer.id) {
      throw invalid('The payment method must be attached to the customer.', 'invoice_settings[default_payment_method]');
    }
  }
  return { ...customer.invoice_settings, ...given(change ?? {}) };
}

export const customerRoutes = [
  route('post', '/customers', createParams, async (work, params) => {
    const clock = params.test_clock ?? null;
    const created = await instantOf(work, { test_clock: clock });
    const customer = newCustomer({ ...params, test_clock: clock }, created);
    customer.metadata = mergeMetadata(null, params.metadata);
    await create(work, 'customer', customer, { event: 'customer.created' });
    const method = params.payment_method && (await attach(work, params.payment_method, customer.id)).id;
    const kept = await readKept(work.db, 'customer', customer.id);
    const settings = await settingsOf(work, customer, {
      ...params.invoice_settings,
      ...(method ? { default_payment_method: method } : {}),
    });
    return change(work, kept, { ...customer, invoice_settings: settings });
  }),

  route('get', '/customers/:id', onlyExpand, async (work, _params, { id }) => read(work.db, 'customer', id)),

  route('post', '/customers/:id', updateParams, async (work, params, { id }) => {
    const kept = await readKept(work.db, 'customer', id);
    return change(
      work,
      kept,
      {
        ...kept.data,
        ...fieldsOf(params),
        invoice_settings: await settingsOf(work, kept.data, params.invoice_settings),
        metadata: mergeMetadata(kept.data.metadata, params.metadata),
      },
      { event: 'customer.updated' },
    );
  }),

  route('delete', '/customers/:id', onlyExpand, async (work, _params, { id }) => {
    const customer = await read(work.db, 'customer', id);
    for (const kept of await all(work.db, 'subscription', { customer: id })) {
      if (kept.data.ended_at === null) await endSubscription(work, kept, 'cancellation_requested');
    }
    const now = await instantOf(work, customer);
    await remove(work.db, id);
    await emit(work, 'customer.deleted', now, customer);
    return { id, object: 'customer', deleted: true } satisfies Stripe.DeletedCustomer;
  }),

  route('get', '/customers', listParams, async (work, { created, email: mail, test_clock: clock, ...cursors }) =>
    listOf(work.db, 'customer', '/v1/customers', {
      paging: cursors,
      created,
      equal: { email: mail, test_clock: clock },
    }),
  ),
];
