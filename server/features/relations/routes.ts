import { createHash } from 'node:crypto';

import type { Deps } from '@/server/deps';
import { route, type Route } from '@/server/http/route';
import { relationSummary } from '@/server/relations/summary';
import { evaluateRequest, evaluateResponse, invertRequest, invertResponse, relationsResponse, type RelationsResponse } from '@/shared/contracts/relations';
import { ENGINE_VERSION } from '@/shared/engine';
import { evaluateRelation, invertRelation } from './service';

/** The whole catalogue with its tag; it changes only with a new version of the server. */
function catalogue({ relations }: Deps): { answer: RelationsResponse; etag: string } {
  const answer = relationsResponse.parse({ engineVersion: ENGINE_VERSION, relations: relations.rows.map(relationSummary) });
  return { answer, etag: `"${createHash('sha256').update(JSON.stringify(answer)).digest('hex').slice(0, 20)}"` };
}

export function relationRoutes(deps: Deps): Route[] {
  let made: ReturnType<typeof catalogue> | null = null;
  return [
    route({ method: 'get', path: '/api/relations', access: 'none', summary: 'Every held relation with its parameters, domain, spread, source and rows', response: relationsResponse, trusted: true /* parsed once, when it is made */ },
      ({ req, res }) => {
        made ??= catalogue(deps);
        res.setHeader('Cache-Control', 'no-cache');
        res.setHeader('ETag', made.etag);
        if (req.headers['if-none-match']?.split(',').some((tag) => tag.trim().replace(/^W\//, '') === made?.etag)) res.status(304).end();
        return made.answer;
      }),

    route({ method: 'post', path: '/api/relations/evaluate', access: 'none', summary: 'J from an angle', body: evaluateRequest, response: evaluateResponse },
      ({ body }) => evaluateRelation(body, deps.relations)),

    route({ method: 'post', path: '/api/relations/invert', access: 'none', summary: 'Every angle that gives a J, and the arcs within a tolerance', body: invertRequest, response: invertResponse },
      ({ body }) => invertRelation(body, deps.relations)),
  ];
}
