import { Readable } from 'node:stream';
import type { AppContext } from '../context.ts';
import { findEdition } from '../editions/editions.queries.ts';
import { makeEpub } from '../epub/make-epub.ts';
import { sha256 } from '../files/file-store.ts';
import type { GateViewer } from '../gate/gate.ts';
import { FileAnswer } from '../http/file-answer.ts';
import { decideRow } from './gate-viewer.ts';
import { notThere } from './reading.errors.ts';
import { findTeasers, type IssuedBook, type TeaserRow } from './reading.queries.ts';
import { opensWhole, readIssuedBook } from './reading.service.ts';

/**
 * The EPUB of the last issued edition, for whom every recipe in it is open. A recipe withdrawn since is left out of a
 * copy that is made for the purpose.
 */
export async function readEpub(ctx: AppContext, slug: string, viewer: GateViewer): Promise<FileAnswer> {
  const book = await readIssuedBook(ctx.db, slug);
  const teasers = await findTeasers(ctx.db, slug);
  const entries = teasers.map((row) => ({ row, decision: decideRow(row, viewer, ctx.now()) }));
  if (!opensWhole(entries)) throw notThere();
  const withdrawn = teasers.filter((row) => row.withdrawn);
  const downloadName = `${slug}-edition-${book.number}.epub`;
  if (withdrawn.length > 0) return withoutWithdrawn(ctx, book, withdrawn, downloadName);
  return new FileAnswer({
    type: 'application/epub+zip',
    etag: book.epub_hash,
    bytes: book.epub_bytes,
    open: () => ctx.files.stream(book.epub_hash),
    downloadName,
  });
}

async function withoutWithdrawn(
  { db, files }: AppContext,
  book: IssuedBook,
  withdrawn: readonly TeaserRow[],
  downloadName: string,
): Promise<FileAnswer> {
  const edition = await findEdition(db, book.edition_id);
  const { snapshot, hash } = edition!;
  const gone = new Set(withdrawn.map((row) => row.teaser.recipeId));
  const chapters = snapshot!.chapters.map((chapter) => ({
    ...chapter,
    recipes: chapter.recipes.filter((recipe) => !gone.has(recipe.recipeId)),
  }));
  const bytes = await makeEpub({ ...snapshot!, chapters }, files, { hash: hash!, modified: edition!.started_at });
  return new FileAnswer({
    type: 'application/epub+zip',
    etag: sha256(bytes),
    bytes: bytes.byteLength,
    open: async () => Readable.from([bytes]),
    downloadName,
  });
}
