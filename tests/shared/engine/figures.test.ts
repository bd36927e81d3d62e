import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { figures as figuresContract, type Figure } from '../../../shared/contracts/figures.ts';
import type { Operation, RecipeDocument } from '../../../shared/contracts/recipe-document.ts';
import { bandOf, computeFigures } from '../../../shared/engine/figures.ts';
import { known } from '../../../shared/engine/figure.ts';
import { parseRest } from '../../../shared/engine/rests.ts';
import { aLine, aRecipe, aStep, larderContext, pour, seconds } from './build.ts';

const NO_YIELD = { stated: null, measured: null, servings: null, servingSize: null };
const measured = (amount: number) => ({ ...NO_YIELD, measured: { amount, unit: 'ml' as const } });
const figuresOf = (document: RecipeDocument, components: Record<string, RecipeDocument> = {}) =>
  computeFigures(document, larderContext(components));

function ends(figure: Figure): { min: number; max: number; how: string; rests: string[] } {
  if (!figure.known) throw new Error(`Not known: ${JSON.stringify(figure.lacks)}`);
  return figure;
}

const SIMMER: Operation = { kind: 'heat', covered: false, liveliness: 'simmer' };

describe('a blend', () => {
  // Mass balance by OIML R 22 (1975): 1 L at 96 % vol comes to 40 with 1470 ml of water and not with 1400.
  it('of strong spirit and water is as strong as the table says', () => {
    const { strength, yieldMl } = figuresOf(aRecipe([pour(1000, 'neutral-spirit-96'), pour(1470.5, 'water')]));
    expect(ends(strength).min).toBeCloseTo(40, 1);
    expect(ends(strength).max).toBe(ends(strength).min);
    expect(strength).toMatchObject({ how: 'computed' });
    expect(ends(yieldMl).min).toBeCloseTo(2400, -1);
  });

  // The product's model, worked by hand on OIML R 22 and Hackbarth 2011.
  it('with sugar takes up the sugar’s volume', () => {
    const { strength, sugar, yieldMl } = figuresOf(
      aRecipe([pour(500, 'neutral-spirit-96'), pour(500, 'water', 'g'), pour(500, 'granulated-sugar', 'g')]),
    );
    expect(Math.abs(ends(yieldMl).min / 1282.74 - 1)).toBeLessThan(0.01);
    expect(Math.abs(ends(strength).min / 37.42 - 1)).toBeLessThan(0.01);
    expect(Math.abs(ends(sugar).min / 389.79 - 1)).toBeLessThan(0.01);
  });

  // 1:1 by volume of granulated sugar is 45.9 °Bx with USDA's 200 g a cup (NDB 19335), not 50: 551 g/L and not 615.
  it('by volume is not by weight', () => {
    const byVolume = figuresOf(
      aRecipe([pour(1, 'granulated-sugar', 'cup'), pour(1, 'water', 'cup')], { kind: 'syrup' }),
    );
    const byWeight = figuresOf(
      aRecipe([pour(200, 'granulated-sugar', 'g'), pour(200, 'water', 'g')], { kind: 'syrup' }),
    );
    expect(Math.abs(ends(byVolume.sugar).max - 551)).toBeLessThan(5);
    expect(Math.abs(ends(byWeight.sugar).max - 614)).toBeLessThan(3);
    expect(byWeight.band).toBe('none');
  });

  it('of a range is a range, and an optional line may be left out', () => {
    const { strength, yieldMl } = figuresOf(
      aRecipe([
        aLine({ id: 'a', larderId: 'gin', amount: { min: 50, max: 60 } }),
        aLine({ id: 'b', larderId: 'water', amount: 20, optional: true }),
      ]),
    );
    expect(ends(strength).max).toBeCloseTo(40, 3);
    // 20 ml of ethanol in the 69.9 ml that 50 ml of gin and 20 ml of water make (OIML R 22).
    expect(ends(strength).min).toBeCloseTo(28.62, 1);
    expect(ends(yieldMl)).toMatchObject({ min: expect.closeTo(50, 3), how: 'computed', rests: ['optional-lines'] });
  });

  it('of parts alone has a strength and no volume', () => {
    const { strength, yieldMl } = figuresOf(aRecipe([pour(1, 'gin', 'part'), pour(1, 'water', 'part')]));
    expect(ends(strength).min).toBeCloseTo(20, 0);
    expect(yieldMl).toMatchObject({ known: false, lacks: [{ code: 'yield-missing' }] });
    const mixed = figuresOf(aRecipe([pour(1, 'gin', 'part'), pour(20, 'water')]));
    expect(mixed.strength).toEqual({ known: false, lacks: [{ code: 'unit-missing', subject: 'gin' }] });
  });

  it('says what a dash was taken for', () => {
    const { strength } = figuresOf(aRecipe([pour(60, 'rye-whiskey'), pour(2, 'aromatic-bitters', 'dash')]));
    expect(ends(strength).rests).toEqual(['dash:0.9']);
    expect(parseRest('dash:0.9')).toEqual({ code: 'dash', value: 0.9 });
    expect(parseRest('luck')).toBeNull();
  });

  it('leaves peel and spice out, and a line that stands in for another', () => {
    const { strength, yieldMl } = figuresOf(
      aRecipe([
        pour(50, 'vodka'),
        pour(1, 'lemon-peel', 'strip'),
        pour(4, 'cloves', 'piece'),
        aLine({ id: 'alt', larderId: 'gin', amount: 50, alternativeTo: 'vodka' }),
      ]),
    );
    expect(ends(strength).min).toBeCloseTo(40, 3);
    expect(ends(yieldMl).min).toBeCloseTo(50, 3);
  });

  it.each([
    [aLine({ id: 'x', name: 'moss tincture', amount: 10 }), 'not-in-larder'],
    [aLine({ id: 'x', name: 'gin', larderId: 'gin' }), 'amount-missing'],
    [aLine({ id: 'x', name: 'honey', larderId: 'honey', amount: 2, unit: 'piece' }), 'piece-weight-missing'],
    [aLine({ id: 'x', name: 'sugar', larderId: 'caster-sugar', amount: 1, unit: null }), 'unit-missing'],
    [aLine({ id: 'x', name: 'syrup', componentId: 'nowhere', amount: 10 }), 'component-missing'],
  ])('says what it lacks instead of guessing', (line, code) => {
    const { strength, sugar, yieldMl, band } = figuresOf(aRecipe([pour(50, 'vodka'), line]));
    for (const figure of [strength, sugar, yieldMl])
      expect(figure).toEqual({ known: false, lacks: [{ code, subject: line.name }] });
    expect(band).toBeNull();
  });

  it('knows nothing of nothing, and is good against its contract', () => {
    const blank = figuresOf(aRecipe([]));
    expect([blank.strength.known, blank.sugar.known, blank.yieldMl.known]).toEqual([false, false, false]);
    expect(figuresContract.parse(blank)).toEqual(blank);
  });

  it('of the most lines a recipe may have is the same in any order', () => {
    const lines = Array.from({ length: 2000 }, (_, i) =>
      aLine({ id: `l${i}`, larderId: i % 3 === 0 ? 'gin' : 'simple-syrup', amount: { min: 1 + (i % 7), max: 9 } }),
    );
    const forwards = figuresOf(aRecipe(lines));
    const backwards = figuresOf(aRecipe([...lines].reverse()));
    expect(ends(backwards.strength).max).toBeCloseTo(ends(forwards.strength).max, 9);
    expect(ends(forwards.strength).min).toBeLessThan(ends(forwards.strength).max);
  });

  it('never gets weaker by more gin, and leaves the document alone', () => {
    const ml = fc.double({ min: 1, max: 500, noNaN: true });
    fc.assert(
      fc.property(ml, ml, ml, ml, (gin, more, syrup, juice) => {
        const build = (spirit: number) =>
          aRecipe([pour(spirit, 'gin'), pour(syrup, 'simple-syrup'), pour(juice, 'lemon-juice')]);
        const document = build(gin);
        const before = structuredClone(document);
        const weaker = ends(figuresOf(document).strength);
        expect(document).toEqual(before);
        expect(ends(figuresOf(build(gin + more)).strength).min).toBeGreaterThanOrEqual(weaker.min);
      }),
      { numRuns: 50 },
    );
  });
});

