import { UniqueConstraintError, type Transaction } from 'sequelize';
import type { Request } from 'express';
import type { z } from 'zod';

import { utcDay, type Actor } from '@/server/auth/actor';
import { THROTTLES } from '@/server/auth/throttle';
import { newToken } from '@/server/auth/tokens';
import { InvitationModel } from '@/server/db/models/InvitationModel';
import { MembershipModel } from '@/server/db/models/MembershipModel';
import { ProjectModel } from '@/server/db/models/ProjectModel';
import type { Deps } from '@/server/deps';
import { fieldProblem, Problem } from '@/server/http/problems';
import { siteAddress, sitePaths } from '@/server/mail/links';
import type { changeMemberRequest, changeProjectRequest, createProjectRequest, inviteRequest } from '@/shared/contracts/team';
import { mailText } from '@/shared/text/mail';
import { problemText } from '@/shared/text/problems';
import { yesNo } from '@/shared/text/team';
import { PROJECT_SETTINGS } from '@/shared/types/projectEvent';
import { mayCreateProject, mayInTeam, standingRefusal, type TeamAct } from './policy';
import { asTeamActor, maySee } from './read';
import { activeLeads, lockProject, logProjectEvent, membersOf, membership, withdrawOpen, type MemberRow } from './store';

const INVITATION_MS = 14 * 24 * 3600 * 1000;

interface Held {
  project: ProjectModel;
  members: MemberRow[];
  transaction: Transaction;
}

/** Runs a change of a project with its row held. @throws Problem not-found to whom it is hidden, not-allowed to whom it is shown */
function change<T>({ db }: Deps, who: Actor, projectId: string, act: TeamAct, work: (held: Held) => Promise<T>): Promise<T> {
  return db.transaction(async (transaction) => {
    const project = await lockProject(projectId, transaction);
    if (!project || !maySee(who, project)) throw new Problem('not-found', problemText.notOfYours);
    const members = await membersOf(db, projectId, transaction);
    if (!mayInTeam(act, asTeamActor(who, projectId), { hasLead: activeLeads(members).length > 0, isDemo: project.isDemo })) throw new Problem('not-allowed', problemText.leadsOnly);
    return work({ project, members, transaction });
  });
}

/** A new project; whoever opens it leads it until they name another. */
export async function createProject({ db, now, newId }: Deps, who: Actor, { key, name }: z.output<typeof createProjectRequest>): Promise<string> {
  if (!mayCreateProject(who)) throw new Problem('not-allowed', problemText.administratorsOnly);
  const id = newId();
  try {
    await db.transaction(async (transaction) => {
      await ProjectModel.create({ id, projectKey: key, name, createdBy: who.id, isDemo: who.isDemo }, { transaction });
      await MembershipModel.create({ projectId: id, userId: who.id, role: 'lead', guestUntil: null, joinedAt: now() }, { transaction });
      await logProjectEvent(id, who.id, now(), { format: 1, kind: 'project-created' }, transaction);
    });
  } catch (error) {
    if (error instanceof UniqueConstraintError) throw fieldProblem('key', problemText.keyTaken);
    throw error;
  }
  return id;
}

const settingText = (value: string | number | boolean): string => (typeof value === 'boolean' ? yesNo(value) : String(value));

export const changeSettings = (deps: Deps, who: Actor, projectId: string, wished: z.output<typeof changeProjectRequest>): Promise<void> =>
  change(deps, who, projectId, 'change-settings', async ({ project, transaction }) => {
    const changes = PROJECT_SETTINGS.filter((setting) => project[setting] !== wished[setting])
      .map((setting) => ({ setting, before: settingText(project[setting]), after: settingText(wished[setting]) }));
    if (changes.length === 0) return;
    await project.update(wished, { transaction });
    await logProjectEvent(projectId, who.id, deps.now(), { format: 1, kind: 'settings-changed', changes }, transaction);
  });

