import { fromWallClock } from '@/composables/zoned-time.ts';

interface Entered {
  rank: number;
  /** Day and time in the zone; empty for the moment of issue. */
  wall: string;
}

interface Outcome {
  moments: { rank: number; at: string }[];
  /** What is wrong, by rank, as the key of a sentence. */
  faults: Record<number, 'unreadable' | 'order'>;
}

/**
 * The moments from which each rank may read, for the rows of a ladder with the lowest rank first. As soon as one row
 * has a moment every rank is named, because the gate lets an unnamed rank wait for the nearest one below it.
 *
 * @param now the moment of issue
 */
export function toMoments(entered: readonly Entered[], zone: string, now: Date): Outcome {
  const faults: Outcome['faults'] = {};
  const moments: { rank: number; at: Date }[] = [];
  for (const { rank, wall } of entered) {
    const at = wall === '' ? now : fromWallClock(wall, zone);
    if (!at) faults[rank] = 'unreadable';
    else if (moments.some((lower) => lower.at < at)) faults[rank] = 'order';
    else moments.push({ rank, at });
  }
  if (entered.every(({ wall }) => wall === '')) return { moments: [], faults };
  return { moments: moments.map(({ rank, at }) => ({ rank, at: at.toISOString() })), faults };
}
