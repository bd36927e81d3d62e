import { describe, expect, it } from 'vitest';
import type { Operation, RecipeDocument, RecipeStep } from '../../../shared/contracts/recipe-document.ts';
import { allergensUnknownFor, findAllergens } from '../../../shared/engine/allergens.ts';
import { findComponentCycle } from '../../../shared/engine/components.ts';
import { computeFigures } from '../../../shared/engine/figures.ts';
import { aLine, aRecipe, aStep, larderContext, pour } from './build.ts';

const HEAT: Operation = { kind: 'heat', covered: false, liveliness: 'simmer' };
const part = (id: string, componentId: string, amount = 30) => aLine({ id, componentId, amount, name: id });
const step = (given: Partial<RecipeStep> & { id: string }) => aStep(given);

function cautionsOf(document: RecipeDocument, components: Record<string, RecipeDocument> = {}) {
  return Object.fromEntries(
    computeFigures(document, larderContext(components)).cautions.map(({ caution, from }) => [caution, from]),
  );
}

// Regulation (EU) 1169/2011, annex II: the fourteen; nuts and cereals that were distilled are exempt.
describe('allergens', () => {
  const orgeat = aRecipe([pour(200, 'almonds', 'g'), pour(500, 'water')], { title: 'Orgeat', kind: 'syrup' });
  const foam = aRecipe([part('orgeat', 'o'), pour(1, 'egg-white', 'piece')], { title: 'Foam', kind: 'syrup' });

  it('come up from components of components, and say from where', () => {
    const sour = aRecipe([pour(50, 'gin'), part('foam', 'f'), pour(90, 'sparkling-wine')], { kind: 'drink' });
    expect(findAllergens(sour, larderContext({ f: foam, o: orgeat }))).toEqual([
      { allergen: 'egg', from: ['egg-white (Foam)'] },
      { allergen: 'nuts', from: ['almonds (Orgeat)'] },
      { allergen: 'sulphites', from: ['sparkling-wine'] },
    ]);
  });

  it.each([
    ['white-wine', ['sulphites']],
    ['red-wine-vinegar', ['sulphites']],
    ['rye-whiskey', []],
    ['vodka', []],
    ['whole-milk', ['milk']],
    ['oats', ['gluten']],
    ['hazelnuts', ['nuts']],
    ['lager', ['gluten']],
    ['celery-bitters', ['celery']],
  ])('%s', (larderId, allergens) => {
    expect(findAllergens(aRecipe([pour(10, larderId)]), larderContext()).map((found) => found.allergen)).toEqual(
      allergens,
    );
  });

  it('count what may stand in and what is optional', () => {
    const either = aRecipe([
      aLine({ id: 'a', larderId: 'simple-syrup', amount: 20 }),
      aLine({ id: 'b', larderId: 'orgeat', amount: 20, alternativeTo: 'a' }),
      aLine({ id: 'c', larderId: 'egg-white', amount: 20, optional: true }),
    ]);
    expect(findAllergens(either, larderContext()).map((found) => found.allergen)).toEqual(['egg', 'nuts']);
  });

  it('take what the creator adds, here and in a component', () => {
    const syrup = { ...orgeat, extraAllergens: ['sesame' as const] };
    const drink = aRecipe([part('orgeat', 'o')], { extraAllergens: ['fish'] });
    expect(findAllergens(drink, larderContext({ o: syrup }))).toEqual([
      { allergen: 'fish', from: [] },
      { allergen: 'nuts', from: ['almonds (Orgeat)'] },
      { allergen: 'sesame', from: ['Orgeat'] },
    ]);
  });

  it('name what nobody knows the contents of', () => {
    const drink = aRecipe([
      aLine({ id: 'x', name: 'aunt’s tonic', amount: 10 }),
      part('lost syrup', 'gone'),
      pour(5, 'gin'),
    ]);
    expect(allergensUnknownFor(drink, larderContext())).toEqual(['aunt’s tonic', 'lost syrup']);
  });
});

