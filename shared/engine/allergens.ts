import type { AllergenFound } from '../contracts/figures.ts';
import type { RecipeDocument } from '../contracts/recipe-document.ts';
import { ALLERGENS, type Allergen } from '../contracts/words.ts';
import { allDocuments, allLines } from './components.ts';
import type { EngineContext } from './context.ts';

/**
 * The allergens of a recipe and of everything in it, with the lines each comes from: by the larder's tags, and what the creator
 * added, here or in a component. In the order of Regulation (EU) 1169/2011, annex II. Nothing computed is ever left out.
 */
export function findAllergens(document: RecipeDocument, context: EngineContext): AllergenFound[] {
  const found = new Map<Allergen, Set<string>>();
  const add = (allergen: Allergen, from: string | null) => {
    const names = found.get(allergen) ?? new Set();
    if (from !== null) names.add(from);
    found.set(allergen, names);
  };
  for (const { item, from } of allLines(document, context))
    for (const allergen of item?.allergens ?? []) add(allergen, from);
  for (const each of allDocuments(document, context))
    for (const allergen of each.extraAllergens) add(allergen, each === document ? null : each.title);
  return ALLERGENS.filter((allergen) => found.has(allergen)).map((allergen) => ({
    allergen,
    from: [...found.get(allergen)!],
  }));
}

/** Names of the lines behind which nothing in the larder stands, so that nobody can say what is in them. */
export function allergensUnknownFor(document: RecipeDocument, context: EngineContext): string[] {
  const unknown = allLines(document, context).filter(({ item }) => item === null);
  return [...new Set(unknown.map(({ from }) => from))];
}
