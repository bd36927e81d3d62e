import { open } from 'node:fs/promises';
import sharp from 'sharp';
import { notAPicture, plateEmpty, plateUnreadable, tooManyPixels, unsupportedFormat } from './plates.errors.ts';

export const MOST_PIXELS = 100_000_000;
const FORMATS = new Set(['jpeg', 'png', 'webp', 'tiff', 'heif']);

/** Size of a picture as it will be seen, its orientation applied. */
export interface Inspected {
  width: number;
  height: number;
}

/**
 * Finds out by its content what a file is; name and declared type count for nothing. Refuses what is empty, no
 * picture, of a kind that cannot be decoded here, damaged, or has more than 100 megapixels, before decoding a pixel.
 */
export async function inspectPicture(path: string): Promise<Inspected> {
  const head = await readHead(path);
  if (head.length === 0) throw plateEmpty();
  if (isHeic(head)) throw unsupportedFormat({ detail: 'HEIC pictures cannot be decoded here.' });
  const metadata = await sharp(path, { limitInputPixels: false })
    .metadata()
    .catch((error: unknown) => {
      throw looksLikePicture(head) ? plateUnreadable({}, error) : notAPicture({}, error);
    });
  const { format, width, height, orientation = 1 } = metadata;
  if (!FORMATS.has(format) || (format === 'heif' && metadata.compression !== 'av1'))
    throw unsupportedFormat({ detail: format });
  if (width * height > MOST_PIXELS)
    throw tooManyPixels({ detail: `${Math.round(width / 1000) * Math.round(height / 1000)} megapixels` });
  return orientation >= 5 ? { width: height, height: width } : { width, height };
}

async function readHead(path: string): Promise<Buffer> {
  const file = await open(path);
  try {
    const { buffer, bytesRead } = await file.read(Buffer.alloc(32), 0, 32, 0);
    return buffer.subarray(0, bytesRead);
  } finally {
    await file.close();
  }
}

/** ISO base media with a brand of HEVC pictures (ISO/IEC 23008-12). */
function isHeic(head: Buffer): boolean {
  return (
    head.toString('latin1', 4, 8) === 'ftyp' && /^(heic|heix|heim|heis|hevc|hevx)/.test(head.toString('latin1', 8, 12))
  );
}

/** The signatures of JPEG, PNG, WebP, TIFF and AVIF files. */
function looksLikePicture(head: Buffer): boolean {
  const text = head.toString('latin1');
  return (
    text.startsWith('\xff\xd8\xff') ||
    text.startsWith('\x89PNG\r\n') ||
    (text.startsWith('RIFF') && text.slice(8, 12) === 'WEBP') ||
    text.startsWith('II*\0') ||
    text.startsWith('MM\0*') ||
    /^....ftypav/s.test(text)
  );
}
