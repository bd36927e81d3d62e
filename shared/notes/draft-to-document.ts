import type { Draft, DraftIngredient, DraftStep } from '../contracts/notes.ts';
import {
  emptyRecipeDocument,
  KEEPING_PLACES,
  type Keeping,
  type NoteSource,
  type RecipeDocument,
} from '../contracts/recipe-document.ts';

/** A draft as a recipe document: every line and step keeps its cue and its second of video. */
export function draftToDocument(draft: Draft, { title, kind }: Pick<RecipeDocument, 'title' | 'kind'>): RecipeDocument {
  const blank = emptyRecipeDocument(title, kind);
  const [stated] = draft.yields;
  return {
    ...blank,
    yield: { ...blank.yield, stated: stated ? { amount: stated.amount, unit: stated.unit } : null },
    sections: [{ id: 's1', title: '', lines: draft.ingredients.map(toLine) }],
    steps: draft.steps.map(toStep),
    keeping: toKeeping(draft.storage),
  };
}

function toLine(ingredient: DraftIngredient, index: number): RecipeDocument['sections'][number]['lines'][number] {
  const { name, amount, unit, prep, optional, larderId } = ingredient;
  return {
    id: `l${index + 1}`,
    ...{ amount, prep, optional, larderId },
    unit: amount ? unit : null,
    name: name.slice(0, 160),
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
    text: step.text,
    uses: step.uses.map((used) => `l${used + 1}`),
    operation: step.operation,
    duration: step.durationSec,
    attention: step.passive ? 'waiting' : 'hands-on',
    temperature: step.temperatureC,
    tools: [],
    plateId: null,
    after: null,
    source: sourceOf(step),
  };
}

function toKeeping(storage: Draft['storage']): Keeping | null {
  const said = storage.find(({ days }) => days !== null) ?? storage[0];
  if (!said) return null;
  const place = KEEPING_PLACES.find((each) => each === said.where) ?? 'refrigerator';
  return { place, days: said.days, temperature: said.temperatureC, basis: 'stated', note: '' };
}

function sourceOf({ cue, at }: { cue: number; at: number | null }): NoteSource | null {
  return at === null ? null : { cue, startMs: at };
}
