import { z } from 'zod';

import type { Env } from '@/server/env';
import { route, type Route } from '@/server/http/route';
import { siteAddress } from '@/server/mail/links';
import {
  caseListQuery, caseListResponse, caseResponse, commentRequest, compareResponse, createCaseRequest, eventsResponse, reopenRequest, resolveRequest, revisionResponse,
  revisionsResponse, saveCaseRequest, saveCaseResponse, submitRequest, supersedeRequest, supersedeResponse, withdrawRequest,
} from '@/shared/contracts/cases';
import { id } from '@/shared/contracts/common';
import type { CaseDeps } from './deps';
import { caseList } from './list';
import type { CaseReads } from './read';
import type { remarkService } from './remarks';
import { caseService } from './service';
import type { resolveQuickLook } from './quickLookInput';

const revisionNumber = z.coerce.number().int().min(1).max(1_000_000);
const revisionParams = z.object({ caseId: id, revision: revisionNumber });
const compareQuery = z.strictObject({ from: revisionNumber, to: revisionNumber });

export const caseRoutes = (deps: CaseDeps, env: Env, reads: CaseReads, remarks: ReturnType<typeof remarkService>, resolve: typeof resolveQuickLook): Route[] => {
  const service = caseService(deps);
  const list = caseList(deps);
  return [
    route({ method: 'get', path: '/api/cases', access: 'person', summary: 'A page of the project log', query: caseListQuery, response: caseListResponse }, ({ who, query }) => list(who, query)),

    route({ method: 'post', path: '/api/cases', access: 'person', summary: 'Open a case, from a quick look or from a question', body: createCaseRequest, response: caseResponse, status: 201 },
      async ({ who, body }) => {
        const { quickLook, ...rest } = body;
        return reads.one(who, await service.create(who, { ...rest, quickLook: quickLook ? await resolve(quickLook) : undefined }));
      }),

    route({ method: 'get', path: '/api/cases/:caseId', access: 'person', summary: 'A case with its trail and review', response: caseResponse }, ({ who, params }) => reads.one(who, params.caseId)),

    route({ method: 'put', path: '/api/cases/:caseId', access: 'person', summary: 'Save the whole content against the version that was seen', body: saveCaseRequest, response: saveCaseResponse },
      async ({ who, params, body }) => {
        await service.save(who, params.caseId, body);
        return reads.one(who, params.caseId);
      }),

    route({ method: 'post', path: '/api/cases/:caseId/submit', access: 'person', summary: 'Send a case to review, signing its authorship', body: submitRequest, response: caseResponse },
      async ({ who, params, body, req }) => {
        await service.submit(who, params.caseId, body, { origin: siteAddress(env, req) });
        return reads.one(who, params.caseId);
      }),

    route({ method: 'post', path: '/api/cases/:caseId/withdraw', access: 'person', summary: 'Withdraw a case with a reason; its record stays', body: withdrawRequest, response: caseResponse },
      async ({ who, params, body }) => {
        await service.withdraw(who, params.caseId, body);
        return reads.one(who, params.caseId);
      }),

    route({ method: 'post', path: '/api/cases/:caseId/reopen', access: 'person', summary: 'Take a case out of review, back to a draft', body: reopenRequest, response: caseResponse },
      async ({ who, params, body }) => {
        await service.reopen(who, params.caseId, body);
        return reads.one(who, params.caseId);
      }),

    route({ method: 'post', path: '/api/cases/:caseId/supersede', access: 'person', summary: 'Open a case that supersedes this signed one once it is signed itself', body: supersedeRequest, response: supersedeResponse, status: 201 },
      async ({ who, params, body }) => ({ newCaseId: await service.supersede(who, params.caseId, body) })),

    route({ method: 'post', path: '/api/cases/:caseId/comments', access: 'person', summary: 'Comment at a value', body: commentRequest, response: caseResponse },
      async ({ who, params, body, req }) => {
        await remarks.comment(who, params.caseId, body, { origin: siteAddress(env, req) });
        return reads.one(who, params.caseId);
      }),

    route({ method: 'post', path: '/api/comments/:commentId/resolve', access: 'person', summary: 'Resolve a comment, or open it again', body: resolveRequest, response: caseResponse },
      async ({ who, params, body }) => reads.one(who, await remarks.resolve(who, params.commentId, body.resolved))),

    route({ method: 'get', path: '/api/cases/:caseId/revisions', access: 'person', summary: 'Every save of a case', response: revisionsResponse }, ({ who, params }) => reads.revisions(who, params.caseId)),

    route({ method: 'get', path: '/api/cases/:caseId/revisions/:revision', access: 'person', summary: 'One revision, whole', params: revisionParams, response: revisionResponse },
      ({ who, params }) => reads.revision(who, params.caseId, params.revision)),

    route({ method: 'get', path: '/api/cases/:caseId/compare', access: 'person', summary: 'What changed between two revisions, field by field', query: compareQuery, response: compareResponse },
      ({ who, params, query }) => reads.compare(who, params.caseId, query.from, query.to)),

    route({ method: 'get', path: '/api/cases/:caseId/events', access: 'person', summary: 'What happened to a case', response: eventsResponse }, ({ who, params }) => reads.events(who, params.caseId)),
  ];
};
