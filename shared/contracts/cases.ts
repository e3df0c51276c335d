import { z } from 'zod';

import { LIMITS } from '../limits';
import { COUPLING_PATHS, EVIDENCE_KINDS, SIGN_STATES, type CaseContent } from '../types/case';
import { caseState, day, done, grade, id, instant, optionalText, person, reviewStep, sha256, signatureMeaning, text } from './common';
import { caseTrail } from './engine';
import { doubleBondFields, quickLookRequest, singleBondFields } from './quickLook';

/** Ids inside a content are made by whoever adds the row (a short random text); they never leave the case. */
const rowId = z.string().regex(/^[A-Za-z0-9_-]{1,40}$/);
const short = (max: number) => z.string().max(max, `At most ${max} characters.`);

export const reading = z.strictObject({
  id: rowId, atomA: short(LIMITS.atomLabel), atomB: short(LIMITS.atomLabel), nuclei: short(LIMITS.nuclei), path: z.enum(COUPLING_PATHS),
  j: short(LIMITS.hzText), se: short(LIMITS.hzText), partner: short(LIMITS.hzText), sign: z.enum(SIGN_STATES),
  where: short(LIMITS.where), method: short(LIMITS.method), note: short(LIMITS.note),
});
export const calculation = z.discriminatedUnion('bond', [
  z.strictObject({ id: rowId, readingId: rowId, ...singleBondFields }),
  z.strictObject({ id: rowId, readingId: rowId, ...doubleBondFields }),
]);
const angle = z.number().min(-180).max(540);
export const candidate = z.strictObject({
  id: rowId, name: short(LIMITS.candidateName), description: short(LIMITS.note),
  claims: z.array(z.discriminatedUnion('kind', [
    z.strictObject({ calculationId: rowId, kind: z.literal('geometry'), geometry: z.enum(['cis', 'trans']) }),
    z.strictObject({ calculationId: rowId, kind: z.literal('angle'), fromDeg: angle, toDeg: angle }),
  ])).max(LIMITS.calculations),
});
export const evidence = z.strictObject({
  id: rowId, kind: z.enum(EVIDENCE_KINDS), text: short(LIMITS.evidenceText), bearing: z.enum(['for', 'against', 'neutral']),
  candidateId: rowId.nullable(), attachmentIds: z.array(id).max(LIMITS.attachmentsPerCase),
});
export const personAnswer = z.strictObject({
  grade, candidateId: z.union([rowId, z.literal('none')]).nullable(), statement: short(LIMITS.statement), reasons: short(LIMITS.reasons),
  leftOpen: short(LIMITS.reasons), overrideReason: short(LIMITS.reasons),
});
/** The content of a draft may be half done; what sending to review needs is checked there, with one sentence per gap. */
export const caseContent = z.strictObject({
  format: z.literal(1),
  question: text(LIMITS.question),
  compound: z.strictObject({ name: short(LIMITS.compoundName), batch: short(LIMITS.batch), notebook: short(LIMITS.notebook),
    structureNote: short(LIMITS.structureNote), formerNames: z.array(short(LIMITS.compoundName)).max(50) }),
  conditions: z.strictObject({ fieldMHz: short(LIMITS.conditionNumber), solvent: short(LIMITS.solvent), temperatureK: short(LIMITS.conditionNumber), concentration: short(LIMITS.concentration) }),
  readings: z.array(reading).max(LIMITS.readings, `At most ${LIMITS.readings} readings a case.`),
  calculations: z.array(calculation).max(LIMITS.calculations),
  candidates: z.array(candidate).max(LIMITS.candidates, `At most ${LIMITS.candidates} candidates a case.`),
  evidence: z.array(evidence).max(LIMITS.evidence),
  answer: personAnswer.nullable(),
  tags: z.array(z.string().trim().min(1).max(LIMITS.tag)).max(LIMITS.tags),
});
export const caseContentMatchesTypes: CaseContent extends z.infer<typeof caseContent> ? true : false = true;

