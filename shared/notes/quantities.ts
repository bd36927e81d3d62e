import type { Range } from '../contracts/primitives.ts';
import type { Unit } from '../contracts/words.ts';
import { numberAt, tokenise, type Token } from './number-words.ts';
import { TIME_WORDS, UNIT_WORDS } from './unit-words.ts';

/** Something measured in a cue, with the tokens it takes. */
export interface Quantity {
  kind: 'amount' | 'duration' | 'temperature' | 'count' | 'share';
  /** Amount or count in its unit, seconds, or degrees Celsius. */
  value: Range;
  unit: Unit | null;
  from: number;
  to: number;
}

export interface ReadCue {
  tokens: Token[];
  quantities: Quantity[];
}

const CORRECTION = /\b(no|sorry|actually|make that|i mean|rather|scratch that|correction)\b/i;

/** All quantities of a cue in order, corrected ones taken out: "thirty, no, forty grams" is forty grams. */
export function readQuantities(text: string): ReadCue {
  const tokens = tokenise(text);
  const quantities: Quantity[] = [];
  for (let index = 0; index < tokens.length;) {
    const quantity = quantityAt(tokens, index);
    if (quantity) quantities.push(quantity);
    index = quantity ? quantity.to : index + 1;
  }
  return { tokens, quantities: withoutCorrected(text, tokens, quantities).filter(isPossible) };
}

/** Whether a recipe could hold it: a finite number, a temperature that a bar can reach. "1/0 cup" and "5000 degrees" are slips. */
function isPossible({ kind, value: { min, max } }: Quantity): boolean {
  if (!Number.isFinite(min) || !Number.isFinite(max)) return false;
  return kind !== 'temperature' || (min >= -200 && max <= 300);
}

function quantityAt(tokens: readonly Token[], index: number): Quantity | null {
  if (tokens[index]?.word === 'overnight')
    return { kind: 'duration', value: { min: 28_800, max: 43_200 }, unit: null, from: index, to: index + 1 };
  const article = articleBeforeUnit(tokens, index);
  const first = article ?? numberAt(tokens, index);
  if (!first) return null;
  let to = index + first.length;
  let value = { min: first.value, max: first.value };
  const second = article ? null : rangeEnd(tokens, to);
  if (second && second.value > first.value) {
    value = { min: first.value, max: second.value };
    to = second.to;
  }
  return measuredAs(tokens, { value, from: index, to });
}

/** "a litre", "an ounce", "a good pinch": an article counts as one only before a unit. */
function articleBeforeUnit(tokens: readonly Token[], index: number) {
  if (!['a', 'an'].includes(tokens[index]?.word ?? '')) return null;
  const filler = ['good', 'big', 'small', 'little', 'generous', 'scant', 'heaped'].includes(
    tokens[index + 1]?.word ?? '',
  );
  const length = filler ? 2 : 1;
  return unitAt(tokens, index + length) || TIME_WORDS[tokens[index + length]?.word ?? ''] ? { value: 1, length } : null;
}

function rangeEnd(tokens: readonly Token[], index: number): { value: number; to: number } | null {
  if (!['to', 'or', '-', '–', 'maybe'].includes(tokens[index]?.word ?? '')) {
    // "ten minutes, maybe twelve" keeps its unit in the middle; only a comma may stand before "maybe".
    if (tokens[index]?.text !== ',' || tokens[index + 1]?.word !== 'maybe') return null;
    return endAt(tokens, index + 2);
  }
  return endAt(tokens, index + 1);
}

function endAt(tokens: readonly Token[], index: number) {
  const number = numberAt(tokens, index);
  return number ? { value: number.value, to: index + number.length } : null;
}

function measuredAs(tokens: readonly Token[], read: { value: Range; from: number; to: number }): Quantity {
  const { value, from, to } = read;
  const next = tokens[to]?.word ?? '';
  const seconds = TIME_WORDS[next];
  if (seconds && !(next === 's' || next === 'h'))
    return { kind: 'duration', value: times(value, seconds), unit: null, from, to: to + 1 };
  const degrees = degreesAt(tokens, to);
  if (degrees) return { kind: 'temperature', value: degrees.toCelsius(value), unit: null, from, to: degrees.to };
  if (next === '%' || next === 'percent') return { kind: 'share', value, unit: null, from, to: to + 1 };
  const unit = unitAt(tokens, to);
  if (unit) return { kind: 'amount', value, unit: unit.unit, from, to: to + unit.length };
  return { kind: 'count', value, unit: null, from, to };
}

function degreesAt(tokens: readonly Token[], index: number) {
  const words = tokens.slice(index, index + 3).map(({ word }) => word);
  const sign = words[0] === '°' || words[0] === 'degrees' || words[0] === 'degree';
  if (!sign && !(words[0] === 'c' || words[0] === 'f')) return null;
  const scale = sign ? words[1] : words[0];
  const named = ['c', 'f', 'celsius', 'fahrenheit', 'centigrade'].includes(scale ?? '');
  const fahrenheit = scale === 'f' || scale === 'fahrenheit';
  const to = index + (sign ? 1 : 0) + (named ? 1 : 0);
  const toCelsius = ({ min, max }: Range): Range =>
    fahrenheit ? { min: celsius(min), max: celsius(max) } : { min, max };
  return { to, toCelsius };
}

const celsius = (fahrenheit: number) => Math.round((fahrenheit - 32) / 1.8);
const times = ({ min, max }: Range, factor: number): Range => ({ min: min * factor, max: max * factor });

function unitAt(tokens: readonly Token[], index: number): { unit: Unit; length: number } | null {
  for (const [words, unit] of UNIT_WORDS)
    if (words.every((word, offset) => tokens[index + offset]?.word === word)) return { unit, length: words.length };
  return null;
}

/** Drops what the next quantity corrects; a correction that names no unit keeps the unit of what it corrects. */
function withoutCorrected(text: string, tokens: readonly Token[], quantities: readonly Quantity[]): Quantity[] {
  const kept: Quantity[] = [];
  for (const quantity of quantities) {
    const before = kept.at(-1);
    if (before && corrects(text, tokens, before, quantity)) {
      kept.pop();
      kept.push(
        quantity.kind === 'count' && before.unit ? { ...quantity, kind: before.kind, unit: before.unit } : quantity,
      );
    } else kept.push(quantity);
  }
  return kept;
}

function corrects(text: string, tokens: readonly Token[], before: Quantity, after: Quantity): boolean {
  const between = text.slice(tokens[before.to - 1]!.end, tokens[after.from]!.start);
  if (between.length > 40 || !CORRECTION.test(between)) return false;
  return before.kind === after.kind || before.kind === 'count' || after.kind === 'count';
}
