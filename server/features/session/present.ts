import type { Actor } from '@/server/auth/actor';
import { DEMO_PASSWORD, PEOPLE } from '@/server/db/demo/people';
import { UserModel } from '@/server/db/models/UserModel';
import type { Deps } from '@/server/deps';
import type { SessionResponse } from '@/shared/contracts/session';

/** The invented accounts that are open now, with their common password, for the sign-in page; null once they are gone. */
async function demoAccounts(): Promise<SessionResponse['demo']> {
  const open = await UserModel.findAll({ where: { isDemo: true, status: 'active' }, attributes: ['email', 'name'], raw: true });
  if (open.length === 0) return null;
  const nameByEmail = new Map(open.map(({ email, name }) => [email, name]));
  const accounts = Object.values(PEOPLE).flatMap(({ email, roleWords }) => {
    const name = nameByEmail.get(email);
    return name === undefined ? [] : [{ email, name, role: roleWords }];
  });
  return { accounts, password: DEMO_PASSWORD, mailbox: true };
}

/** What the shell of the client needs to know about who is asking. */
export async function presentSession({ db, reviewsWaiting }: Deps, who: Actor | null): Promise<SessionResponse> {
  const demo = await demoAccounts();
  if (!who) return { user: null, reviewsWaiting: 0, demo };
  const { id, name, email, siteRole, isDemo, projects } = who;
  return { user: { id, name, email, siteRole, isDemo, projects: [...projects] }, reviewsWaiting: await reviewsWaiting(db, who), demo };
}
