import { defineError } from '../errors.ts';

export const currencyInUse = defineError(
  'imprint.currency_in_use',
  409,
  'Tiers are sold in the present currency. Close them before you change it.',
);
