import { describe, expect, it } from 'vitest';
import {
  apparentVolumeOfSucrose,
  sucroseSolutionDensity,
  sugarPerLitre,
  syrupVolume,
} from '../../../shared/engine/sucrose.ts';
import { WATER_DENSITY } from '../../../shared/engine/oiml.ts';

// AOAC table of sucrose solutions in the fit of J. J. Hackbarth, J. Am. Soc. Brew. Chem. 69(1):39-43 (2011): °Bx, kg/m³.
const HACKBARTH = [
  [0, 998.2],
  [5, 1017.8],
  [15, 1059.1],
  [20, 1080.9],
  [30, 1126.9],
  [45, 1202.5],
  [55, 1257.5],
  [65, 1316.3],
  [66.67, 1326.5],
  [70, 1347.1],
  [75, 1378.9],
  [80, 1411.7],
] as const;

// CRC Handbook of Chemistry and Physics, 102nd ed. (2021), 20 °C: % by mass, g/ml.
const CRC = [
  [5, 1.0178],
  [10, 1.0381],
  [20, 1.081],
  [30, 1.127],
  [40, 1.1765],
  [50, 1.2295],
  [60, 1.2864],
  [70, 1.3472],
] as const;

// Worked from the same fit: grams of sugar, grams of water, ml of syrup; half a per cent is claimed.
const SYRUPS = [
  [100, 100, 162.7],
  [1000, 1000, 1626.6],
  [1000, 500, 1130.8],
  [1000, 1500, 2125.1],
  [650, 350, 759.7],
] as const;

describe('sugar and water', () => {
  it.each(HACKBARTH)('%d °Bx weighs %d kg/m³ (AOAC, Hackbarth 2011)', (brix, density) => {
    expect(Math.abs(1000 * sucroseSolutionDensity(brix) - density)).toBeLessThanOrEqual(0.3);
  });

  it.each(CRC)('%d °Bx weighs %d g/ml (CRC Handbook)', (brix, density) => {
    expect(Math.abs(sucroseSolutionDensity(brix) - density)).toBeLessThanOrEqual(0.0002);
  });

  it.each(SYRUPS)('%d g of sugar and %d g of water make %d ml', (sugar, water, ml) => {
    expect(Math.abs(syrupVolume(sugar, water) / ml - 1)).toBeLessThanOrEqual(0.005);
  });

  it.each([
    [50, 614.8],
    [66.67, 884.4],
  ])('%d °Bx holds %d g of sugar a litre, by mass and volume told apart', (brix, grams) => {
    expect(Math.abs(sugarPerLitre(brix) - grams)).toBeLessThanOrEqual(0.5);
  });

  it('gives back the density of the solution from the apparent volume', () => {
    for (const brix of [1, 20, 50, 79]) {
      const volume = (100 - brix) / WATER_DENSITY + brix * apparentVolumeOfSucrose(brix);
      expect(100 / volume).toBeCloseTo(sucroseSolutionDensity(brix), 10);
    }
  });

  it('refuses more sugar than the table has', () => {
    expect(() => sucroseSolutionDensity(81)).toThrow(RangeError);
    expect(() => sucroseSolutionDensity(-1)).toThrow(RangeError);
  });
});
