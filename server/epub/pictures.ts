import type { BoundPlate, Snapshot } from '../../shared/contracts/editions.ts';
import type { FileStore } from '../files/file-store.ts';
import { findRendition } from '../plates/rendition-address.ts';

/** A plate as it lies in the book. */
export interface BoundPicture {
  id: string;
  name: string;
  alt: string;
  caption: string;
  credit: string;
  bytes: Uint8Array;
}

/** The plates of a snapshot as JPEG of middle size, by plate id. */
export async function bindPictures(
  snapshot: Snapshot,
  files: FileStore,
  onPlate: (done: number, all: number) => Promise<void> = async () => undefined,
): Promise<Map<string, BoundPicture>> {
  const pictures = new Map<string, BoundPicture>();
  for (const [index, plate] of snapshot.plates.entries()) {
    const picture = await bindPicture(plate, files);
    if (picture) pictures.set(plate.id, picture);
    await onPlate(index + 1, snapshot.plates.length);
  }
  return pictures;
}

async function bindPicture(plate: BoundPlate, files: FileStore): Promise<BoundPicture | null> {
  const rendition = findRendition(plate.renditions, { size: 'medium', format: 'jpeg' });
  if (!rendition) return null;
  const { id, alt, caption, credit } = plate;
  return { id, alt, caption, credit, name: `plates/${id}.jpg`, bytes: await files.read(rendition.hash) };
}
