import type { AccountView, MembershipView, Receipt } from '../../shared/contracts/membership.ts';
import type { AppContext } from '../context.ts';
import { entitledRank } from '../gate/entitlement.ts';
import { readImprint } from '../imprint/imprint.queries.ts';
import { converge } from '../payments/converge.service.ts';
import { endAtPeriodEnd, keepRunning, openCardPage } from '../payments/subscriptions.service.ts';
import { membershipNone } from './memberships.errors.ts';
import { findCustomerOf, findMembership, findReceipts, type HeldMembershipRow } from './memberships.queries.ts';
import type { MembershipRow, ReceiptRow } from './memberships.rows.ts';

/** A person's membership and what they paid. */
export async function viewAccount(ctx: AppContext, personId: string): Promise<AccountView> {
  const [membership, receipts] = await Promise.all([viewMembership(ctx, personId), findReceipts(ctx.db, personId)]);
  return { membership, receipts: receipts.map(toReceipt) };
}

/** A person's membership as it stands at this moment; null where there never was one. */
export async function viewMembership({ db, now }: AppContext, personId: string): Promise<MembershipView | null> {
  const [row, imprint] = await Promise.all([findMembership(db, personId), readImprint(db)]);
  return row ? toView(row, entitledRank(toEntitlement(row), imprint.grace_days, now()) > 0) : null;
}

/** Lets the membership end with the period that is paid. */
export async function cancelMembership(ctx: AppContext, personId: string): Promise<AccountView> {
  const { subscription, customer } = await readRunning(ctx, personId);
  const running = await endAtPeriodEnd(ctx, subscription);
  await converge(ctx, customer);
  if (!running) throw membershipNone();
  return viewAccount(ctx, personId);
}

/** Takes a cancellation back, as long as the membership still runs. */
export async function resumeMembership(ctx: AppContext, personId: string): Promise<AccountView> {
  const { subscription, customer } = await readRunning(ctx, personId);
  const running = await keepRunning(ctx, subscription);
  await converge(ctx, customer);
  if (!running) throw membershipNone();
  return viewAccount(ctx, personId);
}

/** The payment service's own page for changing the card. */
export async function startCardChange(ctx: AppContext, personId: string): Promise<{ href: string }> {
  const customer = await findCustomerOf(ctx.db, personId);
  if (!customer) throw membershipNone();
  return { href: await openCardPage(ctx, customer.stripe_customer) };
}

/** Fetches a person's truth from the payment service now. */
export async function convergeMember(ctx: AppContext, personId: string): Promise<AccountView> {
  const customer = await findCustomerOf(ctx.db, personId);
  if (!customer) throw membershipNone();
  await converge(ctx, customer.stripe_customer);
  return viewAccount(ctx, personId);
}

async function readRunning({ db }: AppContext, personId: string): Promise<{ subscription: string; customer: string }> {
  const [membership, customer] = await Promise.all([findMembership(db, personId), findCustomerOf(db, personId)]);
  if (!membership || !customer) throw membershipNone();
  return { subscription: membership.stripe_subscription, customer: customer.stripe_customer };
}

function toEntitlement(row: HeldMembershipRow) {
  const { rank, tier_name: tierName, state, paid_until: paidUntil, ends_at: endsAt } = row;
  return { rank, tierName, state, paidUntil, endsAt, pastDueSince: row.past_due_since };
}

function toView(row: HeldMembershipRow, opens: boolean): MembershipView {
  return {
    tier: { id: row.tier_id, rank: row.rank, name: row.tier_name },
    state: row.state,
    interval: row.payment_interval,
    price: row.price,
    currency: row.currency,
    periodEnd: endOf(row, opens).toISOString(),
    endsThen: row.ends_at !== null,
    opens,
  };
}

/** One that was ended early is read to the end of what was paid. */
function endOf(
  { state, ends_at: endsAt, paid_until: paidUntil, period_end: periodEnd }: MembershipRow,
  opens: boolean,
) {
  if (state === 'canceled' && opens && paidUntil) return paidUntil;
  return endsAt ?? periodEnd;
}

function toReceipt(row: ReceiptRow): Receipt {
  return {
    id: row.stripe_invoice,
    number: row.number,
    paidAt: row.paid_at.toISOString(),
    amount: row.amount,
    currency: row.currency,
    tierName: row.tier_name,
    href: row.href,
  };
}
