import type { CardBehaviour, Decline } from '../cards.ts';
import { DAY } from '../due.ts';
import { invalid } from '../errors.ts';
import { all, change, create, instantOf, read, readKept, type Kept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';
import { endAfterLastAttempt, onPaymentFailed } from './consequences.ts';
import { markPaid, subscriptionOf } from './invoices.ts';
import { newCharge } from './payment-intents.ts';

/** `present`: the customer is at the page and has answered a challenge; `away`: a renewal or a retry. */
export type Presence = 'present' | 'away';

export function declineOf(card: CardBehaviour | undefined, presence: Presence): Decline | null {
  return card?.decline ?? (presence === 'away' ? (card?.laterDecline ?? null) : null);
}

export interface Collected {
  invoice: Kinds['invoice'];
  /** Why the attempt failed; null when the invoice is paid. */
  failure: Decline | null;
  intent: Kinds['payment_intent'] | null;
}

const NO_METHOD: Decline = {
  code: 'card_declined',
  message: 'There is no default payment method set on this customer or subscription.',
};

async function methodFor(work: Work, invoice: Kinds['invoice'], chosen: string | undefined) {
  const subscription = await subscriptionOf(work, invoice);
  const customer = await read(work.db, 'customer', invoice.customer ?? '');
  const id =
    chosen ??
    invoice.default_payment_method ??
    subscription?.default_payment_method ??
    customer.invoice_settings.default_payment_method;
  return id ? readKept(work.db, 'payment_method', id, 'payment_method') : undefined;
}

async function defaultPayment(work: Work, invoice: Kinds['invoice']): Promise<Kept<'invoice_payment'>> {
  const [payment] = await all(work.db, 'invoice_payment', { invoice: invoice.id, status: 'open' });
  if (!payment) throw invalid('This invoice has no open payment.', 'invoice');
  return payment;
}

/** Tries once to collect an open invoice; a failure is recorded, planned again and has its consequences. */
export async function collect(
  work: Work,
  invoiceId: string,
  { presence, method: chosen }: { presence: Presence; method?: string | undefined },
): Promise<Collected> {
  const kept = await readKept(work.db, 'invoice', invoiceId);
  if (kept.data.status === 'paid') return { invoice: kept.data, failure: null, intent: null };
  const payment = await defaultPayment(work, kept.data);
  const intent = await readKept(work.db, 'payment_intent', payment.data.payment.payment_intent ?? '');
  const now = await instantOf(work, kept.data);

  const method = await methodFor(work, kept.data, chosen);
  const failure = method ? declineOf(method.hidden.card, presence) : NO_METHOD;
  const charge = method
    ? newCharge({
        intent: intent.data,
        method: method.data,
        now,
        receiptUrl: `${work.origin}/invoices/${invoiceId}`,
        failure,
      })
    : null;
  if (charge) await create(work, 'charge', charge, { event: failure ? 'charge.failed' : 'charge.succeeded' });

  if (failure) {
    const failed = await failIntent(work, intent, { failure, method: method?.data, charge: charge?.id });
    const invoice = await planRetry(work, kept, now);
    return { invoice, failure, intent: failed };
  }

  const paidIntent = await change(
    work,
    intent,
    {
      ...intent.data,
      amount_received: intent.data.amount,
      last_payment_error: null,
      latest_charge: charge?.id ?? null,
      payment_method: method?.data.id ?? null,
      status: 'succeeded',
    },
    { event: 'payment_intent.succeeded' },
  );
  await change(
    work,
    payment,
    {
      ...payment.data,
      amount_paid: intent.data.amount,
      status: 'paid',
      status_transitions: { canceled_at: null, paid_at: now },
    },
    { event: 'invoice_payment.paid' },
  );
  const invoice = await markPaid(work, kept, { amount: intent.data.amount, attempts: kept.data.attempt_count + 1 });
  return { invoice, failure: null, intent: paidIntent };
}

interface Failed {
  failure: Decline;
  method: Kinds['payment_method'] | undefined;
  charge: string | undefined;
}

async function failIntent(work: Work, intent: Kept<'payment_intent'>, { failure, method, charge }: Failed) {
  return change(
    work,
    intent,
    {
      ...intent.data,
      last_payment_error: {
        ...failure,
        ...(charge ? { charge } : {}),
        ...(method ? { payment_method: method } : {}),
        type: 'card_error',
      },
      latest_charge: charge ?? intent.data.latest_charge,
      payment_method: null,
      status: 'requires_payment_method',
    },
    { event: 'payment_intent.payment_failed' },
  );
}

async function planRetry(work: Work, kept: Kept<'invoice'>, now: number): Promise<Kinds['invoice']> {
  const attempts = kept.data.attempt_count + 1;
  const days = kept.data.auto_advance ? work.dunning.retryDays[attempts - 1] : undefined;
  const isFirst = kept.data.billing_reason === 'subscription_create';
  const next = days === undefined || isFirst ? null : now + days * DAY;
  const invoice = await change(
    work,
    kept,
    { ...kept.data, attempt_count: attempts, attempted: true, next_payment_attempt: next },
    { event: 'invoice.payment_failed' },
  );
  await onPaymentFailed(work, invoice);
  if (next === null && !isFirst && kept.data.auto_advance) await endAfterLastAttempt(work, invoice);
  return invoice;
}
