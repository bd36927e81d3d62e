import { join } from 'node:path';
import { z } from 'zod';
import { bookDraft, chapterDraft } from '../../shared/contracts/books.ts';
import type { DemoBook, DemoChapter, DemoContent, DemoRecipe, DemoShoot } from './content.ts';
import { cueStarts } from './cue-starts.ts';
import { readImprint, readTiers } from './front-of-house.ts';
import { readLoose, readPlaced, withoutNumber, type RecipeFile } from './recipe-files.ts';
import { refuseCycles, refuseUnknown } from './references.ts';
import { readPlates, readShoots } from './shelves.ts';
import { checkSource, readMarkdown } from './source-file.ts';
import { plateIdOf, recipeIdOf } from './stable-id.ts';
import { toRecipeDocument } from './to-recipe-document.ts';
import { writtenAccess } from './written-values.ts';

const BOOK = 'slack-water';

/**
 * Reads the demo's content folder: imprint, tiers, one book with its chapters, recipes in and out of it, shoots, plates.
 * Throws with file name and line where something is wrong: a misspelt key, an ingredient that is not in the larder,
 * a component, plate or shoot that does not exist, components that lead back to themselves.
 */
export async function readContent(dir: string): Promise<DemoContent> {
  const [imprint, tiers, plates, shoots, book] = await Promise.all([
    readImprint(dir),
    readTiers(dir),
    readPlates(dir),
    readShoots(dir),
    readBook(dir),
  ]);
  const files = [...(await readPlaced(dir, BOOK, book.folders)), ...(await readLoose(dir))];
  const plateFiles = new Set(plates.map((plate) => plate.file));
  if (!plateFiles.has(book.head.coverPlateFile)) book.source.refuse(['cover'], 'This is not among the plates.');
  refuseUnknown(files, plateFiles);
  refuseCycles(files);
  const recipes = files.map((file) => toRecipe(file, shoots));
  return { imprint, tiers, book: book.head, chapters: book.chapters, recipes, shoots, plates };
}

const writtenBook = bookDraft.omit({ coverPlateId: true }).extend({
  access: writtenAccess,
  cover: z.string(),
  chapters: z.array(z.string().regex(/^\d\d-[a-z0-9-]+$/)).min(1),
});

async function readBook(dir: string) {
  const source = await readMarkdown(dir, join(BOOK, 'book.md'));
  const { cover, chapters: folders, ...written } = checkSource(writtenBook, source);
  const head: DemoBook = {
    ...written,
    description: source.body,
    coverPlateFile: cover,
    coverPlateId: plateIdOf(cover),
  };
  const chapters = await Promise.all(folders.map((folder, position) => readChapter(dir, folder, position)));
  return { source, head, chapters, folders };
}

const writtenChapter = chapterDraft.omit({ introduction: true }).extend({ access: writtenAccess.optional() });

async function readChapter(dir: string, folder: string, position: number): Promise<DemoChapter> {
  const source = await readMarkdown(dir, join(BOOK, folder, 'chapter.md'));
  const { title, access } = checkSource(writtenChapter, source);
  return { slug: withoutNumber(folder), title, introduction: source.body, access: access ?? null, position };
}

function toRecipe({ slug, source, written, chapter, position }: RecipeFile, shoots: readonly DemoShoot[]): DemoRecipe {
  const shoot = shoots.find((candidate) => candidate.slug === written.shoot);
  if (written.shoot !== undefined && !shoot) source.refuse(['shoot'], `There is no shoot "${written.shoot}".`);
  return {
    id: recipeIdOf(slug),
    slug,
    document: toRecipeDocument(written, source, shoot ? cueStarts(shoot.notesText) : []),
    access: written.access ?? null,
    state: written.state,
    ...{ chapter, position },
    plateFile: written.plate ?? null,
    shoot: shoot?.slug ?? null,
    queries: written.queries,
  };
}
