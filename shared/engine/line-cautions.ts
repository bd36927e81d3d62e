import type { Figure } from '../contracts/figures.ts';
import type { LarderItem } from '../contracts/larder.ts';
import type { RecipeDocument, RecipeLine, RecipeStep } from '../contracts/recipe-document.ts';
import type { Batches } from './batch.ts';
import type { Caught } from './caught.ts';
import { allLines } from './components.ts';
import type { EngineContext } from './context.ts';
import { stepsThrough } from './treatment.ts';

/** From this strength in % vol on, vapour over a warm pan may catch fire: it does at room temperature from about 40. Ours. */
const SPIRIT = 20;

/** From this share of sugar on, in g per 100 g, what simmers is hot syrup. Ours. */
const SWEET = 40;

/** °C of a step from which open vapour counts as heat, sugar as hot, egg as cooked. */
const VAPOUR = 40;
const SUGAR_HOT = 100;
const EGG_COOKED = 70;

/** A line with what is known of it and the steps it goes through. */
interface Watched {
  line: RecipeLine;
  item: LarderItem | null;
  strength: number;
  sweetness: number;
  through: readonly RecipeStep[];
}

/** Cautions that follow from the document's own lines and the steps they go through. */
export function cautionsOfLines(document: RecipeDocument, context: EngineContext, batches: Batches): Caught[] {
  const watched = watch(document, context, batches);
  return [
    ...name(
      'spirit-near-heat',
      watched.filter((one) => one.strength >= SPIRIT && one.through.some(givesOffVapour)),
    ),
    ...name(
      'hot-sugar',
      watched.filter((one) => one.sweetness >= SWEET && one.through.some(isSugarHot)),
    ),
    ...name(
      'raw-egg',
      watched.filter((one) => one.item?.nature === 'egg' && !one.through.some(cooksEgg)),
    ),
    ...name('fresh-keeping', isKept(document) ? watched.filter(isFresh) : []),
    ...name(
      'sealed-gas-pressure',
      isSealed(document) && !isPreserved(batches.of(document).strength) ? watched.filter(mayFerment) : [],
    ),
    ...(isSealed(document) && document.steps.some((step) => step.operation?.kind === 'carbonate')
      ? ([['sealed-gas-pressure', null]] as const)
      : []),
    ...watched.flatMap(({ line, item }) => tagsOf(item).map((caution): Caught => [caution, line.name])),
  ];
}

function watch(document: RecipeDocument, context: EngineContext, batches: Batches): Watched[] {
  const lines = document.sections.flatMap((section) => section.lines);
  const through = stepsThrough(lines, document.steps);
  return lines.map((line) => {
    const item = (line.larderId && context.larder.get(line.larderId)) || null;
    const figures = line.componentId ? batches.ofComponent(line.componentId) : null;
    const inside = line.componentId
      ? allLines({ ...document, sections: [{ id: '', title: '', lines: [line] }] }, context)
      : [];
    return {
      line,
      item,
      strength:
        item?.strength?.value ??
        mostOf(
          figures?.strength,
          inside.map((found) => found.item?.strength?.value ?? 0),
        ),
      // Grams a litre over ten are near enough to grams in 100 g here.
      sweetness:
        item?.sugar?.value ??
        mostOf(
          figures?.sugar,
          inside.map((found) => found.item?.sugar?.value ?? 0),
          10,
        ),
      through: through.get(line.id) ?? [],
    };
  });
}

/** The most that a component may be; where its figure is not known, as much as the most of anything in it. */
function mostOf(figure: Figure | undefined, inside: readonly number[], per = 1): number {
  return figure?.known ? figure.max / per : Math.max(0, ...inside);
}

const name = (caution: Caught[0], watched: readonly Watched[]) =>
  watched.map(({ line }): Caught => [caution, line.name]);

const heats = ({ operation }: RecipeStep) => operation?.kind === 'heat' || operation?.kind === 'reduce';
const isLively = ({ operation }: RecipeStep) =>
  operation?.kind === 'reduce' || (operation?.kind === 'heat' && operation.liveliness !== 'warm');
const reaches = (step: RecipeStep, celsius: number) => (step.temperature?.max ?? -Infinity) >= celsius;

const givesOffVapour = (step: RecipeStep) => heats(step) || (step.operation?.kind !== 'cool' && reaches(step, VAPOUR));
const isSugarHot = (step: RecipeStep) => isLively(step) || (heats(step) && reaches(step, SUGAR_HOT));
const cooksEgg = (step: RecipeStep) =>
  step.temperature ? heats(step) && step.temperature.min >= EGG_COOKED : isLively(step);

const isFresh = ({ item }: Watched) => item?.cautions.includes('fresh-keeping') ?? false;

/** Freshness only matters for what is kept; the larder's other tags always hold. */
const tagsOf = (item: LarderItem | null) => (item?.cautions ?? []).filter((caution) => caution !== 'fresh-keeping');

function isKept(document: RecipeDocument): boolean {
  if (document.keeping) return document.keeping.place !== 'serve-at-once';
  return !['drink', 'garnish', 'ice', 'technique'].includes(document.kind) || document.steps.some(bottles);
}

const bottles = ({ operation }: RecipeStep) => operation?.kind === 'bottle';
const isSealed = (document: RecipeDocument) =>
  document.steps.some(({ operation }) => operation?.kind === 'bottle' && operation.sealed);

/** Fresh juice, and fruit that gives up juice, may begin to work under a stopper. */
const mayFerment = (one: Watched) =>
  isFresh(one) && (one.item?.nature === 'juice' || (!one.item?.dissolves && one.item?.water !== null));

/** As strong as spirit: nothing works in that. */
const isPreserved = (strength: Figure) => strength.known && strength.min >= SPIRIT;
