import type { Unit } from '../contracts/words.ts';
import type { Token } from './tokens.ts';

/** How units are said and written; longer phrases first. A spoken ounce of a liquid is told from one by weight later. */
const UNIT_WORDS: readonly [words: readonly string[], unit: Unit][] = [
  [['fluid', 'ounces'], 'floz'],
  [['fluid', 'ounce'], 'floz'],
  [['fl', 'oz'], 'floz'],
  [['bar', 'spoons'], 'barspoon'],
  [['bar', 'spoon'], 'barspoon'],
  ...one('ml', 'ml', 'mls', 'mil', 'mils', 'millilitre', 'millilitres', 'milliliter', 'milliliters'),
  ...one('cl', 'cl', 'centilitre', 'centilitres'),
  ...one('l', 'l', 'litre', 'litres', 'liter', 'liters'),
  ...one('g', 'g', 'gr', 'gram', 'grams', 'gramme', 'grammes'),
  ...one('kg', 'kg', 'kilo', 'kilos', 'kilogram', 'kilograms'),
  ...one('oz', 'oz', 'ounce', 'ounces'),
  ...one('lb', 'lb', 'lbs', 'pound', 'pounds'),
  ...one('tsp', 'tsp', 'teaspoon', 'teaspoons'),
  ...one('tbsp', 'tbsp', 'tablespoon', 'tablespoons'),
  ...one('cup', 'cup', 'cups'),
  ...one('pint', 'pint', 'pints'),
  ...one('quart', 'quart', 'quarts'),
  ...one('gill', 'gill', 'gills'),
  ...one('dash', 'dash', 'dashes'),
  ...one('drop', 'drop', 'drops'),
  ...one('barspoon', 'barspoon', 'barspoons'),
  ...one('pinch', 'pinch', 'pinches'),
  ...one('splash', 'splash', 'splashes'),
  ...one('part', 'part', 'parts'),
  ...one('leaf', 'leaf', 'leaves'),
  ...one('sprig', 'sprig', 'sprigs'),
  ...one('handful', 'handful', 'handfuls'),
  ...one('slice', 'slice', 'slices'),
  ...one('twist', 'twist', 'twists'),
  ...one('strip', 'strip', 'strips'),
  ...one('stick', 'stick', 'sticks'),
  ...one('pod', 'pod', 'pods'),
  ...one('piece', 'piece', 'pieces', 'wheel', 'wheels', 'wedge', 'wedges', 'ribbon', 'ribbons', 'coin', 'coins'),
  ...one('bottle', 'bottle', 'bottles'),
];

function one(unit: Unit, ...words: string[]): [string[], Unit][] {
  return words.map((word) => [[word], unit]);
}

const BY_FIRST = new Map<string, [words: readonly string[], unit: Unit][]>();
for (const entry of UNIT_WORDS) BY_FIRST.set(entry[0][0]!, [...(BY_FIRST.get(entry[0][0]!) ?? []), entry]);

/** The unit that is named at this token. */
export function unitAt(tokens: readonly Token[], index: number): { unit: Unit; length: number } | null {
  for (const [words, unit] of BY_FIRST.get(tokens[index]?.word ?? '') ?? [])
    if (words.every((word, offset) => tokens[index + offset]?.word === word)) return { unit, length: words.length };
  return null;
}

/** Seconds of each spoken unit of time. */
export const TIME_WORDS: Readonly<Record<string, number>> = {
  ...Object.fromEntries(['s', 'sec', 'secs', 'second', 'seconds'].map((word) => [word, 1])),
  ...Object.fromEntries(['min', 'mins', 'minute', 'minutes'].map((word) => [word, 60])),
  ...Object.fromEntries(['h', 'hr', 'hrs', 'hour', 'hours'].map((word) => [word, 3600])),
  ...Object.fromEntries(['day', 'days'].map((word) => [word, 86_400])),
  ...Object.fromEntries(['week', 'weeks', 'wk', 'wks'].map((word) => [word, 604_800])),
  // A month of keeping is taken as thirty days.
  ...Object.fromEntries(['year', 'years'].map((word) => [word, 31_536_000])),
  ...Object.fromEntries(['month', 'months'].map((word) => [word, 2_592_000])),
};
