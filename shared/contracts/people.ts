import { z } from 'zod';
import { id, instant, line, version } from './primitives.ts';
import { email, password } from './session.ts';
import { role } from './words.ts';

const token = z.string().min(20).max(200);

export const registration = z.strictObject({ name: line(120), email, password });
export type Registration = z.infer<typeof registration>;
export const tokenOnly = z.strictObject({ token });
export const emailOnly = z.strictObject({ email });
export const passwordReset = z.strictObject({ token, password });
export const passwordChange = z.strictObject({ current: z.string().max(200), password });
export const emailChange = z.strictObject({ email, password: z.string().max(200) });
export const nameChange = z.strictObject({ name: line(120) });

/** One person as the office sees them. */
export const personRow = z.object({
  id,
  name: z.string(),
  email: z.string(),
  verified: z.boolean(),
  roles: z.array(role),
  tierName: z.string().nullable(),
  createdAt: instant,
  version,
});
export type PersonRow = z.infer<typeof personRow>;

export const personQuery = z.strictObject({
  find: z.string().trim().max(120).optional(),
  role: role.optional(),
  page: z.coerce.number().int().min(1).default(1),
});
export const personList = z.object({ people: z.array(personRow), total: z.int(), pageSize: z.int() });
export const rolesChange = z.strictObject({ roles: z.array(role).max(3) });
