import { Stripe } from 'stripe';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { eventually, join, makePrice, sdk, startBench, WEBHOOK_SECRET, type Bench } from './stripe-bench.ts';

let bench: Bench;
let stripe: Stripe;

beforeAll(async () => {
  bench = await startBench();
  stripe = bench.stripe;
});
afterAll(async () => bench.close());
beforeEach(async () => {
  bench.answerWith(200);
  await bench.control('/webhooks', {});
  await eventually(
    () => stripe.events.list({ delivery_success: false }),
    ({ data }) => data.length === 0,
  );
  bench.arrivals.length = 0;
});

function read(body: string): Stripe.Event {
  return JSON.parse(body) as Stripe.Event;
}

async function undelivered(): Promise<string[]> {
  return (await stripe.events.list({ delivery_success: false })).data.map(({ id }) => id);
}

async function arrived(count: number): Promise<Stripe.Event[]> {
  const bodies = await eventually(
    () => bench.arrivals.map(({ body }) => body),
    ({ length }) => length >= count,
  );
  return bodies.map(read);
}

describe('webhooks', () => {
  it('carry a signature that the SDK accepts for this body and this secret only', async () => {
    await stripe.products.create({ name: 'Signed' });
    await arrived(1);
    const [first] = bench.arrivals;
    const { body, signature } = first ?? { body: '', signature: '' };

    expect(stripe.webhooks.constructEvent(body, signature, WEBHOOK_SECRET).type).toBe('product.created');
    expect(() => stripe.webhooks.constructEvent(`${body} `, signature, WEBHOOK_SECRET)).toThrow(
      Stripe.errors.StripeSignatureVerificationError,
    );
    expect(() => stripe.webhooks.constructEvent(body, signature, 'whsec_other')).toThrow(
      Stripe.errors.StripeSignatureVerificationError,
    );
  });

  it('tell of a whole join, the same event that the API keeps', async () => {
    const subscription = await join(bench, await makePrice(stripe));
    const events = await eventually(
      () => bench.arrivals.map(({ body }) => read(body)),
      (seen) => seen.some(({ type }) => type === 'checkout.session.completed'),
    );
    const types = events.map(({ type }) => type);
    for (const type of [
      'customer.created',
      'customer.subscription.created',
      'invoice.paid',
      'payment_intent.succeeded',
    ]) {
      expect(types).toContain(type);
    }
    const started = events.find(({ type }) => type === 'customer.subscription.updated');
    expect(started?.data).toMatchObject({
      object: { id: subscription.id, status: 'active' },
      previous_attributes: { status: 'incomplete' },
    });
    const kept = await stripe.events.retrieve(started?.id ?? '');
    expect(kept).toMatchObject({ type: 'customer.subscription.updated', pending_webhooks: 0 });
  });

  it('write decimals as strings', async () => {
    await makePrice(stripe, { amount: 1250 });
    const event = (await arrived(2)).find(({ type }) => type === 'price.created');
    expect((event?.data.object as { unit_amount_decimal: unknown }).unit_amount_decimal).toBe('1250');
  });

  it('are tried again, newly signed, until they are taken', async () => {
    bench.answerWith(500);
    const product = await stripe.products.create({ name: 'Again' });
    await arrived(1);
    expect(await undelivered()).toHaveLength(1);

    bench.answerWith(200);
    const [first, second] = await arrived(2);
    expect(second?.id).toBe(first?.id);
    expect(second?.data.object).toMatchObject({ id: product.id });
    expect(bench.arrivals[1]?.signature).not.toBe(bench.arrivals[0]?.signature);
    await eventually(undelivered, ({ length }) => length === 0);
  });

  it('can be held, then let go in the other order', async () => {
    await bench.control('/webhooks', { mode: 'hold' });
    for (const name of ['a', 'b', 'c']) await stripe.products.create({ name });
    expect(await undelivered()).toHaveLength(3);
    expect(bench.arrivals).toEqual([]);

    const { deliveries } = await bench.control<{ deliveries: { status: number }[] }>('/webhooks/flush', {
      order: 'reversed',
    });
    expect(deliveries.map(({ status }) => status)).toEqual([200, 200, 200]);
    const names = bench.arrivals.map(({ body }) => (read(body).data.object as Stripe.Product).name);
    expect(names).toEqual(['c', 'b', 'a']);
  });

  it('can come twice under one id', async () => {
    await bench.control('/webhooks', { mode: 'duplicate' });
    await stripe.products.create({ name: 'Twice' });
    const [first, second] = await arrived(2);
    expect(second?.id).toBe(first?.id);
  });

  it('can be shuffled, all of them arriving', async () => {
    await bench.control('/webhooks', { mode: 'shuffle' });
    const names = ['1', '2', '3', '4', '5'];
    for (const name of names) await stripe.products.create({ name });
    const seen = (await arrived(5)).map(({ data }) => (data.object as Stripe.Product).name);
    expect(seen.sort()).toEqual(names);
  });

  it('can be sent again by hand after they were taken', async () => {
    await stripe.products.create({ name: 'By hand' });
    const [event] = await arrived(1);
    await bench.control(`/events/${event?.id ?? ''}/redeliver`, {});
    expect((await arrived(2))[1]?.id).toBe(event?.id);
  });

  it('survive a restart of the fake, with everything else', async () => {
    await bench.control('/webhooks', { mode: 'hold' });
    const subscription = await join(bench, await makePrice(stripe));
    const waiting = await undelivered();
    await bench.restart();

    const again = sdk(bench.fake.port);
    expect((await again.subscriptions.retrieve(subscription.id)).status).toBe('active');
    expect((await again.events.list({ delivery_success: false })).data.map(({ id }) => id)).toEqual(waiting);
    await bench.control('/webhooks', { mode: 'deliver' });
    await arrived(waiting.length);
  });

  it('filter by type, wildcards included', async () => {
    await stripe.products.create({ name: 'Typed' });
    const some = await stripe.events.list({ type: 'product.*', limit: 1 });
    expect(some.data[0]?.type).toBe('product.created');
    expect((await stripe.events.list({ types: ['refund.created'] })).data).toEqual([]);
  });
});
