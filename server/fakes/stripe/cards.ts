import { createHash } from 'node:crypto';
import { newId } from './ids.ts';
import type { Kinds } from './wire.ts';

export interface Decline {
  code: 'card_declined' | 'expired_card' | 'incorrect_cvc' | 'incorrect_number' | 'processing_error';
  decline_code?: string;
  message: string;
}

/** What a test card does: at once, when a challenge is asked, and when it is charged later without its holder. */
export interface CardBehaviour {
  decline?: Decline;
  challenge?: boolean;
  laterDecline?: Decline;
}

const DECLINED: Decline = {
  code: 'card_declined',
  decline_code: 'generic_decline',
  message: 'Your card was declined.',
};

/** Test numbers as Stripe's documentation of test cards lists them (docs.stripe.com/testing; from memory). */
const TEST_CARDS: Record<string, CardBehaviour> = {
  '4242424242424242': {},
  '4000056655665556': {},
  '5555555555554444': {},
  '2223003122003222': {},
  '378282246310005': {},
  '4000000000000002': { decline: DECLINED },
  '4000000000009995': {
    decline: {
      code: 'card_declined',
      decline_code: 'insufficient_funds',
      message: 'Your card has insufficient funds.',
    },
  },
  '4000000000000069': { decline: { code: 'expired_card', message: 'Your card has expired.' } },
  '4000000000000127': { decline: { code: 'incorrect_cvc', message: "Your card's security code is incorrect." } },
  '4000000000000119': {
    decline: {
      code: 'processing_error',
      message: 'An error occurred while processing your card. Try again in a little bit.',
    },
  },
  '4000002500003155': { challenge: true },
  '4000000000000341': { laterDecline: DECLINED },
};

/** Ready-made payment methods that the API names instead of a number. */
const TEST_METHODS: Record<string, string> = {
  pm_card_visa: '4242424242424242',
  pm_card_mastercard: '5555555555554444',
  pm_card_amex: '378282246310005',
  pm_card_chargeCustomerFail: '4000000000000341',
  pm_card_visa_chargeDeclined: '4000000000000002',
  pm_card_authenticationRequiredOnSetup: '4000002500003155',
};

export interface CardEntry {
  number: string;
  expMonth: number;
  expYear: number;
  cvc: string;
  name: string | null;
  email: string | null;
}

export function testMethodNumber(id: string): string | undefined {
  return TEST_METHODS[id];
}

/** Luhn's check digit (ISO/IEC 7812-1, annex B). */
export function passesLuhn(number: string): boolean {
  const digits = [...number].reverse().map(Number);
  const sum = digits.reduce((total, digit, i) => {
    const doubled = i % 2 === 1 ? digit * 2 : digit;
    return total + (doubled > 9 ? doubled - 9 : doubled);
  }, 0);
  return /^\d{12,19}$/.test(number) && sum % 10 === 0;
}

export function behaviourOf(number: string): CardBehaviour {
  if (!passesLuhn(number)) return { decline: { code: 'incorrect_number', message: 'Your card number is incorrect.' } };
  return (
    TEST_CARDS[number] ?? {
      decline: {
        code: 'card_declined',
        decline_code: 'test_mode_live_card',
        message: 'Your card was declined. This payment page takes test cards only.',
      },
    }
  );
}

function brandOf(number: string): string {
  if (number.startsWith('4')) return 'visa';
  return number.startsWith('3') ? 'amex' : 'mastercard';
}

/** A payment method for a card, attached to nobody yet. */
export function newCardMethod(entry: CardEntry, created: number): Kinds['payment_method'] {
  const brand = brandOf(entry.number);
  const noAddress = { city: null, country: null, line1: null, line2: null, postal_code: null, state: null };
  return {
    id: newId('pm'),
    object: 'payment_method',
    allow_redisplay: 'unspecified',
    billing_details: { address: noAddress, email: entry.email, name: entry.name, phone: null, tax_id: null },
    card: {
      brand,
      checks: { address_line1_check: null, address_postal_code_check: null, cvc_check: 'pass' },
      country: 'US',
      display_brand: brand,
      exp_month: entry.expMonth,
      exp_year: entry.expYear,
      fingerprint: createHash('sha256').update(entry.number).digest('base64url').slice(0, 16),
      funding: entry.number === '4000056655665556' ? 'debit' : 'credit',
      generated_from: null,
      last4: entry.number.slice(-4),
      networks: { available: [brand], preferred: null },
      regulated_status: 'unregulated',
      three_d_secure_usage: { supported: true },
      wallet: null,
    },
    created,
    customer: null,
    customer_account: null,
    livemode: false,
    metadata: {},
    type: 'card',
  };
}
