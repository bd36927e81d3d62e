import type { Figure, Lack } from '../contracts/figures.ts';
import type { RecipeDocument, RecipeStep } from '../contracts/recipe-document.ts';
import { tradeMeasuresOf, type EngineContext } from './context.ts';
import { known, unknown } from './figure.ts';
import { massOf, shareOf, strengthOf, sugarOf, volumeOf, type Matter } from './matter.ts';
import { mix, type Mixture } from './mixture.ts';
import type { Composition } from './portion.ts';
import { rest } from './rests.ts';
import { stagesOf } from './stages.ts';
import { heatingOf, lossUnknown } from './treatment.ts';
import { yieldBySay } from './yield.ts';

/** What is said of one making of a recipe. */
export interface Batch {
  yieldMl: Figure;
  strength: Figure;
  sugar: Figure;
  composition: Composition;
}

/** Answers for recipes and, by recipe id, for components; each document is worked out once. */
export interface Batches {
  of: (document: RecipeDocument) => Batch;
  ofComponent: (id: string) => Batch;
}

/** Batches of recipes and, all the way down, of what they contain; a component that contains itself lacks `component-cycle`. */
export function batchesIn(context: EngineContext): Batches {
  const finished = new Map<RecipeDocument, Batch>();
  const open = new Set<RecipeDocument>();

  const of = (document: RecipeDocument): Batch => {
    const done = finished.get(document);
    if (done) return done;
    if (open.has(document)) return lackingBatch({ code: 'component-cycle', subject: document.title });
    open.add(document);
    const batch = makeBatch(document, context, (id) => ofComponent(id).composition);
    open.delete(document);
    finished.set(document, batch);
    return batch;
  };
  const ofComponent = (id: string): Batch => {
    const document = context.components.get(id);
    return document ? of(document) : lackingBatch({ code: 'component-missing', subject: id });
  };
  return { of, ofComponent };
}

function lackingBatch(lack: Lack): Batch {
  const figure = unknown([lack]);
  const composition = { variants: [], lacks: [lack], estimated: false, rests: [] };
  return { yieldMl: figure, strength: figure, sugar: figure, composition };
}

function makeBatch(
  document: RecipeDocument,
  context: EngineContext,
  compositionOf: (id: string) => Composition,
): Batch {
  const trade = tradeMeasuresOf(context);
  const measured = yieldBySay({ ...document.yield, stated: null, servings: null }, null, trade);
  const followed = losesVolume(document) && strainSteps(document).every(lossIsKnown);
  const filled = measured && followed ? measured.max : null;
  const mixture = mix(document, context, compositionOf, filled);
  const rests =
    filled === null
      ? [...mixture.rests, ...iceToCome(document)]
      : [...mixture.rests.filter((each) => each !== rest('water-lost-by-time')), rest('measured-yield')];
  const figure = (
    ends: readonly [Matter, Matter],
    measure: (matter: Matter) => number,
    beside: Lack['code'] | null,
  ) => {
    const lacks = lacksFor(document, mixture, beside);
    return lacks.length > 0 ? unknown(lacks) : computed(measure(ends[0]), measure(ends[1]), mixture, rests);
  };
  const said = yieldBySay(document.yield, densityOf(mixture), trade);
  return {
    yieldMl: said ?? strained(document, mixture, figure(mixture.volume, volumeOf, null)),
    strength: figure(mixture.strength, strengthOf, 'sugar-missing'),
    sugar: figure(mixture.sugar, sugarOf, 'strength-missing'),
    composition: compositionFrom(document, mixture),
  };
}

/** Ends that lie closer than this share are one value. */
const SPREAD = 1e-6;

/** Guesses on the way only make an estimate where they leave a range; nothing of something rests on nothing. */
function computed(min: number, max: number, mixture: Mixture, rests: readonly string[]): Figure {
  if (max === 0) return known(0, 0, 'computed');
  return known(min, max, mixture.estimated && max - min > SPREAD * max ? 'estimated' : 'computed', rests);
}

/** What one figure lacks: what is only missing for the other figure does not count; the volume needs neither. */
function lacksFor(document: RecipeDocument, mixture: Mixture, beside: Lack['code'] | null): Lack[] {
  const other = beside === null ? ['sugar-missing', 'strength-missing'] : [beside];
  const lacks = mixture.lacks.filter((lack) => !other.includes(lack.code));
  if (lacks.length > 0 || !mixture.empty) return lacks;
  return [{ code: beside === null ? 'yield-missing' : 'amount-missing', subject: document.title }];
}

function strained(document: RecipeDocument, mixture: Mixture, figure: Figure): Figure {
  if (!figure.known) return figure;
  if (!mixture.sized) return unknown([{ code: 'yield-missing', subject: document.title }]);
  const unmeasured = strainSteps(document).filter((step) => !lossIsKnown(step));
  return unmeasured.length > 0 ? unknown(unmeasured.map(lossUnknown)) : figure;
}

/** The strainings that take something: a drink leaves next to nothing in the strainer, unless it says how much. */
function strainSteps({ kind, steps }: RecipeDocument): RecipeStep[] {
  return steps.filter(
    ({ operation }) => operation?.kind === 'strain' && (kind !== 'drink' || operation.lossShare !== null),
  );
}

/** Where nothing runs through, nothing can be followed. */
function lossIsKnown({ operation }: RecipeStep): boolean {
  return operation?.kind === 'strain' && operation.lossShare !== null && operation.lossShare < 1;
}

/** What a measured yield tells more of than the lines: water that boiled away, ice that melted, what was reduced. */
function losesVolume(document: RecipeDocument): boolean {
  return changesWater(document) || document.steps.some((step) => heatingOf(step) !== null);
}

function changesWater(document: RecipeDocument): boolean {
  return stagesOf(document).some(({ step }) => step.operation?.kind !== 'strain');
}

function densityOf(mixture: Mixture): number | null {
  const [matter] = mixture.volume;
  return mixture.lacks.length > 0 || mixture.empty ? null : massOf(matter) / volumeOf(matter);
}

/** Built over ice, a drink is as strong as stated only until the ice melts. */
function iceToCome(document: RecipeDocument): string[] {
  const iced = document.ice !== '' && !/^(?:none|no)\b/i.test(document.ice);
  return document.kind === 'drink' && iced && !changesWater(document) ? [rest('before-ice')] : [];
}

/** Kinds of recipe that another one uses as a thing, not as a liquid. */
const NO_LIQUID = new Set<RecipeDocument['kind']>(['garnish', 'ice', 'technique']);

function compositionFrom(document: RecipeDocument, mixture: Mixture): Composition {
  if (NO_LIQUID.has(document.kind)) return { variants: [], lacks: [], estimated: false, rests: [] };
  const blocked = lacksFor(document, mixture, null).length > 0;
  const ends = [...mixture.strength, ...mixture.sugar].filter((matter) => volumeOf(matter) > 0);
  const perMl = ends.map((matter) => shareOf(matter, 1 / volumeOf(matter)));
  return {
    variants: blocked ? [] : [...new Map(perMl.map((matter) => [JSON.stringify(matter), matter])).values()],
    lacks: mixture.lacks.map((lack) => ({ ...lack, subject: `${lack.subject} (${document.title})` })),
    estimated: mixture.estimated,
    rests: mixture.rests,
  };
}
