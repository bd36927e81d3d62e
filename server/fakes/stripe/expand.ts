import type { Knex } from 'knex';
import { invalid } from './errors.ts';
import { all, findAny, findKept } from './store.ts';
import { lineItemsOf } from './resources/line-items.ts';
import type { Kinds } from './wire.ts';

const DEPTH = 4;

type Node = Record<string, unknown>;

/** Ids that may be replaced by what they name, by the object that holds them (paths from its root). */
const EXPANDABLE: Record<string, string[]> = {
  product: ['default_price'],
  price: ['product'],
  plan: ['product'],
  customer: ['invoice_settings.default_payment_method', 'test_clock'],
  payment_method: ['customer'],
  promotion_code: ['customer', 'promotion.coupon'],
  discount: ['customer', 'promotion_code', 'source.coupon'],
  subscription: [
    'customer',
    'default_payment_method',
    'latest_invoice',
    'test_clock',
    'discounts',
    'pending_setup_intent',
  ],
  subscription_item: ['discounts'],
  invoice: [
    'customer',
    'default_payment_method',
    'discounts',
    'parent.subscription_details.subscription',
    'test_clock',
  ],
  line_item: ['discounts', 'subscription', 'pricing.price_details.price'],
  invoice_payment: ['invoice', 'payment.payment_intent'],
  payment_intent: ['customer', 'latest_charge', 'payment_method'],
  charge: ['balance_transaction', 'customer', 'payment_intent'],
  refund: ['balance_transaction', 'charge', 'customer', 'payment_intent', 'payment_method'],
  'checkout.session': ['customer', 'invoice', 'payment_intent', 'subscription', 'setup_intent'],
  'billing_portal.session': ['configuration'],
};

/** Lists that are shown only when they are asked for. */
const INCLUDABLE: Record<string, Record<string, (db: Knex, node: Node) => Promise<unknown>>> = {
  'checkout.session': {
    line_items: async (db, node) => {
      const session = await findKept(db, 'checkout.session', String(node.id));
      return session && lineItemsOf(db, session);
    },
  },
  invoice: {
    payments: async (db, node) =>
      wholeList(await all(db, 'invoice_payment', { invoice: String(node.id) }), '/v1/invoice_payments'),
  },
  customer: {
    subscriptions: async (db, node) => {
      const kept = await all(db, 'subscription', { customer: String(node.id) });
      const running = kept.filter(({ data }) => data.status !== 'canceled' && data.status !== 'incomplete_expired');
      return wholeList(running, `/v1/customers/${String(node.id)}/subscriptions`);
    },
  },
  charge: {
    refunds: async (db, node) =>
      wholeList(await all(db, 'refund', { charge: String(node.id) }), `/v1/charges/${String(node.id)}/refunds`),
  },
};

function wholeList(kept: { data: Kinds[keyof Kinds] }[], url: string) {
  return { object: 'list', data: kept.map(({ data }) => data), has_more: false, url };
}

function isNode(value: unknown): value is Node {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

async function resolve(db: Knex, value: unknown, mayExpand: boolean, path: string): Promise<unknown> {
  if (value === null || typeof value !== 'string') return value;
  if (!mayExpand) throw invalid(`This property cannot be expanded (${path}).`, 'expand');
  // What the fake keeps no object of stays an id.
  return (await findAny(db, value)) ?? value;
}

async function expandIn(
  db: Knex,
  holder: Node,
  inside: string,
  node: Node,
  steps: string[],
  path: string,
): Promise<void> {
  const [step, ...rest] = steps;
  if (step === undefined) return;

  const kind = String(holder.object);
  const include = holder === node ? INCLUDABLE[kind]?.[step] : undefined;
  if (include && node[step] === undefined) node[step] = await include(db, node);
  if (!(step in node)) throw invalid(`This property cannot be expanded (${path}).`, 'expand');

  const here = inside === '' ? step : `${inside}.${step}`;
  const mayExpand = EXPANDABLE[kind]?.includes(here) ?? false;
  const value = node[step];
  node[step] = Array.isArray(value)
    ? await Promise.all(value.map((item) => resolve(db, item, mayExpand, path)))
    : await resolve(db, value, mayExpand, path);

  for (const next of [node[step]].flat()) {
    if (!isNode(next)) continue;
    const isObject = typeof next.object === 'string';
    await expandIn(db, isObject ? next : holder, isObject ? '' : here, next, rest, path);
  }
}

/** Replaces ids by their objects along the asked paths, such as `data.customer` or `latest_invoice.payments`. */
export async function expand(db: Knex, answer: object, paths: string[] = []): Promise<object> {
  const root = structuredClone(answer) as Node;
  for (const path of paths) {
    const steps = path.split('.');
    if (steps.length > DEPTH) {
      throw invalid(`You cannot expand more than ${DEPTH} levels of a property. Property: ${path}`, 'expand');
    }
    await expandIn(db, root, '', root, steps, path);
  }
  return root;
}
