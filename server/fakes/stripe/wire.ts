import type { Stripe } from 'stripe';

type Resource = { object: string };
type Decimal = NonNullable<Stripe.Price['unit_amount_decimal']>;

/**
 * An object of the SDK's published types as it stands on the wire: decimals are strings, and a
 * field that may hold either an id or the object behind it holds the id.
 */
export type Wire<T> = T extends string
  ? T
  : T extends Decimal
    ? string
    : T extends Array<infer Item>
      ? Array<WireField<Item>>
      : T extends object
        ? { [Key in keyof T]: WireField<T[Key]> }
        : T;

type WireField<V> = [Extract<V, string>] extends [never] ? WireEach<V> : WireEach<Exclude<V, Resource>>;

type WireEach<V> = V extends unknown ? Wire<V> : never;

/** Every kind of object the fake keeps, by the value of its `object` field. */
export interface Kinds {
  product: Wire<Stripe.Product>;
  price: Wire<Stripe.Price>;
  customer: Wire<Stripe.Customer>;
  payment_method: Wire<Stripe.PaymentMethod>;
  coupon: Wire<Stripe.Coupon>;
  promotion_code: Wire<Stripe.PromotionCode>;
  discount: Wire<Stripe.Discount>;
  subscription: Wire<Stripe.Subscription>;
  invoice: Wire<Stripe.Invoice>;
  invoice_payment: Wire<Stripe.InvoicePayment>;
  payment_intent: Wire<Stripe.PaymentIntent>;
  charge: Wire<Stripe.Charge>;
  refund: Wire<Stripe.Refund>;
  'checkout.session': Wire<Stripe.Checkout.Session>;
  'billing_portal.session': Wire<Stripe.BillingPortal.Session>;
  'billing_portal.configuration': Wire<Stripe.BillingPortal.Configuration>;
  'test_helpers.test_clock': Wire<Stripe.TestHelpers.TestClock>;
}

export type Kind = keyof Kinds;
export type WireEvent = Wire<Stripe.EventBase>;
export type EventType = Stripe.Event['type'];

/** Any JSON object that goes out. */
export type WireObject = Kinds[Kind] | object;

export interface WireList<T> {
  object: 'list';
  data: T[];
  has_more: boolean;
  url: string;
}
