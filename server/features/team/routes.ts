import type { Request } from 'express';

import type { Actor } from '@/server/auth/actor';
import type { Deps } from '@/server/deps';
import { Problem } from '@/server/http/problems';
import { route, type Route } from '@/server/http/route';
import { done } from '@/shared/contracts/common';
import { problemText } from '@/shared/text/problems';
import { changeMemberRequest, changeProjectRequest, createProjectRequest, inviteRequest, projectResponse, teamResponse } from '@/shared/contracts/team';
import { readProject, readTeam } from './read';
import { changeMember, changeSettings, createProject, invite, removeMember, withdrawInvitation } from './service';

/** The same person once more: what they just changed may be their own role. */
async function asNow({ sessions }: Deps, request: Request): Promise<Actor> {
  const who = await sessions.actorOf(request);
  if (!who) throw new Problem('not-signed-in', problemText.signInFirst);
  return who;
}

const DONE = { done: true } as const;

export const teamRoutes = (deps: Deps): Route[] => [
  route({ method: 'get', path: '/api/team', access: 'person', summary: 'Your projects', response: teamResponse },
    ({ who }) => readTeam(deps, who)),

  route({ method: 'post', path: '/api/projects', access: 'person', summary: 'Open a project (administrators)', body: createProjectRequest, response: projectResponse, status: 201 },
    async ({ who, body, req }) => {
      const created = await createProject(deps, who, body);
      return readProject(deps, await asNow(deps, req), created);
    }),

  route({ method: 'get', path: '/api/projects/:projectId', access: 'person', summary: 'A project with its people, invitations, rules and log', response: projectResponse },
    ({ who, params }) => readProject(deps, who, params.projectId)),

  route({ method: 'put', path: '/api/projects/:projectId', access: 'person', summary: 'Change the rules of a project (leads)', body: changeProjectRequest, response: projectResponse },
    async ({ who, params, body }) => {
      await changeSettings(deps, who, params.projectId, body);
      return readProject(deps, who, params.projectId);
    }),

  route({ method: 'post', path: '/api/projects/:projectId/invitations', access: 'person', summary: 'Invite somebody by mail (leads)', body: inviteRequest, response: projectResponse, status: 201 },
    async ({ who, params, body, req }) => {
      await invite(deps, who, params.projectId, body, req);
      return readProject(deps, who, params.projectId);
    }),

  route({ method: 'delete', path: '/api/projects/:projectId/invitations/:invitationId', access: 'person', summary: 'Withdraw an invitation (leads)', response: done },
    async ({ who, params }) => {
      await withdrawInvitation(deps, who, params.projectId, params.invitationId);
      return DONE;
    }),

  route({ method: 'put', path: '/api/projects/:projectId/members/:userId', access: 'person', summary: 'Change a role or an end date (leads)', body: changeMemberRequest, response: projectResponse },
    async ({ who, params, body, req }) => {
      await changeMember(deps, who, params.projectId, params.userId, body);
      return readProject(deps, await asNow(deps, req), params.projectId);
    }),

  route({ method: 'delete', path: '/api/projects/:projectId/members/:userId', access: 'person', summary: 'Take somebody out of a project (leads), or leave it', response: done },
    async ({ who, params }) => {
      await removeMember(deps, who, params.projectId, params.userId);
      return DONE;
    }),
];
