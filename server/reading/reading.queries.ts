import type { Knex } from 'knex';
import { askPrepared, type Prepared } from '../db/prepared.ts';
import type { BoundPlate } from '../../shared/contracts/editions.ts';
import type { BoundChapterRow, BoundRecipeRow, BoundTeaser } from '../editions/editions.rows.ts';

/** What of an entry the gate asks for. */
export interface GatedRow {
  access: BoundRecipeRow['access'];
  opens: { rank: number; at: string }[];
  withdrawn: boolean;
}

export interface TeaserRow extends GatedRow {
  slug: string;
  chapter_id: string;
  teaser: BoundTeaser;
}

/** One recipe as it stands before readers: all that the gate asks for, and where its text is bound. */
export interface ReadableRow extends GatedRow {
  edition_id: string;
  recipe_id: string;
  edition_kind: 'edition' | 'leaf';
  edition_number: number;
  book_title: string;
}

/** What of a bound recipe only those may have to whom it is open. */
export interface BoundText {
  teaser: BoundTeaser;
  recipe: BoundRecipeRow['recipe'];
  plates: BoundPlate[];
}

/**
 * What readers of a book have before them: the recipes of its last issued edition, and leaves released since; where
 * both hold a recipe, the leaf.
 */
const READABLE = `
  select distinct on (bound_recipes.recipe_id)
    bound_recipes.recipe_id, bound_recipes.edition_id, bound_recipes.slug, bound_recipes.chapter_id,
    bound_recipes.position, bound_recipes.access,
    editions.kind as edition_kind, editions.opens,
    coalesce(recipes.withdrawn_at >= editions.issued_at, false) as withdrawn
  from books
  join editions on editions.book_id = books.id and editions.state = 'issued'
  join bound_recipes on bound_recipes.edition_id = editions.id
  join recipes on recipes.id = bound_recipes.recipe_id
  where books.slug = :book
    and editions.issued_at >= coalesce(
      (select max(latest.issued_at) from editions latest
        where latest.book_id = books.id and latest.kind = 'edition' and latest.state = 'issued'),
      '-infinity')
  order by bound_recipes.recipe_id, editions.issued_at desc, editions.kind desc`;

/** Looks only at this recipe's own rows: planning more takes longer than running it. `$1` is the book's address, `$2` the recipe's. */
const FIND_READABLE: Prepared = {
  name: 'find-readable',
  text: `with released as materialized (
      select editions.id, editions.kind, editions.number, editions.issued_at, editions.opens, books.title as book_title
      from books
      join editions on editions.book_id = books.id and editions.state = 'issued'
      where books.slug = $1
        and editions.issued_at >= coalesce(
          (select max(latest.issued_at) from editions latest
            where latest.book_id = books.id and latest.kind = 'edition' and latest.state = 'issued'),
          '-infinity')
    )
    select bound_recipes.edition_id, bound_recipes.recipe_id, bound_recipes.access,
      released.kind as edition_kind, released.number as edition_number, released.opens, released.book_title,
      coalesce(recipes.withdrawn_at >= released.issued_at, false) as withdrawn
    from released
    join bound_recipes on bound_recipes.edition_id = released.id
    join recipes on recipes.id = bound_recipes.recipe_id
    where bound_recipes.slug = $2
      and not exists (
        select from released newer
        join bound_recipes again on again.edition_id = newer.id and again.recipe_id = bound_recipes.recipe_id
        where (newer.issued_at, newer.kind) > (released.issued_at, released.kind))`,
};

/** One recipe as readers of the book have it before them. */
export async function findReadable(db: Knex, book: string, slug: string): Promise<ReadableRow | undefined> {
  const [row] = await askPrepared<ReadableRow>(db, FIND_READABLE, [book, slug]);
  return row;
}

type Bound = Pick<ReadableRow, 'edition_id' | 'recipe_id'>;

/** What everybody past the age check may know of a bound recipe. */
export async function readBoundTeaser(db: Knex, { edition_id, recipe_id }: Bound): Promise<BoundTeaser> {
  const row = await db('bound_recipes').where({ edition_id, recipe_id }).first<{ teaser: BoundTeaser }>('teaser');
  return row.teaser;
}

/** All of a bound recipe; asked for only where it is open. */
export async function readBoundText(db: Knex, { edition_id, recipe_id }: Bound): Promise<BoundText> {
  return db('bound_recipes').where({ edition_id, recipe_id }).first<BoundText>('teaser', 'recipe', 'plates');
}

/** The teasers of a book in running order; nothing that is kept back is loaded. */
export async function findTeasers(db: Knex, book: string): Promise<TeaserRow[]> {
  const { rows } = await db.raw<{ rows: TeaserRow[] }>(
    `select readable.slug, readable.chapter_id, readable.access, readable.opens, readable.withdrawn, bound_recipes.teaser
    from (${READABLE}) readable
    join bound_recipes
      on bound_recipes.edition_id = readable.edition_id and bound_recipes.recipe_id = readable.recipe_id
    order by readable.position, readable.edition_kind`,
    { book },
  );
  return rows;
}

export interface IssuedBook {
  id: string;
  slug: string;
  title: string;
  subtitle: string;
  edition_id: string;
  number: number;
  issued_at: Date;
  opens: GatedRow['opens'];
  epub_hash: string;
  epub_bytes: number;
  recipe_count: number;
  cover: BoundPlate | null;
}

/** The last issued edition of each book, or of the one with this address. */
export async function findIssuedBooks(db: Knex, slug?: string): Promise<IssuedBook[]> {
  const { rows } = await db.raw<{ rows: IssuedBook[] }>(
    `select distinct on (books.id)
      books.id, books.slug, editions.snapshot -> 'book' ->> 'title' as title,
      editions.snapshot -> 'book' ->> 'subtitle' as subtitle,
      editions.id as edition_id, editions.number, editions.issued_at, editions.opens, editions.epub_hash,
      editions.epub_bytes, editions.recipe_count,
      (select plate from jsonb_array_elements(editions.snapshot -> 'plates') plate
        where plate ->> 'id' = editions.snapshot -> 'book' ->> 'coverPlateId') as cover
    from books
    join editions on editions.book_id = books.id and editions.kind = 'edition' and editions.state = 'issued'
    where (:slug::text is null or books.slug = :slug)
    order by books.id, editions.issued_at desc`,
    { slug: slug ?? null },
  );
  return rows;
}

/** Chapters of the last edition and of leaves since, in order. */
export async function findBoundChapters(db: Knex, editionId: string): Promise<BoundChapterRow[]> {
  return db('bound_chapters').where({ edition_id: editionId }).orderBy('position');
}

/** The lowest tier whose rank is at least this one; what a teaser may name as its key. */
export async function findTierFrom(db: Knex, rank: number): Promise<{ rank: number; name: string } | undefined> {
  return db('tiers').whereNull('closed_at').andWhere('rank', '>=', rank).orderBy('rank').first('rank', 'name');
}
