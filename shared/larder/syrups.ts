import type { LarderItem } from '../contracts/larder.ts';
import { sucroseSolutionDensity } from '../engine/sucrose.ts';
import { cup, ESTIMATE, from, item, NO_ALCOHOL, usda, type Sourced } from './make.ts';

function syrup(
  id: string,
  name: string,
  density: Sourced,
  share: Sourced,
  given: Partial<LarderItem> = {},
): LarderItem {
  return item({ id, name, nature: 'syrup', density, strength: NO_ALCOHOL, sugar: share, ...given });
}

function simple(id: string, name: string, brix: number, otherNames: string[]): LarderItem {
  const density = Math.round(sucroseSolutionDensity(brix) * 1e5) / 1e5;
  return syrup(id, name, from(density, `Hackbarth 2011 at ${brix} °Bx`), from(brix, 'definition, by weight'), {
    otherNames,
  });
}

/** Syrups as they are bought or made by weight. */
export const SYRUPS = [
  simple('simple-syrup', 'sugar syrup, 1:1 by weight', 50, ['simple syrup', 'sugar syrup', '1:1 syrup', 'gomme']),
  simple('rich-syrup', 'rich sugar syrup, 2:1 by weight', 66.667, ['rich syrup', 'rich simple syrup', '2:1 syrup']),
  simple('demerara-syrup', 'demerara syrup, 2:1 by weight', 66.667, ['rich demerara syrup']),
  syrup('honey', 'honey', cup(339, '19296'), usda(82.12, '19296'), {
    otherNames: ['runny honey', 'heather honey'],
    water: usda(17.1, '19296'),
  }),
  syrup('maple-syrup', 'maple syrup', cup(315, '19353'), usda(67.9, '19353'), { otherNames: ['maple'] }),
  syrup('agave-syrup', 'agave syrup', from(1.4, 'USDA SR28 NDB 19912, 6.9 g a teaspoon'), usda(68.03, '19912'), {
    otherNames: ['agave nectar', 'agave'],
  }),
  syrup('molasses', 'molasses', cup(337, '19304'), usda(74.72, '19304'), { otherNames: ['black treacle', 'treacle'] }),
  syrup('golden-syrup', 'golden syrup', from(1.43, ESTIMATE), from(80, ESTIMATE), { otherNames: ['light treacle'] }),
  syrup('glucose-syrup', 'glucose syrup', cup(341, '19350'), usda(76.77, '19350'), {
    otherNames: ['corn syrup', 'light corn syrup'],
  }),
  syrup('malt-syrup', 'malt syrup', cup(332, '19352'), usda(71.3, '19352'), {
    otherNames: ['malt extract'],
    allergens: ['gluten'],
  }),
  syrup('grenadine', 'grenadine', from(1.355, 'USDA SR28 NDB 42040, 20 g a tablespoon'), usda(46.55, '42040'), {
    otherNames: ['pomegranate syrup'],
  }),
  syrup('orgeat', 'orgeat', from(1.25, ESTIMATE), from(55, ESTIMATE), {
    otherNames: ['almond syrup'],
    allergens: ['nuts'],
  }),
  syrup('elderflower-cordial', 'elderflower cordial', from(1.23, ESTIMATE), from(50, ESTIMATE), {
    otherNames: ['elderflower syrup'],
  }),
  syrup('lime-cordial', 'lime cordial', from(1.15, ESTIMATE), from(35, ESTIMATE), { acid: from(2, ESTIMATE) }),
  syrup('coconut-cream-sweet', 'sweetened coconut cream', cup(296, '12116'), usda(51.5, '12116'), {
    otherNames: ['cream of coconut'],
    water: usda(28.97, '12116'),
  }),
  syrup('marmalade', 'orange marmalade', cup(320, '19303'), usda(60, '19303'), {
    otherNames: ['marmalade'],
    water: usda(33.2, '19303'),
  }),
];
