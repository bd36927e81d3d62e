import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { LineScaling } from '../../../shared/contracts/recipe-document.ts';
import { factorForBottles, factorForLine, factorForServings, factorForVolume } from '../../../shared/engine/factors.ts';
import { known, unknown } from '../../../shared/engine/figure.ts';
import type { ReadingSystem } from '../../../shared/engine/measures.ts';
import { scaleAmount, scaleLine, scaleLines, type ScalingWish } from '../../../shared/engine/scaling.ts';
import { aLine, aRecipe, pour, seconds } from './build.ts';

const RULES: LineScaling[] = [
  { rule: 'linear' },
  { rule: 'whole' },
  { rule: 'to-taste' },
  { rule: 'fixed' },
  { rule: 'power', exponent: 0.8 },
];

const read = (
  amount: number,
  unit: Parameters<typeof aLine>[0]['unit'],
  wish: ScalingWish,
  rule: LineScaling = { rule: 'linear' },
) => {
  const scaled = scaleLine(aLine({ id: 'x', amount, unit: unit ?? null, scaling: rule }), wish);
  return { text: scaled.text?.text, unit: scaled.unit, off: scaled.deviation };
};

describe('scaling a line', () => {
  it.each([
    [60, 'ml', 1.4, '84', 'ml'],
    [80, 'ml', 1.4, '110', 'ml'],
    [22.5, 'ml', 1, '22.5', 'ml'],
    [7.5, 'ml', 3, '22.5', 'ml'],
    [333.4, 'g', 1.5, '500', 'g'],
    [3.4, 'g', 0.5, '1.7', 'g'],
    [0.5, 'g', 0.5, '0.25', 'g'],
    [1, 'piece', 1 / 3, '½', 'piece'],
    [3, 'leaf', 0.1, '1', 'leaf'],
    [2, 'dash', 1.6, '3', 'dash'],
    [1, 'tsp', 1.5, '1½', 'tsp'],
    [1, 'cup', 1 / 3, '⅓', 'cup'],
  ] as const)('%d %s times %d is %s %s', (amount, unit, factor, text, shownUnit) => {
    expect(read(amount, unit, { factor })).toMatchObject({ text, unit: shownUnit });
  });

  it('keeps what is counted whole, and never lets it vanish', () => {
    expect(read(1, 'pod', { factor: 2.5 }, { rule: 'whole' }).text).toBe('3');
    expect(read(1, 'pod', { factor: 0.1 }, { rule: 'whole' }).text).toBe('1');
  });

  it('scales strong spice below linear, and leaves what is fixed', () => {
    expect(scaleAmount(10, { rule: 'power', exponent: 0.5 }, 4)).toBeCloseTo(20, 12);
    expect(scaleAmount(10, { rule: 'fixed' }, 4)).toBe(10);
  });

  it('says how far off a rounding is once it passes 2 %', () => {
    expect(read(1, 'dash', { factor: 1.4 }).off).toBeCloseTo(1 / 1.4 - 1, 12);
    expect(read(50, 'ml', { factor: 1.02 }).off).toBeNull();
  });

  it('writes ranges with an en dash and keeps both ends', () => {
    const scaled = scaleLine(aLine({ id: 'x', amount: { min: 5, max: 10 }, unit: 'ml' }), { factor: 2 });
    expect(scaled).toMatchObject({
      exact: { min: 10, max: 20 },
      shown: { min: 10, max: 20 },
      text: { text: '10–20', plural: 20 },
    });
  });

  it('leaves a line without an amount alone', () => {
    expect(scaleLine(aLine({ id: 'x', unit: null }), { factor: 3 })).toMatchObject({
      exact: null,
      shown: null,
      text: null,
    });
  });

  it.each([0, -1, Number.NaN, Infinity])('refuses a factor of %d', (factor) => {
    expect(() => scaleLine(pour(10, 'gin'), { factor })).toThrow(RangeError);
  });

  it('comes back by k and then 1/k to within 1e-12, whatever the rule', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.001, max: 10_000, noNaN: true }),
        fc.double({ min: 0.01, max: 1000, noNaN: true }),
        fc.constantFrom(...RULES),
        (amount, factor, scaling) => {
          const back = scaleAmount(scaleAmount(amount, scaling, factor), scaling, 1 / factor);
          expect(Math.abs(back / amount - 1)).toBeLessThanOrEqual(1e-12);
        },
      ),
    );
  });

  it('never changes the document', () => {
    const document = aRecipe([pour(50, 'gin'), pour(1, 'vanilla-pod', 'pod')]);
    const before = structuredClone(document);
    expect(scaleLines(document, { factor: 7.3, system: 'us' })).toHaveLength(2);
    expect(document).toEqual(before);
  });
});

