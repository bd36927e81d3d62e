import { recipeDocument, type RecipeDocument } from './recipe-document.ts';

/**
 * Reads a stored document. One of an older schema is first brought to the present one, step by step; schema 1 is the first, so
 * today this only checks. Throws where what is stored is no recipe document.
 */
export function upgradeRecipeDocument(raw: unknown): RecipeDocument {
  return recipeDocument.parse(raw);
}
