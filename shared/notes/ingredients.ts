import type { DraftIngredient } from '../contracts/notes.ts';
import { foldMentions, type Group } from './fold.ts';
import { linkAmounts } from './link-amounts.ts';
import { findMentions, type Mention } from './mentions.ts';
import { BETWEEN, STATES } from './name-words.ts';
import type { Quantity } from './quantities.ts';
import { wordsOf, type Transcript } from './tokens.ts';
import type { Vocabulary } from './vocabulary.ts';

export interface ReadIngredients {
  ingredients: DraftIngredient[];
  /** Named but left out, each once. */
  leftOut: Mention[];
  /** Of each ingredient all places that name it. */
  places: (readonly Mention[])[];
}

/** Everything that goes in, each once, and what is only named. `taken` are quantities that measure something else. */
export function readIngredients(
  transcript: Transcript,
  {
    vocabulary,
    quantities,
    taken,
  }: { vocabulary: Vocabulary; quantities: readonly Quantity[]; taken: ReadonlySet<Quantity> },
): ReadIngredients {
  const found = findMentions(transcript, vocabulary);
  const { mentions, links } = linkAmounts(transcript, { mentions: found, quantities, taken, vocabulary });
  const groups = foldMentions(transcript, mentions, links);
  const goesIn = groups.filter((group) => isIn(transcript, group));
  return {
    ingredients: goesIn.map((group) => toIngredient(transcript, group)),
    leftOut: groups.filter((group) => !goesIn.includes(group) && !isIce(group)).map(({ mentions: [first] }) => first!),
    places: goesIn.map(({ mentions: all }) => all),
  };
}

/** Ice belongs to the making, not to the measure. */
const isIce = ({ name }: Group) => /^(\w+ )?ice( cubes?)?$/.test(name);

function isIn({ typed, tokens }: Transcript, group: Group): boolean {
  if (isIce(group) || group.intermediate) return false;
  const said = (...ways: Mention['said'][]) => group.mentions.some((mention) => ways.includes(mention.said));
  if (group.amount && group.sure) return true;
  if (said('refused')) return false;
  // "add it to the bitters" names what is being made, not the bitters of the larder.
  const own = ({ bare, known }: Mention) => !bare || (known !== null && known.larderId === group.known?.larderId);
  if (group.mentions.some((mention) => (mention.said === 'added' || mention.said === 'optional') && own(mention)))
    return true;
  // The first typed row is the heading.
  const heads = ({ from, leads, known }: Mention) => leads && known !== null && tokens[from]!.cue > 0;
  return typed && group.mentions.some((mention) => mention.said === 'named' && heads(mention));
}

function toIngredient({ tokens, cues }: Transcript, group: Group): DraftIngredient {
  const first = group.mentions.find(({ said }) => said !== 'refused' && said !== 'told') ?? group.mentions[0]!;
  const token = tokens[first.from]!;
  const held = group.amount ? tokens[group.amount.from]! : null;
  return {
    cue: token.cue,
    at: token.at,
    words: cues[(held ?? token).cue]?.text ?? '',
    name: group.name,
    amount: group.amount?.value ?? null,
    unit: group.amount?.unit ?? null,
    optional: group.optional,
    amountAt: held?.at ?? null,
    prep: prepOf(tokens, group),
    larderId: group.known?.larderId ?? null,
    confidence: confidenceOf(group),
  };
}

function confidenceOf({ amount, known, sure }: Group): number {
  if (!amount) return known ? 0.6 : 0.4;
  return (known ? 0.7 : 0.5) + (sure && amount.near ? 0.25 : 0);
}

/** States before the name ("fresh", "cold"), or the words after a comma that tell how it is prepared. */
function prepOf(tokens: Transcript['tokens'], { mentions, amount }: Group): string {
  const mention = mentions.find(
    ({ from, to }) => amount && (from >= amount.to ? from - amount.to < 5 : amount.from - to < 8),
  );
  if (!mention) return '';
  let from = mention.from;
  while (from > 0 && BETWEEN.has(tokens[from - 1]!.word)) from -= 1;
  const states = tokens.slice(from, mention.from).filter(({ word }) => STATES.has(word));
  if (states.length > 0) return wordsOf(states);
  const next = tokens[mention.to]?.text;
  if (next !== ',' && next !== '(') return '';
  const after = tokens.slice(mention.to + 1, mention.to + 5);
  const end = after.findIndex(({ word }) => !/^\p{L}{3,}$/u.test(word));
  const words = after.slice(0, end < 0 ? after.length : end);
  return words.some(({ word }) => PREPARED.test(word)) ? wordsOf(words.slice(0, 4)) : '';
}

const PREPARED = /(ed|torn|cut|fresh|dried|frozen|whole|split|crushed|over)$/;
