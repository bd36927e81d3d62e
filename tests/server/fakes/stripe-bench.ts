import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { Stripe } from 'stripe';
import { startFake, type RunningFake } from '../../../server/fakes/stripe/fake.ts';
import { makeDatabase } from '../../support/database.ts';

export const WEBHOOK_SECRET = 'whsec_for_tests';

/** Test card numbers of Stripe's documentation (docs.stripe.com/testing). */
export const CARDS = {
  pays: '4242 4242 4242 4242',
  declines: '4000 0000 0000 0002',
  challenges: '4000 0025 0000 3155',
  failsLater: '4000 0000 0000 0341',
} as const;

/** What arrived at the webhook endpoint: the raw body and the signature it came with. */
export interface Arrival {
  body: string;
  signature: string;
}

export interface Bench {
  fake: RunningFake;
  stripe: Stripe;
  arrivals: Arrival[];
  /** The HTTP status the endpoint answers with from now on. */
  answerWith: (status: number) => void;
  control: <T = unknown>(path: string, body?: object) => Promise<T>;
  restart: () => Promise<void>;
  close: () => Promise<void>;
}

/** Starts an empty fake with an endpoint for its webhooks and the official SDK pointed at it. */
export async function startBench(): Promise<Bench> {
  const arrivals: Arrival[] = [];
  let status = 200;
  const endpoint: Server = createServer((req, res) => {
    const parts: Buffer[] = [];
    req.on('data', (part: Buffer) => parts.push(part));
    req.on('end', () => {
      arrivals.push({ body: Buffer.concat(parts).toString(), signature: String(req.headers['stripe-signature']) });
      res.writeHead(status).end();
    });
  });
  await new Promise<void>((resolve) => endpoint.listen(0, '127.0.0.1', resolve));
  const { port: hookPort } = endpoint.address() as AddressInfo;
  const database = await makeDatabase();
  const settings = {
    databaseUrl: database.url,
    webhook: { url: `http://127.0.0.1:${hookPort}/hook`, secret: WEBHOOK_SECRET },
  };

  let fake = await startFake({ port: 0, ...settings });
  const control = async <T>(path: string, body?: object): Promise<T> => {
    const response = await fetch(`${fake.origin}/control${path}`, {
      method: body ? 'POST' : 'GET',
      ...(body ? { headers: { 'content-type': 'application/json' }, body: JSON.stringify(body) } : {}),
    });
    const answer = (await response.json()) as T;
    if (!response.ok) throw new Error(JSON.stringify(answer));
    return answer;
  };
  await control('/reset', {});

  return {
    get fake() {
      return fake;
    },
    stripe: sdk(fake.port),
    arrivals,
    answerWith: (next) => (status = next),
    control,
    async restart() {
      const { port } = fake;
      await fake.close();
      fake = await startFake({ port, ...settings });
    },
    async close() {
      await fake.close();
      endpoint.close();
      endpoint.closeAllConnections();
      await database.drop();
    },
  };
}

/** The official SDK, untouched, pointed at the fake. */
export function sdk(port: number, options: { maxNetworkRetries?: number } = {}): Stripe {
  return new Stripe('sk_test_bench', { host: '127.0.0.1', port, protocol: 'http', maxNetworkRetries: 0, ...options });
}

export async function makePrice(
  stripe: Stripe,
  { amount = 500, interval = 'month' }: { amount?: number; interval?: 'day' | 'week' | 'month' | 'year' } = {},
): Promise<Stripe.Price> {
  const product = await stripe.products.create({ name: 'Reading copy' });
  return stripe.prices.create({ product: product.id, currency: 'gbp', unit_amount: amount, recurring: { interval } });
}

export async function makeSession(
  stripe: Stripe,
  price: Stripe.Price,
  more: Partial<Stripe.Checkout.SessionCreateParams> = {},
): Promise<Stripe.Checkout.Session> {
  return stripe.checkout.sessions.create({
    mode: 'subscription',
    line_items: [{ price: price.id, quantity: 1 }],
    success_url: 'http://127.0.0.1:9/joined?session={CHECKOUT_SESSION_ID}',
    cancel_url: 'http://127.0.0.1:9/left',
    ...more,
  });
}

/** Sends the form of a checkout page as a browser would. */
export async function submit(url: string | null, card: string, more: Record<string, string> = {}): Promise<Response> {
  const fields = {
    email: 'reader@demo.example',
    cardNumber: card,
    cardExpiry: '12/60',
    cardCvc: '123',
    cardName: 'A Reader',
  };
  return postForm(url ?? '', { ...fields, ...more });
}

export async function postForm(url: string, fields: Record<string, string>): Promise<Response> {
  return fetch(url, { method: 'POST', redirect: 'manual', body: new URLSearchParams(fields) });
}

/** Joins through the checkout page and returns the subscription that came of it. */
export async function join(bench: Bench, price: Stripe.Price, card: string = CARDS.pays): Promise<Stripe.Subscription> {
  const session = await makeSession(bench.stripe, price);
  await submit(session.url, card);
  const paid = await bench.stripe.checkout.sessions.retrieve(session.id, { expand: ['subscription'] });
  return paid.subscription as Stripe.Subscription;
}

/** A customer with a card, on a test clock that starts at an instant. */
export async function makeClockedCustomer(stripe: Stripe, start: string, card = 'pm_card_visa') {
  const clock = await stripe.testHelpers.testClocks.create({ frozen_time: seconds(start) });
  const customer = await stripe.customers.create({ email: 'clock@demo.example', test_clock: clock.id });
  const method = await stripe.paymentMethods.attach(card, { customer: customer.id });
  await stripe.customers.update(customer.id, { invoice_settings: { default_payment_method: method.id } });
  return { clock: clock.id, customer: customer.id };
}

export function seconds(iso: string): number {
  return Date.parse(iso) / 1000;
}

export function iso(instant: number | null | undefined): string {
  return new Date((instant ?? 0) * 1000).toISOString();
}

export function periodOf(subscription: Stripe.Subscription): { start: string; end: string } {
  const [item] = subscription.items.data;
  return { start: iso(item?.current_period_start), end: iso(item?.current_period_end) };
}

/** Waits for something that follows a commit, such as a delivery; fails after five seconds. */
export async function eventually<T>(read: () => T | Promise<T>, holds: (value: T) => boolean): Promise<T> {
  const deadline = Date.now() + 5000;
  for (;;) {
    const value = await read();
    if (holds(value)) return value;
    if (Date.now() > deadline) throw new Error(`This never came true; last seen: ${JSON.stringify(value)}`);
    await new Promise((resolve) => setTimeout(resolve, 25));
  }
}
