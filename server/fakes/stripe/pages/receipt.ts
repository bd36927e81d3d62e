import type { Kinds } from '../wire.ts';
import { formatMoney } from '../money.ts';
import { day, html, pageOf } from './html.ts';

/** A plain receipt or bill for an invoice. */
export function receiptPage(invoice: Kinds['invoice']): string {
  const money = (amount: number): string => formatMoney(amount, invoice.currency);
  const paidAt = invoice.status_transitions.paid_at;
  const body = html`
    <h1>${invoice.status === 'paid' ? 'Receipt' : 'Invoice'} ${invoice.number}</h1>
    <dl>
      <dt>Date</dt>
      <dd>${day(invoice.created)}</dd>
      <dt>To</dt>
      <dd>${invoice.customer_name} ${invoice.customer_email}</dd>
      <dt>Status</dt>
      <dd>${invoice.status}${paidAt !== null && ` on ${day(paidAt)}`}</dd>
    </dl>
    <h2>For</h2>
    <table>
      <tbody>
        ${invoice.lines.data.map(
          (line) =>
            html`<tr>
              <td>${line.description}<br />${day(line.period.start)} – ${day(line.period.end)}</td>
              <td>${money(line.amount)}</td>
            </tr>`,
        )}
      </tbody>
    </table>
    <dl>
      <dt>Total</dt>
      <dd>${money(invoice.total)}</dd>
      <dt>Paid</dt>
      <dd>${money(invoice.amount_paid)}</dd>
    </dl>
  `;
  return pageOf(`Invoice ${invoice.number ?? ''}`, body);
}
