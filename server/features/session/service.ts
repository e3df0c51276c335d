import type { Request } from 'express';

import { THROTTLES } from '@/server/auth/throttle';
import { UserModel } from '@/server/db/models/UserModel';
import type { Deps } from '@/server/deps';
import { Problem } from '@/server/http/problems';
import { problemText } from '@/shared/text/problems';

/** Where a request comes from, as `trust proxy` says. */
export const addressOf = (request: Request): string => request.ip ?? 'unknown';

/**
 * Finds the person behind an address and a password. An unknown address, a wrong password: the same sentence after the
 * same time. Only wrong tries count against the limits.
 * @throws Problem not-allowed, too-many-tries
 */
export async function checkCredentials({ passwords, throttle }: Deps, email: string, password: string, address: string): Promise<UserModel> {
  await throttle.take(THROTTLES.signInPerAddress, address);
  await throttle.take(THROTTLES.signInPerEmail, email);
  const found = await UserModel.findOne({ where: { email } });
  const right = await passwords.matches(password, found?.passwordHash ?? null);
  if (!found || !right) throw new Problem('not-allowed', problemText.wrongCredentials, { errors: [{ pointer: '#/password', detail: problemText.wrongCredentials }] });
  await Promise.all([throttle.giveBack(THROTTLES.signInPerAddress, address), throttle.giveBack(THROTTLES.signInPerEmail, email)]);
  if (found.status === 'disabled') throw new Problem('not-allowed', problemText.accountDisabled);
  return found;
}

/** Opens a new session for a person who has just shown who they are. */
export async function beginSession({ sessions, now }: Deps, request: Request, person: UserModel): Promise<void> {
  await person.update({ lastSignInAt: now() });
  await sessions.begin(request, { id: person.id, sessionEpoch: person.sessionEpoch });
}

/** The password asked again from somebody who is signed in: for signing, for a new password. @throws Problem */
export async function confirmPassword({ passwords, throttle }: Pick<Deps, 'passwords' | 'throttle'>, userId: string, password: string, field = 'password'): Promise<UserModel> {
  await throttle.take(THROTTLES.passwordAgain, userId);
  const found = await UserModel.findByPk(userId);
  const right = await passwords.matches(password, found?.passwordHash ?? null);
  if (!found || !right) throw new Problem('not-allowed', problemText.wrongPassword, { errors: [{ pointer: `#/${field}`, detail: problemText.wrongPassword }] });
  await throttle.giveBack(THROTTLES.passwordAgain, userId);
  return found;
}

/** Ends every session of a person, on every device: sessions that carry the old epoch are refused from now on. */
export const endAllSessions = (person: UserModel): Promise<UserModel> => person.increment('sessionEpoch').then((changed) => changed.reload());
