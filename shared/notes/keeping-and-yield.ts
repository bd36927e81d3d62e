import type { Draft } from '../contracts/notes.ts';
import type { Quantity } from './quantities.ts';
import { wordsAfter, wordsBefore, wordsOf, type Token, type Transcript } from './tokens.ts';

const DAY = 86_400;

const YIELD_BEFORE =
  /\b(makes|make(?= (about|around|roughly))|gets?( you)?|yields?|gives?( you)?|comes? (out )?to|you( will|'ll)? get|i got|ended up with|for|(it's|that's)(?= (just )?(over|under|nearly)))( \w+)?( a bit| just)?( about| around| roughly| over| under| nearly)*$/;
const YIELD_AFTER =
  /^(is )?(what (i|we|you) (got|get)|of (the |finished )?(syrup|cordial|shrub|liqueur) (out|at the end))\b/;
const MADE = /\b(makes|yields)\b[^.]{0,24}$/;

/** What the notes say it makes; a measured end ("the bottle says eight fifty") holds over the guess before it. */
export function readYields(
  { tokens, cues }: Transcript,
  quantities: readonly Quantity[],
): Found<Draft['yields'][number]> {
  const items: Draft['yields'] = [];
  const taken = new Set<Quantity>();
  let guess: { quantity: Quantity; index: number } | null = null;
  for (const quantity of quantities) {
    if (quantity.kind !== 'amount' && quantity.kind !== 'count') continue;
    const made = madeOf(tokens, quantity);
    if (made) {
      taken.add(quantity);
      if (items.some(({ amount, unit }) => amount.max === made.amount.max && unit === made.unit)) continue;
      items.push({ ...placeOf(tokens, cues, quantity), ...made, confidence: 0.8 });
      if (quantity.kind === 'amount') guess = { quantity, index: items.length - 1 };
    } else if (guess && refines(tokens, guess.quantity, quantity)) {
      taken.add(quantity);
      items[guess.index] = { ...items[guess.index]!, ...measuredAs(guess.quantity, quantity) };
    }
  }
  return { items, taken };
}

function madeOf(tokens: readonly Token[], quantity: Quantity): Pick<Draft['yields'][number], 'amount' | 'unit'> | null {
  const before = wordsBefore(tokens, quantity.from, 8);
  const after = wordsAfter(tokens, quantity.to, 6);
  const { value: amount, unit } = quantity;
  if (quantity.kind === 'count') {
    const drinks = /^(drinks?|glass(es)?|serves?|servings?|people)\b/.test(after);
    if (/\b(for|makes?|serves?)( just)?$/.test(before) && drinks) return { amount, unit: 'drink' };
    return /(^|\W)(makes|serves)$/.test(before) && after === '' && amount.max <= 50 ? { amount, unit: 'drink' } : null;
  }
  if (!unit || !WHOLE.has(unit) || /\b(for|goes|glass)$/.test(before)) return null;
  return YIELD_BEFORE.test(before) || MADE.test(before) || YIELD_AFTER.test(after) ? { amount, unit } : null;
}

const WHOLE = new Set(['ml', 'cl', 'l', 'g', 'kg', 'cup', 'pint', 'quart', 'bottle', 'floz', 'imp-pint', 'drink']);

/** "just over a litre. One thousand and sixty, I measured": the number is told in millilitres. */
function measuredAs(guess: Quantity, { value, unit }: Quantity): Partial<Draft['yields'][number]> {
  return unit === null && guess.unit === 'l' && value.min > 50 ? { amount: value, unit: 'ml' } : { amount: value };
}

/** "a bit over 800 mil, let's see, the bottle says eight hundred and fifty". */
function refines(tokens: readonly Token[], guess: Quantity, quantity: Quantity): boolean {
  if (quantity.from - guess.to > 25 || (quantity.unit !== null && quantity.unit !== guess.unit)) return false;
  const thousandth = quantity.unit === null && guess.unit === 'l' && quantity.value.max > 50 ? 1000 : 1;
  const ratio = quantity.value.max / thousandth / guess.value.max;
  if (ratio < 0.6 || ratio > 1.6) return false;
  const between = wordsOf(tokens.slice(guess.to, quantity.from));
  return (
    /\b(says|measured|exactly|got|to be exact|let's see)\b/.test(between) ||
    /^(is what|,? i measured)/.test(wordsOf(tokens.slice(quantity.to, quantity.to + 4)))
  );
}

const KEEPS = /\b(keeps?|lasts?|good for|shelf life|use (it )?(up )?(within|by)|drink (it )?(within|by)|opened)\b/;
const WAITS =
  /\b(leave|stand|steep|infuse|soak|rest|stir|shake|before using|before you|cover|for it to|age|lid on|goes back)\b/;
const PLACES: readonly [RegExp, Draft['storage'][number]['where']][] = [
  [/\b(freezer|freeze it|frozen)\b/, 'freezer'],
  [/\b(fridge|refrigerator|refrigerated|chilled)\b/, 'refrigerator'],
  [/\b(cupboard|cellar|cool|dark)\b/, 'cool-dark'],
  [/\b(room temperature|on the shelf|counter|back bar)\b/, 'room'],
];

/** What the notes say of keeping: a time of days or longer with a place or a word of keeping, and no wait on the way. */
export function readStorage(
  { tokens, cues }: Transcript,
  quantities: readonly Quantity[],
): Found<Draft['storage'][number]> {
  const items: Draft['storage'] = [];
  const taken = new Set<Quantity>();
  for (const quantity of quantities) {
    if (quantity.kind !== 'duration' || quantity.value.max < DAY) continue;
    const before = wordsBefore(tokens, quantity.from, 12);
    const after = wordsAfter(tokens, quantity.to, 8);
    const where = placeIn(after, before);
    if (!KEEPS.test(before) && (where === null || WAITS.test(`${lastOf(before, 6)} ${after}`))) continue;
    taken.add(quantity);
    const degrees = quantities.find(
      (each) => each.kind === 'temperature' && each.from >= quantity.to && each.from - quantity.to < 8,
    );
    if (degrees) taken.add(degrees);
    const { min, max } = quantity.value;
    const days = { min: min / DAY, max: max / DAY };
    items.push({
      ...placeOf(tokens, cues, quantity),
      days,
      temperatureC: degrees?.value ?? null,
      where: where ?? 'room',
      confidence: where ? 0.9 : 0.6,
    });
  }
  return { items: [...atOnce({ tokens, cues }), ...items], taken };
}

const AT_ONCE = /^(drink|serve)( it)? (now|at once|straight away|immediately|right away)/;

/** "drink it at once": what is not kept at all. */
function atOnce({ tokens, cues }: Pick<Transcript, 'tokens' | 'cues'>): Draft['storage'] {
  const from = tokens.findIndex(
    ({ word }, index) => (word === 'drink' || word === 'serve') && AT_ONCE.test(wordsAfter(tokens, index, 4)),
  );
  if (from < 0) return [];
  const place = placeOf(tokens, cues, { from });
  return [{ ...place, days: null, temperatureC: null, where: 'serve-at-once', confidence: 0.8 }];
}

const lastOf = (words: string, count: number) => words.split(' ').slice(-count).join(' ');

function placeIn(after: string, before: string): Draft['storage'][number]['where'] | null {
  for (const text of [after.split(' ').slice(0, 5).join(' '), before])
    for (const [pattern, place] of PLACES) if (pattern.test(text)) return place;
  return null;
}

interface Found<T> {
  items: T[];
  /** The quantities that are told of here and measure nothing else. */
  taken: ReadonlySet<Quantity>;
}

function placeOf(tokens: readonly Token[], cues: Transcript['cues'], { from }: { from: number }) {
  const { cue, at } = tokens[from]!;
  return { cue, at, words: cues[cue]?.text ?? '' };
}
