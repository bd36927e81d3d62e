import { describe, expect, it } from 'vitest';
import { threadGap } from '@/components/thread.ts';

// Our own measure: 6 + 15·log2(1 + minutes / 5), worked out by hand where the logarithm comes out whole.
describe('the gap of the thread', () => {
  it.each([
    { minutes: 0, gap: 6 },
    { minutes: 5, gap: 21 },
    { minutes: 15, gap: 36 },
    { minutes: 35, gap: 51 },
    { minutes: 75, gap: 66 },
    { minutes: 635, gap: 111 },
  ])('is $gap px after $minutes minutes', ({ minutes, gap }) => {
    expect(threadGap(minutes * 60)).toBeCloseTo(gap, 10);
  });

  it('keeps twelve hours on the page', () => {
    expect(threadGap(12 * 3600)).toBeLessThan(120);
  });
});
