import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readTier, writeTier, type TypedTier } from '../../src/components/office/tier-text.ts';
import { tierDraft } from '../../shared/contracts/tiers.ts';

const sewn: TypedTier = {
  name: ' Sewn ',
  rank: '2',
  description: 'Lies flat on a wet bar.',
  monthly: '4.50',
  yearly: '45',
  perks: 'Everything in Paperbound\n\n  Infusions \n',
};
const faultsOf = (change: Partial<TypedTier>) => {
  const read = readTier({ ...sewn, ...change });
  return 'faults' in read ? read.faults : [];
};

describe('a tier as it is typed', () => {
  it('is read in minor units, one perk a line', () => {
    expect(readTier(sewn)).toEqual({
      draft: {
        name: 'Sewn',
        rank: 2,
        description: 'Lies flat on a wet bar.',
        monthly: 450,
        yearly: 4500,
        perks: ['Everything in Paperbound', 'Infusions'],
      },
    });
  });

  it('tells everything that is wrong at once, in the order of the form', () => {
    expect(faultsOf({ name: ' ', rank: '2.5', monthly: '4.505', yearly: '' })).toEqual([
      { path: 'name', kind: 'missing' },
      { path: 'rank', kind: 'whole' },
      { path: 'monthly', kind: 'money' },
      { path: 'yearly', kind: 'missing' },
    ]);
  });

  it.each<[Partial<TypedTier>, Partial<TypedTier>, object]>([
    [{ rank: '1' }, { rank: '0' }, { path: 'rank', kind: 'tooLittle', min: 1 }],
    [{ rank: '20' }, { rank: '21' }, { path: 'rank', kind: 'tooMuch', max: 20 }],
    [{ monthly: '0.50' }, { monthly: '0.49' }, { path: 'monthly', kind: 'least', least: 50 }],
    [
      { description: 'x'.repeat(400) },
      { description: 'x'.repeat(401) },
      { path: 'description', kind: 'tooLong', most: 400 },
    ],
    [{ perks: 'x\n'.repeat(12) }, { perks: 'x\n'.repeat(13) }, { path: 'perks', kind: 'tooMany', most: 12 }],
    [
      { perks: 'x'.repeat(120) },
      { perks: 'x'.repeat(121) },
      { path: 'perks', kind: 'longLine', most: 120, start: 'x'.repeat(24) },
    ],
  ])('draws the line where the contract draws it: %o, not %o', (within, beyond, fault) => {
    const read = readTier({ ...sewn, ...within });
    expect('draft' in read && tierDraft.safeParse(read.draft).success).toBe(true);
    expect(faultsOf(beyond)).toEqual([fault]);
  });

  it('comes back as it was written', () => {
    const price = fc.integer({ min: 50, max: 9_999_999 });
    fc.assert(
      fc.property(price, price, fc.integer({ min: 1, max: 20 }), (monthly, yearly, rank) => {
        const draft = { name: 'Sewn', rank, description: '', monthly, yearly, perks: ['One', 'Two'] };
        expect(readTier(writeTier(draft))).toEqual({ draft });
      }),
    );
  });
});
