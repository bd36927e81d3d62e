import type { Knex } from 'knex';
import { act } from './billing/act.ts';
import { movableNow, readControl, updateControl } from './control-settings.ts';
import { invalid } from './errors.ts';
import { SCHEMA, takeTurn } from './schema.ts';
import { change, MOVABLE, readKept } from './store.ts';
import type { Kind, Kinds } from './wire.ts';
import { NO_REQUEST, type Work } from './work.ts';

interface DueRow {
  id: string;
  kind: Kind;
  due_at: string;
}

async function nextDue(db: Knex, timeline: string, until: number): Promise<DueRow | undefined> {
  return db
    .withSchema(SCHEMA)
    .table('objects')
    .where({ timeline })
    .where('due_at', '<=', until)
    .orderBy(['due_at', 'seq'])
    .first<DueRow | undefined>('id', 'kind', 'due_at');
}

/** Acts out, in the order of time, everything that falls due on the movable clock up to `until`. */
async function catchUp(work: Work, until: number): Promise<void> {
  for (;;) {
    const due = await nextDue(work.db, MOVABLE, until);
    if (!due) return;
    await act({ ...work, now: Number(due.due_at) }, due.kind, due.id);
  }
}

/** Begins a change that no request asked for. */
async function ownWork<T>(db: Knex, origin: string, run: (work: Work) => Promise<T>): Promise<T> {
  return db.transaction(async (trx) => {
    await takeTurn(trx);
    const control = await readControl(trx);
    return run({ db: trx, now: movableNow(control), dunning: control.dunning, request: NO_REQUEST, origin });
  });
}

/** Acts out what fell due by itself, and finishes test clocks that are advancing. */
export async function tick(db: Knex, origin: string): Promise<void> {
  await ownWork(db, origin, async (work) => {
    await catchUp(work, work.now);
    const advancing = await work.db
      .withSchema(SCHEMA)
      .table('objects')
      .where({ kind: 'test_helpers.test_clock' })
      .whereRaw("data ->> 'status' = 'advancing'")
      .select<{ id: string }[]>('id');
    for (const { id } of advancing) await finishAdvance(work, id);
  });
}

/** Moves the movable clock forward, acting out what lies between; returns the instant it stands at. */
export async function moveClock(db: Knex, origin: string, to: (now: number) => number): Promise<number> {
  return ownWork(db, origin, async (work) => {
    const target = to(work.now);
    if (target < work.now) throw invalid('The clock moves forward only.', 'now');
    await catchUp(work, target);
    const control = await readControl(work.db);
    await updateControl(work.db, { clockOffset: control.clockOffset + target - work.now });
    return target;
  });
}

/** Advances a test clock to an instant and waits until it is there. */
export async function advanceTestClock(db: Knex, origin: string, id: string, to: number) {
  return ownWork(db, origin, async (work) => {
    await beginAdvance(work, id, to);
    return finishAdvance(work, id);
  });
}

/** Sets a test clock going; it is `advancing` until `finishAdvance` has acted everything out. */
export async function beginAdvance(work: Work, id: string, to: number): Promise<Kinds['test_helpers.test_clock']> {
  const kept = await readKept(work.db, 'test_helpers.test_clock', id);
  if (kept.data.status !== 'ready') throw invalid('The test clock is still advancing.', 'test_clock');
  if (to <= kept.data.frozen_time)
    throw invalid('frozen_time must be after the time of the test clock.', 'frozen_time');
  const after = {
    ...kept.data,
    status: 'advancing' as const,
    status_details: { advancing: { target_frozen_time: to } },
  };
  return change(work, kept, after, { event: 'test_helpers.test_clock.advancing' });
}

async function finishAdvance(work: Work, id: string): Promise<Kinds['test_helpers.test_clock']> {
  const start = await readKept(work.db, 'test_helpers.test_clock', id);
  const target = start.data.status_details.advancing?.target_frozen_time ?? start.data.frozen_time;
  for (;;) {
    const due = await nextDue(work.db, id, target);
    if (!due) break;
    const kept = await readKept(work.db, 'test_helpers.test_clock', id);
    const frozen = Math.max(kept.data.frozen_time, Number(due.due_at));
    await change(work, kept, { ...kept.data, frozen_time: frozen });
    await act(work, due.kind, due.id);
  }
  const kept = await readKept(work.db, 'test_helpers.test_clock', id);
  const after = { ...kept.data, frozen_time: target, status: 'ready' as const, status_details: {} };
  return change(work, kept, after, { event: 'test_helpers.test_clock.ready' });
}
