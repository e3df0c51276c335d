import { Op, QueryTypes, type Transaction } from 'sequelize';

import type { Actor } from '@/server/auth/actor';
import { AttachmentModel } from '@/server/db/models/AttachmentModel';
import { CaseEventModel } from '@/server/db/models/CaseEventModel';
import { CaseModel } from '@/server/db/models/CaseModel';
import { CaseRevisionModel } from '@/server/db/models/CaseRevisionModel';
import { CaseTagModel } from '@/server/db/models/CaseTagModel';
import { ProjectModel } from '@/server/db/models/ProjectModel';
import { ReviewCheckModel } from '@/server/db/models/ReviewCheckModel';
import { ReviewQueryModel } from '@/server/db/models/ReviewQueryModel';
import { UserModel } from '@/server/db/models/UserModel';
import { Problem } from '@/server/http/problems';
import { dateTimeUtc } from '@/shared/format/date';
import { canonicalJson } from '@/shared/engine';
import { casesText } from '@/shared/text/cases';
import { reviewStepWord } from '@/shared/text/reviews';
import type { CaseContent } from '@/shared/types/case';
import { REVIEW_STEPS, type CaseTrail } from '@/shared/types/trail';
import type { CaseDeps } from './deps';
import { contentHash } from './hash';
import { listingOf, searchTextOf } from './listing';
import type { CaseFacts } from './policy';

/** The case in a project of this person; another project's case is not found, as one that is not there. @throws Problem not-found */
export async function findCase(who: Actor, caseId: string): Promise<CaseModel> {
  const found = await CaseModel.findOne({ where: { id: caseId, projectId: { [Op.in]: [...who.projectIds] } } });
  if (!found) throw new Problem('not-found', casesText.notFound);
  return found;
}

/** The same with its row locked until the transaction ends: every decision about a case is taken behind this lock. */
export async function lockCase(who: Actor, caseId: string, tx: Transaction): Promise<CaseModel> {
  const found = await CaseModel.findOne({ where: { id: caseId, projectId: { [Op.in]: [...who.projectIds] } }, transaction: tx, lock: tx.LOCK.UPDATE });
  if (!found) throw new Problem('not-found', casesText.notFound);
  return found;
}

export async function readRevision(caseId: string, number: number, tx: Transaction | null = null): Promise<CaseRevisionModel | null> {
  return CaseRevisionModel.findOne({ where: { caseId, number }, transaction: tx });
}

export const contentOf = (revision: Pick<CaseRevisionModel, 'content'>): CaseContent => JSON.parse(revision.content) as CaseContent;
export const trailOf = (revision: Pick<CaseRevisionModel, 'trail'>): CaseTrail => JSON.parse(revision.trail) as CaseTrail;

/** @throws Error when the row that the case points at is missing: the database was changed behind our back */
export async function presentRevision(found: CaseModel, tx: Transaction | null = null): Promise<CaseRevisionModel> {
  const revision = await readRevision(found.id, found.revision, tx);
  if (!revision) throw new Error(`revision ${found.revision} of case ${found.id} is missing`);
  return revision;
}

/** A claim that has run out is no claim: no timer is needed, and nothing has to be cleared. */
export const holderOf = (found: CaseModel, now: Date): string | null =>
  found.reviewerId !== null && found.heldUntil !== null && found.heldUntil > now ? found.reviewerId : null;

/** What the policy needs to know, read behind the lock when a transaction is given. */
export async function factsOf(who: Actor, found: CaseModel, now: Date, tx: Transaction | null = null): Promise<CaseFacts> {
  const holder = holderOf(found, now);
  const [project, firstSave, queries, checks, successor, holderName] = await Promise.all([
    ProjectModel.findByPk(found.projectId, { attributes: ['peerReview'], transaction: tx }),
    CaseRevisionModel.min<number, CaseRevisionModel>('number', { where: { caseId: found.id, savedById: who.id }, transaction: tx }),
    ReviewQueryModel.findAll({ where: { caseId: found.id, state: ['open', 'answered'] }, attributes: ['number', 'state'], transaction: tx }),
    ReviewCheckModel.findAll({ where: { caseId: found.id, revision: found.revision }, attributes: ['step'], transaction: tx }),
    CaseModel.findOne({ where: { supersedesId: found.id, state: { [Op.ne]: 'withdrawn' } }, attributes: ['code'], transaction: tx }),
    holder !== null && holder !== who.id ? UserModel.findByPk(holder, { attributes: ['name'], transaction: tx }) : null,
  ]);
  const checked = new Set(checks.map(({ step }) => step));
  return {
    role: who.roleIn(found.projectId), isAuthor: found.authorId === who.id,
    savedRevision: found.authorId === who.id || firstSave === null || firstSave === undefined || Number.isNaN(Number(firstSave)) ? null : Number(firstSave),
    state: found.state, isHolder: holder === who.id,
    heldBy: holder !== null && holder !== who.id ? { name: holderName?.name ?? '', until: dateTimeUtc(found.heldUntil ?? now) } : null,
    peerReview: project?.peerReview ?? false,
    openQueries: queries.filter(({ state }) => state === 'open').map(({ number }) => number).sort((a, b) => a - b),
    answeredQueries: queries.filter(({ state }) => state === 'answered').map(({ number }) => number).sort((a, b) => a - b),
    uncheckedSteps: REVIEW_STEPS.filter((step) => !checked.has(step)).map((step) => reviewStepWord[step]),
    revisionSubmitted: found.submittedRevision === found.revision,
    successor: successor?.code ?? null,
  };
}