describe('components', () => {
  const syrup = aRecipe([pour(500, 'caster-sugar', 'g'), pour(500, 'water', 'g')], { title: 'Syrup', kind: 'syrup' });

  it('count as what they are made of', () => {
    const part = aLine({ id: 'c', componentId: 's', name: 'syrup', amount: 100 });
    const through = figuresOf(aRecipe([pour(100, 'vodka'), part]), { s: syrup });
    const direct = figuresOf(
      aRecipe([pour(100, 'vodka'), pour(61.48, 'caster-sugar', 'g'), pour(61.48, 'water', 'g')]),
    );
    expect(ends(through.strength).min).toBeCloseTo(ends(direct.strength).min, 1);
    expect(Math.abs(ends(through.sugar).min - ends(direct.sugar).min)).toBeLessThan(1);
  });

  it('pass on what they lack, with their name', () => {
    const murky = aRecipe([aLine({ id: 'x', name: 'moss', amount: 10 }), pour(10, 'water')], {
      title: 'Murk',
      kind: 'syrup',
    });
    const drink = aRecipe([pour(50, 'gin'), aLine({ id: 'c', componentId: 'm', amount: 10 })]);
    expect(figuresOf(drink, { m: murky }).strength).toEqual({
      known: false,
      lacks: [{ code: 'not-in-larder', subject: 'moss (Murk)' }],
    });
  });

  it('that are a garnish add nothing', () => {
    const garnish = aRecipe([pour(20, 'caster-sugar', 'g')], { title: 'Sugared peel', kind: 'garnish' });
    const drink = aRecipe([pour(50, 'gin'), aLine({ id: 'c', componentId: 'g', amount: 1, unit: 'piece' })]);
    expect(ends(figuresOf(drink, { g: garnish }).strength).max).toBeCloseTo(40, 3);
  });
});

