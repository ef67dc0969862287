import type { Deps } from './deps.ts';
import type { Route } from './http/operation.ts';
import { boatRoutes } from './resources/boats/routes.ts';
import { catalogRoutes } from './resources/catalog/routes.ts';
import { editionRoutes } from './resources/editions/routes.ts';
import { importRoutes } from './resources/imports/routes.ts';
import { keyRoutes } from './resources/keys/routes.ts';
import { questionRoutes } from './resources/questions/routes.ts';
import { searchRoutes } from './resources/search/routes.ts';
import { sessionRoutes } from './resources/session/routes.ts';

/** Everything the API can do. */
export function allRoutes(deps: Deps): Route[] {
  return [
    ...catalogRoutes(deps),
    ...searchRoutes(deps),
    ...editionRoutes(deps),
    ...questionRoutes(deps),
    ...sessionRoutes(deps),
    ...keyRoutes(deps),
    ...boatRoutes(deps),
    ...importRoutes(deps),
  ];
}
