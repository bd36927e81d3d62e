import type { Range } from '../contracts/primitives.ts';

export type Liveliness = 'warm' | 'simmer' | 'boil';

/**
 * Share of the ethanol left after minutes of simmering. USDA Table of Nutrient Retention Factors, release 6 (2007), nutrient
 * 221: stirred into hot liquid 85 %, then 40, 35, 25, 20, 10 and 5 % after 15 minutes to 2.5 hours.
 */
const RETAINED = [
  [0, 0.85],
  [15, 0.4],
  [30, 0.35],
  [60, 0.25],
  [90, 0.2],
  [120, 0.1],
  [150, 0.05],
] as const;

/** Minutes to the last factor that was ever measured. */
export const LONGEST_RETENTION = 150;

/** The factors come from six dishes of one laboratory: they are shown give or take this share. Estimate. */
const SPREAD = 0.1;

/** Water boiled off an open pan, as a share per minute. Estimate: it hangs on the pan's width. */
const WATER_LOSS: Record<Liveliness, Range> = {
  warm: { min: 0, max: 0.003 },
  simmer: { min: 0.003, max: 0.015 },
  boil: { min: 0.01, max: 0.04 },
};

/** What a lid lets through of it. Estimate. */
const LID = 0.2;

export interface Heating {
  liveliness: Liveliness;
  covered: boolean;
  /** Minutes. */
  minutes: Range;
}

/** Share of the ethanol kept, 0 to 1, or null past the 2.5 hours that were measured. A lid or mere warmth may keep all of it. */
export function ethanolKept({ liveliness, covered, minutes }: Heating): Range | null {
  if (minutes.max > LONGEST_RETENTION) return null;
  const max = covered || liveliness === 'warm' ? 1 : retained(minutes.min) + SPREAD;
  return { min: Math.max(0, retained(minutes.max) - SPREAD), max };
}

/** Share of the water kept, 0 to 1. */
export function waterKept({ liveliness, covered, minutes }: Heating): Range {
  const loss = WATER_LOSS[liveliness];
  const through = covered ? LID : 1;
  return {
    min: Math.exp(-loss.max * through * minutes.max),
    max: Math.exp(-loss.min * through * minutes.min),
  };
}

/** The factor between the measured times, drawn straight from one to the next. Minutes from 0 to 150. */
export function retained(minutes: number): number {
  const next = RETAINED.findIndex(([time]) => time >= minutes);
  const [time, share] = RETAINED[next]!;
  const [before, more] = RETAINED[Math.max(0, next - 1)]!;
  return time === before ? share : more + ((share - more) * (minutes - before)) / (time - before);
}
