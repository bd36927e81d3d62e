import type { Unit } from '../contracts/words.ts';
import { DEFAULT_TRADE_MEASURES, isTradeMeasure, type TradeMeasures } from './trade-measures.ts';

const US_GALLON = 231 * 2.54 ** 3;
const IMPERIAL_GALLON = 4546.09;
const POUND = 453.59237;

/**
 * Millilitres in one unit, exact by definition: the US gallon is 231 cubic inches of 2.54 cm (NIST SP 811 appendix B,
 * NIST Handbook 44 appendix C), the imperial one 4.54609 L (Units of Measurement Regulations 1995, United Kingdom).
 */
const MILLILITRES: Partial<Record<Unit, number>> = {
  ml: 1,
  cl: 10,
  l: 1000,
  floz: US_GALLON / 128,
  tsp: US_GALLON / 768,
  tbsp: US_GALLON / 256,
  cup: US_GALLON / 16,
  pint: US_GALLON / 8,
  quart: US_GALLON / 4,
  gill: US_GALLON / 32,
  'imp-floz': IMPERIAL_GALLON / 160,
  'imp-pint': IMPERIAL_GALLON / 8,
  'imp-quart': IMPERIAL_GALLON / 4,
  'imp-gill': IMPERIAL_GALLON / 32,
};

/** Grams in one unit, exact by definition: the avoirdupois pound is 0.45359237 kg (NIST SP 811 appendix B). */
const GRAMS: Partial<Record<Unit, number>> = { g: 1, kg: 1000, oz: POUND / 16, lb: POUND };

/** `count` is what is counted in pieces, `part` only means something beside other parts. */
export type Dimension = 'volume' | 'mass' | 'count' | 'part';

/** What a unit measures; dash, drop, barspoon, pinch, splash and bottle are volumes by common practice. */
export function dimensionOf(unit: Unit): Dimension {
  if (MILLILITRES[unit] !== undefined || isTradeMeasure(unit)) return 'volume';
  if (GRAMS[unit] !== undefined) return 'mass';
  return unit === 'part' ? 'part' : 'count';
}

/** An amount in millilitres, or null where the unit is not a volume. */
export function toMillilitres(
  amount: number,
  unit: Unit,
  trade: Readonly<TradeMeasures> = DEFAULT_TRADE_MEASURES,
): number | null {
  const size = isTradeMeasure(unit) ? trade[unit] : MILLILITRES[unit];
  return size === undefined ? null : amount * size;
}

/** An amount in grams, or null where the unit is not a mass. */
export function toGrams(amount: number, unit: Unit): number | null {
  const size = GRAMS[unit];
  return size === undefined ? null : amount * size;
}

/** An amount in another unit of the same dimension (volume, mass, or the same unit), or null where that means nothing. */
export function convert(
  amount: number,
  from: Unit,
  to: Unit,
  trade: Readonly<TradeMeasures> = DEFAULT_TRADE_MEASURES,
): number | null {
  if (from === to) return amount;
  return (
    ratio(toMillilitres(amount, from, trade), toMillilitres(1, to, trade)) ??
    ratio(toGrams(amount, from), toGrams(1, to))
  );
}

function ratio(amount: number | null, size: number | null): number | null {
  return amount === null || size === null ? null : amount / size;
}
