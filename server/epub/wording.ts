import type { Figure } from '../../shared/contracts/figures.ts';
import type { Range } from '../../shared/contracts/primitives.ts';
import { writeAmount } from '../../shared/engine/amount-text.ts';
import { UNIT_LABELS } from '../../shared/engine/unit-labels.ts';
import type { Unit } from '../../shared/contracts/words.ts';
import { WORDING } from '../../shared/wording/en.ts';

const NBSP = '\u00a0';

/** A range of numbers, joined by an en dash where the ends differ as written. */
export function numbers({ min, max }: Range, digits = 0): string {
  const write = (value: number) => new Intl.NumberFormat('en-GB', { maximumFractionDigits: digits }).format(value);
  return write(min) === write(max) ? write(max) : `${write(min)}–${write(max)}`;
}

/** An amount with its unit, as it is printed. */
export function measure(amount: Range, unit: Unit | null): string {
  const { text, plural } = writeAmount(amount, unit);
  const label = unit ? UNIT_LABELS[unit][plural > 1 ? 'many' : 'one'] : '';
  return label ? `${text}${NBSP}${label}` : text;
}

const SPANS: readonly [seconds: number, one: string, many: string][] = [
  [604_800, 'week', 'weeks'],
  [86_400, 'day', 'days'],
  [3600, 'h', 'h'],
  [60, 'min', 'min'],
  [1, 's', 's'],
];

/** A duration in its two largest units. */
export function duration(seconds: number): string {
  const parts: string[] = [];
  let rest = Math.round(seconds);
  for (const [span, one, many] of SPANS) {
    // Weeks only where nothing is left over: nine days are nine days.
    if (span === 604_800 && (rest < 2 * span || rest % span !== 0)) continue;
    const count = Math.floor(rest / span);
    if (count > 0 && parts.length < 2) parts.push(`${count}${NBSP}${count === 1 ? one : many}`);
    rest -= count * span;
  }
  return parts.join(' ') || `0${NBSP}min`;
}

export function durations({ min, max }: Range): string {
  return min === max ? duration(min) : `${duration(min)} to ${duration(max)}`;
}

/** A figure with how it came about; nothing where it is not known. */
export function figureText(figure: Figure, write: (range: Range) => string): string | null {
  return figure.known ? `${write(figure)} (${WORDING.provenance[figure.how]})` : null;
}
