export const reading = {
  title: {
    book: 'Contents',
    recipe: 'Recipe',
    account: 'Account',
  },
};
