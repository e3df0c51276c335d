import { Op } from 'sequelize';
import type { z } from 'zod';

import type { Actor } from '@/server/auth/actor';
import { AddendumModel } from '@/server/db/models/AddendumModel';
import { AttachmentModel } from '@/server/db/models/AttachmentModel';
import { CaseEventModel } from '@/server/db/models/CaseEventModel';
import { CaseModel } from '@/server/db/models/CaseModel';
import { CaseRevisionModel } from '@/server/db/models/CaseRevisionModel';
import { CommentModel } from '@/server/db/models/CommentModel';
import { ProjectModel } from '@/server/db/models/ProjectModel';
import { QueryMessageModel } from '@/server/db/models/QueryMessageModel';
import { ReviewCheckModel } from '@/server/db/models/ReviewCheckModel';
import { ReviewQueryModel } from '@/server/db/models/ReviewQueryModel';
import { SignatureModel } from '@/server/db/models/SignatureModel';
import { Problem } from '@/server/http/problems';
import type { caseResponse, CompareResponse, EventsResponse, RevisionResponse, RevisionsResponse } from '@/shared/contracts/cases';
import { diffContent } from '@/shared/engine';
import { casesText } from '@/shared/text/cases';
import { REVIEW_STEPS, type ReviewStep } from '@/shared/types/trail';
import type { CaseDeps } from './deps';
import { abilities } from './policy';
import { contentOf, factsOf, findCase, holderOf, namesOf, presentRevision, readRevision, trailOf } from './store';

export type CaseAnswer = z.input<typeof caseResponse>;
type Check = CaseAnswer['review']['checks'][number];
type Person = CaseAnswer['author'];

/** The parts of a case that sheet and screen both show. */
export interface CaseRecord {
  found: CaseModel;
  queries: ReviewQueryModel[];
  messages: Map<string, QueryMessageModel[]>;
  checks: ReviewCheckModel[];
  signatures: SignatureModel[];
  addenda: AddendumModel[];
  attachments: AttachmentModel[];
}

export async function readRecord(found: CaseModel): Promise<CaseRecord> {
  const caseId = found.id;
  const [queries, checks, signatures, addenda, attachments] = await Promise.all([
    ReviewQueryModel.findAll({ where: { caseId }, order: [['number', 'ASC']] }),
    ReviewCheckModel.findAll({ where: { caseId } }),
    SignatureModel.findAll({ where: { caseId }, order: [['signedAt', 'ASC'], ['id', 'ASC']] }),
    AddendumModel.findAll({ where: { caseId }, order: [['number', 'ASC']] }),
    AttachmentModel.findAll({ where: { caseId }, order: [['at', 'ASC'], ['id', 'ASC']] }),
  ]);
  const messages = new Map<string, QueryMessageModel[]>();
  if (queries.length > 0) {
    for (const message of await QueryMessageModel.findAll({ where: { queryId: queries.map(({ id }) => id) }, order: [['id', 'ASC']] })) {
      messages.set(message.queryId, [...(messages.get(message.queryId) ?? []), message]);
    }
  }
  return { found, queries, messages, checks, signatures, addenda, attachments };
}

/** One line a step: a query that is not closed goes before a check; a check of an older revision no longer counts. */
export function checkStates(record: Pick<CaseRecord, 'checks' | 'queries'>, revision: number, names: Map<string, string>): Check[] {
  return REVIEW_STEPS.map((step: ReviewStep): Check => {
    const check = record.checks.find((one) => one.step === step && one.revision === revision);
    const by = check ? { id: check.byId, name: names.get(check.byId) ?? '' } : null;
    const asked = record.queries.some((query) => query.step === step && query.state !== 'closed');
    return { step, state: asked ? 'query' : check ? 'checked' : 'open', by, at: check?.at.toISOString() ?? null };
  });
}

