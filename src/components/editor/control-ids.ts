import type { RecipeDocument } from '@shared/contracts/recipe-document.ts';

/** The id of the control for a field of the recipe, of one of its lines or of one of its steps. */
export const recipeControl = (field: string): string => `recipe-${field}`;
export const sectionControl = (id: string): string => `section-${id}`;
export const lineControl = (id: string, field: string): string => `line-${id}-${field}`;
export const stepControl = (id: string, field: string): string => `step-${id}-${field}`;

/** Fields that share one control with another. */
const SHARED: Readonly<Record<string, string>> = { unit: 'amount', componentId: 'behind', larderId: 'behind' };

/**
 * The control a fault belongs to, from its path in the request (`document.sections.0.lines.2.name`); null where the
 * document has no such place.
 */
export function controlOf(path: string, document: RecipeDocument): string | null {
  const [first, index, ...rest] = path.replace(/^document\./, '').split('.');
  if (first === 'sections') {
    const section = document.sections[Number(index)];
    if (!section) return null;
    if (rest[0] !== 'lines') return sectionControl(section.id);
    const line = section.lines[Number(rest[1])];
    const field = rest[2] ?? 'name';
    return line ? lineControl(line.id, SHARED[field] ?? field) : null;
  }
  if (first === 'steps' && index !== undefined) {
    const step = document.steps[Number(index)];
    return step ? stepControl(step.id, rest[0] ?? 'text') : null;
  }
  return first ? recipeControl(first === 'yield' ? `yield-${index}` : first) : null;
}
