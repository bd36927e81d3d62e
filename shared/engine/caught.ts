import type { Caution } from '../contracts/words.ts';

/** One caution and what it comes from; null where it speaks for the whole recipe. */
export type Caught = readonly [caution: Caution, from: string | null];
