import type { LarderItem } from '../contracts/larder.ts';
import { COMMON, ESTIMATE, from, item, NO_SUGAR, sweetened, usda } from './make.ts';

function wine(id: string, name: string, percent: number, sugarPerLitre: number, otherNames: string[] = []): LarderItem {
  return sweetened({ id, name, otherNames, nature: 'wine', percent, sugarPerLitre, allergens: ['sulphites'] });
}

/** Wines, fortified and aromatised wines by class, and what is brewed. All wine carries sulphites. */
export const WINES = [
  wine('red-wine', 'red wine', 13, 4, ['dry red wine']),
  wine('white-wine', 'white wine', 12.5, 5, ['dry white wine', 'wine']),
  wine('rose-wine', 'rosé wine', 12.5, 6, ['rose wine']),
  wine('sparkling-wine', 'sparkling wine, brut', 12, 10, ['champagne', 'cava', 'prosecco', 'fizz', 'brut']),
  wine('fino-sherry', 'dry sherry', 15.5, 3, ['fino sherry', 'manzanilla', 'fino']),
  wine('amontillado-sherry', 'amontillado sherry', 18, 5, ['amontillado', 'sherry']),
  wine('oloroso-sherry', 'oloroso sherry', 19, 5, ['oloroso']),
  wine('px-sherry', 'very sweet sherry', 16, 380, ['pedro ximenez', 'px sherry', 'cream sherry']),
  wine('ruby-port', 'ruby port', 20, 100, ['port', 'red port']),
  wine('tawny-port', 'tawny port', 20, 110),
  wine('madeira', 'madeira', 19, 60),
  wine('marsala', 'marsala', 18, 60),
  wine('dry-vermouth', 'dry vermouth', 18, 40, ['white dry vermouth', 'french vermouth', 'vermouth']),
  wine('blanc-vermouth', 'bianco vermouth', 16, 140, ['blanc vermouth', 'white vermouth', 'bianco vermouth']),
  wine('sweet-vermouth', 'sweet vermouth', 16, 150, ['red vermouth', 'rosso vermouth', 'italian vermouth']),
  wine('quinquina', 'quinine aperitif wine', 17, 120, ['quinquina', 'kina', 'quinine wine']),
  wine('americano-wine', 'gentian aperitif wine', 16.5, 140, ['americano', 'gentian wine']),
  sweetened({
    id: 'cider',
    name: 'dry cider',
    otherNames: ['cider', 'hard cider'],
    nature: 'wine',
    percent: 5,
    sugarPerLitre: 15,
    allergens: ['sulphites'],
  }),
  sweetened({
    id: 'perry',
    name: 'perry',
    otherNames: ['pear cider'],
    nature: 'wine',
    percent: 5,
    sugarPerLitre: 25,
    allergens: ['sulphites'],
  }),
  sweetened({
    id: 'mead',
    name: 'mead',
    otherNames: ['honey wine'],
    nature: 'wine',
    percent: 13,
    sugarPerLitre: 60,
    allergens: ['sulphites'],
  }),
  item({
    id: 'sake',
    name: 'sake',
    otherNames: ['rice wine'],
    nature: 'wine',
    density: from(0.984, 'USDA SR28 NDB 43479, 29.1 g a US fl oz'),
    strength: from(15, COMMON),
    sugar: from(2.5, ESTIMATE),
  }),
  item({
    id: 'lager',
    name: 'lager beer',
    otherNames: ['beer', 'lager', 'pilsner'],
    nature: 'wine',
    density: from(1.004, 'USDA SR28 NDB 14003, 29.7 g a US fl oz'),
    strength: from(5, COMMON),
    sugar: usda(0, '14003'),
    allergens: ['gluten'],
  }),
  sweetened({
    id: 'stout',
    name: 'stout',
    otherNames: ['porter', 'dark beer'],
    nature: 'wine',
    percent: 5,
    sugarPerLitre: 15,
    source: ESTIMATE,
    allergens: ['gluten'],
  }),
  sweetened({
    id: 'wheat-beer',
    name: 'wheat beer',
    nature: 'wine',
    percent: 5,
    sugarPerLitre: 5,
    source: ESTIMATE,
    allergens: ['gluten'],
  }),
];

function vinegar(id: string, name: string, cupWeight: number, ndb: string, given: Partial<LarderItem>): LarderItem {
  return item({
    id,
    name,
    nature: 'acid',
    density: from(Math.round((cupWeight / 236.5882365) * 1e4) / 1e4, `USDA SR28 NDB ${ndb}, ${cupWeight} g a cup`),
    strength: from(0, ESTIMATE),
    acid: from(5, COMMON),
    ...given,
  });
}

/** Vinegars at the usual five or six per cent of acid; those of wine carry its sulphites. */
export const VINEGARS = [
  vinegar('cider-vinegar', 'cider vinegar', 239, '02048', {
    otherNames: ['apple cider vinegar'],
    sugar: usda(0.4, '02048'),
    water: usda(93.81, '02048'),
  }),
  vinegar('white-wine-vinegar', 'white wine vinegar', 239, '02068', {
    otherNames: ['champagne vinegar', 'wine vinegar'],
    sugar: usda(0, '02068'),
    water: usda(94.47, '02068'),
    acid: from(6, COMMON),
    allergens: ['sulphites'],
  }),
  vinegar('red-wine-vinegar', 'red wine vinegar', 239, '02068', {
    otherNames: ['sherry vinegar'],
    sugar: usda(0, '02068'),
    water: usda(94.47, '02068'),
    acid: from(6, COMMON),
    allergens: ['sulphites'],
  }),
  vinegar('balsamic-vinegar', 'balsamic vinegar', 255, '02069', {
    sugar: usda(14.95, '02069'),
    water: usda(76.45, '02069'),
    acid: from(6, COMMON),
    allergens: ['sulphites'],
  }),
  vinegar('white-vinegar', 'distilled vinegar', 238, '02053', {
    otherNames: ['white vinegar', 'spirit vinegar'],
    sugar: usda(0.04, '02053'),
    water: usda(94.78, '02053'),
  }),
  vinegar('rice-vinegar', 'rice vinegar', 239, '02053', {
    sugar: NO_SUGAR,
    acid: from(4.5, COMMON),
    water: from(95, ESTIMATE),
  }),
  vinegar('malt-vinegar', 'malt vinegar', 239, '02053', {
    sugar: NO_SUGAR,
    water: from(95, ESTIMATE),
    allergens: ['gluten'],
  }),
];
