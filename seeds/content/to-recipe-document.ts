import type { Range } from '../../shared/contracts/primitives.ts';
import {
  RECIPE_DOCUMENT_SCHEMA,
  recipeDocument,
  type NoteSource,
  type RecipeDocument,
  type RecipeLine,
  type RecipeStep,
} from '../../shared/contracts/recipe-document.ts';
import { checkValue, type SourceFile } from './source-file.ts';
import { plateIdOf, recipeIdOf } from './stable-id.ts';
import type { WrittenLine, WrittenRecipe, WrittenStep } from './written-recipe.ts';

type Place = readonly PropertyKey[];
type SaidAt = Pick<WrittenLine, 'at' | 'cue'>;

interface Writing {
  source: SourceFile;
  /** Starts of the shoot's cues in milliseconds; none where the recipe comes from no shoot. */
  cues: readonly number[];
  /** Names of the lines in the order of the file, as steps refer to them. */
  lineNames: readonly string[];
}

const SECONDS = { seconds: 1, minutes: 60, hours: 3600, days: 86_400 } as const;

/**
 * The recipe document that a hand-written recipe stands for, checked by its contract.
 * Lines are `l1`, `l2` … through all sections, steps `t1`, `t2` …; throws with file and line where something is wrong.
 */
export function toRecipeDocument(written: WrittenRecipe, source: SourceFile, cues: readonly number[]): RecipeDocument {
  const lineNames = written.sections.flatMap((section) => section.lines.map((line) => line.name));
  const writing: Writing = { source, cues, lineNames };
  let lineCount = 0;
  const sections = written.sections.map((section, s) => ({
    id: `s${s + 1}`,
    title: section.title,
    lines: section.lines.map((line, l) => toLine(writing, line, `l${++lineCount}`, ['sections', s, 'lines', l])),
  }));

  const { title, kind, method, glass, ice, garnish, tags, extraAllergens, extraCautions } = written;
  const document: RecipeDocument = {
    schema: RECIPE_DOCUMENT_SCHEMA,
    ...{ title, kind, method, glass, ice, garnish, tags, extraAllergens, extraCautions },
    ...toTexts(source),
    leadPlateId: written.plate === undefined ? null : plateIdOf(written.plate),
    yield: toYield(written.yield),
    sections,
    steps: written.steps.map((step, index) => toStep(writing, step, index)),
    keeping: toKeeping(written.keeping),
  };
  return checkValue(recipeDocument, document, source);
}

function toLine(writing: Writing, line: WrittenLine, id: string, place: Place): RecipeLine {
  const { name, prep, note, optional, scaling } = line;
  return {
    id,
    amount: line.amount ?? null,
    unit: line.unit ?? null,
    ...{ name, prep, note, optional, scaling },
    larderId: line.larder ?? null,
    componentId: line.component === undefined ? null : recipeIdOf(line.component),
    alternativeTo: null,
    source: toNoteSource(writing, line, place),
  };
}

function toStep(writing: Writing, step: WrittenStep, index: number): RecipeStep {
  const { text, attention, tools } = step;
  const uses = step.uses.map((used, u) => `l${lineNumberOf(writing, used, ['steps', index, 'uses', u])}`);
  return {
    id: `t${index + 1}`,
    ...{ text, attention, tools, uses },
    operation: step.operation ?? null,
    duration: toDuration(writing, step, index),
    temperature: step.temperature ?? null,
    plateId: null,
    after: step.after?.map((number) => `t${number}`) ?? null,
    source: toNoteSource(writing, step, ['steps', index]),
  };
}

function lineNumberOf({ lineNames, source }: Writing, used: number | string, place: Place): number {
  if (typeof used === 'number') {
    if (used > lineNames.length) source.refuse(place, `There is no line ${used}.`);
    return used;
  }
  const matches = lineNames.flatMap((name, index) =>
    name.toLowerCase().includes(used.toLowerCase()) ? [index + 1] : [],
  );
  const [first, second] = matches;
  if (first === undefined) return source.refuse(place, `No line is called "${used}".`);
  if (second !== undefined) return source.refuse(place, `More than one line is called "${used}".`);
  return first;
}

function toDuration({ source }: Writing, step: WrittenStep, index: number): Range | null {
  const given = (Object.keys(SECONDS) as (keyof typeof SECONDS)[]).filter((unit) => step[unit] !== undefined);
  const [unit, another] = given;
  if (another) source.refuse(['steps', index, another], 'A step has one duration only.');
  const amount = unit && step[unit];
  return unit && amount ? { min: amount.min * SECONDS[unit], max: amount.max * SECONDS[unit] } : null;
}

function toNoteSource({ cues, source }: Writing, { at, cue }: SaidAt, place: Place): NoteSource | null {
  if (at === undefined) {
    if (cue !== undefined) source.refuse([...place, 'cue'], 'A cue needs its time, "at".');
    return null;
  }
  const found = cues.findIndex((start) => Math.floor(start / 1000) === at);
  const startMs = cues[found];
  if (startMs === undefined) return source.refuse([...place, 'at'], "No cue of the shoot's notes starts then.");
  if (cue !== undefined && cue !== found)
    source.refuse([...place, 'cue'], `The cue that starts then is number ${found}.`);
  return { cue: found, startMs };
}

function toYield(written: WrittenRecipe['yield']): RecipeDocument['yield'] {
  const single = (measure: typeof written.measured) =>
    measure ? { amount: measure.amount.min, unit: measure.unit } : null;
  return {
    stated: written.stated ?? null,
    measured: single(written.measured),
    servings: written.servings ?? null,
    servingSize: single(written.servingSize),
  };
}

function toKeeping(written: WrittenRecipe['keeping']): RecipeDocument['keeping'] {
  return written ? { ...written, days: written.days ?? null, temperature: written.temperature ?? null } : null;
}

/** The headnote stands first; `## Tips` and `## Variations` follow in any order. */
function toTexts(source: SourceFile): Pick<RecipeDocument, 'headnote' | 'tips' | 'variations'> {
  const parts = bodyParts(source.body);
  for (const heading of parts.keys())
    if (!['', 'Tips', 'Variations'].includes(heading)) source.refuse([], `There is no part called "${heading}".`);
  return { headnote: parts.get('') ?? '', tips: parts.get('Tips') ?? '', variations: parts.get('Variations') ?? '' };
}

/** The parts of a body by their `## ` heading, the text before the first one under the empty name. */
export function bodyParts(body: string): Map<string, string> {
  const [opening = '', ...rest] = body.split(/^## /m);
  const parts = new Map([['', opening.trim()]]);
  for (const part of rest) {
    const [heading = '', ...lines] = part.split('\n');
    parts.set(heading.trim(), lines.join('\n').trim());
  }
  return parts;
}
