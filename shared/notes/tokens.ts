import type { ShootCue } from '../contracts/shoots.ts';

/** A word, a figure or a sign of the notes; `\n` stands where a row or a take ends. */
export interface Token {
  text: string;
  /** Lower case. */
  word: string;
  cue: number;
  /** Milliseconds; null in notes without times. */
  at: number | null;
  /** No space stands before it. */
  glued: boolean;
}

export interface Transcript {
  cues: readonly ShootCue[];
  tokens: readonly Token[];
  /** Typed notes, a row at a time, and not running speech. */
  typed: boolean;
}

const PIECES = /[\p{L}][\p{L}'’]*|\d+(?:[.,]\d+)?|[½¼¾⅓⅔⅛⅜⅝⅞]|[^\s\p{L}\d]/gu;
const ABBREVIATION = /^(w|abt|approx|ca|tsp|tbsp|oz|ml|cl|g|kg|min|mins|hr|hrs|wk|wks|temp|no)$/;
/** "[Music]", "(laughs)": what captions tell of sounds. A typed row in brackets is none. */
const NOISE = /^\W*[[(♪][^\])]*[\])♪]?\W*$/;
/** A pause in speech that ends a thought, in milliseconds. */
const PAUSE = 2500;

/** The words of one text. */
export function tokenise(text: string, cue = 0, at: number | null = null): Token[] {
  return [...text.matchAll(PIECES)]
    .map(({ 0: piece, index }) => ({
      ...{ text: piece, word: piece.toLowerCase().replaceAll('’', "'"), cue, at },
      glued: index > 0 && /\S/.test(text[index - 1]!),
    }))
    .filter(({ text: sign }, index, all) => sign !== '.' || !endsAbbreviation(all, index));
}

/** "w. sugar", "abt. 700": no sentence ends there. */
function endsAbbreviation(tokens: readonly Token[], index: number): boolean {
  const next = tokens[index + 1];
  return ABBREVIATION.test(tokens[index - 1]?.word ?? '') && next !== undefined && /^[\p{Ll}\d]/u.test(next.text);
}

/** All cues as one run of words: speech goes on over the edge of a cue, a typed row ends with it. */
export function transcribe(cues: readonly ShootCue[]): Transcript {
  // Captions say when they end; the last of typed rows cannot.
  const typed = (cues.at(-1)?.endMs ?? null) === null;
  const tokens: Token[] = [];
  cues.forEach((cue, index) => {
    const before = cues[index - 1];
    const pause = cue.startMs !== null && cue.startMs - (before?.endMs ?? cue.startMs) > PAUSE;
    const sound = !typed && NOISE.test(cue.text);
    if (tokens.length > 0 && (typed || pause || sound))
      tokens.push({ text: '\n', word: '\n', cue: cue.index, at: cue.startMs, glued: false });
    if (!sound) for (const token of tokenise(cue.text, cue.index, cue.startMs)) tokens.push(token);
  });
  return { cues, tokens, typed };
}

const ENDS = new Set(['.', '!', '?', ';', '\n']);
export const endsSentence = (token: Token | undefined): boolean => token === undefined || ENDS.has(token.text);

/** Up to `most` words before a place, back to where the sentence begins, joined by single spaces. */
export function wordsBefore(tokens: readonly Token[], index: number, most: number): string {
  let from = index;
  while (from > 0 && index - from < most && !endsSentence(tokens[from - 1])) from -= 1;
  return wordsOf(tokens.slice(from, index));
}

/** Up to `most` words from a place on; a question mark is let through, for "mint? no". */
export function wordsAfter(tokens: readonly Token[], index: number, most: number): string {
  let to = index;
  while (to - index < most && (!endsSentence(tokens[to]) || tokens[to]?.text === '?')) to += 1;
  return wordsOf(tokens.slice(index, to));
}

/** Words joined by single spaces, hyphens without. */
export function wordsOf(tokens: readonly Token[]): string {
  let words = '';
  let joined = true;
  for (const { word } of tokens) {
    const hyphen = word === '-';
    words += joined || hyphen ? word : ` ${word}`;
    joined = hyphen;
  }
  return words;
}
