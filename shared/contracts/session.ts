import { z } from 'zod';
import { currency } from './imprint.ts';
import { id } from './primitives.ts';
import { role } from './words.ts';

export const password = z.string().min(10, 'Use at least 10 characters.').max(200);
export const email = z.email('This is not an e-mail address.').max(254).trim().toLowerCase();

export const credentials = z.strictObject({ email, password: z.string().min(1).max(200) });
export type Credentials = z.infer<typeof credentials>;

export const sessionUser = z.object({
  id,
  email: z.string(),
  name: z.string(),
  roles: z.array(role),
  verified: z.boolean(),
});
export type SessionUser = z.infer<typeof sessionUser>;

/** Who is at the screen and what the whole page frame needs to know. */
export const sessionView = z.object({
  user: sessionUser.nullable(),
  /** The tier that is open to this person now, by its rank and name; null for none. */
  tier: z.object({ rank: z.int(), name: z.string() }).nullable(),
  ageConfirmed: z.boolean(),
  demo: z.boolean(),
  imprint: z.object({ name: z.string(), currency, zone: z.string(), ageLimit: z.int() }),
});
export type SessionView = z.infer<typeof sessionView>;

export const ageAnswer = z.strictObject({ oldEnough: z.literal(true, 'Only adults may read on.') });

/** An account of the demonstration, offered on the sign-in page in demo mode only. */
export const demoAccounts = z.object({
  password: z.string(),
  accounts: z.array(
    z.object({ email: z.string(), part: z.enum(['admin', 'editor', 'creator', 'member', 'clothbound', 'reader']) }),
  ),
});
export type DemoAccounts = z.infer<typeof demoAccounts>;
