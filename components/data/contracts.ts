import type { z } from 'zod';

import * as cases from '@/shared/contracts/cases';
import { done } from '@/shared/contracts/common';
import { healthResponse } from '@/shared/contracts/health';
import { doubleBondsResponse, quickLookResponse } from '@/shared/contracts/quickLook';
import { evaluateResponse, invertResponse, relationsResponse } from '@/shared/contracts/relations';
import { reviewsResponse } from '@/shared/contracts/reviews';
import { invitationView, sessionResponse } from '@/shared/contracts/session';
import { adminUsersResponse, mailboxResponse, projectResponse, teamResponse } from '@/shared/contracts/team';

/** Every answer a screen may ask for, by name. Loaded once, by parse.ts. */
export const responses = {
  done,
  healthResponse,
  sessionResponse,
  invitationView,
  quickLookResponse,
  doubleBondsResponse,
  relationsResponse,
  evaluateResponse,
  invertResponse,
  caseListResponse: cases.caseListResponse,
  caseResponse: cases.caseResponse,
  supersedeResponse: cases.supersedeResponse,
  revisionsResponse: cases.revisionsResponse,
  revisionResponse: cases.revisionResponse,
  compareResponse: cases.compareResponse,
  eventsResponse: cases.eventsResponse,
  attachmentResponse: cases.attachmentResponse,
  siTextResponse: cases.siTextResponse,
  reviewsResponse,
  teamResponse,
  projectResponse,
  adminUsersResponse,
  mailboxResponse,
};

export function readAs<Schema extends z.ZodType>(schema: Schema, json: unknown): { ok: true; value: z.infer<Schema> } | { ok: false } {
  const read = schema.safeParse(json);
  return read.success ? { ok: true, value: read.data } : { ok: false };
}
