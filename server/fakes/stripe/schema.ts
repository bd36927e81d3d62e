import type { Knex } from 'knex';

export const SCHEMA = 'stripe_fake';

/** Any two processes or requests that change the fake's state take turns on this lock. */
const LOCK = 7_340_221;

/**
 * Makes the fake's own schema when it is not there yet. Objects are kept as they go over the wire,
 * beside what the API never shows (`hidden`) and when they next need attention (`due_at`, seconds on `timeline`).
 */
export async function createSchema(db: Knex): Promise<void> {
  await db.transaction(async (trx) => {
    await takeTurn(trx);
    await trx.raw(`
      create schema if not exists ${SCHEMA};

      create table if not exists ${SCHEMA}.objects (
        id text primary key,
        seq bigint generated always as identity,
        kind text not null,
        timeline text not null,
        due_at bigint,
        data jsonb not null,
        hidden jsonb not null
      );
      create index if not exists objects_kind_seq on ${SCHEMA}.objects (kind, seq);
      create index if not exists objects_due on ${SCHEMA}.objects (timeline, due_at) where due_at is not null;
      create index if not exists objects_customer on ${SCHEMA}.objects ((data ->> 'customer'), kind);

      create table if not exists ${SCHEMA}.events (
        id text primary key,
        seq bigint generated always as identity,
        data jsonb not null,
        recorded_at timestamptz not null default now(),
        attempts integer not null default 0,
        next_attempt_at timestamptz default now(),
        delivered_at timestamptz
      );
      create index if not exists events_seq on ${SCHEMA}.events (seq);
      create index if not exists events_next_attempt on ${SCHEMA}.events (next_attempt_at) where next_attempt_at is not null;

      create table if not exists ${SCHEMA}.idempotency (
        key text primary key,
        request text not null,
        recorded_at timestamptz not null default now(),
        status integer,
        body jsonb
      );

      create table if not exists ${SCHEMA}.control (
        id integer primary key default 1,
        settings jsonb not null,
        constraint control_one_row check (id = 1)
      );
    `);
    // Nobody is still at work on a request of an earlier process.
    await trx.raw(`delete from ${SCHEMA}.idempotency where status is null`);
  });
}

/** Waits until no other change is under way; held to the end of the transaction. */
export async function takeTurn(trx: Knex.Transaction): Promise<void> {
  await trx.raw('select pg_advisory_xact_lock(?)', [LOCK]);
}

/** Forgets everything: objects, events, remembered answers and control settings. */
export async function emptySchema(trx: Knex.Transaction): Promise<void> {
  await trx.raw(
    `truncate ${SCHEMA}.objects, ${SCHEMA}.events, ${SCHEMA}.idempotency, ${SCHEMA}.control restart identity`,
  );
}
