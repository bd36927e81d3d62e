import { readFile } from 'node:fs/promises';
import { basename } from 'node:path';
import type { Knex } from 'knex';
import type { Rendition } from '../../shared/contracts/plates.ts';
import type { FileStore } from '../../server/files/file-store.ts';
import { inspectPicture } from '../../server/plates/inspect.ts';
import { insertPlate } from '../../server/plates/plates.queries.ts';
import { makeRenditions } from '../../server/plates/renditions.ts';
import type { DemoPlate } from '../content/content.ts';

export interface PreparedPlate {
  plate: DemoPlate;
  originalHash: string;
  width: number;
  height: number;
  renditions: Rendition[];
}

/** Makes every size of the demo's pictures, two at a time. */
export async function prepareDemoPlates(plates: readonly DemoPlate[], files: FileStore): Promise<PreparedPlate[]> {
  const prepared: PreparedPlate[] = [];
  const waiting = [...plates];
  const work = async () => {
    for (let plate = waiting.shift(); plate; plate = waiting.shift()) prepared.push(await prepare(plate, files));
  };
  await Promise.all([work(), work()]);
  return prepared;
}

async function prepare(plate: DemoPlate, files: FileStore): Promise<PreparedPlate> {
  const { width, height } = await inspectPicture(plate.path);
  const original = await readFile(plate.path);
  const renditions = await makeRenditions(original, files);
  return { plate, originalHash: await files.keep(original), width, height, renditions };
}

export async function seedPlates(db: Knex, prepared: readonly PreparedPlate[], creatorId: string): Promise<void> {
  for (const { plate, originalHash, width, height, renditions } of prepared)
    await insertPlate(db, {
      id: plate.id,
      ...{ alt: plate.alt, caption: plate.caption, credit: plate.credit, width, height },
      original_hash: originalHash,
      original_name: basename(plate.path),
      state: 'ready',
      renditions: JSON.stringify(renditions) as never,
      created_by: creatorId,
    });
}