describe('cautions', () => {
  it('warn of spirit over heat where it is in the pan, and not where it comes after', () => {
    const lines = [pour(200, 'water'), pour(100, 'vodka')];
    const before = [step({ id: '1', uses: ['water', 'vodka'] }), step({ id: '2', operation: HEAT })];
    const after = [
      step({ id: '1', uses: ['water'], operation: HEAT }),
      step({ id: '2', operation: { kind: 'cool' } }),
      step({ id: '3', uses: ['vodka'] }),
    ];
    expect(cautionsOf(aRecipe(lines, { steps: before }))['spirit-near-heat']).toEqual(['vodka']);
    expect(cautionsOf(aRecipe(lines, { steps: after }))).not.toHaveProperty('spirit-near-heat');
    expect(
      cautionsOf(aRecipe([pour(100, 'white-wine')], { steps: [step({ id: '1', operation: HEAT })] })),
    ).not.toHaveProperty('spirit-near-heat');
  });

  it('warn of a strong component over heat', () => {
    const tincture = aRecipe([pour(100, 'neutral-spirit-96')], { title: 'Tincture', kind: 'infusion' });
    const hot = aRecipe([part('tincture', 't')], { steps: [step({ id: '1', uses: ['tincture'], operation: HEAT })] });
    expect(cautionsOf(hot, { t: tincture })['spirit-near-heat']).toEqual(['tincture']);
  });

  it('warn of hot sugar when it simmers, not when it is only warmed', () => {
    const lines = [pour(200, 'caster-sugar', 'g'), pour(200, 'water')];
    const warm: Operation = { kind: 'heat', covered: false, liveliness: 'warm' };
    expect(cautionsOf(aRecipe(lines, { steps: [step({ id: '1', operation: HEAT })] }))['hot-sugar']).toEqual([
      'caster-sugar',
    ]);
    expect(cautionsOf(aRecipe(lines, { steps: [step({ id: '1', operation: warm })] }))).not.toHaveProperty('hot-sugar');
  });

  it('warn of raw egg unless it is cooked through', () => {
    const lines = [pour(1, 'egg-white', 'piece')];
    const at = (min: number) => [step({ id: '1', operation: HEAT, temperature: { min, max: min } })];
    expect(cautionsOf(aRecipe(lines, { kind: 'drink' }))['raw-egg']).toEqual(['egg-white']);
    expect(cautionsOf(aRecipe(lines, { steps: at(60) }))).toHaveProperty('raw-egg');
    expect(cautionsOf(aRecipe(lines, { steps: at(72) }))).not.toHaveProperty('raw-egg');
  });

  it('warn of fresh juice in what is kept, not in what is drunk at once', () => {
    expect(cautionsOf(aRecipe([pour(20, 'lemon-juice')], { kind: 'cordial' }))['fresh-keeping']).toEqual([
      'lemon-juice',
    ]);
    expect(cautionsOf(aRecipe([pour(20, 'lemon-juice')], { kind: 'drink' }))).not.toHaveProperty('fresh-keeping');
  });

  it('warn of gas under a stopper', () => {
    const bottle: Operation = { kind: 'bottle', sealed: true };
    const fizz = aRecipe([pour(100, 'water')], {
      steps: [step({ id: '1', operation: { kind: 'carbonate' } }), step({ id: '2', operation: bottle })],
    });
    const fruit = aRecipe([pour(100, 'raspberries', 'g')], { steps: [step({ id: '1', operation: bottle })] });
    const open = aRecipe([pour(100, 'raspberries', 'g')], {
      steps: [step({ id: '1', operation: { kind: 'bottle', sealed: false } })],
    });
    expect(cautionsOf(fizz)).toHaveProperty('sealed-gas-pressure');
    expect(cautionsOf(fruit)['sealed-gas-pressure']).toEqual(['raspberries']);
    const peel = aRecipe([pour(100, 'lemon-peel', 'g'), pour(100, 'water')], {
      steps: [step({ id: '1', operation: bottle })],
    });
    const strong = aRecipe([pour(100, 'raspberries', 'g'), pour(500, 'gin')], {
      steps: [step({ id: '1', operation: bottle })],
    });
    for (const quiet of [open, peel, strong]) expect(cautionsOf(quiet)).not.toHaveProperty('sealed-gas-pressure');
  });

  it('read the larder and the words of the steps', () => {
    const steps = [
      step({ id: '1', text: 'Seal in a vacuum bag.' }),
      step({ id: '2', text: 'Top with distilled water.' }),
    ];
    const found = cautionsOf(
      aRecipe([pour(5, 'cinchona-bark', 'g'), pour(30, 'grapefruit-juice')], { kind: 'drink', steps }),
    );
    expect(Object.keys(found)).toEqual(['vacuum-bag', 'harmful-botanical', 'grapefruit-medicines']);
    expect(cautionsOf(aRecipe([], { steps: [step({ id: '1', text: 'Distil it slowly.' })] }))).toHaveProperty(
      'home-distilling',
    );
  });

  it('come from components, and the creator can add but not take away', () => {
    const foam = aRecipe([pour(1, 'egg-white', 'piece')], { title: 'Foam', kind: 'syrup' });
    const drink = aRecipe([part('foam', 'f')], { kind: 'drink', extraCautions: ['dry-ice'] });
    const found = cautionsOf(drink, { f: foam });
    expect(found['raw-egg']).toEqual(['Foam']);
    expect(found['dry-ice']).toEqual([]);
  });
});

describe('components in a ring', () => {
  const sour = aRecipe([part('syrup', 's')], { title: 'Sour' });
  const syrup = aRecipe([part('tincture', 't')], { title: 'Syrup' });
  const tincture = aRecipe([part('sour', 'd')], { title: 'Tincture' });

  it('are named in order', () => {
    const documents = new Map([
      ['s', syrup],
      ['t', tincture],
    ]);
    expect(findComponentCycle('d', sour, documents)).toEqual(['Sour', 'Syrup', 'Tincture']);
    expect(findComponentCycle('x', aRecipe([part('x', 'x')], { title: 'Alone' }), documents)).toEqual(['Alone']);
    expect(findComponentCycle('y', aRecipe([pour(1, 'gin')]), documents)).toBeNull();
  });

  it('end in a figure that says so, and still show every allergen', () => {
    const withMilk = { ...tincture, extraAllergens: ['milk' as const] };
    const figures = computeFigures(sour, larderContext({ s: syrup, t: withMilk, d: sour }));
    expect(figures.strength.known === false && figures.strength.lacks[0]?.code).toBe('component-cycle');
    expect(figures.allergens.map((found) => found.allergen)).toEqual(['milk']);
  });
});
