import type { TierPublic } from '@shared/contracts/tiers.ts';

/** What paying by the year saves against twelve months, in minor units; negative where it costs more. */
export function yearlySaving({ monthly, yearly }: Pick<TierPublic, 'monthly' | 'yearly'>): number {
  return 12 * monthly - yearly;
}
