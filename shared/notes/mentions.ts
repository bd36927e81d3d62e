import { BETWEEN, DERIVED, HEADS, NAME_ADJECTIVES, STATES, STOPS } from './name-words.ts';
import { numberAt } from './number-words.ts';
import { OTHER_DRINK, saidAs, type SaidAs } from './said-as.ts';
import { endsSentence, wordsAfter, wordsBefore, wordsOf, type Token, type Transcript } from './tokens.ts';
import { unitAt } from './unit-words.ts';
import { stem, type Known, type Vocabulary } from './vocabulary.ts';

/** A place where something is named that could go in. */
export interface Mention {
  from: number;
  to: number;
  name: string;
  known: Known | null;
  /** A noun alone, "the syrup", that may point back to a longer name. */
  bare: boolean;
  said: SaidAs;
  /** Stands at the beginning of a row, a sentence or a new thought: what follows is about it. */
  leads: boolean;
  /** How many pieces the name itself tells: "the peel of two lemons". */
  counted: number | null;
}

/** All names in order: the larder's, and what ends in a noun of the trade ("gooseberry shrub"). */
export function findMentions({ tokens }: Transcript, vocabulary: Vocabulary): Mention[] {
  const mentions: Mention[] = [];
  let free = 0;
  for (let index = 0; index < tokens.length;) {
    const span =
      partOf(tokens, index, vocabulary) ?? knownAt(tokens, index, free, vocabulary) ?? headAt(tokens, index, free);
    if (!span) {
      index += 1;
      continue;
    }
    mentions.push(mentionOf(tokens, span, vocabulary));
    free = span.to;
    index = span.to;
  }
  return mentions;
}

interface Span {
  from: number;
  to: number;
  known: Known | null;
  bare: boolean;
  name?: string;
  counted?: number;
}

/** "the peel of one lemon": a part, counted by what it comes from. */
function partOf(tokens: readonly Token[], index: number, vocabulary: Vocabulary): Span | null {
  if (!PARTS.has(tokens[index]!.word) || tokens[index + 1]?.word !== 'of') return null;
  const article = ['a', 'an'].includes(tokens[index + 2]?.word ?? '') ? { value: 1, length: 1 } : null;
  const number = numberAt(tokens, index + 2) ?? article;
  const at = index + 2 + (number?.length ?? 0);
  const found = number ? vocabulary.at(tokens, at) : null;
  if (!number || !found) return null;
  const name = `${stem(tokens[at]!.word)} ${tokens[index]!.word}`;
  return {
    from: index,
    to: at + found.length,
    known: vocabulary.named(name.split(' ')),
    bare: false,
    name,
    counted: number.value,
  };
}

const PARTS = new Set(['peel', 'zest', 'juice', 'rind']);

/** A name of the larder with the adjectives before it and the noun after it that makes it another thing. */
function knownAt(tokens: readonly Token[], index: number, free: number, vocabulary: Vocabulary): Span | null {
  const found = vocabulary.at(tokens, index);
  if (!found) return null;
  // "boiling water" is water, boiling.
  if (STATES.has(tokens[index]!.word) && vocabulary.at(tokens, index + 1)?.length === found.length - 1) return null;
  let from = index;
  while (from > free && NAME_ADJECTIVES.has(tokens[from - 1]!.word)) from -= 1;
  let to = index + found.length;
  let known: Known | null = found.known;
  while (DERIVED.has(tokens[to]?.word ?? '')) {
    to += 1;
    known = null;
  }
  if (known === null || from < index) known = vocabulary.named(tokens.slice(from, to).map(({ word }) => word)) ?? known;
  return { from, to, known, bare: to - from === 1 && HEADS.has(tokens[index]!.word) };
}

