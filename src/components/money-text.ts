/** Money as it is typed and read, without going through binary fractions; the currencies of an imprint have two minor digits. */

const MONEY = /^(\d{1,7})(?:[.,](\d{1,2}))?$/;

/** Minor units of what was typed: `4`, `4.5`, `4,50`; null where nothing is typed, undefined where it is no amount of money. */
export function readMoney(typed: string): number | null | undefined {
  const text = typed.trim();
  if (text === '') return null;
  const found = MONEY.exec(text);
  if (!found) return undefined;
  return Number(found[1]) * 100 + Number((found[2] ?? '').padEnd(2, '0'));
}

/** Minor units as they are typed: `4.50`, without a sign of the currency. */
export function writeMoney(minor: number): string {
  const rest = minor % 100;
  return `${(minor - rest) / 100}.${String(rest).padStart(2, '0')}`;
}
