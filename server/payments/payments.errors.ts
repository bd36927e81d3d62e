import { defineError } from '../errors.ts';

export const paymentsUnavailable = defineError(
  'payments.unavailable',
  503,
  'The payment service does not answer. Nothing was charged; try again in a moment.',
);
export const paymentsSignature = defineError(
  'payments.signature',
  400,
  'The payment service’s message was not signed by it.',
);
export const checkoutNotVerified = defineError(
  'checkout.not_verified',
  403,
  'Confirm your e-mail address before you join.',
);
export const checkoutAlreadyMember = defineError(
  'checkout.already_member',
  409,
  'You hold a membership already. Let it end on your account page, then join another tier.',
);
export const checkoutTierClosed = defineError('checkout.tier_closed', 409, 'This tier takes no new members.');
export const checkoutTierWaiting = defineError(
  'checkout.tier_waiting',
  409,
  'This tier is just being changed. Try again in a moment.',
);
