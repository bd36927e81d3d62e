import type { Knex } from 'knex';
import type { Access } from '../../shared/contracts/access.ts';
import type {
  BookDraft,
  BookRow as BookListed,
  BookView,
  ChapterDraft,
  ChapterView,
  RunningOrder,
} from '../../shared/contracts/books.ts';
import { renderMarkdown } from '../content/markdown.ts';
import { versionConflict } from '../http/http.errors.ts';
import { bookNotFound, chapterNotFound, orderStale } from './books.errors.ts';
import {
  deleteChapter,
  deletePlacement,
  findBook,
  findBooks,
  findChapter,
  findChapters,
  findPlacements,
  insertBook,
  insertChapter,
  insertPlacement,
  lockBook,
  nextPosition,
  updateBook,
  updateChapter,
  updatePlacement,
  type PlacedRow,
} from './books.queries.ts';
import type { BookRow, ChapterRow } from './books.rows.ts';

export async function listBooks(db: Knex): Promise<BookListed[]> {
  return (await findBooks(db)).map((row) => ({
    ...toDraft(row),
    id: row.id,
    version: row.version,
    chapterCount: row.chapter_count,
    recipeCount: row.recipe_count,
    latestEdition: row.latest_edition,
  }));
}

/** The bindery's view of a book: its chapters and recipes in running order. */
export async function readBook(db: Knex, id: string): Promise<BookView> {
  const book = await findBook(db, id);
  if (!book) throw bookNotFound();
  const [chapters, placements] = await Promise.all([findChapters(db, id), findPlacements(db, id)]);
  return {
    ...toDraft(book),
    id,
    version: book.version,
    chapters: chapters.map((chapter) => toChapterView(chapter, placements)),
  };
}

export async function makeBook(db: Knex, draft: BookDraft): Promise<BookView> {
  const row = await insertBook(db, toRow(draft));
  return readBook(db, row.id);
}

export async function saveBook(db: Knex, id: string, draft: BookDraft, expected: number): Promise<BookView> {
  return changing(db, id, expected, async (trx) => {
    await updateBook(trx, id, toRow(draft));
  });
}

/** Adds a chapter at the end of a book. */
export async function addChapter(db: Knex, bookId: string, draft: ChapterDraft): Promise<BookView> {
  return changing(db, bookId, null, async (trx) => {
    const position = await nextPosition(trx, 'chapters', { book_id: bookId });
    await insertChapter(trx, { ...draft, book_id: bookId, position });
    await updateBook(trx, bookId, {});
  });
}

/** Saves a chapter's words and access; its place is the book's matter. */
export async function saveChapter(db: Knex, id: string, draft: ChapterDraft, expected: number): Promise<ChapterView> {
  const before = await findChapter(db, id);
  if (!before) throw chapterNotFound();
  const row = await updateChapter(db, { id, expected, values: draft });
  if (!row) throw versionConflict({ context: { version: before.version } });
  return toChapterView(row, await findPlacements(db, row.book_id));
}

/** Takes a chapter out; its recipes stay, without a place in the book. */
export async function removeChapter(db: Knex, id: string): Promise<BookView> {
  const chapter = await findChapter(db, id);
  if (!chapter) throw chapterNotFound();
  return changing(db, chapter.book_id, null, async (trx) => {
    await deleteChapter(trx, id);
    await updateBook(trx, chapter.book_id, {});
  });
}

/** Places a recipe at the end of a chapter. */
export async function placeRecipe(db: Knex, chapterId: string, recipeId: string): Promise<BookView> {
  const chapter = await findChapter(db, chapterId);
  if (!chapter) throw chapterNotFound();
  return changing(db, chapter.book_id, null, async (trx) => {
    const position = await nextPosition(trx, 'placements', { chapter_id: chapterId });
    await insertPlacement(trx, {
      book_id: chapter.book_id,
      chapter_id: chapterId,
      recipe_id: recipeId,
      position,
      access: null,
    });
    await updateBook(trx, chapter.book_id, {});
  });
}

export async function takeRecipeOut(db: Knex, bookId: string, recipeId: string): Promise<BookView> {
  return changing(db, bookId, null, async (trx) => {
    if ((await deletePlacement(trx, bookId, recipeId)) === 0) throw bookNotFound();
    await updateBook(trx, bookId, {});
  });
}

/** Sets a recipe's own access in a book; null lets the chapter's rule hold. */
export async function setRecipeAccess(
  db: Knex,
  { bookId, recipeId, access }: { bookId: string; recipeId: string; access: Access | null },
): Promise<BookView> {
  return changing(db, bookId, null, async (trx) => {
    if ((await updatePlacement(trx, { bookId, recipeId, values: { access } })) === 0) throw bookNotFound();
    await updateBook(trx, bookId, {});
  });
}

/** Lays the whole running order anew; it must name exactly what the book holds. */
export async function saveOrder(db: Knex, bookId: string, order: RunningOrder, expected: number): Promise<BookView> {
  return changing(db, bookId, expected, async (trx) => {
    const [chapters, placements] = await Promise.all([findChapters(trx, bookId), findPlacements(trx, bookId)]);
    const named = order.chapters.flatMap((chapter) => chapter.recipes);
    if (
      !sameMembers(
        order.chapters.map(({ id }) => id),
        chapters.map(({ id }) => id),
      )
    )
      throw orderStale();
    if (
      !sameMembers(
        named,
        placements.map((placement) => placement.recipe_id),
      )
    )
      throw orderStale();
    for (const [index, chapter] of order.chapters.entries()) {
      await trx('chapters')
        .where({ id: chapter.id })
        .update({ position: index + 1 });
      for (const [place, recipeId] of chapter.recipes.entries())
        await updatePlacement(trx, { bookId, recipeId, values: { chapter_id: chapter.id, position: place + 1 } });
    }
    await updateBook(trx, bookId, {});
  });
}

/** Holds the book's row while it changes; with an expected version refuses when another change came first. */
async function changing(
  db: Knex,
  bookId: string,
  expected: number | null,
  change: (trx: Knex) => Promise<void>,
): Promise<BookView> {
  return db.transaction(async (trx) => {
    const book = await lockBook(trx, bookId);
    if (!book) throw bookNotFound();
    if (expected !== null && book.version !== expected) throw versionConflict({ context: { version: book.version } });
    await change(trx);
    return readBook(trx, bookId);
  });
}

function sameMembers(named: readonly string[], held: readonly string[]): boolean {
  return named.length === held.length && new Set(named).size === named.length && held.every((id) => named.includes(id));
}

function toDraft(row: BookRow): BookDraft {
  const { title, subtitle, slug, access, cover_plate_id: coverPlateId } = row;
  return { title, subtitle, slug, access, coverPlateId };
}

function toRow({ coverPlateId, ...same }: BookDraft): Partial<BookRow> {
  return { ...same, cover_plate_id: coverPlateId };
}

function toChapterView(chapter: ChapterRow, placements: readonly PlacedRow[]): ChapterView {
  const { id, version, title, introduction, access } = chapter;
  return {
    id,
    version,
    title,
    introduction,
    introductionHtml: renderMarkdown(introduction),
    access,
    recipes: placements
      .filter((placement) => placement.chapter_id === id)
      .map((placement) => ({
        recipeId: placement.recipe_id,
        slug: placement.slug,
        title: placement.title,
        kind: placement.kind,
        state: placement.state,
        missing: placement.missing,
        access: placement.access,
      })),
  };
}
