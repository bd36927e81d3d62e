import { createServer, type AddressInfo } from 'node:net';
import type TestAgent from 'supertest/lib/agent.js';
import { afterAll, beforeAll } from 'vitest';
import type { AppContext } from '../../server/context.ts';
import { startFake, type RunningFake } from '../../server/fakes/stripe/fake.ts';
import type { OutgoingLetter } from '../../server/mail/mailer.ts';
import type { PersonRow } from '../../server/people/people.rows.ts';
import type { TierDraft, TierView } from '../../shared/contracts/tiers.ts';
import { PUBLIC_URL, useApi, type TestApi } from './api.ts';
import { runJobs } from './jobs.ts';
import { makePerson, PASSWORD, type PersonWish } from './people.ts';

export const WEBHOOK_SECRET = 'whsec_for_tests';
export const DAY = 86_400_000;

/** Test card numbers of Stripe's documentation (docs.stripe.com/testing). */
export const CARDS = {
  pays: '4242 4242 4242 4242',
  declines: '4000 0000 0000 0002',
  failsLater: '4000 0000 0000 0341',
} as const;

export interface PaidHouse extends TestApi {
  fake: RunningFake;
  /** Letters that were sent; nothing leaves the house. */
  mailed: OutgoingLetter[];
  /** Calls the control plane of the payment fake. */
  control: <T = unknown>(path: string, body: object) => Promise<T>;
  /** Moves the clocks of the house and of the payment fake forward together. */
  passDays: (days: number) => Promise<void>;
  /** Sends every webhook that is held, in this order, then does the jobs that came of them. */
  deliver: (order?: 'created' | 'reversed' | 'shuffled') => Promise<{ status: number | null }[]>;
  /** Does the jobs that wait. */
  work: () => Promise<void>;
  /** A tier that is for sale and in step. */
  sellTier: (wish?: Partial<TierDraft>) => Promise<TierView>;
  /** A person with a signed-in browser. */
  signedIn: (wish?: PersonWish) => Promise<{ person: PersonRow; browser: TestAgent }>;
  /** The same, who has joined a tier through the hosted page and come back. */
  joined: (tier: TierView, card?: string) => Promise<{ person: PersonRow; browser: TestAgent }>;
}

/** The whole house with the payment fake beside it, which holds its webhooks until they are asked for. */
export function usePaidHouse(overrides: Partial<AppContext> = {}, env: Record<string, string> = {}): PaidHouse {
  const settings: Record<string, string> = { STRIPE_WEBHOOK_SECRET: WEBHOOK_SECRET, ...env };
  let port = 0;
  let ahead = 0;
  beforeAll(async () => {
    port = await freePort();
    settings['STRIPE_API_BASE'] = `http://127.0.0.1:${port}`;
  });
  const mailed: OutgoingLetter[] = [];
  const mail = { send: async (letter: OutgoingLetter) => void mailed.push(letter) };
  const now = () => new Date(Date.now() + ahead);
  const house = useApi(settings, { now, mail, ...overrides }) as PaidHouse;
  house.mailed = mailed;

  beforeAll(async () => {
    const webhook = { url: `${house.origin}/api/stripe/webhook`, secret: WEBHOOK_SECRET };
    house.fake = await startFake({ port, databaseUrl: house.url, webhook });
    house.control = (path, body) => control(house.fake.origin, path, body);
    house.work = () => runJobs(house);
    house.passDays = async (days) => {
      const seconds = Math.ceil(days * 86_400);
      ahead += seconds * 1000;
      await house.control('/clock', { by: seconds });
    };
    house.deliver = async (order = 'created') => {
      const { deliveries } = await house.control<{ deliveries: { status: number | null }[] }>('/webhooks/flush', {
        order,
      });
      await house.work();
      return deliveries;
    };
    house.sellTier = (wish) => sellTier(house, wish);
    house.signedIn = (wish) => signedIn(house, wish);
    house.joined = (tier, card) => joined(house, tier, card);
    await house.control('/webhooks', { mode: 'hold' });
  });
  afterAll(() => house.fake.close());
  return house;
}

async function control<T>(origin: string, path: string, body: object): Promise<T> {
  const response = await fetch(`${origin}/control${path}`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(body),
  });
  const answer = (await response.json()) as T;
  if (!response.ok) throw new Error(JSON.stringify(answer));
  return answer;
}

async function freePort(): Promise<number> {
  const server = createServer().listen(0, '127.0.0.1');
  await new Promise((resolve) => server.once('listening', resolve));
  const { port } = server.address() as AddressInfo;
  await new Promise((resolve) => server.close(resolve));
  return port;
}

let nextRank = 0;

export function makeTierDraft(wish: Partial<TierDraft> = {}): TierDraft {
  nextRank += 1;
  return {
    rank: nextRank,
    name: `Tier ${nextRank}`,
    description: '',
    perks: [],
    monthly: 400,
    yearly: 4000,
    ...wish,
  };
}

async function sellTier(house: PaidHouse, wish: Partial<TierDraft> = {}): Promise<TierView> {
  const admin = await house.as({ roles: ['admin'] });
  const made = await admin.post('/api/office/tiers').send(makeTierDraft(wish)).expect(201);
  await house.work();
  const { body } = await admin.get('/api/office/tiers').expect(200);
  return (body.tiers as TierView[]).find(({ id }) => id === made.body.id)!;
}

async function signedIn(house: PaidHouse, wish: PersonWish = {}): Promise<{ person: PersonRow; browser: TestAgent }> {
  const person = await makePerson(house.db, wish);
  const browser = house.visitor();
  await browser.post('/api/session').send({ email: person.email, password: PASSWORD }).expect(200);
  return { person, browser };
}

async function joined(house: PaidHouse, tier: TierView, card: string = CARDS.pays) {
  const reader = await signedIn(house);
  const wish = { tierId: tier.id, interval: 'month', returnTo: '/book/a/b' };
  const { body } = await reader.browser.post('/api/checkout').send(wish).expect(200);
  const session = sessionOf(await payPage(body.href, card));
  const back = await reader.browser.post('/api/checkout/return').send({ session }).expect(200);
  if (back.body.outcome !== 'paid') throw new Error(`The join came to nothing: ${JSON.stringify(back.body)}`);
  return reader;
}

/** Sends the form of a hosted payment page as a browser would; the answer leads on when the card was taken. */
export async function payPage(href: string, card: string): Promise<Response> {
  const fields = { cardNumber: card, cardExpiry: '12/60', cardCvc: '123', cardName: 'A Reader' };
  return fetch(href, { method: 'POST', redirect: 'manual', body: new URLSearchParams(fields) });
}

/** The session that a paid page names when it leads back. */
export function sessionOf(response: Response): string {
  const to = new URL(response.headers.get('location') ?? 'nowhere:');
  if (to.origin !== PUBLIC_URL || to.pathname !== '/join/return') throw new Error(`The page led to ${to.href}.`);
  return to.searchParams.get('session')!;
}
