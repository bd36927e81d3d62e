import type { SubscriptionState } from '../../shared/contracts/membership.ts';

/** What the payment service says of a member, as converged. */
export interface Membership {
  rank: number;
  tierName: string;
  state: SubscriptionState;
  paidUntil: Date | null;
  endsAt: Date | null;
  pastDueSince: Date | null;
}

/**
 * The rank a membership opens at this moment; 0 for none.
 *
 * Open while the subscription is trialing or active; past due for the grace days; cancelled to the end of what was
 * paid. A subscription that ran to the end of its paid time has nothing left, whatever our own clock says.
 */
export function entitledRank(membership: Membership | null, graceDays: number, now: Date): number {
  if (!membership) return 0;
  return isOpen(membership, graceDays, now) ? membership.rank : 0;
}

function isOpen({ state, paidUntil, endsAt, pastDueSince }: Membership, graceDays: number, now: Date): boolean {
  switch (state) {
    case 'trialing':
    case 'active':
      return true;
    case 'past_due':
      return pastDueSince !== null && now.getTime() < pastDueSince.getTime() + graceDays * 86_400_000;
    case 'canceled':
      return paidUntil !== null && endsAt !== null && endsAt < paidUntil && now < paidUntil;
    default:
      return false;
  }
}
