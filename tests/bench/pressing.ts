import { pino } from 'pino';
import sharp from 'sharp';
import { ZipFile } from 'yazl';
import { openDatabase } from '../../server/db/connection.ts';
import { pressEdition } from '../../server/editions/press.job.ts';
import { startPressing } from '../../server/editions/editions.service.ts';
import { openFileStore, type FileStore } from '../../server/files/file-store.ts';
import type { House, Row } from './run.ts';

/** Pressing the demonstration's book, against encoding the same plates and zipping them. */
export async function* benchPressing({ databaseUrl, dataDir }: House): AsyncGenerator<Row> {
  const db = openDatabase(databaseUrl);
  try {
    const files = openFileStore(dataDir);
    const book = (await db('books').first('id'))!;
    const editor = (await db('people').where({ email: 'editor@demo.example' }).first('id'))!;
    const originals: string[] = await db('plates').orderBy('id').pluck('original_hash');
    const floor = await seconds(() => encodeAndZip(files, originals));

    // The house's own worker must not take the job away: its key is claimed here at once.
    const ctx = { db, files, now: () => new Date(), log: pino({ level: 'silent' }) };
    let id = '';
    await db.transaction(async (trx) => {
      ({ id } = await startPressing({ ...ctx, db: trx }, book.id, editor.id));
      await trx.raw('select graphile_worker.remove_job(?)', [`press:${id}`]);
    });
    const ours = await seconds(() => pressEdition(ctx, { editionId: id }, { last: true }));
    const ratio = ours / floor;
    yield {
      name: 'pressing, against encoding and zipping the same plates',
      value: Math.round(ratio * 1000) / 1000,
      unit: 'ratio',
      goal: '<= 1.3',
      met: ratio <= 1.3,
      detail: { plates: originals.length, secondsOurs: round(ours), secondsEncodingAndZipping: round(floor) },
    };
  } finally {
    await db.destroy();
  }
}

async function encodeAndZip(files: FileStore, originals: readonly string[]): Promise<void> {
  const zip = new ZipFile();
  for (const [index, hash] of originals.entries()) {
    const picture = sharp(await files.read(hash))
      .rotate()
      .resize({ width: 1080, withoutEnlargement: true });
    zip.addBuffer(await picture.jpeg({ quality: 80, progressive: true }).toBuffer(), `${index}.jpg`, {
      compress: false,
    });
  }
  zip.end();
  for await (const chunk of zip.outputStream) void chunk;
}

async function seconds(work: () => Promise<unknown>): Promise<number> {
  const began = performance.now();
  await work();
  return (performance.now() - began) / 1000;
}

const round = (value: number) => Math.round(value * 100) / 100;
