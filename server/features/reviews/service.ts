import { Op, type Transaction } from 'sequelize';

import type { Actor } from '@/server/auth/actor';
import { CaseModel } from '@/server/db/models/CaseModel';
import { ProjectModel } from '@/server/db/models/ProjectModel';
import { QueryMessageModel, type QuerySender } from '@/server/db/models/QueryMessageModel';
import { ReviewCheckModel } from '@/server/db/models/ReviewCheckModel';
import { ReviewQueryModel, type QueryState } from '@/server/db/models/ReviewQueryModel';
import { inTransaction } from '@/server/db/transaction';
import { fieldProblem, Problem } from '@/server/http/problems';
import type { CaseDeps, Origin } from '@/server/features/cases/deps';
import { noticeToOther, noticeToPerson } from '@/server/features/cases/notices';
import { refusal } from '@/server/features/cases/policy';
import { demand, demandVersion } from '@/server/features/cases/service';
import { recordSignature } from '@/server/features/cases/signatures';
import { factsOf, holderOf, lockCase, log, presentRevision, trailOf } from '@/server/features/cases/store';
import { plainText } from '@/shared/format/richText';
import { casesText } from '@/shared/text/cases';
import { noticesText } from '@/shared/text/notices';
import { meaningWord, reviewsText, reviewStepWord } from '@/shared/text/reviews';
import type { ReviewStep } from '@/shared/types/trail';

const words = reviewsText;

/**
 * Where a case in review stands: queried while a query waits for an answer or its close, or while the author has changed the
 * content without sending it; in review else. Drafts and closed cases keep their state.
 */
async function settleState(found: CaseModel, tx: Transaction): Promise<void> {
  if (found.state !== 'in-review' && found.state !== 'queried') return;
  // sent back with its answers, a case stays in review while the reviewer reads them: only an open query turns it round
  const waits: QueryState[] = found.state === 'in-review' ? ['open'] : ['open', 'answered'];
  const waiting = await ReviewQueryModel.count({ where: { caseId: found.id, state: waits }, transaction: tx });
  const state = waiting > 0 || found.submittedRevision !== found.revision ? 'queried' : 'in-review';
  if (state !== found.state) await found.update({ state, version: found.version + 1 }, { transaction: tx });
}

/** The query in a project of this person, with its case locked. @throws Problem not-found */
async function lockQuery(who: Actor, queryId: string, tx: Transaction): Promise<{ query: ReviewQueryModel; found: CaseModel }> {
  const pointer = await ReviewQueryModel.findByPk(queryId, { attributes: ['caseId'], transaction: tx });
  const visible = pointer && await CaseModel.count({ where: { id: pointer.caseId, projectId: { [Op.in]: [...who.projectIds] } }, transaction: tx });
  if (!pointer || !visible) throw new Problem('not-found', words.noSuchQuery);
  const found = await lockCase(who, pointer.caseId, tx);
  return { found, query: await ReviewQueryModel.findByPk(queryId, { transaction: tx, rejectOnEmpty: true }) };
}

