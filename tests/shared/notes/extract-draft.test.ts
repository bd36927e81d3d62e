import { describe, expect, it } from 'vitest';
import { draft as draftContract, type Draft } from '../../../shared/contracts/notes.ts';
import { recipeDocument } from '../../../shared/contracts/recipe-document.ts';
import { LARDER } from '../../../shared/larder/index.ts';
import { draftToDocument } from '../../../shared/notes/draft-to-document.ts';
import { extractDraft } from '../../../shared/notes/extract-draft.ts';
import { readNotes } from '../../../shared/notes/read-notes.ts';
import { COFFEE_BITTERS, PLUM_SOUR, QUINCE, SPRITZ, WHEY_PUNCH } from './shoots.ts';

// What a careful editor would take down from each shoot, judged by hand; kitchen and bar usage is common practice.

async function draftOf(text: string): Promise<Draft> {
  const notes = await readNotes(text);
  if (!notes.ok) throw new Error(notes.reason);
  return extractDraft(notes.cues, LARDER);
}

/** "1.2 kg quince", "(1 pinch salt)" where it is optional. */
function lines({ ingredients }: Draft): string[] {
  return ingredients.map(({ name, amount, unit, optional }) => {
    const figure = amount && (amount.min === amount.max ? `${amount.min}` : `${amount.min}-${amount.max}`);
    const text = [figure, unit, name].filter(Boolean).join(' ');
    return optional ? `(${text})` : text;
  });
}

const times = ({ steps }: Draft) =>
  steps.flatMap(({ operation, durationSec }) =>
    durationSec ? [[operation?.kind, durationSec.min, durationSec.max]] : [],
  );

describe('rolling captions without full stops', () => {
  it('give each ingredient once, corrected, with options marked', async () => {
    const draft = await draftOf(QUINCE);
    expect(draft.kind).toBe('cordial');
    expect(lines(draft)).toEqual([
      '1.2 kg quince',
      '1.5 l water',
      '5-6 sprig thyme',
      '800 g sugar',
      '2 piece lemon juice',
      '(star anise)',
    ]);
    expect(times(draft)).toEqual([
      ['heat', 2400, 3000],
      ['strain', 7200, 7200],
    ]);
    expect(draft.steps.flatMap(({ temperatureC }) => temperatureC ?? [])).toEqual([{ min: 77, max: 77 }]);
    expect(draft.yields).toMatchObject([{ amount: { min: 2, max: 2 }, unit: 'l' }]);
    expect(draft.storage).toMatchObject([{ days: { min: 42, max: 42 }, where: 'refrigerator' }]);
  });

  it('point at the cue that names a thing first and at the one that holds its amount', async () => {
    const { ingredients } = await draftOf(QUINCE);
    expect(ingredients[0]).toMatchObject({ cue: 1, at: 5000, amountAt: 15_000, larderId: 'quince' });
    expect(ingredients[0]!.words).toBe('no make that one point two kilos');
  });
});

describe('a drink in two stages', () => {
  it('sums what is added twice, drops what was once done, leaves out what is not used', async () => {
    const draft = await draftOf(PLUM_SOUR);
    expect(draft).toMatchObject({ title: 'Plum sour', kind: 'drink' });
    expect(lines(draft)).toEqual([
      '200 g plum',
      '20 ml plum syrup',
      '200 g sugar',
      '150 ml water',
      '60 ml bourbon',
      '(rye)',
      '25 ml lemon juice',
      '1 dash orange bitters',
    ]);
    expect(times(draft)).toEqual([
      ['heat', 600, 600],
      ['cool', 1800, 1800],
      ['shake', 12, 12],
    ]);
    expect(draft.asides.map(({ name }) => name)).toContain('egg white');
    expect(draft.allergens).toEqual([]);
  });
});

describe('punctuated captions', () => {
  it('take the measure of a bottle, count peels by the fruit and name allergens of what goes in', async () => {
    const draft = await draftOf(WHEY_PUNCH);
    expect(lines(draft)).toEqual([
      '70 cl aged rum',
      '250 ml lemon juice',
      '4 piece lemon peel',
      '0.5 lb demerara sugar',
      '0.5 l black tea',
      '500 ml whole milk',
      'nutmeg',
      '(1 pinch mace)',
    ]);
    expect(draft.allergens).toEqual(['milk']);
    expect(draft.yields).toMatchObject([
      { unit: 'drink', amount: { max: 10 } },
      { unit: 'l', amount: { max: 1 } },
    ]);
    expect(draft.storage).toMatchObject([{ days: { min: 60, max: 90 }, where: 'refrigerator' }]);
    expect(draft.asides.map(({ name }) => name)).toContain('oat milk');
  });

  it('ask for the amount that was never said', async () => {
    const { gaps } = await draftOf(WHEY_PUNCH);
    expect(gaps).toContainEqual(
      expect.objectContaining({ kind: 'amount', subject: 'nutmeg', message: 'The amount of nutmeg was never said.' }),
    );
  });
});

