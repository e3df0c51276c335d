import { z } from 'zod';

import { LIMITS } from '../limits';
import { caseState, day, grade, id, instant, person, reviewStep, sha256, text } from './common';

/** GET /api/reviews: the worklist. Own cases are not listed: an author does not sign them. */
export const reviewRow = z.object({
  caseId: id, code: z.string(), projectName: z.string(), question: z.string(), answer: z.object({ grade, text: z.string() }), state: caseState, author: person,
  reviewer: person.nullable(), heldUntil: instant.nullable(), dueOn: day.nullable(), waitingSince: instant, openQueries: z.number().int(), answeredQueries: z.number().int(),
  checked: z.number().int(), checksTotal: z.number().int(), readyToSign: z.boolean(), untested: z.number().int(),
});
export const reviewsResponse = z.object({ heldByYou: z.array(reviewRow), waiting: z.array(reviewRow), heldByOthers: z.array(reviewRow), yourCases: z.array(reviewRow) });

/** POST /api/cases/:caseId/claim | release (no body fields) */
export const claimRequest = z.strictObject({});
/** POST /api/cases/:caseId/checks */
export const checkRequest = z.strictObject({ step: reviewStep, checked: z.boolean(), revision: z.int().positive() });
/** POST /api/cases/:caseId/queries, POST /api/queries/:queryId/messages, POST /api/queries/:queryId/close */
export const openQueryRequest = z.strictObject({ step: reviewStep, stepKey: z.string().max(120).nullish(), text: text(LIMITS.query) });
export const queryMessageRequest = z.strictObject({ text: text(LIMITS.query) });
export const closeQueryRequest = z.strictObject({ text: z.string().trim().max(LIMITS.query).optional() });
/** POST /api/cases/:caseId/sign: bound to what was on screen (version and hash), with the password asked again. */
export const signRequest = z.strictObject({
  seenVersion: z.int().positive(), contentHash: sha256, meaning: z.enum(['review', 'approval']), password: z.string().min(1, 'Type your password.').max(LIMITS.passwordMax),
});
/** POST /api/cases/:caseId/addenda */
export const addendumRequest = z.strictObject({ text: text(LIMITS.query), password: z.string().min(1, 'Type your password.').max(LIMITS.passwordMax) });

export type ReviewRow = z.infer<typeof reviewRow>;
export type ReviewsResponse = z.infer<typeof reviewsResponse>;
export type SignRequest = z.input<typeof signRequest>;
