import { z } from 'zod';
import { access, ownAccess } from './access.ts';
import { id, line, slug, version } from './primitives.ts';
import { recipeKind, recipeState } from './words.ts';

export const bookDraft = z.strictObject({
  title: line(160),
  subtitle: z.string().trim().max(300),
  slug,
  access,
  coverPlateId: id.nullable(),
});
export type BookDraft = z.infer<typeof bookDraft>;

export const bookRow = bookDraft.extend({
  id,
  version,
  chapterCount: z.int(),
  recipeCount: z.int(),
  latestEdition: z.int().nullable(),
});
export const bookList = z.object({ books: z.array(bookRow) });
export type BookRow = z.infer<typeof bookRow>;

export const chapterDraft = z.strictObject({
  title: line(160),
  /** Markdown. */
  introduction: z.string().max(40_000),
  access: ownAccess,
});
export type ChapterDraft = z.infer<typeof chapterDraft>;

/** A recipe's place in the running order. */
export const placedRecipe = z.object({
  recipeId: id,
  slug,
  title: z.string(),
  kind: recipeKind,
  state: recipeState,
  missing: z.array(z.string()),
  access: ownAccess,
});
export type PlacedRecipe = z.infer<typeof placedRecipe>;

export const chapterView = chapterDraft.extend({
  id,
  version,
  introductionHtml: z.string(),
  recipes: z.array(placedRecipe),
});
export type ChapterView = z.infer<typeof chapterView>;

/** The bindery's view of a book: chapters and recipes in running order. `version` guards the order. */
export const bookView = bookDraft.extend({ id, version, chapters: z.array(chapterView) });
export type BookView = z.infer<typeof bookView>;

/** The whole running order at once: every chapter and every placed recipe exactly once. */
export const runningOrder = z.strictObject({
  chapters: z.array(z.strictObject({ id, recipes: z.array(id).max(500) })).max(100),
});
export type RunningOrder = z.infer<typeof runningOrder>;

export const placeRecipe = z.strictObject({ recipeId: id });
export const placementAccess = z.strictObject({ access: ownAccess });
