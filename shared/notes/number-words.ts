const ONES = [
  ...['zero', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten', 'eleven', 'twelve'],
  ...['thirteen', 'fourteen', 'fifteen', 'sixteen', 'seventeen', 'eighteen', 'nineteen'],
];
const TENS = ['', '', 'twenty', 'thirty', 'forty', 'fifty', 'sixty', 'seventy', 'eighty', 'ninety'];
const FRACTIONS: Record<string, number> = {
  ...{ '½': 1 / 2, '¼': 1 / 4, '¾': 3 / 4, '⅓': 1 / 3, '⅔': 2 / 3, '⅛': 1 / 8, '⅜': 3 / 8, '⅝': 5 / 8, '⅞': 7 / 8 },
};

export interface Token {
  text: string;
  /** Lower case. */
  word: string;
  start: number;
  end: number;
}

/** Words, figures and signs of a cue with their places in it. */
export function tokenise(text: string): Token[] {
  return [...text.matchAll(/[\p{L}][\p{L}'’]*|\d+(?:[.,]\d+)?|[½¼¾⅓⅔⅛⅜⅝⅞]|[^\s\p{L}\d]/gu)].map((match) => ({
    text: match[0],
    word: match[0].toLowerCase(),
    start: match.index,
    end: match.index + match[0].length,
  }));
}

export interface SpokenNumber {
  value: number;
  /** How many tokens it takes. */
  length: number;
}

/** A number in figures or words that begins at this token: `450`, `1 ½`, `four hundred and fifty`, `half a`, `a couple of`. */
export function numberAt(tokens: readonly Token[], index: number): SpokenNumber | null {
  return figureAt(tokens, index) ?? phraseAt(tokens, index) ?? wordsAt(tokens, index);
}

function figureAt(tokens: readonly Token[], index: number): SpokenNumber | null {
  const token = tokens[index];
  if (!token) return null;
  const fraction = FRACTIONS[token.text];
  if (fraction !== undefined) return { value: fraction, length: 1 };
  if (!/^\d/.test(token.text)) return null;
  const value = toNumber(token.text);
  const next = tokens[index + 1];
  if (next && FRACTIONS[next.text] !== undefined) return { value: value + FRACTIONS[next.text]!, length: 2 };
  const denominator = tokens[index + 2];
  if (next?.text === '/' && denominator && /^\d+$/.test(denominator.text))
    return { value: value / Number(denominator.text), length: 3 };
  return andAHalf(tokens, index, { value, length: 1 });
}

/** A comma before three figures groups thousands; before one or two it is a decimal sign. */
function toNumber(text: string): number {
  return Number(/^\d{1,3},\d{3}$/.test(text) ? text.replace(',', '') : text.replace(',', '.'));
}

const PHRASES: readonly [phrase: string[], value: number][] = [
  [['a', 'couple', 'of'], 2],
  [['a', 'couple'], 2],
  [['a', 'dozen'], 12],
  [['half', 'a', 'dozen'], 6],
  [['three', 'quarters', 'of', 'a'], 3 / 4],
  [['three', 'quarters', 'of', 'an'], 3 / 4],
  [['a', 'quarter', 'of', 'a'], 1 / 4],
  [['half', 'a'], 1 / 2],
  [['half', 'an'], 1 / 2],
  [['half'], 1 / 2],
];

function phraseAt(tokens: readonly Token[], index: number): SpokenNumber | null {
  for (const [phrase, value] of PHRASES)
    if (phrase.every((word, offset) => tokens[index + offset]?.word === word)) return { value, length: phrase.length };
  return null;
}

function wordsAt(tokens: readonly Token[], index: number): SpokenNumber | null {
  let total = 0;
  let group = 0;
  let at = index;
  for (; at < tokens.length; at += 1) {
    const word = tokens[at]!.word;
    if (word === 'hundred' && at > index) group = Math.max(group, 1) * 100;
    else if (word === 'thousand' && at > index) {
      total += Math.max(group, 1) * 1000;
      group = 0;
    } else if (ONES.includes(word) || TENS.indexOf(word) > 1) {
      const value = ONES.includes(word) ? ONES.indexOf(word) : TENS.indexOf(word) * 10;
      // "three fifty" means 350: a ten after a lone one is a hundred's tail.
      if (group > 0 && group < 10 && value >= 10) group = group * 100 + value;
      else if (group % 10 !== 0 || (group > 0 && group < 20 && value < 10 && group % 10 !== 0)) break;
      else group += value;
    } else if (!((word === 'and' || word === '-') && at > index && isNumberWord(tokens[at + 1]))) break;
  }
  return at === index || isLoneJoin(tokens, index)
    ? null
    : andAHalf(tokens, index, { value: total + group, length: at - index });
}

const isNumberWord = (token: Token | undefined) =>
  token !== undefined && (ONES.includes(token.word) || TENS.indexOf(token.word) > 1);

const isLoneJoin = (tokens: readonly Token[], index: number) => !isNumberWord(tokens[index]);

/** "two and a half". */
function andAHalf(tokens: readonly Token[], index: number, number: SpokenNumber): SpokenNumber {
  const after = tokens.slice(index + number.length, index + number.length + 3).map(({ word }) => word);
  return after.join(' ') === 'and a half' ? { value: number.value + 0.5, length: number.length + 3 } : number;
}
