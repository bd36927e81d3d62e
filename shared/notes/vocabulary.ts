import type { LarderItem } from '../contracts/larder.ts';
import type { Allergen } from '../contracts/words.ts';
import type { Token } from './tokens.ts';

/** What the reader has to know of a larder entry. */
export type LarderNames = readonly (Pick<LarderItem, 'id' | 'name' | 'otherNames' | 'allergens'> & {
  nature?: LarderItem['nature'];
})[];

export interface Known {
  larderId: string;
  name: string;
  allergens: readonly Allergen[];
  liquid: boolean;
}

export interface Vocabulary {
  /** The longest name of the larder that begins at this token. */
  at: (tokens: readonly Token[], index: number) => { known: Known; length: number } | null;
  /** What has exactly these words, in whatever order: "dry white vermouth" is "white dry vermouth". */
  named: (words: readonly string[]) => Known | null;
}

const LIQUIDS = new Set(['spirit', 'wine', 'liqueur', 'bitters', 'juice', 'water', 'syrup']);
/** Sugars that are called by their kind alone. */
const SUGAR = /^(demerara|muscovado|caster|turbinado|granulated) sugar$/;

/** The larder's names and other names, ready to be found in what somebody says; singular and plural are one. */
export function makeVocabulary(larder: LarderNames): Vocabulary {
  const byFirst = new Map<string, { words: string[]; known: Known }[]>();
  const byWords = new Map<string, Known>();
  for (const item of larder) {
    const known = {
      larderId: item.id,
      name: item.name,
      allergens: item.allergens,
      liquid: LIQUIDS.has(item.nature ?? '') || /vinegar|brine|water$/.test(item.name),
    };
    for (const name of namesOf(item)) {
      const words = name
        .toLowerCase()
        .match(/\p{L}+/gu)
        ?.map(stem);
      if (!words?.length) continue;
      byFirst.set(words[0]!, [...(byFirst.get(words[0]!) ?? []), { words, known }]);
      const key = keyOf(words);
      if (!byWords.has(key)) byWords.set(key, known);
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
    named: (words) => byWords.get(keyOf(words.map(stem))) ?? null,
  };
}

/** A name that tells its strength or its ratio ("vodka, 50 %") is not what somebody says. */
function namesOf({ name, otherNames }: LarderNames[number]): string[] {
  const kind = SUGAR.exec(name)?.[1];
  return [name, ...otherNames, ...(kind ? [kind] : [])]
    .filter((each) => !/\d/.test(each))
    .map((each) => each.replace(/,.*/, ''));
}

const keyOf = (words: readonly string[]) => [...words].sort().join(' ');

/** A word without the ending of its plural. */
export function stem(word: string): string {
  if (/(ies)$/.test(word) && word.length > 4) return `${word.slice(0, -3)}y`;
  if (/(ches|shes|sses|xes|oes)$/.test(word)) return word.slice(0, -2);
  if (/leaves$/.test(word)) return `${word.slice(0, -3)}f`;
  return /[^s]s$/.test(word) && word.length > 3 ? word.slice(0, -1) : word;
}
