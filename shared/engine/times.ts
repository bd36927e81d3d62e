import type { Figure, Figures, Lack } from '../contracts/figures.ts';
import type { RecipeDocument, RecipeStep } from '../contracts/recipe-document.ts';
import { known, unknown } from './figure.ts';
import { findStepCycle, stepsBefore } from './step-order.ts';

/**
 * How long a recipe takes, in seconds, the least and the most.
 *
 * `handsOn` is the work of one pair of hands, every such step added up. `waiting` is the longest chain of waiting. `total` is the
 * longest chain of steps, and never less than the hands-on work. A figure is unknown where a step that it counts has no
 * duration, and all three where steps wait for each other.
 */
export function computeTimes(document: Pick<RecipeDocument, 'title' | 'steps'>): Figures['times'] {
  const { steps } = document;
  const ring = findStepCycle(steps);
  if (ring) return threeTimes(unknown(ring.map((id): Lack => ({ code: 'step-cycle', subject: nameStep(steps, id) }))));
  if (steps.length === 0) return threeTimes(unknown([{ code: 'duration-missing', subject: document.title }]));

  const work = steps.filter((step) => step.attention === 'hands-on');
  const rest = steps.filter((step) => step.attention === 'waiting');
  return {
    handsOn: time(work, (end) => sum(work, end)),
    waiting: time(rest, (end) =>
      longestChain(steps, (step) => (step.attention === 'waiting' ? duration(step, end) : 0)),
    ),
    total: time(steps, (end) =>
      Math.max(
        longestChain(steps, (step) => duration(step, end)),
        sum(work, end),
      ),
    ),
  };
}

type End = 'min' | 'max';

const threeTimes = (figure: Figure) => ({ handsOn: figure, waiting: figure, total: figure });
const duration = (step: RecipeStep, end: End) => step.duration?.[end] ?? 0;
const sum = (steps: readonly RecipeStep[], end: End) =>
  steps.reduce((seconds, step) => seconds + duration(step, end), 0);

function time(counted: readonly RecipeStep[], seconds: (end: End) => number): Figure {
  const untimed = counted.filter((step) => step.duration === null);
  if (untimed.length > 0)
    return unknown(untimed.map((step): Lack => ({ code: 'duration-missing', subject: shorten(step.text) })));
  return known(seconds('min'), seconds('max'), 'computed');
}

function longestChain(steps: readonly RecipeStep[], lasts: (step: RecipeStep) => number): number {
  const before = stepsBefore(steps);
  const byId = new Map(steps.map((step) => [step.id, step]));
  const ends = new Map<string, number>();
  const endOf = (id: string): number => {
    const done = ends.get(id);
    if (done !== undefined) return done;
    const start = Math.max(0, ...(before.get(id) ?? []).map(endOf));
    const end = start + lasts(byId.get(id)!);
    ends.set(id, end);
    return end;
  };
  return Math.max(0, ...steps.map((step) => endOf(step.id)));
}

/** The first words of a step, by which an unknown figure names it. */
export function shorten(text: string): string {
  const line = text.replace(/\s+/g, ' ').trim();
  return line.length <= 60 ? line : `${line.slice(0, 59).trimEnd()}…`;
}

function nameStep(steps: readonly RecipeStep[], id: string): string {
  return shorten(steps.find((step) => step.id === id)?.text ?? id);
}
