import { readdir, readFile } from 'node:fs/promises';
import sharp from 'sharp';
import { openFileStore } from '../../server/files/file-store.ts';
import { inRoot } from '../../server/launch/paths.mjs';
import { makeRenditions } from '../../server/plates/renditions.ts';
import type { House, Row } from './run.ts';

const WIDTHS = [480, 1080, 2000];

/** The sizes of plates, against plain sharp doing the same encodes. */
export async function* benchPlates({ dataDir }: House): AsyncGenerator<Row> {
  const names = (await readdir(inRoot('content/plates'))).filter((name) => name.endsWith('.jpg')).slice(0, 6);
  const pictures = await Promise.all(names.map((name) => readFile(inRoot('content/plates', name))));
  const files = openFileStore(`${dataDir}/bench`);
  await plain(pictures[0]!);
  // Taken in turns, so that a busy moment of the machine hits both.
  let ours = 0;
  let floor = 0;
  for (const picture of pictures) {
    floor += await seconds(() => plain(picture));
    ours += await seconds(() => makeRenditions(picture, files));
  }
  const ratio = ours / floor;
  yield {
    name: 'plate derivatives, against plain sharp doing the same encodes',
    value: Math.round(ratio * 1000) / 1000,
    unit: 'ratio',
    goal: '<= 1.15',
    met: ratio <= 1.15,
    detail: { plates: pictures.length, secondsOurs: round(ours), secondsPlain: round(floor) },
  };
}

async function plain(picture: Buffer): Promise<void> {
  for (const width of WIDTHS) {
    const scaled = () => sharp(picture).rotate().resize({ width, withoutEnlargement: true });
    await scaled().avif({ quality: 55, effort: 1 }).toBuffer();
    await scaled().webp({ quality: 78, effort: 3 }).toBuffer();
    await scaled().jpeg({ quality: 80, progressive: true }).toBuffer();
  }
}

async function seconds(work: () => Promise<unknown>): Promise<number> {
  const began = performance.now();
  await work();
  return (performance.now() - began) / 1000;
}

const round = (value: number) => Math.round(value * 100) / 100;
