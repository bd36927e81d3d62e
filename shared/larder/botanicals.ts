import { botanical, ESTIMATE, from, usda } from './make.ts';

const HARMFUL = { cautions: ['harmful-botanical' as const] };
const FRESH = { cautions: ['fresh-keeping' as const] };
const grams = (value: number) => ({ pieceWeight: from(value, ESTIMATE) });

/** Spices, seeds, roots and barks; nothing of them stays in what is strained. */
export const SPICES = [
  botanical('cinnamon-stick', 'cinnamon stick', {
    otherNames: ['cinnamon', 'cassia bark', 'cinnamon bark'],
    ...grams(4),
  }),
  botanical('ground-cinnamon', 'ground cinnamon', { density: from(0.527, 'USDA SR28 NDB 02010, 2.6 g a teaspoon') }),
  botanical('cloves', 'cloves', { otherNames: ['clove', 'whole cloves'], ...grams(0.1) }),
  botanical('star-anise', 'star anise', grams(1.5)),
  botanical('anise-seed', 'anise seed', {
    otherNames: ['aniseed'],
    density: from(0.426, 'USDA SR28 NDB 02002, 2.1 g a teaspoon'),
  }),
  botanical('fennel-seed', 'fennel seed', {
    density: from(0.406, 'USDA SR28 NDB 02018, 2.0 g a teaspoon'),
    otherNames: ['fennel seeds'],
  }),
  botanical('caraway-seed', 'caraway seed', {
    density: from(0.426, 'USDA SR28 NDB 02005, 2.1 g a teaspoon'),
    otherNames: ['caraway'],
  }),
  botanical('coriander-seed', 'coriander seed', {
    density: from(0.365, 'USDA SR28 NDB 02013, 1.8 g a teaspoon'),
    otherNames: ['coriander seeds'],
  }),
  botanical('cumin-seed', 'cumin seed', { density: from(0.426, 'USDA SR28 NDB 02014, 2.1 g a teaspoon') }),
  botanical('celery-seed', 'celery seed', {
    density: from(0.406, 'USDA SR28 NDB 02007, 2.0 g a teaspoon'),
    allergens: ['celery'],
  }),
  botanical('mustard-seed', 'mustard seed', {
    density: from(0.406, 'USDA SR28 NDB 02024, 2.0 g a teaspoon'),
    allergens: ['mustard'],
  }),
  botanical('cardamom-pod', 'green cardamom pod', {
    otherNames: ['cardamom', 'cardamom pods', 'green cardamom'],
    ...grams(0.2),
  }),
  botanical('black-peppercorns', 'black peppercorns', {
    density: from(0.588, 'USDA SR28 NDB 02030, 2.9 g a teaspoon'),
    otherNames: ['black pepper', 'peppercorns'],
  }),
  botanical('pink-peppercorns', 'pink peppercorns', { density: from(0.3, ESTIMATE), otherNames: ['pink pepper'] }),
  botanical('allspice-berries', 'allspice berries', {
    otherNames: ['allspice', 'pimento berries'],
    density: from(0.385, 'USDA SR28 NDB 02001, 1.9 g a teaspoon'),
  }),
  botanical('juniper-berries', 'juniper berries', { otherNames: ['juniper'], density: from(0.4, ESTIMATE) }),
  botanical('nutmeg', 'nutmeg', {
    otherNames: ['grated nutmeg'],
    pieceWeight: from(5, ESTIMATE),
    density: from(0.446, 'USDA SR28 NDB 02025, 2.2 g a teaspoon'),
  }),
  botanical('mace', 'mace', { density: from(0.345, 'USDA SR28 NDB 02022, 1.7 g a teaspoon') }),
  botanical('saffron', 'saffron', { density: from(0.142, 'USDA SR28 NDB 02037, 0.7 g a teaspoon') }),
  botanical('turmeric', 'turmeric', { density: from(0.609, 'USDA SR28 NDB 02043, 3.0 g a teaspoon') }),
  botanical('vanilla-pod', 'vanilla pod', { otherNames: ['vanilla', 'vanilla bean'], ...grams(3) }),
  botanical('cacao-nibs', 'cacao nibs', { otherNames: ['cocoa nibs'], density: from(0.55, ESTIMATE) }),
  botanical('coffee-beans', 'coffee beans', { otherNames: ['coffee', 'ground coffee'], density: from(0.4, ESTIMATE) }),
  botanical('black-tea-leaves', 'black tea leaves', {
    otherNames: ['loose black tea', 'tea leaves', 'smoked tea'],
    density: from(0.35, ESTIMATE),
  }),
  botanical('green-tea-leaves', 'green tea leaves', {
    otherNames: ['matcha', 'loose green tea'],
    density: from(0.3, ESTIMATE),
  }),
  botanical('hibiscus', 'dried hibiscus', {
    otherNames: ['hibiscus flowers', 'roselle'],
    density: from(0.2, ESTIMATE),
  }),
  botanical('chamomile', 'dried chamomile', { otherNames: ['camomile'], density: from(0.1, ESTIMATE) }),
  botanical('dried-orange-peel', 'dried bitter orange peel', {
    otherNames: ['dried orange peel'],
    density: from(0.3, ESTIMATE),
  }),
  botanical('gentian-root', 'gentian root', { otherNames: ['gentian'], density: from(0.4, ESTIMATE) }),
  botanical('angelica-root', 'angelica root', { otherNames: ['angelica'], density: from(0.4, ESTIMATE) }),
  botanical('orris-root', 'orris root', { otherNames: ['orris'], density: from(0.5, ESTIMATE) }),
  botanical('liquorice-root', 'liquorice root', {
    otherNames: ['licorice root', 'liquorice'],
    density: from(0.4, ESTIMATE),
  }),
  botanical('roasted-barley', 'roasted barley', {
    otherNames: ['barley', 'malted barley', 'pearl barley'],
    allergens: ['gluten'],
    density: from(0.778, 'USDA SR28 NDB 20004, 184 g a cup'),
  }),
  botanical('oats', 'rolled oats', {
    otherNames: ['oats', 'oatmeal'],
    allergens: ['gluten'],
    density: from(0.38, ESTIMATE),
  }),
  botanical('rice', 'rice', { density: from(0.782, 'USDA SR28 NDB 20044, 185 g a cup') }),
  botanical('kelp', 'dried kelp', { otherNames: ['kombu', 'kelp'] }),
  botanical('dulse', 'dried dulse', { otherNames: ['dulse'] }),
  botanical('cinchona-bark', 'cinchona bark', { ...HARMFUL, otherNames: ['quinine bark', 'cinchona'] }),
  botanical('tonka-bean', 'tonka bean', { ...HARMFUL, otherNames: ['tonka'], ...grams(1.2) }),
  botanical('wormwood', 'dried wormwood', { ...HARMFUL, otherNames: ['wormwood', 'artemisia'] }),
  botanical('calamus-root', 'calamus root', { ...HARMFUL, otherNames: ['calamus', 'sweet flag'] }),
  botanical('apricot-kernels', 'apricot kernels', {
    ...HARMFUL,
    otherNames: ['bitter almonds', 'peach stones', 'noyaux'],
  }),
  botanical('tobacco-leaf', 'tobacco leaf', { ...HARMFUL, otherNames: ['tobacco'] }),
];

