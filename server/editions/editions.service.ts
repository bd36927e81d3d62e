import type { Knex } from 'knex';
import type { AppContext } from '../context.ts';
import type { EditionRow as EditionView, Snapshot } from '../../shared/contracts/editions.ts';
import { bookNotFound } from '../books/books.errors.ts';
import { findPlacements, lockBook, type PlacedRow } from '../books/books.queries.ts';
import { addJob } from '../jobs/queue.ts';
import { lockComponentGraph } from '../recipes/component-closure.ts';
import { bindSnapshot } from './bind.ts';
import { canonicalHash } from './canonical-hash.ts';
import { alreadyIssued, editionNotFound, notCleared, notPressed, nothingToPress } from './editions.errors.ts';
import {
  deleteFailed,
  findEditionHead,
  findEditionHeads,
  insertEdition,
  nextNumber,
  updateEdition,
  type EditionHead,
} from './editions.queries.ts';
import { takeSnapshot } from './snapshot.ts';

export async function listEditions(db: Knex, bookId: string): Promise<EditionView[]> {
  return (await findEditionHeads(db, bookId)).map(toEditionView);
}

export async function readEdition(db: Knex, id: string): Promise<EditionView> {
  const row = await findEditionHead(db, id);
  if (!row) throw editionNotFound();
  return toEditionView(row);
}

/** Begins a pressing; the job that does it is enqueued in the same transaction. */
export async function startPressing(
  { db }: Pick<AppContext, 'db'>,
  bookId: string,
  personId: string,
): Promise<EditionView> {
  return db.transaction(async (trx) => {
    const book = await lockBook(trx, bookId);
    if (!book) throw bookNotFound();
    refuseUncleared(await findPlacements(trx, bookId));
    await deleteFailed(trx, bookId);
    const number = await nextNumber(trx, bookId, 'edition');
    const { id } = await insertEdition(trx, { book_id: bookId, kind: 'edition', number, pressed_by: personId });
    await addJob(trx, 'press-edition', { editionId: id }, { maxAttempts: 4, key: `press:${id}` });
    return readEdition(trx, id);
  });
}

/** Puts a pressed edition out: from now on, or from each rank's moment, readers read it. */
export async function issueEdition(
  { db, now }: Pick<AppContext, 'db' | 'now'>,
  { id, personId, opens }: { id: string; personId: string; opens: { rank: number; at: string }[] },
): Promise<EditionView> {
  return db.transaction(async (trx) => {
    const row = await trx('editions').where({ id, kind: 'edition' }).forUpdate().first('state');
    if (!row) throw editionNotFound();
    if (row.state === 'issued') throw alreadyIssued();
    if (row.state !== 'pressed') throw notPressed();
    await updateEdition(trx, id, {
      state: 'issued',
      issued_at: now(),
      issued_by: personId,
      opens: JSON.stringify(opens) as never,
    });
    await putOut(trx, id);
    return readEdition(trx, id);
  });
}

/** Releases one cleared recipe of a book by itself, before an edition binds it. */
export async function releaseLeaf(
  { db, now }: AppContext,
  { recipeId, bookId, personId }: { recipeId: string; bookId: string; personId: string },
): Promise<EditionView> {
  return db.transaction(async (trx) => {
    const book = await lockBook(trx, bookId);
    if (!book) throw bookNotFound();
    const placements = await findPlacements(trx, bookId);
    const place = placements.findIndex((row) => row.recipe_id === recipeId);
    refuseUncleared(placements.slice(place, place + 1));
    const number = await nextNumber(trx, bookId, 'leaf');
    const snapshot: Snapshot = await takeSnapshot(trx, { book, kind: 'leaf', number, onlyRecipe: recipeId });
    const { id } = await insertEdition(trx, {
      book_id: bookId,
      kind: 'leaf',
      number,
      recipe_id: recipeId,
      state: 'issued',
      progress: 100,
      stage: 'pressed',
      snapshot: JSON.stringify(snapshot) as never,
      hash: canonicalHash(snapshot),
      recipe_count: 1,
      pressed_by: personId,
      pressed_at: now(),
      issued_at: now(),
      issued_by: personId,
    });
    await bindSnapshot(trx, id, snapshot, place + 1);
    await putOut(trx, id);
    return readEdition(trx, id);
  });
}

/** A recipe whose working copy is still what was bound is out now; one that was edited since stays a draft. */
async function putOut(db: Knex, editionId: string): Promise<void> {
  await lockComponentGraph(db);
  await db.raw(
    `update recipes set state = 'out', version = recipes.version + 1
     from bound_recipes
     where bound_recipes.edition_id = ? and bound_recipes.recipe_id = recipes.id and recipes.state = 'cleared'
       and (bound_recipes.recipe ->> 'revision')::integer = recipes.revision`,
    [editionId],
  );
}

function refuseUncleared(placed: readonly PlacedRow[]): void {
  if (placed.length === 0) throw nothingToPress();
  const waiting = placed.filter((row) => row.state !== 'cleared' && row.state !== 'out');
  if (waiting.length === 0) return;
  const names = waiting.map((row) => row.title);
  throw notCleared({
    detail: names.join(', '),
    context: { recipes: waiting.map((row) => ({ id: row.recipe_id, title: row.title })) },
  });
}

function toEditionView(row: EditionHead): EditionView {
  return {
    id: row.id,
    bookId: row.book_id,
    kind: row.kind,
    number: row.number,
    state: row.state,
    progress: row.progress,
    stage: row.stage,
    fault: row.fault,
    hash: row.hash,
    recipeCount: row.recipe_count,
    pressedBy: row.pressed_by_name,
    startedAt: row.started_at.toISOString(),
    pressedAt: row.pressed_at?.toISOString() ?? null,
    issuedAt: row.issued_at?.toISOString() ?? null,
    issuedBy: row.issued_by_name,
  };
}
