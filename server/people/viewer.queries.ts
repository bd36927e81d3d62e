import type { Knex } from 'knex';
import type { SubscriptionState } from '../../shared/contracts/membership.ts';
import type { Role } from '../../shared/contracts/words.ts';
import { askPrepared, type Prepared } from '../db/prepared.ts';

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

/** `$1` is the person. */
const FIND_VIEWER: Prepared = {
  name: 'find-viewer',
  text: `select people.id, people.email, people.name, people.verified_at, people.roles, people.age_confirmed_at,
      memberships.state, memberships.paid_until, memberships.ends_at, memberships.past_due_since,
      tiers.rank, tiers.name as tier_name, imprint.grace_days
    from people
    cross join imprint
    left join memberships on memberships.person_id = people.id
    left join tiers on tiers.id = memberships.tier_id
    where people.id = $1`,
};

/** Everything about a person that decides what they may do, in one indexed query. */
export async function findViewerRow(db: Knex, personId: string): Promise<ViewerRow | undefined> {
  const [row] = await askPrepared<ViewerRow>(db, FIND_VIEWER, [personId]);
  return row;
}
