import type { BookContents } from '@shared/contracts/reading.ts';

export type Sample = BookContents['chapters'][number]['recipes'][number];

/** How many open recipes the front door shows. */
const SHOWN = 3;

/**
 * The recipes that everyone may read whole, for the front door: a drink leads, because that is what a visitor knows;
 * the rest follow in the order of the book. Those with a plate come before those without.
 */
export function pickSamples({ chapters }: Pick<BookContents, 'chapters'>): Sample[] {
  const open = chapters.flatMap(({ recipes }) => recipes).filter(({ access }) => access.kind === 'open');
  const shown = [...open.filter(({ plate }) => plate), ...open.filter(({ plate }) => !plate)];
  const lead = shown.find(({ kind }) => kind === 'drink') ?? shown[0];
  return lead ? [lead, ...shown.filter((sample) => sample !== lead)].slice(0, SHOWN) : [];
}
