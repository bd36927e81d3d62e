import type { Knex } from 'knex';
import type { Stripe } from 'stripe';
import type { AppContext } from '../context.ts';
import { withLock } from '../db/lock.ts';
import type { PaymentInterval } from '../../shared/contracts/membership.ts';
import { findTier, type TierRow } from '../tiers/tiers.queries.ts';
import { idempotencyKey, isRefusedRequest } from './call-stripe.ts';

/**
 * Brings the payment service in step with a tier: its product, and a price for each interval. Amounts of a price never
 * change, so another amount is another price; the old one is archived and keeps being charged to those who joined at
 * it. Everything is named by the tier's id and looked up before it is made, so that it may run twice and be killed.
 */
export async function syncTier(ctx: AppContext, { tierId }: { tierId: string }): Promise<void> {
  try {
    await withLock(ctx.db, `sync-tier:${tierId}`, async (trx) => {
      const tier = await findTier(trx, tierId);
      if (tier) await sync(ctx, trx, tier);
    });
  } catch (error) {
    const fault = error instanceof Error ? error.message : 'The payment service refused without a word.';
    await ctx.db('tiers').where({ id: tierId }).update({ sync: 'failed', sync_fault: fault });
    throw error;
  }
}

async function sync({ stripe }: AppContext, trx: Knex, tier: TierRow): Promise<void> {
  const product = await ensureProduct(stripe, tier);
  const active = await stripe.prices.list({ product, active: true, limit: 100 }).autoPagingToArray({ limit: 1000 });
  const chosen = tier.closed_at ? null : await choosePrices(stripe, tier, active, product);
  const kept = chosen ? Object.values(chosen) : [];
  for (const { id } of active) if (!kept.includes(id)) await stripe.prices.update(id, { active: false });

  await trx('tiers')
    .where({ id: tier.id })
    .update({
      stripe_product: product,
      ...(chosen ? { stripe_monthly_price: chosen.month, stripe_yearly_price: chosen.year } : {}),
    });
  // A tier that was changed meanwhile waits for its own run.
  await trx('tiers').where({ id: tier.id, version: tier.version }).update({ sync: 'in-step', sync_fault: null });
}

async function ensureProduct(stripe: Stripe, tier: TierRow): Promise<string> {
  const id = tier.stripe_product ?? `tier_${tier.id}`;
  const fields = { name: tier.name, active: tier.closed_at === null, metadata: { tierId: tier.id } };
  try {
    const { id: known } = await stripe.products.update(id, { ...fields, description: tier.description });
    return known;
  } catch (error) {
    if (!isRefusedRequest(error, 'resource_missing')) throw error;
    const description = tier.description ? { description: tier.description } : {};
    return (await stripe.products.create({ id, ...fields, ...description })).id;
  }
}

async function choosePrices(
  stripe: Stripe,
  tier: TierRow,
  active: readonly Stripe.Price[],
  product: string,
): Promise<Record<PaymentInterval, string>> {
  const currency = tier.currency.toLowerCase();
  const choose = async (interval: PaymentInterval, amount: number): Promise<string> => {
    const same = active.find(
      (price) => price.unit_amount === amount && price.currency === currency && price.recurring?.interval === interval,
    );
    if (same) return same.id;
    const params: Stripe.PriceCreateParams = {
      product,
      currency,
      unit_amount: amount,
      recurring: { interval },
      lookup_key: `tier:${tier.id}:${interval}`,
      transfer_lookup_key: true,
      metadata: { tierId: tier.id },
    };
    // The version tells a price that comes back from the archived one of the same amount.
    const key = idempotencyKey('price', tier.version, params);
    return (await stripe.prices.create(params, { idempotencyKey: key })).id;
  };
  return { month: await choose('month', tier.monthly), year: await choose('year', tier.yearly) };
}
