import { WATER_DENSITY } from './oiml.ts';
import { addMatter, NOTHING, strengthOf, volumeOf, type Matter } from './matter.ts';

/** The ways of chilling over ice that water a drink down. */
export type IceMethod = 'shake' | 'stir' | 'throw' | 'blend';

/** The regressions turn down near 51 and 56 % vol; above this strength, in % vol, the value at it is kept. */
export const STRONGEST_REGRESSED = 45;

/** How far the melt may stray from the regression, as a share of it: estimate, for ice, vessel and hand differ. */
const SCATTER = 0.15;

/**
 * Water taken up from ice, as a share of the volume before ice, for a drink of this strength in % vol (0 and up).
 *
 * Shaken and stirred: regressions of D. Arnold, Liquid Intelligence (W. W. Norton, 2014), p. 123, widened by 15 %.
 * Thrown and blended: estimates, for nothing is published.
 */
export function iceDilution(method: IceMethod, strength: number): { min: number; max: number } {
  if (method === 'throw') return { min: 0.15, max: 0.35 };
  if (method === 'blend') return { min: 0.5, max: 1 };
  const share = regressedDilution(method, strength);
  return { min: share * (1 - SCATTER), max: share * (1 + SCATTER) };
}

/** The regression itself, without its scatter; the strength in % vol is held at 45 above it. */
export function regressedDilution(method: 'shake' | 'stir', strength: number): number {
  const a = Math.min(strength, STRONGEST_REGRESSED) / 100;
  return method === 'stir' ? -1.21 * a ** 2 + 1.246 * a + 0.145 : -1.567 * a ** 2 + 1.742 * a + 0.203;
}

/** A drink after ice: `end` picks the least or the most water of the range. */
export function dilute(matter: Readonly<Matter>, method: IceMethod, end: 'min' | 'max'): Matter {
  const melt = volumeOf(matter) * iceDilution(method, strengthOf(matter))[end];
  return addMatter(matter, { ...NOTHING, water: melt * WATER_DENSITY });
}
