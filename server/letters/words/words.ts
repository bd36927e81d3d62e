import type { LetterFields, LetterKind } from '../letter-kinds.ts';
import type { Formats } from './formats.ts';

/** A paragraph, or a link with its own label. */
export type Part = string | { link: string; label: string };

export interface Wording {
  subject: string;
  greeting: string;
  parts: Part[];
}

/** Words of some kinds of letters, each from what its kind carries. */
export type Words<K extends LetterKind = LetterKind> = {
  [N in K]: (fields: LetterFields[N], formats: Formats) => Wording;
};
