import { beginSubscription } from '../billing/begin.ts';
import { declineOf } from '../billing/collect.ts';
import { amountOff, readDiscount, type TakenDiscount } from '../billing/discounts.ts';
import { amountOf } from '../billing/prices.ts';
import { behaviourOf, newCardMethod } from '../cards.ts';
import { DAY } from '../due.ts';
import { Fault } from '../errors.ts';
import { attach } from '../resources/payment-methods.ts';
import { newCustomer } from '../resources/customers.ts';
import { all, change, create, instantOf, read, type Kept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';
import { fieldOf, readCard, type Form } from './card-form.ts';

export type Attempt = { outcome: 'paid' } | { outcome: 'challenge' } | { outcome: 'refused'; message: string };

type Session = Kept<'checkout.session'>;

const refused = (message: string): Attempt => ({ outcome: 'refused', message });

/** Where a paid page leads: the success address with the session's id filled in. */
export function successAddress({ id, success_url: url }: Kinds['checkout.session']): string {
  return (url ?? '').replaceAll(/(\{|%7B)CHECKOUT_SESSION_ID(\}|%7D)/gi, id);
}

async function promotionOf(work: Work, session: Kinds['checkout.session'], code: string): Promise<string | null> {
  const codes = await all(work.db, 'promotion_code');
  const found = codes.find(({ data }) => data.active && data.code.toLowerCase() === code.toLowerCase());
  if (!found) return null;
  try {
    await readDiscount(work.db, { promotion_code: found.data.id }, { customer: session.customer, now: work.now });
    return found.data.id;
  } catch (error) {
    if (error instanceof Fault) return null;
    throw error;
  }
}

/** Tries the card that was typed. A refusal leaves the page open and nothing behind. */
export async function payCheckout(work: Work, kept: Session, form: Form): Promise<Attempt> {
  const entry = readCard(form, work.now);
  if (typeof entry === 'string') return refused(entry);
  const email = kept.data.customer_email ?? fieldOf(form, 'email');
  if (!kept.data.customer && !/^[^\s@]+@[^\s@]+$/.test(email)) return refused('Write your e-mail address.');

  const session = { ...kept.data };
  const code = session.allow_promotion_codes ? fieldOf(form, 'promotionCode') : '';
  if (code !== '') {
    const promotion = await promotionOf(work, session, code);
    if (promotion === null) return refused('This promotion code is not valid.');
    session.discounts = [{ coupon: null, promotion_code: promotion }];
  }

  const card = behaviourOf(entry.number);
  const decline = declineOf(card, 'present');
  if (decline) return refused(decline.message);
  const method = newCardMethod({ ...entry, email: email || null }, work.now);
  const hidden = { ...kept.hidden, card, challenged: method };
  await change(work, kept, session, { hidden });
  if (card.challenge) return { outcome: 'challenge' };
  return complete(work, { data: session, hidden });
}

/** Answers the challenge that a card asked for. */
export async function answerChallenge(work: Work, kept: Session, passed: boolean): Promise<Attempt> {
  if (!kept.hidden.challenged) return refused('Enter your card first.');
  if (passed) return complete(work, kept);
  const { challenged: _challenged, card: _card, ...hidden } = kept.hidden;
  await change(work, kept, kept.data, { hidden });
  return refused(
    'We are unable to authenticate your payment method. Please choose a different payment method and try again.',
  );
}

async function customerOf(work: Work, { data }: Session, method: Kinds['payment_method']): Promise<Kinds['customer']> {
  if (data.customer) return read(work.db, 'customer', data.customer);
  const fields = { email: method.billing_details.email, name: method.billing_details.name };
  return create(work, 'customer', newCustomer(fields, work.now), { event: 'customer.created' });
}

async function discountsOf(work: Work, session: Kinds['checkout.session'], customer: string): Promise<TakenDiscount[]> {
  const taken: TakenDiscount[] = [];
  for (const { coupon, promotion_code: code } of session.discounts ?? []) {
    const choice = code ? { promotion_code: code } : { coupon: coupon ?? '' };
    taken.push(await readDiscount(work.db, choice, { customer, now: work.now }));
  }
  return taken;
}

/** Attaches the card, starts and pays the subscription and completes the session, all or nothing. */
async function complete(work: Work, kept: Session): Promise<Attempt> {
  const { plan, challenged: method, card } = kept.hidden;
  if (!plan || !method || !card) throw new Error(`Session ${kept.data.id} has nothing to start.`);

  const customer = await customerOf(work, kept, method);
  const now = await instantOf(work, customer);
  await create(work, 'payment_method', method, { hidden: { card } });
  await attach(work, method.id, customer.id);
  const prices = await Promise.all(plan.items.map((item) => read(work.db, 'price', item.price)));
  const discounts = await discountsOf(work, kept.data, customer.id);

  const { subscription, invoice } = await beginSubscription(work, {
    customer,
    items: plan.items.flatMap(({ quantity }, i) => (prices[i] ? [{ price: prices[i], quantity }] : [])),
    method: method.id,
    trialEnd: plan.trialEnd ?? (plan.trialDays ? now + plan.trialDays * DAY : null),
    metadata: plan.metadata,
    description: plan.description,
    discounts,
    session: kept.data.id,
    presence: 'present',
    charge: true,
  });

  const isTrial = subscription.trial_end !== null;
  const sum = prices.reduce((total, price, i) => total + amountOf(price, plan.items[i]?.quantity ?? 1), 0);
  const subtotal = isTrial ? 0 : sum;
  const off = discounts.reduce((total, { coupon }) => total + amountOff(coupon, subtotal), 0);
  await change(
    work,
    kept,
    {
      ...kept.data,
      amount_subtotal: subtotal,
      amount_total: subtotal - off,
      customer: customer.id,
      customer_details: {
        address: method.billing_details.address,
        business_name: null,
        email: customer.email,
        individual_name: null,
        name: method.billing_details.name,
        phone: null,
        tax_exempt: 'none',
        tax_ids: [],
      },
      invoice: invoice.id,
      payment_status: subtotal - off > 0 ? 'paid' : 'no_payment_required',
      status: 'complete',
      subscription: subscription.id,
      total_details: { amount_discount: off, amount_shipping: 0, amount_tax: 0 },
      url: null,
    },
    { hidden: { plan }, event: 'checkout.session.completed' },
  );
  return { outcome: 'paid' };
}
