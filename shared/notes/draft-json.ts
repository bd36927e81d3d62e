import type { Draft } from '../contracts/notes.ts';
import type { Unit } from '../contracts/words.ts';

const PIECES = new Set<Unit | null>(['strip', 'stick', 'pod']);

/** The draft as it is printed for other programs: plain words, gaps as sentences, allergens by their EU names. */
export function toDraftJson(draft: Draft): Record<string, unknown> {
  return {
    ...draft,
    kind: draft.kind === 'drink' ? 'cocktail' : draft.kind,
    ingredients: draft.ingredients.map((item) => ({ ...item, unit: PIECES.has(item.unit) ? 'piece' : item.unit })),
    storage: draft.storage.map((item) => ({ ...item, where: item.where === 'refrigerator' ? 'fridge' : item.where })),
    allergens: draft.allergens.map((allergen) => (allergen === 'egg' ? 'eggs' : allergen)),
    gaps: draft.gaps.map(({ message }) => message),
  };
}
