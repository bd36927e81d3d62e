import { describe, expect, it } from 'vitest';
import { fromWallClock, toWallClock } from '../../src/composables/zoned-time.ts';

/**
 * Source of the changes: the IANA time zone database. Europe/London goes forward on 2026-03-29 at 01:00 UTC and back on
 * 2026-10-25 at 01:00 UTC; America/New_York goes back on 2026-11-01 at 06:00 UTC; Asia/Kathmandu is 5 h 45 min ahead.
 */
describe('the clock on the wall of a zone', () => {
  it.each([
    { zone: 'Europe/London', wall: '2026-01-15T09:00', instant: '2026-01-15T09:00:00.000Z' },
    { zone: 'Europe/London', wall: '2026-07-15T09:00', instant: '2026-07-15T08:00:00.000Z' },
    { zone: 'Asia/Kathmandu', wall: '2026-07-15T00:10', instant: '2026-07-14T18:25:00.000Z' },
    { zone: 'America/New_York', wall: '2026-10-31T23:30', instant: '2026-11-01T03:30:00.000Z' },
    { zone: 'Pacific/Kiritimati', wall: '2027-01-01T00:00', instant: '2026-12-31T10:00:00.000Z' },
  ])('$wall in $zone is $instant, there and back', ({ zone, wall, instant }) => {
    expect(fromWallClock(wall, zone)?.toISOString()).toBe(instant);
    expect(toWallClock(new Date(instant), zone)).toBe(wall);
  });

  it('takes the first of a time that occurs twice', () => {
    expect(fromWallClock('2026-10-25T01:30', 'Europe/London')?.toISOString()).toBe('2026-10-25T00:30:00.000Z');
    expect(fromWallClock('2026-11-01T01:30', 'America/New_York')?.toISOString()).toBe('2026-11-01T05:30:00.000Z');
  });

  it('reads a time that is left out as if the clocks had not gone forward yet', () => {
    expect(fromWallClock('2026-03-29T01:30', 'Europe/London')?.toISOString()).toBe('2026-03-29T01:30:00.000Z');
  });

  it.each(['', '2026-13-01T00:00', '2026-02-01', 'soon'])('says that “%s” is no day and time', (wall) => {
    expect(fromWallClock(wall, 'Europe/London')).toBeNull();
  });
});