/** One line of the project log. */
export const caseRow = z.object({
  id, code: z.string(), projectId: id, projectName: z.string(), question: z.string(), compound: z.string(), batch: z.string(),
  keyReading: z.object({ label: z.string(), jText: z.string() }).nullable(),
  answer: z.object({ grade, text: z.string(), judged: z.boolean() }),
  state: caseState, author: person, reviewer: person.nullable(), dueOn: day.nullable(), changedAt: instant, revision: z.number().int(), tags: z.array(z.string()), supersededBy: z.string().nullable(),
});
export const caseListQuery = z.strictObject({
  q: z.string().trim().max(LIMITS.search).optional(), project: id.optional(), state: caseState.optional(), grade: grade.optional(), person: id.optional(),
  tag: z.string().max(LIMITS.tag).optional(), compound: z.string().max(LIMITS.compoundName).optional(),
  sort: z.enum(['changed', 'created', 'code', 'due']).optional(), cursor: z.string().max(400).optional(), limit: z.coerce.number().int().min(1).max(LIMITS.pageSizeMax).optional(),
});
export const caseListResponse = z.object({
  cases: z.array(caseRow), nextCursor: z.string().nullable(), total: z.number().int(), open: z.number().int(), notDecided: z.number().int(),
  filters: z.object({ projects: z.array(z.object({ id, key: z.string(), name: z.string(), role: z.string() })), people: z.array(person), tags: z.array(z.string()) }),
  /** cases outside the filter that match the search, to offer "Show all projects" */
  elsewhere: z.number().int(),
});

export const attachment = z.object({ id, fileName: z.string(), mediaType: z.string(), bytes: z.number().int(), sha256, by: person, at: instant });
export const comment = z.object({ id, target: z.string(), targetLabel: z.string(), revision: z.number().int(), text: z.string(), by: person, at: instant, resolvedBy: person.nullable(), resolvedAt: instant.nullable() });
export const queryMessage = z.object({ by: person, at: instant, text: z.string(), from: z.enum(['reviewer', 'author']) });
export const query = z.object({ id, number: z.number().int(), step: reviewStep, stepKey: z.string().nullable(), state: z.enum(['open', 'answered', 'closed']), messages: z.array(queryMessage) });
export const check = z.object({ step: reviewStep, state: z.enum(['open', 'checked', 'query']), by: person.nullable(), at: instant.nullable() });
export const signature = z.object({ meaning: signatureMeaning, name: z.string(), at: instant, contentHash: sha256, revision: z.number().int() });
export const addendum = z.object({ id, text: z.string(), by: z.string(), at: instant, hash: sha256 });
export const fieldChange = z.object({ path: z.string(), label: z.string(), before: z.string().nullable(), after: z.string().nullable() });
export const caseEvent = z.object({ at: instant, by: z.string(), kind: z.string(), text: z.string() });

export const caseMay = z.object({
  edit: z.boolean(), submit: z.boolean(), comment: z.boolean(), attach: z.boolean(), claim: z.boolean(), release: z.boolean(), check: z.boolean(), query: z.boolean(), answerQuery: z.boolean(),
  sign: z.boolean(), withdraw: z.boolean(), supersede: z.boolean(), reopen: z.boolean(), addend: z.boolean(),
  /** one sentence for each act that is refused now, keyed by act */
  why: z.record(z.string(), z.string()),
});
export const caseResponse = z.object({
  id, code: z.string(), project: z.object({ id, key: z.string(), name: z.string(), notebookPattern: z.string() }),
  state: caseState, version: z.number().int(), revision: z.number().int(), contentHash: sha256,
  author: person, createdAt: instant, changedAt: instant, changedBy: person,
  content: caseContent, trail: caseTrail,
  review: z.object({ reviewer: person.nullable(), heldUntil: instant.nullable(), dueOn: day.nullable(), checks: z.array(check), queries: z.array(query), submittedAt: instant.nullable() }),
  signatures: z.array(signature), addenda: z.array(addendum), comments: z.array(comment), attachments: z.array(attachment),
  /** since the case was first sent to review; [] while a first draft */
  changedSinceSubmission: z.array(fieldChange),
  supersededBy: z.object({ id, code: z.string() }).nullable(), supersedes: z.object({ id, code: z.string() }).nullable(),
  may: caseMay,
});

