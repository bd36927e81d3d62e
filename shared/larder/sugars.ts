import type { LarderItem } from '../contracts/larder.ts';
import { cup, ESTIMATE, from, item, NO_ALCOHOL, usda, type Sourced } from './make.ts';

function sugar(
  id: string,
  name: string,
  density: Sourced,
  share: Sourced,
  given: Partial<LarderItem> = {},
): LarderItem {
  return item({ id, name, nature: 'sugar', density, strength: NO_ALCOHOL, sugar: share, ...given });
}

/** Dry sugars: the density is that of the heap, the largest error wherever sugar is measured by the cup. */
export const SUGARS = [
  sugar('granulated-sugar', 'granulated sugar', cup(200, '19335'), usda(99.8, '19335'), {
    otherNames: ['sugar', 'white sugar', 'cane sugar', 'beet sugar'],
  }),
  sugar('caster-sugar', 'caster sugar', from(0.85, ESTIMATE), usda(99.8, '19335'), {
    otherNames: ['superfine sugar', 'fine sugar'],
  }),
  sugar('icing-sugar', 'icing sugar', cup(120, '19336'), usda(97.81, '19336'), {
    otherNames: ['powdered sugar', 'confectioners sugar'],
  }),
  sugar('demerara-sugar', 'demerara sugar', cup(202, '19908'), usda(99.19, '19908'), {
    otherNames: ['turbinado sugar', 'raw sugar'],
  }),
  sugar('light-brown-sugar', 'light brown sugar', cup(220, '19334'), usda(97.02, '19334'), {
    otherNames: ['light muscovado sugar', 'brown sugar', 'soft brown sugar'],
    water: usda(1.34, '19334'),
  }),
  sugar('dark-brown-sugar', 'dark brown sugar', cup(220, '19334'), usda(97.02, '19334'), {
    otherNames: ['dark muscovado sugar', 'muscovado', 'molasses sugar'],
    water: usda(1.34, '19334'),
  }),
  sugar('palm-sugar', 'palm sugar', from(0.9, ESTIMATE), from(90, ESTIMATE), {
    otherNames: ['jaggery', 'coconut sugar', 'panela', 'piloncillo'],
  }),
  sugar('maple-sugar', 'maple sugar', from(0.61, 'USDA SR28 NDB 19340, 3.0 g a teaspoon'), usda(84.87, '19340'), {
    water: usda(8, '19340'),
  }),
  sugar('sugar-cube', 'sugar cube', cup(200, '19335'), usda(99.8, '19335'), {
    pieceWeight: usda(2.3, '19335'),
    otherNames: ['cube of sugar'],
  }),
  sugar('fructose', 'fructose', cup(196, '43216'), from(100, 'definition'), {}),
  sugar(
    'glucose-powder',
    'glucose powder',
    from(0.65, ESTIMATE),
    from(91, 'dextrose monohydrate, one water in 198.2 g/mol'),
    { otherNames: ['dextrose'] },
  ),
];
