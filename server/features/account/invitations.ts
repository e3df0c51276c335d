import type { Request } from 'express';
import { UniqueConstraintError, type Transaction } from 'sequelize';

import { utcDay } from '@/server/auth/actor';
import { THROTTLES } from '@/server/auth/throttle';
import { tokenHash } from '@/server/auth/tokens';
import { InvitationModel } from '@/server/db/models/InvitationModel';
import { MembershipModel } from '@/server/db/models/MembershipModel';
import { ProjectModel } from '@/server/db/models/ProjectModel';
import { UserModel } from '@/server/db/models/UserModel';
import type { Deps } from '@/server/deps';
import { addressOf, beginSession, checkCredentials } from '@/server/features/session/service';
import { logProjectEvent } from '@/server/features/team/store';
import { fieldProblem, Problem } from '@/server/http/problems';
import { password as passwordSchema } from '@/shared/contracts/common';
import type { InvitationView } from '@/shared/contracts/session';
import { problemText } from '@/shared/text/problems';

/** The invitation behind a link, while it stands. @throws Problem gone */
function open(found: InvitationModel | null, now: Date): InvitationModel {
  if (!found) throw new Problem('gone', problemText.linkUnknown);
  if (found.acceptedAt) throw new Problem('gone', problemText.linkUsed);
  if (found.withdrawnAt) throw new Problem('gone', problemText.invitationWithdrawn);
  // an invitation to be a guest until yesterday opens nothing any more
  if (found.expiresAt <= now || (found.guestUntil !== null && found.guestUntil < utcDay(now))) throw new Problem('gone', problemText.linkExpired);
  return found;
}

async function invitationByToken({ throttle, now }: Deps, request: Request, token: string): Promise<InvitationModel> {
  await throttle.take(THROTTLES.tokenPerAddress, addressOf(request));
  const found = open(await InvitationModel.findOne({ where: { tokenHash: tokenHash(token) } }), now());
  await throttle.giveBack(THROTTLES.tokenPerAddress, addressOf(request)); // guesses count, a real link does not
  return found;
}

export async function viewInvitation(deps: Deps, request: Request, token: string): Promise<InvitationView> {
  const invitation = await invitationByToken(deps, request, token);
  const [project, by, account] = await Promise.all([
    ProjectModel.findByPk(invitation.projectId, { rejectOnEmpty: true }), UserModel.findByPk(invitation.invitedBy, { rejectOnEmpty: true }),
    UserModel.findOne({ where: { email: invitation.email }, attributes: ['id'] }),
  ]);
  const { email, role, guestUntil } = invitation;
  return { email, projectName: project.name, role, guestUntil, invitedBy: by.name, hasAccount: account !== null };
}

/** Shows who is joining: an account's own password, or a name and a password for a new one. */
async function joiner(deps: Deps, request: Request, email: string, given: { name?: string | undefined; password: string }): Promise<{ person: UserModel } | { name: string; passwordHash: string }> {
  const known = await UserModel.findOne({ where: { email }, attributes: ['id'] });
  if (known) return { person: await checkCredentials(deps, email, given.password, addressOf(request)) };
  if (given.name === undefined) throw fieldProblem('name', problemText.nameMissing);
  const chosen = passwordSchema.safeParse(given.password);
  if (!chosen.success) throw fieldProblem('password', chosen.error.issues[0]?.message ?? problemText.checkFields);
  return { name: given.name, passwordHash: await deps.passwords.hash(chosen.data) };
}

/** Joins the project and signs in. @throws Problem gone, invalid-input, not-allowed, too-many-tries */
export async function acceptInvitation(deps: Deps, request: Request, token: string, given: { name?: string | undefined; password: string }): Promise<UserModel> {
  const { db, now, newId } = deps;
  const { email } = await invitationByToken(deps, request, token);
  const who = await joiner(deps, request, email, given); // slow, so outside the transaction
  const person = await db.transaction(async (transaction) => {
    const invitation = open(await InvitationModel.findOne({ where: { tokenHash: tokenHash(token) }, transaction, lock: transaction.LOCK.UPDATE }), now());
    const joining = 'person' in who ? who.person : await newAccount(newId(), email, who, invitation.projectId, transaction);
    await join(joining, invitation, now(), transaction);
    await invitation.update({ acceptedAt: now() }, { transaction });
    return joining;
  }).catch((error: unknown) => {
    // Two devices accepted at the same moment: the other one made the account.
    if (error instanceof UniqueConstraintError) throw new Problem('gone', problemText.linkUsed);
    throw error;
  });
  await beginSession(deps, request, person);
  return person;
}

/** Whoever is invited into the invented example belongs to it, and goes with it. */
async function newAccount(id: string, email: string, { name, passwordHash }: { name: string; passwordHash: string }, projectId: string, transaction: Transaction): Promise<UserModel> {
  const { isDemo } = await ProjectModel.findByPk(projectId, { attributes: ['isDemo'], rejectOnEmpty: true, transaction });
  return UserModel.create({ id, email, name, passwordHash, isDemo }, { transaction });
}

async function join(person: UserModel, { projectId, role, guestUntil }: InvitationModel, at: Date, transaction: Transaction): Promise<void> {
  const present = await MembershipModel.findOne({ where: { projectId, userId: person.id }, transaction, lock: transaction.LOCK.UPDATE });
  if (present && (present.guestUntil === null || present.guestUntil >= utcDay(at))) return; // became a member meanwhile: keeps what the lead set
  if (present) await present.update({ role, guestUntil, joinedAt: at }, { transaction });
  else await MembershipModel.create({ projectId, userId: person.id, role, guestUntil, joinedAt: at }, { transaction });
  await logProjectEvent(projectId, person.id, at, { format: 1, kind: 'member-added', person: person.name, role, guestUntil }, transaction);
}
