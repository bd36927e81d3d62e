import type { Lack } from '../contracts/figures.ts';
import type { LarderItem } from '../contracts/larder.ts';
import type { RecipeDocument, RecipeLine } from '../contracts/recipe-document.ts';
import { tradeMeasuresOf, type EngineContext } from './context.ts';
import { isDry, juiceOfItem, matterOfItem } from './item-matter.ts';
import { countsBits, gramsPerUnit, lack, restsOfUnit } from './line-amount.ts';
import { massOf, NOTHING, shareOf, type Matter } from './matter.ts';
import { rest } from './rests.ts';

/**
 * What a line brings into the mixture: any one of `variants` (least and most amount, in or left out). None means that it adds
 * nothing that counts. `lacks` says what is missing to know; `estimated` that a variant is a guess.
 */
export interface Portion {
  line: RecipeLine;
  variants: readonly Matter[];
  lacks: readonly Lack[];
  estimated: boolean;
  rests: readonly string[];
}

/** The extremes a component may have, as matter per millilitre; none where it is no liquid. */
export interface Composition {
  variants: readonly Matter[];
  lacks: readonly Lack[];
  estimated: boolean;
  rests: readonly string[];
}

/** The portion of one line; `compositionOf` answers for components. Lines that stand in for others are not asked about. */
export function portionOf(
  line: RecipeLine,
  kind: RecipeDocument['kind'],
  context: EngineContext,
  compositionOf: (componentId: string) => Composition,
): Portion {
  if (line.componentId) {
    if (!context.components.has(line.componentId)) return lacking(line, [lack('component-missing', line)]);
    return ofComponent(line, context, compositionOf(line.componentId));
  }
  const item = line.larderId ? context.larder.get(line.larderId) : undefined;
  if (!item) return countsBits(line.unit) ? empty(line) : lacking(line, [lack('not-in-larder', line)]);
  if (addsNothing(line, item, kind)) return empty(line);
  return ofItem(line, item, context);
}

const SEASONING = new Set<LarderItem['nature']>(['acid', 'solid', 'bitters']);

function addsNothing(line: RecipeLine, item: LarderItem, kind: RecipeDocument['kind']): boolean {
  if (item.dissolves)
    return line.amount === null && (line.optional || (SEASONING.has(item.nature) && line.scaling.rule === 'to-taste'));
  const counted = line.unit === null || line.unit === 'piece';
  return !item.water || countsBits(line.unit) || line.amount === null || (kind === 'drink' && counted);
}

function ofItem(line: RecipeLine, item: LarderItem, context: EngineContext): Portion {
  const trade = tradeMeasuresOf(context);
  const weighing = { density: item.density?.value ?? null, pieceWeight: item.pieceWeight?.value ?? null };
  const grams = gramsPerUnit(line, weighing, trade);
  if (typeof grams !== 'number') return lacking(line, [grams]);
  const unit = item.dissolves ? [matterOfItem(item, grams)] : [NOTHING, juiceOfItem(item, grams)];
  return poured(line, {
    variants: unit,
    lacks: item.dissolves ? lacksOfItem(line, item) : [],
    estimated: !item.dissolves,
    rests: [
      ...restsOfUnit(line.unit, trade),
      ...(item.dissolves ? restsOfItem(item, line, grams) : [rest('fruit-gives-up-juice')]),
    ],
  });
}

function lacksOfItem(line: RecipeLine, item: LarderItem): Lack[] {
  return [
    ...(item.strength ? [] : [lack('strength-missing', line)]),
    ...(item.sugar ? [] : [lack('sugar-missing', line)]),
  ];
}

/** Grams of dissolved acid or salt below which their volume is nothing to speak of. */
const PINCHES = 5;

function restsOfItem(item: LarderItem, line: RecipeLine, gramsPerUnit: number): string[] {
  return item.nature !== 'sugar' && isDry(item) && gramsPerUnit * (line.amount?.max ?? 0) > PINCHES
    ? [rest('dissolved-solids')]
    : [];
}

function ofComponent(line: RecipeLine, context: EngineContext, composition: Composition): Portion {
  const { variants, lacks } = composition;
  if (variants.length === 0 || countsBits(line.unit)) return lacks.length > 0 ? lacking(line, lacks) : empty(line);
  const trade = tradeMeasuresOf(context);
  const weighed = variants.map((one) => {
    const density = massOf(one);
    const grams = gramsPerUnit(line, { density, pieceWeight: null }, trade);
    return typeof grams === 'number' ? shareOf(one, grams / density) : grams;
  });
  const missing = weighed.filter((one): one is Lack => 'code' in one);
  if (missing.length > 0) return lacking(line, missing);
  const units = weighed.filter((one): one is Matter => !('code' in one));
  return poured(line, {
    ...composition,
    variants: units,
    rests: [...composition.rests, ...restsOfUnit(line.unit, trade)],
  });
}

/** A line's amounts of something that is known per unit. */
function poured(line: RecipeLine, unit: Composition): Portion {
  if (!line.amount) return lacking(line, [lack('amount-missing', line)]);
  const { min, max } = line.amount;
  const amounts = [...new Set(line.optional ? [0, min, max] : [min, max])];
  return {
    line,
    variants: unit.variants.flatMap((matter) => amounts.map((amount) => shareOf(matter, amount))),
    lacks: unit.lacks,
    estimated: unit.estimated,
    rests: line.optional ? [...unit.rests, rest('optional-lines')] : unit.rests,
  };
}

const empty = (line: RecipeLine): Portion => ({ line, variants: [], lacks: [], estimated: false, rests: [] });
const lacking = (line: RecipeLine, lacks: readonly Lack[]): Portion => ({ ...empty(line), lacks });
