import type { Actor } from '@/server/auth/actor';
import { CaseEventModel } from '@/server/db/models/CaseEventModel';
import { CaseModel } from '@/server/db/models/CaseModel';
import { ProjectModel } from '@/server/db/models/ProjectModel';
import type { CaseDeps } from '@/server/features/cases/deps';
import { readRecord, type CaseReads } from '@/server/features/cases/read';
import { contentOf, findCase, hashHolds, namesOf, trailOf } from '@/server/features/cases/store';
import { casesText } from '@/shared/text/cases';
import type { Registry } from '@/shared/types/relation';
import type { SheetInput } from './input';

/** Why a case was withdrawn, from the log's own words; '' when it was not. */
async function withdrawnBecause(found: CaseModel): Promise<string> {
  if (found.state !== 'withdrawn') return '';
  const event = await CaseEventModel.findOne({ where: { caseId: found.id, kind: 'withdrawn' }, order: [['id', 'DESC']] });
  const lead = casesText.event.reason(casesText.event.withdrawn, '');
  return event?.text.startsWith(lead) ? event.text.slice(lead.length) : '';
}

/** Reads what a sheet is made of. @throws Problem not-found for a case or revision that this person cannot see */
export async function readSheet(deps: CaseDeps, reads: CaseReads, registry: Registry, who: Actor, caseId: string, number: number | null, zone: string): Promise<SheetInput> {
  const { found, revision } = await reads.revisionOf(who, caseId, number ?? (await findCase(who, caseId)).revision);
  const [record, project, successor, because, holds] = await Promise.all([
    readRecord(found), ProjectModel.findByPk(found.projectId, { attributes: ['name'], rejectOnEmpty: true }),
    found.supersededById === null ? null : CaseModel.findByPk(found.supersededById, { attributes: ['code'] }), withdrawnBecause(found), hashHolds(revision),
  ]);
  const names = await namesOf(deps, [found.authorId, ...record.checks.map(({ byId }) => byId)]);
  return {
    record, revision, content: contentOf(revision), trail: trailOf(revision), projectName: project.name, authorName: names.get(found.authorId) ?? '', names, registry, zone,
    successor: successor?.code ?? null, withdrawnBecause: because, hashHolds: holds,
  };
}
