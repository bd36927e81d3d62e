import type { Range } from '../contracts/primitives.ts';
import type { Unit } from '../contracts/words.ts';
import { unknownAfter, unknownBefore, type Mention } from './mentions.ts';
import { BETWEEN, COUNTABLE } from './name-words.ts';
import type { Quantity } from './quantities.ts';
import { ON_TOP, PAST } from './said-as.ts';
import { endsSentence, wordsAfter, wordsBefore, type Token, type Transcript } from './tokens.ts';
import { unitAt } from './unit-words.ts';
import { stem, type Vocabulary } from './vocabulary.ts';

/** An amount and what it is of. */
export interface Link {
  mention: Mention;
  value: Range;
  /** Null for a bare number, whose unit the rest of the notes tells. */
  unit: Unit | null;
  from: number;
  to: number;
  /** Said right beside the name. */
  near: boolean;
  /** "a bay leaf", "dill sprig": one, because nothing else was said. */
  implied: boolean;
  /** "another twenty": comes on top. */
  onTop: boolean;
}

interface Given {
  mentions: readonly Mention[];
  quantities: readonly Quantity[];
  taken: ReadonlySet<Quantity>;
  vocabulary: Vocabulary;
}

/** How far back, in words, an amount without a name looks for what the talk is about. */
const TOPIC_REACH = 90;
const NEAR = 3;
const REACH = 12;

/** Finds for every amount the name it belongs to; names that only an amount reveals are added. */
export function linkAmounts(transcript: Transcript, given: Given): { mentions: Mention[]; links: Link[] } {
  const { tokens } = transcript;
  const mentions = [...given.mentions];
  const places = indexOf(given.mentions);
  const links: Link[] = [];
  const last = new Map<Mention, Link>();
  for (const [index, quantity] of given.quantities.entries()) {
    if (!isMeasure(tokens, quantity, given.taken) || saysAgain(tokens, given.quantities[index - 1], quantity)) continue;
    const unknown = () => {
      if (quantity.kind !== 'amount') return null;
      const found = unknownAfter(transcript, quantity.to, given.vocabulary);
      if (found) return found;
      return transcript.typed ? unknownBefore(transcript, quantity.from, given.vocabulary) : null;
    };
    const after = mentionAfter(tokens, quantity, places);
    const ofNext = !transcript.typed && tokens[quantity.to]?.word === 'of';
    const near = after ?? (ofNext ? null : mentionBefore(tokens, quantity, places, last));
    const made = near ? null : unknown();
    if (made) mentions.push(made);
    const mention = near ?? made ?? (transcript.typed ? null : topicOf(quantity, places));
    if (!mention) continue;
    const link = linkOf(tokens, quantity, mention, Boolean(near ?? made));
    links.push(link);
    last.set(mention, link);
  }
  mentions.sort((a, b) => a.from - b.from);
  const linked = new Set(links.map(({ mention }) => mention));
  for (const mention of mentions) {
    const implied = linked.has(mention) ? null : (countedIn(mention) ?? impliedOne(tokens, mention));
    if (implied) links.push(implied);
  }
  return { mentions, links: links.sort((a, b) => a.from - b.from) };
}

const VESSEL_AFTER =
  /^(\W*(swing-top|kilner|glass|clean|big|small|large|mason|screw-top|sized?))*\W*(jars?|bottles?|jugs?|pans?|saucepan|bowl|flask|tin|container|glass)\b(?! of\b)/;
