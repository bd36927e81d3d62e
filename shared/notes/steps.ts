import type { DraftIngredient, DraftStep } from '../contracts/notes.ts';
import { clausesOf, type Clause } from './clauses.ts';
import type { Mention } from './mentions.ts';
import type { Quantity } from './quantities.ts';
import { OTHER_DRINK } from './said-as.ts';
import { NOT_DONE, STEP_WORDS, type StepWord } from './step-words.ts';
import { wordsBefore, wordsOf, type Transcript } from './tokens.ts';

interface Act {
  clauses: Clause[];
  word: StepWord;
  duration: Quantity | null;
  temperature: Quantity | null;
}

interface Given {
  quantities: readonly Quantity[];
  /** Quantities that tell of yield and keeping. */
  taken: ReadonlySet<Quantity>;
  /** The times of keeping. */
  kept: readonly Quantity[];
  /** Typed rows of a drink, in the order in which it is built. */
  built: boolean;
  ingredients: readonly DraftIngredient[];
  places: readonly (readonly Mention[])[];
}

/** Clauses of one action within so many words are one step. */
const TOGETHER = 30;
/** A time or temperature told apart from its verb belongs to the nearest step within so many words. */
const NEARBY = 28;
/** So far on, "it's eight minutes" still tells of the last thing done. */
const LATER = 60;
/** From here on a wait is a wait, in seconds. */
const LONG = 1800;

/** What is done, in order, each with its time, its temperature and what it uses. */
export function readSteps(transcript: Transcript, given: Given): DraftStep[] {
  const acts = actsOf(transcript, given);
  measure(transcript, acts, given);
  return together(acts).map((act) => toStep(transcript, act, given));
}

function actsOf(transcript: Transcript, { kept, built, ingredients, places }: Given): Act[] {
  const { tokens } = transcript;
  const rows = built ? places.filter((_, index) => !ingredients[index]!.optional) : [];
  const starts = rows.flatMap((mentions) => mentions.find(({ from }) => tokens[from]!.cue > 0)?.from ?? []);
  return clausesOf(transcript)
    .flatMap((whole) => partsOf(transcript, whole))
    .flatMap((clause) => {
      if (OTHER_DRINK.test(`${clause.words} `)) return [];
      const found = stepWordIn(clause.words);
      const tellsKeeping = found?.passive && kept.some(({ from }) => from >= clause.from && from < clause.to);
      const poured = starts.some((from) => from >= clause.from && from < clause.to);
      const word = (tellsKeeping ? null : found) ?? (poured ? POURED_IN : null);
      return word ? [{ clauses: [clause], word, duration: null, temperature: null }] : [];
    });
}

const JOINS = new Set(['and', 'then', 'minute', 'minutes', 'hour', 'hours', 'second', 'seconds']);

/** In running speech one thing follows the other: "simmer it for ten minutes cool it and strain it". */
function partsOf({ tokens, typed }: Transcript, clause: Clause): Clause[] {
  if (typed) return [clause];
  const starts = [clause.from];
  for (let index = clause.from + 3; index < clause.to - 1; index += 1) {
    if (!JOINS.has(tokens[index - 1]!.word) || index - starts.at(-1)! < 3) continue;
    const words = wordsOf(tokens.slice(index, Math.min(clause.to, index + 6)));
    if (STEP_WORDS.some(({ pattern }) => words.search(pattern) === 0)) starts.push(index);
  }
  return starts.map((from, index) => {
    const to = starts[index + 1] ?? clause.to;
    return { from, to, words: wordsOf(tokens.slice(from, to)) };
  });
}

/** In the notes of a drink that is built row by row each ingredient is a step. */
const POURED_IN: StepWord = { action: '', pattern: /^/, operation: { kind: 'add' } };

/** The first thing done in a clause; null for talk. */
function stepWordIn(words: string): StepWord | null {
  let found: { at: number; word: StepWord } | null = null;
  for (const word of STEP_WORDS) {
    const at = words.search(word.pattern);
    if (at >= 0 && (!found || at < found.at) && !NOT_DONE.test(words.slice(0, at))) found = { at, word };
  }
  return found?.word ?? null;
}

