import type { CardEntry } from '../cards.ts';
import { html, type Markup } from './html.ts';

export type Form = Record<string, unknown>;

export function fieldOf(form: Form, name: string): string {
  const value = form[name];
  return typeof value === 'string' ? value.trim() : '';
}

/** The fields for a card. What was typed stays, apart from the number and code. */
export function cardFields(form: Form): Markup {
  return html`
    <label for="cardNumber">Card number</label>
    <input id="cardNumber" name="cardNumber" inputmode="numeric" autocomplete="cc-number" required />
    <div class="pair">
      <div>
        <label for="cardExpiry">Expiry (MM/YY)</label>
        <input
          id="cardExpiry"
          name="cardExpiry"
          autocomplete="cc-exp"
          value="${fieldOf(form, 'cardExpiry')}"
          required
        />
      </div>
      <div>
        <label for="cardCvc">CVC</label>
        <input id="cardCvc" name="cardCvc" inputmode="numeric" autocomplete="cc-csc" required />
      </div>
    </div>
    <label for="cardName">Name on card</label>
    <input id="cardName" name="cardName" autocomplete="cc-name" value="${fieldOf(form, 'cardName')}" required />
  `;
}

export const testCards: Markup = html`
  <details>
    <summary>Test cards</summary>
    <p>Any future expiry and any three digits as CVC.</p>
    <ul>
      <li><code>4242 4242 4242 4242</code> pays</li>
      <li><code>4000 0000 0000 0002</code> is declined</li>
      <li><code>4000 0025 0000 3155</code> asks for a confirmation</li>
      <li><code>4000 0000 0000 0341</code> pays now and is declined at renewals</li>
    </ul>
  </details>
`;

/** Reads the card that was typed; answers with a sentence when something is not a card's. */
export function readCard(form: Form, now: number): CardEntry | string {
  const number = fieldOf(form, 'cardNumber').replaceAll(/[\s-]/g, '');
  if (!/^\d{12,19}$/.test(number)) return 'Your card number is incomplete.';

  const [, month = '', year = ''] = /^(\d{1,2})\s*\/\s*(?:20)?(\d{2})$/.exec(fieldOf(form, 'cardExpiry')) ?? [];
  const [expMonth, expYear] = [Number(month), 2000 + Number(year)];
  if (month === '' || expMonth < 1 || expMonth > 12) return "Your card's expiry is incomplete: write it as MM/YY.";
  if (Date.UTC(expYear, expMonth) / 1000 <= now) return "Your card's expiration date is in the past.";

  const cvc = fieldOf(form, 'cardCvc');
  if (!/^\d{3,4}$/.test(cvc)) return "Your card's security code is incomplete.";
  const name = fieldOf(form, 'cardName');
  if (name === '') return 'Write the name on the card.';
  return { number, expMonth, expYear, cvc, name, email: null };
}
