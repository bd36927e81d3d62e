import type { Knex } from 'knex';
import { componentIdsOf } from '../../shared/engine/components.ts';
import { insertRecipeWithRevision } from '../../server/recipes/revise.ts';
import type { DemoRecipe } from '../content/content.ts';

/** The recipes, components before what is made of them. Those that are out wait as cleared for the first edition. */
export async function seedRecipes(
  db: Knex,
  recipes: readonly DemoRecipe[],
  shoots: ReadonlyMap<string, string>,
  creatorId: string,
): Promise<void> {
  for (const { id, slug, document, state, shoot } of inOrderOfUse(recipes))
    await insertRecipeWithRevision(db, {
      ...{ id, slug, document },
      state: state === 'out' ? 'cleared' : state,
      shootId: shoot === null ? null : (shoots.get(shoot) ?? null),
      personId: creatorId,
      now: new Date(),
    });
}

/** The questions that the editor has raised. */
export async function seedQueries(db: Knex, recipes: readonly DemoRecipe[], editorId: string): Promise<void> {
  for (const { id, queries } of recipes)
    for (const question of queries)
      await db('recipe_queries').insert({ recipe_id: id, question, asked_by: editorId, asked_at: new Date() });
}

/** Content holds no ring, so what has no component left waiting can always be found. */
function inOrderOfUse(recipes: readonly DemoRecipe[]): DemoRecipe[] {
  const done = new Set<string>();
  const ordered: DemoRecipe[] = [];
  while (ordered.length < recipes.length) {
    const ready = recipes.filter(
      ({ id, document }) => !done.has(id) && componentIdsOf(document).every((used) => done.has(used)),
    );
    if (ready.length === 0) throw new Error('The recipes of the content wait for each other.');
    for (const recipe of ready) {
      done.add(recipe.id);
      ordered.push(recipe);
    }
  }
  return ordered;
}
