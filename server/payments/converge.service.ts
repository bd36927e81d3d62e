import type { Knex } from 'knex';
import type { AppContext } from '../context.ts';
import { withLock } from '../db/lock.ts';
import { queueLetter } from '../letters/letters.ts';
import {
  deleteMembership,
  findCustomer,
  insertReceipts,
  upsertMembership,
} from '../memberships/memberships.queries.ts';
import { findPerson } from '../people/people.queries.ts';
import type { PersonRow } from '../people/people.rows.ts';
import { findTiers } from '../tiers/tiers.queries.ts';
import { callStripe } from './call-stripe.ts';
import { findWaitingEvents, markConverged } from './events.queries.ts';
import { pickSubscription, readReceipts, type ReadSubscription, type Truth } from './read-truth.ts';

/**
 * Fetches what the payment service says of a customer and writes it: membership, receipts, letters. The one way by
 * which money becomes a right to read. It may be called at any time, any number of times: one customer's calls run one
 * after the other, each fetches anew, and each writes all or nothing. A customer who is not ours is left alone.
 */
export async function converge(ctx: AppContext, stripeCustomer: string): Promise<void> {
  await withCustomer(ctx.db, stripeCustomer, async (trx) => {
    const customer = await findCustomer(trx, stripeCustomer);
    const person = customer && (await findPerson(trx, customer.person_id));
    if (!person) return;
    const events = await findWaitingEvents(trx, stripeCustomer);
    const truth = await callStripe(() => fetchTruth(ctx, stripeCustomer));
    await writeTruth(ctx, trx, person, truth);
    await markConverged(trx, events, ctx.now());
  });
}

/** Work on one customer, one piece at a time. */
export function withCustomer<T>(
  db: Knex,
  stripeCustomer: string,
  work: (trx: Knex.Transaction) => Promise<T>,
): Promise<T> {
  return withLock(db, `stripe-customer:${stripeCustomer}`, work);
}

async function fetchTruth({ stripe }: AppContext, customer: string): Promise<Truth> {
  const subscriptions = await stripe.subscriptions
    .list({ customer, status: 'all', limit: 100 })
    .autoPagingToArray({ limit: 1000 });
  const invoices = await stripe.invoices.list({ customer, limit: 100 }).autoPagingToArray({ limit: 1000 });
  return { subscriptions, invoices };
}

async function writeTruth(ctx: AppContext, trx: Knex, person: PersonRow, truth: Truth): Promise<void> {
  const tiers = await findTiers(trx);
  const picked = pickSubscription(truth, tiers);
  const receipts = readReceipts(truth, tiers).map((receipt) => ({ ...receipt, person_id: person.id }));

  if (picked) {
    const { tier: _tier, endAskedAt: _asked, failedInvoice: _failed, ...columns } = picked;
    await upsertMembership(trx, { ...columns, person_id: person.id, converged_at: ctx.now() });
  } else await deleteMembership(trx, person.id);

  await insertReceipts(trx, receipts);
  for (const receipt of receipts) {
    const { number, amount, currency, tier_name: tierName, paid_at: paidAt, href } = receipt;
    await queueLetter(trx, {
      kind: 'receipt',
      to: person.email,
      personId: person.id,
      fields: { name: person.name, number, amount, currency, tierName, paidAt: paidAt.toISOString(), href },
      dedupeKey: `receipt:${receipt.stripe_invoice}`,
    });
  }
  if (picked) await writeAboutEnd(ctx, trx, person, picked);
}

async function writeAboutEnd(
  { settings }: AppContext,
  trx: Knex,
  { id: personId, email: to, name }: PersonRow,
  picked: ReadSubscription,
): Promise<void> {
  const tierName = picked.tier.name;
  const endsAt = lastDay(picked);
  if (endsAt && picked.endAskedAt)
    await queueLetter(trx, {
      kind: 'cancelled',
      to,
      personId,
      fields: { name, tierName, endsAt: endsAt.toISOString() },
      // Whoever cancels, stays after all and cancels again is told again.
      dedupeKey: `cancelled:${picked.stripe_subscription}:${picked.endAskedAt.getTime()}`,
    });
  if (picked.failedInvoice)
    await queueLetter(trx, {
      kind: 'payment-failed',
      to,
      personId,
      fields: { name, tierName, link: `${settings.publicUrl}/account` },
      dedupeKey: `payment-failed:${picked.failedInvoice}`,
    });
}

/** One that was ended early is read to the end of what was paid. */
function lastDay({ state, ends_at: endsAt, paid_until: paidUntil }: ReadSubscription): Date | null {
  return state === 'canceled' && endsAt && paidUntil && endsAt < paidUntil ? paidUntil : endsAt;
}
