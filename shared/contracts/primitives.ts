import { z } from 'zod';

/** A path segment: lower case letters, digits and single hyphens. */
export const slug = z
  .string()
  .max(120)
  .regex(/^[a-z0-9]+(?:-[a-z0-9]+)*$/, 'Use lower case letters, digits and hyphens.');

export const id = z.uuid();

/** An instant in UTC, ISO 8601. */
export const instant = z.iso.datetime({ offset: true });

/** A calendar date, ISO 8601. */
export const date = z.iso.date();

/** A whole number of minor units of the imprint's currency (pence, cents). */
export const minorUnits = z.int().min(0).max(99_999_999);

/** A closed interval; one value is written twice. */
export const range = z
  .strictObject({ min: z.number().nonnegative(), max: z.number().nonnegative() })
  .refine((value) => value.min <= value.max, { message: 'The lower value comes first.', path: ['max'] });
export type Range = z.infer<typeof range>;

/** A temperature range in degrees Celsius. */
export const temperatureRange = z
  .strictObject({ min: z.number().min(-200).max(300), max: z.number().min(-200).max(300) })
  .refine((value) => value.min <= value.max, { message: 'The lower value comes first.', path: ['max'] });
export type TemperatureRange = z.infer<typeof temperatureRange>;

/** SHA-256 in lower case hexadecimal. */
export const sha256 = z.string().regex(/^[0-9a-f]{64}$/);

/** The number that an `ETag` carries for what two people may edit. */
export const version = z.int().min(1);

/** An answer that only says that it was done. */
export const done = z.object({ done: z.literal(true) });
export const DONE = { done: true } as const;

/** Text of one line, trimmed. */
export const line = (max: number) => z.string().trim().min(1, 'This must not be empty.').max(max);
