import type { Figure, Figures, StrengthBand } from '../contracts/figures.ts';
import type { RecipeDocument } from '../contracts/recipe-document.ts';
import { allergensUnknownFor, findAllergens } from './allergens.ts';
import { batchesIn } from './batch.ts';
import { findCautions } from './cautions.ts';
import type { EngineContext } from './context.ts';
import { middleOf } from './figure.ts';
import { computeTimes } from './times.ts';

/**
 * Everything the engine says of a recipe, the same in browser and server.
 *
 * A measured yield wins over a stated one and that over a computed one. What cannot be known says what it lacks; what is guessed
 * on the way carries a range and what it rests on. The document is never changed.
 */
export function computeFigures(document: RecipeDocument, context: EngineContext): Figures {
  const batches = batchesIn(context);
  const { yieldMl, strength, sugar } = batches.of(document);
  return {
    yieldMl,
    strength,
    band: bandOf(strength),
    sugar,
    times: computeTimes(document),
    allergens: findAllergens(document, context),
    cautions: findCautions(document, context, batches),
    allergensUnknownFor: allergensUnknownFor(document, context),
  };
}

/** The lowest % vol of each band above none: ours, from half a per cent, which is commonly sold as free of alcohol. */
const BANDS: readonly (readonly [StrengthBand, number])[] = [
  ['very-strong', 30],
  ['strong', 20],
  ['medium', 10],
  ['light', 0.5],
];

/** The band of a strength by the middle of its range; null where it is not known. */
export function bandOf(strength: Figure): StrengthBand | null {
  const middle = middleOf(strength);
  if (middle === null) return null;
  return BANDS.find(([, from]) => middle >= from)?.[0] ?? 'none';
}