/** Invites by mail; an earlier invitation of the same address is replaced. */
export async function invite(deps: Deps, who: Actor, projectId: string, wished: z.output<typeof inviteRequest>, request: Request): Promise<void> {
  const { env, mail, now, newId, throttle } = deps;
  const { email, role, guestUntil } = wished;
  const refusal = standingRefusal({ role, guestUntil, today: utcDay(now()), leadsLeft: 1 });
  // before the transaction: the counters use a connection of their own
  await throttle.take(THROTTLES.invitePerPerson, who.id);
  await throttle.take(THROTTLES.invitePerEmail, `${projectId}\n${email}`);
  const { token, hash } = newToken();
  const sentAt = now();
  const expiresAt = new Date(sentAt.getTime() + INVITATION_MS);
  const projectName = await change(deps, who, projectId, 'invite', async ({ project, members, transaction }) => {
    if (refusal) throw fieldProblem(refusal.field, refusal.why);
    if (members.some((one) => one.email === email && (one.guestUntil === null || one.guestUntil >= utcDay(sentAt)))) throw fieldProblem('email', problemText.alreadyMember);
    await withdrawOpen(projectId, email, sentAt, transaction);
    await InvitationModel.create({ id: newId(), projectId, email, role, guestUntil, tokenHash: hash, invitedBy: who.id, sentAt, expiresAt }, { transaction });
    await logProjectEvent(projectId, who.id, sentAt, { format: 1, kind: 'invitation-sent', email, role, guestUntil }, transaction);
    return project.name;
  });
  const link = `${siteAddress(env, request)}${sitePaths.invitation(token)}`;
  try {
    await mail.send({ to: email, ...mailText.invitation({ by: who.name, project: projectName, role, guestUntil, link, expires: expiresAt }) });
  } catch (error) {
    deps.log.error('mail-failed', error);
    throw new Problem('unavailable', problemText.mailNotSent);
  }
}

export const withdrawInvitation = (deps: Deps, who: Actor, projectId: string, invitationId: string): Promise<void> =>
  change(deps, who, projectId, 'withdraw-invitation', async ({ transaction }) => {
    const found = await InvitationModel.findOne({ where: { id: invitationId, projectId, acceptedAt: null }, transaction, lock: transaction.LOCK.UPDATE });
    if (!found) throw new Problem('not-found', problemText.notOfYours);
    if (found.withdrawnAt) return; // asked for twice: it is withdrawn
    await found.update({ withdrawnAt: deps.now() }, { transaction });
    await logProjectEvent(projectId, who.id, deps.now(), { format: 1, kind: 'invitation-withdrawn', email: found.email }, transaction);
  });

const leadsWithout = (members: readonly MemberRow[], userId: string): number => activeLeads(members).filter((one) => one.userId !== userId).length;

export const changeMember = (deps: Deps, who: Actor, projectId: string, userId: string, wished: z.output<typeof changeMemberRequest>): Promise<void> =>
  change(deps, who, projectId, 'change-member', async ({ members, transaction }) => {
    const present = members.find((one) => one.userId === userId);
    const row = await membership(projectId, userId, transaction);
    if (!present || !row) throw new Problem('not-found', problemText.notOfYours);
    const { role, guestUntil } = wished;
    // A caretaker must name a lead first; otherwise nobody could look after the project afterwards.
    const leadsLeft = leadsWithout(members, userId) + (role === 'lead' && present.isActive ? 1 : 0);
    const refusal = standingRefusal({ role, guestUntil, today: utcDay(deps.now()), leadsLeft });
    if (refusal) throw fieldProblem(refusal.field, refusal.why);
    if (present.role === role && present.guestUntil === guestUntil) return;
    await row.update({ role, guestUntil }, { transaction });
    await logProjectEvent(projectId, who.id, deps.now(), {
      format: 1, kind: 'member-changed', person: present.name, before: { role: present.role, guestUntil: present.guestUntil }, after: { role, guestUntil },
    }, transaction);
  });

/** Takes somebody out of a project; anybody may leave it themselves. Their cases stay. */
export const removeMember = (deps: Deps, who: Actor, projectId: string, userId: string): Promise<void> =>
  change(deps, who, projectId, userId === who.id ? 'leave' : 'remove-member', async ({ members, transaction }) => {
    const present = members.find((one) => one.userId === userId);
    const row = await membership(projectId, userId, transaction);
    if (!present || !row) throw new Problem('not-found', problemText.notOfYours);
    if (leadsWithout(members, userId) === 0) throw new Problem('wrong-state', problemText.lastLead);
    await row.destroy({ transaction });
    await logProjectEvent(projectId, who.id, deps.now(), { format: 1, kind: 'member-removed', person: present.name, role: present.role }, transaction);
  });
