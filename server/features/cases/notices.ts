import { QueryTypes } from 'sequelize';

import type { Actor } from '@/server/auth/actor';
import { utcDay } from '@/server/auth/actor';
import type { CaseModel } from '@/server/db/models/CaseModel';
import { sitePaths } from '@/server/mail/links';
import { plainText } from '@/shared/format/richText';
import { noticesText, type Notice } from '@/shared/text/notices';
import type { CaseDeps } from './deps';
import { holderOf } from './store';

interface Address {
  id: string;
  name: string;
  email: string;
}

/** Active members of the project with one of these roles, whose time has not run out. */
function membersOf(deps: CaseDeps, projectId: string, roles: readonly string[]): Promise<Address[]> {
  return deps.db.query<Address>(
    `SELECT u.id, u.name, u.email FROM memberships m JOIN users u ON u.id = m.user_id
      WHERE m.project_id = :projectId AND m.role IN (:roles) AND u.status = 'active' AND (m.guest_until IS NULL OR m.guest_until >= :today)`,
    { replacements: { projectId, roles: [...roles], today: utcDay(deps.now()) }, type: QueryTypes.SELECT });
}

function activePeople(deps: CaseDeps, projectId: string, ids: readonly string[]): Promise<Address[]> {
  if (ids.length === 0) return Promise.resolve([]);
  return deps.db.query<Address>(
    `SELECT u.id, u.name, u.email FROM memberships m JOIN users u ON u.id = m.user_id
      WHERE m.project_id = :projectId AND u.id IN (:ids) AND u.status = 'active' AND (m.guest_until IS NULL OR m.guest_until >= :today)`,
    { replacements: { projectId, ids: [...ids], today: utcDay(deps.now()) }, type: QueryTypes.SELECT });
}

function post(deps: CaseDeps, people: readonly Address[], notice: Notice, origin: string, caseId: string): void {
  for (const person of people) {
    deps.mail.post({ to: person.email, subject: notice.subject, text: noticesText.letter(person.name, notice.lines, `${origin}${sitePaths.oneCase(caseId)}`) });
  }
}

const about = (found: CaseModel) => ({ code: found.code, question: plainText(found.question) });

/** To whoever holds the case, else to every reviewer and lead of the project; never to the author. */
export async function noticeSubmitted(deps: CaseDeps, who: Actor, found: CaseModel, origin: string): Promise<void> {
  const holder = holderOf(found, deps.now());
  const people = holder ? await activePeople(deps, found.projectId, [holder]) : await membersOf(deps, found.projectId, ['reviewer', 'lead']);
  post(deps, people.filter(({ id }) => id !== who.id && id !== found.authorId), noticesText.submitted(about(found), who.name, found.dueOn), origin, found.id);
}

/** To the author, or to the reviewer who holds the case, whichever of them did not act. */
export async function noticeToOther(deps: CaseDeps, who: Actor, found: CaseModel, notice: (about: { code: string; question: string }, by: string) => Notice, origin: string): Promise<void> {
  const holder = holderOf(found, deps.now());
  const ids = [found.authorId, ...(holder ? [holder] : [])].filter((id) => id !== who.id);
  post(deps, await activePeople(deps, found.projectId, ids), notice(about(found), who.name), origin, found.id);
}

export async function noticeToPerson(deps: CaseDeps, personId: string, found: CaseModel, notice: Notice, origin: string): Promise<void> {
  post(deps, await activePeople(deps, found.projectId, [personId]), notice, origin, found.id);
}
