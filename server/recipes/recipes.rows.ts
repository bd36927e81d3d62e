import type { Figures } from '../../shared/contracts/figures.ts';
import type { MissingCode, RecipeQueryRow as RecipeQueryView } from '../../shared/contracts/recipes.ts';
import type { RecipeKind, RecipeState } from '../../shared/contracts/words.ts';

/** The working copy: what is asked of it in lists. Its text is the revision that `revision` numbers. */
export interface RecipeRow {
  id: string;
  slug: string;
  title: string;
  kind: RecipeKind;
  state: RecipeState;
  revision: number;
  figures: Figures;
  missing: MissingCode[];
  shoot_id: string | null;
  withdrawn_at: Date | null;
  version: number;
  created_at: Date;
  /** When its text was last saved. */
  updated_at: Date;
}

export interface RevisionRow {
  recipe_id: string;
  number: number;
  /** As it was stored: read it with `upgradeRecipeDocument`. */
  document: unknown;
  note: string;
  saved_by: string;
  saved_at: Date;
}

export interface RecipeComponentRow {
  recipe_id: string;
  component_id: string;
}

export interface RecipeQueryRow {
  id: string;
  recipe_id: string;
  state: RecipeQueryView['state'];
  question: string;
  asked_by: string;
  asked_at: Date;
  answer: string | null;
  answered_by: string | null;
  answered_at: Date | null;
}

declare module 'knex/types/tables.js' {
  interface Tables {
    recipes: RecipeRow;
    revisions: RevisionRow;
    recipe_components: RecipeComponentRow;
    recipe_queries: RecipeQueryRow;
  }
}
