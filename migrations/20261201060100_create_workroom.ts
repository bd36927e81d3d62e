import type { Knex } from 'knex';

export async function up(db: Knex): Promise<void> {
  await db.raw(`
    create table larder_items (
      id text primary key,
      name text not null,
      item jsonb not null
    );

    create table shoots (
      id uuid primary key default gen_random_uuid(),
      title text not null,
      shot_on date not null,
      video_url text,
      notes_name text,
      notes_text text,
      notes_format text,
      cues jsonb not null default '[]',
      warnings jsonb not null default '[]',
      version integer not null default 1,
      created_by uuid not null,
      created_at timestamptz not null default now(),

      constraint shoots_created_by_fkey foreign key (created_by) references people (id),
      constraint shoots_notes_format_check check (notes_format in ('webvtt', 'subrip', 'timed-text', 'prose'))
    );

    create table plates (
      id uuid primary key default gen_random_uuid(),
      original_hash text not null,
      original_name text not null,
      alt text not null default '',
      caption text not null default '',
      credit text not null default '',
      width integer not null,
      height integer not null,
      state text not null default 'preparing',
      renditions jsonb not null default '[]',
      shoot_id uuid,
      version integer not null default 1,
      created_by uuid not null,
      created_at timestamptz not null default now(),

      constraint plates_shoot_fkey foreign key (shoot_id) references shoots (id) on delete set null,
      constraint plates_created_by_fkey foreign key (created_by) references people (id),
      constraint plates_state_check check (state in ('preparing', 'ready', 'failed'))
    );

    create table recipes (
      id uuid primary key default gen_random_uuid(),
      slug text not null,
      title text not null,
      kind text not null,
      state text not null default 'draft',
      revision integer not null,
      figures jsonb not null,
      missing text[] not null default '{}',
      shoot_id uuid,
      -- Whatever was released before this moment is hidden from readers, also after the recipe is taken up again.
      withdrawn_at timestamptz,
      version integer not null default 1,
      created_at timestamptz not null default now(),
      updated_at timestamptz not null default now(),
      search tsvector generated always as (to_tsvector('simple', title)) stored,

      constraint recipes_slug_key unique (slug),
      constraint recipes_shoot_fkey foreign key (shoot_id) references shoots (id) on delete set null,
      constraint recipes_state_check
        check (state in ('draft', 'on-trial', 'with-editor', 'cleared', 'out', 'withdrawn')),
      constraint recipes_kind_check check (kind in
        ('drink', 'syrup', 'cordial', 'shrub', 'infusion', 'liqueur', 'bitters', 'garnish', 'ice', 'technique'))
    );
    create index recipes_search_idx on recipes using gin (search);
    create index recipes_updated_idx on recipes (updated_at desc, id);

    create table revisions (
      recipe_id uuid not null,
      number integer not null,
      document jsonb not null,
      note text not null default '',
      saved_by uuid not null,
      saved_at timestamptz not null default now(),

      constraint revisions_pkey primary key (recipe_id, number),
      constraint revisions_recipe_fkey foreign key (recipe_id) references recipes (id) on delete cascade,
      constraint revisions_saved_by_fkey foreign key (saved_by) references people (id)
    );

    create function refuse_change() returns trigger language plpgsql as $$
    begin
      raise exception '% never changes once it is written', tg_table_name using errcode = 'restrict_violation';
    end $$;
    create trigger revisions_never_change before update on revisions for each row execute function refuse_change();

    -- Which recipes the current revision of a recipe uses, for naming cycles and for uses of a component.
    create table recipe_components (
      recipe_id uuid not null,
      component_id uuid not null,

      constraint recipe_components_pkey primary key (recipe_id, component_id),
      constraint recipe_components_recipe_fkey foreign key (recipe_id) references recipes (id) on delete cascade,
      constraint recipe_components_component_fkey foreign key (component_id) references recipes (id),
      constraint recipe_components_self_check check (recipe_id <> component_id)
    );
    create index recipe_components_component_idx on recipe_components (component_id);

    create table recipe_queries (
      id uuid primary key default gen_random_uuid(),
      recipe_id uuid not null,
      state text not null default 'open',
      question text not null,
      asked_by uuid not null,
      asked_at timestamptz not null default now(),
      answer text,
      answered_by uuid,
      answered_at timestamptz,

      constraint recipe_queries_recipe_fkey foreign key (recipe_id) references recipes (id) on delete cascade,
      constraint recipe_queries_asked_by_fkey foreign key (asked_by) references people (id),
      constraint recipe_queries_answered_by_fkey foreign key (answered_by) references people (id),
      constraint recipe_queries_state_check check (state in ('open', 'answered', 'closed'))
    );
    create index recipe_queries_recipe_idx on recipe_queries (recipe_id, state);
  `);
}

export async function down(db: Knex): Promise<void> {
  await db.raw(`
    drop table recipe_queries, recipe_components, revisions, recipes, plates, shoots, larder_items;
    drop function refuse_change();
  `);
}
