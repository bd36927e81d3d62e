import { z } from 'zod';
import { currency } from './imprint.ts';
import { id, line, minorUnits, version } from './primitives.ts';

/** What an admin sells. Ranks are a ladder: a higher rank opens everything below it. */
export const tierDraft = z.strictObject({
  rank: z.int().min(1).max(20),
  name: line(60),
  description: z.string().trim().max(400),
  perks: z.array(line(120)).max(12),
  /** Minor units of the imprint's currency. */
  monthly: minorUnits.min(50, 'The least that can be charged is 50 minor units.'),
  yearly: minorUnits.min(50, 'The least that can be charged is 50 minor units.'),
});
export type TierDraft = z.infer<typeof tierDraft>;

/** A tier as visitors compare them. */
export const tierPublic = tierDraft.extend({ id, currency, recipeCount: z.int() });
export type TierPublic = z.infer<typeof tierPublic>;
export const tierLadder = z.object({ tiers: z.array(tierPublic) });

/** Whether the payment service knows this tier as it stands here. */
export const TIER_SYNC = ['waiting', 'in-step', 'failed'] as const;
export const tierView = tierDraft.extend({
  id,
  version,
  currency,
  sync: z.enum(TIER_SYNC),
  syncFault: z.string().nullable(),
  members: z.int(),
  closed: z.boolean(),
});
export type TierView = z.infer<typeof tierView>;
export const tierList = z.object({ tiers: z.array(tierView) });
