import { Stripe } from 'stripe';
import supertest from 'supertest';
import { beforeAll, describe, expect, it } from 'vitest';
import { reconcilePayments } from '../../server/payments/reconcile.job.ts';
import type { TierView } from '../../shared/contracts/tiers.ts';
import { CARDS, payPage, usePaidHouse, WEBHOOK_SECRET } from '../support/stripe-fake.ts';

const house = usePaidHouse();
let tier: TierView;
beforeAll(async () => {
  tier = await house.sellTier();
  await house.deliver();
});

/** Pays and never comes back: only the payment service can tell the house. */
async function payAndLeave() {
  const reader = await house.signedIn();
  const wish = { tierId: tier.id, interval: 'month', returnTo: '/' };
  const { body } = await reader.browser.post('/api/checkout').send(wish).expect(200);
  await payPage(body.href, CARDS.pays);
  return reader;
}

async function stateOf(personId: string): Promise<string | undefined> {
  return (await house.db('memberships').where({ person_id: personId }).first('state'))?.state;
}

/** The body of an event, and the request that carries it with a signature by the official SDK. */
function post(event: object, secret = WEBHOOK_SECRET, sent = JSON.stringify(event)) {
  const payload = JSON.stringify(event);
  const header = Stripe.webhooks.generateTestHeaderString({ payload, secret });
  return supertest(house.origin)
    .post('/api/stripe/webhook')
    .set('Content-Type', 'application/json')
    .set('Stripe-Signature', header)
    .send(sent);
}

async function events(): Promise<Stripe.Event[]> {
  return (await house.ctx.stripe.events.list({ limit: 100 })).data;
}

describe('webhooks', () => {
  it('open the gate for somebody who paid and never came back', async () => {
    const { person, browser } = await payAndLeave();
    expect(await stateOf(person.id)).toBeUndefined();
    const deliveries = await house.deliver();
    expect(new Set(deliveries.map(({ status }) => status))).toEqual(new Set([200]));
    expect((await browser.get('/api/account')).body.membership).toMatchObject({ state: 'active', opens: true });
    const recorded = await house.db('stripe_events').whereNotNull('stripe_customer');
    expect(recorded.every(({ converged_at: at }) => at !== null)).toBe(true);
  });

  it.each(['reversed', 'shuffled'] as const)('in %s order come to the same', async (order) => {
    const { person, browser } = await payAndLeave();
    await house.deliver(order);
    expect(await stateOf(person.id)).toBe('active');
    const account = await browser.get('/api/account').expect(200);
    expect(account.body.receipts).toHaveLength(1);
    expect(await house.db('letters').where({ person_id: person.id, kind: 'receipt' })).toHaveLength(1);
  });

  it('that come twice are recorded once and change nothing more', async () => {
    const { person } = await payAndLeave();
    await house.deliver();
    const before = await house.db('memberships').where({ person_id: person.id }).first();
    const [event] = await events();
    const count = async () => (await house.db('stripe_events').where({ id: event!.id })).length;
    expect(await count()).toBe(1);
    await house.control(`/events/${event!.id}/redeliver`, {});
    expect(await count()).toBe(1);
    expect(await house.db.withSchema('graphile_worker').from('jobs').select('task_identifier')).toEqual([]);
    await house.work();
    expect(await house.db('memberships').where({ person_id: person.id }).first()).toEqual(before);
  });

  it('tell that something happened, not what: an old one does not undo what came after it', async () => {
    const { person, browser } = await payAndLeave();
    await house.deliver();
    await browser.post('/api/account/membership/cancel').expect(200);
    const started = (await events()).find(
      ({ type, data }) => type === 'customer.subscription.created' && JSON.stringify(data.object).includes(person.id),
    );
    await house.db('stripe_events').where({ id: started!.id }).delete();
    await house.control(`/events/${started!.id}/redeliver`, {});
    await house.work();
    expect((await browser.get('/api/account')).body.membership).toMatchObject({ state: 'active', endsThen: true });
  });

  it('with a wrong signature, none, or another body are refused and leave nothing', async () => {
    const [event] = await events();
    const forged = { ...event, id: 'evt_forged' };
    for (const request of [
      post(forged, 'whsec_other'),
      post(forged, WEBHOOK_SECRET, JSON.stringify({ ...forged, a: 1 })),
    ])
      expect((await request.expect(400)).body.code).toBe('payments.signature');
    const bare = supertest(house.origin).post('/api/stripe/webhook').set('Content-Type', 'application/json');
    expect((await bare.send(JSON.stringify(forged)).expect(400)).body.code).toBe('payments.signature');
    const empty = await supertest(house.origin).post('/api/stripe/webhook').expect(400);
    expect(empty.body.code).toBe('payments.signature');
    expect(await house.db('stripe_events').where({ id: 'evt_forged' })).toEqual([]);

    await post(forged).expect(200);
    expect(await house.db('stripe_events').where({ id: 'evt_forged' })).toHaveLength(1);
  });

  it('about a customer who is not ours are recorded and left', async () => {
    const stranger = await house.ctx.stripe.customers.create({ email: 'stranger@house.example' });
    await house.deliver();
    const recorded = await house.db('stripe_events').where({ stripe_customer: stranger.id });
    expect(recorded).toMatchObject([{ type: 'customer.created', converged_at: null }]);
    expect(await house.db('customers').where({ stripe_customer: stranger.id })).toEqual([]);
  });

  it('that arrive while the payment service does not answer are worked through later', async () => {
    const { person } = await payAndLeave();
    await house.control('/faults', { prefix: '/v1/subscriptions', times: 3, timeoutMs: 0 });
    await house.deliver();
    expect(await stateOf(person.id)).toBeUndefined();
    await house.db.raw('update graphile_worker._private_jobs set run_at = now()');
    await house.work();
    expect(await stateOf(person.id)).toBe('active');
  });
});

describe('the nightly reconciliation', () => {
  it('catches up with webhooks that never arrived', async () => {
    const { person } = await payAndLeave();
    const { data: missed } = await house.ctx.stripe.events.list({ delivery_success: false });
    await reconcilePayments(house.ctx);
    expect(await stateOf(person.id)).toBe('active');
    const ids = missed.map(({ id }) => id);
    expect(await house.db('stripe_events').whereIn('id', ids)).toHaveLength(ids.length);
  });

  it('goes on after one customer’s trouble, and fails at the end so that it runs again', async () => {
    const [first, second] = [await payAndLeave(), await payAndLeave()];
    // All three tries for the customer whose turn comes first.
    await house.control('/faults', { prefix: '/v1/subscriptions', times: 3, status: 500 });
    await expect(reconcilePayments(house.ctx)).rejects.toThrow('Customers that could not be reconciled: 1.');
    await reconcilePayments(house.ctx);
    expect([await stateOf(first.person.id), await stateOf(second.person.id)]).toEqual(['active', 'active']);
  });
});
