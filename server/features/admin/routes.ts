import type { Deps } from '@/server/deps';
import { route, type Route } from '@/server/http/route';
import { adminUsersResponse, changeUserRequest } from '@/shared/contracts/team';
import { changeUser, readUsers } from './service';

export const adminRoutes = (deps: Deps): Route[] => [
  route({ method: 'get', path: '/api/admin/users', access: 'administrator', summary: 'Every account (administrators)', response: adminUsersResponse },
    ({ who }) => readUsers(deps, who)),

  route({ method: 'put', path: '/api/admin/users/:userId', access: 'administrator', summary: 'Change a site role, shut or open an account (administrators)', body: changeUserRequest, response: adminUsersResponse },
    async ({ who, params, body }) => {
      await changeUser(deps, who, params.userId, body);
      return readUsers(deps, who);
    }),
];
