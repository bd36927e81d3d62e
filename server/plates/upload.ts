import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import type { RequestHandler } from 'express';
import multer from 'multer';
import { requestTooLarge } from '../http/http.errors.ts';

/** The largest file that is kept, and the largest batch that is read at all. */
export const MOST_BYTES = 60 * 1024 * 1024;
const MOST_BATCH_BYTES = 600 * 1024 * 1024;
const MOST_FILES = 40;

/**
 * Takes the field `plates` to a folder of this request, which goes when the request has been answered. One file that
 * is too large is refused by name later, so that the rest of the batch is kept.
 */
export const takePlates: RequestHandler = async (request, response, next) => {
  if (Number(request.get('content-length') ?? Infinity) > MOST_BATCH_BYTES)
    throw requestTooLarge({ detail: 'Bring at most 600 MB at once.' });
  const folder = await mkdtemp(join(tmpdir(), 'plates-'));
  response.once('close', () => void rm(folder, { recursive: true, force: true }));
  const upload = multer({
    storage: multer.diskStorage({ destination: folder }),
    limits: { files: MOST_FILES, fields: 5 },
  });
  void upload.array('plates', MOST_FILES)(request, response, next);
};
