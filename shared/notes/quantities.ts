import type { Range } from '../contracts/primitives.ts';
import type { Unit } from '../contracts/words.ts';
import { addedAt, numberAt } from './number-words.ts';
import { wordsOf, type Token } from './tokens.ts';
import { TIME_WORDS, unitAt } from './unit-words.ts';

/** Something measured in the notes, with the tokens it takes. */
export interface Quantity {
  kind: 'amount' | 'duration' | 'temperature' | 'count' | 'share';
  /** Amount or count in its unit, seconds, or degrees Celsius. */
  value: Range;
  unit: Unit | null;
  from: number;
  to: number;
  /** "under 60 degrees": only the upper end was said. */
  cap?: true;
}

/** Read on the last words before the value that holds; "no ice" corrects nothing. */
const CORRECTION =
  /(^|[\s-])(no( ?[,.-])*( (sorry|wait|make it|make that))?|sorry|actually|make (that|it)|i mean|rather|scratch that|correction)[\s,.-]*(it's|that's)?$/;
const SIZE_WORDS = new Set(['good', 'big', 'small', 'little', 'generous', 'scant', 'heaped', 'full', 'tiny', 'fat']);

/** All quantities in order, corrected ones taken out: "thirty, no, forty grams" is forty grams. */
export function readQuantities(tokens: readonly Token[]): Quantity[] {
  const quantities: Quantity[] = [];
  for (let index = 0; index < tokens.length;) {
    const ratio = ratioAt(tokens, index);
    const quantity = ratio ? null : quantityAt(tokens, index);
    if (quantity && isPossible(quantity)) quantities.push(quantity);
    index = ratio ?? quantity?.to ?? index + 1;
  }
  return withoutCorrected(tokens, quantities);
}

/** A recipe can only hold a finite number and a temperature that a bar can reach: "5000 degrees" is a slip. */
function isPossible({ kind, value: { min, max } }: Quantity): boolean {
  if (!Number.isFinite(min) || !Number.isFinite(max)) return false;
  if (kind !== 'temperature' && max === 0) return false;
  return kind !== 'temperature' || (min >= -200 && max <= 300);
}

/** "1:1" and "one to one by weight" say how two things stand to each other. */
function ratioAt(tokens: readonly Token[], index: number): number | null {
  const [first, sign, second] = tokens.slice(index, index + 3);
  if (/^\d/.test(first?.text ?? '') && sign?.text === ':' && /^\d/.test(second?.text ?? '')) return index + 3;
  if (first?.word !== 'one' && first?.word !== 'two') return null;
  const oneToOne = wordsOf(tokens.slice(index, index + 3));
  return oneToOne === 'one to one' || oneToOne === 'two to one' ? index + 3 : null;
}

function quantityAt(tokens: readonly Token[], index: number): Quantity | null {
  if (tokens[index]?.word === 'overnight')
    return { kind: 'duration', value: { min: 28_800, max: 43_200 }, unit: null, from: index, to: index + 1 };
  const first = articleBeforeUnit(tokens, index) ?? numberAt(tokens, index);
  if (!first) return null;
  let to = index + first.length;
  let value = { min: first.value, max: first.value };
  const second = rangeEnd(tokens, to, index);
  if (second && second.value > first.value) {
    value = { min: first.value, max: second.value };
    to = second.to;
  }
  return measuredAs(tokens, { value, from: index, to });
}

/** "a litre", "an ounce", "a good pinch": an article counts as one only before a unit. */
function articleBeforeUnit(tokens: readonly Token[], index: number) {
  if (!['a', 'an', 'another'].includes(tokens[index]?.word ?? '')) return null;
  // "once a day" tells how often.
  if (['once', 'twice', 'times'].includes(tokens[index - 1]?.word ?? '')) return null;
  const length = SIZE_WORDS.has(tokens[index + 1]?.word ?? '') ? 2 : 1;
  const word = tokens[index + length]?.word ?? '';
  return unitAt(tokens, index + length) || (word.length > 1 && TIME_WORDS[word]) ? { value: 1, length } : null;
}

function rangeEnd(tokens: readonly Token[], index: number, start: number): { value: number; to: number } | null {
  const join = tokens[index]?.word ?? '';
  const between = join === 'and' && tokens[start - 1]?.word === 'between';
  const comma = join === ',' && tokens[index + 1]?.word === 'maybe' ? 1 : 0;
  if (join === ',' && comma === 0) return closeEnd(tokens, index + 1, start);
  if (!between && comma === 0 && !['to', 'or', '-', '–', 'maybe'].includes(join)) return null;
  const number = numberAt(tokens, index + 1 + comma);
  return number ? { value: number.value, to: index + 1 + comma + number.length } : null;
}

