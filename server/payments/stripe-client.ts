import Stripe from 'stripe';
import type { Settings } from '../settings.ts';

export type StripeClient = Stripe;

/** The official client; with an `apiBase` it speaks to the local fake instead, by the same code. */
export function openStripe({ secretKey, apiBase }: Settings['stripe']): StripeClient {
  const common = { maxNetworkRetries: 2, timeout: 15_000, telemetry: false };
  if (!apiBase) return new Stripe(secretKey, common);
  return new Stripe(secretKey, {
    ...common,
    host: apiBase.hostname,
    port: apiBase.port,
    protocol: apiBase.protocol === 'http:' ? 'http' : 'https',
  });
}
