import type { Knex } from 'knex';
import type { Access } from '../../shared/contracts/access.ts';
import type { RecipeKind, RecipeState } from '../../shared/contracts/words.ts';
import { isForeignKeyViolation, isUniqueViolation } from '../db/constraints.ts';
import { bookSlugTaken, recipePlaced } from './books.errors.ts';
import type { BookRow, ChapterRow, PlacementRow } from './books.rows.ts';
import { requestInvalid } from '../http/http.errors.ts';

export interface BookListRow extends BookRow {
  chapter_count: number;
  recipe_count: number;
  latest_edition: number | null;
}

export async function findBooks(db: Knex): Promise<BookListRow[]> {
  return db('books')
    .orderBy('books.title')
    .select<BookListRow[]>(
      'books.*',
      db.raw('(select count(*)::int from chapters where chapters.book_id = books.id) as chapter_count'),
      db.raw('(select count(*)::int from placements where placements.book_id = books.id) as recipe_count'),
      db.raw(
        `(select max(editions.number) from editions
          where editions.book_id = books.id and editions.kind = 'edition' and editions.state = 'issued') as latest_edition`,
      ),
    );
}

export async function findBook(db: Knex, id: string): Promise<BookRow | undefined> {
  return db('books').where({ id }).first();
}

/** Takes the book's row for this transaction, so that changes of its order come one after the other. */
export async function lockBook(db: Knex, id: string): Promise<BookRow | undefined> {
  return db('books').where({ id }).forUpdate().first();
}

export async function insertBook(db: Knex, values: Partial<BookRow>): Promise<BookRow> {
  return catchingFaults(async () => {
    const [row] = await db('books').insert(asStored(values)).returning('*');
    return row!;
  });
}

export async function updateBook(db: Knex, id: string, values: Partial<BookRow>): Promise<BookRow> {
  return catchingFaults(async () => {
    const [row] = await db('books')
      .where({ id })
      .update({ ...asStored(values), version: db.raw('version + 1') as unknown as number })
      .returning('*');
    return row!;
  });
}

async function catchingFaults<T>(statement: () => Promise<T>): Promise<T> {
  try {
    return await statement();
  } catch (error) {
    if (isUniqueViolation(error, 'books_slug_key'))
      throw bookSlugTaken({ faults: [{ path: 'slug', message: 'Another book has that address.' }] }, error);
    if (isForeignKeyViolation(error, 'books_cover_plate_fkey'))
      throw requestInvalid({ faults: [{ path: 'coverPlateId', message: 'There is no such plate.' }] }, error);
    throw error;
  }
}

export async function findChapters(db: Knex, bookId: string): Promise<ChapterRow[]> {
  return db('chapters').where({ book_id: bookId }).orderBy('position');
}

export async function findChapter(db: Knex, id: string): Promise<ChapterRow | undefined> {
  return db('chapters').where({ id }).first();
}

export async function insertChapter(db: Knex, values: Partial<ChapterRow>): Promise<ChapterRow> {
  const [row] = await db('chapters').insert(asStored(values)).returning('*');
  return row!;
}

export async function updateChapter(
  db: Knex,
  { id, expected, values }: { id: string; expected: number; values: Partial<ChapterRow> },
): Promise<ChapterRow | undefined> {
  const [row] = await db('chapters')
    .where({ id, version: expected })
    .update({ ...asStored(values), version: expected + 1 })
    .returning('*');
  return row;
}

export async function deleteChapter(db: Knex, id: string): Promise<void> {
  await db('chapters').where({ id }).delete();
}

export interface PlacedRow extends PlacementRow {
  slug: string;
  title: string;
  kind: RecipeKind;
  state: RecipeState;
  revision: number;
  missing: string[];
}

/** Recipes of a book in running order. */
export async function findPlacements(db: Knex, bookId: string): Promise<PlacedRow[]> {
  return db('placements')
    .join('recipes', 'recipes.id', 'placements.recipe_id')
    .join('chapters', 'chapters.id', 'placements.chapter_id')
    .where('placements.book_id', bookId)
    .orderBy(['chapters.position', 'placements.position'])
    .select<PlacedRow[]>(
      'placements.*',
      'recipes.slug',
      'recipes.title',
      'recipes.kind',
      'recipes.state',
      'recipes.revision',
      'recipes.missing',
    );
}

export async function insertPlacement(db: Knex, values: PlacementRow): Promise<void> {
  try {
    await db('placements').insert(asStored(values));
  } catch (error) {
    if (isUniqueViolation(error, 'placements_pkey')) throw recipePlaced({}, error);
    if (isForeignKeyViolation(error, 'placements_recipe_fkey'))
      throw requestInvalid({ faults: [{ path: 'recipeId', message: 'There is no such recipe.' }] }, error);
    throw error;
  }
}

export async function updatePlacement(
  db: Knex,
  { bookId, recipeId, values }: { bookId: string; recipeId: string; values: Partial<PlacementRow> },
): Promise<number> {
  return db('placements').where({ book_id: bookId, recipe_id: recipeId }).update(asStored(values));
}

export async function deletePlacement(db: Knex, bookId: string, recipeId: string): Promise<number> {
  return db('placements').where({ book_id: bookId, recipe_id: recipeId }).delete();
}

export async function nextPosition(
  db: Knex,
  table: 'chapters' | 'placements',
  of: Record<string, string>,
): Promise<number> {
  const row = await db(table).where(of).max<{ last: number | null }>({ last: 'position' }).first();
  return (row?.last ?? 0) + 1;
}

/** JSON null and SQL null differ: an access that is inherited is SQL null. */
function asStored<T extends { access?: Access | null }>(values: T): T {
  if (values.access === undefined || values.access === null) return values;
  return { ...values, access: JSON.stringify(values.access) as unknown as Access };
}
