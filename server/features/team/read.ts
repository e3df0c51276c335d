import type { Actor } from '@/server/auth/actor';
import { ProjectModel } from '@/server/db/models/ProjectModel';
import type { Deps } from '@/server/deps';
import { Problem } from '@/server/http/problems';
import type { ProjectResponse, ProjectSummary, TeamResponse } from '@/shared/contracts/team';
import { problemText } from '@/shared/text/problems';
import { projectEventText } from '@/shared/text/team';
import type { ProjectEvent } from '@/shared/types/projectEvent';
import { mayAdminister } from '@/server/features/admin/policy';
import { mayCreateProject, mayInTeam, type TeamAct, type TeamActor } from './policy';
import { activeLeads, caseCounts, ledProjects, membersOf, openInvitations, projectLog } from './store';

export const asTeamActor = (who: Actor, projectId: string): TeamActor => ({ siteRole: who.siteRole, role: who.roleIn(projectId), isDemo: who.isDemo });

/** The driver hands JSON columns of a raw query over as text. */
const eventOf = (detail: ProjectEvent | string): ProjectEvent => (typeof detail === 'string' ? JSON.parse(detail) as ProjectEvent : detail);

export const maySee = (who: Actor, { id, isDemo }: ProjectModel): boolean => mayInTeam('see', asTeamActor(who, id), { hasLead: true, isDemo });

function summary(who: Actor, found: ProjectModel, hasLead: boolean, caseCount: number): ProjectSummary {
  const actor = asTeamActor(who, found.id);
  const { id, projectKey: key, name, notebookPattern, claimHours, reviewDays, peerReview, isDemo } = found;
  const may = (act: TeamAct) => mayInTeam(act, actor, { hasLead, isDemo });
  return {
    id, key, name, notebookPattern, claimHours, reviewDays, peerReview, isDemo, caseCount, yourRole: actor.role,
    may: { invite: may('invite'), changeMembers: may('change-member'), changeSettings: may('change-settings') },
  };
}

/** The projects that this person is in; for an administrator all, with no way into their cases. */
export async function readTeam({ db }: Deps, who: Actor): Promise<TeamResponse> {
  const all = mayAdminister(who);
  const [projects, counts, led] = await Promise.all([
    ProjectModel.findAll({ ...(all ? {} : { where: { id: [...who.projectIds] } }), order: [['name', 'ASC'], ['id', 'ASC']] }), caseCounts(db), ledProjects(db),
  ]);
  const shown = projects.filter((found) => maySee(who, found));
  return {
    projects: shown.map((found) => summary(who, found, led.has(found.id), counts.get(found.id) ?? 0)),
    mayCreateProject: mayCreateProject(who), mayAdminister: all,
  };
}

/** @throws Problem not-found for a project that this person may not see, as for one that is not there */
export async function readProject({ db, now }: Deps, who: Actor, projectId: string): Promise<ProjectResponse> {
  const found = await ProjectModel.findByPk(projectId);
  if (!found || !maySee(who, found)) throw new Problem('not-found', problemText.notOfYours);
  const [members, invitations, log, counts] = await Promise.all([membersOf(db, projectId), openInvitations(db, projectId, now()), projectLog(db, projectId), caseCounts(db)]);
  return {
    ...summary(who, found, activeLeads(members).length > 0, counts.get(projectId) ?? 0),
    members: members.map(({ userId, name, email, role, guestUntil, joinedAt }) => ({ userId, name, email, role, guestUntil, joinedAt: joinedAt.toISOString(), isYou: userId === who.id })),
    invitations: invitations.map(({ sentAt, expiresAt, ...rest }) => ({ ...rest, sentAt: sentAt.toISOString(), expiresAt: expiresAt.toISOString() })),
    log: log.map(({ at, by, detail }) => ({ at: at.toISOString(), by, text: projectEventText(eventOf(detail)) })),
  };
}
