import type { LarderItem } from '../contracts/larder.ts';
import { ESTIMATE, from, item, NO_ALCOHOL, NO_SUGAR, usda, type Sourced } from './make.ts';

function dry(id: string, name: string, density: Sourced, given: Partial<LarderItem> = {}): LarderItem {
  return item({ id, name, nature: 'acid', density, strength: NO_ALCOHOL, sugar: NO_SUGAR, ...given });
}

/** Acids as powder; the density is that of the heap. */
export const ACIDS = [
  dry('citric-acid', 'citric acid', from(0.95, ESTIMATE), { acid: from(100, 'definition') }),
  dry('malic-acid', 'malic acid', from(0.85, ESTIMATE), { acid: from(100, 'definition') }),
  dry('tartaric-acid', 'tartaric acid', from(0.95, ESTIMATE), { acid: from(100, 'definition') }),
  dry('lactic-acid', 'lactic acid powder', from(0.7, ESTIMATE), {
    acid: from(60, ESTIMATE),
    otherNames: ['lactic acid'],
  }),
  dry('ascorbic-acid', 'ascorbic acid', from(0.8, ESTIMATE), {
    acid: from(100, 'definition'),
    otherNames: ['vitamin c'],
  }),
  dry('succinic-acid', 'succinic acid', from(0.85, ESTIMATE), { acid: from(100, 'definition') }),
  dry('cream-of-tartar', 'cream of tartar', from(0.61, 'USDA SR28 NDB 18373, 3.0 g a teaspoon')),
];

const solid = (id: string, name: string, density: Sourced, given: Partial<LarderItem> = {}): LarderItem =>
  dry(id, name, density, { nature: 'solid', ...given });

/** Salts and what is stirred in to bind, set or lift. */
export const SALTS = [
  solid('sea-salt', 'fine sea salt', from(1.217, 'USDA SR28 NDB 02047, 6.0 g a teaspoon'), {
    otherNames: ['salt', 'table salt', 'sea salt'],
  }),
  solid('flaky-salt', 'flaky sea salt', from(0.6, ESTIMATE), { otherNames: ['kosher salt', 'coarse salt'] }),
  solid('bicarbonate-of-soda', 'bicarbonate of soda', from(0.93, ESTIMATE), { otherNames: ['baking soda'] }),
  solid('gum-arabic', 'gum arabic', from(0.6, ESTIMATE), { otherNames: ['acacia gum', 'gomme arabic'] }),
  solid('xanthan-gum', 'xanthan gum', from(0.6, ESTIMATE)),
  solid('agar', 'agar powder', from(0.6, ESTIMATE), { otherNames: ['agar-agar'] }),
  solid('gelatine', 'gelatine', from(0.47, 'USDA SR28 NDB 19177, 7.0 g a tablespoon'), {
    otherNames: ['gelatin', 'gelatine leaves'],
  }),
  solid('pectin', 'pectin', from(0.6, ESTIMATE)),
  solid('activated-charcoal', 'activated charcoal', from(0.4, ESTIMATE), {
    dissolves: false,
    cautions: ['harmful-botanical'],
  }),
  solid('cocoa-powder', 'cocoa powder', from(0.364, 'USDA SR28 NDB 19165, 86 g a cup'), {
    sugar: usda(1.75, '19165'),
    otherNames: ['cocoa'],
  }),
  solid('quinine-sulphate', 'quinine powder', from(0.6, ESTIMATE), {
    cautions: ['harmful-botanical'],
    otherNames: ['quinine'],
  }),
  solid('msg', 'monosodium glutamate', from(0.8, ESTIMATE), { otherNames: ['msg'] }),
];
