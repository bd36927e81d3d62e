import type { LarderItem } from '../contracts/larder.ts';
import { ESTIMATE, sweetened } from './make.ts';

function liqueur(
  id: string,
  name: string,
  percent: number,
  sugarPerLitre: number,
  given: Partial<LarderItem> = {},
): LarderItem {
  return sweetened({ id, name, nature: 'liqueur', percent, sugarPerLitre, ...given });
}

/** Liqueurs by class, at common strengths and sweetness; nuts and milk are declared though a distillate may be exempt. */
export const LIQUEURS = [
  liqueur('triple-sec', 'orange liqueur', 40, 250, {
    otherNames: ['triple sec', 'dry orange liqueur', 'curaçao', 'curacao'],
  }),
  liqueur('orange-liqueur-25', 'orange liqueur, 25 %', 25, 300, { otherNames: ['sweet triple sec'] }),
  liqueur('maraschino', 'maraschino', 32, 350, { otherNames: ['maraschino liqueur', 'cherry stone liqueur'] }),
  liqueur('cherry-liqueur', 'cherry liqueur', 24, 280, { otherNames: ['cherry brandy'] }),
  liqueur('creme-de-cassis', 'crème de cassis', 18, 450, { otherNames: ['blackcurrant liqueur', 'cassis'] }),
  liqueur('raspberry-liqueur', 'raspberry liqueur', 18, 320, { otherNames: ['crème de framboise'] }),
  liqueur('peach-liqueur', 'peach liqueur', 18, 260, { otherNames: ['crème de pêche'] }),
  liqueur('apricot-liqueur', 'apricot liqueur', 24, 260, { otherNames: ['apricot brandy'] }),
  liqueur('sloe-gin', 'sloe gin', 26, 220),
  liqueur('elderflower-liqueur', 'elderflower liqueur', 20, 200),
  liqueur('violet-liqueur', 'violet liqueur', 18, 280, { otherNames: ['crème de violette'] }),
  liqueur('ginger-liqueur', 'ginger liqueur', 28, 250),
  liqueur('coffee-liqueur', 'coffee liqueur', 25, 380),
  liqueur('creme-de-cacao', 'crème de cacao', 24, 300, { otherNames: ['cacao liqueur', 'chocolate liqueur'] }),
  liqueur('creme-de-menthe', 'crème de menthe', 24, 320, { otherNames: ['mint liqueur'] }),
  liqueur('almond-liqueur', 'almond liqueur', 28, 260, { otherNames: ['amaretto'], allergens: ['nuts'] }),
  liqueur('hazelnut-liqueur', 'hazelnut liqueur', 24, 240, {
    otherNames: ['walnut liqueur', 'nocino'],
    allergens: ['nuts'],
  }),
  liqueur('cream-liqueur', 'cream liqueur', 17, 200, { otherNames: ['irish cream'], allergens: ['milk'] }),
  liqueur('egg-liqueur', 'egg liqueur', 17, 220, { otherNames: ['advocaat'], allergens: ['egg'] }),
  liqueur('herbal-liqueur', 'herbal liqueur', 43, 250, { otherNames: ['monastery liqueur', 'yellow herbal liqueur'] }),
  liqueur('green-herbal-liqueur', 'green herbal liqueur', 55, 250),
  liqueur('anise-liqueur', 'anise liqueur', 40, 300, { otherNames: ['sambuca', 'anisette'] }),
  liqueur('pastis', 'pastis', 45, 20, { otherNames: ['anise spirit', 'ouzo', 'arak'] }),
  liqueur('caraway-liqueur', 'caraway liqueur', 38, 300, { otherNames: ['kümmel', 'kummel'] }),
  liqueur('red-bitter-aperitivo', 'red bitter aperitif', 25, 220, { otherNames: ['red bitter', 'bitter aperitivo'] }),
  liqueur('orange-aperitivo', 'light bitter aperitif', 11, 230, { otherNames: ['aperitivo', 'orange aperitif'] }),
  liqueur('amaro', 'amaro', 29, 200, { otherNames: ['bitter liqueur', 'medium amaro'] }),
  liqueur('dry-amaro', 'dry amaro', 39, 60, { otherNames: ['fernet'] }),
  liqueur('gentian-liqueur', 'gentian liqueur', 16, 180, { otherNames: ['gentian aperitif'] }),
  liqueur('falernum', 'falernum liqueur', 11, 400, { allergens: ['nuts'] }),
  liqueur('allspice-dram', 'allspice liqueur', 30, 300, { otherNames: ['allspice dram', 'pimento dram'] }),
];

function bitters(
  id: string,
  name: string,
  percent: number,
  sugarPerLitre: number,
  given: Partial<LarderItem> = {},
): LarderItem {
  return sweetened({ id, name, nature: 'bitters', percent, sugarPerLitre, source: ESTIMATE, ...given });
}

/** Bitters and what is dosed like them. */
export const BITTERS = [
  bitters('aromatic-bitters', 'aromatic bitters', 44, 50, { otherNames: ['bitters'] }),
  bitters('orange-bitters', 'orange bitters', 30, 30),
  bitters('anise-bitters', 'anise bitters', 35, 50, { otherNames: ['creole bitters'] }),
  bitters('celery-bitters', 'celery bitters', 40, 20, { allergens: ['celery'] }),
  bitters('chocolate-bitters', 'chocolate bitters', 40, 20, { otherNames: ['cacao bitters', 'mole bitters'] }),
  bitters('grapefruit-bitters', 'grapefruit bitters', 40, 20, { cautions: ['grapefruit-medicines'] }),
  bitters('walnut-bitters', 'walnut bitters', 40, 20, { allergens: ['nuts'] }),
];
