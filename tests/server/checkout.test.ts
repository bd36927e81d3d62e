import { beforeAll, describe, expect, it } from 'vitest';
import type { TierView } from '../../shared/contracts/tiers.ts';
import { makeIssuedBook } from '../support/issued-book.ts';
import { CARDS, payPage, sessionOf, usePaidHouse } from '../support/stripe-fake.ts';

const house = usePaidHouse();
let tier: TierView;
beforeAll(async () => {
  tier = await house.sellTier({ name: 'Paperbound', monthly: 400, yearly: 4000 });
});

const wishFor = (returnTo = '/book/a/b') => ({ tierId: tier.id, interval: 'month', returnTo });

async function membershipOf(personId: string) {
  return house.db('memberships').where({ person_id: personId }).first();
}

describe('joining', () => {
  it('goes from the closed recipe through the hosted page back to it, open', async () => {
    const { book, recipes } = await makeIssuedBook(house.ctx, {
      access: { kind: 'tier', rank: tier.rank },
      recipes: [{}],
    });
    const address = `/api/reading/${book.slug}/${recipes[0]!.slug}`;
    const { person, browser } = await house.signedIn();
    expect((await browser.get(address).expect(200)).body.view).toBe('teaser');

    const started = await browser.post('/api/checkout').send(wishFor('/book/a/b?from=gate')).expect(200);
    expect(started.body.href.startsWith(house.fake.origin)).toBe(true);
    const page = await (await fetch(started.body.href)).text();
    expect(page).toContain('Paperbound');
    expect(page).toContain('£4.00');

    const session = sessionOf(await payPage(started.body.href, CARDS.pays));
    const back = await browser.post('/api/checkout/return').send({ session }).expect(200);
    expect(back.body).toEqual({ outcome: 'paid', returnTo: '/book/a/b?from=gate' });
    expect((await browser.get(address).expect(200)).body.view).toBe('open');
    expect((await browser.get('/api/session')).body.tier).toEqual({ rank: tier.rank, name: 'Paperbound' });

    const account = await browser.get('/api/account').expect(200);
    expect(account.body).toMatchObject({
      membership: { state: 'active', interval: 'month', price: 400, currency: 'GBP', endsThen: false, opens: true },
      receipts: [{ amount: 400, currency: 'GBP', tierName: 'Paperbound' }],
    });
    const receipt = await fetch(account.body.receipts[0].href);
    expect(await receipt.text()).toContain(account.body.receipts[0].number);
    expect(await membershipOf(person.id)).toMatchObject({ tier_id: tier.id });
  });

  it('by the year pays the yearly price', async () => {
    const { browser } = await house.signedIn();
    const { body } = await browser
      .post('/api/checkout')
      .send({ ...wishFor(), interval: 'year' })
      .expect(200);
    const session = sessionOf(await payPage(body.href, CARDS.pays));
    await browser.post('/api/checkout/return').send({ session }).expect(200);
    const account = await browser.get('/api/account').expect(200);
    expect(account.body.membership).toMatchObject({ interval: 'year', price: 4000 });
  });

  it('with a card that is declined leaves no membership, and the page open for another card', async () => {
    const { person, browser } = await house.signedIn();
    const { body } = await browser.post('/api/checkout').send(wishFor()).expect(200);
    const declined = await payPage(body.href, CARDS.declines);
    expect(await declined.text()).toContain('Your card was declined.');
    await house.deliver();
    expect(await membershipOf(person.id)).toBeUndefined();

    const again = await browser.post('/api/checkout').send(wishFor()).expect(200);
    expect(again.body.href).toBe(body.href);
    const session = new URL(body.href).pathname.split('/').at(-1)!;
    const early = await browser.post('/api/checkout/return').send({ session }).expect(200);
    expect(early.body).toEqual({ outcome: 'open', returnTo: '/book/a/b' });

    sessionOf(await payPage(body.href, CARDS.pays));
    const back = await browser.post('/api/checkout/return').send({ session }).expect(200);
    expect(back.body.outcome).toBe('paid');
  });

  it('needs an account whose address is confirmed', async () => {
    await house.visitor().post('/api/checkout').send(wishFor()).expect(401);
    const { person, browser } = await house.signedIn({ verified: false });
    const refused = await browser.post('/api/checkout').send(wishFor()).expect(403);
    expect(refused.body.code).toBe('checkout.not_verified');
    expect(await house.db('customers').where({ person_id: person.id })).toEqual([]);
  });

  it('is not sold twice, not even by a page that was left open in another window', async () => {
    const { person, browser } = await house.signedIn();
    const yearly = await browser
      .post('/api/checkout')
      .send({ ...wishFor(), interval: 'year' })
      .expect(200);
    const monthly = await browser.post('/api/checkout').send(wishFor()).expect(200);
    expect(monthly.body.href).not.toBe(yearly.body.href);
    expect((await payPage(yearly.body.href, CARDS.pays)).status).toBe(410);
    sessionOf(await payPage(monthly.body.href, CARDS.pays));

    // Nobody came back and no webhook has arrived: the next checkout finds out by itself.
    const refused = await browser.post('/api/checkout').send(wishFor()).expect(409);
    expect(refused.body.code).toBe('checkout.already_member');
    expect(await membershipOf(person.id)).toMatchObject({ state: 'active' });
  });

  it('is not sold while the price on show is not yet the price that would be charged', async () => {
    const { browser } = await house.signedIn();
    await house.db('tiers').where({ id: tier.id }).update({ sync: 'waiting' });
    const refused = await browser.post('/api/checkout').send(wishFor()).expect(409);
    await house.db('tiers').where({ id: tier.id }).update({ sync: 'in-step' });
    expect(refused.body.code).toBe('checkout.tier_waiting');
    const unknown = { ...wishFor(), tierId: crypto.randomUUID() };
    expect((await browser.post('/api/checkout').send(unknown).expect(404)).body.code).toBe('tiers.not_found');
  });

  it('leads back to a path of this site only', async () => {
    const { browser } = await house.signedIn();
    for (const returnTo of ['//elsewhere.example', 'https://elsewhere.example', '/\\elsewhere.example', ''])
      await browser.post('/api/checkout').send(wishFor(returnTo)).expect(400);
  });

  it('tells what became of a page to the person who opened it only', async () => {
    const { browser } = await house.signedIn();
    const { body } = await browser.post('/api/checkout').send(wishFor()).expect(200);
    const session = sessionOf(await payPage(body.href, CARDS.pays));
    const other = await house.joined(tier);
    await other.browser.post('/api/checkout/return').send({ session }).expect(404);
    await browser.post('/api/checkout/return').send({ session: 'cs_test_unknown' }).expect(404);
  });
});

