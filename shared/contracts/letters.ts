import { z } from 'zod';

/** A letter caught by the demonstration's local mail catcher. */
export const caughtLetter = z.object({
  id: z.string(),
  at: z.string(),
  to: z.array(z.string()),
  subject: z.string(),
  text: z.string(),
  links: z.array(z.string()),
});
export type CaughtLetter = z.infer<typeof caughtLetter>;
export const caughtLetters = z.object({ letters: z.array(caughtLetter) });
