import type { CautionFound } from '../contracts/figures.ts';
import type { RecipeDocument } from '../contracts/recipe-document.ts';
import { CAUTIONS, type Caution } from '../contracts/words.ts';
import type { Batches } from './batch.ts';
import type { Caught } from './caught.ts';
import { allDocuments } from './components.ts';
import type { EngineContext } from './context.ts';
import { cautionsOfLines } from './line-cautions.ts';
import { cautionsOfText } from './text-cautions.ts';

/**
 * What can harm whoever makes a thing and not whoever pours it: these stay with the recipe that is made that way. Ours; all
 * others go into everything that the thing goes into.
 */
const OF_MAKING: ReadonlySet<Caution> = new Set([
  'spirit-near-heat',
  'hot-sugar',
  'sealed-gas-pressure',
  'vacuum-bag',
  'home-distilling',
]);

/**
 * The cautions of a recipe and of every component of it, with what each comes from: its own lines, words of its steps, or the
 * title of a component; of components only what is in the glass, not what happened at the stove. What the creator adds comes on top; what is computed cannot be taken away.
 */
export function findCautions(document: RecipeDocument, context: EngineContext, batches: Batches): CautionFound[] {
  const found = new Map<Caution, Set<string>>();
  for (const each of allDocuments(document, context)) {
    const caught: Caught[] = [
      ...cautionsOfLines(each, context, batches),
      ...cautionsOfText(each),
      ...each.extraCautions.map((caution) => [caution, null] as const),
    ];
    for (const [caution, from] of caught) {
      if (each !== document && OF_MAKING.has(caution)) continue;
      const names = found.get(caution) ?? new Set();
      const origin = each === document ? from : each.title;
      if (origin !== null) names.add(origin);
      found.set(caution, names);
    }
  }
  return CAUTIONS.filter((caution) => found.has(caution)).map((caution) => ({
    caution,
    from: [...found.get(caution)!],
  }));
}
