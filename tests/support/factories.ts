import type { Knex } from 'knex';
import {
  emptyRecipeDocument,
  type RecipeDocument,
  type RecipeLine,
  type RecipeStep,
} from '../../shared/contracts/recipe-document.ts';
import type { RecipeState } from '../../shared/contracts/words.ts';
import type { PlateRow } from '../../server/plates/plates.rows.ts';
import { insertPlate } from '../../server/plates/plates.queries.ts';
import type { RecipeRow } from '../../server/recipes/recipes.rows.ts';
import { insertRecipeWithRevision } from '../../server/recipes/revise.ts';
import { findFreeSlug } from '../../server/recipes/slugs.ts';
import { makePerson } from './people.ts';

let counter = 0;

/** A line of 50 ml that names nothing of the larder. */
export function makeLine(wish: Partial<RecipeLine> = {}): RecipeLine {
  counter += 1;
  return {
    id: `l${counter}`,
    amount: { min: 50, max: 50 },
    unit: 'ml',
    name: 'rosemary water',
    larderId: null,
    componentId: null,
    prep: '',
    note: '',
    optional: false,
    alternativeTo: null,
    scaling: { rule: 'linear' },
    source: null,
    ...wish,
  };
}

export function makeStep(wish: Partial<RecipeStep> = {}): RecipeStep {
  counter += 1;
  return {
    id: `s${counter}`,
    text: 'Stir it.',
    uses: [],
    operation: { kind: 'stir' },
    duration: { min: 60, max: 60 },
    attention: 'hands-on',
    temperature: null,
    tools: [],
    plateId: null,
    after: null,
    source: null,
    ...wish,
  };
}

/** A drink with all that clearing asks for, but for its lead plate. */
export function makeDocument(wish: Partial<RecipeDocument> & { lines?: RecipeLine[] } = {}): RecipeDocument {
  counter += 1;
  const { lines = [makeLine()], ...fields } = wish;
  return {
    ...emptyRecipeDocument(`Recipe ${counter}`, 'drink'),
    headnote: 'Green and quiet.',
    sections: [{ id: 'main', title: '', lines }],
    steps: [makeStep()],
    yield: { stated: null, measured: null, servings: 1, servingSize: null },
    ...fields,
  };
}

export interface RecipeWish extends Partial<RecipeDocument> {
  lines?: RecipeLine[];
  slug?: string;
  state?: RecipeState;
  personId?: string;
  shootId?: string;
}

/** A recipe with its first revision; recipes it is made of must be there already. */
export async function makeRecipe(db: Knex, wish: RecipeWish = {}): Promise<RecipeRow> {
  const { slug, state, personId, shootId, ...fields } = wish;
  const document = makeDocument(fields);
  return insertRecipeWithRevision(db, {
    document,
    slug: slug ?? (await findFreeSlug(db, document.title)),
    personId: personId ?? (await makePerson(db, { roles: ['creator'] })).id,
    now: new Date(),
    ...(state === undefined ? {} : { state }),
    ...(shootId === undefined ? {} : { shootId }),
  });
}

/** A plate's row with words and no sizes, for what only asks whether it is there and what it says. */
export async function makePlate(db: Knex, wish: Partial<PlateRow> = {}): Promise<PlateRow> {
  return insertPlate(db, {
    original_hash: '0'.repeat(64),
    original_name: 'still.jpg',
    alt: 'A stemmed glass on slate',
    width: 1600,
    height: 1200,
    state: 'ready',
    created_by: wish.created_by ?? (await makePerson(db, { roles: ['creator'] })).id,
    ...wish,
  });
}
