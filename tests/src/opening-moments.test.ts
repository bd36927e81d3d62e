import { describe, expect, it } from 'vitest';
import { toMoments } from '../../src/components/bindery/opening-moments.ts';

// The rules are this product's own; London is an hour ahead of UTC in July (IANA time zone database).
const ZONE = 'Europe/London';
const NOW = new Date('2026-07-01T12:00:00Z');

describe('the moments from which each tier may read', () => {
  it('sends the wall clock of the imprint as UTC, and the moment of issue for what is left empty', () => {
    const rows = [
      { rank: 0, wall: '2026-07-10T09:00' },
      { rank: 1, wall: '2026-07-05T09:00' },
      { rank: 3, wall: '' },
    ];
    expect(toMoments(rows, ZONE, NOW)).toEqual({
      moments: [
        { rank: 0, at: '2026-07-10T08:00:00.000Z' },
        { rank: 1, at: '2026-07-05T08:00:00.000Z' },
        { rank: 3, at: '2026-07-01T12:00:00.000Z' },
      ],
      faults: {},
    });
  });

  it('names nobody when no moment is entered', () => {
    expect(
      toMoments(
        [
          { rank: 0, wall: '' },
          { rank: 1, wall: '' },
        ],
        ZONE,
        NOW,
      ),
    ).toEqual({ moments: [], faults: {} });
  });

  it('refuses a higher tier that would open after a lower one', () => {
    const rows = [
      { rank: 0, wall: '2026-07-10T09:00' },
      { rank: 1, wall: '2026-07-11T09:00' },
      { rank: 2, wall: '2026-07-09T09:00' },
    ];
    expect(toMoments(rows, ZONE, NOW).faults).toEqual({ 1: 'order' });
  });

  it('says which entry is no day and time', () => {
    expect(toMoments([{ rank: 1, wall: '2026-07' }], ZONE, NOW).faults).toEqual({ 1: 'unreadable' });
  });
});
