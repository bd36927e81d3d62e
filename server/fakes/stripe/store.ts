import type { Knex } from 'knex';
import { dueAt } from './due.ts';
import { invalid, missing } from './errors.ts';
import { emit, previousAttributes } from './events.ts';
import type { Hidden } from './hidden.ts';
import type { Paging, Range } from './params.ts';
import { SCHEMA } from './schema.ts';
import type { EventType, Kind, Kinds, WireList } from './wire.ts';
import type { Work } from './work.ts';

/** The timeline of everything that is not on a test clock. */
export const MOVABLE = '';

export interface Kept<K extends Kind> {
  data: Kinds[K];
  hidden: Hidden;
}

function objects(db: Knex) {
  return db.withSchema(SCHEMA).table('objects');
}

export async function findKept<K extends Kind>(db: Knex, kind: K, id: string): Promise<Kept<K> | undefined> {
  return objects(db).where({ id, kind }).first<Kept<K> | undefined>('data', 'hidden');
}

/** Reads an object with what the fake remembers beside it; refuses as the API does when there is none. */
export async function readKept<K extends Kind>(db: Knex, kind: K, id: string, param?: string): Promise<Kept<K>> {
  const kept = await findKept(db, kind, id);
  if (!kept) throw missing(kind.split('.').at(-1)!.replaceAll('_', ' '), id, param);
  return kept;
}

export async function read<K extends Kind>(db: Knex, kind: K, id: string, param?: string): Promise<Kinds[K]> {
  return (await readKept(db, kind, id, param)).data;
}

/** The object of any kind behind an id, for expansion. */
export async function findAny(db: Knex, id: string): Promise<Kinds[Kind] | undefined> {
  const row = await objects(db).where({ id }).first<{ data: Kinds[Kind] } | undefined>('data');
  return row?.data;
}

function testClockOf(data: Kinds[Kind]): string {
  return 'test_clock' in data && data.test_clock ? data.test_clock : MOVABLE;
}

/** Seconds on the clock that an object or customer lives by. */
export async function instantOf(work: Work, data: { test_clock?: string | null }): Promise<number> {
  if (!data.test_clock) return work.now;
  return (await read(work.db, 'test_helpers.test_clock', data.test_clock)).frozen_time;
}

async function eventTime(work: Work, data: Kinds[Kind]): Promise<number> {
  return instantOf(work, { test_clock: testClockOf(data) });
}

/** Keeps a new object and records its event. */
export async function create<K extends Kind>(
  work: Work,
  kind: K,
  data: Kinds[K],
  { hidden = {}, event }: { hidden?: Hidden; event?: EventType } = {},
): Promise<Kinds[K]> {
  await objects(work.db).insert({
    id: data.id,
    kind,
    timeline: testClockOf(data),
    due_at: dueAt(data, hidden),
    data: JSON.stringify(data),
    hidden: JSON.stringify(hidden),
  });
  if (event) await emit(work, event, await eventTime(work, data), data);
  return data;
}

/** Keeps a changed object; its event carries the former values, and nothing changed means no event. */
export async function change<K extends Kind>(
  work: Work,
  before: Kept<K>,
  after: Kinds[K],
  { hidden = before.hidden, event }: { hidden?: Hidden; event?: EventType } = {},
): Promise<Kinds[K]> {
  await objects(work.db)
    .where({ id: after.id })
    .update({ due_at: dueAt(after, hidden), data: JSON.stringify(after), hidden: JSON.stringify(hidden) });
  const previous = previousAttributes(before.data, after);
  if (event && Object.keys(previous).length > 0) await emit(work, event, await eventTime(work, after), after, previous);
  return after;
}

export async function remove(db: Knex, id: string): Promise<void> {
  await objects(db).where({ id }).delete();
}

/** All objects of a kind whose fields have these values, newest first. */
export async function all<K extends Kind>(db: Knex, kind: K, fields: Record<string, string> = {}): Promise<Kept<K>[]> {
  const query = objects(db).where({ kind });
  for (const [field, value] of Object.entries(fields)) void query.whereRaw('data ->> ? = ?', [field, value]);
  return query.orderBy('seq', 'desc').select<Kept<K>[]>('data', 'hidden');
}

export interface ListQuery {
  paging: Paging;
  /** Field (or path with dots) and the value it must have; undefined filters nothing. */
  equal?: Record<string, string | boolean | undefined>;
  oneOf?: Record<string, string[] | undefined>;
  created?: Range | undefined;
  refine?: (query: Knex.QueryBuilder) => void;
}

const COMPARISONS = { gt: '>', gte: '>=', lt: '<', lte: '<=' } as const;

function field(path: string): string {
  return `{${path.replaceAll('.', ',')}}`;
}

function filter(query: Knex.QueryBuilder, { equal = {}, oneOf = {}, created, refine }: ListQuery): void {
  for (const [path, value] of Object.entries(equal)) {
    if (value !== undefined) void query.whereRaw('data #>> ?::text[] = ?', [field(path), String(value)]);
  }
  for (const [path, values] of Object.entries(oneOf)) {
    if (values) void query.whereRaw('data #>> ?::text[] = any(?)', [field(path), values]);
  }
  for (const [name, value] of Object.entries(created ?? {})) {
    const operator = COMPARISONS[name as keyof typeof COMPARISONS];
    if (value !== undefined) void query.whereRaw(`(data ->> 'created')::bigint ${operator} ?`, [value]);
  }
  refine?.(query);
}

/** One page of a table with `id`, `seq` and `data`, newest first, by the API's cursors. */
export async function page<T>(table: Knex.QueryBuilder, url: string, list: ListQuery): Promise<WireList<T>> {
  const { limit = 10, starting_after: after, ending_before: before } = list.paging;
  if (after && before) throw invalid('You cannot use both starting_after and ending_before.', 'starting_after');

  const cursor = after ?? before;
  const query = table.clone();
  if (cursor) {
    const row = await table.clone().where({ id: cursor }).first<{ seq: string } | undefined>('seq');
    if (!row) throw missing('object', cursor, after ? 'starting_after' : 'ending_before');
    void query.where('seq', after ? '<' : '>', row.seq);
  }
  filter(query, list);
  const rows = await query
    .orderBy('seq', before ? 'asc' : 'desc')
    .limit(limit + 1)
    .select<{ data: T }[]>('data');

  const data = rows.slice(0, limit).map((row) => row.data);
  return { object: 'list', data: before ? data.reverse() : data, has_more: rows.length > limit, url };
}

export async function listOf<K extends Kind>(
  db: Knex,
  kind: K,
  url: string,
  list: ListQuery,
): Promise<WireList<Kinds[K]>> {
  return page<Kinds[K]>(objects(db).where({ kind }), url, list);
}
