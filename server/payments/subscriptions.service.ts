import type { Stripe } from 'stripe';
import type { AppContext } from '../context.ts';
import { callStripe, isRefusedRequest } from './call-stripe.ts';

/** Lets a subscription end with its period; false when it has ended already. */
export async function endAtPeriodEnd({ stripe }: AppContext, id: string): Promise<boolean> {
  return changeRunning(stripe, id, (subscription) =>
    subscription.cancel_at === null && !subscription.cancel_at_period_end ? { cancel_at_period_end: true } : null,
  );
}

/** Takes an ending back; false when it has ended already. */
export async function keepRunning({ stripe }: AppContext, id: string): Promise<boolean> {
  return changeRunning(stripe, id, (subscription) => {
    if (subscription.cancel_at_period_end) return { cancel_at_period_end: false };
    // The payment service's own page sets the date without the flag.
    return subscription.cancel_at === null ? null : { cancel_at: '' };
  });
}

async function changeRunning(
  stripe: Stripe,
  id: string,
  change: (subscription: Stripe.Subscription) => Stripe.SubscriptionUpdateParams | null,
): Promise<boolean> {
  try {
    return await callStripe(async () => {
      const subscription = await stripe.subscriptions.retrieve(id);
      if (subscription.ended_at !== null) return false;
      const params = change(subscription);
      if (params) await stripe.subscriptions.update(id, params);
      return true;
    });
  } catch (error) {
    // It may have ended between the two calls.
    if (isRefusedRequest(error)) return false;
    throw error;
  }
}

/** The payment service's own page for a customer's card. */
export async function openCardPage({ stripe, settings }: AppContext, customer: string): Promise<string> {
  const page = await callStripe(() =>
    stripe.billingPortal.sessions.create({ customer, return_url: `${settings.publicUrl}/account` }),
  );
  return page.url;
}
