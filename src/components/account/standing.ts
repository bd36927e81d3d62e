import type { MembershipView } from '@shared/contracts/membership.ts';

/**
 * A membership in the terms of its holder, who does not know the payment service's states.
 *
 * `runs`: paid and renewed; `trial`: not charged before the end of the period; `ends`: cancelled, open until then;
 * `late`: the last payment failed, open for the days of grace; `unpaid`: the payment failed and the tier is closed;
 * `paused`: nothing is charged or open; `readsOn`: ended at once, open to the end of what was paid; `over`: it was;
 * `unfinished`: the first payment never went through.
 */
export type Standing =
  'none' | 'runs' | 'trial' | 'ends' | 'late' | 'unpaid' | 'paused' | 'readsOn' | 'over' | 'unfinished';

export function standingOf(membership: Pick<MembershipView, 'state' | 'endsThen' | 'opens'> | null): Standing {
  if (!membership) return 'none';
  const { state, endsThen, opens } = membership;
  switch (state) {
    case 'active':
      return endsThen ? 'ends' : 'runs';
    case 'trialing':
      return endsThen ? 'ends' : 'trial';
    case 'past_due':
      return opens ? 'late' : 'unpaid';
    case 'unpaid':
      return 'unpaid';
    case 'paused':
      return 'paused';
    case 'canceled':
      return opens ? 'readsOn' : 'over';
    case 'incomplete':
    case 'incomplete_expired':
      return 'unfinished';
  }
}

const OVER: readonly Standing[] = ['readsOn', 'over', 'unfinished'];
const FAILED: readonly Standing[] = ['late', 'unpaid'];

/** Whether it is still kept by the payment service: its card can be changed, and it can be ended. */
export function isHeld(standing: Standing): boolean {
  return standing !== 'none' && !OVER.includes(standing);
}

/** Whether a payment did not go through and another card is what helps. */
export function isFailed(standing: Standing): boolean {
  return FAILED.includes(standing);
}

/** What the day of `periodEnd` is to the holder. */
export function dayWord(standing: Standing, endsThen: boolean): 'renews' | 'ends' | 'ended' | 'until' | 'period' {
  if (standing === 'readsOn') return 'until';
  if (standing === 'over' || standing === 'unfinished') return 'ended';
  if (endsThen) return 'ends';
  return standing === 'unpaid' || standing === 'paused' ? 'period' : 'renews';
}
