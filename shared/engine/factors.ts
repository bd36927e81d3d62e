import type { Figure } from '../contracts/figures.ts';
import type { RecipeDocument, RecipeLine } from '../contracts/recipe-document.ts';
import type { Unit } from '../contracts/words.ts';
import { middleOf } from './figure.ts';
import { convert } from './units.ts';
import { servingsOf } from './yield.ts';

/** Bottles to be filled; volumes in ml. The headspace is left empty in each. */
export interface BottlesWish {
  count: number;
  bottleMl: number;
  headspaceMl: number;
}

/** The factor for so many servings (above 0), or null where the recipe does not say how many it makes. */
export function factorForServings(document: Pick<RecipeDocument, 'kind' | 'yield'>, servings: number): number | null {
  requireAboveNothing('number of servings', servings);
  const makes = servingsOf(document);
  return makes === null ? null : servings / makes;
}

/** The factor for a batch of `ml`, by the middle of the yield, or null where the yield is not known. */
export function factorForVolume(yieldMl: Figure, ml: number): number | null {
  requireAboveNothing('volume', ml);
  const makes = middleOf(yieldMl);
  return makes ? ml / makes : null;
}

/** The factor that fills bottles up to their headspace, or null where the yield is not known. RangeError if nothing would fit. */
export function factorForBottles(yieldMl: Figure, { count, bottleMl, headspaceMl }: BottlesWish): number | null {
  requireAboveNothing('number of bottles', count);
  if (!(headspaceMl >= 0 && headspaceMl < bottleMl))
    throw new RangeError(`A headspace of ${headspaceMl} ml leaves no room in a bottle of ${bottleMl} ml.`);
  return factorForVolume(yieldMl, count * (bottleMl - headspaceMl));
}

/**
 * The factor that uses up what is left of one ingredient. Null where the line has no amount, does not follow the factor evenly
 * (`power`, `fixed`), or is measured in something else than `unit`.
 */
export function factorForLine(line: RecipeLine, available: number, unit: Unit | null): number | null {
  requireAboveNothing('amount', available);
  if (!line.amount || line.scaling.rule === 'power' || line.scaling.rule === 'fixed') return null;
  const has =
    line.unit === unit || !line.unit || !unit
      ? sameUnit(line.unit, unit, available)
      : convert(available, unit, line.unit);
  return has === null || line.amount.max === 0 ? null : has / line.amount.max;
}

const sameUnit = (a: Unit | null, b: Unit | null, amount: number) =>
  (a ?? 'piece') === (b ?? 'piece') ? amount : null;

function requireAboveNothing(what: string, value: number): void {
  if (!(value > 0 && Number.isFinite(value))) throw new RangeError(`The ${what} must be above 0, not ${value}.`);
}
