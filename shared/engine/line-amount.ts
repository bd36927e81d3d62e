import type { Lack } from '../contracts/figures.ts';
import type { RecipeLine } from '../contracts/recipe-document.ts';
import type { Unit } from '../contracts/words.ts';
import { rest } from './rests.ts';
import { isTradeMeasure, type TradeMeasures } from './trade-measures.ts';
import { dimensionOf, toGrams, toMillilitres } from './units.ts';

/** Millilitres of a part where a recipe is written in parts alone: any size gives the same strength. */
export const PART_ML = 30;

/** What turns a volume or a count into a mass; in g/ml and g. */
export interface Weighing {
  density: number | null;
  pieceWeight: number | null;
}

/** Grams in one unit of this line, or what is missing to say so. */
export function gramsPerUnit(line: RecipeLine, weighing: Weighing, trade: Readonly<TradeMeasures>): number | Lack {
  const unit = line.unit ?? 'piece';
  const grams = toGrams(1, unit);
  if (grams !== null) return grams;
  const volume = unit === 'part' ? PART_ML : toMillilitres(1, unit, trade);
  if (volume !== null) return weighing.density === null ? lack('density-missing', line) : volume * weighing.density;
  if (unit !== 'piece') return lack('piece-weight-missing', line);
  return weighing.pieceWeight ?? lack(line.unit === null ? 'unit-missing' : 'piece-weight-missing', line);
}

export function lack(code: Lack['code'], line: Pick<RecipeLine, 'name'>): Lack {
  return { code, subject: line.name };
}

/** The assumption behind a unit without a legal size. */
export function restsOfUnit(unit: Unit | null, trade: Readonly<TradeMeasures>): string[] {
  return unit && isTradeMeasure(unit) ? [rest(unit, trade[unit])] : [];
}

/** True for units in which bits of plants are counted: they leave a drink as they came. */
export function countsBits(unit: Unit | null): boolean {
  return unit !== null && dimensionOf(unit) === 'count' && unit !== 'piece' && unit !== 'drink';
}
