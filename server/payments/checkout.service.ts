import type { Stripe } from 'stripe';
import type { z } from 'zod';
import {
  returnPath,
  type checkoutOutcome,
  type checkoutStart,
  type SubscriptionState,
} from '../../shared/contracts/membership.ts';
import type { AppContext } from '../context.ts';
import { requestNotFound } from '../http/http.errors.ts';
import type { Viewer } from '../http/viewer.ts';
import { findCustomerOf, findMembership } from '../memberships/memberships.queries.ts';
import { viewMembership } from '../memberships/memberships.service.ts';
import { tierNotFound } from '../tiers/tiers.errors.ts';
import { findTier, type TierRow } from '../tiers/tiers.queries.ts';
import { callStripe, idOf, isRefusedRequest } from './call-stripe.ts';
import { converge, withCustomer } from './converge.service.ts';
import { ensureCustomer } from './customers.service.ts';
import {
  checkoutAlreadyMember,
  checkoutNotVerified,
  checkoutTierClosed,
  checkoutTierWaiting,
} from './payments.errors.ts';

type Payer = NonNullable<Viewer['person']>;
type Wish = z.output<typeof checkoutStart>;

/** States that must be changed or ended before another membership can be bought. */
const HELD: readonly SubscriptionState[] = ['trialing', 'active', 'past_due', 'unpaid', 'paused'];

/** Opens the hosted page on which a verified person who holds no membership can buy one. */
export async function startCheckout(ctx: AppContext, payer: Payer, wish: Wish): Promise<{ href: string }> {
  if (!payer.verified) throw checkoutNotVerified();
  const price = await readPrice(ctx, wish);
  const customer = await ensureCustomer(ctx, payer);
  // What was just paid in another window is known before this one sells the same again.
  await converge(ctx, customer);
  const held = await findMembership(ctx.db, payer.id);
  if (held && HELD.includes(held.state)) throw checkoutAlreadyMember();
  return withCustomer(ctx.db, customer, async () => ({
    href: await callStripe(() => openPage(ctx, { payer, customer, price, wish })),
  }));
}

async function readPrice({ db }: AppContext, { tierId, interval }: Wish): Promise<string> {
  const tier = await findTier(db, tierId);
  if (!tier) throw tierNotFound();
  if (tier.closed_at) throw checkoutTierClosed();
  const price = priceOf(tier, interval);
  if (tier.sync !== 'in-step' || !price) throw checkoutTierWaiting();
  return price;
}

function priceOf(tier: TierRow, interval: Wish['interval']): string | null {
  return interval === 'month' ? tier.stripe_monthly_price : tier.stripe_yearly_price;
}

interface Order {
  payer: Payer;
  customer: string;
  price: string;
  wish: Wish;
}

/** The one open page of a customer: the same wish finds it again, another wish closes it, so that one is paid once. */
async function openPage({ stripe, settings }: AppContext, { payer, customer, price, wish }: Order): Promise<string> {
  const metadata = { personId: payer.id, tierId: wish.tierId, price, returnTo: wish.returnTo };
  const open = await stripe.checkout.sessions.list({ customer, status: 'open', limit: 100 });
  const same = open.data.find((session) => session.url && isSame(session.metadata, metadata));
  for (const session of open.data) if (session !== same) await expire(stripe, session.id);
  if (same?.url) return same.url;

  const session = await stripe.checkout.sessions.create({
    mode: 'subscription',
    customer,
    client_reference_id: payer.id,
    line_items: [{ price, quantity: 1 }],
    metadata,
    subscription_data: { metadata: { personId: payer.id, tierId: wish.tierId } },
    success_url: `${settings.publicUrl}/join/return?session={CHECKOUT_SESSION_ID}`,
    cancel_url: `${settings.publicUrl}${wish.returnTo}`,
  });
  return session.url!;
}

function isSame(kept: Stripe.Metadata | null, wanted: Record<string, string>): boolean {
  return Object.entries(wanted).every(([name, value]) => kept?.[name] === value);
}

async function expire(stripe: Stripe, session: string): Promise<void> {
  try {
    await stripe.checkout.sessions.expire(session);
  } catch (error) {
    // It was paid or had run out in this very moment.
    if (!isRefusedRequest(error)) throw error;
  }
}

/** What became of a hosted page that the person comes back from; only they are told. */
export async function finishCheckout(
  ctx: AppContext,
  payer: Payer,
  sessionId: string,
): Promise<z.input<typeof checkoutOutcome>> {
  const customer = await findCustomerOf(ctx.db, payer.id);
  const session = await readSession(ctx, sessionId);
  if (!customer || idOf(session.customer) !== customer.stripe_customer) throw requestNotFound();

  const returnTo = returnPath.safeParse(session.metadata?.['returnTo']).data ?? '/';
  if (session.status !== 'complete') return { outcome: 'open', returnTo };
  await converge(ctx, customer.stripe_customer);
  const membership = await viewMembership(ctx, payer.id);
  return { outcome: membership?.opens ? 'paid' : 'waiting', returnTo };
}

async function readSession({ stripe }: AppContext, id: string): Promise<Stripe.Checkout.Session> {
  try {
    return await callStripe(() => stripe.checkout.sessions.retrieve(id));
  } catch (error) {
    if (isRefusedRequest(error)) throw requestNotFound({}, error);
    throw error;
  }
}
