import { createHash } from 'node:crypto';
import { Stripe } from 'stripe';
import { paymentsUnavailable } from './payments.errors.ts';

const { errors } = Stripe;
const AWAY = [
  errors.StripeConnectionError,
  errors.StripeAPIError,
  errors.StripeRateLimitError,
  errors.StripeAuthenticationError,
  errors.StripePermissionError,
];

/** Calls the payment service; one that is away, busy or will not let us in becomes `payments.unavailable`. */
export async function callStripe<T>(call: () => Promise<T>): Promise<T> {
  try {
    return await call();
  } catch (error) {
    if (AWAY.some((kind) => error instanceof kind))
      throw paymentsUnavailable({ headers: { 'Retry-After': '10' } }, error);
    throw error;
  }
}

/** Whether the payment service refused a request as it was put: something is missing, ended or not allowed. */
export function isRefusedRequest(error: unknown, code?: string): boolean {
  return error instanceof errors.StripeInvalidRequestError && (code === undefined || error.code === code);
}

/** A key under which the payment service does the same thing once, however often it is asked. */
export function idempotencyKey(...parts: unknown[]): string {
  return createHash('sha256').update(JSON.stringify(parts)).digest('hex');
}

/** The id of what may stand there whole or as its id. */
export function idOf(reference: string | { id: string } | null | undefined): string | null {
  return typeof reference === 'string' ? reference : (reference?.id ?? null);
}

export function toInstant(seconds: number): Date {
  return new Date(seconds * 1000);
}
