import { defineError } from '../errors.ts';

export const recipeNotFound = defineError('recipes.not_found', 404, 'There is no such recipe.');
export const revisionNotFound = defineError('recipes.not_found', 404, 'The recipe has no such revision.');
export const componentCycle = defineError('recipes.cycle', 422, 'Recipes cannot be made of each other in a ring.');
export const unknownComponent = defineError('recipes.unknown_component', 422, 'A line uses a recipe that is not here.');
export const unknownLarderItem = defineError(
  'recipes.unknown_larder_item',
  422,
  'A line names something that is not in the larder.',
);
export const transitionRefused = defineError(
  'recipes.transition_refused',
  409,
  'The recipe cannot go from its state to that one.',
);
export const recipeIncomplete = defineError(
  'recipes.incomplete',
  422,
  'Something required is missing before the recipe can be cleared.',
);
export const queriesOpen = defineError(
  'recipes.queries_open',
  409,
  'A query in the margin is open; answer it before the recipe is cleared.',
);
export const recipeSlugTaken = defineError('recipes.slug_taken', 409, 'Another recipe has that address.');
export const queryNotFound = defineError('queries.not_found', 404, 'There is no such query.');
export const queryStateRefused = defineError('queries.state_refused', 409, 'The query is closed already.');
