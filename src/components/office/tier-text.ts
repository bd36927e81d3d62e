import type { TierDraft } from '@shared/contracts/tiers.ts';
import { readMoney, writeMoney } from '@/components/money-text.ts';
import { readWhole, type TypedFault } from './typed-number.ts';

export const TIER_FIELDS = ['rank', 'name', 'description', 'perks', 'monthly', 'yearly'] as const;
export type TierField = (typeof TIER_FIELDS)[number];
/** A tier as it is typed: everything is text until it is saved, one perk a line. */
export type TypedTier = Record<TierField, string>;

export type TierFault = { path: TierField } & (
  | TypedFault
  | { kind: 'money' }
  /** Minor units. */
  | { kind: 'least'; least: number }
  | { kind: 'tooLong' | 'tooMany'; most: number }
  | { kind: 'longLine'; most: number; start: string }
);

/** The bounds of the contract, told before anything is sent. */
const RANKS = { min: 1, max: 20 };
const LEAST_PRICE = 50;
const MOST = { description: 400, perks: 12, perk: 120 };

export function writeTier({ rank, name, description, perks, monthly, yearly }: TierDraft): TypedTier {
  return {
    rank: String(rank),
    name,
    description,
    perks: perks.join('\n'),
    monthly: writeMoney(monthly),
    yearly: writeMoney(yearly),
  };
}

/** What was typed as it is sent, or everything that is wrong with it, in the order of the form. */
export function readTier(typed: TypedTier): { draft: TierDraft } | { faults: TierFault[] } {
  const name = typed.name.trim();
  const rank = readWhole(typed.rank, RANKS);
  const description = typed.description.trim();
  const monthly = readPrice(typed.monthly);
  const yearly = readPrice(typed.yearly);
  const perks = linesOf(typed.perks);

  const faults: TierFault[] = [];
  if (!name) faults.push({ path: 'name', kind: 'missing' });
  if (typeof rank !== 'number') faults.push({ path: 'rank', ...rank });
  if (description.length > MOST.description) {
    faults.push({ path: 'description', kind: 'tooLong', most: MOST.description });
  }
  if (typeof monthly !== 'number') faults.push({ path: 'monthly', ...monthly });
  if (typeof yearly !== 'number') faults.push({ path: 'yearly', ...yearly });
  const long = perks.find((perk) => perk.length > MOST.perk);
  if (perks.length > MOST.perks) faults.push({ path: 'perks', kind: 'tooMany', most: MOST.perks });
  else if (long) faults.push({ path: 'perks', kind: 'longLine', most: MOST.perk, start: long.slice(0, 24) });

  if (typeof rank !== 'number' || typeof monthly !== 'number' || typeof yearly !== 'number' || faults.length > 0) {
    return { faults };
  }
  return { draft: { rank, name, description, perks, monthly, yearly } };
}

function readPrice(typed: string): number | { kind: 'missing' | 'money' } | { kind: 'least'; least: number } {
  const minor = readMoney(typed);
  if (minor === null) return { kind: 'missing' };
  if (minor === undefined) return { kind: 'money' };
  return minor < LEAST_PRICE ? { kind: 'least', least: LEAST_PRICE } : minor;
}

function linesOf(typed: string): string[] {
  return typed
    .split('\n')
    .map((perk) => perk.trim())
    .filter(Boolean);
}
