import type { Knex } from 'knex';
import type { Interval } from '../calendar.ts';
import { invalid } from '../errors.ts';
import { read } from '../store.ts';
import type { Kinds } from '../wire.ts';

export function intervalOf(price: Kinds['price']): Interval {
  if (!price.recurring) throw invalid(`The price ${price.id} is not recurring.`, 'price');
  return { unit: price.recurring.interval as Interval['unit'], count: price.recurring.interval_count };
}

/** Reads a price that a new subscription may use. */
export async function readRecurringPrice(db: Knex, id: string, param: string): Promise<Kinds['price']> {
  const price = await read(db, 'price', id, param);
  if (!price.active) throw invalid(`The price specified is inactive. This field only accepts active prices.`, param);
  const product = await read(db, 'product', price.product);
  if (!product.active) throw invalid(`The product ${product.id} is not active.`, param, 'product_inactive');
  intervalOf(price);
  return price;
}

/** Minor units for a quantity at a price. */
export function amountOf(price: Kinds['price'], quantity: number): number {
  return (price.unit_amount ?? 0) * quantity;
}
