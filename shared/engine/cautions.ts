import type { CautionFound, Figure } from '../contracts/figures.ts';
import type { RecipeDocument } from '../contracts/recipe-document.ts';
import { CAUTIONS, type Caution } from '../contracts/words.ts';
import type { Caught } from './caught.ts';
import { allDocuments } from './components.ts';
import type { EngineContext } from './context.ts';
import { cautionsOfLines } from './line-cautions.ts';
import { cautionsOfText } from './text-cautions.ts';

/**
 * The cautions of a recipe and of every component of it, with what each comes from: lines and operations, a few words of the
 * steps, and what the creator added. What is computed cannot be taken away.
 */
export function findCautions(
  document: RecipeDocument,
  context: EngineContext,
  figuresOfComponent: (id: string) => { strength: Figure; sugar: Figure },
): CautionFound[] {
  const found = new Map<Caution, Set<string>>();
  for (const each of allDocuments(document, context)) {
    const caught: Caught[] = [
      ...cautionsOfLines(each, context, figuresOfComponent),
      ...cautionsOfText(each),
      ...each.extraCautions.map((caution) => [caution, null] as const),
    ];
    for (const [caution, from] of caught) {
      const names = found.get(caution) ?? new Set();
      if (each !== document) names.add(from === null ? each.title : `${from} (${each.title})`);
      else if (from !== null) names.add(from);
      found.set(caution, names);
    }
  }
  return CAUTIONS.filter((caution) => found.has(caution)).map((caution) => ({
    caution,
    from: [...found.get(caution)!],
  }));
}
