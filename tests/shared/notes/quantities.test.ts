import { describe, expect, it } from 'vitest';
import { numberAt } from '../../../shared/notes/number-words.ts';
import { readQuantities } from '../../../shared/notes/quantities.ts';
import { tokenise } from '../../../shared/notes/tokens.ts';

// Numbers, units and times as they are said in English: common usage.

describe('numbers', () => {
  it.each([
    ['450', 450],
    ['1,500', 1500],
    ['0.5', 0.5],
    ['0,5', 0.5],
    ['1½', 1.5],
    ['1 1/2', 1.5],
    ['3/4', 0.75],
    ['seventy-five', 75],
    ['seventy five', 75],
    ['a hundred and fifty', 150],
    ['two hundred and eighty', 280],
    ['three fifty', 350],
    ['one thousand and sixty', 1060],
    ['two thousand five hundred', 2500],
    ['half a', 0.5],
    ['three quarters of an', 0.75],
    ['two and a half', 2.5],
    ['one and two thirds', 5 / 3],
    ['one point two', 1.2],
    ['a couple of', 2],
    ['half a dozen', 6],
  ])('%s', (text, value) => {
    expect(numberAt(tokenise(text), 0)?.value).toBeCloseTo(value, 9);
  });

  it.each(['half past nine', 'half way', 'the lot', 'and', '1/0'])(
    'does not take "%s" for one that measures',
    (text) => {
      const read = readQuantities(tokenise(text)).filter(({ kind, value }) => kind !== 'count' || value.min < 1);
      expect(read).toEqual([]);
    },
  );
});

describe('quantities', () => {
  it.each([
    ['forty mils of lemon', { kind: 'amount', unit: 'ml', value: { min: 40, max: 40 } }],
    ['a litre and a half of water', { kind: 'amount', unit: 'l', value: { min: 1.5, max: 1.5 } }],
    ['two to three dashes', { kind: 'amount', unit: 'dash', value: { min: 2, max: 3 } }],
    ['5-6 sprigs', { kind: 'amount', unit: 'sprig', value: { min: 5, max: 6 } }],
    ['an ounce', { kind: 'amount', unit: 'oz', value: { min: 1, max: 1 } }],
    ['a good pinch', { kind: 'amount', unit: 'pinch', value: { min: 1, max: 1 } }],
    ['2 fl oz', { kind: 'amount', unit: 'floz', value: { min: 2, max: 2 } }],
    ['half an hour', { kind: 'duration', value: { min: 1800, max: 1800 } }],
    ['an hour and a half', { kind: 'duration', value: { min: 5400, max: 5400 } }],
    ['eight minutes, maybe ten', { kind: 'duration', value: { min: 480, max: 600 } }],
    ['between eight and twelve hours', { kind: 'duration', value: { min: 28_800, max: 43_200 } }],
    ['1 wk', { kind: 'duration', value: { min: 604_800, max: 604_800 } }],
    ['sixty, sixty-five degrees', { kind: 'temperature', value: { min: 60, max: 65 } }],
    // 140 °F is 60 °C, 212 °F is 100 °C: NIST SP 811, appendix B.9.
    ['under 140 fahrenheit', { kind: 'temperature', value: { min: 60, max: 60 }, cap: true }],
    ['212 °F', { kind: 'temperature', value: { min: 100, max: 100 } }],
    ['forty per cent', { kind: 'share', value: { min: 40, max: 40 } }],
  ])('%s', (text, expected) => {
    expect(readQuantities(tokenise(text))).toMatchObject([expected]);
  });

  it.each([
    ['thirty, no, forty grams', 40],
    ['35. no - 40 ml gin', 40],
    ['a hundred and fifty no sorry one hundred grams', 100],
    ['one kilo of quinces, no, make that two kilos', 2],
    ['six hundred ml of water just off the boil, no, sorry, seven hundred ml', 700],
  ])('keeps what holds after a correction: %s', (text, value) => {
    expect(readQuantities(tokenise(text)).map((read) => read.value.max)).toEqual([value]);
  });

  it('takes no refusal for a correction', () => {
    const read = readQuantities(tokenise('30 ml gin, no ice, 20 ml lemon'));
    expect(read.map(({ value }) => value.max)).toEqual([30, 20]);
  });

  it.each(['1:1', 'one to one by weight', 'once a day', '5000 degrees'])('measures nothing in "%s"', (text) => {
    expect(readQuantities(tokenise(text))).toEqual([]);
  });
});
