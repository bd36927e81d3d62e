import type { LarderItem } from '../contracts/larder.ts';
import { COMMON, cup, ESTIMATE, from, item, NO_ALCOHOL, NO_SUGAR, usda, type Sourced } from './make.ts';

const PENNISTON = 'Penniston et al. 2008, J. Endourol. 22(3):567-570, citric acid';

interface Juice {
  water: number;
  sugar: number;
  weight: number;
  acid?: Sourced;
  given?: Partial<LarderItem>;
}

/** Water and sugar in g per 100 g, weight in g a US cup. */
function juice(id: string, name: string, ndb: string, { water, sugar, weight, acid, given }: Juice): LarderItem {
  return item({
    id,
    name,
    nature: 'juice',
    density: cup(weight, ndb),
    strength: NO_ALCOHOL,
    sugar: usda(sugar, ndb),
    water: usda(water, ndb),
    acid: acid ?? null,
    cautions: ['fresh-keeping'],
    ...given,
  });
}

/** A juice for which no open table was read: density in g/ml, sugar and water in g per 100 g. */
function estimatedJuice(
  id: string,
  name: string,
  { density, sugar, water }: Record<'density' | 'sugar' | 'water', number>,
  given: Partial<LarderItem> = {},
): LarderItem {
  return item({
    id,
    name,
    nature: 'juice',
    density: from(density, ESTIMATE),
    strength: NO_ALCOHOL,
    sugar: from(sugar, ESTIMATE),
    water: from(water, ESTIMATE),
    cautions: ['fresh-keeping'],
    ...given,
  });
}

/** Juices; a piece weight is the juice that one fruit yields. */
export const JUICES = [
  juice('lemon-juice', 'lemon juice', '09152', {
    water: 92.31,
    sugar: 2.52,
    weight: 244,
    acid: from(4.8, PENNISTON),
    given: { otherNames: ['fresh lemon juice', 'juice of lemon'], pieceWeight: usda(48, '09152') },
  }),
  juice('lime-juice', 'lime juice', '09160', {
    water: 90.79,
    sugar: 1.69,
    weight: 242,
    acid: from(4.58, PENNISTON),
    given: { otherNames: ['fresh lime juice'], pieceWeight: usda(44, '09160') },
  }),
  juice('orange-juice', 'orange juice', '09206', {
    water: 88.3,
    sugar: 8.4,
    weight: 248,
    acid: from(0.91, PENNISTON),
    given: { otherNames: ['fresh orange juice'], pieceWeight: usda(86, '09206') },
  }),
  juice('grapefruit-juice', 'grapefruit juice', '09128', {
    water: 90,
    sugar: 9.1,
    weight: 247,
    acid: from(2.5, PENNISTON),
    given: {
      pieceWeight: usda(196, '09128'),
      cautions: ['fresh-keeping', 'grapefruit-medicines'],
      otherNames: ['pink grapefruit juice'],
    },
  }),
  juice('tangerine-juice', 'mandarin juice', '09221', {
    water: 88.9,
    sugar: 9.9,
    weight: 247,
    given: { otherNames: ['tangerine juice', 'clementine juice'] },
  }),
  juice('pineapple-juice', 'pineapple juice', '09273', { water: 86.37, sugar: 9.98, weight: 250 }),
  juice('pomegranate-juice', 'pomegranate juice', '09442', { water: 85.95, sugar: 12.65, weight: 249 }),
  juice('passion-fruit-juice', 'passion fruit juice', '09232', {
    water: 85.62,
    sugar: 13.4,
    weight: 247,
    given: { otherNames: ['passion fruit purée', 'passionfruit juice'] },
  }),
  juice('cranberry-juice', 'cranberry juice', '43382', {
    water: 87.13,
    sugar: 12.1,
    weight: 253,
    given: { otherNames: ['unsweetened cranberry juice'] },
  }),
  estimatedJuice(
    'apple-juice',
    'apple juice',
    { density: 1.046, sugar: 9.6, water: 88.2 },
    { otherNames: ['cloudy apple juice', 'sweet cider'] },
  ),
  estimatedJuice('grape-juice', 'grape juice', { density: 1.06, sugar: 14.5, water: 84.5 }),
  estimatedJuice(
    'sea-buckthorn-juice',
    'sea buckthorn juice',
    { density: 1.035, sugar: 4, water: 90 },
    { acid: from(3.5, ESTIMATE) },
  ),
  estimatedJuice(
    'verjuice',
    'verjuice',
    { density: 1.02, sugar: 3, water: 94 },
    { acid: from(2, ESTIMATE), otherNames: ['verjus'], allergens: ['sulphites'] },
  ),
  estimatedJuice('tomato-juice', 'tomato juice', { density: 1.027, sugar: 2.6, water: 94 }),
  juice('coconut-water', 'coconut water', '12119', { water: 94.99, sugar: 2.61, weight: 240 }),
];

