import type { Stripe } from 'stripe';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { periodEnd } from '../../../server/fakes/stripe/calendar.ts';
import {
  CARDS,
  eventually,
  join,
  makeClockedCustomer,
  makePrice,
  periodOf,
  postForm,
  seconds,
  startBench,
  type Bench,
} from './stripe-bench.ts';

let bench: Bench;
let stripe: Stripe;

beforeAll(async () => {
  bench = await startBench();
  stripe = bench.stripe;
});
afterAll(async () => bench.close());

const DAY = 86_400;

async function advance(clock: string, to: string): Promise<void> {
  await bench.control('/advance', { test_clock: clock, to: seconds(to) });
}

async function subscribe(start: string, more: Partial<Stripe.SubscriptionCreateParams> = {}, card?: string) {
  const price = await makePrice(stripe);
  const { clock, customer } = await makeClockedCustomer(stripe, start, card);
  const subscription = await stripe.subscriptions.create({ customer, items: [{ price: price.id }], ...more });
  return { clock, customer, price, id: subscription.id, subscription };
}

async function reasonsAndStatuses(subscription: string): Promise<string[]> {
  const { data } = await stripe.invoices.list({ subscription });
  return data.reverse().map(({ billing_reason: reason, status }) => `${reason ?? ''} ${status ?? ''}`);
}

// Stripe's rule (docs.stripe.com/billing/subscriptions/billing-cycle): an anchor on the 31st bills on the last day of a shorter month.
describe('the calendar', () => {
  it.each([
    { anchor: '2026-01-31T10:00:00Z', ends: ['2026-02-28', '2026-03-31', '2026-04-30', '2026-05-31'], unit: 'month' },
    { anchor: '2028-01-30T10:00:00Z', ends: ['2028-02-29', '2028-03-30'], unit: 'month' },
    { anchor: '2028-02-29T10:00:00Z', ends: ['2029-02-28', '2030-02-28', '2031-02-28', '2032-02-29'], unit: 'year' },
    { anchor: '2026-12-31T10:00:00Z', ends: ['2027-01-07', '2027-01-14'], unit: 'week' },
  ] as const)('bills an anchor of $anchor by the $unit on $ends', ({ anchor, ends, unit }) => {
    const seen: number[] = [];
    for (const _end of ends) seen.push(periodEnd(seconds(anchor), seen.at(-1) ?? seconds(anchor), { unit, count: 1 }));
    expect(seen.map((end) => new Date(end * 1000).toISOString())).toEqual(ends.map((day) => `${day}T10:00:00.000Z`));
  });
});

describe('renewal', () => {
  it('renews a member when the movable clock passes the period, drafting first and charging an hour later', async () => {
    const subscription = await join(bench, await makePrice(stripe));
    const end = subscription.items.data[0]?.current_period_end ?? 0;

    await bench.control('/clock', { now: end });
    expect(await reasonsAndStatuses(subscription.id)).toEqual(['subscription_create paid', 'subscription_cycle draft']);
    await bench.control('/clock', { by: 3600 });
    expect(await reasonsAndStatuses(subscription.id)).toEqual(['subscription_create paid', 'subscription_cycle paid']);
    expect((await stripe.subscriptions.retrieve(subscription.id)).items.data[0]?.current_period_start).toBe(end);
    await expect(bench.control('/clock', { now: end })).rejects.toThrow('forward only');
  });

  it('comes back to the 31st after a shorter month', async () => {
    const { clock, id } = await subscribe('2026-01-31T10:00:00Z');
    await advance(clock, '2026-02-28T12:00:00Z');
    expect(periodOf(await stripe.subscriptions.retrieve(id))).toEqual({
      start: '2026-02-28T10:00:00.000Z',
      end: '2026-03-31T10:00:00.000Z',
    });
    await advance(clock, '2026-05-01T00:00:00Z');
    expect(periodOf(await stripe.subscriptions.retrieve(id)).start).toBe('2026-04-30T10:00:00.000Z');
    expect(await reasonsAndStatuses(id)).toHaveLength(4);
  });

  it('answers "advancing" to the SDK and is ready soon after', async () => {
    const { clock, id } = await subscribe('2026-01-01T00:00:00Z');
    const going = await stripe.testHelpers.testClocks.advance(clock, { frozen_time: seconds('2026-02-02T00:00:00Z') });
    expect(going.status).toBe('advancing');
    await eventually(
      () => stripe.testHelpers.testClocks.retrieve(clock),
      ({ status }) => status === 'ready',
    );
    expect(await reasonsAndStatuses(id)).toEqual(['subscription_create paid', 'subscription_cycle paid']);
  });

  it('gives notice three days before a trial ends and bills when it does', async () => {
    const { clock, id } = await subscribe('2026-01-01T00:00:00Z', { trial_period_days: 14 });
    await advance(clock, '2026-01-12T00:00:01Z');
    const notices = await stripe.events.list({ type: 'customer.subscription.trial_will_end' });
    expect(notices.data.map((event) => (event.data.object as { id: string }).id)).toEqual([id]);
    await advance(clock, '2026-01-15T02:00:00Z');
    expect((await stripe.subscriptions.retrieve(id)).status).toBe('active');
    const { data } = await stripe.invoices.list({ subscription: id });
    expect(data.map(({ amount_paid: paid }) => paid)).toEqual([500, 0]);
  });
});

