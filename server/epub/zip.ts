import { ZipFile } from 'yazl';

interface Entry {
  name: string;
  content: string | Uint8Array;
}

/** An OCF container: `mimetype` first and stored, everything else in the given order with one time. */
export async function zipDeterministically(mtime: Date, entries: readonly Entry[]): Promise<Uint8Array> {
  const zip = new ZipFile();
  const options = { mtime, mode: 0o100644, forceDosTimestamp: true };
  zip.addBuffer(Buffer.from('application/epub+zip'), 'mimetype', { ...options, compress: false });
  for (const { name, content } of entries)
    zip.addBuffer(Buffer.from(content), name, { ...options, compress: !name.endsWith('.jpg') });
  zip.end();
  const chunks: Buffer[] = [];
  for await (const chunk of zip.outputStream) chunks.push(chunk as Buffer);
  return Buffer.concat(chunks);
}
