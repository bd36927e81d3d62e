import { newId } from '../ids.ts';
import { create } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';

/** The payment intent that collects an invoice; it waits for a payment method. */
export async function newPaymentIntent(
  work: Work,
  invoice: Kinds['invoice'],
  now: number,
): Promise<Kinds['payment_intent']> {
  const id = newId('pi');
  return create(
    work,
    'payment_intent',
    {
      id,
      object: 'payment_intent',
      allowed_payment_method_types: null,
      amount: invoice.amount_due,
      amount_capturable: 0,
      amount_details: { tip: {} },
      amount_received: 0,
      application: null,
      application_fee_amount: null,
      automatic_payment_methods: null,
      canceled_at: null,
      cancellation_reason: null,
      capture_method: 'automatic',
      client_secret: newId(`${id}_secret`),
      confirmation_method: 'automatic',
      created: now,
      currency: invoice.currency,
      customer: invoice.customer,
      customer_account: null,
      description: invoice.billing_reason === 'subscription_create' ? 'Subscription creation' : 'Subscription update',
      excluded_payment_method_types: null,
      last_payment_error: null,
      latest_charge: null,
      livemode: false,
      managed_payments: null,
      metadata: {},
      next_action: null,
      on_behalf_of: null,
      payment_method: null,
      payment_method_configuration_details: null,
      payment_method_options: null,
      payment_method_types: ['card'],
      payment_record: null,
      processing: null,
      receipt_email: null,
      review: null,
      setup_future_usage: 'off_session',
      shipping: null,
      source: null,
      statement_descriptor: null,
      statement_descriptor_suffix: null,
      status: 'requires_payment_method',
      transfer_data: null,
      transfer_group: null,
    },
    { event: 'payment_intent.created' },
  );
}

interface ChargeSource {
  intent: Kinds['payment_intent'];
  method: Kinds['payment_method'];
  now: number;
  receiptUrl: string;
  failure: { code: string; decline_code?: string; message: string } | null;
}

/** One attempt to take money from a card, done or declined. */
export function newCharge({ intent, method, now, receiptUrl, failure }: ChargeSource): Kinds['charge'] {
  const card = method.card;
  return {
    id: newId('ch'),
    object: 'charge',
    amount: intent.amount,
    amount_captured: failure ? 0 : intent.amount,
    amount_refunded: 0,
    application: null,
    application_fee: null,
    application_fee_amount: null,
    balance_transaction: null,
    billing_details: method.billing_details,
    calculated_statement_descriptor: 'PAYMENT TEST',
    captured: !failure,
    created: now,
    currency: intent.currency,
    customer: intent.customer,
    description: intent.description,
    disputed: false,
    failure_balance_transaction: null,
    failure_code: failure?.code ?? null,
    failure_message: failure?.message ?? null,
    fraud_details: {},
    livemode: false,
    metadata: {},
    on_behalf_of: null,
    outcome: {
      advice_code: null,
      network_advice_code: null,
      network_decline_code: null,
      network_status: failure ? 'declined_by_network' : 'approved_by_network',
      reason: failure ? (failure.decline_code ?? failure.code) : null,
      seller_message: failure ? failure.message : 'Payment complete.',
      type: failure ? 'issuer_declined' : 'authorized',
    },
    paid: !failure,
    payment_intent: intent.id,
    payment_method: method.id,
    payment_method_details: {
      card: {
        amount_authorized: failure ? null : intent.amount,
        authorization_code: null,
        brand: card?.brand ?? null,
        checks: { address_line1_check: null, address_postal_code_check: null, cvc_check: 'pass' },
        country: card?.country ?? null,
        electronic_commerce_indicator: null,
        exp_month: card?.exp_month ?? 1,
        exp_year: card?.exp_year ?? 2099,
        fingerprint: card?.fingerprint ?? null,
        funding: card?.funding ?? null,
        installments: null,
        last4: card?.last4 ?? null,
        mandate: null,
        network: card?.brand ?? null,
        network_transaction_id: null,
        regulated_status: 'unregulated',
        three_d_secure: null,
        transaction_link_id: null,
        wallet: null,
      },
      type: 'card',
    },
    receipt_email: null,
    receipt_number: null,
    receipt_url: failure ? null : receiptUrl,
    refunded: false,
    review: null,
    shipping: null,
    source: null,
    source_transfer: null,
    statement_descriptor: null,
    statement_descriptor_suffix: null,
    status: failure ? 'failed' : 'succeeded',
    transfer_data: null,
    transfer_group: null,
  };
}