/** Hands every duration and temperature to the step it was said of. */
function measure({ tokens }: Transcript, acts: readonly Act[], { quantities, taken }: Given): void {
  let next = 0;
  for (const quantity of quantities) {
    if (taken.has(quantity) || (quantity.kind !== 'duration' && quantity.kind !== 'temperature')) continue;
    if (isPassing(wordsBefore(tokens, quantity.from, 6), quantity)) continue;
    while (next < acts.length && acts[next]!.clauses[0]!.from <= quantity.from) next += 1;
    const before = acts[next - 1];
    const after = acts[next];
    const away = before ? quantity.from - before.clauses[0]!.to : 0;
    const told = /\b(it's|for|takes|about|around|is)( \w+)?$/.test(wordsBefore(tokens, quantity.from, 3));
    const near = before && away < (told ? LATER : NEARBY) ? before : null;
    if (near && repeats(acts, next - 1, quantity)) continue;
    const inside = before && quantity.from < before.clauses[0]!.to;
    const coming = after && after.clauses[0]!.from - quantity.to < NEARBY / 2 ? after : null;
    const taker = inside || !coming || (near && near[quantity.kind] === null) ? near : coming;
    if (taker && taker[quantity.kind] === null) taker[quantity.kind] = quantity;
  }
}

/** "so half an hour, let's have a look": said of the wait before. */
function repeats(acts: readonly Act[], index: number, quantity: Quantity): boolean {
  return acts.slice(Math.max(0, index - 2), index + 1).some((act) => {
    const before = act[quantity.kind as 'duration' | 'temperature'];
    return before !== null && sameTime(before, quantity) && quantity.from - before.to < LATER;
  });
}

/** "at eight hours", "the other four minutes": a moment or a rest, no time to plan with. */
function isPassing(before: string, { kind }: Quantity): boolean {
  if (kind === 'temperature') return /\b(not|isn't|never) (a |at )?$/.test(`${before} `);
  return /\b(at|other|after|half past|costs?|every|in the last|within|took|isn't|not going to( \w+){0,3})( about)?$/.test(
    before,
  );
}

function together(acts: readonly Act[]): Act[] {
  const merged: Act[] = [];
  for (const act of acts) {
    const before = merged.at(-1);
    if (before && isSame(before, act)) {
      before.clauses.push(...act.clauses);
      before.duration ??= act.duration;
      before.temperature ??= act.temperature;
    } else merged.push({ ...act, clauses: [...act.clauses] });
  }
  return merged;
}

function isSame(before: Act, act: Act): boolean {
  if (act.clauses[0]!.from - before.clauses.at(-1)!.to > TOGETHER) return false;
  if (act.duration && before.duration && !sameTime(act.duration, before.duration)) return false;
  if (before.word.action === act.word.action) return act.word !== POURED_IN;
  const passive = before.word.passive && act.word.passive;
  return passive === true && (before.duration === null || act.duration === null);
}

const sameTime = (a: Quantity, b: Quantity) => a.value.min === b.value.min && a.value.max === b.value.max;

function toStep({ tokens, cues }: Transcript, act: Act, { ingredients, places }: Given): DraftStep {
  const [first] = act.clauses;
  const last = act.clauses.at(-1)!;
  const { cue, at } = tokens[first!.from]!;
  const { duration, temperature, word } = act;
  return {
    cue,
    at,
    words: cues[cue]?.text ?? '',
    text: act.clauses.map((clause) => sentence(textOf(tokens, clause))).join(' '),
    durationSec: duration?.value ?? null,
    temperatureC: temperature?.value ?? null,
    passive: word.passive === true || (duration?.value.min ?? 0) >= LONG,
    operation: word.operation,
    uses: ingredients.flatMap((_, index) =>
      places[index]!.some(({ from }) => from >= first!.from && from < last.to) ? [index] : [],
    ),
    confidence: act.duration || word.operation ? 0.8 : 0.6,
  };
}

function textOf(tokens: Transcript['tokens'], { from, to }: Clause): string {
  return tokens
    .slice(from, to)
    .map(({ text, glued }) => (glued ? text : ` ${text}`))
    .join('')
    .trim();
}

const FILLERS = /^\W*((and|so|then|right|ok|okay|um|uh|well|now|oh|yes|yeah)\b[, ]*)+/i;

/** Words as a sentence, without the "so, then" that led to them. */
function sentence(text: string): string {
  const trimmed =
    text
      .replace(FILLERS, '')
      .replace(/([,;\s-]|\s(and|then|so|or|but|with|the|a))+$/i, '')
      .trim() || text.trim();
  const first = trimmed.charAt(0).toUpperCase() + trimmed.slice(1);
  return /[.!?]$/.test(first) ? first : `${first}.`;
}
