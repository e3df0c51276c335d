import type { Request } from 'express';

import type { Actor } from '@/server/auth/actor';
import { THROTTLES } from '@/server/auth/throttle';
import { newToken, tokenHash } from '@/server/auth/tokens';
import { PasswordResetModel } from '@/server/db/models/PasswordResetModel';
import { UserModel } from '@/server/db/models/UserModel';
import type { Deps } from '@/server/deps';
import { addressOf, confirmPassword, endAllSessions } from '@/server/features/session/service';
import { fieldProblem, Problem } from '@/server/http/problems';
import { siteAddress, sitePaths } from '@/server/mail/links';
import { mailText } from '@/shared/text/mail';
import { problemText } from '@/shared/text/problems';

const RESET_MS = 3600 * 1000;

export async function changeName(who: Actor, name: string): Promise<void> {
  await UserModel.update({ name }, { where: { id: who.id } });
}

/** A new password ends every sign-in; the one on this device begins anew. */
export async function changePassword(deps: Deps, who: Actor, request: Request, { current, next }: { current: string; next: string }): Promise<UserModel> {
  const person = await confirmPassword(deps, who.id, current, 'current');
  if (current === next) throw fieldProblem('next', problemText.samePassword);
  await person.update({ passwordHash: await deps.passwords.hash(next) });
  const renewed = await endAllSessions(person);
  await deps.sessions.begin(request, { id: renewed.id, sessionEpoch: renewed.sessionEpoch });
  tellChanged(deps, request, renewed.email);
  return renewed;
}

/** Answers the same for every address, at once: whether there is an account shows in the mailbox only. */
export async function forgotPassword({ env, mail, now, newId, throttle }: Deps, request: Request, email: string): Promise<void> {
  await throttle.take(THROTTLES.resetPerAddress, addressOf(request));
  await throttle.take(THROTTLES.resetPerEmail, email);
  const site = siteAddress(env, request);
  mail.post(async () => {
    const person = await UserModel.findOne({ where: { email, status: 'active' } });
    if (!person) return null;
    const { token, hash } = newToken();
    const expiresAt = new Date(now().getTime() + RESET_MS);
    await PasswordResetModel.create({ id: newId(), userId: person.id, tokenHash: hash, createdAt: now(), expiresAt });
    return { to: email, ...mailText.reset({ link: `${site}${sitePaths.reset(token)}`, expires: expiresAt }) };
  });
}

/** Sets a new password by the link of a mail, once; every sign-in and every other such link ends. @throws Problem gone */
export async function resetPassword(deps: Deps, request: Request, { token, next }: { token: string; next: string }): Promise<void> {
  const { db, now, passwords, throttle } = deps;
  await throttle.take(THROTTLES.tokenPerAddress, addressOf(request));
  const where = { tokenHash: tokenHash(token) };
  openReset(await PasswordResetModel.findOne({ where }), now()); // before the slow hash
  const passwordHash = await passwords.hash(next);
  const person = await db.transaction(async (transaction) => {
    const reset = openReset(await PasswordResetModel.findOne({ where, transaction, lock: transaction.LOCK.UPDATE }), now());
    const found = await UserModel.findOne({ where: { id: reset.userId, status: 'active' }, transaction, lock: transaction.LOCK.UPDATE });
    if (!found) throw new Problem('gone', problemText.accountDisabled);
    await found.update({ passwordHash, sessionEpoch: found.sessionEpoch + 1 }, { transaction });
    await PasswordResetModel.update({ usedAt: now() }, { where: { userId: found.id, usedAt: null }, transaction });
    return found;
  });
  tellChanged(deps, request, person.email);
}

function openReset(found: PasswordResetModel | null, now: Date): PasswordResetModel {
  if (!found) throw new Problem('gone', problemText.linkUnknown);
  if (found.usedAt) throw new Problem('gone', problemText.linkUsed);
  if (found.expiresAt <= now) throw new Problem('gone', problemText.linkExpired);
  return found;
}

function tellChanged({ env, mail, now }: Deps, request: Request, to: string): void {
  mail.post({ to, ...mailText.passwordChanged({ at: now(), link: `${siteAddress(env, request)}${sitePaths.forgot()}` }) });
}
