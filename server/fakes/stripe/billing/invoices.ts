import { emit } from '../events.ts';
import { newId } from '../ids.ts';
import { change, create, instantOf, read, readKept, type Kept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';
import { onInvoicePaid } from './consequences.ts';
import { discountLines } from './discounts.ts';
import type { Line } from './lines.ts';
import { newPaymentIntent } from './payment-intents.ts';

/** A renewal's invoice stays a draft for an hour before it is finalised and charged. */
const DRAFT_LIFE = 3600;

export interface InvoiceSource {
  customer: Kinds['customer'];
  subscription: Kinds['subscription'];
  lines: Line[];
  discounts: { id: string; coupon: Kinds['coupon'] }[];
  reason: 'subscription_create' | 'subscription_cycle' | 'subscription_update' | 'upcoming';
  period: { start: number; end: number };
  now: number;
}

/** A draft of what a subscription owes, kept nowhere yet. */
export function composeInvoice(source: InvoiceSource): Kinds['invoice'] {
  const { customer, subscription, reason, period, now } = source;
  const id = newId(reason === 'upcoming' ? 'upcoming_in' : 'in');
  const { lines, applied } = discountLines(source.lines, source.discounts);
  const subtotal = lines.reduce((sum, line) => sum + line.amount, 0);
  const total = subtotal - applied.reduce((sum, { amount }) => sum + amount, 0);
  const due = Math.max(0, total);
  return {
    id,
    object: 'invoice',
    account_country: 'GB',
    account_name: 'Payment test account',
    account_tax_ids: null,
    amount_due: due,
    amount_overpaid: 0,
    amount_paid: 0,
    amount_remaining: due,
    amount_shipping: 0,
    application: null,
    attempt_count: 0,
    attempted: false,
    auto_advance: true,
    automatic_tax: { disabled_reason: null, enabled: false, liability: null, provider: null, status: null },
    automatically_finalizes_at: now + DRAFT_LIFE,
    billing_reason: reason,
    collection_method: 'charge_automatically',
    created: now,
    currency: subscription.currency,
    custom_fields: null,
    customer: customer.id,
    customer_account: null,
    customer_address: customer.address ?? null,
    customer_email: customer.email,
    customer_name: customer.name ?? null,
    customer_phone: customer.phone ?? null,
    customer_shipping: null,
    customer_tax_exempt: 'none',
    customer_tax_ids: [],
    default_payment_method: null,
    default_source: null,
    default_tax_rates: [],
    description: null,
    discounts: source.discounts.map((discount) => discount.id),
    due_date: null,
    effective_at: null,
    ending_balance: null,
    footer: null,
    from_invoice: null,
    hosted_invoice_url: null,
    invoice_pdf: null,
    issuer: { type: 'self' },
    last_finalization_error: null,
    latest_revision: null,
    lines: {
      object: 'list',
      data: lines.map((line) => ({ ...line, invoice: id })),
      has_more: false,
      url: `/v1/invoices/${id}/lines`,
    },
    livemode: false,
    metadata: {},
    next_payment_attempt: reason === 'upcoming' ? period.end + DRAFT_LIFE : now + DRAFT_LIFE,
    number: null,
    on_behalf_of: null,
    parent: {
      quote_details: null,
      subscription_details: { metadata: subscription.metadata, subscription: subscription.id },
      type: 'subscription_details',
    },
    payment_settings: { default_mandate: null, payment_method_options: null, payment_method_types: null },
    period_end: period.end,
    period_start: period.start,
    post_payment_credit_notes_amount: 0,
    pre_payment_credit_notes_amount: 0,
    receipt_number: null,
    rendering: null,
    shipping_cost: null,
    shipping_details: null,
    starting_balance: customer.balance,
    statement_descriptor: null,
    status: 'draft',
    status_transitions: { finalized_at: null, marked_uncollectible_at: null, paid_at: null, voided_at: null },
    subtotal,
    subtotal_excluding_tax: subtotal,
    test_clock: customer.test_clock ?? null,
    total,
    total_discount_amounts: applied,
    total_excluding_tax: total,
    total_pretax_credit_amounts: [],
    total_taxes: [],
    webhooks_delivered_at: now,
  };
}

/** Keeps an invoice as a draft. */
export async function draftInvoice(work: Work, source: InvoiceSource): Promise<Kinds['invoice']> {
  return create(work, 'invoice', composeInvoice(source), { event: 'invoice.created' });
}

interface Settlement {
  due: number;
  endingBalance: number;
}

/** What is left to pay when the customer's credit (a negative balance) is used, and what credit is left. */
function settle(total: number, balance: number): Settlement {
  if (total < 0) return { due: 0, endingBalance: balance + total };
  const credit = Math.min(Math.max(0, -balance), total);
  return { due: total - credit, endingBalance: balance + credit };
}

/** Gives a draft its number, makes it payable, and marks it paid at once when nothing is due. */
export async function finalizeInvoice(work: Work, id: string): Promise<Kinds['invoice']> {
  const kept = await readKept(work.db, 'invoice', id);
  const draft = kept.data;
  const customer = await readKept(work.db, 'customer', draft.customer ?? '');
  const now = await instantOf(work, draft);
  const { due, endingBalance } = settle(draft.total, customer.data.balance);
  const sequence = customer.data.next_invoice_sequence ?? 1;

  await change(
    work,
    customer,
    { ...customer.data, balance: endingBalance, next_invoice_sequence: sequence + 1, currency: draft.currency },
    { event: 'customer.updated' },
  );
  const open = await change(
    work,
    kept,
    {
      ...draft,
      amount_due: due,
      amount_remaining: due,
      automatically_finalizes_at: null,
      effective_at: now,
      ending_balance: endingBalance,
      hosted_invoice_url: `${work.origin}/invoices/${id}`,
      invoice_pdf: `${work.origin}/invoices/${id}/pdf`,
      number: `${customer.data.invoice_prefix ?? 'TEST'}-${String(sequence).padStart(4, '0')}`,
      starting_balance: customer.data.balance,
      status: 'open',
      status_transitions: { ...draft.status_transitions, finalized_at: now },
    },
    { event: 'invoice.finalized' },
  );
  if (due === 0) return markPaid(work, { data: open, hidden: kept.hidden }, { amount: 0, attempts: 0 });
  await create(work, 'invoice_payment', newInvoicePayment(open, (await newPaymentIntent(work, open, now)).id, now));
  return open;
}

function newInvoicePayment(invoice: Kinds['invoice'], intent: string, now: number): Kinds['invoice_payment'] {
  return {
    id: newId('inpay'),
    object: 'invoice_payment',
    amount_paid: null,
    amount_requested: invoice.amount_due,
    created: now,
    currency: invoice.currency,
    invoice: invoice.id,
    is_default: true,
    livemode: false,
    payment: { payment_intent: intent, type: 'payment_intent' },
    status: 'open',
    status_transitions: { canceled_at: null, paid_at: null },
  };
}

/** Marks an open invoice paid with `amount` minor units received at the given attempt. */
export async function markPaid(
  work: Work,
  kept: Kept<'invoice'>,
  { amount, attempts }: { amount: number; attempts: number },
): Promise<Kinds['invoice']> {
  const now = await instantOf(work, kept.data);
  const paid = await change(
    work,
    kept,
    {
      ...kept.data,
      amount_paid: amount,
      amount_remaining: 0,
      attempt_count: attempts,
      attempted: true,
      next_payment_attempt: null,
      status: 'paid',
      status_transitions: { ...kept.data.status_transitions, paid_at: now },
    },
    { event: 'invoice.paid' },
  );
  await emit(work, 'invoice.payment_succeeded', now, paid);
  await onInvoicePaid(work, paid);
  return paid;
}

/** Makes an open or draft invoice void: it is owed no longer. */
export async function voidInvoice(work: Work, kept: Kept<'invoice'>): Promise<Kinds['invoice']> {
  const now = await instantOf(work, kept.data);
  const transitions = { ...kept.data.status_transitions, voided_at: now };
  const after = {
    ...kept.data,
    auto_advance: false,
    next_payment_attempt: null,
    status: 'void',
    status_transitions: transitions,
  };
  return change(work, kept, after satisfies Kinds['invoice'], { event: 'invoice.voided' });
}

/** The subscription an invoice is for. */
export async function subscriptionOf(
  work: Work,
  invoice: Kinds['invoice'],
): Promise<Kinds['subscription'] | undefined> {
  const id = invoice.parent?.subscription_details?.subscription;
  return id === undefined ? undefined : read(work.db, 'subscription', id);
}
