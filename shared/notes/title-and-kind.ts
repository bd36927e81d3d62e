import type { ShootCue } from '../contracts/shoots.ts';
import { RECIPE_KINDS, type RecipeKind } from '../contracts/words.ts';

const NAMED =
  'cordial|syrup|shrub|liqueur|bitters|vermouth|sour|highball|orgeat|infusion|gin|punch|spritz|fizz|martini|old fashioned';
const KIND_OF_NAME = new RegExp(
  `((?:[\\p{L}'’-]+(?: and | & | \\+ | ))?[\\p{L}'’-]+(?: [\\p{L}'’-]+)? (?:${NAMED}))\\b`,
  'iu',
);
const CALLED =
  /\b(?:it's|is|this one is|we) called? ((?:[\p{L}'’]+ ?){1,4}?)(?= (?:because|and|it's|which|so|it)\b|[,.])/iu;
const LEAD = /^((this is|it's|the|a|an|our|my|right|for|of|making|today|some|and|so|is|doing|egg)\s+)+/i;

/** A heading in capitals, what it is called, or the words before "cordial", "sour" and their like in the first cues. */
export function titleOf(cues: readonly ShootCue[]): string {
  const beginnings = cues.slice(0, 2).map(({ text }) => /^[^a-z(]{6,}/.exec(text)?.[0].trim() ?? '');
  const heading = beginnings.find((text) => /\p{Lu}{2}/u.test(text));
  if (heading) return capitalise(heading.toLowerCase());
  const opening = cues
    .slice(0, 12)
    .map(({ text }) => text)
    .join(' ');
  const called = CALLED.exec(opening)?.[1];
  if (called) return capitalise(called);
  for (const { text } of cues.slice(0, 8)) {
    const named = KIND_OF_NAME.exec(text);
    const title = named?.[1]!.replace(LEAD, '').trim() ?? '';
    if (title.includes(' ')) return capitalise(title);
  }
  return '';
}

const capitalise = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);

const KIND_WORDS: readonly [RegExp, RecipeKind][] = [
  [/\bshrub\b/i, 'shrub'],
  [/\bcordial\b/i, 'cordial'],
  [/\b(syrup|orgeat|falernum)\b/i, 'syrup'],
  [/\bbitters\b/i, 'bitters'],
  [/\bliqueur\b/i, 'liqueur'],
  [/\b(sour|highball|martini|fizz|punch|spritz|shaker|coupe)\b/i, 'drink'],
  [/\b(infusion|infused?|vermouth|steep)\b/i, 'infusion'],
];

/** What the title says, else what the opening says, else the whole. */
export function kindOf(title: string, cues: readonly ShootCue[]): RecipeKind {
  const opening = cues.slice(0, 8).map(({ text }) => text);
  if (opening.some((text) => /\b(highball|sour|spritz|fizz|martini)\b/i.test(text))) return 'drink';
  for (const text of [title, opening.join(' '), cues.map((cue) => cue.text).join(' ')]) {
    const found = KIND_WORDS.find(([pattern]) => pattern.test(text));
    if (found) return found[1];
  }
  return RECIPE_KINDS[0];
}
