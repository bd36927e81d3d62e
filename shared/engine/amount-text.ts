import type { Range } from '../contracts/primitives.ts';
import type { Unit } from '../contracts/words.ts';

const FRACTIONS: readonly (readonly [number, string])[] = [
  [1 / 8, '⅛'],
  [1 / 4, '¼'],
  [1 / 3, '⅓'],
  [3 / 8, '⅜'],
  [1 / 2, '½'],
  [5 / 8, '⅝'],
  [2 / 3, '⅔'],
  [3 / 4, '¾'],
  [7 / 8, '⅞'],
];

const DECIMAL: readonly (Unit | null)[] = ['ml', 'cl', 'l', 'g', 'kg'];

/** A printed amount, and the unit whose label follows it; `plural` is the number that the label agrees with. */
export interface AmountText {
  text: string;
  unit: Unit | null;
  plural: number;
}

/**
 * An amount as it is printed: decimals with metric units, proper fractions (1½) with all others, two ends joined by an en
 * dash. `locale` is a BCP 47 tag for the decimal sign; British English unless told.
 */
export function writeAmount({ min, max }: Range, unit: Unit | null, locale = 'en-GB'): AmountText {
  const write = (amount: number) => (DECIMAL.includes(unit) ? decimal(amount, locale) : fraction(amount, locale));
  const text = write(min) === write(max) ? write(max) : `${write(min)}–${write(max)}`;
  return { text, unit, plural: max };
}

function decimal(amount: number, locale: string): string {
  return new Intl.NumberFormat(locale, { maximumFractionDigits: 3, useGrouping: false }).format(amount);
}

function fraction(amount: number, locale: string): string {
  const whole = Math.floor(amount + 1e-9);
  const rest = amount - whole;
  if (Math.abs(rest) < 1e-3) return decimal(whole, locale);
  const sign = FRACTIONS.find(([value]) => Math.abs(value - rest) < 1e-3)?.[1];
  if (!sign) return decimal(amount, locale);
  return whole === 0 ? sign : `${decimal(whole, locale)}${sign}`;
}
