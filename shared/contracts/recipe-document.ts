import { z } from 'zod';
import { id, line, range, temperatureRange } from './primitives.ts';
import { allergen, caution, recipeKind, unit } from './words.ts';

/** Where in the shoot's notes something was said: the cue's number from 0 and its start. */
export const noteSource = z.strictObject({ cue: z.int().min(0), startMs: z.int().min(0) });
export type NoteSource = z.infer<typeof noteSource>;

/** How a line follows the factor when a recipe is scaled. */
export const lineScaling = z.discriminatedUnion('rule', [
  z.strictObject({ rule: z.literal('linear') }),
  z.strictObject({ rule: z.literal('whole') }),
  z.strictObject({ rule: z.literal('power'), exponent: z.number().min(0).max(1) }),
  z.strictObject({ rule: z.literal('fixed') }),
  z.strictObject({ rule: z.literal('to-taste') }),
]);
export type LineScaling = z.infer<typeof lineScaling>;

const localId = z.string().min(1).max(40);

export const recipeLine = z.strictObject({
  id: localId,
  amount: range.nullable(),
  unit: unit.nullable(),
  name: line(160),
  larderId: z.string().max(120).nullable(),
  componentId: id.nullable(),
  prep: z.string().trim().max(200),
  note: z.string().trim().max(300),
  optional: z.boolean(),
  alternativeTo: localId.nullable(),
  scaling: lineScaling,
  source: noteSource.nullable(),
});
export type RecipeLine = z.infer<typeof recipeLine>;

export const recipeSection = z.strictObject({
  id: localId,
  title: z.string().trim().max(120),
  lines: z.array(recipeLine).max(2000),
});
export type RecipeSection = z.infer<typeof recipeSection>;

/** What a volume, a mass or a share is reduced to. */
const reduceTo = z.discriminatedUnion('measure', [
  z.strictObject({ measure: z.literal('volume'), ml: z.number().positive() }),
  z.strictObject({ measure: z.literal('mass'), g: z.number().positive() }),
  z.strictObject({ measure: z.literal('share'), share: z.number().min(0).max(1) }),
]);

/** What is done in a step: trade operations with the parameters that change a figure. */
export const operation = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('add') }),
  z.strictObject({
    kind: z.literal('heat'),
    covered: z.boolean(),
    liveliness: z.enum(['warm', 'simmer', 'boil']),
  }),
  z.strictObject({ kind: z.literal('reduce'), to: reduceTo.nullable() }),
  z.strictObject({ kind: z.literal('infuse') }),
  z.strictObject({ kind: z.literal('strain'), lossShare: z.number().min(0).max(1).nullable() }),
  z.strictObject({ kind: z.literal('cool') }),
  z.strictObject({ kind: z.literal('shake') }),
  z.strictObject({ kind: z.literal('stir') }),
  z.strictObject({ kind: z.literal('blend') }),
  z.strictObject({ kind: z.literal('throw') }),
  z.strictObject({ kind: z.literal('carbonate') }),
  z.strictObject({ kind: z.literal('clarify') }),
  z.strictObject({ kind: z.literal('fat-wash') }),
  z.strictObject({ kind: z.literal('bottle'), sealed: z.boolean() }),
]);
export type Operation = z.infer<typeof operation>;
export const OPERATION_KINDS = operation.options.map((option) => option.shape.kind.value);
export type OperationKind = Operation['kind'];

export const recipeStep = z.strictObject({
  id: localId,
  /** Markdown. */
  text: line(4000),
  uses: z.array(localId).max(200),
  operation: operation.nullable(),
  /** Seconds. */
  duration: range.nullable(),
  attention: z.enum(['hands-on', 'waiting']),
  /** Degrees Celsius. */
  temperature: temperatureRange.nullable(),
  tools: z.array(line(80)).max(20),
  plateId: id.nullable(),
  /** Steps that must be done before this one; null means the step before it. */
  after: z.array(localId).max(50).nullable(),
  source: noteSource.nullable(),
});
export type RecipeStep = z.infer<typeof recipeStep>;

const measure = z.strictObject({ amount: z.number().positive(), unit });