export const reviewService = (deps: CaseDeps) => {
  const message = (query: ReviewQueryModel, who: Actor, sender: QuerySender, text: string, at: Date, tx: Transaction) =>
    QueryMessageModel.create({ queryId: query.id, sender, text, byId: who.id, byName: who.name, at }, { transaction: tx });

  return {
    /** Takes a case for review, or prolongs one's own claim. Of two at the same moment the row lock lets one win. */
    claim: async (who: Actor, caseId: string): Promise<void> =>
      inTransaction(deps.db, async (tx) => {
        const found = await lockCase(who, caseId, tx);
        const at = deps.now();
        await demand('claim', who, found, at, tx);
        const project = await ProjectModel.findByPk(found.projectId, { attributes: ['claimHours'], transaction: tx, rejectOnEmpty: true });
        const renewed = holderOf(found, at) === who.id;
        await found.update({ reviewerId: who.id, claimedAt: at, heldUntil: new Date(at.getTime() + project.claimHours * 3600 * 1000) }, { transaction: tx });
        if (!renewed) await log(found, who, at, 'claimed', words.event.claimed, tx);
      }),

    release: async (who: Actor, caseId: string, { origin }: Origin): Promise<void> => {
      const { found, freed } = await inTransaction(deps.db, async (tx) => {
        const row = await lockCase(who, caseId, tx);
        const at = deps.now();
        const facts = await factsOf(who, row, at, tx);
        const refused = refusal('release', facts);
        if (refused) throw new Problem(refused.kind, refused.sentence);
        const other = facts.isHolder ? null : row.reviewerId;
        await row.update({ reviewerId: null, claimedAt: null, heldUntil: null }, { transaction: tx });
        await log(row, who, at, 'released', other ? words.event.releasedFor(facts.heldBy?.name ?? '') : words.event.released, tx);
        return { found: row, freed: other };
      });
      if (freed) await noticeToPerson(deps, freed, found, noticesText.released({ code: found.code, question: plainText(found.question) }, who.name), origin);
    },

    /** Checks a step, or takes the check back. A check counts for the revision that was looked at, and for no later one. */
    check: async (who: Actor, caseId: string, request: { step: ReviewStep; checked: boolean; revision: number }): Promise<void> =>
      inTransaction(deps.db, async (tx) => {
        const found = await lockCase(who, caseId, tx);
        const at = deps.now();
        await demand('check', who, found, at, tx);
        if (request.revision !== found.revision) await demandVersion(found, -1, words.otherRevision, tx);
        const { step } = request;
        const before = await ReviewCheckModel.findOne({ where: { caseId, step }, transaction: tx });
        const stands = before !== null && before.revision === found.revision;
        if (stands === request.checked) return;
        await ReviewCheckModel.destroy({ where: { caseId, step }, transaction: tx });
        if (request.checked) await ReviewCheckModel.create({ caseId, step, revision: found.revision, byId: who.id, at }, { transaction: tx });
        const stepWord = reviewStepWord[step];
        await log(found, who, at, request.checked ? 'checked' : 'unchecked', request.checked ? words.event.checked(stepWord) : words.event.unchecked(stepWord), tx);
      }),

    openQuery: async (who: Actor, caseId: string, request: { step: ReviewStep; stepKey?: string | null | undefined; text: string }, { origin }: Origin): Promise<void> => {
      const found = await inTransaction(deps.db, async (tx) => {
        const row = await lockCase(who, caseId, tx);
        const at = deps.now();
        await demand('query', who, row, at, tx);
        const stepKey = request.stepKey ?? null;
        if (stepKey !== null && !trailOf(await presentRevision(row, tx)).steps.some(({ key }) => key === stepKey)) throw fieldProblem('stepKey', words.noSuchStep);
        const last = await ReviewQueryModel.max<number, ReviewQueryModel>('number', { where: { caseId }, transaction: tx });
        const query = await ReviewQueryModel.create({
          id: deps.newId(), caseId, number: (Number(last) || 0) + 1, step: request.step, stepKey, state: 'open', revision: row.revision,
          openedById: who.id, openedAt: at, closedById: null, closedAt: null,
        }, { transaction: tx });
        await message(query, who, 'reviewer', request.text, at, tx);
        await log(row, who, at, 'query-opened', words.event.queryOpened(query.number, reviewStepWord[request.step]), tx);
        await settleState(row, tx);
        return row;
      });
      await noticeToOther(deps, who, found, noticesText.queryOpened, origin);
    },

    /** The author's message answers a query; one of the reviewer asks again. */
    reply: async (who: Actor, queryId: string, text: string, { origin }: Origin): Promise<string> => {
      const found = await inTransaction(deps.db, async (tx) => {
        const { query, found: row } = await lockQuery(who, queryId, tx);
        const at = deps.now();
        await demand('answerQuery', who, row, at, tx);
        if (query.state === 'closed') throw new Problem('wrong-state', words.queryClosed);
        const fromAuthor = row.authorId === who.id;
        await message(query, who, fromAuthor ? 'author' : 'reviewer', text, at, tx);
        await query.update({ state: fromAuthor ? 'answered' : 'open' }, { transaction: tx });
        await log(row, who, at, fromAuthor ? 'query-answered' : 'query-asked-again', fromAuthor ? words.event.queryAnswered(query.number) : words.event.queryAskedAgain(query.number), tx);
        await settleState(row, tx);
        return row;
      });
      await noticeToOther(deps, who, found, noticesText.queryAnswered, origin);
      return found.id;
    },

    /** The reviewer who holds the case closes a query; with the last one the case is in review again. */
    close: async (who: Actor, queryId: string, text: string | undefined): Promise<string> =>
      inTransaction(deps.db, async (tx) => {
        const { query, found } = await lockQuery(who, queryId, tx);
        const at = deps.now();
        await demand('query', who, found, at, tx);
        if (query.state === 'closed') throw new Problem('wrong-state', words.queryClosed);
        if (text !== undefined && text !== '') await message(query, who, 'reviewer', text, at, tx);
        await query.update({ state: 'closed', closedById: who.id, closedAt: at }, { transaction: tx });
        await log(found, who, at, 'query-closed', words.event.queryClosed(query.number), tx);
        await settleState(found, tx);
        return found.id;
      }),

    /**
     * Signs the revision on screen: version and hash must be the ones that were seen, the password is asked again, and every
     * rule is looked at once more behind the row lock. A case that this one was made to supersede is superseded with it.
     */
    sign: async (who: Actor, caseId: string, request: { seenVersion: number; contentHash: string; meaning: 'review' | 'approval'; password: string }, { origin }: Origin): Promise<void> => {
      await deps.confirm(who.id, request.password);
      const signed = await inTransaction(deps.db, async (tx) => {
        const found = await lockCase(who, caseId, tx);
        const at = deps.now();
        await demand('sign', who, found, at, tx);
        if (found.contentHash !== request.contentHash) await demandVersion(found, -1, words.seen, tx);
        await demandVersion(found, request.seenVersion, words.seen, tx);
        const revision = await presentRevision(found, tx);
        await recordSignature(deps, { found, revision, who, meaning: request.meaning, at }, tx);
        await found.update({ state: 'signed', version: found.version + 1, changedAt: at, changedById: who.id, heldUntil: null }, { transaction: tx });
        await log(found, who, at, 'signed', words.event.signed(meaningWord[request.meaning], found.revision), tx);
        if (found.supersedesId !== null) await supersedeOld(found, who, at, tx);
        return found;
      });
      await noticeToOther(deps, who, signed, noticesText.signed, origin);
    },
  };
};
export type ReviewService = ReturnType<typeof reviewService>;

async function supersedeOld(next: CaseModel, who: Actor, at: Date, tx: Transaction): Promise<void> {
  const old = await CaseModel.findByPk(next.supersedesId ?? '', { transaction: tx, lock: tx.LOCK.UPDATE });
  if (!old || old.state !== 'signed') return;
  await old.update({ state: 'superseded', supersededById: next.id, version: old.version + 1, changedAt: at, changedById: who.id }, { transaction: tx });
  await log(old, who, at, 'superseded', casesText.event.superseded(next.code), tx);
}
