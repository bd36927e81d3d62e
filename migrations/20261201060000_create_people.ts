import type { Knex } from 'knex';

export async function up(db: Knex): Promise<void> {
  await db.raw(`
    create table imprint (
      id boolean primary key default true,
      name text not null,
      currency text not null,
      zone text not null,
      age_limit integer not null,
      grace_days integer not null,
      terms text not null,
      privacy text not null,
      version integer not null default 1,

      constraint imprint_single_row check (id),
      constraint imprint_age_limit_check check (age_limit >= 16 and age_limit <= 25),
      constraint imprint_grace_days_check check (grace_days >= 0 and grace_days <= 60)
    );

    create table people (
      id uuid primary key default gen_random_uuid(),
      email text not null,
      name text not null,
      password_hash text not null,
      verified_at timestamptz,
      roles text[] not null default '{}',
      age_confirmed_at timestamptz,
      version integer not null default 1,
      created_at timestamptz not null default now(),

      constraint people_email_lower_check check (email = lower(email)),
      constraint people_email_key unique (email),
      constraint people_roles_check check (roles <@ array['creator', 'editor', 'admin'])
    );

    create table people_tokens (
      token_hash text primary key,
      person_id uuid not null,
      purpose text not null,
      new_email text,
      expires_at timestamptz not null,
      created_at timestamptz not null default now(),

      constraint people_tokens_person_fkey foreign key (person_id) references people (id) on delete cascade,
      constraint people_tokens_purpose_check check (purpose in ('verify', 'reset', 'change-email'))
    );
    create index people_tokens_person_idx on people_tokens (person_id, purpose);

    -- Laid out as connect-pg-simple reads and writes it.
    create table sessions (
      sid text primary key,
      sess json not null,
      expire timestamptz not null
    );
    create index sessions_expire_idx on sessions (expire);
    create index sessions_person_idx on sessions ((sess #>> '{passport,user}'));

    -- Laid out as rate-limiter-flexible reads and writes it.
    create table failure_limits (
      key text primary key,
      points integer not null default 0,
      expire bigint
    );
  `);
}

export async function down(db: Knex): Promise<void> {
  await db.raw('drop table failure_limits, sessions, people_tokens, people, imprint');
}