/** "sixty, sixty-five degrees": two numbers close together that share what is measured. */
function closeEnd(tokens: readonly Token[], index: number, start: number): { value: number; to: number } | null {
  const [first, second] = [numberAt(tokens, start), numberAt(tokens, index)];
  if (!first || !second || second.value > first.value * 1.6) return null;
  const to = index + second.length;
  const shared = TIME_WORDS[tokens[to]?.word ?? ''] !== undefined || degreesAt(tokens, to) !== null;
  return shared ? { value: second.value, to } : null;
}

/** What stands after the number tells what it measures. */
function measuredAs(tokens: readonly Token[], read: { value: Range; from: number; to: number }): Quantity {
  const { value, from, to } = read;
  const next = tokens[to]?.word ?? '';
  const seconds = TIME_WORDS[next];
  if (seconds) {
    const end = laterEnd(tokens, to + 1, value);
    return { kind: 'duration', value: times(end.value, seconds), unit: null, from, to: end.to };
  }
  const degrees = degreesAt(tokens, to);
  if (degrees) {
    const cap = /\b(under|below|no (more|hotter|higher) than|not (over|above)|up to|max(imum)?)( of)?$/;
    const capped = cap.test(wordsOf(tokens.slice(Math.max(0, from - 4), from)));
    const celsius = degrees.toCelsius(value);
    return { kind: 'temperature', value: celsius, unit: null, from, to: degrees.to, ...(capped && { cap: true }) };
  }
  if (next === '%' || next === 'percent') return { kind: 'share', value, unit: null, from, to: to + 1 };
  if (next === 'per' && tokens[to + 1]?.word === 'cent') return { kind: 'share', value, unit: null, from, to: to + 2 };
  const unit = unitAt(tokens, to);
  if (!unit) return { kind: 'count', value, unit: null, from, to };
  const added = addedAt(tokens, to + unit.length);
  const whole = added ? { min: value.min + added.value, max: value.max + added.value } : value;
  return { kind: 'amount', value: whole, unit: unit.unit, from, to: to + unit.length + (added?.length ?? 0) };
}

/** "eight minutes, maybe ten", "an hour and a half". */
function laterEnd(tokens: readonly Token[], index: number, value: Range): { value: Range; to: number } {
  const added = addedAt(tokens, index);
  if (added) return { value: { min: value.min + added.value, max: value.max + added.value }, to: index + added.length };
  const comma = tokens[index]?.text === ',' ? 1 : 0;
  if (!['maybe', 'or', 'to'].includes(tokens[index + comma]?.word ?? '')) return { value, to: index };
  const number = numberAt(tokens, index + comma + 1);
  const to = index + comma + 1 + (number?.length ?? 0);
  if (!number || number.value <= value.max || number.value > value.max * 3) return { value, to: index };
  const repeated = TIME_WORDS[tokens[to]?.word ?? ''] ? 1 : 0;
  return { value: { min: value.min, max: number.value }, to: to + repeated };
}

function degreesAt(tokens: readonly Token[], index: number) {
  const words = tokens.slice(index, index + 3).map(({ word }) => word);
  const sign = words[0] === '°' || words[0] === 'degrees' || words[0] === 'degree';
  const scale = words[sign ? 1 : 0];
  const named = ['c', 'f', 'celsius', 'fahrenheit', 'centigrade'].includes(scale ?? '');
  if (!sign && !named) return null;
  const fahrenheit = scale === 'f' || scale === 'fahrenheit';
  const toCelsius = ({ min, max }: Range): Range =>
    fahrenheit ? { min: celsius(min), max: celsius(max) } : { min, max };
  return { to: index + (sign ? 1 : 0) + (named ? 1 : 0), toCelsius };
}

const celsius = (fahrenheit: number) => Math.round((fahrenheit - 32) / 1.8);
const times = ({ min, max }: Range, factor: number): Range => ({ min: min * factor, max: max * factor });

/** Drops what the next quantity corrects; a correction that names no unit keeps the unit of what it corrects. */
function withoutCorrected(tokens: readonly Token[], quantities: readonly Quantity[]): Quantity[] {
  const kept: Quantity[] = [];
  for (const quantity of quantities) {
    const before = kept.at(-1);
    if (before && corrects(tokens, before, quantity)) {
      kept.pop();
      kept.push(
        quantity.kind === 'count' && before.unit ? { ...quantity, kind: before.kind, unit: before.unit } : quantity,
      );
    } else kept.push(quantity);
  }
  return kept;
}

function corrects(tokens: readonly Token[], before: Quantity, after: Quantity): boolean {
  if (after.from - before.to > 14) return false;
  const between = tokens.slice(before.to, after.from);
  if (between.some(({ text }) => text === '\n') || !CORRECTION.test(wordsOf(between.slice(-5)))) return false;
  if (before.kind !== after.kind) return before.kind === 'count' || after.kind === 'count';
  return before.kind !== 'temperature' || !between.some(({ word }) => word === 'not');
}
