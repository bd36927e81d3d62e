import { botanical, cup, ESTIMATE, from } from './make.ts';

/** Nuts and seeds; what is ground and strained leaves its allergens behind. */
export const NUTS = [
  botanical('almonds', 'almonds', {
    allergens: ['nuts'],
    density: cup(143, '12061'),
    otherNames: ['blanched almonds', 'almond'],
  }),
  botanical('hazelnuts', 'hazelnuts', {
    allergens: ['nuts'],
    density: cup(135, '12120'),
    otherNames: ['hazelnut', 'toasted hazelnuts'],
  }),
  botanical('walnuts', 'walnuts', {
    allergens: ['nuts'],
    density: cup(117, '12155'),
    otherNames: ['walnut halves', 'walnut'],
  }),
  botanical('pecans', 'pecans', { allergens: ['nuts'], density: cup(109, '12142'), otherNames: ['pecan'] }),
  botanical('pistachios', 'pistachios', { allergens: ['nuts'], density: cup(123, '12151'), otherNames: ['pistachio'] }),
  botanical('cashews', 'cashews', { allergens: ['nuts'], density: from(0.58, ESTIMATE), otherNames: ['cashew'] }),
  botanical('peanuts', 'peanuts', {
    allergens: ['peanuts'],
    density: cup(146, '16087'),
    otherNames: ['peanut', 'peanut butter'],
  }),
  botanical('sesame-seed', 'sesame seed', {
    allergens: ['sesame'],
    density: cup(144, '12023'),
    otherNames: ['sesame', 'tahini', 'sesame oil'],
  }),
  botanical('pumpkin-seeds', 'pumpkin seeds', { density: cup(129, '12014') }),
  botanical('coconut', 'coconut', {
    density: from(0.338, 'USDA SR28 NDB 12104, 80 g a cup'),
    otherNames: ['desiccated coconut', 'coconut flakes'],
  }),
];

/** What chills, smokes or seasons. */
export const OTHER = [
  botanical('ice', 'ice', { nature: 'other', otherNames: ['ice cubes', 'crushed ice', 'block ice'] }),
  botanical('dry-ice', 'dry ice', { nature: 'other', cautions: ['dry-ice'] }),
  botanical('liquid-nitrogen', 'liquid nitrogen', { nature: 'other', cautions: ['liquid-nitrogen'] }),
  botanical('olive-oil', 'olive oil', { nature: 'other', density: from(0.913, ESTIMATE) }),
  botanical('coconut-oil', 'coconut oil', { nature: 'other', density: from(0.92, ESTIMATE) }),
  botanical('bacon-fat', 'bacon fat', { nature: 'other', otherNames: ['smoked fat'] }),
  botanical('anchovy-sauce', 'anchovy table sauce', {
    nature: 'other',
    otherNames: ['worcestershire sauce', 'worcester sauce'],
    allergens: ['fish', 'gluten'],
  }),
  botanical('soy-sauce', 'soy sauce', { nature: 'other', allergens: ['soya', 'gluten'], otherNames: ['soya sauce'] }),
  botanical('oyster-shell', 'oyster shell', { nature: 'other', allergens: ['molluscs'] }),
];
