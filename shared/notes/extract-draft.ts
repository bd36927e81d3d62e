import type { Draft, DraftGap, DraftIngredient, DraftStep } from '../contracts/notes.ts';
import type { ShootCue } from '../contracts/shoots.ts';
import { RECIPE_KINDS, type Allergen, type RecipeKind } from '../contracts/words.ts';
import { readIngredients } from './ingredients.ts';
import { readEquipment, readSteps, readStorage, readYields } from './method.ts';
import { tokenise } from './number-words.ts';
import { makeVocabulary, type Vocabulary } from './vocabulary.ts';

type LarderNames = Parameters<typeof makeVocabulary>[0];

/**
 * The draft that a shoot's cues give: ingredients, steps, equipment, yield, keeping, each with its cue and its words, what was
 * named but left out, and the gaps that an editor would ask about. Deterministic; the larder's names are its vocabulary.
 */
export function extractDraft(cues: readonly ShootCue[], larder: LarderNames): Draft {
  const vocabulary = makeVocabulary(larder);
  const title = titleOf(cues);
  const ingredients = readIngredients(cues, vocabulary);
  const steps = readSteps(cues, ingredients);
  const yields = readYields(cues);
  const storage = readStorage(cues);
  return {
    title,
    kind: kindOf(title, cues),
    ingredients,
    steps,
    equipment: readEquipment(cues),
    yields,
    storage,
    allergens: allergensOf(ingredients, larder),
    gaps: gapsOf({ ingredients, steps, yields, storage }),
    asides: asidesOf(cues, ingredients, vocabulary),
  };
}

/** A heading in capitals, or the words before "cordial", "sour" and their like in the first cues. */
function titleOf(cues: readonly ShootCue[]): string {
  const beginnings = cues.slice(0, 2).map(({ text }) => /^[^a-z(]{6,}/.exec(text)?.[0].trim() ?? '');
  const heading = beginnings.find((text) => /\p{Lu}{2}/u.test(text));
  if (heading) return capitalise(heading.toLowerCase());
  for (const { text } of cues.slice(0, 4)) {
    const named =
      /((?:[\p{L}'’-]+(?: and | & | ))?[\p{L}'’-]+(?: [\p{L}'’-]+)? (?:cordial|syrup|shrub|liqueur|bitters|vermouth|sour|highball|orgeat|infusion|gin))\b/iu.exec(
        text,
      );
    if (named)
      return capitalise(
        named[1]!.replace(/^(this is|it's|the|a|an|our|my|right|for|of|making|today|some) /gi, '').trim(),
      );
  }
  return '';
}

function capitalise(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

const KIND_WORDS: readonly [RegExp, RecipeKind][] = [
  [/\bshrub\b/i, 'shrub'],
  [/\bcordial\b/i, 'cordial'],
  [/\b(syrup|orgeat|falernum)\b/i, 'syrup'],
  [/\bbitters\b/i, 'bitters'],
  [/\bliqueur\b/i, 'liqueur'],
  [/\b(sour|highball|martini|fizz|punch|spritz|shake|coupe)\b/i, 'drink'],
  [/\b(infusion|infused|vermouth|steep)\b/i, 'infusion'],
];

function kindOf(title: string, cues: readonly ShootCue[]): RecipeKind {
  const all = cues.map(({ text }) => text).join(' ');
  for (const text of [title, all]) {
    const found = KIND_WORDS.find(([pattern]) => pattern.test(text));
    if (found) return found[1];
  }
  return RECIPE_KINDS[0];
}

function allergensOf(ingredients: readonly DraftIngredient[], larder: LarderNames): Allergen[] {
  const used = new Set(ingredients.map(({ larderId }) => larderId));
  return [...new Set(larder.filter(({ id }) => used.has(id)).flatMap(({ allergens }) => allergens))];
}

function gapsOf({
  ingredients,
  steps,
  yields,
  storage,
}: Pick<Draft, 'ingredients' | 'steps' | 'yields' | 'storage'>): DraftGap[] {
  return [
    ...ingredients
      .filter(({ amount }) => amount === null)
      .map(({ name, cue, at }): DraftGap => ({ kind: 'amount', subject: name, cue, at })),
    ...steps.filter(isUntimed).map(({ text, cue, at }): DraftGap => ({ kind: 'duration', subject: text, cue, at })),
    ...(yields.length === 0 ? [{ kind: 'yield' as const, subject: '', cue: null, at: null }] : []),
    ...(storage.some(({ days }) => days !== null)
      ? []
      : [{ kind: 'keeping' as const, subject: '', cue: storage[0]?.cue ?? null, at: storage[0]?.at ?? null }]),
  ];
}

function isUntimed({ durationSec, passive, operation }: DraftStep): boolean {
  return durationSec === null && (passive || operation?.kind === 'heat' || operation?.kind === 'strain');
}

/** What the larder knows and the notes name, but which does not go in: "not malt vinegar". */
function asidesOf(
  cues: readonly ShootCue[],
  ingredients: readonly DraftIngredient[],
  vocabulary: Vocabulary,
): Draft['asides'] {
  const used = new Set(ingredients.map(({ larderId }) => larderId));
  const asides = new Map<string, Draft['asides'][number]>();
  for (const cue of cues) {
    const tokens = tokenise(cue.text);
    for (let index = 0; index < tokens.length; index += 1) {
      const found = vocabulary.at(tokens, index);
      if (!found) continue;
      if (!used.has(found.known.larderId) && !asides.has(found.known.larderId))
        asides.set(found.known.larderId, { cue: cue.index, at: cue.startMs, words: cue.text, name: found.known.name });
      index += found.length - 1;
    }
  }
  return [...asides.values()];
}
