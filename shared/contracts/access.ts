import { z } from 'zod';

/** Who may read an entry: everyone, an account whose e-mail is verified, or members from a tier's rank upwards. */
export const access = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('open') }),
  z.strictObject({ kind: z.literal('account') }),
  z.strictObject({ kind: z.literal('tier'), rank: z.int().min(1).max(20) }),
]);
export type Access = z.infer<typeof access>;

/** An entry's own rule, or null where the chapter's or the book's holds. */
export const ownAccess = access.nullable();
