import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Figure } from '../../../shared/contracts/figures.ts';
import type { RecipeDocument, RecipeLine } from '../../../shared/contracts/recipe-document.ts';
import { computeFigures } from '../../../shared/engine/figures.ts';
import { aLine, aRecipe, aStep, larderContext, pour } from './build.ts';

function least(figure: Figure): number {
  if (!figure.known) throw new Error(`Not known: ${JSON.stringify(figure.lacks)}`);
  return figure.min;
}

/** First lines go in, are strained with a loss, and the others follow. */
function strained(before: RecipeLine[], lossShare: number, after: RecipeLine[] = []): RecipeDocument {
  return aRecipe([...before, ...after], {
    steps: [
      aStep({ id: 'in', uses: before.map(({ id }) => id), operation: { kind: 'add' } }),
      aStep({ id: 'strain', operation: { kind: 'strain', lossShare } }),
      aStep({ id: 'rest', uses: after.map(({ id }) => id), operation: { kind: 'add' } }),
    ],
  });
}
const figuresOf = (document: RecipeDocument) => computeFigures(document, larderContext());
/** Pure alcohol in the finished whole, in ml at 20 °C: strength and volume multiplied out. */
function alcohol(document: RecipeDocument): number {
  const { strength, yieldMl } = figuresOf(document);
  return (least(strength) / 100) * least(yieldMl);
}

// Conservation of mass, worked by hand: what clings to the solids is the liquid as it is at that moment.
describe('straining', () => {
  const water = pour(1000, 'water', 'g');
  const spirit = pour(200, 'neutral-spirit-96');

  it('takes its share of what has come so far, and nothing of what is added after it', () => {
    // 200 ml of 96 % vol hold 192 ml of alcohol; a fifth of them is 38.4 ml.
    expect(alcohol(strained([water], 0.2, [spirit]))).toBeCloseTo(192, 6);
    expect(alcohol(strained([water, spirit], 0.2))).toBeCloseTo(192 - 38.4, 6);
  });

  it('leaves 700 g of 1000 g of water, which 700 g of sugar make a syrup of 50 °Bx', () => {
    const { sugar, yieldMl } = figuresOf(strained([water], 0.3, [pour(700, 'granulated-sugar', 'g')]));
    // 50 % by mass weighs 1.2295 g/ml (CRC Handbook): 1400 g in 1138.7 ml, 614.8 g of sugar a litre.
    expect(Math.abs(least(yieldMl) / 1138.7 - 1)).toBeLessThan(0.005);
    expect(Math.abs(least(sugar) / 614.8 - 1)).toBeLessThan(0.005);
  });

  it('makes what ran through neither weaker nor less sweet, however much is lost', () => {
    const lines = [water, spirit, pour(300, 'granulated-sugar', 'g')];
    const whole = figuresOf(aRecipe(lines));
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 0.9, noNaN: true }), (loss) => {
        const left = figuresOf(strained(lines, loss));
        expect(least(left.strength)).toBeCloseTo(least(whole.strength), 6);
        expect(least(left.sugar)).toBeCloseTo(least(whole.sugar), 6);
        expect(least(left.yieldMl)).toBeCloseTo((1 - loss) * least(whole.yieldMl), 6);
      }),
    );
  });

  it('twice takes twice', () => {
    const twice = strained([water, spirit], 0.2);
    twice.steps.push(aStep({ id: 'again', operation: { kind: 'strain', lossShare: 0.5 } }));
    expect(alcohol(twice)).toBeCloseTo(192 * 0.8 * 0.5, 6);
  });
});

describe('cautions of making', () => {
  const cordial = aRecipe([pour(500, 'water'), pour(500, 'granulated-sugar', 'g'), pour(100, 'lemon-juice')], {
    title: 'Cordial',
    kind: 'cordial',
    steps: [
      aStep({ id: 'boil', operation: { kind: 'heat', covered: false, liveliness: 'boil' } }),
      aStep({ id: 'bottle', operation: { kind: 'bottle', sealed: true } }),
    ],
    extraCautions: ['grapefruit-medicines'],
  });
  const cautionsOf = (document: RecipeDocument) =>
    computeFigures(document, larderContext({ c: cordial })).cautions.map(({ caution }) => caution);

  it('stand with what is made at the stove, and not with a drink that only pours it', () => {
    const drink = aRecipe([pour(50, 'gin'), aLine({ id: 'cordial', componentId: 'c', amount: 30 })], { kind: 'drink' });
    expect(cautionsOf(cordial)).toEqual(expect.arrayContaining(['hot-sugar', 'sealed-gas-pressure']));
    expect(cautionsOf(drink)).not.toContain('hot-sugar');
    expect(cautionsOf(drink)).not.toContain('sealed-gas-pressure');
    expect(cautionsOf(drink)).toContain('grapefruit-medicines');
  });
});