/** POST /api/cases: from a quick look (nothing retyped) or from a question alone. */
export const createCaseRequest = z.strictObject({
  projectId: id, question: text(LIMITS.question).optional(), compoundName: optionalText(LIMITS.compoundName).optional(), quickLook: quickLookRequest.optional(),
});
/** PUT /api/cases/:caseId: the whole content against the version the person saw. A reason is asked once the case has been in review. */
export const saveCaseRequest = z.strictObject({ seenVersion: z.int().positive(), content: caseContent, reason: optionalText(LIMITS.note).optional() });
export const saveCaseResponse = caseResponse;

/** POST /api/cases/:caseId/submit | withdraw | supersede | reopen */
export const submitRequest = z.strictObject({ seenVersion: z.int().positive(), dueOn: day.nullish(), password: z.string().min(1, 'Type your password.').max(LIMITS.passwordMax).optional() });
export const withdrawRequest = z.strictObject({ seenVersion: z.int().positive(), reason: text(LIMITS.note) });
export const supersedeRequest = z.strictObject({ seenVersion: z.int().positive(), reason: text(LIMITS.note) });
export const supersedeResponse = z.object({ newCaseId: id });
export const reopenRequest = z.strictObject({ seenVersion: z.int().positive() });

/** POST /api/cases/:caseId/comments, POST /api/comments/:commentId/resolve */
export const commentRequest = z.strictObject({ target: z.string().min(1).max(120), text: text(LIMITS.comment) });
export const resolveRequest = z.strictObject({ resolved: z.boolean() });

/** GET /api/cases/:caseId/revisions, /revisions/:n, /compare?from=1&to=3, /events */
export const revisionsResponse = z.object({ revisions: z.array(z.object({ number: z.number().int(), by: person, at: instant, reason: z.string(), contentHash: sha256, engineVersion: z.string(), changes: z.number().int(), signed: z.boolean() })) });
export const revisionResponse = z.object({ number: z.number().int(), by: person, at: instant, reason: z.string(), contentHash: sha256, content: caseContent, trail: caseTrail });
export const compareResponse = z.object({ from: z.number().int(), to: z.number().int(), changes: z.array(fieldChange) });
export const eventsResponse = z.object({ events: z.array(caseEvent) });

/** POST /api/cases/:caseId/attachments: the bytes as the body, always sent as `Content-Type: application/octet-stream`
 * (a form of another site cannot send that; the server finds the real type itself), name in `X-File-Name` (percent-encoded). GET /api/attachments/:id returns them. */
export const attachmentResponse = attachment;
export const doneResponse = done;

/** GET /api/cases/:caseId/si-text */
export const siTextResponse = z.object({ text: z.string() });

export type CaseRow = z.infer<typeof caseRow>;
export type CaseListQuery = z.input<typeof caseListQuery>;
export type CaseListResponse = z.infer<typeof caseListResponse>;
export type CaseResponse = z.infer<typeof caseResponse>;
export type CaseMay = z.infer<typeof caseMay>;
export type CaseQuery = z.infer<typeof query>;
export type CaseComment = z.infer<typeof comment>;
export type Attachment = z.infer<typeof attachment>;
export type FieldChange = z.infer<typeof fieldChange>;
export type CreateCaseRequest = z.input<typeof createCaseRequest>;
export type SaveCaseRequest = z.input<typeof saveCaseRequest>;
export type RevisionsResponse = z.infer<typeof revisionsResponse>;
export type RevisionResponse = z.infer<typeof revisionResponse>;
export type CompareResponse = z.infer<typeof compareResponse>;
export type EventsResponse = z.infer<typeof eventsResponse>;
