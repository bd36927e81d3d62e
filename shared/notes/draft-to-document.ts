import type { Draft, DraftIngredient, DraftStep } from '../contracts/notes.ts';
import {
  emptyRecipeDocument,
  type Keeping,
  type NoteSource,
  type RecipeDocument,
} from '../contracts/recipe-document.ts';
import { toolsIn } from './equipment.ts';

/** The most that a recipe document holds; notes of a whole day may say more. */
const MOST = { lines: 2000, steps: 200, uses: 200, name: 160, prep: 200, text: 4000, servings: 10_000, tools: 20 };

/**
 * A draft as a recipe document: every line and step keeps its cue and its second of video. What goes beyond a document's
 * measure is left in the notes.
 */
export function draftToDocument(draft: Draft, { title, kind }: Pick<RecipeDocument, 'title' | 'kind'>): RecipeDocument {
  const blank = emptyRecipeDocument(title, kind);
  const stated = draft.yields.findLast(({ unit }) => unit !== 'drink');
  const drinks = draft.yields.find(({ unit }) => unit === 'drink')?.amount.max ?? null;
  return {
    ...blank,
    yield: {
      ...blank.yield,
      stated: stated ? { amount: stated.amount, unit: stated.unit } : null,
      servings: drinks !== null && drinks > 0 && drinks <= MOST.servings ? drinks : null,
    },
    sections: [{ id: 's1', title: '', lines: draft.ingredients.slice(0, MOST.lines).map(toLine) }],
    steps: draft.steps.slice(0, MOST.steps).map(toStep),
    keeping: toKeeping(draft.storage),
  };
}

function toLine(ingredient: DraftIngredient, index: number): RecipeDocument['sections'][number]['lines'][number] {
  const { name, amount, unit, prep, optional, larderId } = ingredient;
  return {
    id: `l${index + 1}`,
    ...{ amount, optional, larderId },
    prep: prep.slice(0, MOST.prep),
    unit: amount ? unit : null,
    name: name.slice(0, MOST.name),
    componentId: null,
    note: '',
    alternativeTo: null,
    scaling: { rule: 'linear' },
    source: sourceOf(ingredient),
  };
}

function toStep(step: DraftStep, index: number): RecipeDocument['steps'][number] {
  return {
    id: `t${index + 1}`,
    text: step.text.slice(0, MOST.text),
    uses: step.uses
      .filter((used) => used < MOST.lines)
      .slice(0, MOST.uses)
      .map((used) => `l${used + 1}`),
    operation: step.operation,
    duration: step.durationSec,
    attention: step.passive ? 'waiting' : 'hands-on',
    temperature: step.temperatureC,
    tools: toolsIn(step.text).slice(0, MOST.tools),
    plateId: null,
    after: null,
    source: sourceOf(step),
  };
}

function toKeeping(storage: Draft['storage']): Keeping | null {
  const said = storage.find(({ days }) => days !== null) ?? storage[0];
  if (!said) return null;
  return { place: said.where, days: said.days, temperature: said.temperatureC, basis: 'stated', note: '' };
}

function sourceOf({ cue, at }: { cue: number; at: number | null }): NoteSource | null {
  return at === null ? null : { cue, startMs: at };
}
