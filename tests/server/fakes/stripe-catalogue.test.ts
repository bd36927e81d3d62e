import { request } from 'node:http';
import { Stripe } from 'stripe';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makePrice, sdk, startBench, type Bench } from './stripe-bench.ts';

let bench: Bench;
let stripe: Stripe;

beforeAll(async () => {
  bench = await startBench();
  stripe = bench.stripe;
});
afterAll(async () => bench.close());

async function refusal(call: Promise<unknown>): Promise<Stripe.errors.StripeError> {
  const outcome: unknown = await call.then(
    () => new Error('It was accepted.'),
    (error: unknown) => error,
  );
  if (outcome instanceof Stripe.errors.StripeError) return outcome;
  throw outcome;
}

// Behaviour as Stripe's API reference states it (docs.stripe.com/api: products, prices, pagination, expanding, metadata).
describe('the catalogue', () => {
  it('keeps a product with its prices and finds a price by its lookup key', async () => {
    const product = await stripe.products.create({ name: 'Clothbound', metadata: { tier: '2' } });
    const price = await stripe.prices.create({
      product: product.id,
      currency: 'gbp',
      unit_amount: 900,
      recurring: { interval: 'month' },
      lookup_key: 'clothbound_month',
    });

    const found = await stripe.prices.list({ lookup_keys: ['clothbound_month'], expand: ['data.product'] });
    expect(found.data.map(({ id }) => id)).toEqual([price.id]);
    expect(found.data[0]?.product).toMatchObject({ id: product.id, metadata: { tier: '2' } });
    expect(String(price.unit_amount_decimal)).toBe('900');
  });

  it('gives a lookup key to another price only when told to transfer it', async () => {
    const first = await makePrice(stripe);
    await stripe.prices.update(first.id, { lookup_key: 'moving' });
    const next = {
      product: first.product as string,
      currency: 'gbp',
      unit_amount: 700,
      recurring: { interval: 'month' as const },
    };

    expect((await refusal(stripe.prices.create({ ...next, lookup_key: 'moving' }))).param).toBe('lookup_key');
    await stripe.prices.create({ ...next, lookup_key: 'moving', transfer_lookup_key: true });
    expect((await stripe.prices.retrieve(first.id)).lookup_key).toBeNull();
  });

  it('never changes the amount of a price', async () => {
    const price = await makePrice(stripe, { amount: 500 });
    const asked = { unit_amount: 1 } as Stripe.PriceUpdateParams;

    expect(await refusal(stripe.prices.update(price.id, asked))).toMatchObject({
      code: 'parameter_unknown',
      param: 'unit_amount',
    });
    expect((await stripe.prices.retrieve(price.id)).unit_amount).toBe(500);
  });

  it('sells no archived price and archives no default price', async () => {
    const price = await makePrice(stripe);
    const product = price.product as string;
    await stripe.products.update(product, { default_price: price.id });
    expect((await refusal(stripe.prices.update(price.id, { active: false }))).param).toBe('active');

    const other = await stripe.prices.create({
      product,
      currency: 'gbp',
      unit_amount: 1,
      recurring: { interval: 'year' },
    });
    await stripe.prices.update(other.id, { active: false });
    const session = stripe.checkout.sessions.create({
      mode: 'subscription',
      line_items: [{ price: other.id, quantity: 1 }],
      success_url: 'http://127.0.0.1:9/',
    });
    expect((await refusal(session)).param).toBe('line_items[0][price]');
  });

  it('merges metadata, an empty value taking its key away and an empty whole all of it', async () => {
    const { id } = await stripe.products.create({ name: 'M', metadata: { a: '1', b: '2' } });
    expect((await stripe.products.update(id, { metadata: { b: '', c: '3' } })).metadata).toEqual({ a: '1', c: '3' });
    expect((await stripe.products.update(id, { metadata: '' })).metadata).toEqual({});
  });

  it('lists newest first in pages that follow one another', async () => {
    const made = [];
    for (const name of ['one', 'two', 'three'])
      made.push((await stripe.products.create({ name, url: 'https://demo.example/p' })).id);

    const first = await stripe.products.list({ url: 'https://demo.example/p', limit: 2 });
    expect(first.data.map(({ name }) => name)).toEqual(['three', 'two']);
    expect(first.has_more).toBe(true);
    const all = await stripe.products
      .list({ url: 'https://demo.example/p', limit: 1 })
      .autoPagingToArray({ limit: 10 });
    expect(all.map(({ id }) => id)).toEqual(made.reverse());
    expect(await refusal(stripe.products.list({ limit: 101 }))).toMatchObject({ param: 'limit' });
  });
});

