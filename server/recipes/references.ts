import type { Knex } from 'knex';
import type { FieldFault } from '../../shared/contracts/errors.ts';
import type { RecipeDocument, RecipeLine } from '../../shared/contracts/recipe-document.ts';
import { componentIdsOf, findComponentCycle } from '../../shared/engine/components.ts';
import { requestInvalid } from '../http/http.errors.ts';
import { findLarderItems } from '../larder/larder.queries.ts';
import { findPlates } from '../plates/plates.queries.ts';
import { loadComponentClosure } from './component-closure.ts';
import { componentCycle, unknownComponent, unknownLarderItem } from './recipes.errors.ts';

/**
 * Refuses a document that names what is not there, at its field, or that would make recipes of each other in a ring. Ask only
 * while the component graph is locked.
 */
export async function checkReferences(db: Knex, recipeId: string, document: RecipeDocument): Promise<void> {
  await checkLarder(db, document);
  await checkPlates(db, document);
  await checkComponents(db, recipeId, document);
}

async function checkLarder(db: Knex, document: RecipeDocument): Promise<void> {
  const named = linesOf(document).flatMap(({ line }) => line.larderId ?? []);
  const held = await findLarderItems(db, [...new Set(named)]);
  const faults = faultsAt(document, 'larderId', (id) => !held.has(id), 'This is not in the larder.');
  if (faults.length > 0) throw unknownLarderItem({ faults });
}

async function checkPlates(db: Knex, { leadPlateId, steps }: RecipeDocument): Promise<void> {
  const places = [
    { id: leadPlateId, path: 'document.leadPlateId' },
    ...steps.map((step, index) => ({ id: step.plateId, path: `document.steps.${index}.plateId` })),
  ];
  const held = new Set((await findPlates(db, [...new Set(places.flatMap(({ id }) => id ?? []))])).map(({ id }) => id));
  const faults = places
    .filter(({ id }) => id !== null && !held.has(id))
    .map(({ path }) => ({ path, message: 'There is no such plate.' }));
  if (faults.length > 0) throw requestInvalid({ faults });
}

async function checkComponents(db: Knex, recipeId: string, document: RecipeDocument): Promise<void> {
  if (componentIdsOf(document).length === 0) return;
  const components = await loadComponentClosure(db, [document]);
  const isUnknown = (id: string) => id !== recipeId && !components.has(id);
  const faults = faultsAt(document, 'componentId', isUnknown, 'There is no such recipe.');
  if (faults.length > 0) throw unknownComponent({ faults });

  const names = findComponentCycle(recipeId, document, components);
  if (names) throw componentCycle({ detail: [...names, names[0]].join(' → '), context: { names } });
}

function faultsAt(
  document: RecipeDocument,
  field: 'larderId' | 'componentId',
  isWrong: (id: string) => boolean,
  message: string,
): FieldFault[] {
  return linesOf(document)
    .filter(({ line }) => line[field] !== null && isWrong(line[field]))
    .map(({ path }) => ({ path: `${path}.${field}`, message }));
}

/** Every line with its place in a save. */
function linesOf({ sections }: RecipeDocument): { line: RecipeLine; path: string }[] {
  return sections.flatMap(({ lines }, s) =>
    lines.map((line, l) => ({ line, path: `document.sections.${s}.lines.${l}` })),
  );
}
