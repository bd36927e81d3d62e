import type { Route } from './http/registry.ts';
import { bookRoutes } from './books/books.routes.ts';
import { editionRoutes } from './editions/editions.routes.ts';
import { imprintRoutes } from './imprint/imprint.routes.ts';
import { larderRoutes } from './larder/larder.routes.ts';
import { descriptionRoutes } from './http/openapi.routes.ts';
import { plateRoutes } from './plates/plates.routes.ts';
import { readingRoutes } from './reading/reading.routes.ts';
import { peopleRoutes } from './people/people.routes.ts';
import { sessionRoutes } from './people/session.routes.ts';
import { demoLetterRoutes } from './demo/letters.routes.ts';
import { membershipRoutes } from './memberships/memberships.routes.ts';
import { paymentRoutes } from './payments/payments.routes.ts';
import { tierRoutes } from './tiers/tiers.routes.ts';
import { recipeRoutes } from './recipes/recipes.routes.ts';
import { shootRoutes } from './shoots/shoots.routes.ts';

/** Every route of the house, one line a feature; what is asked most stands first, because it is looked for in this order. */
export const allRoutes: readonly Route[] = [
  ...readingRoutes,
  ...sessionRoutes,
  ...peopleRoutes,
  ...imprintRoutes,
  ...larderRoutes,
  ...plateRoutes,
  ...shootRoutes,
  ...recipeRoutes,
  ...bookRoutes,
  ...editionRoutes,
  ...tierRoutes,
  ...paymentRoutes,
  ...membershipRoutes,
  ...demoLetterRoutes,
  ...descriptionRoutes,
];
