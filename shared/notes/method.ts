import type { Draft, DraftIngredient, DraftStep } from '../contracts/notes.ts';
import type { ShootCue } from '../contracts/shoots.ts';
import { tokenise } from './number-words.ts';
import { readQuantities } from './quantities.ts';
import { KEEPING_WORDS, KITCHEN, stepWordIn, YIELD_WORDS } from './step-words.ts';
import { stem } from './vocabulary.ts';

const DAY = 86_400;
const LONG_WAIT = 1800;

/** The cues in which something is done, with time, temperature, and what they use. */
export function readSteps(cues: readonly ShootCue[], ingredients: readonly DraftIngredient[]): DraftStep[] {
  return cues.flatMap((cue) => {
    const word = stepWordIn(cue.text);
    if (!word || isKeeping(cue.text)) return [];
    const { quantities } = readQuantities(cue.text);
    const duration = quantities.find(({ kind }) => kind === 'duration')?.value ?? null;
    const temperature = quantities.find(({ kind }) => kind === 'temperature')?.value ?? null;
    return [
      {
        cue: cue.index,
        at: cue.startMs,
        words: cue.text,
        text: sentence(cue.text),
        durationSec: duration,
        temperatureC: temperature,
        passive: word.passive === true || (duration?.min ?? 0) >= LONG_WAIT,
        operation: word.operation,
        uses: usesIn(cue, ingredients),
      },
    ];
  });
}

/** What the notes say it makes. */
export function readYields(cues: readonly ShootCue[]): Draft['yields'] {
  return cues.flatMap((cue) => {
    if (!YIELD_WORDS.test(cue.text)) return [];
    const said = YIELD_WORDS.exec(cue.text)!.index;
    const { tokens, quantities } = readQuantities(cue.text);
    const amount = quantities.find(({ kind, from }) => kind === 'amount' && tokens[from]!.start > said);
    return amount?.unit
      ? [{ cue: cue.index, at: cue.startMs, words: cue.text, amount: amount.value, unit: amount.unit }]
      : [];
  });
}

/** What the notes say of keeping. */
export function readStorage(cues: readonly ShootCue[]): Draft['storage'] {
  return cues.flatMap((cue) => {
    if (!isKeeping(cue.text)) return [];
    const { quantities } = readQuantities(cue.text);
    const duration = quantities.find(({ kind }) => kind === 'duration')?.value;
    const temperature = quantities.find(({ kind }) => kind === 'temperature')?.value ?? null;
    const days = duration && duration.max >= DAY ? { min: duration.min / DAY, max: duration.max / DAY } : null;
    return [
      { cue: cue.index, at: cue.startMs, words: cue.text, days, temperatureC: temperature, where: placeIn(cue.text) },
    ];
  });
}

export function readEquipment(cues: readonly ShootCue[]): string[] {
  return [...new Set(cues.flatMap((cue) => cue.text.match(KITCHEN) ?? []).map((name) => name.toLowerCase()))];
}

/** Keeping is told in days or longer, or as a place to keep it in, and not as a wait on the way. */
function isKeeping(text: string): boolean {
  if (!KEEPING_WORDS.test(text)) return false;
  const { quantities } = readQuantities(text);
  if (/\b(keeps?|lasts?|shelf|use (it )?(up )?(within|by)|then make another)\b/i.test(text)) return true;
  const long = quantities.some(({ kind, value }) => kind === 'duration' && value.max >= 3 * DAY);
  return long && !/\b(before using|steep|infuse|stir|leave)\b/i.test(text);
}

function placeIn(text: string): string {
  if (/\bfreezer\b/i.test(text)) return 'freezer';
  if (/\b(fridge|refrigerator|cold)\b/i.test(text)) return 'refrigerator';
  return /\b(cool|dark|cupboard|cellar)\b/i.test(text) ? 'cool-dark' : '';
}

function usesIn(cue: ShootCue, ingredients: readonly DraftIngredient[]): number[] {
  const words = new Set(tokenise(cue.text).map(({ word }) => stem(word)));
  return ingredients.flatMap(({ name, cue: from }, index) => {
    const head = stem(name.split(' ').at(-1) ?? '');
    return from === cue.index || (head.length > 2 && words.has(head)) ? [index] : [];
  });
}

/** The words of a cue as a sentence. */
function sentence(text: string): string {
  const trimmed = text
    .trim()
    .replace(/^(and|so|then|right|ok|okay)[, ]+/i, '')
    .replace(/[,;\s]+$/, '');
  const first = trimmed.charAt(0).toUpperCase() + trimmed.slice(1);
  return /[.!?]$/.test(first) ? first : `${first}.`;
}