describe('a card that fails at renewal', () => {
  it('makes the membership past due, is tried again after 3, 5 and 7 days, and then ends it', async () => {
    const { clock, id } = await subscribe('2026-01-01T00:00:00Z', {}, 'pm_card_chargeCustomerFail');
    const at = async (instant: string) => {
      await advance(clock, instant);
      const expand = ['latest_invoice'];
      const { status, latest_invoice: invoice } = await stripe.subscriptions.retrieve(id, { expand });
      return `${status} after ${(invoice as Stripe.Invoice).attempt_count}`;
    };

    expect(await at('2026-02-01T01:00:00Z')).toBe('past_due after 1');
    expect(await at('2026-02-04T01:00:00Z')).toBe('past_due after 2');
    expect(await at('2026-02-09T01:00:00Z')).toBe('past_due after 3');
    expect(await at('2026-02-16T01:00:00Z')).toBe('canceled after 4');
    const ended = await stripe.subscriptions.retrieve(id);
    expect(ended.cancellation_details?.reason).toBe('payment_failed');
    expect((await stripe.invoices.list({ subscription: id })).data[0]).toMatchObject({
      status: 'open',
      next_payment_attempt: null,
    });
  });

  it('is active again once another card pays, here on the portal page', async () => {
    const subscription = await join(bench, await makePrice(stripe), CARDS.failsLater);
    await bench.control('/clock', { now: (subscription.items.data[0]?.current_period_end ?? 0) + 3601 });
    expect((await stripe.subscriptions.retrieve(subscription.id)).status).toBe('past_due');

    const portal = await stripe.billingPortal.sessions.create({ customer: subscription.customer as string });
    await postForm(`${portal.url}/card`, {
      cardNumber: CARDS.pays,
      cardExpiry: '12/60',
      cardCvc: '123',
      cardName: 'A Reader',
    });
    expect((await stripe.subscriptions.retrieve(subscription.id)).status).toBe('active');
  });

  it('can end unpaid instead, when that is set', async () => {
    await bench.control('/dunning', { retryDays: [1], afterwards: 'unpaid' });
    const { clock, id } = await subscribe('2026-01-01T00:00:00Z', {}, 'pm_card_chargeCustomerFail');
    await advance(clock, '2026-02-03T00:00:00Z');
    expect((await stripe.subscriptions.retrieve(id)).status).toBe('unpaid');
    await bench.control('/dunning', {});
  });

  it('answers a failing payment with a card error and keeps the attempt', async () => {
    const { clock, id } = await subscribe('2026-01-01T00:00:00Z', {}, 'pm_card_chargeCustomerFail');
    await advance(clock, '2026-02-01T02:00:00Z');
    const invoice = (await stripe.subscriptions.retrieve(id)).latest_invoice as string;
    await expect(stripe.invoices.pay(invoice)).rejects.toMatchObject({
      type: 'StripeCardError',
      code: 'card_declined',
      statusCode: 402,
    });
    expect((await stripe.invoices.retrieve(invoice)).attempt_count).toBe(2);
  });
});

describe('cancelling', () => {
  it.each([
    { how: 'the flag', params: { cancel_at_period_end: true }, flag: true },
    { how: 'the date', params: { cancel_at: 'min_period_end' as const }, flag: false },
  ])('at the end of the period by $how ends it then and no sooner', async ({ params, flag }) => {
    const { clock, id } = await subscribe('2026-01-01T00:00:00Z');
    const set = await stripe.subscriptions.update(id, params);
    expect(set).toMatchObject({
      status: 'active',
      cancel_at_period_end: flag,
      cancel_at: seconds('2026-02-01T00:00:00Z'),
    });

    await advance(clock, '2026-01-31T23:59:59Z');
    expect((await stripe.subscriptions.retrieve(id)).status).toBe('active');
    await advance(clock, '2026-02-01T00:00:00Z');
    expect(await stripe.subscriptions.retrieve(id)).toMatchObject({
      status: 'canceled',
      ended_at: seconds('2026-02-01T00:00:00Z'),
    });
    expect(await reasonsAndStatuses(id)).toEqual(['subscription_create paid']);
  });

  it('can be taken back, and then it renews', async () => {
    const { clock, id } = await subscribe('2026-01-01T00:00:00Z');
    await stripe.subscriptions.update(id, { cancel_at_period_end: true });
    await stripe.subscriptions.update(id, { cancel_at_period_end: false });
    await advance(clock, '2026-02-01T02:00:00Z');
    expect(await stripe.subscriptions.retrieve(id)).toMatchObject({
      status: 'active',
      cancel_at: null,
      canceled_at: null,
    });
  });

  it('at once ends it at once, and only once', async () => {
    const { id } = await subscribe('2026-01-01T00:00:00Z');
    expect((await stripe.subscriptions.cancel(id)).status).toBe('canceled');
    await expect(stripe.subscriptions.cancel(id)).rejects.toMatchObject({ code: 'resource_missing' });
    expect((await stripe.subscriptions.list({ status: 'canceled', limit: 100 })).data.map((each) => each.id)).toContain(
      id,
    );
  });
});