export const filesOf = (caseId: string, tx: Transaction | null = null) =>
  AttachmentModel.findAll({ where: { caseId }, attributes: ['id', 'sha256'], transaction: tx, raw: true });

/** What a save stores: both texts, and the hash over them and over the files that the evidence cites. */
export function makeRevision(deps: Pick<CaseDeps, 'trailOf'>, content: CaseContent, files: { id: string; sha256: string }[]) {
  const cited = new Set(content.evidence.flatMap(({ attachmentIds }) => attachmentIds));
  const trail = deps.trailOf(content);
  const texts = { content: canonicalJson(content), trail: canonicalJson(trail) };
  return { ...texts, trailValue: trail, hash: contentHash(texts.content, texts.trail, files.filter(({ id }) => cited.has(id))) };
}
export type MadeRevision = ReturnType<typeof makeRevision>;

/** Is the stored revision still what its hash says? Content, trail and cited files are hashed again. */
export async function hashHolds(revision: CaseRevisionModel, tx: Transaction | null = null): Promise<boolean> {
  const cited = new Set(contentOf(revision).evidence.flatMap(({ attachmentIds }) => attachmentIds));
  const files = (await filesOf(revision.caseId, tx)).filter(({ id }) => cited.has(id));
  return contentHash(revision.content, revision.trail, files) === revision.contentHash;
}

/** The columns of the log for a content, together with what a search looks through. */
export function columnsOf(code: string, authorName: string, content: CaseContent, trail: CaseTrail) {
  const listing = listingOf(content, trail);
  return { ...listing, searchText: searchTextOf(code, authorName, content, listing) };
}

export async function keepTags(caseId: string, projectId: string, tags: readonly string[], tx: Transaction): Promise<void> {
  await CaseTagModel.destroy({ where: { caseId }, transaction: tx });
  if (tags.length > 0) await CaseTagModel.bulkCreate(tags.map((tag) => ({ caseId, projectId, tag })), { transaction: tx, ignoreDuplicates: true });
}

export function log(found: { id: string }, who: Pick<Actor, 'id' | 'name'>, at: Date, kind: string, text: string, tx: Transaction): Promise<unknown> {
  return CaseEventModel.create({ caseId: found.id, at, byId: who.id, byName: who.name, kind, text: text.slice(0, 2400) }, { transaction: tx });
}

/** The next number of a project, taken behind a lock on its row: numbers are neither given twice nor left out. */
export async function takeNumber(projectId: string, tx: Transaction): Promise<{ number: number; key: string; isDemo: boolean }> {
  const project = await ProjectModel.findByPk(projectId, { transaction: tx, lock: tx.LOCK.UPDATE });
  if (!project) throw new Problem('not-found', casesText.notFoundProject);
  const number = project.nextCaseNumber;
  await project.update({ nextCaseNumber: number + 1 }, { transaction: tx });
  return { number, key: project.projectKey, isDemo: project.isDemo };
}

export const codeOf = (key: string, number: number): { code: string; codeOrder: string } => ({
  code: `${key}-${String(number).padStart(4, '0')}`, codeOrder: `${key}-${String(number).padStart(9, '0')}`,
});

/** People by id, for names beside ids; a handful at most. */
export async function namesOf(deps: Pick<CaseDeps, 'db'>, ids: readonly (string | null)[]): Promise<Map<string, string>> {
  const wanted = [...new Set(ids.filter((id): id is string => id !== null))];
  if (wanted.length === 0) return new Map();
  const rows = await deps.db.query<{ id: string; name: string }>('SELECT id, name FROM users WHERE id IN (:wanted)', { replacements: { wanted }, type: QueryTypes.SELECT });
  return new Map(rows.map(({ id, name }) => [id, name]));
}
