import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import {
  CARDS,
  join,
  makeClockedCustomer,
  makePrice,
  makeSession,
  seconds,
  startBench,
  submit,
  type Bench,
} from './stripe-bench.ts';
import { openWireContract, type Claim, type WireContract } from './wire-contract.ts';

// Source: Stripe's published types, npm package stripe 23.1.0 (API 2026-10-28.endive), read by the TypeScript compiler.
const TYPES: Record<string, string> = {
  'billing_portal.configuration': 'Stripe.BillingPortal.Configuration',
  'billing_portal.session': 'Stripe.BillingPortal.Session',
  charge: 'Stripe.Charge',
  'checkout.session': 'Stripe.Checkout.Session',
  coupon: 'Stripe.Coupon',
  customer: 'Stripe.Customer',
  discount: 'Stripe.Discount',
  event: 'Stripe.EventBase',
  invoice: 'Stripe.Invoice',
  invoice_payment: 'Stripe.InvoicePayment',
  item: 'Stripe.LineItem',
  line_item: 'Stripe.InvoiceLineItem',
  payment_intent: 'Stripe.PaymentIntent',
  payment_method: 'Stripe.PaymentMethod',
  plan: 'Stripe.Plan',
  price: 'Stripe.Price',
  product: 'Stripe.Product',
  promotion_code: 'Stripe.PromotionCode',
  refund: 'Stripe.Refund',
  subscription: 'Stripe.Subscription',
  subscription_item: 'Stripe.SubscriptionItem',
  'test_helpers.test_clock': 'Stripe.TestHelpers.TestClock',
};
const DELETED: Record<string, string> = {
  coupon: 'Stripe.DeletedCoupon',
  customer: 'Stripe.DeletedCustomer',
  product: 'Stripe.DeletedProduct',
  'test_helpers.test_clock': 'Stripe.TestHelpers.DeletedTestClock',
};

let bench: Bench;
let contract: WireContract;

beforeAll(async () => {
  bench = await startBench();
  contract = openWireContract();
});
afterAll(async () => {
  contract.close();
  await bench.close();
});

async function wire(path: string, method: 'GET' | 'POST' | 'DELETE' = 'GET', body?: string): Promise<unknown> {
  const headers = { authorization: 'Bearer sk_test_contract', 'content-type': 'application/x-www-form-urlencoded' };
  const response = await fetch(`${bench.fake.origin}/v1${path}`, { method, headers, ...(body ? { body } : {}) });
  return response.json();
}

/** Every object in an answer, at whatever depth, with the type its `object` field names. */
function claimsIn(value: unknown): Claim[] {
  if (Array.isArray(value)) return value.flatMap(claimsIn);
  if (typeof value !== 'object' || value === null) return [];
  const fields = value as Record<string, unknown>;
  const inner = Object.values(fields).flatMap(claimsIn);
  const kind = fields.object;
  if (typeof kind !== 'string' || kind === 'list') return inner;
  const type = fields.deleted === true ? DELETED[kind] : TYPES[kind];
  if (!type) throw new Error(`The contract names no type for '${kind}'.`);
  return [{ type, value }, ...inner];
}

