import multer from 'multer';

const MOST_BYTES = 10 * 1024 * 1024;

/** Takes one file, the field `notes`, into memory. */
export const takeNotes = multer({ limits: { files: 1, fileSize: MOST_BYTES } }).array('notes', 1);

/** Multer reads names as Latin-1; browsers send UTF-8. */
export function fileNameOf({ originalname }: Express.Multer.File): string {
  return Buffer.from(originalname, 'latin1').toString('utf8');
}
