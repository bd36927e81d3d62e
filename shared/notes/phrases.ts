import type { Token } from './number-words.ts';

/** Words that end the name of an ingredient. */
const STOPS = new Set(
  (
    'and then into to in for until till with on over at about just it its is that so because we i you or from goes go ' +
    'comes go per no not never only what which while when but if of this these there here before after each every again ' +
    'maybe please twice once will should can did do does was were am are be been still also too off up down through'
  ).split(' '),
);
const FILLERS = new Set([
  'of',
  'the',
  'a',
  'an',
  'some',
  'your',
  'our',
  'my',
  'good',
  'nice',
  'proper',
  'about',
  'or',
  'so',
  'more',
  'roughly',
  'those',
  'these',
  'big',
  'little',
  'small',
  'heaped',
  'level',
  'scant',
  'generous',
  'fat',
  'plain',
  'old',
]);

/** The words after a quantity that name what is measured; empty where none follow. */
export function nameAfter(tokens: readonly Token[], index: number): { name: string; prep: string; to: number } {
  let at = index;
  while (FILLERS.has(tokens[at]?.word ?? '')) at += 1;
  const from = at;
  while (at < tokens.length && at - from < 5 && isNameWord(tokens[at]!)) at += 1;
  const name = wordsOf(tokens.slice(from, at));
  return { name, prep: prepAfter(tokens, at), to: at };
}

/** The words before a quantity, back to the last stop: "damsons, stoned 600 g", "sugar, three fifty". */
export function nameBefore(tokens: readonly Token[], index: number): { name: string; prep: string } {
  let from = index - 1;
  while (from >= 0 && ![';', '.', ':', '!', '?'].includes(tokens[from]!.text) && !/\d/.test(tokens[from]!.text))
    from -= 1;
  const words = tokens.slice(from + 1, index);
  const comma = words.findIndex(({ text }) => text === ',' || text === '(');
  const named = (comma < 0 ? words : words.slice(0, comma)).filter(
    (token) => isNameWord(token) && !FILLERS.has(token.word),
  );
  const after = comma < 0 ? [] : words.slice(comma + 1).filter(({ text }) => /\p{L}/u.test(text));
  return named.length > 4 ? { name: '', prep: '' } : { name: wordsOf(named), prep: wordsOf(after.slice(0, 6)) };
}

/** "…, stoned" or "…, picked over": up to four words that end in a way of preparing. */
function prepAfter(tokens: readonly Token[], index: number): string {
  if (tokens[index]?.text !== ',') return '';
  const words: Token[] = [];
  for (const token of tokens.slice(index + 1, index + 5)) {
    if (!/^\p{L}/u.test(token.text)) break;
    words.push(token);
  }
  return words.some(({ word }) => /(ed|ly cut|torn|cut|fresh|frozen|dried|whole|cracked|split)$/.test(word))
    ? wordsOf(words)
    : '';
}

function isNameWord({ word }: Token): boolean {
  return (/^\p{L}/u.test(word) || word === '-') && !STOPS.has(word);
}

function wordsOf(tokens: readonly Token[]): string {
  return tokens
    .map(({ word }) => word)
    .join(' ')
    .replace(/ - /g, '-')
    .replace(/^-|-$/g, '')
    .trim();
}
