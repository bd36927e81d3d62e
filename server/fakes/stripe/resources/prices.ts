import type { Stripe } from 'stripe';
import { z } from 'zod';
import { invalid } from '../errors.ts';
import { count, currency, flag, given, mergeMetadata, metadata, paging, range, shape, text } from '../params.ts';
import { onlyExpand, route } from '../route.ts';
import { all, change, create, listOf, read, readKept } from '../store.ts';
import type { Work } from '../work.ts';
import { interval, newPrice, newProduct, recurring } from './catalogue.ts';

const createParams = shape<Stripe.PriceCreateParams>()({
  currency,
  unit_amount: count,
  product: text.optional(),
  product_data: z.strictObject({ name: text, metadata: metadata.optional() }).optional(),
  recurring: recurring.optional(),
  active: flag.optional(),
  billing_scheme: z.literal('per_unit').optional(),
  lookup_key: z.string().max(200).optional(),
  metadata: metadata.optional(),
  nickname: text.optional(),
  tax_behavior: z.enum(['exclusive', 'inclusive', 'unspecified']).optional(),
  transfer_lookup_key: flag.optional(),
});

// Amount, currency and interval of a price never change: another amount is another price.
const updateParams = shape<Stripe.PriceUpdateParams>()({
  active: flag.optional(),
  lookup_key: z.string().max(200).optional(),
  metadata: metadata.optional(),
  nickname: text.optional(),
  tax_behavior: z.enum(['exclusive', 'inclusive', 'unspecified']).optional(),
  transfer_lookup_key: flag.optional(),
});

const listParams = shape<Stripe.PriceListParams>()({
  ...paging,
  active: flag.optional(),
  created: range.optional(),
  currency: currency.optional(),
  lookup_keys: z.array(text).max(10).optional(),
  product: text.optional(),
  recurring: z.strictObject({ interval: interval.optional() }).optional(),
  type: z.enum(['one_time', 'recurring']).optional(),
});

/** A lookup key names one price: it is taken over when the caller says so, else refused. */
async function takeLookupKey(work: Work, key: string | undefined, transfer: boolean, own?: string): Promise<void> {
  if (!key) return;
  const [holder] = await all(work.db, 'price', { lookup_key: key });
  if (!holder || holder.data.id === own) return;
  if (!transfer) throw invalid(`A price (\`${holder.data.id}\`) already uses that lookup key.`, 'lookup_key');
  await change(work, holder, { ...holder.data, lookup_key: null }, { event: 'price.updated' });
}

async function productFor(work: Work, fields: { name: string; metadata?: Record<string, string> | null | undefined }) {
  const product = { ...newProduct(fields.name, work.now), metadata: mergeMetadata(null, fields.metadata) };
  return (await create(work, 'product', product, { event: 'product.created' })).id;
}

export const priceRoutes = [
  route('post', '/prices', createParams, async (work, params) => {
    const { product_data: productData, transfer_lookup_key: transfer = false, ...source } = params;
    if (!source.product === !productData)
      throw invalid('Pass either product or product_data.', 'product', 'parameter_missing');
    const product = source.product ?? (await productFor(work, productData!));
    if (source.product) await read(work.db, 'product', source.product, 'product');
    await takeLookupKey(work, source.lookup_key, transfer);
    return create(work, 'price', newPrice({ ...source, product }, work.now), { event: 'price.created' });
  }),

  route('get', '/prices/:id', onlyExpand, async (work, _params, { id }) => read(work.db, 'price', id)),

  route('post', '/prices/:id', updateParams, async (work, params, { id }) => {
    const { expand: _expand, transfer_lookup_key: transfer = false, lookup_key: key, ...fields } = params;
    const kept = await readKept(work.db, 'price', id);
    const product = await read(work.db, 'product', kept.data.product);
    if (fields.active === false && product.default_price === id) {
      throw invalid('This price cannot be archived because it is the default price of its product.', 'active');
    }
    await takeLookupKey(work, key, transfer, id);
    return change(
      work,
      kept,
      {
        ...kept.data,
        ...given(fields),
        ...(key === undefined ? {} : { lookup_key: key || null }),
        metadata: mergeMetadata(kept.data.metadata, fields.metadata),
      },
      { event: 'price.updated' },
    );
  }),

  route('get', '/prices', listParams, async (work, params) => {
    const { active, created, currency: money, lookup_keys: keys, product, recurring: every, type, ...cursors } = params;
    return listOf(work.db, 'price', '/v1/prices', {
      paging: cursors,
      equal: { active, currency: money, product, type, 'recurring.interval': every?.interval },
      oneOf: { lookup_key: keys },
      created,
    });
  }),
];
