import { tierLadder, type TierPublic } from '@shared/contracts/tiers.ts';
import { request } from './request.ts';

/** The tiers that can be joined, lowest first. */
export async function fetchTiers(): Promise<TierPublic[]> {
  return (await request('GET', '/api/tiers', tierLadder)).data.tiers;
}
