export const office = {
  title: {
    people: 'People',
    tiers: 'Tiers and prices',
    imprint: 'Imprint',
  },
};
