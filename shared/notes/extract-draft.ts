import type { Draft, DraftIngredient } from '../contracts/notes.ts';
import type { ShootCue } from '../contracts/shoots.ts';
import type { Allergen } from '../contracts/words.ts';
import { readEquipment } from './equipment.ts';
import { gapsOf } from './gaps.ts';
import { readIngredients } from './ingredients.ts';
import { readStorage, readYields } from './keeping-and-yield.ts';
import type { Mention } from './mentions.ts';
import { readQuantities } from './quantities.ts';
import { readSteps } from './steps.ts';
import { kindOf, titleOf } from './title-and-kind.ts';
import { transcribe, type Transcript } from './tokens.ts';
import { makeVocabulary, type LarderNames } from './vocabulary.ts';

/**
 * The draft that a shoot's cues give: ingredients, steps, equipment, yield, keeping, each with its cue and its words, what was
 * named but left out, and the gaps that an editor would ask about. Deterministic; the larder's names are its vocabulary.
 */
export function extractDraft(cues: readonly ShootCue[], larder: LarderNames = []): Draft {
  const transcript = transcribe(cues);
  const quantities = readQuantities(transcript.tokens);
  const yields = readYields(transcript, quantities);
  const storage = readStorage(transcript, quantities);
  const taken = new Set([...yields.taken, ...storage.taken]);
  const vocabulary = makeVocabulary(larder);
  const { ingredients, leftOut, places } = readIngredients(transcript, { vocabulary, quantities, taken });
  const title = titleOf(cues);
  const kind = kindOf(title, cues);
  const kept = quantities.filter((quantity) => storage.taken.has(quantity));
  const built = transcript.typed && kind === 'drink';
  const steps = readSteps(transcript, { quantities, taken, kept, built, ingredients, places });
  return {
    title,
    kind,
    ingredients,
    steps,
    equipment: readEquipment(transcript),
    yields: yields.items,
    storage: storage.items,
    allergens: allergensOf(ingredients, larder),
    gaps: gapsOf({ ingredients, steps, yields: yields.items, storage: storage.items }),
    asides: leftOut.map((mention) => toAside(transcript, mention)),
  };
}

/** Of what goes in, not of what may. */
function allergensOf(ingredients: readonly DraftIngredient[], larder: LarderNames): Allergen[] {
  const used = new Set(ingredients.filter(({ optional }) => !optional).map(({ larderId }) => larderId));
  return [...new Set(larder.filter(({ id }) => used.has(id)).flatMap(({ allergens }) => allergens))];
}

function toAside({ tokens, cues }: Transcript, { from, name }: Mention): Draft['asides'][number] {
  const { cue, at } = tokens[from]!;
  return { cue, at, words: cues[cue]?.text ?? '', name };
}
