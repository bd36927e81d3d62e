import type { RecipeDocument, RecipeLine, RecipeStep } from '@shared/contracts/recipe-document.ts';

type Field = Exclude<keyof RecipeDocument, 'schema' | 'sections' | 'steps'>;

/** One thing in which two texts of a recipe differ. */
export type Difference =
  | { part: 'field'; field: Field; before: unknown; after: unknown }
  | { part: 'section'; before: string | undefined; after: string | undefined }
  | { part: 'line'; before: RecipeLine | undefined; after: RecipeLine | undefined }
  | { part: 'step'; number: number; before: RecipeStep | undefined; after: RecipeStep | undefined }
  | { part: 'order'; of: 'lines' | 'steps' };

/**
 * What has changed from one text to another, in the order of the page. Lines and steps are told apart by their ids: what is
 * not on the other side is there alone. `number` of a step is its place where it is.
 */
export function documentDifferences(before: RecipeDocument, after: RecipeDocument): Difference[] {
  const fields = (Object.keys(after) as (keyof RecipeDocument)[]).filter(
    (key): key is Field => key !== 'schema' && key !== 'sections' && key !== 'steps',
  );
  return [
    ...fields
      .filter((field) => !isSame(before[field], after[field]))
      .map((field) => ({ part: 'field' as const, field, before: before[field], after: after[field] })),
    ...sectionDifferences(before, after),
    ...lineDifferences(before, after),
    ...stepDifferences(before, after),
  ];
}

function sectionDifferences(before: RecipeDocument, after: RecipeDocument): Difference[] {
  return pairs(before.sections, after.sections)
    .map(([was, is]) => ({ part: 'section' as const, before: was?.title, after: is?.title }))
    .filter((pair) => pair.before !== pair.after);
}

function lineDifferences(before: RecipeDocument, after: RecipeDocument): Difference[] {
  const linesOf = ({ sections }: RecipeDocument) => sections.flatMap(({ lines }) => lines);
  const places = ({ sections }: RecipeDocument) =>
    sections.flatMap((section) => section.lines.map(({ id }) => `${section.id} ${id}`));
  const changed = pairs(linesOf(before), linesOf(after)).filter(([was, is]) => !isSame(was, is));
  const differences: Difference[] = changed.map(([was, is]) => ({ part: 'line', before: was, after: is }));
  if (isMoved(places(before), places(after))) differences.push({ part: 'order', of: 'lines' });
  return differences;
}

function stepDifferences(before: RecipeDocument, after: RecipeDocument): Difference[] {
  const changed = pairs(before.steps, after.steps).filter(([was, is]) => !isSame(was, is));
  const differences: Difference[] = changed.map(([was, is]) => ({
    part: 'step',
    number: 1 + (is ? after.steps.indexOf(is) : before.steps.indexOf(was!)),
    before: was,
    after: is,
  }));
  const ids = ({ steps }: RecipeDocument) => steps.map(({ id }) => id);
  if (isMoved(ids(before), ids(after))) differences.push({ part: 'order', of: 'steps' });
  return differences;
}

/** Each entry with its like on the other side; those of `after` in their order, then what is gone. */
function pairs<T extends { id: string }>(
  before: readonly T[],
  after: readonly T[],
): (readonly [T | undefined, T | undefined])[] {
  const was = new Map(before.map((entry) => [entry.id, entry]));
  const kept = new Set(after.map(({ id }) => id));
  return [
    ...after.map((entry) => [was.get(entry.id), entry] as const),
    ...before.filter(({ id }) => !kept.has(id)).map((entry) => [entry, undefined] as const),
  ];
}

/** Whether what both have stands in another order. */
function isMoved(before: readonly string[], after: readonly string[]): boolean {
  const common = (one: readonly string[], other: readonly string[]) => one.filter((id) => other.includes(id)).join('|');
  return common(before, after) !== common(after, before);
}

function isSame(one: unknown, other: unknown): boolean {
  return JSON.stringify(one) === JSON.stringify(other);
}
