import type { Stripe } from 'stripe';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { CARDS, makePrice, makeSession, postForm, startBench, submit, type Bench } from './stripe-bench.ts';

let bench: Bench;
let stripe: Stripe;
let price: Stripe.Price;

beforeAll(async () => {
  bench = await startBench();
  stripe = bench.stripe;
  price = await makePrice(stripe, { amount: 500 });
});
afterAll(async () => bench.close());

async function subscriptionsFor(reference: string): Promise<Stripe.Subscription[]> {
  const { data } = await stripe.subscriptions.list({ status: 'all', limit: 100 });
  return data.filter(({ metadata }) => metadata.reference === reference);
}

function sessionFor(reference: string, more: Partial<Stripe.Checkout.SessionCreateParams> = {}) {
  return makeSession(stripe, price, {
    client_reference_id: reference,
    subscription_data: { metadata: { reference } },
    ...more,
  });
}

// Cards and their outcomes as in Stripe's documentation of test cards (docs.stripe.com/testing).
describe('the checkout page', () => {
  it('takes a card that pays, leads back with the session filled in, and starts a paid subscription', async () => {
    const session = await sessionFor('pays');
    const paid = await submit(session.url, CARDS.pays);

    expect(paid.status).toBe(303);
    expect(paid.headers.get('location')).toBe(`http://127.0.0.1:9/joined?session=${session.id}`);
    const expand = ['customer', 'subscription.latest_invoice.payments', 'line_items'];
    const done = await stripe.checkout.sessions.retrieve(session.id, { expand });
    expect(done).toMatchObject({
      status: 'complete',
      payment_status: 'paid',
      amount_total: 500,
      client_reference_id: 'pays',
    });
    expect(done.customer).toMatchObject({ email: 'reader@demo.example', name: 'A Reader' });
    expect(done.line_items?.data[0]).toMatchObject({ description: 'Reading copy', amount_total: 500 });
    expect(done.subscription).toMatchObject({
      status: 'active',
      metadata: { reference: 'pays' },
      latest_invoice: { status: 'paid', amount_paid: 500, billing_reason: 'subscription_create' },
    });
  });

  it('declines, says so, stays open and leaves nothing behind', async () => {
    const session = await sessionFor('declines');
    const refused = await submit(session.url, CARDS.declines);

    expect(refused.status).toBe(200);
    expect(await refused.text()).toContain('Your card was declined.');
    expect((await stripe.checkout.sessions.retrieve(session.id)).status).toBe('open');
    expect(await subscriptionsFor('declines')).toEqual([]);

    expect((await submit(session.url, CARDS.pays)).status).toBe(303);
    expect(await subscriptionsFor('declines')).toHaveLength(1);
  });

  it('pays after a challenge is passed, and not when it is failed', async () => {
    const session = await sessionFor('challenge');
    const challenge = `${session.url ?? ''}/challenge`;
    const asked = await submit(session.url, CARDS.challenges);
    expect(asked.headers.get('location')).toBe(`/checkout/${session.id}/challenge`);
    expect(await (await fetch(challenge)).text()).toContain('Complete authentication');

    const failed = await postForm(challenge, { answer: 'fail' });
    expect(await failed.text()).toContain('unable to authenticate');
    expect(await subscriptionsFor('challenge')).toEqual([]);

    await submit(session.url, CARDS.challenges);
    expect((await postForm(challenge, { answer: 'complete' })).status).toBe(303);
    expect((await subscriptionsFor('challenge')).map(({ status }) => status)).toEqual(['active']);
  });

  it('starts one subscription however often the button is pressed', async () => {
    const session = await sessionFor('pressed');
    const answers = await Promise.all(Array.from({ length: 8 }, () => submit(session.url, CARDS.pays)));

    expect(answers.map(({ status }) => status)).toEqual(Array<number>(8).fill(303));
    expect(await subscriptionsFor('pressed')).toHaveLength(1);
    expect((await fetch(session.url ?? '', { redirect: 'manual' })).status).toBe(303);
  });

  it.each([
    { what: 'an incomplete number', fields: { cardNumber: '4242' }, says: 'number is incomplete' },
    {
      what: 'a number that fails its check digit',
      fields: { cardNumber: '4242424242424241' },
      says: 'number is incorrect',
    },
    { what: 'a card that is no test card', fields: { cardNumber: '4111111111111111' }, says: 'test cards only' },
    { what: 'a past expiry', fields: { cardExpiry: '01/20' }, says: 'in the past' },
    { what: 'a short code', fields: { cardCvc: '1' }, says: 'security code is incomplete' },
    { what: 'no e-mail address', fields: { email: '' }, says: 'e-mail address' },
  ])('answers $what with its reason', async ({ fields, says }) => {
    const session = await sessionFor('bad');
    const refused = await submit(session.url, CARDS.pays, fields);
    expect(refused.status).toBe(200);
    expect(await refused.text()).toContain(says);
  });

  it('escapes what was typed', async () => {
    const session = await sessionFor('typed');
    const page = await (await submit(session.url, CARDS.declines, { cardName: '"><script>x</script>' })).text();
    expect(page).toContain('&quot;&gt;&lt;script&gt;x&lt;/script&gt;');
    expect(page).not.toContain('<script>');
  });

  it('charges nothing today for a trial', async () => {
    const session = await sessionFor('trial', {
      subscription_data: { metadata: { reference: 'trial' }, trial_period_days: 7 },
    });
    await submit(session.url, CARDS.pays);

    expect(await stripe.checkout.sessions.retrieve(session.id)).toMatchObject({
      payment_status: 'no_payment_required',
      amount_total: 0,
    });
    const [subscription] = await subscriptionsFor('trial');
    expect(subscription?.status).toBe('trialing');
    expect((subscription?.trial_end ?? 0) - (subscription?.trial_start ?? 0)).toBe(7 * 86_400);
  });

  it('takes a promotion code off the first payment, and refuses one that is not', async () => {
    const coupon = await stripe.coupons.create({ percent_off: 20, duration: 'once' });
    await stripe.promotionCodes.create({ promotion: { type: 'coupon', coupon: coupon.id }, code: 'SLACKWATER' });
    const session = await sessionFor('code', { allow_promotion_codes: true });

    const wrong = await submit(session.url, CARDS.pays, { promotionCode: 'NONE' });
    expect(await wrong.text()).toContain('promotion code is not valid');
    await submit(session.url, CARDS.pays, { promotionCode: 'slackwater' });

    const done = await stripe.checkout.sessions.retrieve(session.id, { expand: ['invoice'] });
    expect(done).toMatchObject({ amount_subtotal: 500, amount_total: 400, total_details: { amount_discount: 100 } });
    expect(done.invoice).toMatchObject({ subtotal: 500, total: 400, amount_paid: 400 });
    expect((await stripe.coupons.retrieve(coupon.id)).times_redeemed).toBe(1);
  });

  it('closes when it is expired by call or by time, and says so', async () => {
    const called = await sessionFor('called');
    expect((await stripe.checkout.sessions.expire(called.id)).status).toBe('expired');
    expect((await submit(called.url, CARDS.pays)).status).toBe(410);

    const timed = await sessionFor('timed');
    await bench.control('/clock', { by: 24 * 3600 + 1 });
    expect((await stripe.checkout.sessions.retrieve(timed.id)).status).toBe('expired');
    expect((await fetch(timed.url ?? '')).status).toBe(410);
    const told = await stripe.events.list({ type: 'checkout.session.expired', limit: 100 });
    const ids = told.data.map((event) => (event.data.object as Stripe.Checkout.Session).id);
    expect(ids).toEqual(expect.arrayContaining([timed.id, called.id]));
  });

  it('gives back the money in parts, up to what was paid, and the subscription goes on', async () => {
    const session = await sessionFor('refund');
    await submit(session.url, CARDS.pays);
    const done = await stripe.checkout.sessions.retrieve(session.id, { expand: ['subscription'] });
    const { latest_invoice: invoice } = done.subscription as Stripe.Subscription;
    const paid = await stripe.invoices.retrieve(invoice as string, {
      expand: ['payments.data.payment.payment_intent'],
    });
    const intent = paid.payments?.data[0]?.payment.payment_intent as Stripe.PaymentIntent;

    await stripe.refunds.create({ payment_intent: intent.id, amount: 200 });
    await expect(stripe.refunds.create({ payment_intent: intent.id, amount: 301 })).rejects.toThrow(
      'greater than unrefunded',
    );
    expect(await stripe.refunds.create({ payment_intent: intent.id })).toMatchObject({
      amount: 300,
      status: 'succeeded',
    });
    await expect(stripe.refunds.create({ payment_intent: intent.id })).rejects.toThrow('already been refunded');
    expect((await subscriptionsFor('refund'))[0]?.status).toBe('active');
  });
});

describe('the portal page', () => {
  it('cancels by date and not by flag, as flexible billing does, and takes it back', async () => {
    const session = await sessionFor('portal');
    await submit(session.url, CARDS.pays);
    const [before] = await subscriptionsFor('portal');
    const portal = await stripe.billingPortal.sessions.create({
      customer: before?.customer as string,
      return_url: 'http://127.0.0.1:9/',
    });
    expect(await (await fetch(portal.url)).text()).toContain('Cancel Reading copy at the end of the period');

    await postForm(`${portal.url}/cancel`, { subscription: before?.id ?? '' });
    const [canceled] = await subscriptionsFor('portal');
    expect(canceled?.cancel_at_period_end).toBe(false);
    expect(canceled?.cancel_at).toBe(before?.items.data[0]?.current_period_end);

    await postForm(`${portal.url}/resume`, { subscription: before?.id ?? '' });
    expect((await subscriptionsFor('portal'))[0]?.cancel_at).toBeNull();
  });
});
