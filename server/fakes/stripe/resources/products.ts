import type { Stripe } from 'stripe';
import { z } from 'zod';
import { invalid } from '../errors.ts';
import { emit } from '../events.ts';
import { emptyable, flag, given, mergeMetadata, metadata, paging, range, shape, text, whole } from '../params.ts';
import { onlyExpand, route } from '../route.ts';
import { change, create, findKept, listOf, read, readKept, remove } from '../store.ts';
import { newPrice, newProduct, recurring } from './catalogue.ts';

const features = z.array(z.strictObject({ name: text }));

const createParams = shape<Stripe.ProductCreateParams>()({
  name: text,
  active: flag.optional(),
  description: text.optional(),
  id: text.optional(),
  images: z.array(text).max(8).optional(),
  marketing_features: features.optional(),
  metadata: metadata.optional(),
  statement_descriptor: text.optional(),
  tax_code: text.optional(),
  unit_label: text.optional(),
  url: text.optional(),
  default_price_data: z
    .strictObject({
      currency: text.toLowerCase(),
      unit_amount: whole,
      recurring: recurring.optional(),
      metadata: metadata.optional(),
    })
    .optional(),
});

const updateParams = shape<Stripe.ProductUpdateParams>()({
  name: text.optional(),
  active: flag.optional(),
  default_price: text.optional(),
  description: emptyable(text).optional(),
  images: emptyable(z.array(text).max(8)).optional(),
  marketing_features: emptyable(features).optional(),
  metadata: metadata.optional(),
  statement_descriptor: text.optional(),
  tax_code: emptyable(text).optional(),
  unit_label: emptyable(text).optional(),
  url: emptyable(text).optional(),
});

const listParams = shape<Stripe.ProductListParams>()({
  ...paging,
  active: flag.optional(),
  created: range.optional(),
  ids: z.array(text).optional(),
  url: text.optional(),
});

export const productRoutes = [
  route('post', '/products', createParams, async (work, params) => {
    const { default_price_data: priceData, expand: _expand, id, ...fields } = params;
    if (id && (await findKept(work.db, 'product', id))) {
      throw invalid(`Product already exists.`, 'id', 'resource_already_exists');
    }
    const product = {
      ...newProduct(fields.name, work.now),
      ...given(fields),
      ...(id ? { id } : {}),
      metadata: mergeMetadata(null, fields.metadata),
    };
    await create(work, 'product', product, { event: 'product.created' });
    if (!priceData) return product;

    const price = newPrice({ ...priceData, product: product.id }, work.now);
    await create(work, 'price', price, { event: 'price.created' });
    const kept = { data: product, hidden: {} };
    return change(work, kept, { ...product, default_price: price.id }, { event: 'product.updated' });
  }),

  route('get', '/products/:id', onlyExpand, async (work, _params, { id }) => read(work.db, 'product', id)),

  route('post', '/products/:id', updateParams, async (work, params, { id }) => {
    const { expand: _expand, images, marketing_features: marketing, ...fields } = params;
    const kept = await readKept(work.db, 'product', id);
    if (fields.default_price) {
      const price = await read(work.db, 'price', fields.default_price, 'default_price');
      if (price.product !== id) throw invalid('The default price must belong to the product.', 'default_price');
    }
    return change(
      work,
      kept,
      {
        ...kept.data,
        ...given(fields),
        ...(images === undefined ? {} : { images: images ?? [] }),
        ...(marketing === undefined ? {} : { marketing_features: marketing ?? [] }),
        metadata: mergeMetadata(kept.data.metadata, fields.metadata),
        updated: work.now,
      },
      { event: 'product.updated' },
    );
  }),

  route('delete', '/products/:id', onlyExpand, async (work, _params, { id }) => {
    const product = await read(work.db, 'product', id);
    const prices = await listOf(work.db, 'price', '/v1/prices', { paging: { limit: 1 }, equal: { product: id } });
    if (prices.data.length > 0) {
      throw invalid('This product cannot be deleted because it has one or more user-created prices.', 'id');
    }
    await remove(work.db, id);
    await emit(work, 'product.deleted', work.now, product);
    return { id, object: 'product', deleted: true } satisfies Stripe.DeletedProduct;
  }),

  route('get', '/products', listParams, async (work, { active, created, ids, url, ...cursors }) =>
    listOf(work.db, 'product', '/v1/products', {
      paging: cursors,
      equal: { active, url },
      oneOf: { id: ids },
      created,
    }),
  ),
];
