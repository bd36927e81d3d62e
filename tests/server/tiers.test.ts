import type { Stripe } from 'stripe';
import { describe, expect, it } from 'vitest';
import type { TierDraft, TierView } from '../../shared/contracts/tiers.ts';
import { syncTier } from '../../server/payments/sync-tier.job.ts';
import { makeIssuedBook } from '../support/issued-book.ts';
import { makeTierDraft, usePaidHouse } from '../support/stripe-fake.ts';

const house = usePaidHouse();

async function pricesOf(tier: TierView): Promise<Stripe.Price[]> {
  const row = await house.db('tiers').where({ id: tier.id }).first();
  const { data } = await house.ctx.stripe.prices.list({ product: row!.stripe_product!, limit: 100 });
  return data;
}

async function save(tier: TierView, change: Partial<TierDraft>, version = tier.version): Promise<TierView> {
  const admin = await house.as({ roles: ['admin'] });
  const { rank, name, description, perks, monthly, yearly } = tier;
  const draft = { rank, name, description, perks, monthly, yearly, ...change };
  const { body } = await admin
    .put(`/api/office/tiers/${tier.id}`)
    .set('If-Match', `"${version}"`)
    .send(draft)
    .expect(200);
  return body as TierView;
}

describe('a tier', () => {
  it('waits until the payment service knows it, then has a product and a price for each interval', async () => {
    const admin = await house.as({ roles: ['admin'] });
    const draft = makeTierDraft({ name: 'Paperbound', monthly: 450, yearly: 4500, perks: ['Scaling'] });
    const made = await admin.post('/api/office/tiers').send(draft).expect(201);
    expect(made.body).toMatchObject({ ...draft, sync: 'waiting', currency: 'GBP', members: 0, closed: false });
    expect(made.headers['etag']).toBe('"1"');

    await house.work();
    const { body } = await admin.get('/api/office/tiers').expect(200);
    expect(body.tiers.find(({ id }: TierView) => id === made.body.id)).toMatchObject({ sync: 'in-step' });
    const prices = await pricesOf(made.body);
    expect(
      prices.map(({ active, currency, unit_amount, recurring, lookup_key, metadata }) => {
        return { active, currency, unit_amount, interval: recurring?.interval, lookup_key, metadata };
      }),
    ).toEqual(
      [
        { interval: 'year', unit_amount: 4500 },
        { interval: 'month', unit_amount: 450 },
      ].map(({ interval, unit_amount }) => ({
        interval,
        unit_amount,
        active: true,
        currency: 'gbp',
        lookup_key: `tier:${made.body.id}:${interval}`,
        metadata: { tierId: made.body.id },
      })),
    );
  });

  it('gets another price for another amount, once however often it is synchronised, and archives the old one', async () => {
    const tier = await house.sellTier({ monthly: 500, yearly: 5000 });
    await save(tier, { monthly: 600 });
    await house.work();
    await syncTier(house.ctx, { tierId: tier.id });
    const states = (await pricesOf(tier)).map(({ unit_amount: amount, active }) => ({ amount, active }));
    expect(states).toEqual([
      { amount: 600, active: true },
      { amount: 5000, active: true },
      { amount: 500, active: false },
    ]);

    // Back to the first amount: the archived price of that amount must not be taken for the new one.
    const again = await save(tier, { monthly: 500 }, 2);
    await house.work();
    const active = (await pricesOf(again)).filter((price) => price.active);
    expect(active.map((price) => price.unit_amount).sort()).toEqual([500, 5000]);
  });

  it('says why it is out of step, and comes in step by itself', async () => {
    const tier = await house.sellTier();
    await house.control('/faults', { prefix: '/v1/products', times: 3, status: 500 });
    await save(tier, { name: 'Renamed' });
    await house.work();
    const row = await house.db('tiers').where({ id: tier.id }).first();
    expect(row).toMatchObject({ sync: 'failed', sync_fault: expect.stringContaining('control plane') });

    await house.db.raw('update graphile_worker._private_jobs set run_at = now()');
    await house.work();
    expect(await house.db('tiers').where({ id: tier.id }).first()).toMatchObject({ sync: 'in-step', sync_fault: null });
    const product = await house.ctx.stripe.products.retrieve(row!.stripe_product!);
    expect(product.name).toBe('Renamed');
  });

  it('finds again what a run that was killed had made', async () => {
    const tier = await house.sellTier();
    const before = await house.db('tiers').where({ id: tier.id }).first();
    await house.db('tiers').where({ id: tier.id }).update({
      stripe_product: null,
      stripe_monthly_price: null,
      stripe_yearly_price: null,
    });
    await syncTier(house.ctx, { tierId: tier.id });
    expect(await house.db('tiers').where({ id: tier.id }).first()).toEqual(before);
  });

  it('shares its rank with no other open tier, told at the field', async () => {
    const tier = await house.sellTier();
    const admin = await house.as({ roles: ['admin'] });
    const refused = await admin
      .post('/api/office/tiers')
      .send(makeTierDraft({ rank: tier.rank }))
      .expect(409);
    expect(refused.body).toMatchObject({ code: 'tiers.rank_taken', faults: [{ path: 'rank' }] });
  });

  it('is saved on the version that was seen only', async () => {
    const tier = await house.sellTier();
    await save(tier, { name: 'First' });
    const admin = await house.as({ roles: ['admin'] });
    const draft = makeTierDraft({ rank: tier.rank });
    const put = () => admin.put(`/api/office/tiers/${tier.id}`).send(draft);
    await put().set('If-Match', '"1"').expect(412);
    await put().expect(428);
    expect((await house.db('tiers').where({ id: tier.id }).first())!.name).toBe('First');
  });

  it('refuses a price below what can be charged', async () => {
    const admin = await house.as({ roles: ['admin'] });
    const refused = await admin
      .post('/api/office/tiers')
      .send(makeTierDraft({ monthly: 49 }))
      .expect(400);
    expect(refused.body.faults).toMatchObject([{ path: 'monthly' }]);
  });
});

