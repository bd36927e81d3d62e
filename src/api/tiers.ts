import {
  tierLadder,
  tierList,
  tierView,
  type TierDraft,
  type TierPublic,
  type TierView,
} from '@shared/contracts/tiers.ts';
import { request } from './request.ts';

/** The tiers that can be joined, lowest first. */
export async function fetchTiers(): Promise<TierPublic[]> {
  return (await request('GET', '/api/tiers', tierLadder)).data.tiers;
}

/** Every tier with its members and its state at the payment service. */
export async function fetchOfficeTiers(): Promise<TierView[]> {
  return (await request('GET', '/api/office/tiers', tierList)).data.tiers;
}

export async function makeTier(draft: TierDraft): Promise<TierView> {
  return (await request('POST', '/api/office/tiers', tierView, { body: draft })).data;
}

/** Saves a tier over the version that was read. @throws ApiProblem `request.version_conflict` */
export async function saveTier(tier: Pick<TierView, 'id' | 'version'>, draft: TierDraft): Promise<TierView> {
  const path = `/api/office/tiers/${tier.id}`;
  return (await request('PUT', path, tierView, { body: draft, ifMatch: `"${tier.version}"` })).data;
}

/** Closes a tier to new members; those who hold it keep it. */
export async function closeTier(id: string): Promise<TierView> {
  return (await request('POST', `/api/office/tiers/${id}/close`, tierView)).data;
}
