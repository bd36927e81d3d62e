import type { Knex } from 'knex';
import { intervalOf } from '../billing/prices.ts';
import { amountOff } from '../billing/discounts.ts';
import { formatMoney } from '../money.ts';
import { lineItemsOf } from '../resources/line-items.ts';
import { findKept, read, type Kept } from '../store.ts';
import { cardFields, fieldOf, testCards, type Form } from './card-form.ts';
import { day, errorNotice, html, pageOf, type Markup } from './html.ts';

type Session = Kept<'checkout.session'>;

async function summary(db: Knex, session: Session): Promise<Markup> {
  const { plan } = session.hidden;
  const { data: items } = await lineItemsOf(db, session);
  const currency = session.data.currency ?? 'gbp';
  const rows = items.map((item) => {
    const every = item.price ? intervalOf(item.price) : null;
    const per = every && (every.count === 1 ? `per ${every.unit}` : `every ${every.count} ${every.unit}s`);
    return html`<dt>${item.description}</dt>
      <dd>${formatMoney(item.amount_total, currency)} ${per}</dd>`;
  });
  const trial = plan?.trialDays
    ? html`<p>Free for ${plan.trialDays} days; then the price above.</p>`
    : plan?.trialEnd && html`<p>Free until ${day(plan.trialEnd)}; then the price above.</p>`;
  return html`<dl>
      ${rows}
      <dt>Due today</dt>
      <dd>${formatMoney(session.data.amount_total ?? 0, currency)}</dd>
    </dl>
    ${trial}`;
}

async function discountNote(db: Knex, { data }: Session): Promise<Markup | null> {
  const [first] = data.discounts ?? [];
  if (!first?.coupon) return null;
  const coupon = await read(db, 'coupon', first.coupon);
  const off = amountOff(coupon, data.amount_subtotal ?? 0);
  return html`<p>${coupon.name ?? coupon.id}: ${formatMoney(off, data.currency ?? 'gbp')} off.</p>`;
}

/** The hosted page of an open session. */
export async function checkoutPage(db: Knex, session: Session, form: Form, message: string | null): Promise<string> {
  const { data } = session;
  const customer = data.customer ? await findKept(db, 'customer', data.customer) : undefined;
  const email = customer?.data.email ?? data.customer_email;
  const total = formatMoney(data.amount_total ?? 0, data.currency ?? 'gbp');
  const body = html`
    <h1>Pay and join</h1>
    ${errorNotice(message)} ${await summary(db, session)} ${await discountNote(db, session)}
    <form method="post" action="/checkout/${data.id}">
      ${
        email === null
          ? html`<label for="email">Email</label>
              <input
                id="email"
                name="email"
                type="email"
                autocomplete="email"
                value="${fieldOf(form, 'email')}"
                required
              />`
          : html`<p>Paying as <strong>${email}</strong></p>`
      }
      ${cardFields(form)}
      ${
        data.allow_promotion_codes &&
        html`<label for="promotionCode">Promotion code</label>
          <input id="promotionCode" name="promotionCode" value="${fieldOf(form, 'promotionCode')}" />`
      }
      ${data.custom_text.submit && html`<p>${data.custom_text.submit.message}</p>`}
      <button type="submit">Pay ${total}</button>
    </form>
    ${data.cancel_url && html`<p><a href="${data.cancel_url}">Cancel and go back</a></p>`} ${testCards}
  `;
  return pageOf('Checkout', body);
}

/** The question a card's bank asks before it pays. */
export function challengePage({ data }: Session): string {
  const body = html`
    <h1>Confirm the payment</h1>
    <p>Your bank asks whether it is you who pays ${formatMoney(data.amount_total ?? 0, data.currency ?? 'gbp')}.</p>
    <form method="post" action="/checkout/${data.id}/challenge">
      <button type="submit" name="answer" value="complete">Complete authentication</button>
      <button type="submit" name="answer" value="fail" class="plain">Fail authentication</button>
    </form>
  `;
  return pageOf('Confirm the payment', body);
}

export function closedPage({ data }: Session): string {
  const body = html`
    <h1>This page has expired</h1>
    <p>Nothing was paid.</p>
    ${data.cancel_url && html`<p><a href="${data.cancel_url}">Go back</a></p>`}
  `;
  return pageOf('Expired', body);
}
