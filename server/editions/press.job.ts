import type { Knex } from 'knex';
import type { AppContext } from '../context.ts';
import { findBook } from '../books/books.queries.ts';
import { makeEpub } from '../epub/make-epub.ts';
import type { JobAttempt } from '../jobs/tasks.ts';
import { bindSnapshot } from './bind.ts';
import { canonicalHash } from './canonical-hash.ts';
import { findEdition, updateEdition, updateProgress } from './editions.queries.ts';
import type { EditionRow } from './editions.rows.ts';
import { takeSnapshot } from './snapshot.ts';

type PressContext = Pick<AppContext, 'db' | 'files' | 'now'>;

/**
 * Presses an edition. Everything before the last transaction can be done again after a kill: nothing of the edition
 * is visible until that transaction has it whole.
 */
export async function pressEdition(
  ctx: PressContext,
  { editionId }: { editionId: string },
  attempt: JobAttempt,
): Promise<void> {
  const edition = await findEdition(ctx.db, editionId);
  if (edition?.state !== 'pressing') return;
  try {
    await press(ctx, edition);
  } catch (error) {
    const fault = error instanceof Error ? error.message : 'unknown';
    if (attempt.last) await updateEdition(ctx.db, editionId, { state: 'failed', fault });
    else await updateEdition(ctx.db, editionId, { fault });
    throw error;
  }
}

async function press(ctx: PressContext, edition: EditionRow): Promise<void> {
  const { db, files, now } = ctx;
  await updateProgress(db, edition.id, 5, 'gathering');
  const snapshot = await inOneView(db, async (view) => {
    const book = await findBook(view, edition.book_id);
    return takeSnapshot(view, { book: book!, kind: 'edition', number: edition.number });
  });
  const hash = canonicalHash(snapshot);
  await updateProgress(db, edition.id, 20, 'typesetting');
  const epub = await makeEpub(snapshot, files, {
    hash,
    modified: edition.started_at,
    onPlate: (done, all) => updateProgress(db, edition.id, 20 + Math.floor((60 * done) / all), 'plates'),
  });
  await updateProgress(db, edition.id, 85, 'binding');
  const epubHash = await files.keep(epub);

  await db.transaction(async (trx) => {
    // Holding the row lets one of two presses of the same edition finish; the other finds it pressed.
    const held = await trx('editions').where({ id: edition.id, state: 'pressing' }).forUpdate().first('id');
    if (!held) return;
    await bindSnapshot(trx, edition.id, snapshot);
    await updateEdition(trx, edition.id, {
      state: 'pressed',
      progress: 100,
      stage: 'pressed',
      fault: null,
      snapshot: JSON.stringify(snapshot) as never,
      hash,
      recipe_count: snapshot.chapters.reduce((sum, chapter) => sum + chapter.recipes.length, 0),
      epub_hash: epubHash,
      epub_bytes: epub.byteLength,
      pressed_at: now(),
    });
  });
}

/** Reads as of one moment; inside somebody's transaction that is theirs. */
function inOneView<T>(db: Knex, read: (view: Knex) => Promise<T>): Promise<T> {
  return db.isTransaction === true
    ? read(db)
    : db.transaction(read, { isolationLevel: 'repeatable read', readOnly: true });
}
