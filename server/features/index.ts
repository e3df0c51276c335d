import type { Deps } from '@/server/deps';
import { docsRoutes } from '@/server/http/docs/routes';
import type { Route } from '@/server/http/route';
import { accountRoutes } from './account/routes';
import { adminRoutes } from './admin/routes';
import { caseFeatureRoutes } from './cases/wire';
import { healthRoutes } from './health/routes';
import { mailboxRoutes } from './mailbox/routes';
import { quickLookRoutes } from './quickLook/routes';
import { relationRoutes } from './relations/routes';
import { sessionRoutes } from './session/routes';
import { structureRoutes } from './structures/routes';
import { teamRoutes } from './team/routes';

/** Every route of the product, in one list: what is mounted is what the description of the API is made from. */
export function allRoutes(deps: Deps): Route[] {
  const routes: Route[] = [
    ...healthRoutes(deps),
    ...quickLookRoutes(deps),
    ...structureRoutes(),
    ...relationRoutes(deps),
    ...sessionRoutes(deps),
    ...accountRoutes(deps),
    ...teamRoutes(deps),
    ...adminRoutes(deps),
    ...caseFeatureRoutes(deps),
    ...mailboxRoutes(deps),
    ...docsRoutes(() => routes),
  ];
  return routes;
}
