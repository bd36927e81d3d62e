import { A, B, C } from './oiml-coefficients.ts';

/** Density of pure water at 20 °C in g/ml: the first coefficient of OIML R 22. */
export const WATER_DENSITY = A[0] / 1000;

/** Density of pure ethanol at 20 °C in g/ml: the formula of OIML R 22 at a mass fraction of 1. */
export const ETHANOL_DENSITY = polynomial(A, 1) / 1000;

/** Value of Σ cₖ xᵏ, the first coefficient standing at the power `from`. */
export function polynomial(coefficients: readonly number[], x: number, from = 0): number {
  return coefficients.reduceRight((sum, coefficient) => sum * x + coefficient, 0) * x ** from;
}

/**
 * Density of a mixture of ethanol and water in g/ml.
 *
 * `massFraction` is grams of ethanol per gram of mixture, 0 to 1; `celsius` −20 to 40.
 * Throws a RangeError outside. Source: OIML R 22 (1975).
 */
export function ethanolWaterDensity(massFraction: number, celsius = 20): number {
  requireWithin('mass fraction of ethanol', massFraction, 0, 1);
  requireWithin('temperature', celsius, -20, 40);
  const apart = celsius - 20;
  const mixed = C.reduce((sum, row, i) => sum + polynomial(row, massFraction, 1) * apart ** (i + 1), 0);
  return (polynomial(A, massFraction) + polynomial(B, apart, 1) + mixed) / 1000;
}

/** Strength in % vol at 20 °C of a mixture with this mass fraction of ethanol (0 to 1). RangeError outside. */
export function strengthFromMassFraction(massFraction: number): number {
  return (100 * massFraction * ethanolWaterDensity(massFraction)) / ethanolWaterDensity(1);
}

/** Mass fraction of ethanol (0 to 1) of a mixture of this strength in % vol (0 to 100). RangeError outside. */
export function massFractionFromStrength(strength: number): number {
  requireWithin('strength', strength, 0, 100);
  let low = 0;
  let high = 1;
  // The strength rises with the mass fraction all the way, so halving always ends on it; 60 halvings exhaust a double.
  for (let round = 0; round < 60; round += 1) {
    const middle = (low + high) / 2;
    if (strengthFromMassFraction(middle) < strength) low = middle;
    else high = middle;
  }
  return strength === 0 ? 0 : high;
}

/** Density in g/ml at 20 °C of a spirit of this strength in % vol without sugar. RangeError outside 0 to 100. */
export function densityFromStrength(strength: number): number {
  return ethanolWaterDensity(massFractionFromStrength(strength));
}

export function requireWithin(what: string, value: number, min: number, max: number): void {
  if (!(value >= min && value <= max))
    throw new RangeError(`The ${what} must be between ${min} and ${max}, not ${value}.`);
}
