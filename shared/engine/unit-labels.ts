import type { Unit } from '../contracts/words.ts';

/** How a unit is written after an amount; `one` serves amounts up to 1, `many` those above. */
export interface UnitLabel {
  one: string;
  many: string;
}

const same = (label: string): UnitLabel => ({ one: label, many: label });
const counted = (one: string, many = `${one}s`): UnitLabel => ({ one, many });

/** English labels of the units, shared by the catalogue of messages and what is typeset. A `piece` is not spelt out. */
export const UNIT_LABELS: Readonly<Record<Unit, UnitLabel>> = {
  ml: same('ml'),
  cl: same('cl'),
  l: same('l'),
  g: same('g'),
  kg: same('kg'),
  oz: same('oz'),
  lb: same('lb'),
  floz: same('fl oz'),
  tsp: same('tsp'),
  tbsp: same('tbsp'),
  cup: counted('cup'),
  pint: counted('pint'),
  quart: counted('quart'),
  gill: counted('gill'),
  'imp-floz': same('imp. fl oz'),
  'imp-pint': counted('imp. pint'),
  'imp-quart': counted('imp. quart'),
  'imp-gill': counted('imp. gill'),
  dash: counted('dash', 'dashes'),
  drop: counted('drop'),
  barspoon: counted('barspoon'),
  pinch: counted('pinch', 'pinches'),
  splash: counted('splash', 'splashes'),
  piece: same(''),
  part: counted('part'),
  leaf: counted('leaf', 'leaves'),
  sprig: counted('sprig'),
  handful: counted('handful'),
  slice: counted('slice'),
  twist: counted('twist'),
  strip: counted('strip'),
  stick: counted('stick'),
  pod: counted('pod'),
  drink: counted('drink'),
  bottle: counted('bottle'),
};
