import type { Knex } from 'knex';
import type { Figures } from '../../shared/contracts/figures.ts';
import type { RecipeDocument } from '../../shared/contracts/recipe-document.ts';
import type { MissingCode } from '../../shared/contracts/recipes.ts';
import { missingFields } from '../../shared/engine/completeness.ts';
import type { EngineContext } from '../../shared/engine/context.ts';
import { computeFigures } from '../../shared/engine/figures.ts';
import { findLarderItems } from '../larder/larder.queries.ts';
import { findPlate } from '../plates/plates.queries.ts';
import { findUsersOf, loadComponentClosure, lockComponentGraph } from './component-closure.ts';
import { findCurrentDocuments, updateDerived } from './recipes.queries.ts';

/** What the engine needs to know of these documents: their components all the way down and the larder behind every line. */
export async function readEngineContext(db: Knex, documents: readonly RecipeDocument[]): Promise<EngineContext> {
  const components = await loadComponentClosure(db, documents);
  const lines = [...documents, ...components.values()].flatMap(({ sections }) =>
    sections.flatMap(({ lines }) => lines),
  );
  const larderIds = new Set(lines.flatMap((line) => line.larderId ?? []));
  return { components, larder: await findLarderItems(db, [...larderIds]) };
}

/** Everything that is kept beside a text because it follows from it. */
export async function derive(
  db: Knex,
  document: RecipeDocument,
): Promise<{ figures: Figures; missing: MissingCode[] }> {
  const figures = computeFigures(document, await readEngineContext(db, [document]));
  return { figures, missing: await readMissing(db, document) };
}

/** What the recipe lacks before it may be cleared, with its lead plate as it stands now. */
export async function readMissing(db: Knex, document: RecipeDocument): Promise<MissingCode[]> {
  const plate = document.leadPlateId ? await findPlate(db, document.leadPlateId) : undefined;
  return missingFields(document, { leadPlateAlt: plate?.alt ?? null });
}

/** Works the figures of every recipe that is made with this one out again. */
export async function refreshUsersOf(db: Knex, recipeId: string): Promise<void> {
  const users = await findCurrentDocuments(db, await findUsersOf(db, recipeId));
  const documents = [...users.values()].map(({ document }) => document);
  const context = await readEngineContext(db, documents);
  for (const [id, { document }] of users) await updateDerived(db, id, { figures: computeFigures(document, context) });
}

/** Finds out again what the recipes led by this plate lack, after its words have changed. */
export async function refreshRecipesLedBy(trx: Knex, plateId: string): Promise<void> {
  await lockComponentGraph(trx);
  const ids: string[] = await trx('recipes')
    .join('revisions', (on) => on.on('revisions.recipe_id', 'recipes.id').andOn('revisions.number', 'recipes.revision'))
    .whereRaw(`revisions.document ->> 'leadPlateId' = ?`, [plateId])
    .pluck('recipes.id');
  for (const [id, { document }] of await findCurrentDocuments(trx, ids))
    await updateDerived(trx, id, { missing: await readMissing(trx, document) });
}
