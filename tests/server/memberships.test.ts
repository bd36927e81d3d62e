import { Stripe } from 'stripe';
import { beforeAll, describe, expect, it } from 'vitest';
import { converge } from '../../server/payments/converge.service.ts';
import type { TierView } from '../../shared/contracts/tiers.ts';
import { makeIssuedBook } from '../support/issued-book.ts';
import { CARDS, DAY, usePaidHouse } from '../support/stripe-fake.ts';

const house = usePaidHouse();
let tier: TierView;
let address: string;
beforeAll(async () => {
  tier = await house.sellTier({ name: 'Paperbound' });
  const { book, recipes } = await makeIssuedBook(house.ctx, {
    access: { kind: 'tier', rank: tier.rank },
    recipes: [{}],
  });
  address = `/api/reading/${book.slug}/${recipes[0]!.slug}`;
});

type Joined = Awaited<ReturnType<typeof house.joined>>;

async function sees({ browser }: Joined): Promise<string> {
  return (await browser.get(address).expect(200)).body.view;
}

async function membershipOf({ browser }: Joined) {
  return (await browser.get('/api/account').expect(200)).body.membership;
}

async function customerOf({ person }: Joined): Promise<string> {
  return (await house.db('customers').where({ person_id: person.id }).first())!.stripe_customer;
}

async function subscriptionOf({ person }: Joined): Promise<string> {
  return (await house.db('memberships').where({ person_id: person.id }).first())!.stripe_subscription;
}

async function letterKinds({ person }: Joined): Promise<string[]> {
  return house.db('letters').where({ person_id: person.id }).orderBy('created_at').pluck('kind');
}

describe('cancelling', () => {
  it('keeps the gate open to the end of what was paid; then the webhook shuts it', async () => {
    const member = await house.joined(tier);
    const { periodEnd } = await membershipOf(member);
    const cancelled = await member.browser.post('/api/account/membership/cancel').expect(200);
    expect(cancelled.body.membership).toMatchObject({ state: 'active', endsThen: true, periodEnd, opens: true });
    await member.browser.post('/api/account/membership/cancel').expect(200);
    expect(await letterKinds(member)).toEqual(['receipt', 'cancelled']);

    await house.passDays(20);
    await house.deliver();
    expect(await sees(member)).toBe('open');
    await house.passDays(15);
    await house.deliver();
    expect(await membershipOf(member)).toMatchObject({ state: 'canceled', endsThen: true, periodEnd, opens: false });
    expect(await sees(member)).toBe('teaser');
    expect(await letterKinds(member)).toEqual(['receipt', 'cancelled']);
    const late = await member.browser.post('/api/account/membership/resume').expect(409);
    expect(late.body.code).toBe('membership.none');
  });

  it('can be taken back while the membership runs, and it then renews', async () => {
    const member = await house.joined(tier);
    await member.browser.post('/api/account/membership/cancel').expect(200);
    const resumed = await member.browser.post('/api/account/membership/resume').expect(200);
    expect(resumed.body.membership).toMatchObject({ endsThen: false, opens: true });
    await house.passDays(33);
    await house.deliver();
    expect(await membershipOf(member)).toMatchObject({ state: 'active', opens: true });
    expect((await member.browser.get('/api/account')).body.receipts).toHaveLength(2);
    expect(await letterKinds(member)).toEqual(['receipt', 'cancelled', 'receipt']);
  });

  it('on the payment service’s own page, which sets a date without the flag, is understood and taken back alike', async () => {
    const member = await house.joined(tier);
    const { body } = await member.browser.post('/api/account/card').expect(200);
    const subscription = await subscriptionOf(member);
    const form = new URLSearchParams({ subscription });
    await fetch(`${body.href}/cancel`, { method: 'POST', redirect: 'manual', body: form });
    const told = await house.ctx.stripe.subscriptions.retrieve(subscription);
    expect(told).toMatchObject({ cancel_at_period_end: false, cancel_at: expect.any(Number) });

    await house.deliver();
    expect(await membershipOf(member)).toMatchObject({ endsThen: true });
    const resumed = await member.browser.post('/api/account/membership/resume').expect(200);
    expect(resumed.body.membership).toMatchObject({ endsThen: false });
  });

  it('needs a membership', async () => {
    const { browser } = await house.signedIn();
    for (const path of ['membership/cancel', 'membership/resume', 'card'])
      expect((await browser.post(`/api/account/${path}`).expect(409)).body.code).toBe('membership.none');
    expect((await browser.get('/api/account').expect(200)).body).toEqual({ membership: null, receipts: [] });
    await house.visitor().get('/api/account').expect(401);
  });

  it('changes nothing while the payment service is away', async () => {
    const member = await house.joined(tier);
    await house.control('/faults', { prefix: '/v1/subscriptions', times: 3, timeoutMs: 0 });
    const away = await member.browser.post('/api/account/membership/cancel').expect(503);
    expect(away.body.code).toBe('payments.unavailable');
    expect(await membershipOf(member)).toMatchObject({ endsThen: false });
  });

  it('by the office with immediate effect still leaves what was paid for', async () => {
    const member = await house.joined(tier);
    const { periodEnd } = await membershipOf(member);
    await house.ctx.stripe.subscriptions.cancel(await subscriptionOf(member));
    await house.deliver();
    expect(await membershipOf(member)).toMatchObject({ state: 'canceled', periodEnd, opens: true });
    expect(await sees(member)).toBe('open');
    await house.passDays(32);
    expect(await sees(member)).toBe('teaser');
  });
});

