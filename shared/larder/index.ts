import type { LarderItem } from '../contracts/larder.ts';
import { ACIDS, SALTS } from './acids-and-salts.ts';
import { HERBS, SPICES } from './botanicals.ts';
import { DAIRY_AND_EGG } from './dairy-and-egg.ts';
import { DRIED_FRUIT, FRUIT } from './fruit.ts';
import { JUICES, WATERS } from './juices.ts';
import { BITTERS, LIQUEURS } from './liqueurs.ts';
import { NUTS, OTHER } from './nuts.ts';
import { SPIRITS } from './spirits.ts';
import { SUGARS } from './sugars.ts';
import { SYRUPS } from './syrups.ts';
import { VINEGARS, WINES } from './wines.ts';

/**
 * The ingredient catalogue that a new imprint starts with: generic entries of the trade, every number with its source. USDA is
 * the National Nutrient Database for Standard Reference, release 28 (2015), public domain.
 */
export const LARDER: readonly LarderItem[] = [
  ...SPIRITS,
  ...WINES,
  ...LIQUEURS,
  ...BITTERS,
  ...JUICES,
  ...WATERS,
  ...VINEGARS,
  ...SUGARS,
  ...SYRUPS,
  ...ACIDS,
  ...SALTS,
  ...DAIRY_AND_EGG,
  ...SPICES,
  ...HERBS,
  ...FRUIT,
  ...DRIED_FRUIT,
  ...NUTS,
  ...OTHER,
];

/** The catalogue by id, as the engine asks for it. */
export const LARDER_BY_ID: ReadonlyMap<string, LarderItem> = new Map(LARDER.map((entry) => [entry.id, entry]));
