import { z } from 'zod';
import { range, temperatureRange } from './primitives.ts';
import { KEEPING_PLACES, operation } from './recipe-document.ts';
import { allergen, recipeKind, unit } from './words.ts';

/** Where something was said: the cue's number from 0, its start in milliseconds (null without times), the words themselves. */
const said = { cue: z.int().min(0), at: z.number().nullable(), words: z.string() };
/** From 0 to 1: how sure the reader is. */
const confidence = z.number().min(0).max(1);

export const draftIngredient = z.object({
  ...said,
  name: z.string(),
  amount: range.nullable(),
  unit: unit.nullable(),
  optional: z.boolean(),
  /** Where the amount that holds begins, when it was said elsewhere or corrected. */
  amountAt: z.number().nullable(),
  prep: z.string(),
  larderId: z.string().nullable(),
  confidence,
});
export type DraftIngredient = z.infer<typeof draftIngredient>;

export const draftStep = z.object({
  ...said,
  text: z.string(),
  durationSec: range.nullable(),
  temperatureC: temperatureRange.nullable(),
  /** Waiting, not hands-on. */
  passive: z.boolean(),
  operation: operation.nullable(),
  /** Numbers of the ingredients that the words name. */
  uses: z.array(z.int()),
  confidence,
});
export type DraftStep = z.infer<typeof draftStep>;

export const draftGap = z.object({
  kind: z.enum(['amount', 'duration', 'yield', 'keeping']),
  /** What it is about: an ingredient, the words of a step. */
  subject: z.string(),
  cue: z.int().min(0).nullable(),
  at: z.number().nullable(),
  /** The question in words. */
  message: z.string(),
});
export type DraftGap = z.infer<typeof draftGap>;

/** What a careful reader makes of a shoot's notes; every item knows its cue and its words. */
export const draft = z.object({
  title: z.string(),
  kind: recipeKind,
  ingredients: z.array(draftIngredient),
  steps: z.array(draftStep),
  equipment: z.array(z.string()),
  yields: z.array(z.object({ ...said, amount: range, unit, confidence })),
  storage: z.array(
    z.object({
      ...said,
      days: range.nullable(),
      temperatureC: temperatureRange.nullable(),
      where: z.enum(KEEPING_PLACES),
      confidence,
    }),
  ),
  allergens: z.array(allergen),
  gaps: z.array(draftGap),
  asides: z.array(z.object({ ...said, name: z.string() })),
});
export type Draft = z.infer<typeof draft>;
