import type { Transaction } from 'sequelize';

import type { Actor } from '@/server/auth/actor';
import { utcDay } from '@/server/auth/actor';
import { AttachmentModel } from '@/server/db/models/AttachmentModel';
import { CaseModel } from '@/server/db/models/CaseModel';
import { CaseRevisionModel } from '@/server/db/models/CaseRevisionModel';
import { ProjectModel } from '@/server/db/models/ProjectModel';
import { inTransaction } from '@/server/db/transaction';
import { fieldProblem, Problem } from '@/server/http/problems';
import { diffContent } from '@/shared/engine';
import { casesText } from '@/shared/text/cases';
import type { CaseContent } from '@/shared/types/case';
import type { CaseTrail } from '@/shared/types/trail';
import type { CaseDeps, Origin } from './deps';
import { firstContent, type NewCase } from './firstContent';
import { gapsBeforeReview } from './gaps';
import { normalised, checkReferences } from './normalise';
import { noticeSubmitted } from './notices';
import { mayCreateCase, refusal, type CaseAct } from './policy';
import { recordSignature, hasAuthorship } from './signatures';
import { codeOf, columnsOf, contentOf, factsOf, filesOf, keepTags, lockCase, log, makeRevision, presentRevision, takeNumber, trailOf, type MadeRevision } from './store';

/** Refuses an act in the words of the policy. @throws Problem */
export async function demand(act: CaseAct, who: Actor, found: CaseModel, now: Date, tx: Transaction): Promise<void> {
  const refused = refusal(act, await factsOf(who, found, now, tx));
  if (refused) throw new Problem(refused.kind, refused.sentence);
}

/** The state of a case moved on while the person looked at it: told with where it stands now. @throws Problem changed-meanwhile */
export async function demandVersion(found: CaseModel, seenVersion: number, detail: string, tx: Transaction): Promise<void> {
  if (found.version === seenVersion) return;
  const revision = await presentRevision(found, tx);
  throw new Problem('changed-meanwhile', detail, {
    current: { version: found.version, revision: found.revision, savedBy: revision.savedByName, savedAt: revision.savedAt.toISOString(), state: found.state, content: contentOf(revision) },
  });
}

interface Write {
  who: Actor;
  found: CaseModel;
  number: number;
  content: CaseContent;
  made: MadeRevision;
  reason: string;
  changes: number;
}

async function addRevision({ who, found, number, made, reason, changes }: Omit<Write, 'content'>, at: Date, tx: Transaction): Promise<void> {
  await CaseRevisionModel.create({
    caseId: found.id, number, content: made.content, trail: made.trail, contentHash: made.hash, engineVersion: made.trailValue.engineVersion,
    savedById: who.id, savedByName: who.name, savedAt: at, reason, changes,
  }, { transaction: tx });
}

/** Opens a case and its first revision; the number is taken in the same transaction. */
async function insertCase(deps: CaseDeps, who: Actor, projectId: string, content: CaseContent, supersedesId: string | null, tx: Transaction,
  files: { id: string; sha256: string }[] = []): Promise<CaseModel> {
  const { number, key } = await takeNumber(projectId, tx);
  const at = deps.now();
  const made = makeRevision(deps, content, files);
  const { code, codeOrder } = codeOf(key, number);
  const found = await CaseModel.create({
    id: deps.newId(), projectId, number, code, codeOrder, authorId: who.id, state: 'draft', version: 1, revision: 1, contentHash: made.hash,
    firstSubmittedRevision: null, submittedRevision: null, submittedAt: null, reviewerId: null, claimedAt: null, heldUntil: null, dueOn: null,
    supersedesId, supersededById: null, createdAt: at, changedAt: at, changedById: who.id, ...columnsOf(code, who.name, content, made.trailValue),
  }, { transaction: tx });
  await addRevision({ who, found, number: 1, made, reason: '', changes: 0 }, at, tx);
  await keepTags(found.id, projectId, content.tags, tx);
  return found;
}

