import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isDry, matterOfItem } from '../../../shared/engine/item-matter.ts';
import {
  blend,
  massOf,
  NOTHING,
  strengthOf,
  sugarOf,
  volumeOf,
  withVolume,
  type Matter,
} from '../../../shared/engine/matter.ts';
import {
  densityFromStrength,
  ETHANOL_DENSITY,
  massFractionFromStrength,
  WATER_DENSITY,
} from '../../../shared/engine/oiml.ts';
import { LARDER } from '../../../shared/larder/index.ts';

const spirit = (ml: number, strength: number): Matter => {
  const grams = ml * densityFromStrength(strength);
  const share = massFractionFromStrength(strength);
  return { ...NOTHING, ethanol: grams * share, water: grams * (1 - share) };
};
const sugar = (grams: number): Matter => ({ ...NOTHING, sugar: grams });
const water = (grams: number): Matter => ({ ...NOTHING, water: grams });
const syrup = (ml: number, brix: number, density: number): Matter => ({
  ...NOTHING,
  sugar: (ml * density * brix) / 100,
  water: ml * density * (1 - brix / 100),
});

const matter = fc.record({
  ethanol: fc.double({ min: 0, max: 1000, noNaN: true }),
  water: fc.double({ min: 1, max: 1000, noNaN: true }),
  sugar: fc.double({ min: 0, max: 1000, noNaN: true }),
  other: fc.double({ min: 0, max: 50, noNaN: true }),
  residue: fc.double({ min: 0, max: 50, noNaN: true }),
});

describe('pouring together', () => {
  // Mass balance with OIML R 22 (1975): ml of ethanol and of water, ml together.
  it.each([
    [10, 90, 99.26],
    [25, 75, 97.78],
    [50, 50, 96.46],
    [60, 40, 96.53],
    [75, 25, 97.08],
    [90, 10, 98.32],
  ])('%d ml of ethanol and %d ml of water make %d ml, not 100 (OIML R 22)', (ethanol, rest, ml) => {
    const both = { ...NOTHING, ethanol: ethanol * ETHANOL_DENSITY, water: rest * WATER_DENSITY };
    expect(Math.abs(volumeOf(both) - ml)).toBeLessThanOrEqual(0.05);
  });

  it('makes 51.83 % vol of equal volumes (OIML R 22)', () => {
    expect(Math.abs(strengthOf(blend([spirit(50, 100), water(50 * WATER_DENSITY)])) - 51.83)).toBeLessThanOrEqual(0.05);
  });

  // ml at % vol and ml of water: % vol of the blend (OIML R 22).
  it.each([
    [45, 50, 45, 25.1],
    [500, 96, 500, 49.5],
    [50, 40, 25, 26.71],
  ])('%d ml at %d %% vol with %d ml of water is %d %% vol (OIML R 22)', (ml, strength, rest, expected) => {
    expect(
      Math.abs(strengthOf(blend([spirit(ml, strength), water(rest * WATER_DENSITY)])) - expected),
    ).toBeLessThanOrEqual(0.02);
  });

  // Water to reduce a spirit, by the same mass balance: 1470 ml and not 1400 from 96 to 40 % vol.
  it.each([
    [1000, 96, 40, 1470.5],
    [1000, 96, 50, 980.2],
    [1000, 96, 20, 3872.6],
    [700, 63, 46, 267.9],
    [700, 57.15, 40, 308],
    [1000, 50, 40, 255.4],
  ])('%d ml at %d %% vol comes to %d %% vol with %d ml of water (OIML R 22)', (ml, strength, wanted, added) => {
    expect(strengthOf(blend([spirit(ml, strength), water(added * WATER_DENSITY)]))).toBeCloseTo(wanted, 1);
  });

  // The product's own model on both published formulas, worked by hand: ml, % vol, g/L; one per cent is claimed, the rows are rounded.
  it.each([
    [
      '500 ml of 96 % with 500 g each of water and sugar',
      [spirit(500, 96), water(500), sugar(500)],
      1282.74,
      37.42,
      389.79,
    ],
    ['700 ml of 40 % with 200 g of sugar', [spirit(700, 40), sugar(200)], 824, 33.98, 243],
    ['500 ml of 50 % with 300 ml of syrup at 50 °Bx', [spirit(500, 50), syrup(300, 50, 1.2295)], 795.79, 31.42, 231.76],
    [
      '1 L of 40 % with 500 ml of syrup at 66.67 °Bx',
      [spirit(1000, 40), syrup(500, 66.67, 1.3265)],
      1494.24,
      26.77,
      295.91,
    ],
  ])('%s', (_, poured, ml, strength, sweetness) => {
    const whole = blend(poured);
    expect(Math.abs(volumeOf(whole) / ml - 1)).toBeLessThan(0.002);
    expect(Math.abs(strengthOf(whole) / strength - 1)).toBeLessThan(0.002);
    expect(Math.abs(sugarOf(whole) / sweetness - 1)).toBeLessThan(0.002);
  });

  it('keeps all mass, in whatever order', () => {
    fc.assert(
      fc.property(fc.array(matter, { minLength: 1, maxLength: 12 }), (portions) => {
        const total = portions.reduce((sum, portion) => sum + massOf(portion), 0);
        const forwards = blend(portions);
        const backwards = blend([...portions].reverse());
        expect(massOf(forwards)).toBeCloseTo(total, 6);
        expect(strengthOf(backwards)).toBeCloseTo(strengthOf(forwards), 8);
        expect(volumeOf(backwards)).toBeCloseTo(volumeOf(forwards), 6);
      }),
    );
  });

  it('never gets weaker by more ethanol', () => {
    fc.assert(
      fc.property(matter, fc.double({ min: 0.01, max: 500, noNaN: true }), (mixture, more) => {
        const stronger = blend([mixture, { ...NOTHING, ethanol: more }]);
        expect(strengthOf(stronger)).toBeGreaterThanOrEqual(strengthOf(mixture));
      }),
    );
  });

  it('finds the water that fills a volume', () => {
    fc.assert(
      fc.property(matter, fc.double({ min: 1, max: 3, noNaN: true }), (mixture, times) => {
        const wanted = volumeOf(mixture) * times;
        expect(volumeOf(withVolume(mixture, wanted)) / wanted).toBeCloseTo(1, 8);
      }),
    );
  });

  it('is nothing where nothing is', () => {
    expect([volumeOf(NOTHING), strengthOf(NOTHING), sugarOf(NOTHING)]).toEqual([0, 0, 0]);
  });
});

describe('what the larder says of itself', () => {
  const liquids = LARDER.filter((item) => item.dissolves && item.density && !isDry(item));

  it.each(liquids.map((item) => [item.name, item] as const))(
    '%s fills its own volume and has its own strength',
    (_, item) => {
      const litre = matterOfItem(item, item.density!.value * 1000);
      expect(volumeOf(litre)).toBeCloseTo(1000, 6);
      expect(strengthOf(litre)).toBeCloseTo(item.strength?.value ?? 0, 6);
      expect(massOf(litre)).toBeCloseTo(item.density!.value * 1000, 6);
    },
  );
});
