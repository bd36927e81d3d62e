import type { Stripe } from 'stripe';
import { z } from 'zod';
import { couponIsValid } from '../billing/discounts.ts';
import { invalid } from '../errors.ts';
import { emit } from '../events.ts';
import { newId } from '../ids.ts';
import { count, currency, flag, fraction, mergeMetadata, metadata, paging, range, shape, text } from '../params.ts';
import { onlyExpand, route } from '../route.ts';
import { change, create, findKept, listOf, read, readKept, remove } from '../store.ts';
import type { Kinds } from '../wire.ts';

const couponParams = shape<Stripe.CouponCreateParams>()({
  id: text.optional(),
  amount_off: count.optional(),
  currency: currency.optional(),
  duration: z.enum(['forever', 'once', 'repeating']).optional(),
  duration_in_months: count.optional(),
  max_redemptions: count.optional(),
  metadata: metadata.optional(),
  name: z.string().max(40).optional(),
  percent_off: fraction.refine((value) => value > 0 && value <= 100, 'must be above 0 and at most 100').optional(),
  redeem_by: count.optional(),
});
const couponUpdate = shape<Stripe.CouponUpdateParams>()({ metadata: metadata.optional(), name: text.optional() });
const couponList = shape<Stripe.CouponListParams>()({ ...paging, created: range.optional() });

const codeParams = shape<Stripe.PromotionCodeCreateParams>()({
  promotion: z.strictObject({ type: z.literal('coupon'), coupon: text }),
  active: flag.optional(),
  code: z
    .string()
    .regex(/^[a-z0-9-]{1,500}$/i, 'must be letters, digits and dashes')
    .optional(),
  customer: text.optional(),
  expires_at: count.optional(),
  max_redemptions: count.optional(),
  metadata: metadata.optional(),
});
const codeUpdate = shape<Stripe.PromotionCodeUpdateParams>()({
  active: flag.optional(),
  metadata: metadata.optional(),
});
const codeList = shape<Stripe.PromotionCodeListParams>()({
  ...paging,
  active: flag.optional(),
  code: text.optional(),
  coupon: text.optional(),
  created: range.optional(),
  customer: text.optional(),
});

export const couponRoutes = [
  route('post', '/coupons', couponParams, async (work, params) => {
    const { amount_off: amount, percent_off: percent } = params;
    if ((amount === undefined) === (percent === undefined)) {
      throw invalid('Pass either percent_off or amount_off.', 'percent_off', 'parameter_missing');
    }
    if (amount !== undefined && !params.currency)
      throw invalid('Pass currency with amount_off.', 'currency', 'parameter_missing');
    if (params.duration === 'repeating' && !params.duration_in_months) {
      throw invalid('Pass duration_in_months with a repeating coupon.', 'duration_in_months', 'parameter_missing');
    }
    const id = params.id ?? newId('c', 8).slice(2);
    if (await findKept(work.db, 'coupon', id)) throw invalid('Coupon already exists.', 'id', 'resource_already_exists');
    const coupon: Kinds['coupon'] = {
      id,
      object: 'coupon',
      amount_off: amount ?? null,
      created: work.now,
      currency: params.currency ?? null,
      duration: params.duration ?? 'once',
      duration_in_months: params.duration_in_months ?? null,
      livemode: false,
      max_redemptions: params.max_redemptions ?? null,
      metadata: mergeMetadata(null, params.metadata),
      name: params.name ?? null,
      percent_off: percent ?? null,
      redeem_by: params.redeem_by ?? null,
      times_redeemed: 0,
      valid: true,
    };
    return create(work, 'coupon', { ...coupon, valid: couponIsValid(coupon, work.now) }, { event: 'coupon.created' });
  }),

  route('get', '/coupons/:id', onlyExpand, async (work, _params, { id }) => read(work.db, 'coupon', id)),

  route('post', '/coupons/:id', couponUpdate, async (work, params, { id }) => {
    const kept = await readKept(work.db, 'coupon', id);
    const after = {
      ...kept.data,
      name: params.name ?? kept.data.name,
      metadata: mergeMetadata(kept.data.metadata, params.metadata),
    };
    return change(work, kept, after, { event: 'coupon.updated' });
  }),

  route('delete', '/coupons/:id', onlyExpand, async (work, _params, { id }) => {
    const coupon = await read(work.db, 'coupon', id);
    const used = await listOf(work.db, 'discount', '', { paging: { limit: 1 }, equal: { 'source.coupon': id } });
    if (used.data.length > 0) throw invalid('The fake keeps a coupon that a subscription has used.', 'id');
    await remove(work.db, id);
    await emit(work, 'coupon.deleted', work.now, coupon);
    return { id, object: 'coupon', deleted: true } satisfies Stripe.DeletedCoupon;
  }),

  route('get', '/coupons', couponList, async (work, { created, ...cursors }) =>
    listOf(work.db, 'coupon', '/v1/coupons', { paging: cursors, created }),
  ),

  route('post', '/promotion_codes', codeParams, async (work, params) => {
    await read(work.db, 'coupon', params.promotion.coupon, 'promotion[coupon]');
    if (params.customer) await read(work.db, 'customer', params.customer, 'customer');
    const code = params.code ?? newId('c', 8).slice(2).toUpperCase();
    const same = await listOf(work.db, 'promotion_code', '', {
      paging: { limit: 1 },
      equal: { active: true },
      refine: (query) => void query.whereRaw("lower(data ->> 'code') = lower(?)", [code]),
    });
    if (same.data.length > 0) throw invalid('An active promotion code with that code already exists.', 'code');
    return create(
      work,
      'promotion_code',
      {
        id: newId('promo'),
        object: 'promotion_code',
        active: params.active ?? true,
        code,
        created: work.now,
        customer: params.customer ?? null,
        customer_account: null,
        expires_at: params.expires_at ?? null,
        livemode: false,
        max_redemptions: params.max_redemptions ?? null,
        metadata: mergeMetadata(null, params.metadata),
        promotion: { coupon: params.promotion.coupon, type: 'coupon' },
        restrictions: { first_time_transaction: false, minimum_amount: null, minimum_amount_currency: null },
        times_redeemed: 0,
      },
      { event: 'promotion_code.created' },
    );
  }),

  route('get', '/promotion_codes/:id', onlyExpand, async (work, _params, { id }) =>
    read(work.db, 'promotion_code', id),
  ),

  route('post', '/promotion_codes/:id', codeUpdate, async (work, params, { id }) => {
    const kept = await readKept(work.db, 'promotion_code', id);
    const after = {
      ...kept.data,
      active: params.active ?? kept.data.active,
      metadata: mergeMetadata(kept.data.metadata, params.metadata),
    };
    return change(work, kept, after, { event: 'promotion_code.updated' });
  }),

  route('get', '/promotion_codes', codeList, async (work, { active, code, coupon, created, customer, ...cursors }) =>
    listOf(work.db, 'promotion_code', '/v1/promotion_codes', {
      paging: cursors,
      equal: { active, customer, 'promotion.coupon': coupon },
      created,
      refine: (query) => {
        if (code) void query.whereRaw("lower(data ->> 'code') = lower(?)", [code]);
      },
    }),
  ),
];
