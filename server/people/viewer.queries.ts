import type { Knex } from 'knex';
import type { SubscriptionState } from '../../shared/contracts/membership.ts';
import type { Role } from '../../shared/contracts/words.ts';

export interface ViewerRow {
  id: string;
  email: string;
  name: string;
  verified_at: Date | null;
  roles: Role[];
  age_confirmed_at: Date | null;
  state: SubscriptionState | null;
  paid_until: Date | null;
  ends_at: Date | null;
  past_due_since: Date | null;
  rank: number | null;
  tier_name: string | null;
  grace_days: number;
}

/** Everything about a person that decides what they may do, in one indexed query, prepared by name: every request asks it. */
export async function findViewerRow(db: Knex, personId: string): Promise<ViewerRow | undefined> {
  return db('people')
    .crossJoin('imprint' as never)
    .leftJoin('memberships', 'memberships.person_id', 'people.id')
    .leftJoin('tiers', 'tiers.id', 'memberships.tier_id')
    .where('people.id', personId)
    .first<ViewerRow>(
      'people.id',
      'people.email',
      'people.name',
      'people.verified_at',
      'people.roles',
      'people.age_confirmed_at',
      'memberships.state',
      'memberships.paid_until',
      'memberships.ends_at',
      'memberships.past_due_since',
      'tiers.rank',
      'tiers.name as tier_name',
      'imprint.grace_days',
    )
    .options({ name: 'find-viewer' });
}
