import type { z } from 'zod';
import { readingView, type bookContents, type Shelf } from '../../shared/contracts/reading.ts';
import type { AppContext } from '../context.ts';
import type { Decision, GateViewer } from '../gate/gate.ts';
import { WrittenAnswer } from '../http/written-answer.ts';
import { toPicture } from '../plates/rendition-address.ts';
import { decideRow } from './gate-viewer.ts';
import { notIssued, notThere } from './reading.errors.ts';
import {
  findBoundChapters,
  findIssuedBooks,
  findReadable,
  findTeasers,
  findTierFrom,
  readBoundTeaser,
  readBoundText,
  type IssuedBook,
  type TeaserRow,
} from './reading.queries.ts';
import { toClosedBecause, toClosedView, toOpenView, toTeaserView } from './views.ts';

/** Where a book's pictures are asked for, below its own address. */
const coverBase = (book: string) => `/api/reading/${book}/cover`;
const plateBase = (book: string, recipe: string) => `/api/reading/${book}/${recipe}/plates`;

/** The issued books, without a word about a drink. */
export async function readShelf({ db }: AppContext): Promise<Shelf> {
  const books = await findIssuedBooks(db);
  return {
    books: books.map((book) => ({
      slug: book.slug,
      title: book.title,
      subtitle: book.subtitle,
      edition: book.number,
      recipeCount: book.recipe_count,
      cover: book.cover && toPicture(book.cover, coverBase(book.slug), 'all'),
    })),
  };
}

/** A recipe to this reader: whole, or closed behind its teaser. Only an open one's text is fetched. */
export async function readRecipe(
  { db, now, pages }: AppContext,
  { book: address, slug }: { book: string; slug: string },
  viewer: GateViewer,
): Promise<z.input<typeof readingView> | WrittenAnswer> {
  const row = await findReadable(db, address, slug);
  if (!row) throw notThere();
  const decision = decideRow(row, viewer, now());
  const book = { slug: address, title: row.book_title };
  const base = plateBase(address, slug);
  if (decision.open) {
    const edition = { kind: row.edition_kind, number: row.edition_number };
    return pages.take(
      JSON.stringify([row.edition_id, row.recipe_id, book]),
      async () => new WrittenAnswer(readingView, toOpenView(await readBoundText(db, row), { book, edition }, base)),
    );
  }
  if (decision.why === 'withdrawn') throw notThere();
  const tier = decision.why === 'tier' ? await findTierFrom(db, decision.rank) : undefined;
  return toClosedView(await readBoundTeaser(db, row), book, base, toClosedBecause(decision, tier));
}

/** The contents of a book as this reader sees them. */
export async function readContents(
  { db, now }: AppContext,
  slug: string,
  viewer: GateViewer,
): Promise<z.input<typeof bookContents>> {
  const book = await readIssuedBook(db, slug);
  const [chapters, teasers] = await Promise.all([findBoundChapters(db, book.edition_id), findTeasers(db, slug)]);
  const entries = teasers.map((row) => ({ row, decision: decideRow(row, viewer, now()) }));
  const shown = entries.filter(({ decision }) => decision.open || decision.why !== 'withdrawn');
  return {
    slug,
    title: book.title,
    subtitle: book.subtitle,
    edition: { kind: 'edition', number: book.number, issuedAt: book.issued_at.toISOString() },
    cover: book.cover && toPicture(book.cover, coverBase(slug), 'all'),
    chapters: chapters.map((chapter) => ({
      id: chapter.chapter_id,
      title: chapter.title,
      introductionHtml: decideRow({ ...chapter, opens: book.opens, withdrawn: false }, viewer, now()).open
        ? chapter.introduction_html
        : '',
      recipes: shown.filter(({ row }) => row.chapter_id === chapter.chapter_id).map((entry) => toEntry(entry, slug)),
    })),
    download: opensWhole(entries),
  };
}

/** Whether everything that is not withdrawn is open to the reader. */
export function opensWhole(entries: readonly { row: TeaserRow; decision: Decision }[]): boolean {
  return entries.every(({ row, decision }) => row.withdrawn || decision.open);
}

export async function readIssuedBook(db: AppContext['db'], slug: string): Promise<IssuedBook> {
  const [book] = await findIssuedBooks(db, slug);
  if (!book) throw notIssued();
  return book;
}

function toEntry({ row, decision }: { row: TeaserRow; decision: Decision }, book: string) {
  const teaser = toTeaserView(row.teaser, plateBase(book, row.slug), 'small');
  return { ...teaser, headnoteText: row.teaser.headnoteText, open: decision.open };
}
