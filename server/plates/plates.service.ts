import { readFile } from 'node:fs/promises';
import type { Knex } from 'knex';
import type { PlateUpload, PlateView, PlateWords, Rendition } from '../../shared/contracts/plates.ts';
import type { AppContext } from '../context.ts';
import { Refusal } from '../errors.ts';
import { FileAnswer } from '../http/file-answer.ts';
import { versionConflict } from '../http/http.errors.ts';
import { addJob } from '../jobs/queue.ts';
import { refreshRecipesLedBy } from '../recipes/derived.ts';
import { inspectPicture } from './inspect.ts';
import { plateInUse, plateNotFound, plateTooLarge } from './plates.errors.ts';
import { deletePlate, findAllPlates, findPlate, insertPlate, isPlateUsed, updatePlateWords } from './plates.queries.ts';
import type { PlateRow } from './plates.rows.ts';
import { findRendition, type RenditionName } from './rendition-address.ts';
import { MOST_BYTES } from './upload.ts';

interface Batch {
  files: readonly Express.Multer.File[];
  personId: string;
  shootId: string | null;
}

/** Keeps every picture of a batch that can be kept, and says by name why another one cannot. */
export async function keepPlates(ctx: AppContext, { files, personId, shootId }: Batch): Promise<PlateUpload> {
  const outcome: PlateUpload = { kept: [], refused: [] };
  for (const file of files) {
    const name = fileName(file);
    try {
      outcome.kept.push(await keepPlate(ctx, { file, name, personId, shootId }));
    } catch (error) {
      if (!(error instanceof Refusal)) throw error;
      const { code, message, details } = error;
      outcome.refused.push({ name, code, reason: details.detail ? `${message} (${details.detail})` : message });
    }
  }
  return outcome;
}

async function keepPlate(
  { db, files }: AppContext,
  {
    file,
    name,
    personId,
    shootId,
  }: { file: Express.Multer.File; name: string; personId: string; shootId: string | null },
): Promise<PlateView> {
  if (file.size > MOST_BYTES) throw plateTooLarge();
  const { width, height } = await inspectPicture(file.path);
  const originalHash = await files.keep(await readFile(file.path));
  return db.transaction(async (trx) => {
    const values = { original_hash: originalHash, original_name: name, width, height, created_by: personId };
    const row = await insertPlate(trx, { ...values, shoot_id: shootId });
    await addJob(trx, 'prepare-plate', { plateId: row.id }, { maxAttempts: 3, key: `plate:${row.id}` });
    return toPlateView(row);
  });
}

export async function listPlates(db: Knex, shootId?: string): Promise<PlateView[]> {
  return (await findAllPlates(db, shootId)).map(toPlateView);
}

export async function readPlate(db: Knex, id: string): Promise<PlateView> {
  const row = await findPlate(db, id);
  if (!row) throw plateNotFound();
  return toPlateView(row);
}

export async function savePlateWords(db: Knex, id: string, words: PlateWords, expected: number): Promise<PlateView> {
  const before = await readPlate(db, id);
  return db.transaction(async (trx) => {
    const row = await updatePlateWords(trx, { id, expected, values: words });
    if (!row) throw versionConflict({ context: { version: before.version } });
    await refreshRecipesLedBy(trx, id);
    return toPlateView(row);
  });
}

/** Takes a plate away that nothing shows; released editions keep theirs by content. */
export async function removePlate(db: Knex, id: string): Promise<void> {
  await readPlate(db, id);
  if (await isPlateUsed(db, id)) throw plateInUse();
  await deletePlate(db, id);
}

/** One size of a plate for staff. */
export async function readRendition({ db, files }: AppContext, id: string, name: RenditionName): Promise<FileAnswer> {
  const row = await findPlate(db, id);
  const rendition = row && findRendition(row.renditions, name);
  if (!rendition) throw plateNotFound();
  return toFileAnswer(files, rendition);
}

/** A rendition's bytes, streamed. */
export function toFileAnswer(files: AppContext['files'], { hash, format, bytes }: Rendition): FileAnswer {
  return new FileAnswer({ type: `image/${format}`, etag: hash, bytes, open: () => files.stream(hash) });
}

/** Multer reads names as Latin-1; browsers send UTF-8. */
function fileName({ originalname }: Express.Multer.File): string {
  return Buffer.from(originalname, 'latin1').toString('utf8').slice(0, 200);
}

function toPlateView(row: PlateRow): PlateView {
  const { id, version, alt, caption, credit, state, width, height, renditions } = row;
  return {
    id,
    version,
    alt,
    caption,
    credit,
    state,
    width,
    height,
    renditions,
    originalName: row.original_name,
    shootId: row.shoot_id,
    createdAt: row.created_at.toISOString(),
  };
}