export const caseService = (deps: CaseDeps) => ({
  /** A case from a question, or from a quick look as it stands: nothing is typed again. @throws Problem */
  create: async (who: Actor, request: NewCase): Promise<string> => {
    const role = who.roleIn(request.projectId);
    if (role === null) throw new Problem('not-found', casesText.notFoundProject);
    if (!mayCreateCase(role)) throw new Problem('not-allowed', casesText.refused.readerOnly);
    const content = normalised(firstContent(deps, request), null);
    return inTransaction(deps.db, async (tx) => {
      const found = await insertCase(deps, who, request.projectId, content, null, tx);
      await log(found, who, deps.now(), 'created', request.quickLook ? casesText.event.createdFromQuickLook : casesText.event.created, tx);
      return found.id;
    });
  },

  /** Saves the whole content against the version the person saw. The same content again saves nothing new. @throws Problem */
  save: async (who: Actor, caseId: string, request: { seenVersion: number; content: CaseContent; reason?: string | undefined }): Promise<void> =>
    inTransaction(deps.db, async (tx) => {
      const found = await lockCase(who, caseId, tx);
      const role = refusal('edit', await factsOf(who, found, deps.now(), tx));
      if (role?.kind === 'not-allowed') throw new Problem(role.kind, role.sentence);
      await demandVersion(found, request.seenVersion, casesText.changed, tx);
      if (role) throw new Problem(role.kind, role.sentence);
      const before = contentOf(await presentRevision(found, tx));
      const content = normalised(request.content, before);
      const files = await filesOf(caseId, tx);
      checkReferences(content, new Set(files.map(({ id }) => id)));
      const made = makeRevision(deps, content, files);
      if (made.hash === found.contentHash) return;
      const reason = request.reason?.trim() ?? '';
      if (found.firstSubmittedRevision !== null && reason === '') throw fieldProblem('reason', casesText.reasonNeeded);
      const at = deps.now();
      const changes = diffContent(before, content).length;
      const number = found.revision + 1;
      await addRevision({ who, found, number, made, reason, changes }, at, tx);
      const author = await authorName(found, who, tx);
      await found.update({
        version: found.version + 1, revision: number, contentHash: made.hash, changedAt: at, changedById: who.id,
        ...columnsOf(found.code, author, content, made.trailValue),
      }, { transaction: tx });
      if (JSON.stringify(before.tags) !== JSON.stringify(content.tags)) await keepTags(caseId, found.projectId, content.tags, tx);
      await log(found, who, at, 'saved', reason === '' ? casesText.event.saved(number, changes) : casesText.event.reason(casesText.event.saved(number, changes), reason), tx);
    }),

  /** Sends the present revision to review and signs its authorship. @throws Problem, with one entry for each gap */
  submit: async (who: Actor, caseId: string, request: { seenVersion: number; dueOn?: string | null | undefined; password?: string | undefined }, { origin }: Origin): Promise<void> => {
    if (request.password !== undefined) await deps.confirm(who.id, request.password); // a slow hash is asked outside the transaction
    const sent = await inTransaction(deps.db, async (tx) => {
      const found = await lockCase(who, caseId, tx);
      const at = deps.now();
      const role = refusal('submit', await factsOf(who, found, at, tx));
      if (role?.kind === 'not-allowed') throw new Problem(role.kind, role.sentence);
      await demandVersion(found, request.seenVersion, casesText.changedState(found.state), tx);
      if (role) throw new Problem(role.kind, role.sentence);
      const revision = await presentRevision(found, tx);
      demandComplete(contentOf(revision), trailOf(revision));
      const dueOn = await dueDay(found, request.dueOn ?? null, at, tx);
      if (!(await hasAuthorship(found, who.id, tx))) {
        if (request.password === undefined) throw fieldProblem('password', casesText.passwordToSubmit);
        await recordSignature(deps, { found, revision, who, meaning: 'authorship', at }, tx);
        await log(found, who, at, 'authorship-signed', casesText.event.authorship(found.revision), tx);
      }
      const again = found.firstSubmittedRevision !== null;
      await found.update({
        state: 'in-review', version: found.version + 1, submittedRevision: found.revision, firstSubmittedRevision: found.firstSubmittedRevision ?? found.revision,
        submittedAt: at, dueOn, changedAt: at, changedById: who.id,
      }, { transaction: tx });
      await log(found, who, at, 'submitted', again ? casesText.event.resubmitted(found.revision) : casesText.event.submitted(found.revision), tx);
      return found;
    });
    await noticeSubmitted(deps, who, sent, origin);
  },

  withdraw: async (who: Actor, caseId: string, request: { seenVersion: number; reason: string }): Promise<void> =>
    inTransaction(deps.db, async (tx) => {
      const found = await lockCase(who, caseId, tx);
      const at = deps.now();
      await demand('withdraw', who, found, at, tx);
      await demandVersion(found, request.seenVersion, casesText.changedState(found.state), tx);
      // a signed case keeps who held it: nothing of its record changes but its state
      const freed = found.state === 'signed' ? {} : { reviewerId: null, claimedAt: null, heldUntil: null };
      await found.update({ state: 'withdrawn', version: found.version + 1, changedAt: at, changedById: who.id, ...freed }, { transaction: tx });
      await log(found, who, at, 'withdrawn', casesText.event.reason(casesText.event.withdrawn, request.reason), tx);
    }),

  /** Takes a case out of review, back to a draft. Queries stay open and are answered before it is sent again. */
  reopen: async (who: Actor, caseId: string, request: { seenVersion: number }): Promise<void> =>
    inTransaction(deps.db, async (tx) => {
      const found = await lockCase(who, caseId, tx);
      const at = deps.now();
      await demand('reopen', who, found, at, tx);
      await demandVersion(found, request.seenVersion, casesText.changedState(found.state), tx);
      await found.update({ state: 'draft', version: found.version + 1, submittedAt: null, reviewerId: null, claimedAt: null, heldUntil: null, changedAt: at, changedById: who.id }, { transaction: tx });
      await log(found, who, at, 'reopened', casesText.event.reopened, tx);
    }),

  /** Opens a draft that copies a signed case; the old one is superseded at the moment the new one is signed, and stands until then. */
  supersede: async (who: Actor, caseId: string, request: { seenVersion: number; reason: string }): Promise<string> =>
    inTransaction(deps.db, async (tx) => {
      const found = await lockCase(who, caseId, tx);
      const at = deps.now();
      await demand('supersede', who, found, at, tx);
      await demandVersion(found, request.seenVersion, casesText.changedState(found.state), tx);
      const old = contentOf(await presentRevision(found, tx));
      const files = await AttachmentModel.findAll({ where: { caseId }, transaction: tx, raw: true });
      const newIds = new Map(files.map(({ id }) => [id, deps.newId()]));
      const content: CaseContent = {
        ...old, evidence: old.evidence.map((entry) => ({ ...entry, attachmentIds: entry.attachmentIds.flatMap((id) => newIds.get(id) ?? []) })),
      };
      const copied = files.map((file) => ({ ...file, id: newIds.get(file.id) ?? deps.newId() }));
      const next = await insertCase(deps, who, found.projectId, content, found.id, tx, copied);
      if (copied.length > 0) await AttachmentModel.bulkCreate(copied.map((file) => ({ ...file, caseId: next.id })), { transaction: tx });
      await log(next, who, at, 'created', casesText.event.reason(casesText.event.createdToSupersede(found.code), request.reason), tx);
      await log(found, who, at, 'supersede-started', casesText.event.reason(casesText.event.supersedeStarted(next.code), request.reason), tx);
      return next.id;
    }),
});
export type CaseService = ReturnType<typeof caseService>;

function demandComplete(content: CaseContent, trail: CaseTrail): void {
  const gaps = gapsBeforeReview(content, trail);
  const [first] = gaps;
  if (first) throw new Problem('invalid-input', first.detail, { errors: gaps });
}

/** The day asked for, else the one given before, else as many days from now as the project takes for a review. */
async function dueDay(found: CaseModel, asked: string | null, now: Date, tx: Transaction): Promise<string> {
  if (asked !== null) {
    if (asked < utcDay(now)) throw fieldProblem('dueOn', casesText.pastDay);
    return asked;
  }
  if (found.dueOn !== null && found.dueOn >= utcDay(now)) return found.dueOn;
  const project = await ProjectModel.findByPk(found.projectId, { attributes: ['reviewDays'], transaction: tx });
  return utcDay(new Date(now.getTime() + (project?.reviewDays ?? 7) * 24 * 3600 * 1000));
}

async function authorName(found: CaseModel, who: Actor, tx: Transaction): Promise<string> {
  if (found.authorId === who.id) return who.name;
  const first = await CaseRevisionModel.findOne({ where: { caseId: found.id, number: 1 }, attributes: ['savedByName'], transaction: tx });
  return first?.savedByName ?? '';
}
