import { periodEnd } from '../calendar.ts';
import { periodOf } from '../due.ts';
import { invalid } from '../errors.ts';
import type { PendingLine } from '../hidden.ts';
import { read, type Kept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';
import { planOf } from './begin.ts';
import { amountOf, intervalOf, readRecurringPrice } from './prices.ts';

export type Proration = 'create_prorations' | 'always_invoice' | 'none';

export interface ItemChange {
  id?: string | undefined;
  price?: string | undefined;
  quantity?: number | undefined;
}

export interface Switched {
  subscription: Kinds['subscription'];
  pendingLines: PendingLine[];
  /** Whether the whole new period is billed at once: another interval starts a new period now. */
  newPeriod: boolean;
  invoiceNow: boolean;
}

type Item = Kinds['subscription']['items']['data'][number];

interface Part {
  item: Item;
  name: string;
  /** The share of the period that is left, 0 to 1. */
  share: number;
  now: number;
  end: number;
}

function partLine({ item, name, share, now, end }: Part, sign: 1 | -1): PendingLine {
  const quantity = item.quantity ?? 1;
  return {
    amount: sign * Math.round(amountOf(item.price, quantity) * share),
    description: `${sign < 0 ? 'Unused' : 'Remaining'} time on ${name}`,
    price: item.price.id,
    product: item.price.product,
    unitAmount: item.price.unit_amount ?? 0,
    quantity,
    period: { start: now, end },
    subscriptionItem: item.id,
  };
}

/**
 * Plans other prices or quantities for the items of a subscription. What is left of the period is
 * credited at the old price and charged at the new, by the second, unless proration is `none`.
 */
export async function planSwitch(
  work: Work,
  kept: Kept<'subscription'>,
  changes: ItemChange[],
  { proration, now }: { proration: Proration; now: number },
): Promise<Switched> {
  const { data: subscription } = kept;
  const { start, end } = periodOf(subscription);
  const share = Math.max(0, Math.min(1, (end - now) / (end - start)));
  const pendingLines = [...(kept.hidden.pendingLines ?? [])];
  let newPeriod = false;
  const items = [...subscription.items.data];

  for (const wanted of changes) {
    const index = items.findIndex(({ id }) => id === wanted.id);
    const old = items[index];
    if (!old) throw invalid(`Name the item to change by its id; '${wanted.id ?? ''}' is not one.`, 'items');
    const price = wanted.price ? await readRecurringPrice(work.db, wanted.price, 'items[0][price]') : old.price;
    if (price.currency !== subscription.currency)
      throw invalid('All prices of a subscription have one currency.', 'items');
    const item: Item = { ...old, price, plan: planOf(price), quantity: wanted.quantity ?? old.quantity ?? 1 };
    items[index] = item;

    const [before, after] = [intervalOf(old.price), intervalOf(price)];
    const otherInterval = before.unit !== after.unit || before.count !== after.count;
    const isTrial = subscription.status === 'trialing';
    if (otherInterval && !isTrial) newPeriod = true;
    if (proration === 'none' || isTrial || (price.id === old.price.id && item.quantity === old.quantity)) continue;

    const [oldName, newName] = [await nameOf(work, old), await nameOf(work, item)];
    pendingLines.push(partLine({ item: old, name: oldName, share, now, end }, -1));
    if (!otherInterval) pendingLines.push(partLine({ item, name: newName, share, now, end }, 1));
  }

  return {
    subscription: withItems(subscription, items, newPeriod ? now : null),
    pendingLines,
    newPeriod,
    invoiceNow: newPeriod || proration === 'always_invoice',
  };
}

async function nameOf(work: Work, item: Item): Promise<string> {
  return (await read(work.db, 'product', item.price.product)).name;
}

function withItems(subscription: Kinds['subscription'], items: Item[], restart: number | null): Kinds['subscription'] {
  const [first] = items;
  if (restart === null || !first) return { ...subscription, items: { ...subscription.items, data: items } };
  const end = periodEnd(restart, restart, intervalOf(first.price));
  const data = items.map((item) => ({ ...item, current_period_start: restart, current_period_end: end }));
  return { ...subscription, billing_cycle_anchor: restart, items: { ...subscription.items, data } };
}
