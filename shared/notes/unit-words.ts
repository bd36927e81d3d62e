import type { Unit } from '../contracts/words.ts';

/** How units are said and written; longer phrases first. A spoken ounce of a liquid is told from one by weight later. */
export const UNIT_WORDS: readonly [words: readonly string[], unit: Unit][] = [
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
  ...one('dash', 'dash', 'dashes'),
  ...one('drop', 'drop', 'drops'),
  ...one('barspoon', 'barspoon', 'barspoons'),
  ...one('pinch', 'pinch', 'pinches'),
  ...one('splash', 'splash'),
  ...one('part', 'part', 'parts'),
  ...one('leaf', 'leaf', 'leaves'),
  ...one('sprig', 'sprig', 'sprigs'),
  ...one('handful', 'handful', 'handfuls'),
  ...one('slice', 'slice', 'slices'),
  ...one('twist', 'twist', 'twists'),
  ...one('strip', 'strip', 'strips'),
  ...one('stick', 'stick', 'sticks'),
  ...one('pod', 'pod', 'pods'),
];

function one(unit: Unit, ...words: string[]): [string[], Unit][] {
  return words.map((word) => [[word], unit]);
}

/** Seconds of each spoken unit of time. */
export const TIME_WORDS: Readonly<Record<string, number>> = {
  ...Object.fromEntries(['s', 'sec', 'secs', 'second', 'seconds'].map((word) => [word, 1])),
  ...Object.fromEntries(['min', 'mins', 'minute', 'minutes'].map((word) => [word, 60])),
  ...Object.fromEntries(['h', 'hr', 'hrs', 'hour', 'hours'].map((word) => [word, 3600])),
  ...Object.fromEntries(['day', 'days'].map((word) => [word, 86_400])),
  ...Object.fromEntries(['week', 'weeks', 'wk', 'wks'].map((word) => [word, 604_800])),
  // A month of keeping is taken as thirty days.
  ...Object.fromEntries(['month', 'months'].map((word) => [word, 2_592_000])),
};
