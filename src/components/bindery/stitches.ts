import type { PlacedRecipe } from '@shared/contracts/books.ts';
import { MISSING_CODES, type MissingCode } from '@shared/contracts/recipes.ts';

/** What a whole recipe consists of, one stitch each. */
export const STITCHES = ['headnote', 'amounts', 'method', 'yield', 'keeping', 'plate', 'cleared'] as const;
export type Stitch = (typeof STITCHES)[number];

const SEWN_BY: Record<MissingCode, Stitch> = {
  title: 'headnote',
  headnote: 'headnote',
  lines: 'amounts',
  amounts: 'amounts',
  steps: 'method',
  yield: 'yield',
  keeping: 'keeping',
  'lead-plate': 'plate',
  'lead-plate-alt': 'plate',
};

/** The stitches that a placed recipe still lacks, in the order of the row. */
export function missingStitches({ missing, state }: Pick<PlacedRecipe, 'missing' | 'state'>): Stitch[] {
  const lacking = new Set<Stitch>(MISSING_CODES.filter((code) => missing.includes(code)).map((code) => SEWN_BY[code]));
  if (state !== 'cleared' && state !== 'out') lacking.add('cleared');
  return STITCHES.filter((stitch) => lacking.has(stitch));
}
