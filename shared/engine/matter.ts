import { ETHANOL_DENSITY, ethanolWaterDensity, WATER_DENSITY } from './oiml.ts';
import { apparentVolumeOfSucrose } from './sucrose.ts';

/**
 * What a liquid is made of, at 20 °C. Masses in grams. `residue` in millilitres is what `other` (acid, fat, pulp, salt) adds to
 * the volume of ethanol, water and sugar; it is carried along unchanged and may be slightly negative.
 */
export interface Matter {
  ethanol: number;
  water: number;
  sugar: number;
  other: number;
  residue: number;
}

export const NOTHING: Readonly<Matter> = { ethanol: 0, water: 0, sugar: 0, other: 0, residue: 0 };

export function addMatter(a: Readonly<Matter>, b: Readonly<Matter>): Matter {
  return {
    ethanol: a.ethanol + b.ethanol,
    water: a.water + b.water,
    sugar: a.sugar + b.sugar,
    other: a.other + b.other,
    residue: a.residue + b.residue,
  };
}

/** The same liquid, `share` times as much of it. */
export function shareOf(matter: Readonly<Matter>, share: number): Matter {
  return {
    ethanol: matter.ethanol * share,
    water: matter.water * share,
    sugar: matter.sugar * share,
    other: matter.other * share,
    residue: matter.residue * share,
  };
}

/** Everything poured together; the order does not matter. */
export function blend(portions: readonly Readonly<Matter>[]): Matter {
  return portions.reduce<Matter>(addMatter, { ...NOTHING });
}

/** Grams. */
export function massOf({ ethanol, water, sugar, other }: Readonly<Matter>): number {
  return ethanol + water + sugar + other;
}

/**
 * Millilitres at 20 °C. Ethanol and water by OIML R 22, so that 50 ml and 50 ml make 96.5; sugar added at its apparent
 * volume in the water that is there (Hackbarth 2011). The sum is the product's own model: claim no better than 1 % with sugar.
 */
export function volumeOf(matter: Readonly<Matter>): number {
  return volumeWithoutResidue(matter) + matter.residue;
}

/** Millilitres that ethanol, water and sugar take up by themselves. */
export function volumeWithoutResidue({ ethanol, water, sugar }: Readonly<Matter>): number {
  const liquid = ethanol + water;
  const solvent = liquid === 0 ? 0 : liquid / ethanolWaterDensity(ethanol / liquid);
  return solvent + (sugar === 0 ? 0 : sugar * apparentVolumeOfSucrose((100 * sugar) / (sugar + water)));
}

/** Strength in % vol; 0 for nothing at all. `volume` in ml stands in for the computed one where it was measured. */
export function strengthOf(matter: Readonly<Matter>, volume = volumeOf(matter)): number {
  return volume > 0 ? (100 * matter.ethanol) / ETHANOL_DENSITY / volume : 0;
}

/** Sugar in grams per litre; 0 for nothing at all. `volume` as in `strengthOf`. */
export function sugarOf(matter: Readonly<Matter>, volume = volumeOf(matter)): number {
  return volume > 0 ? (1000 * matter.sugar) / volume : 0;
}

/** The same with so much less or more water that it fills `ml`. What holds no water to lose stays larger than asked. */
export function withVolume(matter: Readonly<Matter>, ml: number): Matter {
  let result = { ...matter };
  // Water changes the volume by very nearly its own, so this closes in by a digit and more a round.
  for (let round = 0; round < 12; round += 1)
    result = withWater(result, result.water + (ml - volumeOf(result)) * WATER_DENSITY);
  return result;
}

/** The same with another amount of water in grams, at least none. */
export function withWater(matter: Readonly<Matter>, water: number): Matter {
  return { ...matter, water: Math.max(0, water) };
}
