import type { Route } from './http/registry.ts';
import { imprintRoutes } from './imprint/imprint.routes.ts';
import { larderRoutes } from './larder/larder.routes.ts';
import { descriptionRoutes } from './http/openapi.routes.ts';
import { peopleRoutes } from './people/people.routes.ts';
import { sessionRoutes } from './people/session.routes.ts';

/** Every route of the house, one line a feature. */
export const allRoutes: readonly Route[] = [
  ...sessionRoutes,
  ...peopleRoutes,
  ...imprintRoutes,
  ...larderRoutes,
  ...descriptionRoutes,
];
