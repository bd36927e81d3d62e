/** Minor units as people read them: `(1250, 'gbp')` is `£12.50`, `(500, 'jpy')` is `JP¥500`. */
export function formatMoney(amount: number, currency: string): string {
  const format = new Intl.NumberFormat('en-GB', { style: 'currency', currency });
  const digits = format.resolvedOptions().maximumFractionDigits ?? 2;
  return format.format(amount / 10 ** digits);
}
