import { z } from 'zod';
import { allergen, caution } from './words.ts';

const sourced = <T extends z.ZodType>(value: T) => z.object({ value, source: z.string().min(1) });

/**
 * One entry of the ingredient catalogue; every number carries its source ("common practice" and "estimate" are sources too).
 * `density` in g/ml at 20 °C (bulk density for dry matter), `strength` in % vol, `sugar` in g per 100 g, `acid` in g per 100 ml,
 * `pieceWeight` in g, `water` in g per 100 g: for what gives up its juice.
 */
export const larderItem = z.object({
  id: z.string().regex(/^[a-z0-9]+(?:-[a-z0-9]+)*$/),
  name: z.string().min(1),
  otherNames: z.array(z.string()),
  nature: z.enum([
    'spirit',
    'wine',
    'liqueur',
    'bitters',
    'juice',
    'water',
    'sugar',
    'syrup',
    'acid',
    'dairy',
    'egg',
    'solid',
    'other',
  ]),
  density: sourced(z.number().positive()).nullable(),
  strength: sourced(z.number().min(0).max(100)).nullable(),
  sugar: sourced(z.number().min(0).max(100)).nullable(),
  acid: sourced(z.number().min(0).max(100)).nullable(),
  water: sourced(z.number().min(0).max(100)).nullable(),
  pieceWeight: sourced(z.number().positive()).nullable(),
  allergens: z.array(allergen),
  cautions: z.array(caution),
  /** False for what leaves the mixture when it is strained: peels, spices, leaves. */
  dissolves: z.boolean(),
});
export type LarderItem = z.infer<typeof larderItem>;
export const larderList = z.object({ items: z.array(larderItem) });
