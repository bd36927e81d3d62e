import { describe, expect, it } from 'vitest';
import { larderItem } from '../../../shared/contracts/larder.ts';
import { densityFromStrength } from '../../../shared/engine/oiml.ts';
import { LARDER, LARDER_BY_ID } from '../../../shared/larder/index.ts';

const of = (id: string) => LARDER_BY_ID.get(id)!;

describe('the larder', () => {
  it('has each entry once, each good against the contract', () => {
    expect(LARDER_BY_ID.size).toBe(LARDER.length);
    for (const entry of LARDER) expect(larderItem.parse(entry)).toEqual(entry);
  });

  it('is known by one name only once', () => {
    const names = LARDER.map((entry) => entry.name.toLowerCase());
    expect(names.filter((name, i) => names.indexOf(name) !== i)).toEqual([]);
  });

  it('knows density, strength and sugar of all that is poured or dissolved', () => {
    const gaps = LARDER.filter((entry) => entry.dissolves && !(entry.density && entry.strength && entry.sugar));
    expect(gaps.map((entry) => entry.id)).toEqual([]);
  });

  // OIML R 22 (1975).
  it('weighs plain spirits by their strength', () => {
    for (const entry of LARDER.filter((each) => each.nature === 'spirit'))
      expect(entry.density!.value).toBeCloseTo(densityFromStrength(entry.strength!.value), 5);
  });

  // USDA National Nutrient Database, release 28 (2015), weight of a US cup over 236.588 ml.
  it.each([
    ['honey', 1.433],
    ['maple-syrup', 1.331],
    ['molasses', 1.424],
    ['glucose-syrup', 1.441],
    ['lemon-juice', 1.031],
    ['lime-juice', 1.023],
    ['orange-juice', 1.048],
    ['whole-milk', 1.031],
    ['double-cream', 1.006],
    ['granulated-sugar', 0.8454],
  ])('%s weighs %d g/ml', (id, density) => {
    expect(Math.abs(of(id).density!.value - density)).toBeLessThanOrEqual(0.001);
  });

  // The same database, weights of one.
  it.each([
    ['egg-white', 33],
    ['egg-yolk', 17],
    ['egg', 50],
    ['lemon-juice', 48],
    ['lime-juice', 44],
    ['orange-juice', 86],
    ['sugar-cube', 2.3],
  ])('one %s gives %d g', (id, grams) => {
    expect(of(id).pieceWeight!.value).toBe(grams);
  });

  // Penniston et al. 2008, J. Endourol. 22(3):567-570: citric acid, g per 100 ml.
  it.each([
    ['lemon-juice', 4.8],
    ['lime-juice', 4.58],
    ['grapefruit-juice', 2.5],
  ])('%s holds %d g of acid', (id, acid) => {
    expect(of(id).acid!.value).toBeCloseTo(acid, 6);
  });

  // Regulation (EU) 2019/787, annex I: a liqueur has at least 15 % vol and 100 g/L of invert sugar, 95.0 g/L of sucrose;
  // crème de cassis 400 g/L of invert sugar. Bitter and low-strength ones are sold under other names.
  it.each(['triple-sec', 'maraschino', 'coffee-liqueur', 'almond-liqueur', 'herbal-liqueur', 'elderflower-liqueur'])(
    '%s is a liqueur',
    (id) => {
      const perLitre = of(id).sugar!.value * of(id).density!.value * 10;
      expect(perLitre * 1.05263).toBeGreaterThanOrEqual(100);
      expect(of(id).strength!.value).toBeGreaterThanOrEqual(15);
    },
  );

  it('marks wine and wine vinegar with sulphites, and distilled grain with nothing', () => {
    const wines = LARDER.filter((entry) => /\bwine\b|sherry|port|vermouth/.test(entry.name) && entry.id !== 'sake');
    expect(wines.filter((entry) => !entry.allergens.includes('sulphites')).map((entry) => entry.id)).toEqual([]);
    expect(LARDER.filter((entry) => entry.nature === 'spirit').flatMap((entry) => entry.allergens)).toEqual([]);
  });
});
