import { pino } from 'pino';
import { describe, expect, it } from 'vitest';
import { joinDemoMembers } from '../../server/demo/demo-members.job.ts';
import { addJob } from '../../server/jobs/queue.ts';
import { makeTier } from '../support/members.ts';
import { makePerson } from '../support/people.ts';
import { usePaidHouse } from '../support/stripe-fake.ts';

const house = usePaidHouse({ log: pino({ level: 'silent' }) }, { MODE: 'demo' });

describe('the members of the demonstration', () => {
  it('hold what was really bought for them, once, however often the job runs', async () => {
    const member = await makePerson(house.db, { email: 'member@demo.example' });
    const reader = await makePerson(house.db, { email: 'reader@demo.example' });
    await makeTier(house.db, 1);
    await addJob(house.db, 'join-demo-members', {});
    await house.work();
    await joinDemoMembers(house.ctx);

    const held = await house.db('memberships').where({ person_id: member.id }).first();
    expect(held).toMatchObject({ state: 'active', payment_interval: 'month', price: 400 });
    expect(await house.db('memberships').where({ person_id: reader.id })).toEqual([]);
    const { data } = await house.ctx.stripe.subscriptions.list({ status: 'all' });
    expect(data.map(({ id }) => id)).toEqual([held!.stripe_subscription]);
  });

  it('do not exist outside the demonstration', async () => {
    const member = await makePerson(house.db, { email: 'clothbound@demo.example' });
    await makeTier(house.db, 3);
    await joinDemoMembers({ ...house.ctx, settings: { ...house.ctx.settings, mode: 'production' } });
    expect(await house.db('customers').where({ person_id: member.id })).toEqual([]);
  });
});
