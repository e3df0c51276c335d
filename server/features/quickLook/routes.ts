import type { Deps } from '@/server/deps';
import { route, type Route } from '@/server/http/route';
import { quickLookRequest, quickLookResponse } from '@/shared/contracts/quickLook';
import { lookAt } from './service';

export const quickLookRoutes = ({ relations }: Deps): Route[] => [
  route({
    method: 'post', path: '/api/quick-look', access: 'none', summary: 'What one measured coupling allows: angles of a single bond, or the geometry of a double bond',
    body: quickLookRequest, response: quickLookResponse,
    // Asked at each key press, and its answer is made by the engine from its own types, never from stored data: nothing
    // private could slip out. Development and tests hold it to the contract.
    trusted: true,
  }, ({ body }) => lookAt(body, relations)),
];
