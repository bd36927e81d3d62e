import { z } from 'zod';
import { line, version } from './primitives.ts';

/** ISO 4217 codes offered to an imprint whose money has two minor digits. */
export const CURRENCIES = ['GBP', 'EUR', 'USD', 'CAD', 'AUD', 'NZD', 'CHF', 'SEK', 'NOK', 'DKK'] as const;
export const currency = z.enum(CURRENCIES);
export type Currency = z.infer<typeof currency>;

const timeZone = z.string().refine(
  (value) => {
    try {
      new Intl.DateTimeFormat('en', { timeZone: value });
      return true;
    } catch {
      return false;
    }
  },
  { message: 'This is not a time zone of the IANA database.' },
);

/** What an admin sets for the publishing house. */
export const imprintDraft = z.strictObject({
  name: line(120),
  currency,
  zone: timeZone,
  ageLimit: z.int().min(16).max(25),
  /** Days that a past-due membership still opens its tier. */
  graceDays: z.int().min(0).max(60),
  /** Markdown. */
  terms: z.string().max(100_000),
  /** Markdown. */
  privacy: z.string().max(100_000),
});
export type ImprintDraft = z.infer<typeof imprintDraft>;

/** The settings as the office sees them. */
export const imprintSettings = imprintDraft.extend({ version });
export type ImprintSettings = z.infer<typeof imprintSettings>;

/** What everyone may know of the house; terms and privacy as sanitised HTML. */
export const imprintPublic = z.object({
  name: z.string(),
  currency,
  zone: z.string(),
  ageLimit: z.int(),
  termsHtml: z.string(),
  privacyHtml: z.string(),
});
export type ImprintPublic = z.infer<typeof imprintPublic>;
