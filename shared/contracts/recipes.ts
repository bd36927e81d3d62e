import { z } from 'zod';
import { figures } from './figures.ts';
import { id, instant, line, slug, version } from './primitives.ts';
import { recipeDocument } from './recipe-document.ts';
import { recipeKind, recipeState } from './words.ts';

export const recipeQuery = z.strictObject({
  kind: recipeKind.optional(),
  state: recipeState.optional(),
  find: z.string().trim().max(120).optional(),
});

/** What a recipe must have before it can be cleared. */
export const MISSING_CODES = [
  'title',
  'headnote',
  'lines',
  'amounts',
  'steps',
  'yield',
  'keeping',
  'lead-plate',
  'lead-plate-alt',
] as const;
export const missingCode = z.enum(MISSING_CODES);
export type MissingCode = z.infer<typeof missingCode>;

export const recipeRow = z.object({
  id,
  slug,
  title: z.string(),
  kind: recipeKind,
  state: recipeState,
  revision: z.int(),
  version,
  /** Required fields that are still missing, by code. */
  missing: z.array(missingCode),
  openQueries: z.int(),
  updatedAt: instant,
});
export type RecipeRow = z.infer<typeof recipeRow>;
export const recipeList = z.object({ recipes: z.array(recipeRow), total: z.int() });

/** A new working copy: blank, from a shoot's notes, or as a copy of another recipe. */
export const recipeStart = z.discriminatedUnion('from', [
  z.strictObject({ from: z.literal('blank'), title: line(160), kind: recipeKind }),
  z.strictObject({ from: z.literal('shoot'), shootId: id, document: recipeDocument }),
  z.strictObject({ from: z.literal('copy'), recipeId: id }),
]);
export type RecipeStart = z.infer<typeof recipeStart>;

/** The working copy as staff edit it. `version` is what `If-Match` must carry. */
export const recipeView = z.object({
  id,
  slug,
  state: recipeState,
  version,
  revision: z.int(),
  document: recipeDocument,
  figures,
  missing: z.array(missingCode),
  shoot: z.object({ id, title: z.string() }).nullable(),
  /** What this person may do next. */
  transitions: z.array(recipeState),
  updatedAt: instant,
  updatedBy: z.string(),
});
export type RecipeView = z.infer<typeof recipeView>;

/** The whole document replaces the working copy and becomes the next revision. */
export const recipeSave = z.strictObject({ document: recipeDocument, note: z.string().trim().max(300).default('') });
export type RecipeSave = z.infer<typeof recipeSave>;

export const recipeMove = z.strictObject({ to: recipeState });

export const revisionRow = z.object({ number: z.int(), note: z.string(), savedBy: z.string(), savedAt: instant });
export type RevisionRow = z.infer<typeof revisionRow>;
export const revisionList = z.object({ revisions: z.array(revisionRow) });
export const revisionView = revisionRow.extend({ document: recipeDocument });

export const QUERY_STATES = ['open', 'answered', 'closed'] as const;
export const recipeQueryRow = z.object({
  id,
  state: z.enum(QUERY_STATES),
  question: z.string(),
  askedBy: z.string(),
  askedAt: instant,
  answer: z.string().nullable(),
  answeredBy: z.string().nullable(),
  answeredAt: instant.nullable(),
});
export type RecipeQueryRow = z.infer<typeof recipeQueryRow>;
export const recipeQueryList = z.object({ queries: z.array(recipeQueryRow) });
export const queryRaise = z.strictObject({ question: line(2000) });
export const queryAnswer = z.strictObject({ answer: line(2000) });
