import type { Access } from '../../shared/contracts/access.ts';
import type { ImprintDraft } from '../../shared/contracts/imprint.ts';
import type { RecipeDocument } from '../../shared/contracts/recipe-document.ts';
import type { TierDraft } from '../../shared/contracts/tiers.ts';
import type { RecipeState } from '../../shared/contracts/words.ts';

/** The house of the demo; `country` is an ISO 3166-1 alpha-2 code. */
export type DemoImprint = ImprintDraft & { country: string };

export interface DemoBook {
  title: string;
  subtitle: string;
  slug: string;
  /** The one sentence of the front door. */
  description: string;
  access: Access;
  coverPlateFile: string;
  coverPlateId: string;
}

/** A chapter; `position` from 0 in the running order, `access` null where the book's holds. */
export interface DemoChapter {
  slug: string;
  title: string;
  introduction: string;
  access: Access | null;
  position: number;
}

export interface DemoRecipe {
  /** Derived from the slug, so that components in documents point at it. */
  id: string;
  slug: string;
  document: RecipeDocument;
  /** Its own rule, null where the chapter's or the book's holds. */
  access: Access | null;
  state: RecipeState;
  /** The chapter's slug, null for a recipe that stands in no book. */
  chapter: string | null;
  /** From 0 within the chapter. */
  position: number | null;
  plateFile: string | null;
  /** The slug of the shoot it was drafted from. */
  shoot: string | null;
  /** Questions the editor has raised and nobody has answered. */
  queries: string[];
}

export interface DemoShoot {
  slug: string;
  title: string;
  /** ISO 8601 calendar date. */
  date: string;
  videoUrl: string;
  notesName: string;
  notesText: string;
}

export interface DemoPlate {
  /** Derived from the file name, so that documents point at it. */
  id: string;
  file: string;
  /** Where the picture lies on disk. */
  path: string;
  alt: string;
  caption: string;
  credit: string;
}

/** Everything the demo is made of, read and checked. */
export interface DemoContent {
  imprint: DemoImprint;
  tiers: TierDraft[];
  book: DemoBook;
  chapters: DemoChapter[];
  recipes: DemoRecipe[];
  shoots: DemoShoot[];
  plates: DemoPlate[];
}