const VESSEL_BEFORE = /\b(mine (is|holds)|it holds|holds( about)?|jar (is|of)|a jar that's)$/;

/** An amount, or a number that could be one; not the size of a jar, nor what the recipe once was. */
function isMeasure(tokens: readonly Token[], quantity: Quantity, taken: ReadonlySet<Quantity>): boolean {
  if ((quantity.kind !== 'amount' && quantity.kind !== 'count') || taken.has(quantity)) return false;
  const before = wordsBefore(tokens, quantity.from, 14);
  if (quantity.unit !== 'bottle' && VESSEL_AFTER.test(wordsAfter(tokens, quantity.to, 4))) return false;
  return !VESSEL_BEFORE.test(before) && !PAST.test(`${before} `);
}

/** "half a gram of salt, that's an eighth of a teaspoon": the same in another unit. */
function saysAgain(tokens: readonly Token[], before: Quantity | undefined, { from, kind }: Quantity): boolean {
  if (!before || before.kind !== 'amount' || before.unit === 'bottle' || kind !== 'amount' || from - before.to > 9)
    return false;
  return /\b(that's|that is|which is|call it)( about| around| roughly)?$/.test(wordsBefore(tokens, from, 4));
}

/** The name that follows: "forty mils of fresh lemon juice", "two egg whites". */
function mentionAfter(tokens: readonly Token[], { to }: Quantity, places: Places): Mention | null {
  for (let index = to; index <= to + 5; index += 1) {
    const mention = places.at(index);
    if (mention) return mention;
    if (!BETWEEN.has(tokens[index]?.word ?? '')) return null;
  }
  return null;
}

interface Places {
  at: (index: number) => Mention | undefined;
  /** Mentions that end before a place, the nearest first, while they are within reach. */
  before: (index: number, reach: number) => Mention[];
}

function indexOf(mentions: readonly Mention[]): Places {
  const byStart = new Map(mentions.map((mention) => [mention.from, mention]));
  const order = new Map(mentions.map((mention, index) => [mention, index]));
  return {
    at: (index) => byStart.get(index),
    before: (index, reach) => {
      let nearest: Mention | undefined;
      for (let at = index - 1; at >= 0 && index - at <= reach && !nearest; at -= 1) nearest = byStart.get(at);
      const found: Mention[] = [];
      for (let at = nearest ? order.get(nearest)! : -1; at >= 0 && index - mentions[at]!.to <= reach; at -= 1)
        if (mentions[at]!.to <= index) found.push(mentions[at]!);
      return found;
    },
  };
}

/** The name that came before in the same sentence, with no other amount between: "lemon juice, fresh, forty mils". */
function mentionBefore(
  tokens: readonly Token[],
  quantity: Quantity,
  places: Places,
  last: ReadonlyMap<Mention, Link>,
): Mention | null {
  const reach = quantity.kind === 'count' ? NEAR : REACH;
  const [mention] = places.before(quantity.from, reach + 4);
  if (!mention || quantity.from - mention.to > reach) return null;
  if (tokens.slice(mention.to, quantity.from).some((token) => endsSentence(token))) return null;
  const own = last.get(mention);
  // "One bottle of vermouth, seventy-five centilitres" tells the same amount again; two names do not share one.
  return own && own.unit !== 'bottle' && own.unit !== null ? null : mention;
}

/** What the talk is about: "Then the barley. … How much? Thirty grams." */
function topicOf(quantity: Quantity, places: Places): Mention | null {
  if (quantity.kind !== 'amount' || quantity.unit === 'bottle') return null;
  const topic = places
    .before(quantity.from, TOPIC_REACH)
    .find(({ leads, said, bare }) => !bare && (leads || said === 'added' || said === 'optional'));
  return topic && topic.said !== 'told' ? topic : null;
}

function linkOf(tokens: readonly Token[], quantity: Quantity, mention: Mention, near: boolean): Link {
  const { value, unit, from, to } = quantity;
  const onTop = ON_TOP.test(`${wordsBefore(tokens, from, 3)} ${wordsAfter(tokens, from, to - from + 2)}`);
  return { mention, value, unit, from, to, near, implied: false, onTop };
}

function countedIn(mention: Mention): Link | null {
  const { counted, from, to } = mention;
  if (counted === null) return null;
  const value = { min: counted, max: counted };
  return { mention, value, unit: 'piece', from, to, near: true, implied: false, onTop: false };
}

/** "a bay leaf", "cucumber ribbon", "salt, tiny pinch", "strip of orange peel". */
function impliedOne(tokens: readonly Token[], mention: Mention): Link | null {
  const one = { mention, value: { min: 1, max: 1 }, near: true, implied: true, onTop: false };
  for (let index = mention.to - 1; index <= mention.to + 2; index += 1) {
    if (index < mention.to && mention.to - mention.from === 1) continue;
    const unit = unitAt(tokens, index);
    if (unit && IMPLYING.has(unit.unit) && !tokens[index]!.word.endsWith('s'))
      return { ...one, unit: unit.unit, from: index, to: index + 1 };
    if (index >= mention.to && !BETWEEN.has(tokens[index]?.word ?? '') && tokens[index]?.text !== ',') break;
  }
  const before = tokens[mention.from - 1]?.word === 'of' ? unitAt(tokens, mention.from - 2) : null;
  if (before && IMPLYING.has(before.unit) && !tokens[mention.from - 2]!.word.endsWith('s'))
    return { ...one, unit: before.unit, from: mention.from - 2, to: mention.from };
  const article = ['a', 'an', 'one'].includes(tokens[mention.from - 1]?.word ?? '');
  const last = tokens[mention.to - 1]!.word;
  if (!article || stem(last) !== last || !COUNTABLE.has(last)) return null;
  return { ...one, unit: 'piece', from: mention.from - 1, to: mention.from };
}

const IMPLYING = new Set<Unit>([
  'pinch',
  'dash',
  'splash',
  'handful',
  'sprig',
  'twist',
  'slice',
  'strip',
  'stick',
  'piece',
  'leaf',
]);
