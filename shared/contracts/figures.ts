import { z } from 'zod';
import { allergen, caution } from './words.ts';

/** How a figure came about; `estimated` ones carry a range. */
export const provenance = z.enum(['measured', 'stated', 'computed', 'estimated']);
export type Provenance = z.infer<typeof provenance>;

/** Why a figure is missing: a permanent code and the name of what it lacks (an ingredient, a step). */
export const lack = z.object({
  code: z.enum([
    'amount-missing',
    'unit-missing',
    'density-missing',
    'piece-weight-missing',
    'not-in-larder',
    'strength-missing',
    'sugar-missing',
    'yield-missing',
    'duration-missing',
    'component-missing',
    'loss-unknown',
    'keeping-missing',
    'step-cycle',
    'component-cycle',
  ]),
  subject: z.string(),
});
export type Lack = z.infer<typeof lack>;

/** A number with its range, how it came about, and what is missing when it is not known. */
export const figure = z.discriminatedUnion('known', [
  z.object({
    known: z.literal(true),
    min: z.number(),
    max: z.number(),
    how: provenance,
    /** What was assumed on the way, e.g. the value of a dash: a code, or `code:value` (see the engine's `rests`). */
    rests: z.array(z.string()),
  }),
  z.object({ known: z.literal(false), lacks: z.array(lack) }),
]);
export type Figure = z.infer<typeof figure>;

export const allergenFound = z.object({ allergen, from: z.array(z.string()) });
export type AllergenFound = z.infer<typeof allergenFound>;
export const cautionFound = z.object({ caution, from: z.array(z.string()) });
export type CautionFound = z.infer<typeof cautionFound>;

export const STRENGTH_BANDS = ['none', 'light', 'medium', 'strong', 'very-strong'] as const;
export const strengthBand = z.enum(STRENGTH_BANDS);
export type StrengthBand = z.infer<typeof strengthBand>;

/** What the engine says of a recipe. Volumes in ml at 20 °C, strength in % vol, sugar in g/L, times in seconds. */
export const figures = z.object({
  yieldMl: figure,
  strength: figure,
  band: strengthBand.nullable(),
  sugar: figure,
  times: z.object({ handsOn: figure, waiting: figure, total: figure }),
  allergens: z.array(allergenFound),
  cautions: z.array(cautionFound),
  /** Names of lines whose allergens are not known, because nothing in the larder stands behind them. */
  allergensUnknownFor: z.array(z.string()),
});
export type Figures = z.infer<typeof figures>;
