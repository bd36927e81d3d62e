import { addMatter, blend, NOTHING, shareOf, type Matter } from './matter.ts';

/** The variants of one line and the group of the mixture that it joins. */
export interface Choice {
  variants: readonly Matter[];
  group: number;
}

/** How often every line is looked at again; a second look settles what the first one left. */
const ROUNDS = 2;

/**
 * The groups of a mixture at the variants for which `measure` is largest. Every line is settled in turn with the others
 * held: exact where a line only ever raises or only ever lowers the measure, as it does for volume, strength and sugar.
 */
export function largest(
  choices: readonly Choice[],
  groupCount: number,
  measure: (groups: readonly Matter[]) => number,
): Matter[] {
  const chosen = choices.map((choice) => choice.variants[0] ?? NOTHING);
  for (let round = 0; round < ROUNDS; round += 1) {
    const groups = sumGroups(choices, chosen, groupCount);
    choices.forEach((choice, i) => {
      if (choice.variants.length < 2) return;
      const others = addMatter(groups[choice.group] ?? NOTHING, shareOf(chosen[i]!, -1));
      const best = bestOf(choice.variants, (variant) => measure(groups.with(choice.group, addMatter(others, variant))));
      chosen[i] = best;
      groups[choice.group] = addMatter(others, best);
    });
  }
  return sumGroups(choices, chosen, groupCount);
}

function sumGroups(choices: readonly Choice[], chosen: readonly Matter[], groupCount: number): Matter[] {
  return Array.from({ length: groupCount }, (_, group) => blend(chosen.filter((__, i) => choices[i]?.group === group)));
}

function bestOf(variants: readonly Matter[], measure: (variant: Matter) => number): Matter {
  let best = variants[0]!;
  let most = -Infinity;
  for (const variant of variants) {
    const value = measure(variant);
    if (value > most) [best, most] = [variant, value];
  }
  return best;
}
