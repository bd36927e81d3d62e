import type { RecipeStep } from '../contracts/recipe-document.ts';

/** The ids of the steps that must be done right before each step: those it names, else the one written before it. */
export function stepsBefore(steps: readonly RecipeStep[]): Map<string, readonly string[]> {
  return new Map(
    steps.map((step, index) => [step.id, step.after ?? steps.slice(Math.max(0, index - 1), index).map((s) => s.id)]),
  );
}

/** The ids of steps that wait for each other in a ring, in that order, or null where the steps can all be done. */
export function findStepCycle(steps: readonly RecipeStep[]): string[] | null {
  const before = stepsBefore(steps);
  return findCycle([...before.keys()], (id) => before.get(id) ?? []);
}

/** The first ring met in a graph, walked from the given starts; each node once, in order. */
export function findCycle(starts: readonly string[], nextOf: (node: string) => readonly string[]): string[] | null {
  const finished = new Set<string>();
  for (const start of starts) {
    const ring = walk(start, [], finished, nextOf);
    if (ring) return ring;
  }
  return null;
}

function walk(
  node: string,
  path: readonly string[],
  finished: Set<string>,
  nextOf: (node: string) => readonly string[],
): string[] | null {
  if (finished.has(node)) return null;
  if (path.includes(node)) return path.slice(path.indexOf(node));
  for (const next of nextOf(node)) {
    const ring = walk(next, [...path, node], finished, nextOf);
    if (ring) return ring;
  }
  finished.add(node);
  return null;
}

/** For each step the ids of every step before it and its own. Steps of a ring only see what is met before it closes. */
export function reachOfSteps(steps: readonly RecipeStep[]): Map<string, ReadonlySet<string>> {
  const before = stepsBefore(steps);
  return new Map(steps.map((step) => [step.id, reach(step.id, before)]));
}

function reach(id: string, before: ReadonlyMap<string, readonly string[]>): ReadonlySet<string> {
  const seen = new Set([id]);
  // A set is walked to its end even while it grows.
  for (const each of seen) for (const earlier of before.get(each) ?? []) seen.add(earlier);
  return seen;
}
