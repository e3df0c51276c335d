import { route, type Route } from '@/server/http/route';
import type { CaseDeps } from '@/server/features/cases/deps';
import type { CaseReads } from '@/server/features/cases/read';
import { siteAddress } from '@/server/mail/links';
import type { Env } from '@/server/env';
import { caseResponse } from '@/shared/contracts/cases';
import { addendumRequest, checkRequest, claimRequest, closeQueryRequest, openQueryRequest, queryMessageRequest, reviewsResponse, signRequest } from '@/shared/contracts/reviews';
import type { remarkService } from '@/server/features/cases/remarks';
import { reviewReads } from './read';
import { reviewService } from './service';

export const reviewRoutes = (deps: CaseDeps, env: Env, reads: CaseReads, remarks: ReturnType<typeof remarkService>): Route[] => {
  const service = reviewService(deps);
  const worklist = reviewReads(deps);
  return [
    route({ method: 'get', path: '/api/reviews', access: 'person', summary: 'The worklist of a reviewer', response: reviewsResponse }, ({ who }) => worklist(who)),

    route({ method: 'post', path: '/api/cases/:caseId/claim', access: 'person', summary: 'Take a case for review', body: claimRequest, response: caseResponse },
      async ({ who, params }) => {
        await service.claim(who, params.caseId);
        return reads.one(who, params.caseId);
      }),

    route({ method: 'post', path: '/api/cases/:caseId/release', access: 'person', summary: 'Give a taken case back', body: claimRequest, response: caseResponse },
      async ({ who, params, req }) => {
        await service.release(who, params.caseId, { origin: siteAddress(env, req) });
        return reads.one(who, params.caseId);
      }),

    route({ method: 'post', path: '/api/cases/:caseId/checks', access: 'person', summary: 'Check a step of the review, or take the check back', body: checkRequest, response: caseResponse },
      async ({ who, params, body }) => {
        await service.check(who, params.caseId, body);
        return reads.one(who, params.caseId);
      }),

    route({ method: 'post', path: '/api/cases/:caseId/queries', access: 'person', summary: 'Open a query at a step of the trail', body: openQueryRequest, response: caseResponse },
      async ({ who, params, body, req }) => {
        await service.openQuery(who, params.caseId, body, { origin: siteAddress(env, req) });
        return reads.one(who, params.caseId);
      }),

    route({ method: 'post', path: '/api/queries/:queryId/messages', access: 'person', summary: 'Answer a query, or ask again', body: queryMessageRequest, response: caseResponse },
      async ({ who, params, body, req }) => reads.one(who, await service.reply(who, params.queryId, body.text, { origin: siteAddress(env, req) }))),

    route({ method: 'post', path: '/api/queries/:queryId/close', access: 'person', summary: 'Close a query', body: closeQueryRequest, response: caseResponse },
      async ({ who, params, body }) => reads.one(who, await service.close(who, params.queryId, body.text))),

    route({ method: 'post', path: '/api/cases/:caseId/sign', access: 'person', summary: 'Sign the revision on screen', body: signRequest, response: caseResponse },
      async ({ who, params, body, req }) => {
        await service.sign(who, params.caseId, body, { origin: siteAddress(env, req) });
        return reads.one(who, params.caseId);
      }),

    route({ method: 'post', path: '/api/cases/:caseId/addenda', access: 'person', summary: 'Add a signed addendum to a signed case', body: addendumRequest, response: caseResponse },
      async ({ who, params, body }) => {
        await remarks.addend(who, params.caseId, body);
        return reads.one(who, params.caseId);
      }),
  ];
};
