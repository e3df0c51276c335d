import type { Deps } from '@/server/deps';
import { readActor } from '@/server/auth/actor';
import { UserModel } from '@/server/db/models/UserModel';
import { route, type Route } from '@/server/http/route';
import { sessionResponse, signInRequest } from '@/shared/contracts/session';
import { presentSession } from './present';
import { addressOf, beginSession, checkCredentials, endAllSessions } from './service';

export const sessionRoutes = (deps: Deps): Route[] => [
  route({ method: 'get', path: '/api/session', access: 'optional', summary: 'Who is asking', response: sessionResponse },
    ({ who }) => presentSession(deps, who)),

  route({ method: 'post', path: '/api/session', access: 'optional', summary: 'Sign in', body: signInRequest, response: sessionResponse },
    async ({ body, req }) => {
      const person = await checkCredentials(deps, body.email, body.password, addressOf(req));
      await beginSession(deps, req, person);
      return presentSession(deps, await readActor(deps.db, person.id, person.sessionEpoch, deps.now()));
    }),

  route({ method: 'delete', path: '/api/session', access: 'optional', summary: 'Sign out on this device', response: sessionResponse },
    async ({ req, res }) => {
      await deps.sessions.end(req);
      res.clearCookie('tb.sid', { path: '/' });
      return presentSession(deps, null);
    }),

  route({ method: 'post', path: '/api/session/end-all', access: 'person', summary: 'Sign out on every device', response: sessionResponse },
    async ({ who, req, res }) => {
      const person = await UserModel.findByPk(who.id, { rejectOnEmpty: true });
      await endAllSessions(person);
      await deps.sessions.end(req);
      res.clearCookie('tb.sid', { path: '/' });
      return presentSession(deps, null);
    }),
];