describe('typed rows', () => {
  it('of two takes keep the later', async () => {
    const draft = await draftOf(SPRITZ);
    expect(lines(draft)).toEqual([
      '25 ml rhubarb syrup',
      '30 ml dry vermouth',
      '15 ml lemon juice',
      '90 ml sparkling wine',
      '(1 pinch salt)',
      '1 slice orange slice',
    ]);
    expect(draft.allergens).toEqual(['sulphites']);
    expect(draft.storage).toMatchObject([{ days: null, where: 'serve-at-once' }]);
  });

  it('without times give a list, its preparation and the steps below it', async () => {
    const draft = await draftOf(COFFEE_BITTERS);
    expect(draft).toMatchObject({ title: 'Coffee & orange bitters', kind: 'bitters' });
    expect(lines(draft)).toEqual([
      '40 g coffee beans',
      '200 ml overproof rum',
      '2 piece orange zest',
      '1 tsp gentian root',
      '3 piece cardamom pods',
      '1.5 tbsp demerara sugar',
      '60 ml water',
    ]);
    expect(draft.ingredients[0]).toMatchObject({ at: null, prep: 'lightly crushed' });
    expect(times(draft)).toEqual([['add', 864_000, 1_209_600]]);
    expect(draft.steps[0]).toMatchObject({ passive: true });
    expect(draft.yields).toMatchObject([{ amount: { min: 220, max: 220 }, unit: 'ml' }]);
    expect(draft.storage).toMatchObject([{ days: { min: 730, max: 730 }, where: 'cool-dark' }]);
  });
});

describe('what is said of an ingredient', () => {
  const typed = (row: string) => draftOf(`0:00 A test\n0:05 ${row}`);

  it.each([
    ['gin 35. no - 40 ml gin', ['40 ml gin']],
    ['two ounces of gin', ['2 floz gin']],
    ['four ounces of sugar', ['4 oz sugar']],
    ['mint? no', []],
    ['no sugar, the syrup is sweet enough', []],
    ['a handful of meadowsweet', ['1 handful meadowsweet']],
    ['meadowsweet, dried 12 g', ['12 g meadowsweet']],
    ['20 g honey, if you like', ['(20 g honey)']],
    ['top w/ cold soda', ['soda']],
    ['0% version: leave gin out, 60 ml lime juice', []],
  ])('%s', async (row, expected) => {
    expect(lines(await typed(row))).toEqual(expected);
  });
});

describe('the recipe document of a draft', () => {
  it.each(Object.entries({ QUINCE, PLUM_SOUR, WHEY_PUNCH, SPRITZ, COFFEE_BITTERS }))(
    'of %s keeps to its contract, as the draft does',
    async (_, text) => {
      const draft = await draftOf(text);
      expect(draftContract.parse(draft)).toEqual(draft);
      const document = draftToDocument(draft, { title: draft.title || 'Untitled', kind: draft.kind });
      expect(recipeDocument.parse(document)).toEqual(document);
      expect(document.sections[0]!.lines).toHaveLength(draft.ingredients.length);
    },
  );

  it('carries seconds, waiting, source, servings and keeping', async () => {
    const document = draftToDocument(await draftOf(WHEY_PUNCH), { title: 'Whey punch', kind: 'drink' });
    expect(document.yield).toMatchObject({ stated: { amount: { min: 1, max: 1 }, unit: 'l' }, servings: 10 });
    expect(document.keeping).toMatchObject({ place: 'refrigerator', days: { min: 60, max: 90 }, basis: 'stated' });
    expect(document.sections[0]!.lines[0]).toMatchObject({ larderId: 'aged-rum', source: { cue: 1, startMs: 6500 } });
    expect(document.steps.find(({ duration }) => duration?.max === 10_800)).toMatchObject({
      operation: { kind: 'strain' },
      attention: 'waiting',
      tools: ['coffee filter'],
      source: { cue: 9, startMs: 50_500 },
    });
  });
});

it('reads the same notes into the same draft, and nothing into an empty one', async () => {
  expect(await draftOf(PLUM_SOUR)).toEqual(await draftOf(PLUM_SOUR));
  expect(extractDraft([], LARDER)).toMatchObject({ ingredients: [], steps: [], asides: [] });
});