/** Goes through the life of memberships, so that every kind of object is there in several states. */
async function live(): Promise<unknown[]> {
  const { stripe } = bench;
  const price = await makePrice(stripe);
  const coupon = await stripe.coupons.create({ percent_off: 10, duration: 'repeating', duration_in_months: 3 });
  await stripe.promotionCodes.create({ promotion: { type: 'coupon', coupon: coupon.id }, code: 'TEN' });
  const session = await makeSession(stripe, price, { allow_promotion_codes: true });
  await submit(session.url, CARDS.pays, { promotionCode: 'TEN' });
  await makeSession(stripe, price, {
    customer_email: 'open@demo.example',
    custom_text: { submit: { message: 'Terms.' } },
  });
  const failing = await join(bench, price, CARDS.failsLater);
  const { clock, customer } = await makeClockedCustomer(stripe, '2026-01-31T00:00:00Z');
  const trial = await stripe.subscriptions.create({ customer, items: [{ price: price.id }], trial_period_days: 5 });
  await bench.control('/advance', { test_clock: clock, to: seconds('2026-03-10T00:00:00Z') });
  await bench.control('/clock', { by: 32 * 86_400 });
  const yearly = await makePrice(stripe, { amount: 4000, interval: 'year' });
  const items = [{ id: trial.items.data[0]?.id ?? '', price: yearly.id }];
  await stripe.subscriptions.update(trial.id, { items, cancel_at_period_end: true });
  const charges = await stripe.charges.list();
  await stripe.refunds.create({
    charge: charges.data.find(({ paid }) => paid)?.id ?? '',
    reason: 'requested_by_customer',
  });
  await stripe.billingPortal.configurations.create({ features: { invoice_history: { enabled: true } } });

  const unused = await stripe.products.create({ name: 'Unused' });
  const other = await stripe.coupons.create({ amount_off: 100, currency: 'gbp' });
  return [
    await wire(`/billing_portal/sessions`, 'POST', `customer=${customer}&return_url=http://127.0.0.1:9/`),
    await wire('/invoices/create_preview', 'POST', `subscription=${failing.id}`),
    await wire(`/products/${unused.id}`, 'DELETE'),
    await wire(`/coupons/${other.id}`, 'DELETE'),
    await wire(`/customers/${failing.customer as string}`, 'DELETE'),
  ];
}

const LISTS = [
  '/products?expand[0]=data.default_price',
  '/prices?expand[0]=data.product',
  '/coupons',
  '/promotion_codes?expand[0]=data.promotion.coupon',
  '/customers?expand[0]=data.invoice_settings.default_payment_method&expand[1]=data.subscriptions',
  '/payment_methods',
  '/subscriptions?status=all&expand[0]=data.customer&expand[1]=data.latest_invoice.payments&expand[2]=data.discounts',
  '/invoices?expand[0]=data.payments&expand[1]=data.parent.subscription_details.subscription',
  '/invoice_payments?expand[0]=data.payment.payment_intent',
  '/payment_intents?expand[0]=data.latest_charge',
  '/charges?expand[0]=data.refunds',
  '/refunds?expand[0]=data.charge',
  '/checkout/sessions?expand[0]=data.line_items&expand[1]=data.subscription',
  '/billing_portal/configurations',
  '/test_helpers/test_clocks',
  '/events?limit=100',
];

describe("the wire against Stripe's published types", () => {
  it('is of its type in every object of every kind, events included', async () => {
    const made = await live();
    const listed = await Promise.all(LISTS.map(async (path) => wire(path)));
    for (const list of listed)
      expect(list).toMatchObject({ object: 'list', url: expect.stringMatching(/^\/v1\//) as string });
    const clock = await bench.stripe.testHelpers.testClocks.list();
    made.push(await wire(`/test_helpers/test_clocks/${clock.data[0]?.id ?? ''}`, 'DELETE'));

    const claims = claimsIn([...made, ...listed]);
    const findings = new Set(contract.check(claims).flat());
    expect([...findings]).toEqual([]);
    const covered = new Set(claims.map(({ type }) => type));
    expect([...covered].sort()).toEqual([...Object.values(TYPES), ...Object.values(DELETED)].sort());
  }, 60_000);

  it('is found out when a field is missing, unknown, of a wrong enum, or a decimal is no string', async () => {
    const price = await makePrice(bench.stripe);
    const good = (await wire(`/prices/${price.id}`)) as Record<string, unknown>;
    const { currency: _currency, ...without } = good;
    const type = 'Stripe.Price';
    const [fine, ...wrong] = contract.check([
      { type, value: good },
      { type, value: without },
      { type, value: { ...good, amount: 500 } },
      { type, value: { ...good, type: 'sometimes' } },
      { type, value: { ...good, unit_amount_decimal: 500 } },
      { type, value: { ...good, recurring: { ...(good.recurring as object), interval: 'fortnight' } } },
    ]);

    expect(fine).toEqual([]);
    expect(wrong[0]?.join()).toContain("'currency'");
    expect(wrong[1]?.join()).toContain(`'"amount"' does not exist`);
    expect(wrong[2]?.join()).toContain('"sometimes"');
    expect(wrong[3]?.join()).toContain("'number' is not assignable");
    expect(wrong[4]?.join()).toContain('"fortnight"');
  }, 60_000);
});