// Proration by the second as docs.stripe.com/billing/subscriptions/prorations describes it: half a period left, half the price.
describe('switching the price', () => {
  async function halfWay() {
    const made = await subscribe('2026-04-01T00:00:00Z');
    await advance(made.clock, '2026-04-16T00:00:00Z');
    const dearer = await makePrice(stripe, { amount: 1500 });
    const items = [{ id: made.subscription.items.data[0]?.id ?? '', price: dearer.id }];
    return { ...made, items };
  }

  it('credits and charges what is left of the period with the next invoice, as previewed', async () => {
    const { clock, id, items } = await halfWay();
    const preview = await stripe.invoices.createPreview({ subscription: id, subscription_details: { items } });
    await stripe.subscriptions.update(id, { items });
    await advance(clock, '2026-05-01T02:00:00Z');

    const invoice = await stripe.invoices.retrieve((await stripe.subscriptions.retrieve(id)).latest_invoice as string);
    expect(invoice.lines.data.map(({ amount }) => amount)).toEqual([-250, 750, 1500]);
    expect(invoice).toMatchObject({ total: 2000, amount_paid: 2000 });
    expect(preview.total).toBe(2000);
  });

  it('charges the difference at once when told to', async () => {
    const { id, items } = await halfWay();
    await stripe.subscriptions.update(id, { items, proration_behavior: 'always_invoice' });
    expect((await stripe.invoices.list({ subscription: id })).data[0]).toMatchObject({
      billing_reason: 'subscription_update',
      status: 'paid',
      amount_paid: 500,
    });
  });

  it('starts a new period now when the interval is another, less what was not used', async () => {
    const { id, subscription } = await halfWay();
    const yearly = await makePrice(stripe, { amount: 6000, interval: 'year' });
    const switched = await stripe.subscriptions.update(id, {
      items: [{ id: subscription.items.data[0]?.id ?? '', price: yearly.id }],
    });
    expect(periodOf(switched)).toEqual({ start: '2026-04-16T00:00:00.000Z', end: '2027-04-16T00:00:00.000Z' });
    expect((await stripe.invoices.list({ subscription: id })).data[0]).toMatchObject({ total: 5750, status: 'paid' });
  });
});

describe('a first payment by call', () => {
  it('that is declined leaves the subscription incomplete, which expires after 23 hours', async () => {
    const { clock, customer } = await makeClockedCustomer(stripe, '2026-01-01T00:00:00Z', 'pm_card_chargeCustomerFail');
    const price = await makePrice(stripe);
    const subscription = await stripe.subscriptions.create({
      customer,
      items: [{ price: price.id }],
      off_session: true,
    });
    expect(subscription.status).toBe('incomplete');
    await advance(clock, '2026-01-01T23:00:00Z');
    expect((await stripe.subscriptions.retrieve(subscription.id)).status).toBe('incomplete_expired');
    expect(await reasonsAndStatuses(subscription.id)).toEqual(['subscription_create void']);
  });

  it('is not tried without a card', async () => {
    const customer = await stripe.customers.create({ email: 'none@demo.example' });
    const price = await makePrice(stripe);
    await expect(
      stripe.subscriptions.create({ customer: customer.id, items: [{ price: price.id }] }),
    ).rejects.toMatchObject({
      code: 'resource_missing',
    });
  });

  it('is followed by renewals that use the credit a customer has', async () => {
    const { clock, customer, id } = await subscribe('2026-01-01T00:00:00Z');
    await stripe.customers.update(customer, { balance: -700 });
    await advance(clock, new Date((seconds('2026-02-01T02:00:00Z') + DAY) * 1000).toISOString());
    const [renewal] = (await stripe.invoices.list({ subscription: id })).data;
    expect(renewal).toMatchObject({ total: 500, amount_due: 0, status: 'paid', ending_balance: -200 });
    expect((await stripe.customers.retrieve(customer)) as Stripe.Customer).toMatchObject({ balance: -200 });
  });
});
