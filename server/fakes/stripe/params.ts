import qs from 'qs';
import { z } from 'zod';
import { faultOfIssue } from './errors.ts';

/** Form bodies and query strings arrive as strings; these read them back. */
export const text = z.string().min(1, 'must not be empty').max(5000, 'must be at most 5000 characters');
export const whole = z
  .string()
  .regex(/^-?\d{1,12}$/, 'must be an integer')
  .transform(Number);
export const count = z
  .string()
  .regex(/^\d{1,12}$/, 'must be a whole number')
  .transform(Number);
export const fraction = z
  .string()
  .regex(/^\d+(\.\d+)?$/, 'must be a number')
  .transform(Number);
export const flag = z.enum(['true', 'false'], 'must be true or false').transform((value) => value === 'true');
export const currency = z
  .string()
  .regex(/^[a-z]{3}$/i, 'must be a three-letter currency code')
  .toLowerCase();

/** A parameter that an empty string clears. */
export function emptyable<T extends z.ZodType>(schema: T) {
  return z.union([z.literal('').transform(() => null), schema]);
}

export const metadata = emptyable(z.record(z.string().max(40), z.string().max(500)));

export const range = z.union([
  whole.transform((value) => ({ gte: value, lte: value })),
  z.strictObject({ gt: whole.optional(), gte: whole.optional(), lt: whole.optional(), lte: whole.optional() }),
]);
export type Range = z.output<typeof range>;

/**
 * The parameters of one call. `P` is the SDK's own type of them, so that a name the SDK does not
 * know cannot be accepted; names it knows and the fake does not act out are refused like unknown ones.
 */
export function shape<P>() {
  return <S extends { [Key in keyof P]?: z.ZodType }>(fields: S & Record<Exclude<keyof S, keyof P>, never>) =>
    z.strictObject({ ...(fields as S), expand: z.array(text).optional() });
}

export const paging = {
  limit: count.refine((value) => value >= 1 && value <= 100, 'must be between 1 and 100').optional(),
  starting_after: text.optional(),
  ending_before: text.optional(),
};
export interface Paging {
  limit?: number | undefined;
  starting_after?: string | undefined;
  ending_before?: string | undefined;
}

/** Checks parameters, refusing the first thing wrong with them. */
export function check<T extends z.ZodType>(schema: T, input: unknown): z.output<T> {
  const result = schema.safeParse(input, { reportInput: true });
  if (!result.success) throw faultOfIssue(result.error.issues[0]!);
  return result.data;
}

/** Reads a form body or a query string, brackets and all. */
export function parseForm(body: string): unknown {
  return qs.parse(body, { depth: 20, arrayLimit: 1000, parameterLimit: 10_000 });
}

/** Metadata merges key by key; an empty value takes its key away, an empty whole takes all away. */
export function mergeMetadata(
  before: Record<string, string> | null,
  change: Record<string, string> | null | undefined,
): Record<string, string> {
  if (change === undefined) return before ?? {};
  if (change === null) return {};
  const merged = Object.entries({ ...before, ...change }).filter(([, value]) => value !== '');
  return Object.fromEntries(merged);
}

/** Leaves out what was not sent. */
export function given<T extends object>(values: T): { [Key in keyof T]?: Exclude<T[Key], undefined> } {
  return Object.fromEntries(Object.entries(values).filter(([, value]) => value !== undefined)) as {
    [Key in keyof T]?: Exclude<T[Key], undefined>;
  };
}
