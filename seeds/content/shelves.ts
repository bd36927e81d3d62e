import { access, readdir } from 'node:fs/promises';
import { basename, join } from 'node:path';
import { z } from 'zod';
import { plateWords } from '../../shared/contracts/plates.ts';
import { shootDraft } from '../../shared/contracts/shoots.ts';
import type { DemoPlate, DemoShoot } from './content.ts';
import { checkSource, readMarkdown, readText, readYaml } from './source-file.ts';
import { plateIdOf } from './stable-id.ts';

const writtenPlates = z.array(
  plateWords.extend({ file: z.string().regex(/^[a-z0-9-]+\.jpg$/), alt: z.string().trim().min(1) }),
);

/** The plates of `plates/plates.yaml`, each with its picture beside it. */
export async function readPlates(dir: string): Promise<DemoPlate[]> {
  const source = await readYaml(dir, 'plates/plates.yaml');
  return Promise.all(
    checkSource(writtenPlates, source).map(async (plate, index) => {
      const path = join(dir, 'plates', plate.file);
      await access(path).catch(() => source.refuse([index, 'file'], `There is no picture "${plate.file}" beside it.`));
      return { ...plate, id: plateIdOf(plate.file), path };
    }),
  );
}

const writtenShoot = shootDraft
  .omit({ shotOn: true })
  .extend({
    date: shootDraft.shape.shotOn,
    videoUrl: z.url(),
    notes: z.string().regex(/^[a-z0-9-]+\.(?:vtt|srt|txt)$/),
  });

/** The shoots of `shoots/*.md` with the text of their notes, oldest first. */
export async function readShoots(dir: string): Promise<DemoShoot[]> {
  const shoots = await Promise.all((await markdownIn(dir, 'shoots')).map((name) => readShoot(dir, name)));
  return shoots.sort((one, other) => one.date.localeCompare(other.date));
}

async function readShoot(dir: string, name: string): Promise<DemoShoot> {
  const { title, date, videoUrl, notes } = checkSource(writtenShoot, await readMarkdown(dir, name));
  const notesText = await readText(dir, join('shoots', notes));
  return { slug: basename(name, '.md'), title, date, videoUrl, notesName: notes, notesText };
}

/** Names of the Markdown files of a folder, below `dir`, in the order of their names. */
export async function markdownIn(dir: string, folder: string): Promise<string[]> {
  const names = await readdir(join(dir, folder));
  return names
    .filter((name) => name.endsWith('.md'))
    .sort()
    .map((name) => join(folder, name));
}
