import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readMoney, writeMoney } from '../../src/components/money-text.ts';

describe('money as it is typed', () => {
  it.each([
    ['4', 400],
    ['4.5', 450],
    ['4,50', 450],
    ['0.05', 5],
    ['19.99', 1999],
    [' 12 ', 1200],
  ])('%s is %i minor units', (typed, minor) => {
    expect(readMoney(typed)).toBe(minor);
  });

  it('takes nothing that is no amount of money', () => {
    for (const typed of ['4.505', '-4', 'four', '1e3', '4.', '.5', '£4']) expect(readMoney(typed)).toBeUndefined();
    expect(readMoney('')).toBeNull();
  });

  it('reads every amount that it writes', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 99_999_999 }), (minor) => {
        expect(readMoney(writeMoney(minor))).toBe(minor);
      }),
    );
  });
});
