import type { Figure, Lack } from '../contracts/figures.ts';
import type { RecipeDocument } from '../contracts/recipe-document.ts';
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
  const filled = measured && losesVolume(document) ? beforeStraining(document, measured.max) : null;
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
  const kept = keptInStraining(document);
  if (kept === null) return unknown(strainSteps(document).filter(isUnmeasured).map(lossUnknown));
  return kept === 1 ? figure : known(figure.min * kept, figure.max * kept, 'estimated', figure.rests);
}

const strainSteps = (document: RecipeDocument) => document.steps.filter((step) => step.operation?.kind === 'strain');
const isUnmeasured = (step: RecipeDocument['steps'][number]) => lossShareOf(step) === null;
const lossShareOf = ({ operation }: RecipeDocument['steps'][number]) =>
  operation?.kind === 'strain' ? operation.lossShare : null;

/** Share left after every straining, or null where one states no loss. A drink leaves next to nothing in the strainer. */
function keptInStraining(document: RecipeDocument): number | null {
  const losses = strainSteps(document).map((step) => lossShareOf(step) ?? (document.kind === 'drink' ? 0 : null));
  return losses.reduce<number | null>((kept, loss) => (kept === null || loss === null ? null : kept * (1 - loss)), 1);
}

function beforeStraining(document: RecipeDocument, measured: number): number | null {
  const kept = keptInStraining(document);
  return kept === null || kept === 0 ? null : measured / kept;
}

function losesVolume(document: RecipeDocument): boolean {
  return stagesOf(document).length > 0 || document.steps.some((step) => heatingOf(step) !== null);
}

function densityOf(mixture: Mixture): number | null {
  const [matter] = mixture.volume;
  return mixture.lacks.length > 0 || mixture.empty ? null : massOf(matter) / volumeOf(matter);
}

/** Built over ice, a drink is as strong as stated only until the ice melts. */
function iceToCome(document: RecipeDocument): string[] {
  const iced = document.ice !== '' && !/^(?:none|no)\b/i.test(document.ice);
  return document.kind === 'drink' && iced && stagesOf(document).length === 0 ? [rest('before-ice')] : [];
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