describe('closing a tier', () => {
  it('takes it off the ladder and out of sale, and leaves its members what they have', async () => {
    const tier = await house.sellTier();
    const { browser } = await house.joined(tier);
    const admin = await house.as({ roles: ['admin'] });
    const closed = await admin.post(`/api/office/tiers/${tier.id}/close`).expect(200);
    expect(closed.body).toMatchObject({ closed: true, members: 1 });
    await admin.post(`/api/office/tiers/${tier.id}/close`).expect(200);
    await house.work();

    const ladder = await house.visitor().get('/api/tiers').expect(200);
    expect(ladder.body.tiers.map(({ id }: TierView) => id)).not.toContain(tier.id);
    expect((await pricesOf(tier)).every(({ active }) => !active)).toBe(true);
    const other = await house.signedIn();
    const wish = { tierId: tier.id, interval: 'month', returnTo: '/' };
    const refused = await other.browser.post('/api/checkout').send(wish).expect(409);
    expect(refused.body.code).toBe('checkout.tier_closed');
    expect((await browser.get('/api/account')).body.membership).toMatchObject({ opens: true });
    await house.sellTier({ rank: tier.rank });
  });
});

describe('the ladder', () => {
  it('stands lowest first and counts the recipes that each rank opens', async () => {
    await house.db('tiers').update({ closed_at: new Date() });
    const high = await house.sellTier({ rank: 5 });
    const low = await house.sellTier({ rank: 2 });
    await makeIssuedBook(house.ctx, {
      access: { kind: 'tier', rank: 5 },
      recipes: [
        { access: { kind: 'open' } },
        { access: { kind: 'account' } },
        { access: { kind: 'tier', rank: 2 } },
        { access: null },
      ],
    });
    const { body } = await house.visitor().get('/api/tiers').expect(200);
    expect(body.tiers.map(({ id, recipeCount }: { id: string; recipeCount: number }) => ({ id, recipeCount }))).toEqual(
      [
        { id: low.id, recipeCount: 3 },
        { id: high.id, recipeCount: 4 },
      ],
    );
  });
});
