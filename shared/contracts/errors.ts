import { z } from 'zod';

/** Permanent codes of every refusal. A code never changes its meaning; the sentence beside it may. */
export const ERROR_CODES = [
  'request.invalid',
  'request.not_found',
  'request.too_large',
  'request.unsupported_type',
  'request.foreign_origin',
  'request.precondition_required',
  'request.version_conflict',
  'request.limited',
  'server.failed',
  'server.unready',
  'access.sign_in',
  'access.role',
  'age.unconfirmed',
  'session.wrong_credentials',
  'people.email_taken',
  'people.token_invalid',
  'people.wrong_password',
  'people.not_found',
  'people.last_admin',
  'imprint.currency_in_use',
  'shoots.not_found',
  'shoots.notes_unreadable',
  'recipes.not_found',
  'recipes.cycle',
  'recipes.unknown_component',
  'recipes.unknown_larder_item',
  'recipes.transition_refused',
  'recipes.incomplete',
  'recipes.queries_open',
  'recipes.slug_taken',
  'queries.not_found',
  'queries.state_refused',
  'plates.not_found',
  'plates.in_use',
  'plates.empty',
  'plates.not_a_picture',
  'plates.unsupported_format',
  'plates.too_many_pixels',
  'plates.unreadable',
  'plates.too_large',
  'books.not_found',
  'books.slug_taken',
  'chapters.not_found',
  'chapters.recipe_placed',
  'chapters.order_stale',
  'editions.not_found',
  'editions.nothing_to_press',
  'editions.not_cleared',
  'editions.pressing_runs',
  'editions.not_pressed',
  'editions.already_issued',
  'reading.not_found',
  'reading.not_issued',
  'tiers.not_found',
  'tiers.rank_taken',
  'checkout.not_verified',
  'checkout.already_member',
  'checkout.tier_closed',
  'checkout.tier_waiting',
  'payments.unavailable',
  'payments.signature',
  'membership.none',
  'letters.local_only',
] as const;
export const errorCode = z.enum(ERROR_CODES);
export type ErrorCode = z.infer<typeof errorCode>;

/** A fault in the request, at the field it belongs to. */
export const fieldFault = z.object({ path: z.string(), message: z.string() });
export type FieldFault = z.infer<typeof fieldFault>;

/** Problem details (RFC 9457). */
export const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  code: errorCode,
  detail: z.string().optional(),
  instance: z.string().optional(),
  faults: z.array(fieldFault).optional(),
  /** What the sentence speaks of: names of a cycle, of files, of missing fields. */
  context: z.record(z.string(), z.unknown()).optional(),
});
export type Problem = z.infer<typeof problem>;
