import type { Unit } from '../contracts/words.ts';
import { DEFAULT_TRADE_MEASURES, type TradeMeasures } from './trade-measures.ts';
import { convert, dimensionOf, toGrams, toMillilitres } from './units.ts';

/** The system of measures a reader reads in; `as-written` leaves every unit as the creator gave it. */
export const READING_SYSTEMS = ['as-written', 'metric', 'us', 'imperial'] as const;
export type ReadingSystem = (typeof READING_SYSTEMS)[number];

/** Read the same everywhere: spoons, and what no system defines. */
const EVERYWHERE: readonly Unit[] = ['tsp', 'tbsp', 'dash', 'drop', 'barspoon', 'pinch', 'splash', 'bottle'];

const OWN: Record<Exclude<ReadingSystem, 'as-written'>, readonly Unit[]> = {
  metric: ['ml', 'cl', 'l', 'g', 'kg'],
  us: ['floz', 'cup', 'pint', 'quart', 'gill', 'oz', 'lb'],
  imperial: ['imp-floz', 'imp-pint', 'imp-quart', 'imp-gill', 'oz', 'lb'],
};

/** A number that a person can measure, the unit for it, and by what share it is off (signed). */
export interface Measured {
  amount: number;
  unit: Unit | null;
  off: number;
}

/**
 * The units to read an amount in, the best first. A unit that already belongs to the system stays, and so do spoons, counts and
 * parts; small amounts may also be read in spoons or, by weight, in grams, where an ounce is too coarse.
 */
export function unitsToRead(
  amount: number,
  unit: Unit,
  system: ReadingSystem,
  trade: Readonly<TradeMeasures> = DEFAULT_TRADE_MEASURES,
): readonly Unit[] {
  if (system === 'as-written' || EVERYWHERE.includes(unit)) return [unit];
  const dimension = dimensionOf(unit);
  if (dimension === 'volume') return volumeUnits(toMillilitres(amount, unit, trade) ?? 0, unit, system);
  if (dimension === 'mass') return massUnits(toGrams(amount, unit) ?? 0, unit, system);
  return [unit];
}

function volumeUnits(ml: number, unit: Unit, system: Exclude<ReadingSystem, 'as-written'>): readonly Unit[] {
  if (system === 'metric') return ml >= 1000 ? ['l'] : unit === 'cl' ? ['cl'] : ['ml'];
  if (OWN[system].includes(unit)) return [unit];
  const ounce = system === 'us' ? 'floz' : 'imp-floz';
  return ml < 30 ? [ounce, 'tbsp', 'tsp'] : [ounce];
}

function massUnits(grams: number, unit: Unit, system: Exclude<ReadingSystem, 'as-written'>): readonly Unit[] {
  if (system === 'metric') return grams >= 1000 ? ['kg'] : ['g'];
  if (OWN[system].includes(unit)) return [unit];
  return grams < 115 ? ['oz', 'g'] : ['oz'];
}

/** An amount in another unit of its dimension; the same number for what cannot be converted. */
export function amountIn(amount: number, from: Unit, to: Unit, trade?: Readonly<TradeMeasures>): number {
  return convert(amount, from, to, trade) ?? amount;
}
