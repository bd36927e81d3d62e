import type { Knex } from 'knex';
import { isUniqueViolation } from '../db/constraints.ts';
import { pressingRuns } from './editions.errors.ts';
import type { BoundChapterRow, BoundRecipeRow, EditionRow } from './editions.rows.ts';

export type EditionHead = Omit<EditionRow, 'snapshot'> & { pressed_by_name: string; issued_by_name: string | null };

/** Columns without the snapshot, which a list has no use for. */
const HEAD = [
  'editions.id',
  'editions.book_id',
  'editions.kind',
  'editions.number',
  'editions.recipe_id',
  'editions.state',
  'editions.progress',
  'editions.stage',
  'editions.fault',
  'editions.hash',
  'editions.recipe_count',
  'editions.opens',
  'editions.epub_hash',
  'editions.epub_bytes',
  'editions.pressed_by',
  'editions.started_at',
  'editions.pressed_at',
  'editions.issued_at',
  'editions.issued_by',
  'pressers.name as pressed_by_name',
  'issuers.name as issued_by_name',
] as const;

function heads(db: Knex): Knex.QueryBuilder {
  return db('editions')
    .join('people as pressers', 'pressers.id', 'editions.pressed_by')
    .leftJoin('people as issuers', 'issuers.id', 'editions.issued_by')
    .select(HEAD as unknown as string[]);
}

export async function findEditionHeads(db: Knex, bookId: string): Promise<EditionHead[]> {
  return (await heads(db)
    .where('editions.book_id', bookId)
    .orderBy([
      { column: 'editions.started_at', order: 'desc' },
      { column: 'editions.id', order: 'desc' },
    ])) as EditionHead[];
}

export async function findEditionHead(db: Knex, id: string): Promise<EditionHead | undefined> {
  return (await heads(db).where('editions.id', id).first()) as EditionHead | undefined;
}

export async function findEdition(db: Knex, id: string): Promise<EditionRow | undefined> {
  return db('editions').where({ id }).first();
}

/** Begins an edition; a second pressing of the same book at the same time is refused. */
export async function insertEdition(db: Knex, values: Partial<EditionRow>): Promise<EditionRow> {
  try {
    const [row] = await db('editions').insert(values).returning('*');
    return row!;
  } catch (error) {
    if (isUniqueViolation(error, 'editions_one_pressing_idx')) throw pressingRuns({}, error);
    throw error;
  }
}

/** The next free number; whoever takes one holds the book's row. */
export async function nextNumber(db: Knex, bookId: string, kind: EditionRow['kind']): Promise<number> {
  const row = await db('editions')
    .where({ book_id: bookId, kind })
    .max<{ last: number | null }>({ last: 'number' })
    .first();
  return (row?.last ?? 0) + 1;
}

/** Takes failed pressings away, so that their numbers are free again. */
export async function deleteFailed(db: Knex, bookId: string): Promise<void> {
  await db('editions').where({ book_id: bookId, state: 'failed' }).delete();
}

export async function updateEdition(db: Knex, id: string, values: Partial<EditionRow>): Promise<void> {
  await db('editions').where({ id }).update(values);
}

/** Shows how far a pressing is; a finished one is left alone. */
export async function updateProgress(db: Knex, id: string, progress: number, stage: string): Promise<void> {
  await db('editions').where({ id, state: 'pressing' }).update({ progress, stage });
}

export async function insertBound(
  db: Knex,
  { chapters, recipes }: { chapters: readonly BoundChapterRow[]; recipes: readonly BoundRecipeRow[] },
): Promise<void> {
  await db.batchInsert(
    'bound_chapters',
    chapters.map((row) => ({ ...row, access: asJson(row.access) })),
  );
  await db.batchInsert(
    'bound_recipes',
    recipes.map((row) => ({
      ...row,
      access: asJson(row.access),
      teaser: asJson(row.teaser),
      recipe: asJson(row.recipe),
      plates: asJson(row.plates),
    })),
    50,
  );
}

/** The driver would take an array for an array of PostgreSQL. */
function asJson<T>(value: T): T {
  return JSON.stringify(value) as T;
}
