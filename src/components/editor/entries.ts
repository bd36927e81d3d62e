import type { Range } from '@shared/contracts/primitives.ts';
import type { Unit } from '@shared/contracts/words.ts';
import { UNITS } from '@shared/contracts/words.ts';
import { writeAmount } from '@shared/engine/amount-text.ts';
import { tokenise } from '@shared/notes/tokens.ts';
import { TIME_WORDS, unitAt } from '@shared/notes/unit-words.ts';
import { numericQuantity } from 'numeric-quantity';
import { parseDecimal } from '../parse-decimal.ts';

/** What was typed, understood; or why not, as a key of the catalogue and what it speaks of. */
export type Entry<T> = { value: T; fault?: never } | { fault: string; about: string };

/** An amount with its unit; counted things have none. */
export interface Measure {
  amount: Range | null;
  unit: Unit | null;
}

const NUMBER = String.raw`(?:\d+(?:[.,]\d+)?\s*[½¼¾⅓⅔⅛⅜⅝⅞]|\d+\s+\d+\s*[/⁄]\s*\d+|\d+\s*[/⁄]\s*\d+|\d+(?:[.,]\d+)?|[½¼¾⅓⅔⅛⅜⅝⅞])`;
const JOIN = String.raw`\s*(?:–|-|\bto\b)\s*`;
const MEASURE = new RegExp(`^(${NUMBER})(?:${JOIN}(${NUMBER}))?\\s*(.*)$`, 'i');
const TIME = new RegExp(`(${NUMBER})(?:${JOIN}(${NUMBER}))?\\s*([a-z]+)\\s*`, 'giy');
const DEGREES = /^([-−]?\d+(?:[.,]\d+)?)(?:\s*(?:–|\bto\b|-(?=\s*\d))\s*([-−]?\d+(?:[.,]\d+)?))?\s*°?\s*([cf])?$/i;

/**
 * An amount as a bartender writes it: `450 g`, `1–2 dashes`, `1½ fl oz`, `3`. Units by their codes, their printed names or
 * the words the shoot's notes know them by. Nothing typed is no amount.
 *
 * @param nameOf the printed names of a unit, singular and plural
 */
export function readMeasure(typed: string, nameOf: (unit: Unit) => readonly string[]): Entry<Measure> {
  const text = typed.trim();
  if (text === '') return { value: { amount: null, unit: null } };
  const found = MEASURE.exec(text);
  if (!found) return { fault: 'amount', about: text };
  const amount = toRange(found[1]!, found[2]);
  if (!amount) return { fault: 'order', about: text };
  const named = found[3]!.trim();
  if (named === '') return { value: { amount, unit: null } };
  const unit = unitNamed(named, nameOf);
  return unit ? { value: { amount, unit } } : { fault: 'unit', about: named };
}

/** The same the other way round: what {@link readMeasure} understands as this amount. */
export function writeMeasure({ amount, unit }: Measure, nameOf: (unit: Unit) => readonly string[]): string {
  if (!amount) return '';
  const { text } = writeAmount(amount, unit);
  const names = unit ? nameOf(unit) : [];
  return [text, amount.max > 1 ? names.at(-1) : names[0]].filter(Boolean).join(' ');
}

/** A time in seconds: `10–12 min`, `1 h 30 min`, `3 weeks`. Nothing typed is no time. */
export function readDuration(typed: string): Entry<Range | null> {
  const text = typed.trim();
  if (text === '') return { value: null };
  const parts = [...text.matchAll(TIME)];
  if (parts.length === 0 || parts.map(([part]) => part).join('') !== text) return { fault: 'duration', about: text };
  const sum = { min: 0, max: 0 };
  for (const [, low, high, word] of parts) {
    const seconds = TIME_WORDS[word!.toLowerCase()];
    const range = toRange(low!, high);
    if (!seconds || !range) return { fault: 'duration', about: text };
    sum.min += range.min * seconds;
    sum.max += range.max * seconds;
  }
  return { value: { min: Math.round(sum.min), max: Math.round(sum.max) } };
}

