import { Op } from 'sequelize';

import type { Actor } from '@/server/auth/actor';
import { AddendumModel } from '@/server/db/models/AddendumModel';
import { CaseModel } from '@/server/db/models/CaseModel';
import { CommentModel } from '@/server/db/models/CommentModel';
import { inTransaction } from '@/server/db/transaction';
import { fieldProblem, Problem } from '@/server/http/problems';
import { casesText } from '@/shared/text/cases';
import { noticesText } from '@/shared/text/notices';
import type { CaseDeps, Origin } from './deps';
import { addendumHash } from './hash';
import { noticeToPerson } from './notices';
import { demand } from './service';
import { contentOf, lockCase, log, presentRevision, trailOf } from './store';
import { targetLabel } from './targets';
import { plainText } from '@/shared/format/richText';

/** Comments at a value, and addenda: both stand beside the content and never change it. */
export const remarkService = (deps: CaseDeps) => ({
  comment: async (who: Actor, caseId: string, request: { target: string; text: string }, { origin }: Origin): Promise<void> => {
    const found = await inTransaction(deps.db, async (tx) => {
      const row = await lockCase(who, caseId, tx);
      const at = deps.now();
      await demand('comment', who, row, at, tx);
      const revision = await presentRevision(row, tx);
      const label = targetLabel(request.target, contentOf(revision), trailOf(revision));
      if (label === null) throw fieldProblem('target', casesText.target.unknown);
      const targetLabelText = plainText(label).slice(0, 200);
      await CommentModel.create({
        id: deps.newId(), caseId, target: request.target, targetLabel: targetLabelText, revision: row.revision, text: request.text,
        byId: who.id, byName: who.name, at, resolvedById: null, resolvedByName: null, resolvedAt: null,
      }, { transaction: tx });
      await log(row, who, at, 'commented', casesText.event.commented(targetLabelText), tx);
      return row;
    });
    if (found.authorId !== who.id) await noticeToPerson(deps, found.authorId, found, noticesText.commented({ code: found.code, question: plainText(found.question) }, who.name), origin);
  },

  resolve: async (who: Actor, commentId: string, resolved: boolean): Promise<string> =>
    inTransaction(deps.db, async (tx) => {
      const pointer = await CommentModel.findByPk(commentId, { attributes: ['caseId'], transaction: tx });
      const visible = pointer && await CaseModel.count({ where: { id: pointer.caseId, projectId: { [Op.in]: [...who.projectIds] } }, transaction: tx });
      if (!pointer || !visible) throw new Problem('not-found', casesText.noSuchComment);
      const found = await lockCase(who, pointer.caseId, tx);
      const at = deps.now();
      await demand('comment', who, found, at, tx);
      const comment = await CommentModel.findByPk(commentId, { transaction: tx, rejectOnEmpty: true });
      if ((comment.resolvedAt !== null) === resolved) return found.id;
      await comment.update(resolved ? { resolvedById: who.id, resolvedByName: who.name, resolvedAt: at } : { resolvedById: null, resolvedByName: null, resolvedAt: null }, { transaction: tx });
      await log(found, who, at, resolved ? 'comment-resolved' : 'comment-opened', casesText.event[resolved ? 'resolved' : 'unresolved'](comment.targetLabel), tx);
      return found.id;
    }),

  /** Signed text added to a signed case; its hash takes in the one before, so the row of addenda cannot be rearranged. */
  addend: async (who: Actor, caseId: string, request: { text: string; password: string }): Promise<void> => {
    await deps.confirm(who.id, request.password);
    await inTransaction(deps.db, async (tx) => {
      const found = await lockCase(who, caseId, tx);
      const at = deps.now();
      await demand('addend', who, found, at, tx);
      const last = await AddendumModel.findOne({ where: { caseId }, order: [['number', 'DESC']], transaction: tx });
      const record = { caseId, number: (last?.number ?? 0) + 1, text: request.text, byId: who.id, byName: who.name, at, previousHash: last?.hash ?? found.contentHash };
      await AddendumModel.create({ id: deps.newId(), ...record, revision: found.revision, hash: addendumHash(record) }, { transaction: tx });
      await log(found, who, at, 'addendum', casesText.event.addendum(record.number), tx);
      await found.update({ changedAt: at, changedById: who.id }, { transaction: tx });
    });
  },
});
