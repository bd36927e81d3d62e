import type { Knex } from 'knex';
import type { z } from 'zod';
import type { TierDraft, TierPublic, TierView } from '../../shared/contracts/tiers.ts';
import type { tierLadder } from '../../shared/contracts/tiers.ts';
import type { AppContext } from '../context.ts';
import { decide, type GateViewer } from '../gate/gate.ts';
import { versionConflict } from '../http/http.errors.ts';
import { readImprint } from '../imprint/imprint.queries.ts';
import { addJob } from '../jobs/queue.ts';
import { tierNotFound } from './tiers.errors.ts';
import {
  countMembers,
  findIssuedEntries,
  findOpenTiers,
  findTier,
  findTiers,
  insertTier,
  updateTier,
  type BoundEntryRow,
  type TierRow,
} from './tiers.queries.ts';

/** The ladder as visitors compare it, lowest first, with the number of recipes that each rank opens now. */
export async function viewLadder({ db, now }: AppContext): Promise<z.input<typeof tierLadder>> {
  const [tiers, entries] = await Promise.all([findOpenTiers(db), findIssuedEntries(db)]);
  return { tiers: tiers.map((tier) => toPublic(tier, countOpen(entries, tier.rank, now()))) };
}

function countOpen(entries: readonly BoundEntryRow[], rank: number, now: Date): number {
  const member: GateViewer = { staff: false, signedIn: true, verified: true, rank };
  const open = entries.filter(({ opens, ...entry }) => {
    const moments = opens.map(({ rank, at }) => ({ rank, at: new Date(at) }));
    return decide({ ...entry, opens: moments }, member, now).open;
  });
  return new Set(open.map((entry) => entry.recipe_id)).size;
}

/** Every tier as the office sees it. */
export async function listTiers(db: Knex): Promise<TierView[]> {
  const [tiers, members] = await Promise.all([findTiers(db), countMembers(db)]);
  return tiers.map((tier) => toView(tier, members.get(tier.id) ?? 0));
}

/** Opens a tier for sale; the payment service is told by a job that exists only if this commits. */
export async function makeTier({ db }: AppContext, draft: TierDraft): Promise<TierView> {
  return db.transaction(async (trx) => {
    const { currency } = await readImprint(trx);
    const row = await insertTier(trx, { ...draft, currency });
    await enqueueSync(trx, row.id);
    return toView(row, 0);
  });
}

/** Changes a tier. Members who hold it keep the price they joined at. */
export async function saveTier(
  { db }: AppContext,
  { id, draft, expected }: { id: string; draft: TierDraft; expected: number },
): Promise<TierView> {
  return change(db, { id, expected, values: draft });
}

/** Closes a tier: nobody can join it any more, those who hold it keep it. */
export async function closeTier({ db, now }: AppContext, id: string): Promise<TierView> {
  const tier = await findTier(db, id);
  if (!tier) throw tierNotFound();
  if (tier.closed_at) return toView(tier, (await countMembers(db)).get(id) ?? 0);
  return change(db, { id, expected: tier.version, values: { closed_at: now() } });
}

async function change(
  db: Knex,
  { id, expected, values }: { id: string; expected: number; values: Partial<TierRow> },
): Promise<TierView> {
  return db.transaction(async (trx) => {
    const row = await updateTier(trx, { id, expected }, { ...values, sync: 'waiting', sync_fault: null });
    if (!row) throw (await findTier(trx, id)) ? versionConflict() : tierNotFound();
    await enqueueSync(trx, id);
    return toView(row, (await countMembers(trx)).get(id) ?? 0);
  });
}

async function enqueueSync(trx: Knex, tierId: string): Promise<void> {
  await addJob(trx, 'sync-tier', { tierId }, { key: `sync-tier:${tierId}` });
}

function toDraft({ rank, name, description, perks, monthly, yearly }: TierRow): TierDraft {
  return { rank, name, description, perks, monthly, yearly };
}

function toPublic(row: TierRow, recipeCount: number): TierPublic {
  return { ...toDraft(row), id: row.id, currency: row.currency, recipeCount };
}

function toView(row: TierRow, members: number): TierView {
  const { id, version, currency, sync, sync_fault: syncFault, closed_at: closedAt } = row;
  return { ...toDraft(row), id, version, currency, sync, syncFault, members, closed: closedAt !== null };
}