describe('a renewal that is not paid', () => {
  it('leaves the gate open for the days of grace and no longer, tells the member once, and mends with another card', async () => {
    await house.db('imprint').update({ grace_days: 4 });
    await house.control('/dunning', { retryDays: [3, 5, 7], afterwards: 'past_due' });
    const member = await house.joined(tier, CARDS.failsLater);
    const { periodEnd } = await membershipOf(member);
    const daysLeft = (Date.parse(periodEnd) - house.ctx.now().getTime()) / DAY;

    await house.passDays(daysLeft + 1);
    await house.deliver();
    expect(await membershipOf(member)).toMatchObject({ state: 'past_due', opens: true });
    expect(await sees(member)).toBe('open');
    await house.passDays(2.9);
    await house.deliver();
    expect(await sees(member)).toBe('open');
    await house.passDays(0.2);
    expect(await sees(member)).toBe('teaser');
    expect(await letterKinds(member)).toEqual(['receipt', 'payment-failed']);

    // The debt began with the first unpaid period: the next one brings no new days of grace.
    await house.passDays(30);
    await house.deliver();
    expect(await membershipOf(member)).toMatchObject({ state: 'past_due', opens: false });

    const { body } = await member.browser.post('/api/account/card').expect(200);
    const card = { cardNumber: CARDS.pays, cardExpiry: '12/60', cardCvc: '123', cardName: 'A Reader' };
    await fetch(`${body.href}/card`, { method: 'POST', redirect: 'manual', body: new URLSearchParams(card) });
    await house.deliver();
    expect(await membershipOf(member)).toMatchObject({ state: 'active', opens: true });
    expect(await sees(member)).toBe('open');
  });
});

describe('the price of a tier', () => {
  it('stays for those who joined at it, and is the new one for those who come after', async () => {
    const sold = await house.sellTier({ monthly: 700 });
    const early = await house.joined(sold);
    const admin = await house.as({ roles: ['admin'] });
    const { rank, name, description, perks, yearly } = sold;
    await admin
      .put(`/api/office/tiers/${sold.id}`)
      .set('If-Match', `"${sold.version}"`)
      .send({ rank, name, description, perks, yearly, monthly: 900 })
      .expect(200);
    await house.work();
    const late = await house.joined(sold);
    expect((await membershipOf(late)).price).toBe(900);

    await house.passDays(33);
    await house.deliver();
    expect((await membershipOf(early)).price).toBe(700);
    const { receipts } = (await early.browser.get('/api/account').expect(200)).body;
    expect(receipts.map(({ amount }: { amount: number }) => amount)).toEqual([700, 700]);
  });
});