describe('eight checkouts at once', () => {
  it('make one customer and lead to one page', async () => {
    const { person, browser } = await house.signedIn();
    const answers = await Promise.all(Array.from({ length: 8 }, () => browser.post('/api/checkout').send(wishFor())));
    expect(answers.map(({ status }) => status)).toEqual(Array.from({ length: 8 }, () => 200));
    expect(new Set(answers.map(({ body }) => body.href)).size).toBe(1);
    const { data } = await house.ctx.stripe.customers.list({ email: person.email });
    expect(data).toHaveLength(1);
  });
});

describe('while the payment service is away', () => {
  it('checkout says so and nothing is half done', async () => {
    const { person, browser } = await house.signedIn();
    // The client tries three times before it gives up.
    await house.control('/faults', { prefix: '/v1/customers', times: 3, timeoutMs: 0 });
    const away = await browser.post('/api/checkout').send(wishFor()).expect(503);
    expect(away.body.code).toBe('payments.unavailable');
    expect(away.headers['retry-after']).toBe('10');
    expect(await house.db('customers').where({ person_id: person.id })).toEqual([]);
    await browser.post('/api/checkout').send(wishFor()).expect(200);
  });

  it('a customer whose making was acted out but never answered is not made again', async () => {
    const { person, browser } = await house.signedIn();
    await house.control('/faults', { prefix: '/v1/customers', times: 3, timeoutMs: 0, when: 'after' });
    await browser.post('/api/checkout').send(wishFor()).expect(503);
    await browser.post('/api/checkout').send(wishFor()).expect(200);
    const { data } = await house.ctx.stripe.customers.list({ email: person.email });
    expect(data).toHaveLength(1);
  });

  it('a payment that cannot be looked up yet is not lost', async () => {
    const { person, browser } = await house.signedIn();
    const { body } = await browser.post('/api/checkout').send(wishFor()).expect(200);
    const session = sessionOf(await payPage(body.href, CARDS.pays));
    await house.control('/faults', { prefix: '/v1/invoices', times: 3, status: 500 });
    await browser.post('/api/checkout/return').send({ session }).expect(503);
    expect(await membershipOf(person.id)).toBeUndefined();
    const back = await browser.post('/api/checkout/return').send({ session }).expect(200);
    expect(back.body.outcome).toBe('paid');
  });
});