describe('reading in another system', () => {
  // Bar practice: 15, 30, 45 and 60 ml are poured as ½, 1, 1½ and 2 fl oz; 5 ml as a teaspoon.
  it.each([
    [15, 'ml', 'us', '½', 'floz'],
    [30, 'ml', 'us', '1', 'floz'],
    [45, 'ml', 'us', '1½', 'floz'],
    [60, 'ml', 'us', '2', 'floz'],
    [7.5, 'ml', 'us', '¼', 'floz'],
    [5, 'ml', 'us', '1', 'tsp'],
    [25, 'ml', 'imperial', '5', 'tsp'],
    [200, 'g', 'us', '7', 'oz'],
    [5, 'g', 'us', '5', 'g'],
    [2, 'floz', 'metric', '59', 'ml'],
    [1, 'cup', 'metric', '235', 'ml'],
    [8, 'oz', 'metric', '227', 'g'],
    [1500, 'ml', 'metric', '1.5', 'l'],
    [2, 'tbsp', 'metric', '2', 'tbsp'],
    [2, 'dash', 'us', '2', 'dash'],
    [1, 'cup', 'us', '1', 'cup'],
    [1, 'imp-pint', 'us', '19¼', 'floz'],
    [3, 'sprig', 'metric', '3', 'sprig'],
  ] as const)('%d %s in %s is %s %s', (amount, unit, system: ReadingSystem, text, shownUnit) => {
    expect(read(amount, unit, { factor: 1, system })).toMatchObject({ text, unit: shownUnit });
  });

  it('writes the decimal sign of the reader’s locale', () => {
    expect(read(22.5, 'ml', { factor: 1, locale: 'de-DE' }).text).toBe('22,5');
  });
});

describe('factors', () => {
  const yields = (servings: number | null) => ({ stated: null, measured: null, servings, servingSize: null });

  it('goes by servings, and takes a drink that says nothing for one', () => {
    expect(factorForServings(aRecipe([], { yield: yields(4) }), 6)).toBe(1.5);
    expect(factorForServings(aRecipe([], { kind: 'drink' }), 6)).toBe(6);
    expect(factorForServings(aRecipe([], { kind: 'syrup' }), 6)).toBeNull();
  });

  it('fills three bottles of 500 ml and leaves 20 ml in the neck of each', () => {
    const yieldMl = known(700, 740, 'estimated');
    expect(factorForBottles(yieldMl, { count: 3, bottleMl: 500, headspaceMl: 20 })).toBeCloseTo(1440 / 720, 12);
    expect(factorForVolume(unknown([{ code: 'yield-missing', subject: 'x' }]), 500)).toBeNull();
    expect(() => factorForBottles(yieldMl, { count: 1, bottleMl: 50, headspaceMl: 50 })).toThrow(RangeError);
  });

  it('goes by the ingredient that is short', () => {
    expect(factorForLine(pour(200, 'caster-sugar', 'g'), 80, 'g')).toBeCloseTo(0.4, 12);
    expect(factorForLine(pour(1, 'caster-sugar', 'kg'), 500, 'g')).toBeCloseTo(0.5, 12);
    expect(factorForLine(pour(200, 'caster-sugar', 'g'), 80, 'ml')).toBeNull();
    expect(factorForLine(aLine({ id: 'x', amount: seconds(2), unit: null }), 3, 'piece')).toBeCloseTo(1.5, 12);
  });
});
