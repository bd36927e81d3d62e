import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  densityFromStrength,
  ethanolWaterDensity,
  massFractionFromStrength,
  strengthFromMassFraction,
} from '../../../shared/engine/oiml.ts';

// OIML R 22 (1975), general formula at 20 °C: strength in % vol, density in kg/m³, ethanol in % by mass.
const OIML = [
  [0, 998.2, 0],
  [5, 991.06, 3.982],
  [10, 984.71, 8.015],
  [15, 978.97, 12.093],
  [20, 973.56, 16.214],
  [25, 968.1, 20.381],
  [30, 962.21, 24.607],
  [35, 955.59, 28.907],
  [40, 948.05, 33.3],
  [45, 939.54, 37.801],
  [50, 930.14, 42.426],
  [55, 919.96, 47.185],
  [60, 909.11, 52.088],
  [65, 897.65, 57.15],
  [70, 885.56, 62.386],
  [75, 872.79, 67.82],
  [80, 859.27, 73.48],
  [85, 844.85, 79.405],
  [95, 811.38, undefined],
  [100, 789.24, 100],
] as const;

// CRC Handbook of Chemistry and Physics, 102nd ed. (2021), concentrative properties of aqueous solutions, 20 °C: % by mass, g/ml.
const CRC = [
  [5, 0.9893],
  [10, 0.9819],
  [20, 0.9687],
  [30, 0.9539],
  [40, 0.9352],
  [50, 0.9139],
  [60, 0.8911],
  [80, 0.8436],
  [96, 0.8013],
  [100, 0.7893],
] as const;

// The same formula with its terms in temperature; water also agrees with IAPWS-95.
const OTHER_TEMPERATURES = [
  [1, 15.5556, 793.03],
  [1, 25, 784.95],
  [0, 4, 999.97],
] as const;

describe('ethanol and water', () => {
  it.each(OIML)('%d %% vol weighs %d kg/m³ (OIML R 22)', (strength, density) => {
    expect(Math.abs(1000 * densityFromStrength(strength) - density)).toBeLessThanOrEqual(0.02);
  });

  it.each(OIML.filter(([, , mass]) => mass !== undefined))(
    '%d %% vol is not the same number by mass (OIML R 22)',
    (strength, _density, mass) => {
      expect(Math.abs(100 * massFractionFromStrength(strength) - mass!)).toBeLessThanOrEqual(0.01);
    },
  );

  it.each([
    [10, 12.44],
    [30, 36.255],
    [50, 57.889],
    [60, 67.744],
    [94, 96.111],
  ])('%d %% by mass is %d %% vol (OIML R 22)', (mass, strength) => {
    expect(Math.abs(strengthFromMassFraction(mass / 100) - strength)).toBeLessThanOrEqual(0.01);
  });

  it.each(CRC)('%d %% by mass weighs %d g/ml (CRC Handbook)', (mass, density) => {
    expect(Math.abs(ethanolWaterDensity(mass / 100) - density)).toBeLessThanOrEqual(0.0003);
  });

  it.each(OTHER_TEMPERATURES)(
    'a mass fraction of %d at %d °C weighs %d kg/m³ (OIML R 22)',
    (mass, celsius, density) => {
      expect(Math.abs(1000 * ethanolWaterDensity(mass, celsius) - density)).toBeLessThanOrEqual(0.25);
    },
  );

  it('turns strength into mass and back', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 100, noNaN: true }), (strength) => {
        expect(strengthFromMassFraction(massFractionFromStrength(strength))).toBeCloseTo(strength, 8);
      }),
    );
  });

  it.each([
    () => ethanolWaterDensity(1.01),
    () => ethanolWaterDensity(-0.01),
    () => ethanolWaterDensity(0.5, 60),
    () => massFractionFromStrength(101),
    () => ethanolWaterDensity(Number.NaN),
  ])('refuses what the formula was not made for', (call) => {
    expect(call).toThrow(RangeError);
  });
});
