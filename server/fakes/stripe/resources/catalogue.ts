import { z } from 'zod';
import { newId } from '../ids.ts';
import { count, mergeMetadata } from '../params.ts';
import type { Kinds } from '../wire.ts';

export const interval = z.enum(['day', 'week', 'month', 'year']);

export const recurring = z.strictObject({
  interval,
  interval_count: count.refine((value) => value >= 1, 'must be at least 1').optional(),
  usage_type: z.literal('licensed').optional(),
});

/** A product with nothing but its name. */
export function newProduct(name: string, created: number): Kinds['product'] {
  return {
    id: newId('prod', 14),
    object: 'product',
    active: true,
    created,
    default_price: null,
    description: null,
    images: [],
    livemode: false,
    marketing_features: [],
    metadata: {},
    name,
    package_dimensions: null,
    shippable: null,
    statement_descriptor: null,
    tax_code: null,
    tax_details: null,
    type: 'service',
    unit_label: null,
    updated: created,
    url: null,
  };
}

interface PriceSource {
  currency: string;
  unit_amount: number;
  product: string;
  recurring?: z.output<typeof recurring> | undefined;
  active?: boolean | undefined;
  lookup_key?: string | undefined;
  metadata?: Record<string, string> | null | undefined;
  nickname?: string | undefined;
  tax_behavior?: 'exclusive' | 'inclusive' | 'unspecified' | undefined;
}

export function newPrice(source: PriceSource, created: number): Kinds['price'] {
  return {
    id: newId('price'),
    object: 'price',
    active: source.active ?? true,
    billing_scheme: 'per_unit',
    created,
    currency: source.currency,
    custom_unit_amount: null,
    livemode: false,
    lookup_key: source.lookup_key || null,
    metadata: mergeMetadata(null, source.metadata),
    nickname: source.nickname ?? null,
    product: source.product,
    recurring: source.recurring
      ? {
          interval: source.recurring.interval,
          interval_count: source.recurring.interval_count ?? 1,
          meter: null,
          trial_period_days: null,
          usage_type: 'licensed',
        }
      : null,
    tax_behavior: source.tax_behavior ?? 'unspecified',
    tiers_mode: null,
    transform_quantity: null,
    type: source.recurring ? 'recurring' : 'one_time',
    unit_amount: source.unit_amount,
    unit_amount_decimal: String(source.unit_amount),
  };
}
