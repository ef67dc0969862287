import type { Deps } from './deps.ts';
import type { Route } from './http/operation.ts';
import { accountRoutes } from './resources/accounts/routes.ts';
import { auditRoutes } from './resources/audit/routes.ts';
import { batchRoutes } from './resources/batch/routes.ts';
import { boatRoutes } from './resources/boats/routes.ts';
import { catalogRoutes } from './resources/catalog/routes.ts';
import { changeRoutes } from './resources/changes/routes.ts';
import { editionRoutes } from './resources/editions/routes.ts';
import { exportRoutes } from './resources/exports/routes.ts';
import { fitRoutes } from './resources/fits/routes.ts';
import { healthRoutes } from './resources/health/routes.ts';
import { reviewRoutes } from './resources/imports/review-routes.ts';
import { importRoutes } from './resources/imports/routes.ts';
import { invitationRoutes } from './resources/invitations/routes.ts';
import { keyRoutes } from './resources/keys/routes.ts';
import { levelRoutes } from './resources/levels/routes.ts';
import { limitRoutes } from './resources/limits/routes.ts';
import { mailRoutes } from './resources/mail/routes.ts';
import { matchRoutes } from './resources/matches/routes.ts';
import { meRoutes } from './resources/me/routes.ts';
import { questionRoutes } from './resources/questions/routes.ts';
import { resolveRoutes } from './resources/resolve/routes.ts';
import { searchRoutes } from './resources/search/routes.ts';
import { secondFactorRoutes } from './resources/second-factor/routes.ts';
import { sessionRoutes } from './resources/session/routes.ts';
import { shareRoutes } from './resources/shares/routes.ts';
import { usageRoutes } from './resources/usage/routes.ts';
import { userRoutes } from './resources/users/routes.ts';
import { webhookRoutes } from './resources/webhooks/routes.ts';

/** Everything the API can do. */
export function allRoutes(deps: Deps): Route[] {
  return [
    ...catalogRoutes(deps),
    ...searchRoutes(deps),
    ...editionRoutes(deps),
    ...changeRoutes(deps),
    ...exportRoutes(deps),
    ...resolveRoutes(deps),
    ...questionRoutes(deps),
    ...batchRoutes(deps),
    ...matchRoutes(deps),
    ...levelRoutes(),
    ...sessionRoutes(deps),
    ...accountRoutes(deps),
    ...meRoutes(deps),
    ...secondFactorRoutes(deps),
    ...keyRoutes(deps),
    ...usageRoutes(deps),
    ...webhookRoutes(deps),
    ...limitRoutes(deps),
    ...boatRoutes(deps),
    ...fitRoutes(deps),
    ...shareRoutes(deps),
    ...importRoutes(deps),
    ...reviewRoutes(deps),
    ...userRoutes(deps),
    ...invitationRoutes(deps),
    ...auditRoutes(deps),
    ...mailRoutes(deps),
    ...healthRoutes(deps),
  ];
}
