import { botanical, ESTIMATE, from, fruit, usda } from './make.ts';

const SULPHITED = { allergens: ['sulphites' as const], cautions: [] };

/** A fruit whose sugar no open table was read for: water and sugar in g per 100 g. */
function estimated(id: string, name: string, water: number, sugar: number, otherNames: string[]) {
  return botanical(id, name, {
    otherNames,
    water: from(water, ESTIMATE),
    sugar: from(sugar, ESTIMATE),
    cautions: id === 'elderberries' ? ['fresh-keeping', 'harmful-botanical'] : ['fresh-keeping'],
  });
}

/** Fresh fruit, and the vegetables that the trade treats alike. */
export const FRUIT = [
  fruit('lemon', 'lemon', '09150', {
    water: 88.98,
    sugar: 2.5,
    pieceWeight: usda(84, '09150'),
    otherNames: ['lemons', 'lemon wheel', 'lemon wedge'],
  }),
  fruit('lime', 'lime', '09159', {
    water: 88.26,
    sugar: 1.69,
    pieceWeight: usda(67, '09159'),
    otherNames: ['limes', 'lime wedge', 'lime wheel'],
  }),
  fruit('orange', 'orange', '09200', {
    water: 86.75,
    sugar: 9.35,
    pieceWeight: usda(131, '09200'),
    otherNames: ['oranges', 'orange slice'],
  }),
  fruit('grapefruit', 'grapefruit', '09111', {
    water: 90.89,
    sugar: 6.98,
    pieceWeight: usda(256, '09111'),
    cautions: ['fresh-keeping', 'grapefruit-medicines'],
  }),
  fruit('seville-orange', 'Seville orange', '09200', {
    water: 86.75,
    sugar: 9.35,
    otherNames: ['bitter orange'],
    cautions: ['fresh-keeping', 'grapefruit-medicines'],
  }),
  fruit('raspberries', 'raspberries', '09302', {
    water: 85.75,
    sugar: 4.42,
    pieceWeight: usda(1.9, '09302'),
    density: from(0.52, 'USDA SR28 NDB 09302, 123 g a cup'),
    otherNames: ['raspberry'],
  }),
  fruit('strawberries', 'strawberries', '09316', {
    water: 90.95,
    sugar: 4.89,
    pieceWeight: usda(12, '09316'),
    density: from(0.609, 'USDA SR28 NDB 09316, 144 g a cup'),
    otherNames: ['strawberry'],
  }),
  fruit('blackberries', 'blackberries', '09042', {
    water: 88.15,
    sugar: 4.88,
    density: from(0.609, 'USDA SR28 NDB 09042, 144 g a cup'),
    otherNames: ['brambles', 'blackberry'],
  }),
  fruit('blueberries', 'blueberries', '09050', {
    water: 84.21,
    sugar: 9.96,
    density: from(0.626, 'USDA SR28 NDB 09050, 148 g a cup'),
    otherNames: ['bilberries', 'blueberry'],
  }),
  estimated('blackcurrants', 'blackcurrants', 82, 8, ['blackcurrant']),
  fruit('redcurrants', 'redcurrants', '09084', {
    water: 83.95,
    sugar: 7.37,
    density: from(0.473, 'USDA SR28 NDB 09084, 112 g a cup'),
  }),
  fruit('cranberries', 'cranberries', '09078', {
    water: 87.13,
    sugar: 4.04,
    density: from(0.423, 'USDA SR28 NDB 09078, 100 g a cup'),
  }),
  fruit('cherries', 'cherries', '09070', {
    water: 82.25,
    sugar: 12.82,
    pieceWeight: usda(8.2, '09070'),
    otherNames: ['dark cherries', 'cherry', 'sweet cherries'],
  }),
  fruit('sour-cherries', 'sour cherries', '09063', { water: 86.13, sugar: 8.49, otherNames: ['morello cherries'] }),
  fruit('plums', 'plums', '09279', {
    water: 87.23,
    sugar: 9.92,
    pieceWeight: usda(66, '09279'),
    otherNames: ['plum', 'damsons'],
  }),
  fruit('peaches', 'peaches', '09236', {
    water: 88.87,
    sugar: 8.39,
    pieceWeight: usda(150, '09236'),
    otherNames: ['peach'],
  }),
  fruit('apricots', 'apricots', '09021', {
    water: 86.35,
    sugar: 9.24,
    pieceWeight: usda(35, '09021'),
    otherNames: ['apricot'],
  }),
  fruit('apples', 'apples', '09003', {
    water: 85.56,
    sugar: 10.39,
    pieceWeight: usda(182, '09003'),
    otherNames: ['apple'],
  }),
  fruit('pears', 'pears', '09252', {
    water: 83.96,
    sugar: 9.75,
    pieceWeight: usda(178, '09252'),
    otherNames: ['pear'],
  }),
  fruit('rhubarb', 'rhubarb', '09307', {
    water: 93.61,
    sugar: 1.1,
    pieceWeight: usda(51, '09307'),
    otherNames: ['rhubarb stalks'],
  }),
  fruit('pineapple', 'pineapple', '09266', { water: 86, sugar: 9.85, pieceWeight: usda(905, '09266') }),
  fruit('mango', 'mango', '09176', { water: 83.46, sugar: 13.66, pieceWeight: usda(336, '09176') }),
  fruit('banana', 'banana', '09040', {
    water: 74.91,
    sugar: 12.23,
    pieceWeight: usda(118, '09040'),
    otherNames: ['bananas'],
  }),
  fruit('passion-fruit', 'passion fruit', '09231', { water: 72.93, sugar: 11.2, pieceWeight: usda(18, '09231') }),
  fruit('grapes', 'grapes', '09132', {
    water: 80.54,
    sugar: 15.48,
    pieceWeight: usda(4.9, '09132'),
    otherNames: ['grape'],
  }),
  fruit('figs', 'figs', '09089', { water: 79.11, sugar: 16.26, pieceWeight: usda(50, '09089'), otherNames: ['fig'] }),
  fruit('watermelon', 'watermelon', '09326', { water: 91.45, sugar: 6.2 }),
  fruit('pomegranate-seeds', 'pomegranate seeds', '09286', { water: 77.93, sugar: 13.67 }),
  fruit('cucumber', 'cucumber', '11205', { water: 95.23, sugar: 1.67, pieceWeight: usda(301, '11205') }),
  fruit('beetroot', 'beetroot', '11080', {
    water: 87.58,
    sugar: 6.76,
    pieceWeight: usda(82, '11080'),
    otherNames: ['beet'],
  }),
  fruit('carrot', 'carrot', '11124', { water: 88.29, sugar: 4.74, pieceWeight: usda(61, '11124') }),
  fruit('tomato', 'tomato', '11529', { water: 94.52, sugar: 2.63 }),
  estimated('sloes', 'sloes', 82, 8, ['sloe berries', 'sloe']),
  estimated('sea-buckthorn', 'sea buckthorn berries', 83, 4, ['sea buckthorn']),
  estimated('elderberries', 'elderberries', 79.8, 8, ['elderberry']),
  estimated('quince', 'quince', 83.8, 9, ['quinces']),
];

/** Dried fruit and preserves; dried fruit is commonly kept with sulphites. */
export const DRIED_FRUIT = [
  botanical('raisins', 'raisins', {
    ...SULPHITED,
    otherNames: ['sultanas', 'raisin'],
    density: from(0.613, 'USDA SR28 NDB 09298, 145 g a cup'),
  }),
  botanical('dried-apricots', 'dried apricots', { ...SULPHITED }),
  botanical('dried-figs', 'dried figs', { ...SULPHITED }),
  botanical('dates', 'dates', { otherNames: ['date'], pieceWeight: usda(24, '09421') }),
  botanical('cocktail-cherry', 'preserved cherry', {
    ...SULPHITED,
    otherNames: ['cocktail cherry', 'cherries in syrup'],
    pieceWeight: from(5, ESTIMATE),
  }),
  botanical('green-olive', 'green olive', { otherNames: ['olives', 'olive'], pieceWeight: from(4, ESTIMATE) }),
  botanical('cocktail-onion', 'pickled onion', {
    ...SULPHITED,
    otherNames: ['cocktail onion'],
    pieceWeight: from(3, ESTIMATE),
  }),
];
