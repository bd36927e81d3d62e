import type { Lack } from '../contracts/figures.ts';
import type { Range } from '../contracts/primitives.ts';
import type { RecipeLine, RecipeStep } from '../contracts/recipe-document.ts';
import { ethanolKept, waterKept, type Heating } from './heating.ts';
import type { Matter } from './matter.ts';
import type { Portion } from './portion.ts';
import { rest } from './rests.ts';
import { reachOfSteps } from './step-order.ts';
import { shorten } from './times.ts';

/** Minutes taken where a heating step states no time: from coming up to heat to ten minutes. Estimate. */
const UNTIMED: Range = { min: 0, max: 10 };

/**
 * The steps that a line goes through: those that use it and all that come after them. A line that no step names is taken to be
 * in from the beginning, which is the careful reading for heat.
 */
export function stepsThrough(
  lines: readonly RecipeLine[],
  steps: readonly RecipeStep[],
): Map<string, readonly RecipeStep[]> {
  const reach = reachOfSteps(steps);
  const usedBy = (line: RecipeLine) => steps.filter((step) => step.uses.includes(line.id)).map((step) => step.id);
  return new Map(
    lines.map((line) => {
      const users = usedBy(line);
      const through = steps.filter((step) => users.some((user) => reach.get(step.id)?.has(user)));
      return [line.id, users.length === 0 ? steps : through];
    }),
  );
}

/** How a step heats, or null where it does not. Reducing counts as simmering in an open pan. */
export function heatingOf(step: RecipeStep): Heating | null {
  const operation = step.operation;
  if (operation?.kind !== 'heat' && operation?.kind !== 'reduce') return null;
  const minutes = step.duration ? { min: step.duration.min / 60, max: step.duration.max / 60 } : UNTIMED;
  if (operation.kind === 'reduce') return { liveliness: 'simmer', covered: false, minutes };
  return { liveliness: operation.liveliness, covered: operation.covered, minutes };
}

/** A portion after the heat it goes through: ethanol and water lost by time. */
export function heatPortion(portion: Portion, through: readonly RecipeStep[]): Portion {
  return through.reduce(heatOnce, portion);
}

function heatOnce(portion: Portion, step: RecipeStep): Portion {
  const heating = heatingOf(step);
  if (!heating || portion.variants.length === 0) return portion;
  const ethanol = portion.variants.some((matter) => matter.ethanol > 0) ? ethanolKept(heating) : ALL;
  if (!ethanol) return { ...portion, variants: [], lacks: [...portion.lacks, lossUnknown(step)] };
  const water = reducesToKnown(step) ? ALL : waterKept(heating);
  if (ethanol === ALL && water === ALL) return portion;
  return {
    ...portion,
    variants: widest(portion.variants.flatMap((matter) => corners(matter, ethanol, water))),
    estimated: true,
    rests: [...portion.rests, ...restsOfHeat(step, ethanol, water)],
  };
}

const ALL: Readonly<Range> = { min: 1, max: 1 };

/** Where the end of reducing is known, its time says nothing of the water. */
const reducesToKnown = ({ operation }: RecipeStep) => operation?.kind === 'reduce' && operation.to !== null;

function restsOfHeat(step: RecipeStep, ethanol: Range, water: Range): string[] {
  return [
    ...(water === ALL ? [] : [rest('water-lost-by-time')]),
    ...(ethanol === ALL ? [] : [rest('ethanol-lost-by-time')]),
    ...(step.duration ? [] : [rest('warming-taken-as-minutes', UNTIMED.max)]),
  ];
}

function corners(matter: Matter, ethanol: Range, water: Range): Matter[] {
  return [ethanol.min, ethanol.max].flatMap((e) =>
    [water.min, water.max].map((w) => ({ ...matter, ethanol: matter.ethanol * e, water: matter.water * w })),
  );
}

/** Several heats would multiply the corners; equal ones are dropped, and of many those that can end a range are kept. */
function widest(variants: readonly Matter[]): Matter[] {
  const distinct = [...new Map(variants.map((matter) => [JSON.stringify(matter), matter])).values()];
  if (distinct.length <= 16) return distinct;
  const byWater = [...distinct].sort((a, b) => a.water - b.water);
  const byStrength = [...distinct].sort((a, b) => a.ethanol * b.water - b.ethanol * a.water);
  return [byWater[0]!, byWater.at(-1)!, byStrength[0]!, byStrength.at(-1)!];
}

export function lossUnknown(step: RecipeStep): Lack {
  return { code: 'loss-unknown', subject: shorten(step.text) };
}
