import type { Knex } from 'knex';
import type { SubscriptionState } from '../../shared/contracts/membership.ts';

export interface MembershipWish {
  rank: number;
  state?: SubscriptionState;
  paidUntil?: Date | null;
  endsAt?: Date | null;
  pastDueSince?: Date | null;
}

/** The open tier of a rank, made when it is not there. */
export async function makeTier(db: Knex, rank: number): Promise<string> {
  const there = await db('tiers').where({ rank }).whereNull('closed_at').first('id');
  if (there) return there.id;
  const [row] = await db('tiers')
    .insert({ rank, name: `Tier ${rank}`, monthly: rank * 400, yearly: rank * 4000, currency: 'GBP' })
    .returning('id');
  return row!.id;
}

/** A membership as converging would have written it; active and paid for a month unless told otherwise. */
export async function makeMembership(db: Knex, personId: string, wish: MembershipWish): Promise<void> {
  const month = new Date(Date.now() + 30 * 86_400_000);
  await db.table('memberships').insert({
    person_id: personId,
    tier_id: await makeTier(db, wish.rank),
    stripe_subscription: `sub_${personId}`,
    state: wish.state ?? 'active',
    payment_interval: 'month',
    price: wish.rank * 400,
    currency: 'GBP',
    period_end: month,
    paid_until: wish.paidUntil === undefined ? month : wish.paidUntil,
    ends_at: wish.endsAt ?? null,
    past_due_since: wish.pastDueSince ?? null,
    converged_at: new Date(),
  });
}
