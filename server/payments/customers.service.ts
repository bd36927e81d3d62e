import type { AppContext } from '../context.ts';
import { withLock } from '../db/lock.ts';
import { findCustomerOf, insertCustomer } from '../memberships/memberships.queries.ts';
import { callStripe, idempotencyKey } from './call-stripe.ts';

interface Payer {
  id: string;
  email: string;
  name: string;
}

/** The person's customer at the payment service, made the first time; one person's calls run one after the other. */
export async function ensureCustomer({ db, stripe }: AppContext, { id, email, name }: Payer): Promise<string> {
  return withLock(db, `payer:${id}`, async (trx) => {
    const known = await findCustomerOf(trx, id);
    if (known) return known.stripe_customer;
    const params = { email, name, metadata: { personId: id } };
    const made = await callStripe(() =>
      stripe.customers.create(params, { idempotencyKey: idempotencyKey('customer', params) }),
    );
    await insertCustomer(trx, { person_id: id, stripe_customer: made.id });
    return made.id;
  });
}
