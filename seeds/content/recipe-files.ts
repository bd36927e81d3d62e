import { basename, join } from 'node:path';
import { markdownIn } from './shelves.ts';
import { checkSource, readMarkdown, type SourceFile } from './source-file.ts';
import { writtenRecipe, type WrittenRecipe } from './written-recipe.ts';

const LOOSE_LEAVES = 'loose-leaves';

/** A recipe file before its references are followed. */
export interface RecipeFile {
  slug: string;
  source: SourceFile;
  written: WrittenRecipe;
  chapter: string | null;
  position: number | null;
}

/** The recipes of a book in running order: a folder is a chapter, the number before a file's name its place. */
export async function readPlaced(dir: string, book: string, folders: readonly string[]): Promise<RecipeFile[]> {
  const chapters = folders.map(async (folder) => {
    const names = await markdownIn(dir, join(book, folder));
    const recipes = names.filter((name) => basename(name) !== 'chapter.md');
    return Promise.all(recipes.map((name, index) => readRecipeFile(dir, name, withoutNumber(folder), index)));
  });
  return (await Promise.all(chapters)).flat();
}

/** The recipes that stand in no book. */
export async function readLoose(dir: string): Promise<RecipeFile[]> {
  return Promise.all((await markdownIn(dir, LOOSE_LEAVES)).map((name) => readRecipeFile(dir, name, null, null)));
}

async function readRecipeFile(
  dir: string,
  name: string,
  chapter: string | null,
  position: number | null,
): Promise<RecipeFile> {
  const source = await readMarkdown(dir, name);
  return {
    slug: withoutNumber(basename(name, '.md')),
    source,
    written: checkSource(writtenRecipe, source),
    chapter,
    position,
  };
}

/** A name without the number that puts it in order. */
export function withoutNumber(name: string): string {
  return name.replace(/^\d\d-/, '');
}
