import type { Knex } from 'knex';

export async function up(db: Knex): Promise<void> {
  await db.raw(`
    create table tiers (
      id uuid primary key default gen_random_uuid(),
      rank integer not null,
      name text not null,
      description text not null default '',
      perks text[] not null default '{}',
      monthly integer not null,
      yearly integer not null,
      currency text not null,
      stripe_product text,
      stripe_monthly_price text,
      stripe_yearly_price text,
      sync text not null default 'waiting',
      sync_fault text,
      closed_at timestamptz,
      version integer not null default 1,
      created_at timestamptz not null default now(),

      constraint tiers_rank_check check (rank >= 1 and rank <= 20),
      constraint tiers_monthly_check check (monthly >= 0),
      constraint tiers_yearly_check check (yearly >= 0),
      constraint tiers_sync_check check (sync in ('waiting', 'in-step', 'failed'))
    );
    -- A closed tier keeps its members but gives its rank free.
    create unique index tiers_rank_key on tiers (rank) where closed_at is null;

    create table customers (
      person_id uuid primary key,
      stripe_customer text not null,

      constraint customers_person_fkey foreign key (person_id) references people (id) on delete cascade,
      constraint customers_stripe_customer_key unique (stripe_customer)
    );

    create table memberships (
      person_id uuid primary key,
      tier_id uuid not null,
      stripe_subscription text not null,
      state text not null,
      payment_interval text not null,
      price integer not null,
      currency text not null,
      period_end timestamptz not null,
      -- The end of the last period that was paid for; null where nothing was.
      paid_until timestamptz,
      -- The moment it ends, or ended, when it was cancelled; null while it renews.
      ends_at timestamptz,
      past_due_since timestamptz,
      converged_at timestamptz not null,

      constraint memberships_person_fkey foreign key (person_id) references people (id) on delete cascade,
      constraint memberships_tier_fkey foreign key (tier_id) references tiers (id),
      constraint memberships_interval_check check (payment_interval in ('month', 'year')),
      constraint memberships_state_check check (state in
        ('incomplete', 'incomplete_expired', 'trialing', 'active', 'past_due', 'canceled', 'unpaid', 'paused'))
    );
    create index memberships_tier_idx on memberships (tier_id);

    create table receipts (
      stripe_invoice text primary key,
      person_id uuid not null,
      number text not null,
      amount integer not null,
      currency text not null,
      tier_name text not null,
      href text,
      paid_at timestamptz not null,

      constraint receipts_person_fkey foreign key (person_id) references people (id) on delete cascade
    );
    create index receipts_person_idx on receipts (person_id, paid_at desc);

    create table stripe_events (
      id text primary key,
      type text not null,
      stripe_customer text,
      received_at timestamptz not null default now(),
      converged_at timestamptz
    );

    -- What each letter was for, so that a job that runs twice sends once.
    create table letters (
      id uuid primary key default gen_random_uuid(),
      kind text not null,
      dedupe_key text,
      person_id uuid,
      recipient text not null,
      fields jsonb not null,
      created_at timestamptz not null default now(),
      sent_at timestamptz,

      constraint letters_person_fkey foreign key (person_id) references people (id) on delete set null,
      constraint letters_dedupe_key unique (dedupe_key)
    );
  `);
}

export async function down(db: Knex): Promise<void> {
  await db.raw('drop table letters, stripe_events, receipts, memberships, customers, tiers');
}
