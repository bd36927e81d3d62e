import type { LarderItem } from '../contracts/larder.ts';
import type { Allergen } from '../contracts/words.ts';
import type { Token } from './number-words.ts';

export interface Known {
  larderId: string;
  name: string;
  allergens: readonly Allergen[];
}

export interface Vocabulary {
  /** The longest name of the larder that begins at this token. */
  at: (tokens: readonly Token[], index: number) => { known: Known; length: number } | null;
}

/** The larder's names and other names, ready to be found in what somebody says; singular and plural are one. */
export function makeVocabulary(
  larder: readonly Pick<LarderItem, 'id' | 'name' | 'otherNames' | 'allergens'>[],
): Vocabulary {
  const byFirst = new Map<string, { words: string[]; known: Known }[]>();
  for (const item of larder) {
    const known = { larderId: item.id, name: item.name, allergens: item.allergens };
    for (const name of [item.name, ...item.otherNames]) {
      const words = name
        .toLowerCase()
        .match(/\p{L}+/gu)
        ?.map(stem);
      if (!words?.length) continue;
      byFirst.set(words[0]!, [...(byFirst.get(words[0]!) ?? []), { words, known }]);
    }
  }
  for (const entries of byFirst.values()) entries.sort((a, b) => b.words.length - a.words.length);
  return {
    at: (tokens, index) => {
      const entries = byFirst.get(stem(tokens[index]?.word ?? '')) ?? [];
      const found = entries.find(({ words }) =>
        words.every((word, offset) => stem(tokens[index + offset]?.word ?? '') === word),
      );
      return found ? { known: found.known, length: found.words.length } : null;
    },
  };
}

/** A word without the ending of its plural. */
export function stem(word: string): string {
  if (/(ies)$/.test(word) && word.length > 4) return `${word.slice(0, -3)}y`;
  if (/(ches|shes|sses|xes|oes)$/.test(word)) return word.slice(0, -2);
  if (/leaves$/.test(word)) return `${word.slice(0, -3)}f`;
  return /[^s]s$/.test(word) && word.length > 3 ? word.slice(0, -1) : word;
}
