import type { Snapshot } from '../../shared/contracts/editions.ts';
import type { FileStore } from '../files/file-store.ts';
import { chapterPage } from './chapter-page.ts';
import { colophonPage, coverPage, titlePage } from './front-pages.ts';
import { navigation } from './navigation.ts';
import { CONTAINER, packageDocument, type Part } from './package-document.ts';
import { bindPictures, type BoundPicture } from './pictures.ts';
import { recipePage } from './recipe-page.ts';
import { STYLES } from './styles.ts';
import { zipDeterministically } from './zip.ts';

interface EpubOptions {
  /** The edition's canonical hash; the book is identified by it. */
  hash: string;
  modified: Date;
  onPlate?: (done: number, all: number) => Promise<void>;
}

/**
 * Typesets a snapshot as EPUB 3: cover, title, chapters with their recipes in running order, colophon, and the plates as
 * JPEG. The same snapshot gives the same bytes.
 */
export async function makeEpub(snapshot: Snapshot, files: FileStore, options: EpubOptions): Promise<Uint8Array> {
  const pictures = await bindPictures(snapshot, files, options.onPlate);
  const parts = [...pages(snapshot, pictures, options.hash), { name: 'nav.xhtml', title: 'Contents', body: '' }];
  const nav = navigation(snapshot, parts);
  return zipDeterministically(options.modified, [
    { name: 'META-INF/container.xml', content: CONTAINER },
    { name: 'OEBPS/package.opf', content: packageDocument(snapshot, { ...options, parts, pictures }) },
    { name: 'OEBPS/nav.xhtml', content: nav },
    { name: 'OEBPS/styles.css', content: STYLES },
    ...parts.filter(({ body }) => body !== '').map(({ name, body }) => ({ name: `OEBPS/${name}`, content: body })),
    ...[...pictures.values()].map(({ name, bytes }) => ({ name: `OEBPS/${name}`, content: bytes })),
  ]);
}

/** Every page in reading order. */
function pages(snapshot: Snapshot, pictures: ReadonlyMap<string, BoundPicture>, hash: string): Part[] {
  const cover = snapshot.book.coverPlateId ? pictures.get(snapshot.book.coverPlateId) : undefined;
  return [
    ...(cover ? [{ name: 'cover.xhtml', title: 'Cover', body: coverPage(snapshot, cover) }] : []),
    { name: 'title.xhtml', title: snapshot.book.title, body: titlePage(snapshot) },
    ...snapshot.chapters.flatMap((chapter, index) => [
      { name: `chapter-${index + 1}.xhtml`, title: chapter.title, body: chapterPage(chapter) },
      ...chapter.recipes.map((recipe) => ({
        name: `${recipe.slug}.xhtml`,
        title: recipe.document.title,
        body: recipePage(recipe, pictures, hasPage(snapshot)),
      })),
    ]),
    { name: 'colophon.xhtml', title: 'Colophon', body: colophonPage(snapshot, hash) },
  ];
}

/** Whether a recipe has a page in this book, so that it can be linked to. */
function hasPage({ chapters }: Snapshot): (slug: string) => boolean {
  const slugs = new Set(chapters.flatMap((chapter) => chapter.recipes.map((recipe) => recipe.slug)));
  return (slug) => slugs.has(slug);
}