/** A noun of the trade with up to two words before it that can only be its own. */
function headAt(tokens: readonly Token[], index: number, free: number): Span | null {
  if (!HEADS.has(tokens[index]!.word)) return null;
  let from = index;
  while (from > free && index - from < 2 && belongs(tokens, from - 1)) from -= 1;
  return { from, to: index + 1, known: null, bare: from === index };
}

function belongs(tokens: readonly Token[], index: number): boolean {
  const { word } = tokens[index]!;
  if (!/^\p{L}{3,}$/u.test(word) || STOPS.has(word) || /(ing|ly)$/.test(word)) return false;
  return (!BETWEEN.has(word) || NAME_ADJECTIVES.has(word)) && !numberAt(tokens, index) && !unitAt(tokens, index);
}

/** An unknown name right after an amount: "80 g of gorse flowers"; null where the next words name nothing. */
export function unknownAfter(transcript: Transcript, index: number, vocabulary: Vocabulary): Mention | null {
  const { tokens } = transcript;
  let from = index;
  while (BETWEEN.has(tokens[from]?.word ?? '')) from += 1;
  const said = transcript.typed || tokens[index]?.word === 'of';
  if (!said) return null;
  let to = from;
  while (to - from < 3 && to < tokens.length && isNameWord(tokens, to)) to += 1;
  return to === from ? null : mentionOf(tokens, { from, to, known: null, bare: false }, vocabulary);
}

/** An unknown name at the head of a typed row, before its amount: "meadowsweet, dried 12 g". */
export function unknownBefore({ tokens }: Transcript, index: number, vocabulary: Vocabulary): Mention | null {
  let from = index;
  while (from > 0 && !endsSentence(tokens[from - 1])) from -= 1;
  let to = from;
  while (to - from < 3 && to < index && isNameWord(tokens, to)) to += 1;
  const next = tokens[to];
  const closed = to === index || next?.text === ',' || next?.text === ':' || next?.text === '(' || next?.text === '-';
  return to > from && closed ? mentionOf(tokens, { from, to, known: null, bare: false }, vocabulary) : null;
}

function isNameWord(tokens: readonly Token[], index: number): boolean {
  const { word } = tokens[index]!;
  return /^\p{L}{2,}/u.test(word) && !STOPS.has(word) && !numberAt(tokens, index) && !unitAt(tokens, index);
}

function mentionOf(tokens: readonly Token[], span: Span, vocabulary: Vocabulary): Mention {
  const { from, to, bare } = span;
  const name = span.name ?? wordsOf(tokens.slice(from, to)).replace(/\s*-\s*/g, '-');
  const known = span.known ?? vocabulary.named(name.split(' '));
  return {
    from,
    to,
    name,
    known,
    bare,
    said: surroundingsOf(tokens, from, to),
    leads: leads(tokens, from),
    counted: span.counted ?? null,
  };
}

function surroundingsOf(tokens: readonly Token[], from: number, to: number): SaidAs {
  const sentence = wordsBefore(tokens, from, 60);
  if (OTHER_DRINK.test(`${sentence} `)) return 'told';
  const earlier = wordsOf(tokens.slice(Math.max(0, from - 40), from));
  return saidAs({ before: wordsBefore(tokens, from, 14), after: wordsAfter(tokens, to, 12), earlier });
}

const OPENERS = new Set([
  'so',
  'then',
  'and',
  'now',
  'okay',
  'ok',
  'right',
  'next',
  'finally',
  'the',
  'some',
  'your',
  'a',
  'um',
  ',',
]);

function leads(tokens: readonly Token[], from: number): boolean {
  let index = from;
  while (index > 0 && from - index < 4 && isOpener(tokens[index - 1]!)) index -= 1;
  const opened = tokens
    .slice(index, from)
    .some(({ word }) => ['then', 'now', 'so', 'next', 'okay', 'right'].includes(word));
  return opened || endsSentence(tokens[index - 1]) || tokens[index - 1]!.text === ':';
}

const isOpener = ({ word }: Token) => OPENERS.has(word) || STATES.has(word);
