import type { Stripe } from 'stripe';
import type { PendingLine } from '../hidden.ts';
import { newId } from '../ids.ts';
import { formatMoney } from '../money.ts';
import type { Kinds, Wire } from '../wire.ts';

export type Line = Wire<Stripe.InvoiceLineItem>;

interface LineSource {
  amount: number;
  currency: string;
  description: string;
  price: string;
  product: string;
  unitAmount: number | null;
  quantity: number;
  period: { start: number; end: number };
  subscription: string;
  subscriptionItem: string;
  proration: boolean;
  metadata: Record<string, string>;
}

function newLine(source: LineSource): Line {
  return {
    id: newId('il'),
    object: 'line_item',
    amount: source.amount,
    currency: source.currency,
    description: source.description,
    discount_amounts: [],
    discountable: !source.proration,
    discounts: [],
    invoice: null,
    livemode: false,
    metadata: source.metadata,
    parent: {
      invoice_item_details: null,
      subscription_item_details: {
        invoice_item: null,
        proration: source.proration,
        proration_details: source.proration ? { credited_items: null } : null,
        subscription: source.subscription,
        subscription_item: source.subscriptionItem,
      },
      type: 'subscription_item_details',
    },
    period: source.period,
    pretax_credit_amounts: [],
    pricing: {
      price_details: { price: source.price, product: source.product },
      type: 'price_details',
      unit_amount_decimal: source.unitAmount === null ? null : String(source.unitAmount),
    },
    quantity: source.quantity,
    quantity_decimal: String(source.quantity),
    subscription: source.subscription,
    subtotal: source.amount,
    taxes: [],
  };
}

interface ItemOfPeriod {
  subscription: Kinds['subscription'];
  item: Kinds['subscription']['items']['data'][number];
  productName: string;
  period: { start: number; end: number };
  /** A period that costs nothing, such as a trial. */
  free: boolean;
}

/** The line for one item over one period. */
export function itemLine({ subscription, item, productName, period, free }: ItemOfPeriod): Line {
  const quantity = item.quantity ?? 1;
  const { price } = item;
  const each = formatMoney(price.unit_amount ?? 0, price.currency);
  return newLine({
    amount: free ? 0 : (price.unit_amount ?? 0) * quantity,
    currency: subscription.currency,
    description: free
      ? `Trial period for ${productName}`
      : `${quantity} × ${productName} (at ${each} / ${price.recurring?.interval ?? 'once'})`,
    price: price.id,
    product: price.product,
    unitAmount: free ? 0 : price.unit_amount,
    quantity,
    period,
    subscription: subscription.id,
    subscriptionItem: item.id,
    proration: false,
    metadata: subscription.metadata,
  });
}

/** The line for a charge or credit that was waiting for this invoice. */
export function pendingLine(subscription: Kinds['subscription'], pending: PendingLine): Line {
  return newLine({
    ...pending,
    currency: subscription.currency,
    subscription: subscription.id,
    proration: true,
    metadata: subscription.metadata,
  });
}
