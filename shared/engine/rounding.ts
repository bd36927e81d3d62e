import type { Unit } from '../contracts/words.ts';

/** Steps in which a unit can be measured, for amounts below each bound; several steps mean that any of them may be met. */
type Ladder = readonly (readonly [below: number, ...steps: number[]])[];

const METRIC_SMALL: Ladder = [
  [1, 0.1],
  [10, 0.5],
  // A jigger has lines at 22.5 and 37.5.
  [100, 1, 2.5],
  [Infinity, 5],
];
const GRAMS: Ladder = [
  [1, 0.01],
  [10, 0.1],
  [Infinity, 1],
];
const QUARTERS: Ladder = [[Infinity, 0.25]];
const SPOONS: Ladder = [
  [0.25, 0.125],
  [Infinity, 0.25],
];
const HALVES: Ladder = [[Infinity, 0.5]];
const WHOLES: Ladder = [[Infinity, 1]];

const LADDERS: Partial<Record<Unit, Ladder>> = {
  ml: METRIC_SMALL,
  cl: [[Infinity, 0.1, 0.25]],
  l: [[Infinity, 0.01]],
  g: GRAMS,
  kg: [[Infinity, 0.001]],
  floz: QUARTERS,
  'imp-floz': QUARTERS,
  oz: QUARTERS,
  lb: QUARTERS,
  cup: [[Infinity, 0.25, 1 / 3]],
  pint: QUARTERS,
  quart: QUARTERS,
  gill: QUARTERS,
  'imp-pint': QUARTERS,
  'imp-quart': QUARTERS,
  'imp-gill': QUARTERS,
  part: QUARTERS,
  tsp: SPOONS,
  tbsp: SPOONS,
  dash: WHOLES,
  drop: WHOLES,
  pinch: WHOLES,
  splash: WHOLES,
  leaf: WHOLES,
  sprig: WHOLES,
  slice: WHOLES,
  twist: WHOLES,
  strip: WHOLES,
};

/**
 * The nearest amount that a person can measure with scale, jigger, spoons or by counting, never none of it.
 *
 * Millilitres go by 1 below 100 (and the jigger's 2.5) and by 5 from there, finer below 10; grams by 1, below 10 on a
 * precision scale; ounces and spoons by quarters; dashes and leaves whole; what is left, pieces among it, by halves.
 *
 * @example
 * roundToMeasure(0.3, 'piece') // 0.5
 */
export function roundToMeasure(amount: number, unit: Unit | null): number {
  if (amount <= 0) return 0;
  const ladder = (unit && LADDERS[unit]) ?? HALVES;
  const [, ...steps] = ladder.find(([below]) => amount < below) ?? [Infinity, 1];
  return steps
    .map((step) => nearest(amount, step))
    .reduce((best, each) => (isNearer(each, best, amount) ? each : best));
}

/** To whole numbers, never none: what must stay countable. */
export function roundToWhole(amount: number): number {
  return amount <= 0 ? 0 : Math.max(1, Math.round(amount));
}

function nearest(amount: number, step: number): number {
  const steps = Math.max(1, Math.round(amount / step));
  // 0.1 × 3 is not 0.3 in binary; no step is finer than this.
  return Math.round(steps * step * 1e6) / 1e6;
}

const isNearer = (a: number, b: number, amount: number) => Math.abs(a - amount) < Math.abs(b - amount);
