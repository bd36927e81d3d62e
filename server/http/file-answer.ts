import type { Readable } from 'node:stream';

/** Bytes as an answer. `etag` names the content; a reader's browser asks again each time, so a closed gate holds at once. */
export class FileAnswer {
  readonly type: string;
  readonly etag: string;
  readonly open: () => Promise<Readable>;
  readonly bytes: number | null;
  readonly downloadName: string | null;

  constructor(file: {
    type: string;
    etag: string;
    open: () => Promise<Readable>;
    bytes?: number | null;
    downloadName?: string;
  }) {
    this.type = file.type;
    this.etag = file.etag;
    this.open = file.open;
    this.bytes = file.bytes ?? null;
    this.downloadName = file.downloadName ?? null;
  }
}
