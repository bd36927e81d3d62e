import { createHash } from 'node:crypto';
import { resolve } from 'node:path';
import type { Readable } from 'node:stream';
import { pathToFileURL } from 'node:url';
import { Disk } from 'flydrive';
import { FSDriver } from 'flydrive/drivers/fs';

/** Bytes by the SHA-256 of their content; the same content is kept once. */
export interface FileStore {
  /** Keeps the bytes and returns their name. */
  keep(bytes: Uint8Array): Promise<string>;
  has(hash: string): Promise<boolean>;
  read(hash: string): Promise<Uint8Array>;
  stream(hash: string): Promise<Readable>;
}

/** Opens the store in a folder of this machine. */
export function openFileStore(dataDir: string): FileStore {
  const disk = new Disk(
    new FSDriver({ location: pathToFileURL(resolve(dataDir, 'files') + '/'), visibility: 'private' }),
  );
  return {
    async keep(bytes) {
      const hash = sha256(bytes);
      if (!(await disk.exists(keyOf(hash)))) {
        // Written aside and moved, so that a process killed on the way leaves no half file under a good name.
        const aside = `incoming/${hash}-${process.pid}-${Math.random().toString(36).slice(2)}`;
        await disk.put(aside, bytes);
        await disk.move(aside, keyOf(hash));
      }
      return hash;
    },
    has: (hash) => disk.exists(keyOf(hash)),
    read: (hash) => disk.getBytes(keyOf(hash)),
    stream: (hash) => disk.getStream(keyOf(hash)),
  };
}

/** SHA-256 in lower case hexadecimal. */
export function sha256(content: Uint8Array | string): string {
  return createHash('sha256').update(content).digest('hex');
}

function keyOf(hash: string): string {
  return `${hash.slice(0, 2)}/${hash.slice(2)}`;
}