export const caseReads = (deps: CaseDeps) => {
  const one = async (who: Actor, caseId: string): Promise<CaseAnswer> => {
    const found = await findCase(who, caseId);
    const now = deps.now();
    const [revision, project, record, comments, facts, linked, first] = await Promise.all([
      presentRevision(found), ProjectModel.findByPk(found.projectId, { rejectOnEmpty: true }), readRecord(found),
      CommentModel.findAll({ where: { caseId }, order: [['at', 'ASC'], ['id', 'ASC']] }), factsOf(who, found, now),
      CaseModel.findAll({ where: { id: { [Op.in]: [found.supersedesId, found.supersededById].filter((id): id is string => id !== null) } }, attributes: ['id', 'code'] }),
      found.firstSubmittedRevision !== null && found.firstSubmittedRevision < found.revision ? readRevision(caseId, found.firstSubmittedRevision) : null,
    ]);
    const holder = holderOf(found, now);
    const names = await namesOf(deps, [found.authorId, found.changedById, holder, found.reviewerId, ...record.checks.map(({ byId }) => byId)]);
    const person = (id: string): Person => ({ id, name: names.get(id) ?? '' });
    const link = (id: string | null) => {
      const row = linked.find((candidate) => candidate.id === id);
      return row ? { id: row.id, code: row.code } : null;
    };
    const content = contentOf(revision);
    // a signed case keeps the reviewer who signed it; a case in review shows whoever holds it now
    const reviewer = found.state === 'signed' || found.state === 'superseded' ? found.reviewerId : holder;
    return {
      id: found.id, code: found.code, project: { id: project.id, key: project.projectKey, name: project.name, notebookPattern: project.notebookPattern },
      state: found.state, version: found.version, revision: found.revision, contentHash: found.contentHash,
      author: person(found.authorId), createdAt: found.createdAt.toISOString(), changedAt: found.changedAt.toISOString(), changedBy: person(found.changedById),
      content, trail: trailOf(revision),
      review: {
        reviewer: reviewer ? person(reviewer) : null, heldUntil: holder ? found.heldUntil?.toISOString() ?? null : null, dueOn: found.dueOn,
        checks: checkStates(record, found.revision, names),
        queries: record.queries.map((query) => ({
          id: query.id, number: query.number, step: query.step, stepKey: query.stepKey, state: query.state,
          messages: (record.messages.get(query.id) ?? []).map((message) => ({ by: { id: message.byId, name: message.byName }, at: message.at.toISOString(), text: message.text, from: message.sender })),
        })),
        submittedAt: found.submittedAt?.toISOString() ?? null,
      },
      signatures: record.signatures.map((one) => ({ meaning: one.meaning, name: one.signerName, at: one.signedAt.toISOString(), contentHash: one.contentHash, revision: one.revision })),
      addenda: record.addenda.map((one) => ({ id: one.id, text: one.text, by: one.byName, at: one.at.toISOString(), hash: one.hash })),
      comments: comments.map((one) => ({
        id: one.id, target: one.target, targetLabel: one.targetLabel, revision: one.revision, text: one.text, by: { id: one.byId, name: one.byName }, at: one.at.toISOString(),
        resolvedBy: one.resolvedById === null ? null : { id: one.resolvedById, name: one.resolvedByName ?? '' }, resolvedAt: one.resolvedAt?.toISOString() ?? null,
      })),
      attachments: record.attachments.map((one) => ({ id: one.id, fileName: one.fileName, mediaType: one.mediaType, bytes: one.bytes, sha256: one.sha256, by: { id: one.byId, name: one.byName }, at: one.at.toISOString() })),
      changedSinceSubmission: first ? diffContent(contentOf(first), content) : [],
      supersededBy: link(found.supersededById), supersedes: link(found.supersedesId),
      may: abilities(facts),
    };
  };

  const revisionOf = async (who: Actor, caseId: string, number: number): Promise<{ found: CaseModel; revision: CaseRevisionModel }> => {
    const found = await findCase(who, caseId);
    const revision = await readRevision(caseId, number);
    if (!revision) throw new Problem('not-found', casesText.noSuchRevision(found.code, number));
    return { found, revision };
  };

  return {
    one,
    revisionOf,
    revisions: async (who: Actor, caseId: string): Promise<RevisionsResponse> => {
      const found = await findCase(who, caseId);
      const [rows, signatures] = await Promise.all([
        CaseRevisionModel.findAll({ where: { caseId }, attributes: { exclude: ['content', 'trail'] }, order: [['number', 'DESC']] }),
        SignatureModel.findAll({ where: { caseId, meaning: { [Op.ne]: 'authorship' } }, attributes: ['revision'] }),
      ]);
      const signed = new Set(found.state === 'draft' ? [] : signatures.map(({ revision }) => revision));
      return {
        revisions: rows.map((row) => ({
          number: row.number, by: { id: row.savedById, name: row.savedByName }, at: row.savedAt.toISOString(), reason: row.reason, contentHash: row.contentHash,
          engineVersion: row.engineVersion, changes: row.changes, signed: signed.has(row.number),
        })),
      };
    },
    revision: async (who: Actor, caseId: string, number: number): Promise<RevisionResponse> => {
      const { revision } = await revisionOf(who, caseId, number);
      return {
        number, by: { id: revision.savedById, name: revision.savedByName }, at: revision.savedAt.toISOString(), reason: revision.reason, contentHash: revision.contentHash,
        content: contentOf(revision), trail: trailOf(revision),
      };
    },
    compare: async (who: Actor, caseId: string, from: number, to: number): Promise<CompareResponse> => {
      const [before, after] = await Promise.all([revisionOf(who, caseId, from), revisionOf(who, caseId, to)]);
      return { from, to, changes: diffContent(contentOf(before.revision), contentOf(after.revision)) };
    },
    events: async (who: Actor, caseId: string): Promise<EventsResponse> => {
      await findCase(who, caseId);
      const rows = await CaseEventModel.findAll({ where: { caseId }, order: [['id', 'DESC']], limit: 2000 });
      return { events: rows.map((row) => ({ at: row.at.toISOString(), by: row.byName, kind: row.kind, text: row.text })) };
    },
  };
};
export type CaseReads = ReturnType<typeof caseReads>;
