import type { z } from 'zod';
import type { bookContents, readingView } from '../../shared/contracts/reading.ts';
import { bookNotFound } from '../books/books.errors.ts';
import { findBook } from '../books/books.queries.ts';
import type { AppContext } from '../context.ts';
import { toBoundRows } from '../editions/bind.ts';
import type { BoundRecipeRow } from '../editions/editions.rows.ts';
import { takeSnapshot } from '../editions/snapshot.ts';
import type { GateViewer } from '../gate/gate.ts';
import { toPicture } from '../plates/rendition-address.ts';
import { decideRow } from './gate-viewer.ts';
import { notThere } from './reading.errors.ts';
import { findTierFrom } from './reading.queries.ts';
import { toClosedBecause, toClosedView, toOpenView, toTeaserView } from './views.ts';

/** Galleys are for staff, who see plates at the staff's address. */
const PLATES = '/api/plates';

/** The working copies of a book bound as they stand now, for proof-reading; nothing of it is kept. */
async function takeGalley({ db }: AppContext, bookId: string) {
  const book = await findBook(db, bookId);
  if (!book) throw bookNotFound();
  const snapshot = await takeSnapshot(db, { book, kind: 'edition', number: 0 });
  return { snapshot, ...toBoundRows(bookId, snapshot) };
}

/** The contents of a galley as a reader of this kind would see them. */
export async function readGalley(
  ctx: AppContext,
  bookId: string,
  viewer: GateViewer,
): Promise<z.input<typeof bookContents>> {
  const { snapshot, chapters, recipes } = await takeGalley(ctx, bookId);
  const cover = snapshot.plates.find((plate) => plate.id === snapshot.book.coverPlateId);
  const opens = (row: Pick<BoundRecipeRow, 'access'>) => decideRow(gated(row), viewer, ctx.now()).open;
  return {
    slug: snapshot.book.slug,
    title: snapshot.book.title,
    subtitle: snapshot.book.subtitle,
    edition: { kind: 'galley', number: 0, issuedAt: null },
    cover: cover ? toPicture(cover, PLATES, 'all') : null,
    chapters: chapters.map((chapter) => ({
      id: chapter.chapter_id,
      title: chapter.title,
      introductionHtml: opens(chapter) ? chapter.introduction_html : '',
      recipes: recipes
        .filter((row) => row.chapter_id === chapter.chapter_id)
        .map((row) => ({
          ...toTeaserView(row.teaser, PLATES, 'small'),
          headnoteText: row.teaser.headnoteText,
          open: opens(row),
        })),
    })),
    download: false,
  };
}

/** One recipe of a galley as a reader of this kind would see it. */
export async function readGalleyRecipe(
  ctx: AppContext,
  { bookId, slug }: { bookId: string; slug: string },
  viewer: GateViewer,
): Promise<z.input<typeof readingView>> {
  const { snapshot, recipes } = await takeGalley(ctx, bookId);
  const row = recipes.find((bound) => bound.slug === slug);
  if (!row) throw notThere();
  const book = { slug: snapshot.book.slug, title: snapshot.book.title };
  const decision = decideRow(gated(row), viewer, ctx.now());
  if (decision.open) return toOpenView(row, { book, edition: { kind: 'galley', number: 0 } }, PLATES);
  if (decision.why === 'withdrawn') throw notThere();
  const tier = decision.why === 'tier' ? await findTierFrom(ctx.db, decision.rank) : undefined;
  return toClosedView(row.teaser, book, PLATES, toClosedBecause(decision, tier));
}

/** A galley has no dates, and a withdrawn recipe stands in it so that it can be seen and taken out. */
function gated({ access }: Pick<BoundRecipeRow, 'access'>) {
  return { access, opens: [], withdrawn: false };
}
