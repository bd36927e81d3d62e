import { z } from 'zod';
import { KEEPING_PLACES } from '../../shared/contracts/recipe-document.ts';
import { slug } from '../../shared/contracts/primitives.ts';
import { allergen, caution, recipeKind, recipeState, unit } from '../../shared/contracts/words.ts';
import {
  writtenAccess,
  writtenMeasure,
  writtenOperation,
  writtenRange,
  writtenScaling,
  writtenTime,
} from './written-values.ts';

/** Where in the shoot's notes it was said; `cue` from 0 is only a check on `at`. */
const said = { at: writtenTime.optional(), cue: z.int().min(0).optional() };

const writtenLine = z.strictObject({
  amount: writtenRange.optional(),
  unit: unit.optional(),
  name: z.string(),
  larder: z.string().optional(),
  component: slug.optional(),
  prep: z.string().default(''),
  note: z.string().default(''),
  optional: z.boolean().default(false),
  scaling: writtenScaling.default({ rule: 'linear' }),
  ...said,
});
export type WrittenLine = z.output<typeof writtenLine>;

const writtenStep = z.strictObject({
  text: z.string(),
  /** Numbers of lines from 1 through all sections, or words of their names. */
  uses: z.array(z.union([z.int().min(1), z.string()])).default([]),
  operation: writtenOperation.optional(),
  seconds: writtenRange.optional(),
  minutes: writtenRange.optional(),
  hours: writtenRange.optional(),
  days: writtenRange.optional(),
  attention: z.enum(['hands-on', 'waiting']).default('hands-on'),
  temperature: writtenRange.optional(),
  tools: z.array(z.string()).default([]),
  /** Numbers of steps from 1; without it a step follows the one before. */
  after: z.array(z.int().min(1)).optional(),
  ...said,
});
export type WrittenStep = z.output<typeof writtenStep>;

/** The front matter of a recipe: the recipe document in the short form that a hand can write. */
export const writtenRecipe = z.strictObject({
  title: z.string(),
  kind: recipeKind,
  method: z.string().default(''),
  glass: z.string().default(''),
  ice: z.string().default(''),
  garnish: z.string().default(''),
  tags: z.array(z.string()).default([]),
  plate: z.string().optional(),
  access: writtenAccess.optional(),
  state: recipeState,
  shoot: slug.optional(),
  queries: z.array(z.string()).default([]),
  yield: z.strictObject({
    stated: writtenMeasure.optional(),
    measured: writtenMeasure.optional(),
    servings: z.number().positive().optional(),
    servingSize: writtenMeasure.optional(),
  }),
  sections: z.array(z.strictObject({ title: z.string(), lines: z.array(writtenLine) })),
  steps: z.array(writtenStep),
  keeping: z
    .strictObject({
      place: z.enum(KEEPING_PLACES),
      days: writtenRange.optional(),
      temperature: writtenRange.optional(),
      basis: z.enum(['stated', 'guidance']),
      note: z.string().default(''),
    })
    .optional(),
  extraAllergens: z.array(allergen).default([]),
  extraCautions: z.array(caution).default([]),
});
export type WrittenRecipe = z.output<typeof writtenRecipe>;
