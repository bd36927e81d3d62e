import { z } from 'zod';

/** The roles a person can hold beside being a reader; several at once are possible. */
export const ROLES = ['creator', 'editor', 'admin'] as const;
export const role = z.enum(ROLES);
export type Role = z.infer<typeof role>;

/** What a recipe is. Trade words. */
export const RECIPE_KINDS = [
  'drink',
  'syrup',
  'cordial',
  'shrub',
  'infusion',
  'liqueur',
  'bitters',
  'garnish',
  'ice',
  'technique',
] as const;
export const recipeKind = z.enum(RECIPE_KINDS);
export type RecipeKind = z.infer<typeof recipeKind>;

/** The path of a working copy, in order; `withdrawn` stands beside it. */
export const RECIPE_STATES = ['draft', 'on-trial', 'with-editor', 'cleared', 'out', 'withdrawn'] as const;
export const recipeState = z.enum(RECIPE_STATES);
export type RecipeState = z.infer<typeof recipeState>;

/**
 * Units a line may carry. `floz`, `pint`, `quart`, `gill`, `gal` are US customary; the `imp-` ones are imperial.
 * Spoons, cups and `oz` are US customary and avoirdupois. Dash, drop, barspoon, pinch and splash are common practice.
 */
export const UNITS = [
  'ml',
  'cl',
  'l',
  'g',
  'kg',
  'oz',
  'lb',
  'floz',
  'tsp',
  'tbsp',
  'cup',
  'pint',
  'quart',
  'gill',
  'imp-floz',
  'imp-pint',
  'imp-quart',
  'imp-gill',
  'dash',
  'drop',
  'barspoon',
  'pinch',
  'splash',
  'piece',
  'part',
  'leaf',
  'sprig',
  'handful',
  'slice',
  'twist',
  'strip',
  'stick',
  'pod',
  'drink',
  'bottle',
] as const;
export const unit = z.enum(UNITS);
export type Unit = z.infer<typeof unit>;

/** The 14 allergens of Regulation (EU) 1169/2011, Annex II. */
export const ALLERGENS = [
  'gluten',
  'crustaceans',
  'egg',
  'fish',
  'peanuts',
  'soya',
  'milk',
  'nuts',
  'celery',
  'mustard',
  'sesame',
  'sulphites',
  'lupin',
  'molluscs',
] as const;
export const allergen = z.enum(ALLERGENS);
export type Allergen = z.infer<typeof allergen>;

/** Cautions the product knows how to word. */
export const CAUTIONS = [
  'spirit-near-heat',
  'hot-sugar',
  'raw-egg',
  'fresh-keeping',
  'sealed-gas-pressure',
  'vacuum-bag',
  'dry-ice',
  'liquid-nitrogen',
  'harmful-botanical',
  'home-distilling',
  'grapefruit-medicines',
] as const;
export const caution = z.enum(CAUTIONS);
export type Caution = z.infer<typeof caution>;
