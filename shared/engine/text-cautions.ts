import type { RecipeDocument } from '../contracts/recipe-document.ts';
import type { Caution } from '../contracts/words.ts';
import type { Caught } from './caught.ts';

/** Words of a step or a tool that bring a caution with them. "Distilled" water or vinegar is nothing to warn of. */
const TELLTALES: readonly (readonly [Caution, RegExp])[] = [
  ['dry-ice', /\bdry ice\b/i],
  ['liquid-nitrogen', /\bliquid nitrogen\b/i],
  ['vacuum-bag', /\bvacuum(?:[- ]\w+)? (?:bags?|seal\w*|pouch\w*)|\bsous[- ]vide\b/i],
  ['home-distilling', /\bdistill?(?:ing|ation)?\b|\brotary evaporator\b|\bpot still\b/i],
];

/** Cautions that only the wording of the steps and tools gives away; each comes from the words that were met. */
export function cautionsOfText(document: Pick<RecipeDocument, 'steps'>): Caught[] {
  const texts = document.steps.flatMap((step) => [step.text, ...step.tools]);
  return texts.flatMap((text) =>
    TELLTALES.flatMap(([caution, words]): Caught[] => {
      const met = words.exec(text);
      return met ? [[caution, met[0].toLowerCase()]] : [];
    }),
  );
}
