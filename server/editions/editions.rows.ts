import type { z } from 'zod';
import type { Access } from '../../shared/contracts/access.ts';
import type { BoundPlate, BoundRecipe, EditionRow as EditionView, Snapshot } from '../../shared/contracts/editions.ts';
import type { recipeTeaser } from '../../shared/contracts/reading.ts';

export interface EditionRow {
  id: string;
  book_id: string;
  kind: EditionView['kind'];
  number: number;
  recipe_id: string | null;
  state: EditionView['state'];
  progress: number;
  stage: string;
  fault: string | null;
  snapshot: Snapshot | null;
  hash: string | null;
  recipe_count: number;
  opens: { rank: number; at: string }[];
  epub_hash: string | null;
  epub_bytes: number | null;
  pressed_by: string;
  started_at: Date;
  pressed_at: Date | null;
  issued_at: Date | null;
  issued_by: string | null;
}

export interface BoundChapterRow {
  edition_id: string;
  chapter_id: string;
  position: number;
  title: string;
  introduction_html: string;
  access: Access;
}

/** A teaser as it is kept: its plate still by content hash, its headnote also as plain words. */
export type BoundTeaser = Omit<z.output<typeof recipeTeaser>, 'plate'> & {
  headnoteText: string;
  leadPlate: BoundPlate | null;
};

export interface BoundRecipeRow {
  edition_id: string;
  recipe_id: string;
  slug: string;
  position: number;
  chapter_id: string;
  chapter_title: string;
  access: Access;
  teaser: BoundTeaser;
  recipe: BoundRecipe;
  plates: BoundPlate[];
  title: string;
}

declare module 'knex/types/tables.js' {
  interface Tables {
    editions: EditionRow;
    bound_chapters: BoundChapterRow;
    bound_recipes: BoundRecipeRow;
  }
}
