import type { LarderItem } from '../contracts/larder.ts';
import type { RecipeDocument, RecipeLine } from '../contracts/recipe-document.ts';
import type { EngineContext } from './context.ts';
import { findCycle } from './step-order.ts';

/** The recipe ids that a document's lines name as components, each once. */
export function componentIdsOf(document: Pick<RecipeDocument, 'sections'>): string[] {
  const ids = document.sections.flatMap((section) => section.lines).flatMap((line) => line.componentId ?? []);
  return [...new Set(ids)];
}

/**
 * The titles of recipes that contain each other in a ring, in that order and each once, were `document` saved under `id`; null
 * where there is none. `documents` holds every recipe that may be a component, by id.
 */
export function findComponentCycle(
  id: string,
  document: RecipeDocument,
  documents: ReadonlyMap<string, RecipeDocument>,
): string[] | null {
  const documentOf = (each: string) => (each === id ? document : documents.get(each));
  const ring = findCycle([id], (each) => componentIdsOf(documentOf(each) ?? { sections: [] }));
  return ring?.map((each) => documentOf(each)?.title ?? each) ?? null;
}

/** A line met anywhere in a recipe or its components. `from` names it, with the component it came in. */
export interface FoundLine {
  line: RecipeLine;
  item: LarderItem | null;
  from: string;
  /** The component's document is not there, so nothing below it is known. */
  lost: boolean;
}

/** Every line that is an ingredient, alternatives and options too, components opened all the way down; a ring is opened once. */
export function allLines(document: RecipeDocument, context: EngineContext): FoundLine[] {
  return open(document, context, null, new Set());
}

function open(
  document: RecipeDocument,
  context: EngineContext,
  title: string | null,
  opened: Set<string>,
): FoundLine[] {
  return document.sections
    .flatMap((section) => section.lines)
    .flatMap((line): FoundLine[] => {
      const from = title === null ? line.name : `${line.name} (${title})`;
      const item = (line.larderId && context.larder.get(line.larderId)) || null;
      if (!line.componentId) return [{ line, item, from, lost: false }];
      const component = context.components.get(line.componentId);
      if (!component) return [{ line, item: null, from, lost: true }];
      if (opened.has(line.componentId)) return [];
      opened.add(line.componentId);
      return open(component, context, component.title, opened);
    });
}

/** A document and the documents of all its components, each once, the document first. */
export function allDocuments(document: RecipeDocument, context: EngineContext): RecipeDocument[] {
  const seen = new Set([document]);
  for (const each of seen)
    for (const id of componentIdsOf(each)) {
      const component = context.components.get(id);
      if (component) seen.add(component);
    }
  return [...seen];
}
