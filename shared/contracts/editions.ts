import { z } from 'zod';
import { access } from './access.ts';
import { figures } from './figures.ts';
import { id, instant, sha256, slug } from './primitives.ts';
import { recipeDocument } from './recipe-document.ts';
import { rendition } from './plates.ts';

export const EDITION_STATES = ['pressing', 'pressed', 'failed', 'issued'] as const;
export const editionState = z.enum(EDITION_STATES);

/** A plate as bound: its words and the content hashes of its sizes. */
export const boundPlate = z.object({
  id,
  alt: z.string(),
  caption: z.string(),
  credit: z.string(),
  width: z.int(),
  height: z.int(),
  renditions: z.array(rendition),
});
export type BoundPlate = z.infer<typeof boundPlate>;

export const boundRecipe = z.object({
  recipeId: id,
  slug,
  revision: z.int(),
  /** The rule that holds here: its own, else the chapter's, else the book's. */
  access,
  document: recipeDocument,
  figures,
  /** Markdown texts of the document as sanitised HTML, so that reading renders nothing. */
  html: z.object({ headnote: z.string(), tips: z.string(), variations: z.string(), steps: z.array(z.string()) }),
  /** Components that stand in the same book, by recipe id, with their address there. */
  components: z.record(z.string(), z.object({ slug, title: z.string() })),
});
export type BoundRecipe = z.infer<typeof boundRecipe>;

export const boundChapter = z.object({
  id,
  title: z.string(),
  introductionHtml: z.string(),
  access,
  recipes: z.array(boundRecipe),
});

export const SNAPSHOT_SCHEMA = 1;

/**
 * Everything a released text consists of: an edition holds a whole book, a leaf one recipe in its chapter.
 * Immutable; its canonical form (RFC 8785) is hashed with SHA-256.
 */
export const snapshot = z.object({
  schema: z.literal(SNAPSHOT_SCHEMA),
  kind: z.enum(['edition', 'leaf']),
  imprint: z.object({ name: z.string(), ageLimit: z.int() }),
  book: z.object({ id, slug, title: z.string(), subtitle: z.string(), coverPlateId: id.nullable() }),
  number: z.int(),
  chapters: z.array(boundChapter),
  plates: z.array(boundPlate),
});
export type Snapshot = z.infer<typeof snapshot>;

export const editionRow = z.object({
  id,
  bookId: id,
  kind: z.enum(['edition', 'leaf']),
  number: z.int(),
  state: editionState,
  /** 0 to 100 while pressing. */
  progress: z.int(),
  stage: z.string(),
  fault: z.string().nullable(),
  hash: sha256.nullable(),
  recipeCount: z.int(),
  pressedBy: z.string(),
  startedAt: instant,
  pressedAt: instant.nullable(),
  issuedAt: instant.nullable(),
  issuedBy: z.string().nullable(),
});
export type EditionRow = z.infer<typeof editionRow>;
export const editionList = z.object({ editions: z.array(editionRow) });

/** When each tier may open what is issued, by rank; a rank that is not named opens at the time of issue. */
export const editionIssue = z.strictObject({
  opens: z
    .array(z.strictObject({ rank: z.int().min(0).max(20), at: instant }))
    .max(21)
    .default([]),
});
export const leafRelease = z.strictObject({ bookId: id });
