import { z } from 'zod';
import { access } from './access.ts';
import { allergenFound, cautionFound, figures, figure, strengthBand } from './figures.ts';
import { id, instant, slug } from './primitives.ts';
import { picture } from './plates.ts';
import { keeping, recipeSection, recipeStep, recipeYield } from './recipe-document.ts';
import { recipeKind } from './words.ts';

/** Why an entry is closed to this reader, and what would open it. */
export const closedBecause = z.discriminatedUnion('why', [
  z.object({ why: z.literal('account') }),
  z.object({ why: z.literal('verify') }),
  z.object({ why: z.literal('tier'), rank: z.int(), tierName: z.string() }),
  z.object({ why: z.literal('date'), opensAt: instant }),
]);
export type ClosedBecause = z.infer<typeof closedBecause>;

/** What everyone past the age check may know of an entry; allergens and cautions are never kept back. */
const teaserFields = {
  recipeId: id,
  slug,
  title: z.string(),
  kind: recipeKind,
  chapterTitle: z.string(),
  headnoteHtml: z.string(),
  access,
  totalTime: figure,
  yieldStated: recipeYield.shape.stated,
  servings: z.number().nullable(),
  band: strengthBand.nullable(),
  allergens: z.array(allergenFound.pick({ allergen: true })),
  cautions: z.array(cautionFound.pick({ caution: true })),
  allergensUnknown: z.boolean(),
  plate: picture.nullable(),
};

export const recipeTeaser = z.object(teaserFields);
export type RecipeTeaser = z.infer<typeof recipeTeaser>;

/** One line as it is read: what the document says, cut of its source in the notes. */
const readLine = recipeSection.shape.lines.element.omit({ source: true }).strip();
const readSection = z.object({ id: z.string(), title: z.string(), lines: z.array(readLine) });
const readStep = recipeStep
  .omit({ source: true, text: true, plateId: true })
  .strip()
  .extend({ html: z.string(), plate: picture.nullable() });
/** A recipe to a reader: whole, or closed behind its teaser. */
export const readingView = z.discriminatedUnion('view', [
  z.object({
    view: z.literal('open'),
    ...teaserFields,
    book: z.object({ slug, title: z.string() }),
    edition: z.object({ kind: z.enum(['edition', 'leaf', 'galley']), number: z.int() }),
    method: z.string(),
    glass: z.string(),
    ice: z.string(),
    garnish: z.string(),
    yield: recipeYield,
    sections: z.array(readSection),
    steps: z.array(readStep),
    tipsHtml: z.string(),
    variationsHtml: z.string(),
    keeping: keeping.nullable(),
    figures,
    components: z.record(z.string(), z.object({ slug, title: z.string() })),
  }),
  z.object({
    view: z.literal('teaser'),
    ...teaserFields,
    book: z.object({ slug, title: z.string() }),
    closed: closedBecause,
  }),
]);
export type ReadingView = z.infer<typeof readingView>;
export type OpenRecipe = Extract<ReadingView, { view: 'open' }>;
export type ClosedRecipe = Extract<ReadingView, { view: 'teaser' }>;

const contentsEntry = recipeTeaser.omit({ chapterTitle: true, headnoteHtml: true }).extend({
  headnoteText: z.string(),
  open: z.boolean(),
});

/** The contents of a book as this reader sees them. */
export const bookContents = z.object({
  slug,
  title: z.string(),
  subtitle: z.string(),
  edition: z.object({ kind: z.enum(['edition', 'galley']), number: z.int(), issuedAt: instant.nullable() }),
  cover: picture.nullable(),
  chapters: z.array(
    z.object({
      id,
      title: z.string(),
      /** Empty where the chapter is closed to this reader. */
      introductionHtml: z.string(),
      recipes: z.array(contentsEntry),
    }),
  ),
  /** Whether this reader may download the whole book. */
  download: z.boolean(),
});
export type BookContents = z.infer<typeof bookContents>;

/** What the front door says of each issued book before the age check: no drink is named. */
export const shelf = z.object({
  books: z.array(
    z.object({
      slug,
      title: z.string(),
      subtitle: z.string(),
      edition: z.int(),
      recipeCount: z.int(),
      cover: picture.nullable(),
    }),
  ),
});
export type Shelf = z.infer<typeof shelf>;

/** Staff may ask to read as a visitor (0) or a member of a tier. */
export const readingQuery = z.strictObject({ as: z.coerce.number().int().min(0).max(20).optional() });
