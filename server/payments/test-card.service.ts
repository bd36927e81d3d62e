import type { AppContext } from '../context.ts';
import { findMembership } from '../memberships/memberships.queries.ts';
import type { PersonRow } from '../people/people.rows.ts';
import { tierNotFound } from '../tiers/tiers.errors.ts';
import { findTier } from '../tiers/tiers.queries.ts';
import { callStripe, idempotencyKey } from './call-stripe.ts';
import { converge } from './converge.service.ts';
import { ensureCustomer } from './customers.service.ts';
import { checkoutTierWaiting } from './payments.errors.ts';

/** Makes a person a member by the month with the payment service's own test card; only a test account has that. */
export async function joinWithTestCard(ctx: AppContext, person: PersonRow, tierId: string): Promise<void> {
  const { db, stripe } = ctx;
  const tier = await findTier(db, tierId);
  if (!tier) throw tierNotFound();
  const price = tier.stripe_monthly_price;
  if (!price) throw checkoutTierWaiting();

  const customer = await ensureCustomer(ctx, person);
  await converge(ctx, customer);
  if (await findMembership(db, person.id)) return;
  await callStripe(async () => {
    const card = await stripe.paymentMethods.attach(
      'pm_card_visa',
      { customer },
      { idempotencyKey: idempotencyKey('test card', customer) },
    );
    await stripe.subscriptions.create(
      { customer, items: [{ price }], default_payment_method: card.id, metadata: { personId: person.id, tierId } },
      { idempotencyKey: idempotencyKey('test membership', customer, price) },
    );
  });
  await converge(ctx, customer);
}