describe('yield', () => {
  const lines = [pour(500, 'water'), pour(500, 'granulated-sugar', 'g')];

  it('is the measured one, then the stated one, then the computed one', () => {
    const stated = { amount: { min: 700, max: 750 }, unit: 'ml' as const };
    const both = figuresOf(aRecipe(lines, { yield: { ...measured(780), stated } }));
    expect(both.yieldMl).toMatchObject({ min: 780, max: 780, how: 'measured' });
    expect(figuresOf(aRecipe(lines, { yield: { ...NO_YIELD, stated } })).yieldMl).toMatchObject({
      min: 700,
      max: 750,
      how: 'stated',
    });
    expect(figuresOf(aRecipe(lines)).yieldMl).toMatchObject({ how: 'computed' });
  });

  it('counts servings by their size, and weighs what is stated in grams', () => {
    const served = { ...NO_YIELD, servings: 8, servingSize: { amount: 30, unit: 'ml' as const } };
    expect(figuresOf(aRecipe(lines, { yield: served })).yieldMl).toMatchObject({ min: 240, how: 'stated' });
    const weighed = { ...NO_YIELD, measured: { amount: 1, unit: 'kg' as const } };
    // 50 °Bx weighs 1.2295 g/ml (CRC Handbook).
    expect(ends(figuresOf(aRecipe(lines, { yield: weighed })).yieldMl).min).toBeCloseTo(1000 / 1.2295, -1);
  });

  it('is unknown after straining off an unknown share, and known after a stated one', () => {
    const strain = (lossShare: number | null) => [
      aStep({ id: '1', text: 'Strain.', operation: { kind: 'strain', lossShare } }),
    ];
    expect(figuresOf(aRecipe(lines, { steps: strain(null) })).yieldMl).toEqual({
      known: false,
      lacks: [{ code: 'loss-unknown', subject: 'Strain.' }],
    });
    const all = ends(figuresOf(aRecipe(lines)).yieldMl).min;
    expect(ends(figuresOf(aRecipe(lines, { steps: strain(0.1) })).yieldMl).min).toBeCloseTo(0.9 * all, 6);
    expect(figuresOf(aRecipe(lines, { kind: 'drink', steps: strain(null) })).yieldMl.known).toBe(true);
  });
});

