import type { Stripe } from 'stripe';
import { z } from 'zod';
import { collect } from '../billing/collect.ts';
import { finalizeInvoice, markPaid, voidInvoice } from '../billing/invoices.ts';
import { previewPeriod } from '../billing/period-invoice.ts';
import { inNextPeriod } from '../billing/renew.ts';
import { planSwitch } from '../billing/switch.ts';
import { Fault, invalid } from '../errors.ts';
import { count, emptyable, flag, mergeMetadata, metadata, paging, range, shape, text } from '../params.ts';
import { onlyExpand, route } from '../route.ts';
import { all, change, instantOf, listOf, read, readKept } from '../store.ts';

const listParams = shape<Stripe.InvoiceListParams>()({
  ...paging,
  collection_method: z.enum(['charge_automatically', 'send_invoice']).optional(),
  created: range.optional(),
  customer: text.optional(),
  status: z.enum(['draft', 'open', 'paid', 'uncollectible', 'void']).optional(),
  subscription: text.optional(),
});
const updateParams = shape<Stripe.InvoiceUpdateParams>()({
  auto_advance: flag.optional(),
  description: emptyable(text).optional(),
  metadata: metadata.optional(),
});
const payParams = shape<Stripe.InvoicePayParams>()({
  off_session: flag.optional(),
  paid_out_of_band: flag.optional(),
  payment_method: text.optional(),
});
const finalizeParams = shape<Stripe.InvoiceFinalizeInvoiceParams>()({ auto_advance: flag.optional() });
const linesParams = shape<Stripe.InvoiceListLineItemsParams>()(paging);
const previewParams = shape<Stripe.InvoiceCreatePreviewParams>()({
  customer: text.optional(),
  subscription: text,
  subscription_details: z
    .strictObject({
      items: z.array(z.strictObject({ id: text, price: text.optional(), quantity: count.optional() })).optional(),
      proration_behavior: z.enum(['always_invoice', 'create_prorations', 'none']).optional(),
      proration_date: count.optional(),
    })
    .optional(),
});
const paymentsParams = shape<Stripe.InvoicePaymentListParams>()({
  ...paging,
  created: range.optional(),
  invoice: text.optional(),
  payment: z.strictObject({ type: z.literal('payment_intent'), payment_intent: text.optional() }).optional(),
  status: z.enum(['canceled', 'open', 'paid']).optional(),
});

export const invoiceRoutes = [
  route('get', '/invoices/:id', onlyExpand, async (work, _params, { id }) => read(work.db, 'invoice', id)),

  route(
    'get',
    '/invoices',
    listParams,
    async (work, { collection_method: method, created, customer, status, subscription, ...cursors }) =>
      listOf(work.db, 'invoice', '/v1/invoices', {
        paging: cursors,
        created,
        equal: {
          collection_method: method,
          customer,
          status,
          'parent.subscription_details.subscription': subscription,
        },
      }),
  ),

  route(
    'post',
    '/invoices/create_preview',
    previewParams,
    async (work, { subscription: id, subscription_details: details }) => {
      const kept = await readKept(work.db, 'subscription', id, 'subscription');
      const now = details?.proration_date ?? (await instantOf(work, kept.data));
      const proration = details?.proration_behavior ?? 'create_prorations';
      const switched = await planSwitch(work, kept, details?.items ?? [], { proration, now });
      const hidden = { ...kept.hidden, pendingLines: switched.pendingLines };
      if (switched.invoiceNow) return previewPeriod(work, { data: switched.subscription, hidden }, switched.newPeriod);
      return previewPeriod(work, { data: inNextPeriod(switched.subscription), hidden });
    },
  ),

  route('post', '/invoices/:id', updateParams, async (work, params, { id }) => {
    const kept = await readKept(work.db, 'invoice', id);
    return change(
      work,
      kept,
      {
        ...kept.data,
        auto_advance: params.auto_advance ?? kept.data.auto_advance ?? false,
        description: params.description === undefined ? kept.data.description : params.description,
        metadata: mergeMetadata(kept.data.metadata, params.metadata),
      },
      { event: 'invoice.updated' },
    );
  }),

  route('post', '/invoices/:id/finalize', finalizeParams, async (work, _params, { id }) => {
    const invoice = await read(work.db, 'invoice', id);
    if (invoice.status !== 'draft') throw invalid('This invoice is already finalized.', 'id', 'invoice_not_editable');
    return finalizeInvoice(work, id);
  }),

  route('post', '/invoices/:id/pay', payParams, async (work, params, { id }) => {
    const found = await read(work.db, 'invoice', id);
    const invoice = found.status === 'draft' ? await finalizeInvoice(work, id) : found;
    if (invoice.status === 'paid' && found.status !== 'draft') throw invalid('Invoice is already paid', 'id');
    if (invoice.status === 'paid') return invoice;
    if (invoice.status !== 'open') throw invalid(`A ${invoice.status ?? ''} invoice cannot be paid.`, 'id');
    if (params.paid_out_of_band) {
      return markPaid(work, await readKept(work.db, 'invoice', id), { amount: 0, attempts: invoice.attempt_count });
    }
    const presence = params.off_session === false ? 'present' : 'away';
    const collected = await collect(work, id, { presence, method: params.payment_method });
    if (!collected.failure) return collected.invoice;
    throw new Fault(
      402,
      { type: 'card_error', ...collected.failure, ...(collected.intent ? { payment_intent: collected.intent } : {}) },
      { keepsState: true },
    );
  }),

  route('post', '/invoices/:id/void', onlyExpand, async (work, _params, { id }) => {
    const kept = await readKept(work.db, 'invoice', id);
    if (kept.data.status !== 'open') throw invalid('Only an open invoice can be voided.', 'id');
    return voidInvoice(work, kept);
  }),

  route('get', '/invoices/:id/lines', linesParams, async (work, { limit = 10, starting_after: after }, { id }, url) => {
    const { lines } = await read(work.db, 'invoice', id);
    const from = after ? lines.data.findIndex((line) => line.id === after) + 1 : 0;
    const data = lines.data.slice(from, from + limit);
    return { object: 'list', data, has_more: from + limit < lines.data.length, url };
  }),

  route('get', '/invoice_payments', paymentsParams, async (work, { created, invoice, payment, status, ...cursors }) =>
    listOf(work.db, 'invoice_payment', '/v1/invoice_payments', {
      paging: cursors,
      created,
      equal: { invoice, status, 'payment.payment_intent': payment?.payment_intent },
    }),
  ),

  route('get', '/invoice_payments/:id', onlyExpand, async (work, _params, { id }) =>
    read(work.db, 'invoice_payment', id),
  ),
];

/** The invoices of a customer that may still be paid, oldest first. */
export async function openInvoices(work: Parameters<typeof instantOf>[0], customer: string) {
  return (await all(work.db, 'invoice', { customer, status: 'open' })).map(({ data }) => data).reverse();
}
