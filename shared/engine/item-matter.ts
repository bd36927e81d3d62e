import type { LarderItem } from '../contracts/larder.ts';
import { NOTHING, volumeWithoutResidue, type Matter } from './matter.ts';
import { ETHANOL_DENSITY } from './oiml.ts';

/** No liquid: what is neither sugar nor stated water in it is a dissolved solid. Vinegar is an acid with water stated. */
export function isDry({ nature, water }: LarderItem): boolean {
  return nature === 'sugar' || nature === 'solid' || ((nature === 'acid' || nature === 'other') && !water);
}

/** Millilitres that a gram of dissolved acid or salt adds: citric acid is near 0.63, table salt near 0.35. Estimate. */
const DISSOLVED_SOLID_VOLUME = 0.6;

const shareIn = (per100: LarderItem['sugar']) => (per100?.value ?? 0) / 100;

/** What so many grams of something that dissolves are made of. Strength and sugar count as 0 where the larder has none. */
export function matterOfItem(item: LarderItem, grams: number): Matter {
  const sugar = grams * shareIn(item.sugar);
  if (!item.density || isDry(item)) return drySolid(item, grams, sugar);

  const volume = grams / item.density.value;
  const ethanol = volume * shareIn(item.strength) * ETHANOL_DENSITY;
  const rest = Math.max(0, grams - sugar - ethanol);
  const water = item.water ? Math.min(rest, grams * shareIn(item.water)) : rest;
  const explained = volumeWithoutResidue({ ethanol, water, sugar, other: 0, residue: 0 });
  return { ethanol, water, sugar, other: rest - water, residue: volume - explained };
}

/** The juice of something that does not dissolve itself, if all of it came out. */
export function juiceOfItem(item: LarderItem, grams: number): Matter {
  return { ...NOTHING, sugar: grams * shareIn(item.sugar), water: grams * shareIn(item.water) };
}

function drySolid(item: LarderItem, grams: number, sugar: number): Matter {
  const water = grams * shareIn(item.water);
  const other = Math.max(0, grams - sugar - water);
  return { ...NOTHING, sugar, water, other, residue: other * DISSOLVED_SOLID_VOLUME };
}
