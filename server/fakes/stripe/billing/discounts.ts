import type { Knex } from 'knex';
import { addMonths } from '../calendar.ts';
import { invalid } from '../errors.ts';
import { newId } from '../ids.ts';
import { change, create, read, readKept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';
import type { Line } from './lines.ts';

export interface DiscountChoice {
  coupon?: string | undefined;
  promotion_code?: string | undefined;
  discount?: string | undefined;
}

/** Whether a coupon may still be taken at an instant. */
export function couponIsValid(coupon: Kinds['coupon'], now: number): boolean {
  const used = coupon.max_redemptions !== null && coupon.times_redeemed >= coupon.max_redemptions;
  return !used && (coupon.redeem_by === null || coupon.redeem_by > now);
}

function promotionIsOpen(code: Kinds['promotion_code'], customer: string | null, now: number): boolean {
  const used = code.max_redemptions !== null && code.times_redeemed >= code.max_redemptions;
  const mine = code.customer === null || code.customer === customer;
  return code.active && !used && mine && (code.expires_at === null || code.expires_at > now);
}

export interface TakenDiscount {
  coupon: Kinds['coupon'];
  promotionCode: Kinds['promotion_code'] | null;
}

/** Reads what a coupon or promotion code gives; refuses one that is used up or over. */
export async function readDiscount(
  db: Knex,
  choice: DiscountChoice,
  { customer, now }: { customer: string | null; now: number },
): Promise<TakenDiscount> {
  const promotionCode = choice.promotion_code
    ? await read(db, 'promotion_code', choice.promotion_code, 'discounts')
    : null;
  const couponId = promotionCode ? promotionCode.promotion.coupon : choice.coupon;
  if (!couponId) throw invalid('A discount names a coupon or a promotion code.', 'discounts');
  if (promotionCode && !promotionIsOpen(promotionCode, customer, now)) {
    throw invalid(
      'This promotion code cannot be redeemed: it is expired, used up or not for this customer.',
      'discounts',
    );
  }
  const coupon = await read(db, 'coupon', couponId, 'discounts');
  if (!couponIsValid(coupon, now)) throw invalid('This coupon is expired.', 'discounts', 'coupon_expired');
  return { coupon, promotionCode };
}

/** Gives a subscription a discount and counts the redemption. */
export async function redeem(
  work: Work,
  { coupon, promotionCode }: TakenDiscount,
  target: { customer: string; subscription: string; session: string | null; now: number },
): Promise<string> {
  const months = coupon.duration === 'repeating' ? (coupon.duration_in_months ?? 0) : null;
  const discount = await create(
    work,
    'discount',
    {
      id: newId('di'),
      object: 'discount',
      checkout_session: target.session,
      customer: target.customer,
      customer_account: null,
      end: months === null ? null : addMonths(target.now, months),
      invoice: null,
      invoice_item: null,
      promotion_code: promotionCode?.id ?? null,
      source: { coupon: coupon.id, type: 'coupon' },
      start: target.now,
      subscription: target.subscription,
      subscription_item: null,
    },
    { event: 'customer.discount.created' },
  );
  await countRedemption(work, 'coupon', coupon.id);
  if (promotionCode) await countRedemption(work, 'promotion_code', promotionCode.id);
  return discount.id;
}

async function countRedemption(work: Work, kind: 'coupon' | 'promotion_code', id: string): Promise<void> {
  if (kind === 'coupon') {
    const kept = await readKept(work.db, 'coupon', id);
    const after = { ...kept.data, times_redeemed: kept.data.times_redeemed + 1 };
    await change(work, kept, { ...after, valid: couponIsValid(after, work.now) }, { event: 'coupon.updated' });
    return;
  }
  const kept = await readKept(work.db, 'promotion_code', id);
  await change(
    work,
    kept,
    { ...kept.data, times_redeemed: kept.data.times_redeemed + 1 },
    { event: 'promotion_code.updated' },
  );
}

/** Minor units that a coupon takes off a sum; never more than the sum. */
export function amountOff(coupon: Kinds['coupon'], sum: number): number {
  if (sum <= 0) return 0;
  return coupon.percent_off === null
    ? Math.min(coupon.amount_off ?? 0, sum)
    : Math.round((sum * coupon.percent_off) / 100);
}

export interface AppliedDiscount {
  discount: string;
  amount: number;
}

/** Takes discounts off the lines that may have one, one after the other, the last line bearing the rounding. */
export function discountLines(lines: Line[], discounts: { id: string; coupon: Kinds['coupon'] }[]) {
  const open = lines.filter((line) => line.discountable && line.amount > 0);
  const applied: AppliedDiscount[] = [];
  for (const { id, coupon } of discounts) {
    const sum = open.reduce((total, line) => total + line.amount - lineDiscount(line), 0);
    const off = amountOff(coupon, sum);
    if (off === 0) continue;
    let left = off;
    open.forEach((line, i) => {
      const rest = line.amount - lineDiscount(line);
      const share = i === open.length - 1 ? left : Math.min(left, Math.floor((off * rest) / sum));
      left -= share;
      line.discounts.push(id);
      line.discount_amounts = [...(line.discount_amounts ?? []), { amount: share, discount: id }];
    });
    applied.push({ discount: id, amount: off });
  }
  return { lines, applied };
}

function lineDiscount(line: Line): number {
  return (line.discount_amounts ?? []).reduce((total, { amount }) => total + amount, 0);
}

/** The discounts of a subscription that hold at an instant, with their coupons. */
export async function discountsAt(db: Knex, ids: string[], now: number) {
  const discounts = await Promise.all(ids.map((id) => read(db, 'discount', id)));
  const holding = discounts.filter(({ end }) => end === null || end > now);
  return Promise.all(
    holding.map(async ({ id, source }) => ({ id, coupon: await read(db, 'coupon', source.coupon ?? '') })),
  );
}