const SPANS: readonly (readonly [number, string])[] = [
  [604_800, 'weeks'],
  [86_400, 'days'],
  [3600, 'h'],
  [60, 'min'],
  [1, 's'],
];

export function writeDuration(range: Range | null): string {
  if (!range) return '';
  const { min, max } = range;
  if (min === max) return inParts(min) || '0 s';
  const [seconds, name] = SPANS.find(([span]) => min % span === 0 && max % span === 0) ?? [1, 's'];
  return `${min / seconds}–${max / seconds} ${name}`;
}

function inParts(seconds: number): string {
  const single = SPANS.find(([span]) => seconds > 0 && seconds % span === 0);
  if (single && seconds / single[0] < 120) return `${seconds / single[0]} ${single[1]}`;
  let rest = seconds;
  const parts: string[] = [];
  for (const [span, name] of SPANS.slice(1)) {
    const count = Math.floor(rest / span);
    if (count > 0) parts.push(`${count} ${name}`);
    rest -= count * span;
  }
  if (rest > 0) parts.push(`${rest} s`);
  return parts.join(' ');
}

/** Degrees Celsius; Fahrenheit is understood and turned into Celsius, to a tenth. Nothing typed is no temperature. */
export function readTemperature(typed: string): Entry<Range | null> {
  const text = typed.trim();
  if (text === '') return { value: null };
  const found = DEGREES.exec(text);
  if (!found) return { fault: 'temperature', about: text };
  const fahrenheit = found[3]?.toLowerCase() === 'f';
  const [min, max] = [found[1]!, found[2] ?? found[1]!].map((number) => {
    const degrees = Number(number.replace('−', '-').replace(',', '.'));
    return fahrenheit ? Math.round(((degrees - 32) / 1.8) * 10) / 10 : degrees;
  }) as [number, number];
  if (min > max) return { fault: 'order', about: text };
  if (min < -200 || max > 300) return { fault: 'temperatureBounds', about: text };
  return { value: { min, max } };
}

export function writeTemperature(range: Range | null): string {
  if (!range) return '';
  return range.min === range.max ? `${range.min} °C` : `${range.min}–${range.max} °C`;
}

/** Whole days: `14`, `10–14`, `3 weeks`. Nothing typed is no number of days. */
export function readDays(typed: string): Entry<Range | null> {
  const bare = /^[\d.,½¼¾\s–-]+$/.test(typed) ? `${typed} days` : typed;
  const read = readDuration(bare);
  if (read.fault !== undefined) return { fault: 'days', about: typed.trim() };
  return { value: read.value && { min: read.value.min / 86_400, max: read.value.max / 86_400 } };
}

export function writeDays(range: Range | null): string {
  if (!range) return '';
  return range.min === range.max ? `${range.min}` : `${range.min}–${range.max}`;
}

function toRange(low: string, high: string | undefined): Range | null {
  const [min, max] = [toNumber(low), toNumber(high ?? low)];
  return Number.isFinite(min) && Number.isFinite(max) && min <= max ? { min, max } : null;
}

function toNumber(text: string): number {
  return numericQuantity(text.replace(',', '.').replace('⁄', '/'), { round: false });
}

function unitNamed(text: string, nameOf: (unit: Unit) => readonly string[]): Unit | null {
  const wanted = text.toLowerCase().replaceAll('.', '').replace(/\s+/g, ' ');
  const printed = UNITS.find((unit) => unit === wanted || nameOf(unit).some((name) => name.toLowerCase() === wanted));
  if (printed) return printed;
  const tokens = tokenise(wanted);
  const spoken = unitAt(tokens, 0);
  return spoken && spoken.length === tokens.length ? spoken.unit : null;
}

/** A number within bounds, both included. Nothing typed is no number. */
export function readNumber(typed: string, min: number, max: number): Entry<number | null> {
  const value = parseDecimal(typed);
  if (value === undefined) return { fault: 'number', about: typed.trim() };
  if (value !== null && (value < min || value > max)) return { fault: 'bounds', about: `${min}–${max}` };
  return { value };
}