function soft(id: string, name: string, sugar: Sourced, density: Sourced, given: Partial<LarderItem> = {}): LarderItem {
  return item({ id, name, nature: 'water', density, strength: NO_ALCOHOL, sugar, ...given });
}

/** Waters, sodas, teas and coffee as they are poured. */
export const WATERS = [
  soft('water', 'water', NO_SUGAR, from(0.9982, 'OIML R 22 at 0 % vol'), {
    otherNames: ['cold water', 'hot water', 'boiling water', 'filtered water', 'still water', 'spring water'],
  }),
  soft('soda-water', 'soda water', NO_SUGAR, from(0.9982, 'as water'), {
    otherNames: ['sparkling water', 'club soda', 'soda', 'carbonated water'],
  }),
  soft('tonic-water', 'tonic water', usda(8.8, '14155'), from(1.0313, 'USDA SR28 NDB 14155, 30.5 g a US fl oz'), {
    otherNames: ['tonic'],
  }),
  soft('ginger-ale', 'ginger ale', usda(8.7, '14136'), from(1.0313, 'USDA SR28 NDB 14136, 30.5 g a US fl oz')),
  soft('ginger-beer', 'ginger beer', from(9, ESTIMATE), from(1.033, ESTIMATE)),
  soft('lemonade', 'lemon soda', usda(10.38, '14144'), from(1.0415, 'USDA SR28 NDB 14144, 30.8 g a US fl oz'), {
    otherNames: ['lemonade', 'lemon-lime soda'],
  }),
  soft('cola', 'cola', usda(10.75, '14148'), from(1.0381, 'USDA SR28 NDB 14148, 30.7 g a US fl oz')),
  soft('grapefruit-soda', 'grapefruit soda', from(9.5, ESTIMATE), from(1.035, ESTIMATE), {
    cautions: ['grapefruit-medicines'],
  }),
  soft('black-tea', 'brewed black tea', NO_SUGAR, from(0.9995, ESTIMATE), {
    otherNames: ['black tea', 'tea', 'brewed tea', 'cold tea', 'strong tea'],
  }),
  soft('green-tea', 'brewed green tea', NO_SUGAR, from(0.9995, ESTIMATE), { otherNames: ['green tea'] }),
  soft('brewed-coffee', 'brewed coffee', NO_SUGAR, from(1.003, ESTIMATE), {
    otherNames: ['filter coffee', 'cold brew', 'cold brew coffee'],
  }),
  soft('espresso', 'espresso', NO_SUGAR, from(1.02, ESTIMATE)),
  soft('rose-water', 'rose water', NO_SUGAR, from(0.9982, 'as water'), { otherNames: ['rosewater'] }),
  soft('orange-flower-water', 'orange flower water', NO_SUGAR, from(0.9982, 'as water'), {
    otherNames: ['orange blossom water'],
  }),
  soft('saline-20', 'saline solution, 20 %', NO_SUGAR, from(1.148, COMMON), {
    otherNames: ['saline', 'salt solution', 'saline solution'],
    water: from(80, 'definition: 20 g of salt in 100 g'),
  }),
  soft('olive-brine', 'olive brine', NO_SUGAR, from(1.03, ESTIMATE), { otherNames: ['brine'] }),
];
