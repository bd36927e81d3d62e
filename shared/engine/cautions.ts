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
 * The cautions of a recipe and of every component of it, with what each comes from: its own lines, words of its steps, or the
 * title of a component. What the creator adds comes on top; what is computed cannot be taken away.
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
