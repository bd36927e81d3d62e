import type { DraftIngredient } from '../contracts/notes.ts';
import type { ShootCue } from '../contracts/shoots.ts';
import { nameAfter, nameBefore } from './phrases.ts';
import { readQuantities, type Quantity, type ReadCue } from './quantities.ts';
import { KEEPING_WORDS, YIELD_WORDS } from './step-words.ts';
import { stem, type Known, type Vocabulary } from './vocabulary.ts';

const VESSEL = /^(bottle|jar|jug|pan|saucepan|glass|kilner|swing|flask|tin)/;
const OPTIONAL = /\b(optional|not needed|if you (like|want|have)|nice but|if the)\b/i;
const SOMETHING = new Set(['some', 'few', 'little', 'bit', 'plenty', 'plus', 'enough', 'fresh']);
const MEASURED = new Set([
  'leaf',
  'sprig',
  'strip',
  'slice',
  'twist',
  'stick',
  'pod',
  'pinch',
  'handful',
  'dash',
  'drop',
]);

interface Heard extends DraftIngredient {
  key: string;
}

/** Everything that goes in, each once: a later amount for the same thing holds, an earlier place stays. */
export function readIngredients(cues: readonly ShootCue[], vocabulary: Vocabulary): DraftIngredient[] {
  const heard: Heard[] = [];
  for (const cue of cues) for (const found of inCue(cue, vocabulary)) fold(heard, found);
  return heard.map(({ key: _key, ...ingredient }) => ingredient);
}

function fold(heard: Heard[], found: Heard): void {
  const before = heard.find(({ key }) => key === found.key);
  if (!before) heard.push(found);
  else if (found.amount) Object.assign(before, { amount: found.amount, unit: found.unit, amountAt: found.at });
}

function inCue(cue: ShootCue, vocabulary: Vocabulary): Heard[] {
  const read = readQuantities(cue.text);
  if (YIELD_WORDS.test(cue.text) && !hasKnown(read, vocabulary)) return [];
  if (KEEPING_WORDS.test(cue.text) && !read.quantities.some(({ kind }) => kind === 'amount')) return [];
  const measured = read.quantities.flatMap((quantity, index) => measuredIn(cue, read, index, quantity, vocabulary));
  const named = new Set(measured.map(({ key }) => key));
  return [...measured, ...unmeasuredIn(cue, read, vocabulary).filter(({ key }) => !named.has(key))];
}

function measuredIn(cue: ShootCue, read: ReadCue, index: number, quantity: Quantity, vocabulary: Vocabulary): Heard[] {
  if (quantity.kind !== 'amount' && quantity.kind !== 'count') return [];
  const { tokens, quantities } = read;
  const after = nameAfter(tokens, quantity.to);
  if (VESSEL.test(after.name)) return [];
  const known = knownAt(tokens, quantity.to, after.to, vocabulary);
  if (quantity.kind === 'count') {
    if (!known) return [];
  }
  // A bare "two" before another number's words is no amount of anything.
  if (after.name === '' || (!known && quantity.unit === null)) {
    const start = quantities[index - 1]?.to ?? 0;
    const before = nameBefore(tokens.slice(start), quantity.from - start);
    return before.name === ''
      ? []
      : [hear(cue, quantity, before.name, before.prep, knownAt(tokens, start, quantity.from, vocabulary))];
  }
  return [hear(cue, quantity, after.name, after.prep, known)];
}

/** What the larder knows and the notes only mention: "some honey", "a few bay leaves". Its amount is a gap. */
function unmeasuredIn(cue: ShootCue, { tokens, quantities }: ReadCue, vocabulary: Vocabulary): Heard[] {
  const heard: Heard[] = [];
  for (let index = 1; index < tokens.length; index += 1) {
    const found = vocabulary.at(tokens, index);
    if (!found || quantities.some(({ from, to }) => index >= from && index < to)) continue;
    const before = tokens.slice(Math.max(0, index - 3), index).map(({ word }) => word);
    if (
      !before.some((word) => SOMETHING.has(word)) ||
      before.some((word) => ['no', 'not', 'never', 'without'].includes(word))
    )
      continue;
    heard.push(
      hear(
        cue,
        null,
        tokens
          .slice(index, index + found.length)
          .map(({ word }) => word)
          .join(' '),
        '',
        found.known,
      ),
    );
    index += found.length - 1;
  }
  return heard;
}

function knownAt(tokens: ReadCue['tokens'], from: number, to: number, vocabulary: Vocabulary): Known | null {
  for (let index = from; index < to; index += 1) {
    const found = vocabulary.at(tokens, index);
    if (found) return found.known;
  }
  return null;
}

function hasKnown({ tokens }: ReadCue, vocabulary: Vocabulary): boolean {
  return knownAt(tokens, 0, tokens.length, vocabulary) !== null;
}

function hear(cue: ShootCue, quantity: Quantity | null, name: string, prep: string, known: Known | null): Heard {
  const words = name.split(' ').filter((word) => !MEASURED.has(stem(word)) || name.split(' ').length === 1);
  return {
    key: known?.larderId ?? words.map(stem).join(' '),
    cue: cue.index,
    at: cue.startMs,
    words: cue.text,
    name,
    amount: quantity?.value ?? null,
    unit: quantity ? (quantity.unit ?? (quantity.kind === 'count' ? 'piece' : null)) : null,
    optional: OPTIONAL.test(cue.text),
    amountAt: quantity ? cue.startMs : null,
    prep,
    larderId: known?.larderId ?? null,
    confidence: quantity && known ? 0.95 : quantity || known ? 0.7 : 0.4,
  };
}
