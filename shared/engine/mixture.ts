import type { Lack } from '../contracts/figures.ts';
import type { RecipeDocument, RecipeLine, RecipeStep } from '../contracts/recipe-document.ts';
import type { EngineContext } from './context.ts';
import { largest, type Choice } from './extremes.ts';
import { strengthOf, sugarOf, volumeOf, withVolume, type Matter } from './matter.ts';
import { portionOf, type Composition, type Portion } from './portion.ts';
import { rest } from './rests.ts';
import { lacksOfStages, limitsOf, runStages, stageMet, stagesOf, type Stage } from './stages.ts';
import { heatPortion, lossUnknown, stepsThrough } from './treatment.ts';
import { dimensionOf } from './units.ts';

/** A mixture at its ends: `[least, most]` matter for each figure. */
export interface Mixture {
  volume: readonly [Matter, Matter];
  strength: readonly [Matter, Matter];
  sugar: readonly [Matter, Matter];
  lacks: readonly Lack[];
  estimated: boolean;
  rests: readonly string[];
  /** False where parts alone are written, so that only ratios are known. */
  sized: boolean;
  /** True where no line counts. */
  empty: boolean;
}

/** All lines that count, in order; those that stand in for another are left out. */
export function linesThatCount(document: Pick<RecipeDocument, 'sections'>): RecipeLine[] {
  return document.sections.flatMap((section) => section.lines).filter((line) => line.alternativeTo === null);
}

/**
 * Pours a recipe together: every line by the larder or its component, heat by time, ice, reducing and straining as
 * stages. `filled` in ml is the measured volume of the finished whole; it wins over what would be computed.
 */
export function mix(
  document: RecipeDocument,
  context: EngineContext,
  compositionOf: (componentId: string) => Composition,
  filled: number | null,
): Mixture {
  const portions = heatedPortions(document, context, compositionOf);
  const stages = stagesOf(document);
  const choices = choicesOf(document, portions, stages);
  const soaks = document.steps.some(soaksUp);
  return {
    ...ends(choices, stages, filled, soaks ? 1 - SOAKED : 1),
    lacks: [
      ...portions.flatMap((portion) => portion.lacks),
      ...lacksOfParts(portions),
      ...lacksOfStages(stages, document.steps),
      ...(filled === null ? lacksOfReducing(document.steps) : []),
    ],
    estimated: soaks || stages.length > 0 || portions.some((portion) => portion.estimated),
    rests: [
      ...portions.flatMap((portion) => portion.rests),
      ...stages.flatMap((stage) => stage.rests),
      ...limitsOf(
        stages,
        largest(choices, stages.length + 1, (groups) => strengthOf(runStages(stages, groups, 'min'))),
      ),
      ...(soaks ? [rest('botanicals-soak-up')] : []),
    ],
    sized: !portions.some(inParts),
    empty: choices.length === 0,
  };
}

/** Share of strength or sugar that botanicals, fat or curds may hold back. Estimate. */
const SOAKED = 0.05;

function soaksUp({ operation }: RecipeStep): boolean {
  return operation?.kind === 'infuse' || operation?.kind === 'fat-wash' || operation?.kind === 'clarify';
}

function heatedPortions(
  document: RecipeDocument,
  context: EngineContext,
  compositionOf: (componentId: string) => Composition,
): Portion[] {
  const lines = linesThatCount(document);
  const through = stepsThrough(lines, document.steps);
  return lines
    .map((line) => portionOf(line, document.kind, context, compositionOf))
    .map((portion) => heatPortion(portion, through.get(portion.line.id) ?? []));
}

function choicesOf(document: RecipeDocument, portions: readonly Portion[], stages: readonly Stage[]): Choice[] {
  const poured = portions.filter((portion) => portion.variants.length > 0);
  const through = stepsThrough(
    poured.map((portion) => portion.line),
    document.steps,
  );
  return poured.map(({ line, variants }) => ({ variants, group: stageMet(stages, through.get(line.id) ?? []) }));
}

function ends(choices: readonly Choice[], stages: readonly Stage[], filled: number | null, kept: number) {
  const run = (groups: readonly Matter[], water: 'min' | 'max') => {
    const pot = runStages(stages, groups, water);
    return filled === null ? pot : withVolume(pot, filled);
  };
  const search = (water: 'min' | 'max', measure: (pot: Matter) => number) =>
    run(
      largest(choices, stages.length + 1, (groups) => measure(run(groups, water))),
      water,
    );
  const weakest = search('max', (pot) => -strengthOf(pot));
  const leastSweet = search('max', (pot) => -sugarOf(pot));
  return {
    volume: [search('min', (pot) => -volumeOf(pot)), search('max', volumeOf)] as const,
    strength: [{ ...weakest, ethanol: weakest.ethanol * kept }, search('min', strengthOf)] as const,
    sugar: [{ ...leastSweet, sugar: leastSweet.sugar * kept }, search('min', sugarOf)] as const,
  };
}

const inParts = (portion: Portion) => portion.line.unit === 'part' && portion.variants.length > 0;

/** Parts beside millilitres mean nothing until somebody says how large a part is. */
function lacksOfParts(portions: readonly Portion[]): Lack[] {
  const poured = portions.filter((portion) => portion.variants.length > 0);
  const parts = poured.filter(inParts);
  const measured = poured.some((portion) => !inParts(portion) && dimensionOf(portion.line.unit ?? 'piece') !== 'count');
  return measured ? parts.map(({ line }): Lack => ({ code: 'unit-missing', subject: line.name })) : [];
}

function lacksOfReducing(steps: readonly RecipeStep[]): Lack[] {
  return steps.filter((step) => step.operation?.kind === 'reduce' && step.operation.to === null).map(lossUnknown);
}
