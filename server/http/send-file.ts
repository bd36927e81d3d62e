import { pipeline } from 'node:stream/promises';
import type { Request, Response } from 'express';
import type { FileAnswer } from './file-answer.ts';

/** Streams bytes; a browser may keep them but must ask each time, so a gate that has closed holds at once. */
export async function sendFile(file: FileAnswer, request: Request, response: Response): Promise<void> {
  response.set({
    'Content-Type': file.type,
    'Cache-Control': 'private, no-cache',
    ETag: `"${file.etag}"`,
    Vary: 'Cookie',
    'X-Content-Type-Options': 'nosniff',
  });
  if (file.downloadName) response.attachment(file.downloadName);
  if (request.get('if-none-match') === `"${file.etag}"`) {
    response.status(304).end();
    return;
  }
  if (file.bytes !== null) response.set('Content-Length', String(file.bytes));
  const stream = await file.open();
  if (request.method === 'HEAD') {
    stream.destroy();
    response.end();
    return;
  }
  await pipeline(stream, response).catch((error: unknown) => {
    // The reader went away; there is nobody left to tell.
    if (!response.destroyed && !response.headersSent) throw error;
  });
}
