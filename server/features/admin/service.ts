import { QueryTypes } from 'sequelize';
import type { z } from 'zod';

import type { Actor } from '@/server/auth/actor';
import { AccountEventModel } from '@/server/db/models/AccountEventModel';
import { UserModel } from '@/server/db/models/UserModel';
import type { Deps } from '@/server/deps';
import { fieldProblem, Problem } from '@/server/http/problems';
import type { AdminUsersResponse, changeUserRequest } from '@/shared/contracts/team';
import { problemText } from '@/shared/text/problems';
import { accountRefusal } from './policy';

/**
 * Every account with the names of its projects. An administrator of the invented example, whose password anybody may
 * read, sees and changes the invented accounts alone.
 */
export async function readUsers({ db }: Deps, who: Actor): Promise<AdminUsersResponse> {
  const [users, joined] = await Promise.all([
    UserModel.findAll({ ...(who.isDemo ? { where: { isDemo: true } } : {}), order: [['name', 'ASC'], ['id', 'ASC']] }),
    db.query<{ userId: string; name: string }>('SELECT m.user_id AS userId, p.name FROM memberships m JOIN projects p ON p.id = m.project_id ORDER BY p.name', { type: QueryTypes.SELECT }),
  ]);
  const projects = new Map<string, string[]>();
  for (const { userId, name } of joined) projects.set(userId, [...projects.get(userId) ?? [], name]);
  return {
    users: users.map(({ id, name, email, siteRole, status, isDemo, createdAt, lastSignInAt }) => ({
      id, name, email, siteRole, status, isDemo, createdAt: createdAt.toISOString(), lastSignInAt: lastSignInAt?.toISOString() ?? null, projects: projects.get(id) ?? [],
    })),
  };
}

/** Changes a site role or shuts an account; a shut account is refused at its very next request. */
export async function changeUser({ db, now }: Deps, who: Actor, userId: string, wished: z.output<typeof changeUserRequest>): Promise<void> {
  await db.transaction(async (transaction) => {
    // All administrators are held, so that two of them cannot take the role from each other at the same moment.
    const administrators = await UserModel.findAll({ where: { siteRole: 'administrator', status: 'active' }, order: [['id', 'ASC']], transaction, lock: transaction.LOCK.UPDATE });
    const found = await UserModel.findByPk(userId, { transaction, lock: transaction.LOCK.UPDATE });
    if (!found || (who.isDemo && !found.isDemo)) throw new Problem('not-found', problemText.noSuchPath);
    const before = { siteRole: found.siteRole, status: found.status };
    const refusal = accountRefusal({ before, after: wished, isYou: userId === who.id, otherAdministrators: administrators.filter(({ id, isDemo }) => id !== userId && isDemo === found.isDemo).length });
    if (refusal) throw fieldProblem(refusal.field, refusal.why);
    if (before.siteRole === wished.siteRole && before.status === wished.status) return;
    const shut = before.status === 'active' && wished.status === 'disabled';
    await found.update({ ...wished, ...(shut ? { sessionEpoch: found.sessionEpoch + 1 } : {}) }, { transaction });
    await AccountEventModel.create({
      userId, byId: who.id, at: now(), kind: 'changed', detail: { siteRoleBefore: before.siteRole, siteRole: wished.siteRole, statusBefore: before.status, status: wished.status },
    }, { transaction });
  });
}