describe('what is done to it', () => {
  it('a shaken sour is estimated, weaker than it was mixed, and says why', () => {
    const lines = [pour(60, 'gin'), pour(25, 'lemon-juice'), pour(25, 'simple-syrup')];
    const shaken = figuresOf(
      aRecipe(lines, { kind: 'drink', steps: [aStep({ id: '1', operation: { kind: 'shake' } })] }),
    );
    const mixed = figuresOf(aRecipe(lines, { kind: 'drink' }));
    expect(ends(mixed.strength).min).toBeCloseTo(21.9, 0);
    // Regression for 22 % vol: 0.51 of 110 ml of water, so about 14.5 % vol.
    expect(ends(shaken.strength).min).toBeLessThan(14.5);
    expect(ends(shaken.strength).max).toBeGreaterThan(14.5);
    expect(ends(shaken.strength)).toMatchObject({ how: 'estimated', rests: ['shaken-over-ice'] });
    expect(shaken.band).toBe('medium');
  });

  it('a dry shake is no dilution, nor is stirring a syrup or what is built in the glass', () => {
    const dry = [aStep({ id: '1', text: 'Dry shake hard.', operation: { kind: 'shake' } })];
    const stir = [aStep({ id: '1', operation: { kind: 'stir' } })];
    const built = figuresOf(aRecipe([pour(60, 'gin')], { kind: 'drink', method: 'Built', ice: 'cubes', steps: stir }));
    expect(ends(built.strength)).toMatchObject({ how: 'computed', rests: ['before-ice'] });
    expect(figuresOf(aRecipe([pour(60, 'gin')], { kind: 'drink', steps: dry })).strength).toMatchObject({
      how: 'computed',
    });
    expect(figuresOf(aRecipe([pour(60, 'gin')], { kind: 'liqueur', steps: stir })).strength).toMatchObject({
      how: 'computed',
    });
  });

  it('soda poured after the shake is not diluted by it', () => {
    const lines = [pour(60, 'gin'), pour(100, 'soda-water')];
    const steps = [
      aStep({ id: '1', uses: ['gin'], operation: { kind: 'shake' } }),
      aStep({ id: '2', uses: ['soda-water'] }),
    ];
    const top = figuresOf(aRecipe(lines, { kind: 'drink', steps }));
    const together = figuresOf(
      aRecipe(lines, { kind: 'drink', steps: [aStep({ id: '1', operation: { kind: 'shake' } })] }),
    );
    expect(ends(top.strength).max).not.toBeCloseTo(ends(together.strength).max, 1);
    // 60 ml at 40 % take up 0.649 of their volume, give or take 15 %: 24 ml of ethanol in 192 to 205 ml.
    expect(ends(top.strength).min).toBeCloseTo(11.7, 0);
  });

  it('says where the ice regression was stopped at 45 % vol', () => {
    const steps = [aStep({ id: '1', operation: { kind: 'stir' } })];
    const { strength } = figuresOf(aRecipe([pour(60, 'navy-strength-gin')], { kind: 'drink', steps }));
    expect(ends(strength).rests).toContain('ice-strongest:45');
  });

  it('simmered liqueur keeps a range of its ethanol by USDA’s factors, and none is invented past 2.5 h', () => {
    const lines = [pour(500, 'red-wine'), pour(100, 'caster-sugar', 'g')];
    const heated = (duration: { min: number; max: number }) =>
      figuresOf(aRecipe(lines, { steps: [aStep({ id: '1', text: 'Simmer.', operation: SIMMER, duration })] }));
    const quarter = ends(heated(seconds(900)).strength);
    const raw = ends(figuresOf(aRecipe(lines)).strength);
    expect(quarter.how).toBe('estimated');
    expect(quarter.min).toBeLessThan(0.4 * raw.min);
    expect(quarter.max).toBeGreaterThan(0.4 * raw.min);
    expect(quarter.max).toBeLessThan(raw.min);
    expect(heated(seconds(10_000)).strength).toMatchObject({
      known: false,
      lacks: [{ code: 'loss-unknown', subject: 'Simmer.' }],
    });
  });

  it('spirit that comes in after the pan has cooled loses nothing', () => {
    const steps = [
      aStep({ id: '1', uses: ['water', 'caster-sugar'], operation: SIMMER, duration: seconds(300) }),
      aStep({ id: '2', operation: { kind: 'cool' } }),
      aStep({ id: '3', uses: ['vodka'] }),
    ];
    const { strength } = figuresOf(
      aRecipe([pour(200, 'water'), pour(200, 'caster-sugar', 'g'), pour(500, 'vodka')], { steps }),
    );
    expect(ends(strength).rests).not.toContain('ethanol-lost-by-time');
    expect(ends(strength).min).toBeGreaterThan(24);
    expect(ends(strength).max).toBeLessThan(28);
  });

  it('a measured yield wins over what the pan is guessed to lose', () => {
    const steps = [aStep({ id: '1', operation: SIMMER, duration: seconds(600) })];
    const { sugar } = figuresOf(
      aRecipe([pour(500, 'granulated-sugar', 'g'), pour(600, 'water')], { kind: 'syrup', steps, yield: measured(800) }),
    );
    // 500 g of sugar at 99.8 % (USDA SR28 NDB 19335) in 800 ml.
    expect(ends(sugar).min).toBeCloseTo(499 / 0.8, 6);
    expect(ends(sugar).max).toBeCloseTo(499 / 0.8, 6);
    expect(ends(sugar).rests).toContain('measured-yield');
  });

  it.each([
    [{ measure: 'volume', ml: 300 }, 300],
    [{ measure: 'share', share: 0.5 }, 250],
  ] as const)('reducing goes to where it says', (to, ml) => {
    const steps = [aStep({ id: '1', operation: { kind: 'reduce', to } })];
    const { yieldMl } = figuresOf(aRecipe([pour(500, 'water')], { steps }));
    expect(ends(yieldMl).max).toBeCloseTo(ml, 3);
    expect(ends(yieldMl)).toMatchObject({ how: 'computed', rests: expect.arrayContaining(['reduced-to']) });
  });

  it('reducing to nobody knows what is not known', () => {
    const steps = [aStep({ id: '1', text: 'Reduce.', operation: { kind: 'reduce', to: null } })];
    expect(figuresOf(aRecipe([pour(500, 'apple-juice')], { steps })).sugar).toMatchObject({
      known: false,
      lacks: [{ code: 'loss-unknown', subject: 'Reduce.' }],
    });
  });

  it('fruit may give up all its juice or none', () => {
    const steps = [aStep({ id: '1', operation: { kind: 'infuse' } })];
    const { strength } = figuresOf(
      aRecipe([pour(500, 'gin'), pour(300, 'raspberries', 'g')], { kind: 'infusion', steps }),
    );
    expect(ends(strength).max).toBeCloseTo(40, 1);
    // 300 g of raspberries hold 257 g of water (USDA SR28 NDB 09302): 200 ml of ethanol in some 750 ml.
    expect(ends(strength).min).toBeGreaterThan(23);
    expect(ends(strength).min).toBeLessThan(28);
    expect(ends(strength).rests).toEqual(expect.arrayContaining(['fruit-gives-up-juice', 'botanicals-soak-up']));
  });
});

describe('bands', () => {
  it.each([
    [0, 'none'],
    [5, 'light'],
    [15, 'medium'],
    [22, 'strong'],
    [40, 'very-strong'],
  ] as const)('%d %% vol is %s', (strength, band) => {
    expect(bandOf(known(strength, strength, 'computed'))).toBe(band);
  });
});
