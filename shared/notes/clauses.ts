import { endsSentence, wordsOf, type Token, type Transcript } from './tokens.ts';

/** A thought: a sentence, or in speech without full stops the words up to the next "so", "then", "because". */
export interface Clause {
  from: number;
  to: number;
  words: string;
}

const TURNS = new Set(['so', 'okay', 'ok', 'right', 'now', 'because', 'but', 'um', 'then', 'till', 'until']);
/** Words of a clause before a turn may begin the next one. */
const LEAST = 4;
/** A thought that nobody ended is cut here, in words. */
const MOST = 40;
/** From here on the edge of a cue is the better place to cut. */
const LONG = 25;

export function clausesOf({ tokens, typed }: Transcript): Clause[] {
  const clauses: Clause[] = [];
  let from = 0;
  const close = (to: number) => {
    if (to > from) clauses.push({ from, to, words: wordsOf(tokens.slice(from, to)) });
    from = to;
  };
  for (let index = 0; index < tokens.length; index += 1) {
    if (endsSentence(tokens[index])) {
      close(index);
      from = index + 1;
    } else if (index - from >= MOST || (!typed && (turnsAt(tokens, index, from) || edgeAt(tokens, index, from))))
      close(index);
  }
  close(tokens.length);
  return clauses;
}

function turnsAt(tokens: readonly Token[], index: number, from: number): boolean {
  if (index - from < LEAST) return false;
  const { word } = tokens[index]!;
  if (word === 'till' || word === 'until') return false;
  return TURNS.has(word) && !(word === 'right' && tokens[index + 1]?.word === 'down');
}

const edgeAt = (tokens: readonly Token[], index: number, from: number) =>
  index - from >= LONG && tokens[index]!.cue !== tokens[index - 1]!.cue;
