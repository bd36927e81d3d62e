import type { Stripe } from 'stripe';
import type { Knex } from 'knex';
import { amountOf } from '../billing/prices.ts';
import { read, type Kept } from '../store.ts';
import type { Wire, WireList } from '../wire.ts';

type LineItem = Wire<Stripe.LineItem>;

/** What a checkout page sells. */
export async function lineItemsOf(db: Knex, { data, hidden }: Kept<'checkout.session'>): Promise<WireList<LineItem>> {
  const items = hidden.plan?.items ?? [];
  const lines = await Promise.all(
    items.map(async ({ id, price: priceId, quantity }): Promise<LineItem> => {
      const price = await read(db, 'price', priceId);
      const amount = amountOf(price, quantity);
      return {
        id,
        object: 'item',
        adjustable_quantity: null,
        amount_discount: 0,
        amount_subtotal: amount,
        amount_tax: 0,
        amount_total: amount,
        currency: price.currency,
        description: (await read(db, 'product', price.product)).name,
        metadata: null,
        price,
        quantity,
      };
    }),
  );
  return { object: 'list', data: lines, has_more: false, url: `/v1/checkout/sessions/${data.id}/line_items` };
}
