import type { LarderItem } from '../contracts/larder.ts';
import { cup, ESTIMATE, from, item, NO_ALCOHOL, NO_SUGAR, usda } from './make.ts';

interface Composition {
  ndb: string;
  weight: number;
  water: number;
  sugar: number;
}

/** Water and sugar in g per 100 g, weight in g a US cup. */
function fresh(
  id: string,
  name: string,
  nature: LarderItem['nature'],
  { ndb, weight, water, sugar }: Composition,
  given: Partial<LarderItem>,
): LarderItem {
  return item({
    id,
    name,
    nature,
    density: cup(weight, ndb),
    strength: NO_ALCOHOL,
    sugar: usda(sugar, ndb),
    water: usda(water, ndb),
    cautions: ['fresh-keeping'],
    ...given,
  });
}

const dairy = (id: string, name: string, composition: Composition, otherNames: string[] = []) =>
  fresh(id, name, 'dairy', composition, { otherNames, allergens: ['milk'] });
const egg = (id: string, name: string, composition: Composition, given: Partial<LarderItem>) =>
  fresh(id, name, 'egg', composition, { allergens: ['egg'], ...given });
const plantMilk = (id: string, name: string, composition: Composition, given: Partial<LarderItem>) =>
  fresh(id, name, 'other', composition, given);

/** Milk and cream, their stand-ins, and egg; raw egg is warned of by the engine, from its nature. */
export const DAIRY_AND_EGG = [
  dairy('whole-milk', 'whole milk', { ndb: '01077', weight: 244, water: 88.13, sugar: 5.05 }, [
    'milk',
    'full-fat milk',
  ]),
  dairy('single-cream', 'single cream', { ndb: '01050', weight: 240, water: 73.75, sugar: 3.66 }, [
    'light cream',
    'table cream',
  ]),
  dairy('double-cream', 'double cream', { ndb: '01053', weight: 238, water: 57.71, sugar: 2.79 }, [
    'cream',
    'heavy cream',
    'whipping cream',
  ]),
  dairy('half-and-half', 'half milk, half cream', { ndb: '01049', weight: 242, water: 80.57, sugar: 4.3 }, [
    'half and half',
  ]),
  dairy('buttermilk', 'buttermilk', { ndb: '01230', weight: 245, water: 87.91, sugar: 4.88 }),
  dairy('yogurt', 'plain yogurt', { ndb: '01116', weight: 245, water: 87.9, sugar: 4.66 }, ['yoghurt']),
  dairy('whey', 'whey', { ndb: '01112', weight: 246, water: 93.42, sugar: 5.12 }, ['acid whey']),
  dairy('condensed-milk', 'sweetened condensed milk', { ndb: '01095', weight: 306, water: 27.16, sugar: 54.4 }, [
    'condensed milk',
  ]),
  item({
    id: 'butter',
    name: 'butter',
    otherNames: ['brown butter', 'unsalted butter', 'clarified butter'],
    nature: 'dairy',
    density: cup(227, '01145'),
    allergens: ['milk'],
    cautions: ['fresh-keeping'],
    dissolves: false,
  }),
  egg(
    'egg-white',
    'egg white',
    { ndb: '01124', weight: 243, water: 87.57, sugar: 0.71 },
    { pieceWeight: usda(33, '01124'), otherNames: ['egg whites', 'pasteurised egg white', 'albumen'] },
  ),
  egg(
    'egg-yolk',
    'egg yolk',
    { ndb: '01125', weight: 243, water: 52.31, sugar: 0.56 },
    { pieceWeight: usda(17, '01125'), otherNames: ['yolk', 'egg yolks'] },
  ),
  egg(
    'egg',
    'whole egg',
    { ndb: '01123', weight: 243, water: 76.15, sugar: 0.37 },
    { pieceWeight: usda(50, '01123'), otherNames: ['eggs', 'whole egg'] },
  ),
  plantMilk(
    'coconut-milk',
    'coconut milk',
    { ndb: '12118', weight: 226, water: 72.88, sugar: 3.3 },
    { sugar: from(3.3, ESTIMATE) },
  ),
  plantMilk(
    'almond-milk',
    'almond milk',
    { ndb: '14016', weight: 240, water: 91.8, sugar: 6.25 },
    { allergens: ['nuts'] },
  ),
  plantMilk(
    'oat-milk',
    'oat milk',
    { ndb: '', weight: 243, water: 90, sugar: 4 },
    { density: from(1.03, ESTIMATE), water: from(90, ESTIMATE), sugar: from(4, ESTIMATE), allergens: ['gluten'] },
  ),
  plantMilk(
    'soya-milk',
    'soya milk',
    { ndb: '16139', weight: 243, water: 90.36, sugar: 3.65 },
    { allergens: ['soya'], otherNames: ['soy milk'] },
  ),
  item({
    id: 'chickpea-water',
    name: 'chickpea water',
    otherNames: ['aquafaba'],
    nature: 'other',
    density: from(1.02, ESTIMATE),
    strength: NO_ALCOHOL,
    sugar: NO_SUGAR,
    water: from(94, ESTIMATE),
    cautions: ['fresh-keeping'],
  }),
];
