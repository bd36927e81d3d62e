import type { LarderItem } from '../contracts/larder.ts';
import { massOf, withVolume } from '../engine/matter.ts';
import { densityFromStrength, ETHANOL_DENSITY } from '../engine/oiml.ts';

type Given = Pick<LarderItem, 'id' | 'name' | 'nature'> & Partial<LarderItem>;
export type Sourced = NonNullable<LarderItem['density']>;

export const COMMON = 'common practice';
export const ESTIMATE = 'estimate';

/** One US cup in millilitres, by which USDA household weights become densities. */
const CUP = 236.5882365;

/** An entry with everything blank that is not given. */
export function item(given: Given): LarderItem {
  return {
    otherNames: [],
    density: null,
    strength: null,
    sugar: null,
    acid: null,
    water: null,
    pieceWeight: null,
    allergens: [],
    cautions: [],
    dissolves: true,
    ...given,
  };
}

export const from = (value: number, source: string): Sourced => ({ value, source });

/** A value of the USDA National Nutrient Database, release 28, by its NDB number. */
export const usda = (value: number, ndb: string): Sourced => from(value, `USDA SR28 NDB ${ndb}`);

/** A density from the weight of one US cup in the same database. */
export const cup = (grams: number, ndb: string): Sourced =>
  from(round(grams / CUP), `USDA SR28 NDB ${ndb}, ${grams} g a cup of ${CUP.toFixed(2)} ml`);

/** Nought for what cannot hold any. */
export const NO_ALCOHOL = from(0, 'holds no alcohol');
export const NO_SUGAR = from(0, 'holds no sugar');

/** A distilled spirit without sugar at a strength in % vol. */
export function spirit(id: string, name: string, strength: number, otherNames: string[] = []): LarderItem {
  return item({
    id,
    name,
    otherNames,
    nature: 'spirit',
    density: from(round(densityFromStrength(strength)), `OIML R 22 at ${strength} % vol`),
    strength: from(strength, COMMON),
    sugar: NO_SUGAR,
  });
}

/** Something with alcohol and sugar: strength in % vol and sugar in g/L as the trade sells it, density from the mixture model. */
export function sweetened(given: Given & { percent: number; sugarPerLitre: number; source?: string }): LarderItem {
  const { percent, sugarPerLitre, source = COMMON, ...rest } = given;
  const litre = withVolume(
    { ethanol: 10 * percent * ETHANOL_DENSITY, water: 500, sugar: sugarPerLitre, other: 0, residue: 0 },
    1000,
  );
  return item({
    density: from(round(massOf(litre) / 1000), `computed from ${percent} % vol and ${sugarPerLitre} g/L`),
    strength: from(percent, source),
    sugar: from(round((100 * sugarPerLitre) / massOf(litre)), `${source}, ${sugarPerLitre} g/L`),
    ...rest,
  });
}

/** A botanical that gives flavour and is strained off. */
export function botanical(id: string, name: string, given: Partial<LarderItem> = {}): LarderItem {
  return item({ id, name, nature: 'solid', dissolves: false, ...given });
}

/** Fresh fruit: water and sugar in g per 100 g of what is eaten. */
export function fruit(
  id: string,
  name: string,
  ndb: string,
  { water, sugar, ...given }: { water: number; sugar: number } & Partial<Omit<LarderItem, 'water' | 'sugar'>>,
): LarderItem {
  return botanical(id, name, {
    water: usda(water, ndb),
    sugar: usda(sugar, ndb),
    cautions: ['fresh-keeping'],
    ...given,
  });
}

/** Five decimals are finer than any source. */
function round(value: number): number {
  return Math.round(value * 1e5) / 1e5;
}
