export const workroom = {
  title: {
    shoots: 'Shoots',
    shoot: 'Drafting table',
    recipes: 'Recipes',
    recipe: 'Recipe at work',
    plates: 'Plates',
    bindery: 'Bindery',
    binding: 'Book at work',
    larder: 'Larder',
    atWork: 'At work: {title}',
    shootOf: 'Shoot: {title}',
    galley: 'Galley',
    galleyRecipe: 'Recipe in the galley',
  },
};