describe('several subscriptions of one customer', () => {
  it('count as the best of them', async () => {
    const high = await house.sellTier();
    const member = await house.joined(tier);
    const first = await subscriptionOf(member);
    const price = (await house.db('tiers').where({ id: high.id }).first())!.stripe_monthly_price!;
    const customer = await customerOf(member);
    const card = (await house.ctx.stripe.subscriptions.retrieve(first)).default_payment_method as string;
    await house.ctx.stripe.subscriptions.create({ customer, items: [{ price }], default_payment_method: card });
    await converge(house.ctx, customer);
    expect(await membershipOf(member)).toMatchObject({ tier: { rank: high.rank } });

    await house.ctx.stripe.subscriptions.cancel(await subscriptionOf(member));
    await converge(house.ctx, customer);
    expect(await membershipOf(member)).toMatchObject({ tier: { rank: tier.rank }, state: 'active' });
  });
});

describe('the office', () => {
  it('can fetch a member’s truth at once; nobody else can', async () => {
    const member = await house.joined(tier);
    await house.ctx.stripe.subscriptions.update(await subscriptionOf(member), { cancel_at_period_end: true });
    const path = `/api/office/members/${member.person.id}/converge`;
    await member.browser.post(path).expect(403);
    const admin = await house.as({ roles: ['admin'] });
    const { body } = await admin.post(path).expect(200);
    expect(body.membership).toMatchObject({ endsThen: true });
    await admin.post(`/api/office/members/${crypto.randomUUID()}/converge`).expect(409);
  });
});

describe('converging at the same time', () => {
  it('eight times leaves one membership, one receipt and one letter', async () => {
    const member = await house.joined(tier);
    const customer = await customerOf(member);
    const { person } = member;
    for (const table of ['memberships', 'receipts', 'letters'] as const)
      await house.db(table).where({ person_id: person.id }).delete();
    await Promise.all(Array.from({ length: 8 }, () => converge(house.ctx, customer)));
    for (const table of ['memberships', 'receipts', 'letters'] as const)
      expect(await house.db(table).where({ person_id: person.id })).toHaveLength(1);
  });

  it('never lets an answer that was read earlier overwrite a later one', async () => {
    const member = await house.joined(tier);
    const customer = await customerOf(member);
    const slow = slowClient();
    const early = converge({ ...house.ctx, stripe: slow.stripe }, customer);
    await slow.answered;
    await house.ctx.stripe.subscriptions.cancel(await subscriptionOf(member));
    const late = converge(house.ctx, customer);
    const lateCameFirst = await Promise.race([late.then(() => true), pause(300).then(() => false)]);
    slow.release();
    await Promise.all([early, late]);
    expect(lateCameFirst).toBe(false);
    expect(await membershipOf(member)).toMatchObject({ state: 'canceled' });
  });
});

describe('when the clocks of the two disagree', () => {
  it('shuts the gate when the payment service says it is over, though the clock of the house stands still', async () => {
    const member = await house.joined(tier);
    await member.browser.post('/api/account/membership/cancel').expect(200);
    await house.control('/clock', { by: 32 * 86_400 });
    await house.deliver();
    expect(await sees(member)).toBe('teaser');
  });
});

function pause(milliseconds: number): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, milliseconds));
}

/** The official client, whose first answer is on its way until it is released. */
function slowClient() {
  let release = (): void => undefined;
  let answer = (): void => undefined;
  const released = new Promise<void>((resolve) => (release = resolve));
  const answered = new Promise<void>((resolve) => (answer = resolve));
  const slowFetch: typeof fetch = async (...request) => {
    const response = await fetch(...request);
    answer();
    await released;
    return response;
  };
  const stripe = new Stripe('sk_test_slow', {
    host: '127.0.0.1',
    port: house.fake.port,
    protocol: 'http',
    httpClient: Stripe.createFetchHttpClient(slowFetch),
  });
  return { stripe, answered, release: () => release() };
}
