import type { Stripe } from 'stripe';
import type { AppContext } from '../context.ts';
import { addJob } from '../jobs/queue.ts';
import { findCustomer } from '../memberships/memberships.queries.ts';
import { insertEvent } from './events.queries.ts';
import { idOf } from './call-stripe.ts';
import { paymentsSignature } from './payments.errors.ts';

/** Takes in what the payment service sent, if it was signed by it. */
export async function receiveEvent(ctx: AppContext, body: unknown, signature: string | undefined): Promise<void> {
  await recordEvent(ctx, verify(ctx, body, signature));
}

function verify({ stripe, settings }: AppContext, body: unknown, signature: string | undefined): Stripe.Event {
  if (!Buffer.isBuffer(body) || !signature) throw paymentsSignature();
  try {
    return stripe.webhooks.constructEvent(body, signature, settings.stripe.webhookSecret);
  } catch (error) {
    throw paymentsSignature({}, error);
  }
}

/**
 * Records an event once. What it says is not believed, only that something happened: the customer's truth is fetched
 * by a job that exists if, and only if, the event is recorded. A customer who is not ours is left alone.
 */
export async function recordEvent({ db }: AppContext, event: Stripe.Event): Promise<void> {
  const stripeCustomer = customerOf(event);
  await db.transaction(async (trx) => {
    const isNew = await insertEvent(trx, { id: event.id, type: event.type, stripe_customer: stripeCustomer });
    if (!isNew || !stripeCustomer || !(await findCustomer(trx, stripeCustomer))) return;
    await addJob(trx, 'converge-customer', { stripeCustomer }, { key: `converge:${stripeCustomer}` });
  });
}

function customerOf({ data: { object } }: Stripe.Event): string | null {
  if (object.object === 'customer') return object.id;
  const owner = 'customer' in object ? object.customer : null;
  return typeof owner === 'string' || (typeof owner === 'object' && owner !== null && 'id' in owner)
    ? idOf(owner)
    : null;
}
