import { polynomial, requireWithin, WATER_DENSITY } from './oiml.ts';

/** J. J. Hackbarth, J. Am. Soc. Brew. Chem. 69(1):39-43 (2011), fitted to the AOAC table of sucrose solutions. */
const HACKBARTH = [
  0.3875135555, 0.09702881653, 0.388335748, -1.782845295, 5.591472292, -11.00667976, 13.62230734, -10.33082001,
  4.387787019, -0.799555873,
] as const;

/** The highest share of sucrose the formula is good for, in °Bx (grams per 100 g). */
export const MAX_BRIX = 80;

/** Density in g/ml at 20 °C of sucrose in water; `brix` in grams per 100 g, 0 to 80. RangeError outside. Source: Hackbarth 2011. */
export function sucroseSolutionDensity(brix: number): number {
  requireWithin('share of sucrose', brix, 0, MAX_BRIX);
  return WATER_DENSITY * (1 + polynomial(HACKBARTH, brix / 100, 1));
}

/**
 * Millilitres by which one gram of sucrose enlarges its water at 20 °C: 0.615 in a thin, 0.635 in a thick solution.
 * Takes any share up to 100; above 80 °Bx it stays at the value for 80, beyond which nothing is published.
 */
export function apparentVolumeOfSucrose(brix: number): number {
  // The limit towards no sugar at all would divide nothing by nothing.
  const share = Math.min(Math.max(brix, 0.01), MAX_BRIX);
  return (
    1 / sucroseSolutionDensity(share) + (100 / share - 1) * (1 / sucroseSolutionDensity(share) - 1 / WATER_DENSITY)
  );
}

/** Millilitres at 20 °C of a syrup from grams of sugar and of water. RangeError above 80 °Bx. */
export function syrupVolume(sugar: number, water: number): number {
  return (sugar + water) / sucroseSolutionDensity((100 * sugar) / (sugar + water));
}

/** Grams of sucrose in a litre of a solution of this many °Bx, 0 to 80. */
export function sugarPerLitre(brix: number): number {
  return 10 * brix * sucroseSolutionDensity(brix);
}
