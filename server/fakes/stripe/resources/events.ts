import type { Stripe } from 'stripe';
import { z } from 'zod';
import { missing } from '../errors.ts';
import { flag, paging, range, shape, text } from '../params.ts';
import { onlyExpand, route } from '../route.ts';
import { SCHEMA } from '../schema.ts';
import { page } from '../store.ts';
import type { WireEvent } from '../wire.ts';

const listParams = shape<Stripe.EventListParams>()({
  ...paging,
  created: range.optional(),
  delivery_success: flag.optional(),
  type: text.optional(),
  types: z.array(text).max(20).optional(),
});

export const eventRoutes = [
  route('get', '/events/:id', onlyExpand, async (work, _params, { id }) => {
    const row = await work.db
      .withSchema(SCHEMA)
      .table('events')
      .where({ id })
      .first<{ data: WireEvent } | undefined>('data');
    if (!row) throw missing('event', id);
    return row.data;
  }),

  route('get', '/events', listParams, async (work, { created, delivery_success: delivered, type, types, ...cursors }) =>
    page<WireEvent>(work.db.withSchema(SCHEMA).table('events'), '/v1/events', {
      paging: cursors,
      created,
      oneOf: { type: types },
      refine: (query) => {
        if (type) void query.whereRaw("data ->> 'type' like ?", [type.replaceAll('_', '\\_').replaceAll('*', '%')]);
        if (delivered === true) void query.whereNotNull('delivered_at');
        if (delivered === false) void query.whereNull('delivered_at');
      },
    }),
  ),
];
