import type { RecipeDocument, RecipeLine, RecipeSection, RecipeStep } from '@shared/contracts/recipe-document.ts';

type Field = Exclude<keyof RecipeDocument, 'schema' | 'sections' | 'steps'>;

/** A part that both changed: a field of the recipe, or one line or step by its id. */
export interface Clash {
  part: Field | 'section' | 'line' | 'step';
  /** Of the section, line or step. */
  id: string | null;
  mine: unknown;
  theirs: unknown;
}

export interface Merged {
  document: RecipeDocument;
  /** What both changed, each in its own way; mine stands in the document. */
  clashes: Clash[];
}

interface Sides<T> {
  base: T | undefined;
  mine: T | undefined;
  theirs: T | undefined;
}

/**
 * Two texts that were written over the same one, laid together: what only one side changed is taken, what both changed
 * stays mine and is named. Lines and steps are told apart by their ids; a step no longer uses a line that is gone.
 */
export function mergeDocuments(base: RecipeDocument, mine: RecipeDocument, theirs: RecipeDocument): Merged {
  const clashes: Clash[] = [];
  const document = { ...mine };
  for (const field of Object.keys(mine) as (keyof RecipeDocument)[]) {
    if (field === 'schema' || field === 'sections' || field === 'steps') continue;
    const sides = { base: base[field], mine: mine[field], theirs: theirs[field] };
    Object.assign(document, {
      [field]: settle(sides, () => clashes.push({ part: field, id: null, ...sidesOf(sides) })),
    });
  }
  document.sections = mergeSections(base, mine, theirs, clashes);
  document.steps = mergeById(base.steps, mine.steps, theirs.steps, (sides, id) =>
    settle(sides, () => clashes.push({ part: 'step', id, ...sidesOf(sides) })),
  );
  return { document: withoutLooseEnds(document), clashes };
}

/** The same text with one clash settled for the other side. */
export function takeTheirs(document: RecipeDocument, { part, id, theirs }: Clash): RecipeDocument {
  const replace = <T extends { id: string }>(all: readonly T[]): T[] =>
    all.flatMap((entry) => (entry.id !== id ? [entry] : theirs === undefined ? [] : [theirs as T]));
  if (part === 'step') return withoutLooseEnds({ ...document, steps: replace(document.steps) });
  if (part === 'line') {
    const sections = document.sections.map((section) => ({ ...section, lines: replace(section.lines) }));
    return withoutLooseEnds({ ...document, sections });
  }
  if (part === 'section') {
    const sections = document.sections.map((section) =>
      section.id === id ? { ...section, title: String(theirs) } : section,
    );
    return { ...document, sections };
  }
  return { ...document, [part]: theirs };
}

function mergeSections(
  base: RecipeDocument,
  mine: RecipeDocument,
  theirs: RecipeDocument,
  clashes: Clash[],
): RecipeSection[] {
  const [before, own, other] = [linesOf(base), linesOf(mine), linesOf(theirs)];
  const settleLine = ({ id }: RecipeLine) => {
    const sides = { base: before.get(id)?.line, mine: own.get(id)?.line, theirs: other.get(id)?.line };
    return settle(sides, () => clashes.push({ part: 'line', id, ...sidesOf(sides) }));
  };
  /** A line that both have stands where the one who moved it put it. */
  const homeOf = ({ id }: RecipeLine) => {
    const [was, here, there] = [before.get(id)?.section, own.get(id)?.section, other.get(id)?.section];
    return here === was ? (there ?? here) : (here ?? there);
  };
  const frames = mergeById(base.sections, mine.sections, theirs.sections, (sides, id) => {
    const section = sides.mine ?? sides.theirs;
    // A section that one side took away goes only when the other left it as it was.
    const taken = !sides.mine || !sides.theirs;
    if (!section || (sides.base && taken && isSame(sides.base, section))) return undefined;
    const titles = { base: sides.base?.title, mine: sides.mine?.title, theirs: sides.theirs?.title };
    const title = taken
      ? section.title
      : settle(titles, () => clashes.push({ part: 'section', id, ...sidesOf(titles) }));
    return { ...section, title: title ?? section.title };
  });
  return frames.map((section) => {
    const [was, here, there] = [base, mine, theirs].map(
      ({ sections }) => sections.find(({ id }) => id === section.id)?.lines ?? [],
    ) as [RecipeLine[], RecipeLine[], RecipeLine[]];
    const lines = orderOf(was, here, there)
      .filter((line) => homeOf(line) === section.id)
      .flatMap((line) => settleLine(line) ?? []);
    return { ...section, lines };
  });
}

function linesOf({ sections }: RecipeDocument): Map<string, { line: RecipeLine; section: string }> {
  return new Map(sections.flatMap(({ id, lines }) => lines.map((line) => [line.id, { line, section: id }] as const)));
}

function mergeById<T extends { id: string }>(
  base: readonly T[],
  mine: readonly T[],
  theirs: readonly T[],
  settleOne: (sides: Sides<T>, id: string) => T | undefined,
): T[] {
  const find = (all: readonly T[], id: string) => all.find((entry) => entry.id === id);
  return orderOf(base, mine, theirs).flatMap(({ id }) => {
    const settled = settleOne({ base: find(base, id), mine: find(mine, id), theirs: find(theirs, id) }, id);
    return settled ? [settled] : [];
  });
}

/** My order, or theirs where mine is as it was; what only the other side has follows what it stood behind there. */
function orderOf<T extends { id: string }>(base: readonly T[], mine: readonly T[], theirs: readonly T[]): T[] {
  const ids = (all: readonly T[]) => all.map(({ id }) => id).join();
  const [first, second] = ids(mine) === ids(base) ? [theirs, mine] : [mine, theirs];
  const order = [...first];
  second.forEach((entry, index) => {
    if (order.some(({ id }) => id === entry.id)) return;
    const before = second[index - 1]?.id;
    order.splice(before === undefined ? 0 : order.findIndex(({ id }) => id === before) + 1, 0, entry);
  });
  return order;
}

function settle<T>({ base, mine, theirs }: Sides<T>, clash: () => void): T | undefined {
  if (isSame(mine, theirs) || isSame(theirs, base)) return mine;
  if (isSame(mine, base)) return theirs;
  clash();
  return mine;
}

function sidesOf<T>({ mine, theirs }: Sides<T>): { mine: unknown; theirs: unknown } {
  return { mine, theirs };
}

function withoutLooseEnds(document: RecipeDocument): RecipeDocument {
  const lines = new Set(document.sections.flatMap((section) => section.lines.map(({ id }) => id)));
  const steps = new Set(document.steps.map(({ id }) => id));
  return {
    ...document,
    sections: document.sections.map((section) => ({
      ...section,
      lines: section.lines.map((line) =>
        line.alternativeTo && !lines.has(line.alternativeTo) ? { ...line, alternativeTo: null } : line,
      ),
    })),
    steps: document.steps.map((step: RecipeStep) => ({
      ...step,
      uses: step.uses.filter((id) => lines.has(id)),
      after: step.after && step.after.filter((id) => steps.has(id)),
    })),
  };
}

function isSame(one: unknown, other: unknown): boolean {
  return JSON.stringify(one) === JSON.stringify(other);
}
