import { withEnding } from '../billing/cancel.ts';
import { collect, declineOf } from '../billing/collect.ts';
import { behaviourOf, newCardMethod } from '../cards.ts';
import { periodOf } from '../due.ts';
import { invalid } from '../errors.ts';
import { formatMoney } from '../money.ts';
import { openInvoices } from '../resources/invoices.ts';
import { attach } from '../resources/payment-methods.ts';
import { all, change, create, instantOf, read, readKept, type Kept } from '../store.ts';
import type { Kinds } from '../wire.ts';
import type { Work } from '../work.ts';
import { cardFields, fieldOf, readCard, testCards, type Form } from './card-form.ts';
import { day, errorNotice, html, pageOf, type Markup } from './html.ts';

type Session = Kinds['billing_portal.session'];

async function subscriptionBlock(work: Work, { data }: Kept<'subscription'>, session: Session): Promise<Markup> {
  const [item] = data.items.data;
  const name = item ? (await read(work.db, 'product', item.price.product)).name : data.id;
  const { end } = periodOf(data);
  const ends = data.cancel_at !== null;
  return html`
    <h2>${name}</h2>
    <p>${data.status}; ${ends ? html`ends on ${day(data.cancel_at ?? end)}` : html`renews on ${day(end)}`}</p>
    <form method="post" action="/portal/${session.id}/${ends ? 'resume' : 'cancel'}">
      <input type="hidden" name="subscription" value="${data.id}" />
      <button type="submit" class="plain">${ends ? `Keep ${name}` : `Cancel ${name} at the end of the period`}</button>
    </form>
  `;
}

function invoiceRows(invoices: Kept<'invoice'>[]): Markup[] {
  return invoices.map(
    ({ data }) =>
      html`<tr>
        <td>
          <a href="${data.hosted_invoice_url ?? '#'}">${data.number ?? 'Draft'}</a>, ${day(data.created)},
          ${data.status}
        </td>
        <td>${formatMoney(data.total, data.currency)}</td>
      </tr>`,
  );
}

/** The customer's own page: what runs, the card, the invoices. */
export async function portalPage(work: Work, session: Session, form: Form, message: string | null): Promise<string> {
  const running = (await all(work.db, 'subscription', { customer: session.customer })).filter(
    ({ data }) => data.ended_at === null,
  );
  const blocks: Markup[] = [];
  for (const kept of running) blocks.push(await subscriptionBlock(work, kept, session));
  const body = html`
    <h1>Your membership</h1>
    ${errorNotice(message)} ${running.length === 0 ? html`<p>Nothing is running.</p>` : blocks}
    <h2>Card</h2>
    <form method="post" action="/portal/${session.id}/card">
      ${cardFields(form)}
      <button type="submit">Use this card</button>
    </form>
    <h2>Invoices</h2>
    <table>
      <tbody>
        ${invoiceRows(await all(work.db, 'invoice', { customer: session.customer }))}
      </tbody>
    </table>
    ${session.return_url && html`<p><a href="${session.return_url}">Go back</a></p>`} ${testCards}
  `;
  return pageOf('Your membership', body);
}

async function ownSubscription(work: Work, session: Session, form: Form): Promise<Kept<'subscription'>> {
  const kept = await readKept(work.db, 'subscription', fieldOf(form, 'subscription'));
  if (kept.data.customer !== session.customer) throw invalid('This subscription is not yours.');
  return kept;
}

/** Sets or takes back the end. Under flexible billing the portal sets the date and not the flag. */
export async function setEnding(work: Work, session: Session, form: Form, ends: boolean): Promise<void> {
  const kept = await ownSubscription(work, session, form);
  const now = await instantOf(work, kept.data);
  const after = withEnding(kept.data, ends ? periodOf(kept.data).end : null, now);
  await change(work, kept, after, { event: 'customer.subscription.updated' });
}

/** Makes a card the one that is charged, and charges it for what is open. Returns why it was refused, or null. */
export async function useCard(work: Work, session: Session, form: Form): Promise<string | null> {
  const customer = await readKept(work.db, 'customer', session.customer);
  const now = await instantOf(work, customer.data);
  const entry = readCard(form, now);
  if (typeof entry === 'string') return entry;
  const card = behaviourOf(entry.number);
  const decline = declineOf(card, 'present');
  if (decline) return decline.message;

  const method = newCardMethod({ ...entry, email: customer.data.email }, now);
  await create(work, 'payment_method', method, { hidden: { card } });
  await attach(work, method.id, session.customer);
  const settings = { ...customer.data.invoice_settings, default_payment_method: method.id };
  await change(work, customer, { ...customer.data, invoice_settings: settings }, { event: 'customer.updated' });
  for (const kept of await all(work.db, 'subscription', { customer: session.customer })) {
    if (kept.data.ended_at !== null) continue;
    const after = { ...kept.data, default_payment_method: method.id };
    await change(work, kept, after, { event: 'customer.subscription.updated' });
  }
  for (const invoice of await openInvoices(work, session.customer)) {
    if (invoice.auto_advance) await collect(work, invoice.id, { presence: 'present' });
  }
  return null;
}
