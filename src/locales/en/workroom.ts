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
    galley: 'Galley',
    galleyRecipe: 'Recipe in the galley',
  },
};
