import { z } from 'zod';
import { draft } from './notes.ts';
import { date, id, instant, line, version } from './primitives.ts';
import { recipeDocument } from './recipe-document.ts';

const videoUrl = z
  .url({ protocol: /^https?$/, error: 'Give a web address that starts with https://' })
  .max(500)
  .nullable();

const shotOn = date.refine((day) => day >= '1900-01-01', 'Give the year in full.');

/** What a creator writes of a filming day. */
export const shootDraft = z.strictObject({ title: line(160), shotOn, videoUrl });
export type ShootDraft = z.infer<typeof shootDraft>;

export const NOTES_FORMATS = ['webvtt', 'subrip', 'timed-text', 'prose'] as const;
export const notesFormat = z.enum(NOTES_FORMATS);
export type NotesFormat = z.infer<typeof notesFormat>;

/** One timed line; `startMs` and `endMs` from the start of the video, null where the notes carry no times. */
export const shootCue = z.object({
  index: z.int().min(0),
  startMs: z.int().min(0).nullable(),
  endMs: z.int().min(0).nullable(),
  text: z.string(),
});
export type ShootCue = z.infer<typeof shootCue>;

export const shootRow = shootDraft.extend({
  id,
  version,
  cueCount: z.int(),
  recipeCount: z.int(),
  createdAt: instant,
});
export type ShootRow = z.infer<typeof shootRow>;
export const shootList = z.object({ shoots: z.array(shootRow) });

export const shootNotes = z.object({
  name: z.string(),
  format: notesFormat,
  cues: z.array(shootCue),
  warnings: z.array(z.string()),
});

export const shootView = shootDraft.extend({
  id,
  version,
  notes: shootNotes.nullable(),
  recipes: z.array(z.object({ id, title: z.string(), state: z.string() })),
});
export type ShootView = z.infer<typeof shootView>;

/** Notes pasted as text; a file travels as multipart with the field `notes`. */
export const notesPaste = z.strictObject({ text: z.string().min(1, 'Paste the notes first.').max(10_000_000) });

/** What the reader makes of a shoot's notes, and the recipe document that this would begin. */
export const shootReading = z.object({ draft, document: recipeDocument });
export type ShootReading = z.infer<typeof shootReading>;
