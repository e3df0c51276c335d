import type { Deps } from '@/server/deps';
import type { Route } from '@/server/http/route';
import { healthRoutes } from './health/routes';
import { sessionRoutes } from './session/routes';

/** Every route of the product, in one list: what is mounted is what the description of the API is made from. */
export const allRoutes = (deps: Deps): Route[] => [
  ...healthRoutes(deps),
  ...sessionRoutes(deps),
];
