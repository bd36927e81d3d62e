import { z } from 'zod';
import { id, instant, sha256, version } from './primitives.ts';

export const RENDITION_FORMATS = ['avif', 'webp', 'jpeg'] as const;

/** One size of a plate in one format. `size` names it in the address; widths in pixels. */
export const rendition = z.object({
  format: z.enum(RENDITION_FORMATS),
  size: z.enum(['small', 'medium', 'large']),
  width: z.int(),
  height: z.int(),
  bytes: z.int(),
  hash: sha256,
});
export type Rendition = z.infer<typeof rendition>;

export const plateWords = z.strictObject({
  alt: z.string().trim().max(400),
  caption: z.string().trim().max(400),
  credit: z.string().trim().max(200),
});
export type PlateWords = z.infer<typeof plateWords>;

export const PLATE_STATES = ['preparing', 'ready', 'failed'] as const;
export const plateView = plateWords.extend({
  id,
  version,
  state: z.enum(PLATE_STATES),
  originalName: z.string(),
  width: z.int(),
  height: z.int(),
  renditions: z.array(rendition),
  shootId: id.nullable(),
  createdAt: instant,
});
export type PlateView = z.infer<typeof plateView>;
export const plateList = z.object({ plates: z.array(plateView) });

/** The outcome for each file of a batch: kept, or refused with a permanent code. */
export const plateUpload = z.object({
  kept: z.array(plateView),
  refused: z.array(z.object({ name: z.string(), code: z.string(), reason: z.string() })),
});
export type PlateUpload = z.infer<typeof plateUpload>;

/** A picture as a reader's page shows it: addresses, never storage names. */
export const picture = z.object({
  alt: z.string(),
  caption: z.string(),
  credit: z.string(),
  width: z.int(),
  height: z.int(),
  sources: z.array(z.object({ format: z.enum(RENDITION_FORMATS), width: z.int(), href: z.string() })),
});
export type Picture = z.infer<typeof picture>;
