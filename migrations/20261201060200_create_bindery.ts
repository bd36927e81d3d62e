import type { Knex } from 'knex';

export async function up(db: Knex): Promise<void> {
  await db.raw(`
    create table books (
      id uuid primary key default gen_random_uuid(),
      slug text not null,
      title text not null,
      subtitle text not null default '',
      access jsonb not null,
      cover_plate_id uuid,
      version integer not null default 1,
      created_at timestamptz not null default now(),

      constraint books_slug_key unique (slug),
      constraint books_cover_plate_fkey foreign key (cover_plate_id) references plates (id)
    );

    create table chapters (
      id uuid primary key default gen_random_uuid(),
      book_id uuid not null,
      position integer not null,
      title text not null,
      introduction text not null default '',
      access jsonb,
      version integer not null default 1,
      created_at timestamptz not null default now(),

      constraint chapters_book_fkey foreign key (book_id) references books (id) on delete cascade,
      -- Deferred, so that one transaction may change the whole order.
      constraint chapters_book_position_key unique (book_id, position) deferrable initially deferred
    );

    create table placements (
      book_id uuid not null,
      chapter_id uuid not null,
      recipe_id uuid not null,
      position integer not null,
      access jsonb,

      constraint placements_pkey primary key (book_id, recipe_id),
      constraint placements_book_fkey foreign key (book_id) references books (id) on delete cascade,
      constraint placements_chapter_fkey foreign key (chapter_id) references chapters (id) on delete cascade,
      constraint placements_recipe_fkey foreign key (recipe_id) references recipes (id) on delete cascade,
      constraint placements_chapter_position_key unique (chapter_id, position) deferrable initially deferred
    );

    -- Editions and leaves: the same thing at two sizes.
    create table editions (
      id uuid primary key default gen_random_uuid(),
      book_id uuid not null,
      kind text not null,
      number integer not null,
      -- The one recipe of a leaf; null for an edition.
      recipe_id uuid,
      state text not null default 'pressing',
      progress integer not null default 0,
      stage text not null default 'waiting',
      fault text,
      snapshot jsonb,
      hash text,
      recipe_count integer not null default 0,
      -- Moments by rank from which a tier may open it: [{rank, at}].
      opens jsonb not null default '[]',
      epub_hash text,
      epub_bytes integer,
      pressed_by uuid not null,
      started_at timestamptz not null default now(),
      pressed_at timestamptz,
      issued_at timestamptz,
      issued_by uuid,

      constraint editions_book_fkey foreign key (book_id) references books (id),
      constraint editions_recipe_fkey foreign key (recipe_id) references recipes (id),
      constraint editions_pressed_by_fkey foreign key (pressed_by) references people (id),
      constraint editions_issued_by_fkey foreign key (issued_by) references people (id),
      constraint editions_number_key unique (book_id, kind, number),
      constraint editions_kind_check check (kind in ('edition', 'leaf')),
      constraint editions_leaf_check check ((kind = 'leaf') = (recipe_id is not null)),
      constraint editions_state_check check (state in ('pressing', 'pressed', 'failed', 'issued')),
      constraint editions_snapshot_check
        check (state in ('pressing', 'failed') or (snapshot is not null and hash is not null and pressed_at is not null)),
      constraint editions_issued_check check ((state = 'issued') = (issued_at is not null))
    );
    create index editions_book_issued_idx on editions (book_id, issued_at desc) where state = 'issued';
    -- One pressing of a book at a time.
    create unique index editions_one_pressing_idx on editions (book_id) where state = 'pressing' and kind = 'edition';

    create function refuse_rebinding() returns trigger language plpgsql as $$
    begin
      if old.snapshot is not null and (new.snapshot is distinct from old.snapshot or new.hash is distinct from old.hash
          or new.number is distinct from old.number or new.book_id is distinct from old.book_id) then
        raise exception 'an edition never changes once it is pressed' using errcode = 'restrict_violation';
      end if;
      return new;
    end $$;
    create trigger editions_never_change before update on editions for each row execute function refuse_rebinding();

    create table bound_chapters (
      edition_id uuid not null,
      chapter_id uuid not null,
      position integer not null,
      title text not null,
      introduction_html text not null,
      access jsonb not null,

      constraint bound_chapters_pkey primary key (edition_id, chapter_id),
      constraint bound_chapters_edition_fkey foreign key (edition_id) references editions (id) on delete cascade
    );

    -- One row a bound recipe, so that reading loads one recipe and not a whole book.
    create table bound_recipes (
      edition_id uuid not null,
      recipe_id uuid not null,
      slug text not null,
      position integer not null,
      chapter_id uuid not null,
      chapter_title text not null,
      access jsonb not null,
      -- What everyone past the age check may know; lists read nothing else.
      teaser jsonb not null,
      recipe jsonb not null,
      plates jsonb not null,
      title text not null,

      constraint bound_recipes_pkey primary key (edition_id, recipe_id),
      constraint bound_recipes_edition_fkey foreign key (edition_id) references editions (id) on delete cascade,
      constraint bound_recipes_slug_key unique (edition_id, slug)
    );
  `);
}

export async function down(db: Knex): Promise<void> {
  await db.raw(`
    drop table bound_recipes, bound_chapters, editions, placements, chapters, books;
    drop function refuse_rebinding();
  `);
}
