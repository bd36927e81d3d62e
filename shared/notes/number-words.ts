import { numericQuantity } from 'numeric-quantity';
import type { Token } from './tokens.ts';

export interface SpokenNumber {
  value: number;
  /** How many tokens it takes. */
  length: number;
}

const ONES = [
  ...['zero', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten', 'eleven', 'twelve'],
  ...['thirteen', 'fourteen', 'fifteen', 'sixteen', 'seventeen', 'eighteen', 'nineteen'],
];
const TENS = ['', '', 'twenty', 'thirty', 'forty', 'fifty', 'sixty', 'seventy', 'eighty', 'ninety'];
const VULGAR = /^[½¼¾⅓⅔⅛⅜⅝⅞]$/;

/** Shares and rough numbers as they are said; longer phrases first. */
const PHRASES: readonly [phrase: readonly string[], value: number][] = (
  [
    ['three quarters of an', 3 / 4],
    ['three quarters of a', 3 / 4],
    ['three quarters', 3 / 4],
    ['two thirds of a', 2 / 3],
    ['two thirds', 2 / 3],
    ['a quarter of an', 1 / 4],
    ['a quarter of a', 1 / 4],
    ['quarter of an', 1 / 4],
    ['quarter of a', 1 / 4],
    ['a third of a', 1 / 3],
    ['an eighth of a', 1 / 8],
    ['a couple of', 2],
    ['a couple', 2],
    ['half a dozen', 6],
    ['a dozen', 12],
    ['half an', 1 / 2],
    ['half a', 1 / 2],
    ['half', 1 / 2],
  ] as const
).map(([phrase, value]) => [phrase.split(' '), value]);

/** What is added to a whole number: "two and a half". */
const ADDED: readonly [phrase: string, value: number][] = [
  ['and three quarters', 3 / 4],
  ['and two thirds', 2 / 3],
  ['and a quarter', 1 / 4],
  ['and a third', 1 / 3],
  ['and a half', 1 / 2],
];

/** A number in figures or words that begins at this token: `450`, `1 ½`, `four hundred and fifty`, `half a`, `a couple of`. */
export function numberAt(tokens: readonly Token[], index: number): SpokenNumber | null {
  return figureAt(tokens, index) ?? phraseAt(tokens, index) ?? wordsAt(tokens, index);
}

function figureAt(tokens: readonly Token[], index: number): SpokenNumber | null {
  const [token, next, after] = tokens.slice(index, index + 3);
  if (!token) return null;
  if (VULGAR.test(token.text)) return { value: numericQuantity(token.text), length: 1 };
  if (!/^\d/.test(token.text)) return null;
  const value = toNumber(token.text);
  if (next && VULGAR.test(next.text)) return { value: value + numericQuantity(next.text), length: 2 };
  if (next?.text === '/' && after && /^[1-9]\d*$/.test(after.text))
    return { value: value / Number(after.text), length: 3 };
  if (next && after && /^[1-9]$/.test(next.text) && after.text === '/' && /^[2-9]$/.test(tokens[index + 3]?.text ?? ''))
    return { value: value + Number(next.text) / Number(tokens[index + 3]!.text), length: 4 };
  return withAdded(tokens, index, { value, length: 1 });
}

/** A comma before three figures groups thousands; before one or two it is a decimal sign. */
function toNumber(text: string): number {
  return Number(/^\d{1,3},\d{3}$/.test(text) ? text.replace(',', '') : text.replace(',', '.'));
}

function phraseAt(tokens: readonly Token[], index: number): SpokenNumber | null {
  for (const [phrase, value] of PHRASES)
    if (phrase.every((word, offset) => tokens[index + offset]?.word === word)) {
      const next = tokens[index + phrase.length]?.word ?? '';
      // "half past nine", "half way", "half the time" measure nothing.
      return phrase.length === 1 && ['past', 'way', 'the', 'of', 'and'].includes(next)
        ? null
        : { value, length: phrase.length };
    }
  return null;
}

const onesOf = (word: string | undefined) => ONES.indexOf(word ?? '');
const tensOf = (word: string | undefined) => Math.max(TENS.indexOf(word ?? '-'), 0) * 10;

/** Below a hundred: "seven", "forty", "seventy-five". */
function belowHundred(tokens: readonly Token[], index: number): SpokenNumber | null {
  const one = onesOf(tokens[index]?.word);
  if (one >= 0) return { value: one, length: 1 };
  const ten = tensOf(tokens[index]?.word);
  if (ten === 0) return null;
  const hyphen = tokens[index + 1]?.text === '-' ? 1 : 0;
  const unit = onesOf(tokens[index + 1 + hyphen]?.word);
  return unit > 0 && unit < 10 ? { value: ten + unit, length: 2 + hyphen } : { value: ten, length: 1 };
}

function wordsAt(tokens: readonly Token[], index: number): SpokenNumber | null {
  const article = tokens[index]?.word === 'a' && ['hundred', 'thousand'].includes(tokens[index + 1]?.word ?? '');
  const first = article ? { value: 1, length: 1 } : belowHundred(tokens, index);
  if (!first) return null;
  const scale = tokens[index + first.length]?.word;
  if (scale === 'thousand') return scaled(tokens, index, first, 1000);
  if (scale === 'hundred') return scaled(tokens, index, first, 100);
  // "three fifty" is 350: a ten after a lone one is a hundred's tail.
  const tail = first.value > 0 && first.value < 10 ? belowHundred(tokens, index + 1) : null;
  if (tail && tail.value >= 10) return { value: first.value * 100 + tail.value, length: 1 + tail.length };
  return decimalOf(tokens, index, first) ?? withAdded(tokens, index, first);
}

/** "one point two", "nought point five" is said digit by digit. */
function decimalOf(tokens: readonly Token[], index: number, whole: SpokenNumber): SpokenNumber | null {
  if (tokens[index + whole.length]?.word !== 'point') return null;
  const digits: number[] = [];
  for (let at = index + whole.length + 1; ; at += 1) {
    const digit = onesOf(tokens[at]?.word);
    if (digit < 0 || digit > 9) break;
    digits.push(digit);
  }
  if (digits.length === 0) return null;
  return { value: Number(`${whole.value}.${digits.join('')}`), length: whole.length + 1 + digits.length };
}

function scaled(tokens: readonly Token[], index: number, first: SpokenNumber, factor: 100 | 1000): SpokenNumber {
  const length = first.length + 1;
  const joined = tokens[index + length]?.word === 'and' ? 1 : 0;
  const tail =
    factor === 1000 ? wordsAt(tokens, index + length + joined) : belowHundred(tokens, index + length + joined);
  const value = first.value * factor;
  if (!tail || tail.value >= factor) return withAdded(tokens, index, { value, length });
  return { value: value + tail.value, length: length + joined + tail.length };
}

/** "two and a half". */
function withAdded(tokens: readonly Token[], index: number, number: SpokenNumber): SpokenNumber {
  const added = addedAt(tokens, index + number.length);
  return added ? { value: number.value + added.value, length: number.length + added.length } : number;
}

/** "and a half", "and two thirds" at this token; also said after the unit, "a litre and a half". */
export function addedAt(tokens: readonly Token[], index: number): SpokenNumber | null {
  if (tokens[index]?.word !== 'and') return null;
  const after = [tokens[index + 1]?.word, tokens[index + 2]?.word].join(' ');
  const found = ADDED.find(([phrase]) => phrase === `and ${after}`);
  return found ? { value: found[1], length: 3 } : null;
}
