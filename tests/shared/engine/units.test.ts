import { describe, expect, it } from 'vitest';
import type { Unit } from '../../../shared/contracts/words.ts';
import { DEFAULT_TRADE_MEASURES } from '../../../shared/engine/trade-measures.ts';
import { convert, dimensionOf, toGrams, toMillilitres } from '../../../shared/engine/units.ts';

// US customary: NIST Handbook 44 appendix C and SP 811 appendix B, from the gallon of 231 cubic inches.
// Imperial: Units of Measurement Regulations 1995 (United Kingdom), from the gallon of 4.54609 L.
const VOLUMES: readonly (readonly [Unit, number])[] = [
  ['floz', 29.5735295625],
  ['tsp', 4.92892159375],
  ['tbsp', 14.78676478125],
  ['cup', 236.5882365],
  ['pint', 473.176473],
  ['quart', 946.352946],
  ['gill', 118.29411825],
  ['imp-floz', 28.4130625],
  ['imp-pint', 568.26125],
  ['imp-quart', 1136.5225],
  ['imp-gill', 142.0653125],
  ['l', 1000],
  ['cl', 10],
];

// International avoirdupois pound of 0.45359237 kg: NIST SP 811 appendix B.
const MASSES: readonly (readonly [Unit, number])[] = [
  ['oz', 28.349523125],
  ['lb', 453.59237],
  ['kg', 1000],
];

// Ranges of published tables of bar measures; common practice.
const TRADE: readonly (readonly [Unit, number, number])[] = [
  ['dash', 0.77, 1.64],
  ['drop', 0.03, 0.07],
  ['barspoon', 2.5, 5],
  ['splash', 0.92, 3.7],
];

describe('units', () => {
  it.each(VOLUMES)('one %s is %d ml by definition', (unit, ml) => {
    expect(toMillilitres(1, unit)).toBeCloseTo(ml, 9);
  });

  it.each(MASSES)('one %s is %d g by definition', (unit, grams) => {
    expect(toGrams(1, unit)).toBeCloseTo(grams, 9);
  });

  it.each(TRADE)('a %s stays within the %d to %d ml that the trade takes for it', (unit, min, max) => {
    expect(toMillilitres(1, unit)).toBeGreaterThanOrEqual(min);
    expect(toMillilitres(1, unit)).toBeLessThanOrEqual(max);
  });

  it('takes the imprint’s own size of a dash', () => {
    expect(toMillilitres(3, 'dash', { ...DEFAULT_TRADE_MEASURES, dash: 0.8 })).toBeCloseTo(2.4, 12);
  });

  it('converts within a dimension and refuses across', () => {
    expect(convert(1, 'cup', 'floz')).toBeCloseTo(8, 12);
    expect(convert(1, 'imp-pint', 'imp-floz')).toBeCloseTo(20, 12);
    expect(convert(1, 'lb', 'oz')).toBeCloseTo(16, 12);
    expect(convert(1, 'cup', 'g')).toBeNull();
    expect(convert(2, 'leaf', 'ml')).toBeNull();
    expect(convert(2, 'leaf', 'leaf')).toBe(2);
  });

  it('knows the US cup from the 240 ml of a nutrition label (21 CFR 101.9(b)(5)(viii))', () => {
    expect(toMillilitres(1, 'cup')).not.toBe(240);
    expect(toGrams(1, 'oz')).not.toBe(28);
  });

  it('tells volumes, masses, counts and parts apart', () => {
    expect((['ml', 'oz', 'sprig', 'part', 'dash'] as const).map(dimensionOf)).toEqual([
      'volume',
      'mass',
      'count',
      'part',
      'volume',
    ]);
  });
});
