import { z } from 'zod';

import { readActor } from '@/server/auth/actor';
import type { Deps } from '@/server/deps';
import { presentSession } from '@/server/features/session/present';
import { route, type Route } from '@/server/http/route';
import { done } from '@/shared/contracts/common';
import {
  acceptInvitationRequest, changeNameRequest, changePasswordRequest, forgotPasswordRequest, invitationView, resetPasswordRequest, sessionResponse,
} from '@/shared/contracts/session';
import { acceptInvitation, viewInvitation } from './invitations';
import { changeName, changePassword, forgotPassword, resetPassword } from './service';

const tokenParams = z.object({ token: z.string().min(20).max(200) });
const DONE = { done: true } as const;

export const accountRoutes = (deps: Deps): Route[] => [
  route({ method: 'put', path: '/api/account/name', access: 'person', summary: 'Change your name; signatures already given keep the old one', body: changeNameRequest, response: sessionResponse },
    async ({ who, body }) => {
      await changeName(who, body.name);
      return presentSession(deps, { ...who, name: body.name });
    }),

  route({ method: 'put', path: '/api/account/password', access: 'person', summary: 'Change your password; every other sign-in ends', body: changePasswordRequest, response: sessionResponse },
    async ({ who, body, req }) => {
      const { id, sessionEpoch } = await changePassword(deps, who, req, body);
      return presentSession(deps, await readActor(deps.db, id, sessionEpoch, deps.now()));
    }),

  route({ method: 'post', path: '/api/password/forgot', access: 'none', summary: 'Ask for a link to choose a new password; the same answer for every address', body: forgotPasswordRequest, response: done },
    async ({ body, req }) => {
      await forgotPassword(deps, req, body.email);
      return DONE;
    }),

  route({ method: 'post', path: '/api/password/reset', access: 'none', summary: 'Choose a new password by the link of a mail', body: resetPasswordRequest, response: done },
    async ({ body, req }) => {
      await resetPassword(deps, req, body);
      return DONE;
    }),

  route({ method: 'get', path: '/api/invitations/:token', access: 'none', summary: 'What an invitation offers', params: tokenParams, response: invitationView },
    ({ params, req, res }) => {
      res.setHeader('Cache-Control', 'no-store');
      return viewInvitation(deps, req, params.token);
    }),

  route({ method: 'post', path: '/api/invitations/:token/accept', access: 'optional', summary: 'Join a project; makes the account when there is none, and signs in', params: tokenParams, body: acceptInvitationRequest, response: sessionResponse },
    async ({ params, body, req }) => {
      const person = await acceptInvitation(deps, req, params.token, body);
      return presentSession(deps, await readActor(deps.db, person.id, person.sessionEpoch, deps.now()));
    }),
];
