import type { RecipeDocument, RecipeYield } from '../contracts/recipe-document.ts';
import type { Unit } from '../contracts/words.ts';
import { known, type KnownFigure } from './figure.ts';
import type { TradeMeasures } from './trade-measures.ts';
import { toGrams, toMillilitres } from './units.ts';

/** How many of the drinks or pieces a recipe gives: its servings, else what it states in drinks, else 1 for a drink. Null if unsaid. */
export function servingsOf({ kind, yield: gives }: Pick<RecipeDocument, 'kind' | 'yield'>): number | null {
  if (gives.servings !== null) return gives.servings;
  if (gives.measured?.unit === 'drink') return gives.measured.amount;
  if (gives.stated?.unit === 'drink') return (gives.stated.amount.min + gives.stated.amount.max) / 2;
  return kind === 'drink' && gives.stated === null && gives.measured === null ? 1 : null;
}

/** Millilitres measured or stated by the creator, the measured one first; null where neither says a volume. */
export function yieldBySay(
  gives: RecipeYield,
  density: number | null,
  trade: Readonly<TradeMeasures>,
): KnownFigure | null {
  const ml = (amount: number, unit: Unit) => millilitresOf(amount, unit, density, gives, trade);
  const measured = gives.measured && ml(gives.measured.amount, gives.measured.unit);
  if (measured) return known(measured, measured, 'measured');
  const stated = gives.stated && [
    ml(gives.stated.amount.min, gives.stated.unit),
    ml(gives.stated.amount.max, gives.stated.unit),
  ];
  if (stated?.[0] && stated[1]) return known(stated[0], stated[1], 'stated');
  const served = gives.servings && ml(gives.servings, 'drink');
  return served ? known(served, served, 'stated') : null;
}

function millilitresOf(
  amount: number,
  unit: Unit,
  density: number | null,
  { servingSize }: RecipeYield,
  trade: Readonly<TradeMeasures>,
): number | null {
  const grams = toGrams(amount, unit);
  if (grams !== null) return density === null ? null : grams / density;
  if (unit !== 'drink') return toMillilitres(amount, unit, trade);
  return servingSize && servingSize.unit !== 'drink'
    ? toMillilitres(amount * servingSize.amount, servingSize.unit, trade)
    : null;
}