describe('the manners of the API', () => {
  it('refuses a parameter it does not know, by name, however deep', async () => {
    const feature = { name: 'y', colour: 'red' };
    const params = { name: 'x', marketing_features: [feature] };
    expect(await refusal(stripe.products.create(params))).toMatchObject({
      type: 'StripeInvalidRequestError',
      code: 'parameter_unknown',
      param: 'marketing_features[0][colour]',
      statusCode: 400,
    });
  });

  it('names a missing parameter, a missing object and an unknown address', async () => {
    expect(await refusal(stripe.products.create({} as Stripe.ProductCreateParams))).toMatchObject({
      code: 'parameter_missing',
      param: 'name',
    });
    const none = await refusal(stripe.products.retrieve('prod_none'));
    expect(none).toMatchObject({ code: 'resource_missing', statusCode: 404 });
    expect(none.requestId).toMatch(/^req_/);
    expect((await refusal(stripe.quotes.list())).message).toContain('Unrecognized request URL');
  });

  it('expands four levels and not a fifth, and nothing that cannot be', async () => {
    const price = await makePrice(stripe);
    const deep = await refusal(stripe.prices.retrieve(price.id, { expand: ['product.a.b.c.d'] }));
    expect(deep.message).toContain('more than 4 levels');
    expect((await refusal(stripe.prices.retrieve(price.id, { expand: ['currency'] }))).message).toContain(
      'cannot be expanded',
    );
  });

  it('takes test keys only', async () => {
    const live = new Stripe('sk_live_x', { host: '127.0.0.1', port: bench.fake.port, protocol: 'http' });
    expect(await refusal(live.products.list())).toBeInstanceOf(Stripe.errors.StripeAuthenticationError);
  });

  it('repeats the first answer for a key, refuses another request under it, and stores no refused one', async () => {
    const once = { idempotencyKey: 'key-1' };
    const bad = stripe.products.create({ nam: 'typo' } as unknown as Stripe.ProductCreateParams, once);
    expect((await refusal(bad)).statusCode).toBe(400);

    const first = await stripe.products.create({ name: 'Once' }, once);
    const again = await stripe.products.create({ name: 'Once' }, once);
    expect(again.id).toBe(first.id);
    expect(again.lastResponse.headers['idempotent-replayed']).toBe('true');
    expect(await refusal(stripe.products.create({ name: 'Other' }, once))).toBeInstanceOf(
      Stripe.errors.StripeIdempotencyError,
    );
  });

  it('makes one object of eight simultaneous requests under one key', async () => {
    const calls = Array.from({ length: 8 }, () =>
      sdk(bench.fake.port, { maxNetworkRetries: 5 }).products.create({ name: 'Race' }, { idempotencyKey: 'key-race' }),
    );
    const ids = (await Promise.all(calls)).map(({ id }) => id);
    expect(new Set(ids).size).toBe(1);
  });

  it('loses only the answer when told to, and the retry finds what was done', async () => {
    await bench.control('/faults', { prefix: '/v1/products', when: 'after' });
    const product = await sdk(bench.fake.port, { maxNetworkRetries: 2 }).products.create({ name: 'Heard twice' });
    const named = (await stripe.products.list({ limit: 100 })).data.filter(({ name }) => name === 'Heard twice');
    expect(named.map(({ id }) => id)).toEqual([product.id]);
  });

  it('fails as often as told with the status that was set', async () => {
    await bench.control('/faults', { prefix: '/v1/customers', status: 429, times: 1 });
    expect(await refusal(stripe.customers.list())).toBeInstanceOf(Stripe.errors.StripeRateLimitError);
    expect((await stripe.customers.list()).object).toBe('list');
    await bench.control('/faults', { prefix: '/v1/customers', status: 500, times: 1 });
    expect(await refusal(stripe.customers.list())).toBeInstanceOf(Stripe.errors.StripeAPIError);
  });
});

describe('the fake', () => {
  async function statusFor(path: string, headers: Record<string, string>, method = 'GET'): Promise<number | undefined> {
    return new Promise((resolve, reject) => {
      const asked = request(`${bench.fake.origin}${path}`, { method, headers }, (answer) => {
        answer.resume();
        resolve(answer.statusCode);
      });
      asked.on('error', reject);
      asked.end(method === 'POST' ? 'by=1' : undefined);
    });
  }

  it('answers this machine only, whatever name a page of the web gave it', async () => {
    expect(await statusFor('/control/clock', { host: 'localhost:1' })).toBe(200);
    expect(await statusFor('/control/clock', { host: 'pay.demo.example' })).toBe(421);
  });

  it('takes no order from a form', async () => {
    const form = { 'content-type': 'application/x-www-form-urlencoded', 'content-length': '4' };
    expect(await statusFor('/control/clock', form, 'POST')).toBe(415);
    expect(await statusFor('/checkout/cs_test_x', { ...form, 'sec-fetch-site': 'cross-site' }, 'POST')).toBe(403);
  });

  it('names what is wrong with an order', async () => {
    await expect(bench.control('/webhooks', { mode: 'drop' })).rejects.toThrow('mode');
    await expect(bench.control('/faults', { prefix: '/v2/' })).rejects.toThrow('prefix');
  });
});
