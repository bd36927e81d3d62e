import type { AppContext } from '../context.ts';
import { findAllCustomers } from '../memberships/memberships.queries.ts';
import { converge } from './converge.service.ts';
import { recordEvent } from './events.service.ts';

/** Does what a webhook asked for. */
export async function convergeCustomer(ctx: AppContext, { stripeCustomer }: { stripeCustomer: string }): Promise<void> {
  await converge(ctx, stripeCustomer);
}

/**
 * Catches up with events that never reached us, then fetches every customer's truth. One customer's trouble does not
 * keep the others waiting; it fails the job at the end, so that it runs again.
 */
export async function reconcilePayments(ctx: AppContext): Promise<void> {
  for await (const event of ctx.stripe.events.list({ delivery_success: false, limit: 100 })) {
    await recordEvent(ctx, event);
  }
  const failures: unknown[] = [];
  for (const { stripe_customer: customer } of await findAllCustomers(ctx.db)) {
    try {
      await converge(ctx, customer);
    } catch (error) {
      ctx.log.error({ err: error, customer }, 'a customer could not be reconciled');
      failures.push(error);
    }
  }
  if (failures.length > 0)
    throw new AggregateError(failures, `Customers that could not be reconciled: ${failures.length}.`);
}
