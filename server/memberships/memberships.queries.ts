import type { Knex } from 'knex';
import type { CustomerRow, MembershipRow, ReceiptRow } from './memberships.rows.ts';

export type HeldMembershipRow = MembershipRow & { rank: number; tier_name: string };

/** A person's membership with the tier it holds. */
export async function findMembership(db: Knex, personId: string): Promise<HeldMembershipRow | undefined> {
  return db('memberships')
    .join('tiers', 'tiers.id', 'memberships.tier_id')
    .where('memberships.person_id', personId)
    .first<HeldMembershipRow | undefined>('memberships.*', 'tiers.rank', 'tiers.name as tier_name');
}

export async function upsertMembership(db: Knex, values: MembershipRow): Promise<void> {
  await db('memberships').insert(values).onConflict('person_id').merge();
}

export async function deleteMembership(db: Knex, personId: string): Promise<void> {
  await db('memberships').where({ person_id: personId }).delete();
}

export async function findReceipts(db: Knex, personId: string): Promise<ReceiptRow[]> {
  return db('receipts').where({ person_id: personId }).orderBy('paid_at', 'desc').orderBy('number', 'desc');
}

/** Writes receipts that are not there yet and leaves the others. */
export async function insertReceipts(db: Knex, rows: ReceiptRow[]): Promise<void> {
  if (rows.length > 0) await db('receipts').insert(rows).onConflict('stripe_invoice').ignore();
}

export async function findCustomerOf(db: Knex, personId: string): Promise<CustomerRow | undefined> {
  return db('customers').where({ person_id: personId }).first();
}

export async function findCustomer(db: Knex, stripeCustomer: string): Promise<CustomerRow | undefined> {
  return db('customers').where({ stripe_customer: stripeCustomer }).first();
}

export async function insertCustomer(db: Knex, values: CustomerRow): Promise<void> {
  await db('customers').insert(values);
}

export async function findAllCustomers(db: Knex): Promise<CustomerRow[]> {
  return db('customers').orderBy('stripe_customer');
}
