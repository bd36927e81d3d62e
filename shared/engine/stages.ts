import type { Lack } from '../contracts/figures.ts';
import type { Operation, RecipeDocument, RecipeStep } from '../contracts/recipe-document.ts';
import { dilute, STRONGEST_REGRESSED, type IceMethod } from './dilution.ts';
import {
  addMatter,
  massOf,
  NOTHING,
  shareOf,
  strengthOf,
  volumeOf,
  withVolume,
  withWater,
  type Matter,
} from './matter.ts';
import { rest, type RestCode } from './rests.ts';
import { reachOfSteps } from './step-order.ts';
import { lossUnknown } from './treatment.ts';

/** A step that changes everything in the vessel at once: ice, reducing to a known end, straining with a known loss. */
export interface Stage {
  step: RecipeStep;
  change: (pot: Matter, end: 'min' | 'max') => Matter;
  rests: readonly string[];
  /** What else must be said of the vessel as it comes to this stage. */
  limits: (pot: Matter) => readonly string[];
}

const ICE_RESTS: Record<IceMethod, RestCode> = {
  shake: 'shaken-over-ice',
  stir: 'stirred-over-ice',
  throw: 'thrown-over-ice',
  blend: 'blended-with-ice',
};

/**
 * The stages of a recipe in the order of its steps. Ice only counts in a drink, and the last chilling counts, so that a dry
 * shake before it is no dilution; in what is built in the glass or hot, and in all other kinds, stirring is just stirring.
 * Straining takes its share of what has come so far, and leaves alone what is added after it.
 */
export function stagesOf({ kind, method, steps }: Pick<RecipeDocument, 'kind' | 'method' | 'steps'>): Stage[] {
  const chills = (step: RecipeStep) => iceMethodOf(step) !== null && !(isStirredLightly(step) && BUILT.test(method));
  const iced = kind === 'drink' ? steps.findLast(chills) : undefined;
  return steps.flatMap((step) => reduceStage(step) ?? strainStage(step) ?? (step === iced ? iceStage(step) : []));
}

const BUILT = /\b(?:built|build|hot)\b/i;

const isStirredLightly = ({ operation }: RecipeStep) => operation?.kind === 'stir';

const ICELESS = /\bdry[ -]shak|\b(?:without|no) ice\b/i;

function iceMethodOf(step: RecipeStep): IceMethod | null {
  const kind = step.operation?.kind;
  const method = kind === 'shake' || kind === 'stir' || kind === 'throw' || kind === 'blend' ? kind : null;
  return method && !ICELESS.test(step.text) ? method : null;
}

function iceStage(step: RecipeStep): Stage[] {
  const method = iceMethodOf(step);
  if (!method) return [];
  const tooStrong = (pot: Matter) => (method === 'shake' || method === 'stir') && strengthOf(pot) > STRONGEST_REGRESSED;
  return [
    {
      step,
      change: (pot, end) => dilute(pot, method, end),
      rests: [rest(ICE_RESTS[method])],
      limits: (pot) => (tooStrong(pot) ? [rest('ice-strongest', STRONGEST_REGRESSED)] : []),
    },
  ];
}

function reduceStage(step: RecipeStep): Stage[] | null {
  const to = step.operation?.kind === 'reduce' ? step.operation.to : null;
  if (!to) return null;
  return [{ step, change: (pot) => reduceTo(pot, to), rests: [rest('reduced-to')], limits: () => [] }];
}

/** What clings to the solids is the same liquid as what runs through: less of it, neither weaker nor less sweet. */
function strainStage(step: RecipeStep): Stage[] | null {
  const loss = step.operation?.kind === 'strain' ? step.operation.lossShare : null;
  if (!loss) return null;
  return [{ step, change: (pot) => shareOf(pot, 1 - loss), rests: [], limits: () => [] }];
}

type ReduceTo = NonNullable<Extract<Operation, { kind: 'reduce' }>['to']>;

function reduceTo(pot: Matter, to: ReduceTo): Matter {
  if (to.measure === 'volume') return withVolume(pot, to.ml);
  if (to.measure === 'mass') return withWater(pot, pot.water + to.g - massOf(pot));
  return withVolume(pot, volumeOf(pot) * to.share);
}

/** Which stage a line first meets, by the step ids it goes through; the number of stages where it meets none. */
export function stageMet(stages: readonly Stage[], through: readonly RecipeStep[]): number {
  const met = stages.findIndex((stage) => through.includes(stage.step));
  return met === -1 ? stages.length : met;
}

/** The vessel after all stages, `groups[i]` poured in before stage i and the last group after them all. */
export function runStages(stages: readonly Stage[], groups: readonly Matter[], end: 'min' | 'max'): Matter {
  const pot = stages.reduce((before, stage, i) => stage.change(addMatter(before, groups[i] ?? NOTHING), end), {
    ...NOTHING,
  });
  return addMatter(pot, groups[stages.length] ?? NOTHING);
}

/** What the stages say of the vessel on the way. */
export function limitsOf(stages: readonly Stage[], groups: readonly Matter[]): string[] {
  return stages.flatMap((stage, i) =>
    stage.limits(addMatter(runStages(stages.slice(0, i), groups.slice(0, i), 'min'), groups[i] ?? NOTHING)),
  );
}

/** Stages that stand in separate vessels cannot be followed: what is lacking then, else nothing. */
export function lacksOfStages(stages: readonly Stage[], steps: readonly RecipeStep[]): Lack[] {
  const reach = reachOfSteps(steps);
  const apart = stages.filter((stage, i) => i > 0 && !reach.get(stage.step.id)?.has(stages[i - 1]!.step.id));
  return apart.map((stage) => lossUnknown(stage.step));
}
