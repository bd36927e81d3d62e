import type { RecipeDocument } from '@shared/contracts/recipe-document.ts';

/** The document without the lines and steps of these ids; no step uses or waits for what is gone. */
export function without(document: RecipeDocument, ids: ReadonlySet<string>): RecipeDocument {
  const stays = (id: string) => !ids.has(id);
  return {
    ...document,
    sections: document.sections.map((section) => ({
      ...section,
      lines: section.lines
        .filter((line) => stays(line.id))
        .map((line) => ({
          ...line,
          alternativeTo: line.alternativeTo && stays(line.alternativeTo) ? line.alternativeTo : null,
        })),
    })),
    steps: document.steps
      .filter((step) => stays(step.id))
      .map((step) => ({ ...step, uses: step.uses.filter(stays), after: step.after && step.after.filter(stays) })),
  };
}
