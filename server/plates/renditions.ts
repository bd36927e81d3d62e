import sharp, { type Sharp } from 'sharp';
import type { Rendition } from '../../shared/contracts/plates.ts';
import type { FileStore } from '../files/file-store.ts';
import { MOST_PIXELS } from './inspect.ts';

const WIDTHS = { small: 480, medium: 1080, large: 2000 } as const;
type Size = keyof typeof WIDTHS;

/** How each format is encoded; AVIF at the effort that keeps a shoot's worth of stills within a coffee. */
const ENCODERS: Record<Rendition['format'], (picture: Sharp) => Sharp> = {
  avif: (picture) => picture.avif({ quality: 55, effort: 1 }),
  webp: (picture) => picture.webp({ quality: 78, effort: 3 }),
  jpeg: (picture) => picture.flatten({ background: '#ffffff' }).jpeg({ quality: 80, progressive: true }),
};

/**
 * Makes every size of a picture in every format: orientation applied, colours in sRGB, all metadata left behind,
 * never enlarged. The same picture always gives the same bytes.
 */
export async function makeRenditions(original: Uint8Array, files: FileStore): Promise<Rendition[]> {
  const renditions: Rendition[] = [];
  for (const size of Object.keys(WIDTHS) as Size[]) {
    const scaled = await scale(original, WIDTHS[size]);
    for (const [format, encode] of Object.entries(ENCODERS) as [Rendition['format'], (typeof ENCODERS)['avif']][]) {
      const bytes = await encode(sharp(scaled.data, { raw: scaled.info })).toBuffer();
      const { width, height } = scaled.info;
      renditions.push({ format, size, width, height, bytes: bytes.length, hash: await files.keep(bytes) });
    }
  }
  return renditions;
}

/** Decodes and scales once for all formats. */
async function scale(original: Uint8Array, width: number) {
  return sharp(original, { limitInputPixels: MOST_PIXELS, failOn: 'error', sequentialRead: true })
    .rotate()
    .resize({ width, withoutEnlargement: true })
    .toColourspace('srgb')
    .raw()
    .toBuffer({ resolveWithObject: true });
}