/** Fresh herbs, leaves, flowers, peels and roots. */
export const HERBS = [
  botanical('mint', 'mint', {
    ...FRESH,
    otherNames: ['mint leaves', 'spearmint', 'peppermint', 'fresh mint'],
    pieceWeight: from(0.15, 'USDA SR28 NDB 02065, 0.3 g for 2 leaves'),
  }),
  botanical('basil', 'basil', {
    ...FRESH,
    otherNames: ['basil leaves'],
    pieceWeight: from(0.5, 'USDA SR28 NDB 02044, 2.5 g for 5 leaves'),
  }),
  botanical('rosemary', 'rosemary', { ...FRESH, otherNames: ['fresh rosemary'] }),
  botanical('thyme', 'thyme', { ...FRESH, otherNames: ['fresh thyme', 'lemon thyme'] }),
  botanical('sage', 'sage', { ...FRESH, otherNames: ['sage leaves'] }),
  botanical('bay-leaf', 'bay leaf', { ...FRESH, otherNames: ['bay', 'bay leaves'], ...grams(0.2) }),
  botanical('lemon-verbena', 'lemon verbena', { ...FRESH, otherNames: ['verbena'] }),
  botanical('lemongrass', 'lemongrass', { ...FRESH, otherNames: ['lemon grass'], ...grams(20) }),
  botanical('lavender', 'lavender', { ...FRESH, otherNames: ['lavender flowers'] }),
  botanical('rose-petals', 'rose petals', { ...FRESH, otherNames: ['rose'] }),
  botanical('elderflower', 'elderflower', { ...FRESH, otherNames: ['elderflower heads'], ...grams(5) }),
  botanical('dill', 'dill', { ...FRESH, pieceWeight: from(0.2, 'USDA SR28 NDB 02045, 1.0 g for 5 sprigs') }),
  botanical('celery', 'celery', {
    ...FRESH,
    allergens: ['celery'],
    pieceWeight: usda(40, '11143'),
    water: usda(95.43, '11143'),
    sugar: usda(1.83, '11143'),
  }),
  botanical('ginger', 'fresh ginger', {
    ...FRESH,
    otherNames: ['ginger', 'ginger root'],
    water: usda(78.89, '11216'),
    sugar: usda(1.7, '11216'),
  }),
  botanical('chilli', 'fresh chilli', {
    ...FRESH,
    otherNames: ['chili', 'chilli pepper', 'jalapeño'],
    pieceWeight: usda(14, '11979'),
  }),
  botanical('lemon-peel', 'lemon peel', { ...FRESH, otherNames: ['lemon zest', 'lemon twist'], ...grams(8) }),
  botanical('lime-peel', 'lime peel', { ...FRESH, otherNames: ['lime zest', 'lime twist'], ...grams(5) }),
  botanical('orange-peel', 'orange peel', { ...FRESH, otherNames: ['orange zest', 'orange twist'], ...grams(15) }),
  botanical('grapefruit-peel', 'grapefruit peel', {
    otherNames: ['grapefruit zest', 'grapefruit twist'],
    cautions: ['fresh-keeping', 'grapefruit-medicines'],
  }),
];
