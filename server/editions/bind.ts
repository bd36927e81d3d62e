import type { Knex } from 'knex';
import type { BoundPlate, BoundRecipe, Snapshot } from '../../shared/contracts/editions.ts';
import { plainText } from '../content/markdown.ts';
import { insertBound } from './editions.queries.ts';
import type { BoundChapterRow, BoundRecipeRow, BoundTeaser } from './editions.rows.ts';
import { platesOf } from './snapshot.ts';

/** Lays a snapshot out, a row a chapter and a row a recipe, so that reading one recipe loads one. */
export async function bindSnapshot(db: Knex, editionId: string, snapshot: Snapshot, firstPosition = 1): Promise<void> {
  await insertBound(db, toBoundRows(editionId, snapshot, firstPosition));
}

/** The rows of a snapshot; also what a galley is read from, without being kept. */
export function toBoundRows(
  editionId: string,
  snapshot: Snapshot,
  firstPosition = 1,
): { chapters: BoundChapterRow[]; recipes: BoundRecipeRow[] } {
  const plates = new Map(snapshot.plates.map((plate) => [plate.id, plate]));
  let position = firstPosition - 1;
  const chapters = snapshot.chapters.map((chapter, index) => ({
    edition_id: editionId,
    chapter_id: chapter.id,
    position: index + 1,
    title: chapter.title,
    introduction_html: chapter.introductionHtml,
    access: chapter.access,
  }));
  const recipes = snapshot.chapters.flatMap((chapter) =>
    chapter.recipes.map((recipe) => ({
      edition_id: editionId,
      recipe_id: recipe.recipeId,
      slug: recipe.slug,
      position: ++position,
      chapter_id: chapter.id,
      chapter_title: chapter.title,
      access: recipe.access,
      teaser: toTeaser(recipe, chapter.title, plates),
      recipe,
      plates: platesOf(recipe.document).flatMap((id) => plates.get(id) ?? []),
      title: recipe.document.title,
    })),
  );
  return { chapters, recipes };
}

/** What everyone past the age check may know of a recipe, and nothing else of it. */
function toTeaser(recipe: BoundRecipe, chapterTitle: string, plates: ReadonlyMap<string, BoundPlate>): BoundTeaser {
  const { document, figures } = recipe;
  return {
    recipeId: recipe.recipeId,
    slug: recipe.slug,
    title: document.title,
    kind: document.kind,
    chapterTitle,
    headnoteHtml: recipe.html.headnote,
    headnoteText: plainText(document.headnote),
    access: recipe.access,
    // What the figure rests on names lines and steps, which a teaser keeps back.
    totalTime: figures.times.total.known ? { ...figures.times.total, rests: [] } : { known: false, lacks: [] },
    yieldStated: document.yield.stated,
    servings: document.yield.servings,
    band: figures.band,
    allergens: figures.allergens.map(({ allergen }) => ({ allergen })),
    cautions: figures.cautions.map(({ caution }) => ({ caution })),
    allergensUnknown: figures.allergensUnknownFor.length > 0,
    leadPlate: (document.leadPlateId && plates.get(document.leadPlateId)) || null,
  };
}
