import type { Range } from '../contracts/primitives.ts';
import type { LineScaling, RecipeDocument, RecipeLine } from '../contracts/recipe-document.ts';
import type { Unit } from '../contracts/words.ts';
import { writeAmount, type AmountText } from './amount-text.ts';
import { amountIn, unitsToRead, type Measured, type ReadingSystem } from './measures.ts';
import { roundToMeasure, roundToWhole } from './rounding.ts';
import { DEFAULT_TRADE_MEASURES, type TradeMeasures } from './trade-measures.ts';

export interface ScalingWish {
  /** How many times the recipe, above 0. */
  factor: number;
  system?: ReadingSystem;
  tradeMeasures?: Readonly<TradeMeasures>;
  /** BCP 47 tag, British English unless told. */
  locale?: string;
}

/** One line as somebody reads it; the document's own line is not touched. */
export interface ScaledLine {
  lineId: string;
  rule: LineScaling['rule'];
  /** The amount before any rounding, in the line's own unit; null where the line has none. */
  exact: Range | null;
  /** The amount to measure out, in the unit to read it in. */
  shown: Range | null;
  unit: Unit | null;
  text: AmountText | null;
  /** By what share `shown` differs from `exact`, signed, where that is more than 2 %; else null. */
  deviation: number | null;
}

/** A rounding that stays below this share is nothing to tell a reader. */
export const WORTH_SAYING = 0.02;

/**
 * All lines of a recipe at a factor, in order: a view, the document stays as it is. Times do not scale. Throws a RangeError for
 * a factor that is not above 0.
 */
export function scaleLines(document: Pick<RecipeDocument, 'sections'>, wish: ScalingWish): ScaledLine[] {
  return document.sections.flatMap((section) => section.lines).map((line) => scaleLine(line, wish));
}

/** One line at a factor. Throws a RangeError for a factor that is not above 0. */
export function scaleLine(line: RecipeLine, wish: ScalingWish): ScaledLine {
  const { id: lineId, amount, unit, scaling } = line;
  const { rule } = scaling;
  if (!amount) return { lineId, rule, exact: null, shown: null, unit, text: null, deviation: null };

  const exact = {
    min: scaleAmount(amount.min, scaling, wish.factor),
    max: scaleAmount(amount.max, scaling, wish.factor),
  };
  const [min, max] = readRange(exact, line, wish);
  const shown = { min: min.amount, max: max.amount };
  const off = Math.abs(min.off) > Math.abs(max.off) ? min.off : max.off;
  const text = writeAmount(shown, max.unit, wish.locale);
  return { lineId, rule, exact, shown, unit: max.unit, text, deviation: Math.abs(off) > WORTH_SAYING ? off : null };
}

/**
 * An amount at a factor, without rounding: `linear`, `whole` and `to-taste` follow it, `power` by its exponent, `fixed` not at
 * all. Scaling by k and then by 1/k gives the amount back. Throws a RangeError for a factor that is not above 0.
 */
export function scaleAmount(amount: number, scaling: LineScaling, factor: number): number {
  if (!(factor > 0 && Number.isFinite(factor)))
    throw new RangeError(`A recipe is scaled by a number above 0, not by ${factor}.`);
  if (scaling.rule === 'fixed') return amount;
  return amount * (scaling.rule === 'power' ? factor ** scaling.exponent : factor);
}

/** Both ends in one unit, the one that suits the larger end. */
function readRange(exact: Range, line: RecipeLine, wish: ScalingWish): [Measured, Measured] {
  const { system = 'as-written', tradeMeasures = DEFAULT_TRADE_MEASURES } = wish;
  const { unit } = line;
  const asIs = (amount: number): Measured => ({ amount, unit, off: 0 });
  const units = unit ? unitsToRead(exact.max, unit, system, tradeMeasures) : [null];
  // What the creator wrote is not rounded: 22.5 ml is 22.5 ml.
  if (units[0] === unit && exact.min === line.amount?.min && exact.max === line.amount.max)
    return [asIs(exact.min), asIs(exact.max)];

  const measure = (amount: number, to: Unit | null) =>
    round(unit && to ? amountIn(amount, unit, to, tradeMeasures) : amount, to, line);
  const max = bestOf(units.map((to) => measure(exact.max, to)));
  return [measure(exact.min, max.unit), max];
}

function round(amount: number, unit: Unit | null, line: RecipeLine): Measured {
  const rounded = line.scaling.rule === 'whole' ? roundToWhole(amount) : roundToMeasure(amount, unit);
  return { amount: rounded, unit, off: amount === 0 ? 0 : rounded / amount - 1 };
}

/** The first unit that is near enough, else the nearest. */
function bestOf(measured: readonly Measured[]): Measured {
  const nearest = measured.reduce((best, each) => (Math.abs(each.off) < Math.abs(best.off) ? each : best));
  return measured.find((each) => Math.abs(each.off) <= WORTH_SAYING) ?? nearest;
}