export const recipeYield = z.strictObject({
  stated: z.strictObject({ amount: range, unit }).nullable(),
  measured: measure.nullable(),
  servings: z.number().positive().max(10_000).nullable(),
  servingSize: measure.nullable(),
});
export type RecipeYield = z.infer<typeof recipeYield>;

export const KEEPING_PLACES = ['refrigerator', 'freezer', 'cool-dark', 'room', 'serve-at-once'] as const;

export const keeping = z.strictObject({
  place: z.enum(KEEPING_PLACES),
  days: range.nullable(),
  /** Degrees Celsius. */
  temperature: temperatureRange.nullable(),
  basis: z.enum(['stated', 'guidance']),
  note: z.string().trim().max(300),
});
export type Keeping = z.infer<typeof keeping>;

export const RECIPE_DOCUMENT_SCHEMA = 1;

const recipeDocumentShape = z.strictObject({
  schema: z.literal(RECIPE_DOCUMENT_SCHEMA),
  title: line(160),
  kind: recipeKind,
  /** Markdown. */
  headnote: z.string().max(4000),
  method: z.string().trim().max(80),
  glass: z.string().trim().max(80),
  ice: z.string().trim().max(80),
  garnish: z.string().trim().max(200),
  tags: z.array(line(40)).max(30),
  /** Markdown. */
  tips: z.string().max(8000),
  /** Markdown. */
  variations: z.string().max(8000),
  leadPlateId: id.nullable(),
  yield: recipeYield,
  sections: z.array(recipeSection).max(40),
  steps: z.array(recipeStep).max(200),
  keeping: keeping.nullable(),
  extraAllergens: z.array(allergen).max(14),
  extraCautions: z.array(caution).max(20),
});

/**
 * The only form of a recipe: what a revision stores, an edition snapshots and the engine reads.
 * Amounts as written by the creator; durations in seconds, temperatures in degrees Celsius.
 * Refused where a step or an alternative points at a line or step that is not there, or where two ids are equal.
 */
export const recipeDocument = recipeDocumentShape.superRefine((document, context) => {
  const lineIds = new Set<string>();
  const stepIds = new Set(document.steps.map((step) => step.id));
  const refuse = (path: (string | number)[], message: string) => context.addIssue({ code: 'custom', path, message });

  document.sections.forEach((section, s) =>
    section.lines.forEach((entry, l) => {
      if (lineIds.has(entry.id)) refuse(['sections', s, 'lines', l, 'id'], 'Two lines have the same id.');
      lineIds.add(entry.id);
      if (entry.larderId && entry.componentId)
        refuse(['sections', s, 'lines', l, 'componentId'], 'A line is either from the larder or a component.');
      if (entry.unit && !entry.amount) refuse(['sections', s, 'lines', l, 'amount'], 'A unit needs an amount.');
    }),
  );
  document.sections.forEach((section, s) =>
    section.lines.forEach((entry, l) => {
      if (entry.alternativeTo && !lineIds.has(entry.alternativeTo))
        refuse(['sections', s, 'lines', l, 'alternativeTo'], 'The line it stands in for is not there.');
    }),
  );
  if (stepIds.size !== document.steps.length) refuse(['steps'], 'Two steps have the same id.');
  document.steps.forEach((step, index) => {
    for (const used of step.uses)
      if (!lineIds.has(used)) refuse(['steps', index, 'uses'], 'A step uses a line that is not there.');
    for (const before of step.after ?? [])
      if (!stepIds.has(before)) refuse(['steps', index, 'after'], 'A step follows one that is not there.');
  });
});
export type RecipeDocument = z.infer<typeof recipeDocument>;

/** A blank working copy with only what must be there. */
export function emptyRecipeDocument(title: string, kind: RecipeDocument['kind']): RecipeDocument {
  return {
    schema: RECIPE_DOCUMENT_SCHEMA,
    title,
    kind,
    headnote: '',
    method: '',
    glass: '',
    ice: '',
    garnish: '',
    tags: [],
    tips: '',
    variations: '',
    leadPlateId: null,
    yield: { stated: null, measured: null, servings: null, servingSize: null },
    sections: [{ id: 's1', title: '', lines: [] }],
    steps: [],
    keeping: null,
    extraAllergens: [],
    extraCautions: [],
  };
}
