import type { Stripe } from 'stripe';
import { endSubscription } from '../billing/cancel.ts';
import { DAY } from '../due.ts';
import { emit } from '../events.ts';
import { newId } from '../ids.ts';
import { count, paging, shape, text } from '../params.ts';
import { onlyExpand, route } from '../route.ts';
import { all, create, listOf, read, remove } from '../store.ts';
import { beginAdvance } from '../timeline.ts';

const createParams = shape<Stripe.TestHelpers.TestClockCreateParams>()({ frozen_time: count, name: text.optional() });
const advanceParams = shape<Stripe.TestHelpers.TestClockAdvanceParams>()({ frozen_time: count });
const listParams = shape<Stripe.TestHelpers.TestClockListParams>()(paging);

export const testClockRoutes = [
  route('post', '/test_helpers/test_clocks', createParams, async (work, { frozen_time: frozen, name }) =>
    create(
      work,
      'test_helpers.test_clock',
      {
        id: newId('clock'),
        object: 'test_helpers.test_clock',
        created: work.now,
        deletes_after: work.now + 30 * DAY,
        frozen_time: frozen,
        livemode: false,
        name: name ?? null,
        status: 'ready',
        status_details: {},
      },
      { event: 'test_helpers.test_clock.created' },
    ),
  ),

  route('get', '/test_helpers/test_clocks/:id', onlyExpand, async (work, _params, { id }) =>
    read(work.db, 'test_helpers.test_clock', id),
  ),

  // Answers while the clock is `advancing`, as the API does; the ticker brings it to `ready`.
  route('post', '/test_helpers/test_clocks/:id/advance', advanceParams, async (work, { frozen_time: to }, { id }) =>
    beginAdvance(work, id, to),
  ),

  route('delete', '/test_helpers/test_clocks/:id', onlyExpand, async (work, _params, { id }) => {
    const clock = await read(work.db, 'test_helpers.test_clock', id);
    for (const { data } of await all(work.db, 'customer', { test_clock: id })) {
      for (const kept of await all(work.db, 'subscription', { customer: data.id })) {
        if (kept.data.ended_at === null) await endSubscription(work, kept, 'cancellation_requested');
      }
      await remove(work.db, data.id);
    }
    await remove(work.db, id);
    await emit(work, 'test_helpers.test_clock.deleted', work.now, clock);
    return { id, object: 'test_helpers.test_clock', deleted: true } satisfies Stripe.TestHelpers.DeletedTestClock;
  }),

  route('get', '/test_helpers/test_clocks', listParams, async (work, cursors) =>
    listOf(work.db, 'test_helpers.test_clock', '/v1/test_helpers/test_clocks', { paging: cursors }),
  ),
];
