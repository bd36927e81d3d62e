import type { PaymentInterval, SubscriptionState } from '../../shared/contracts/membership.ts';
import type { Currency } from '../../shared/contracts/imprint.ts';

/** What the payment service last said of a person's subscription. */
export interface MembershipRow {
  person_id: string;
  tier_id: string;
  stripe_subscription: string;
  state: SubscriptionState;
  payment_interval: PaymentInterval;
  price: number;
  currency: Currency;
  period_end: Date;
  paid_until: Date | null;
  ends_at: Date | null;
  past_due_since: Date | null;
  converged_at: Date;
}

export interface CustomerRow {
  person_id: string;
  stripe_customer: string;
}

export interface ReceiptRow {
  stripe_invoice: string;
  person_id: string;
  number: string;
  amount: number;
  currency: Currency;
  tier_name: string;
  href: string | null;
  paid_at: Date;
}

declare module 'knex/types/tables.js' {
  interface Tables {
    memberships: MembershipRow;
    customers: CustomerRow;
    receipts: ReceiptRow;
  }
}
