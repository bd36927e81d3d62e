import { describe, expect, it } from 'vitest';
import { readWhole } from '../../src/components/office/typed-number.ts';

describe('a whole number as it is typed', () => {
  const bounds = { min: 16, max: 25 };

  it.each([
    ['16', 16],
    [' 18 ', 18],
    ['025', 25],
  ])('%s is %i', (typed, value) => {
    expect(readWhole(typed, bounds)).toBe(value);
  });

  it.each([
    ['', { kind: 'missing' }],
    ['  ', { kind: 'missing' }],
    ['18.5', { kind: 'whole' }],
    ['1e1', { kind: 'whole' }],
    ['eighteen', { kind: 'whole' }],
    ['15', { kind: 'tooLittle', min: 16 }],
    ['-18', { kind: 'tooLittle', min: 16 }],
    ['26', { kind: 'tooMuch', max: 25 }],
  ])('"%s" says what is wrong with it', (typed, fault) => {
    expect(readWhole(typed, bounds)).toEqual(fault);
  });
});
