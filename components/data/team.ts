import { queryOptions, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';

import type { ProjectResponse, TeamResponse } from '@/shared/contracts/team';
import type { ProjectRole } from '@/shared/types/roles';

import { api } from './api';
import type { ApiProblem } from './problems';
import { sessionKeys } from './session';

export const teamKeys = { all: ['team'] as const, list: ['team', 'list'] as const, project: (id: string) => ['team', 'project', id] as const };

export const teamOptions = queryOptions<TeamResponse, ApiProblem>({ queryKey: teamKeys.list, queryFn: ({ signal }) => api.get('/api/team', 'teamResponse', { signal }) });
export const useTeam = (enabled: boolean) => useQuery({ ...teamOptions, enabled });
export const projectOptions = (id: string) => queryOptions<ProjectResponse, ApiProblem>({
  queryKey: teamKeys.project(id), queryFn: ({ signal }) => api.get(`/api/projects/${id}`, 'projectResponse', { signal }),
});
export const useProject = (id: string, enabled: boolean) => useQuery({ ...projectOptions(id), enabled });

function useProjectAct<Request, Answer>(send: (request: Request) => Promise<Answer>, kept?: (answer: Answer) => ProjectResponse) {
  const client = useQueryClient();
  return useMutation<Answer, ApiProblem, Request>({
    mutationFn: send,
    onSuccess: async (answer) => {
      if (kept) { const project = kept(answer); client.setQueryData(teamKeys.project(project.id), project); }
      // roles and projects are part of the session, and filters of the log name the projects
      await Promise.all([client.invalidateQueries({ queryKey: teamKeys.all }), client.invalidateQueries({ queryKey: sessionKeys.session }), client.invalidateQueries({ queryKey: ['cases', 'list'] })]);
    },
  });
}
const project = (answer: ProjectResponse) => answer;

export interface Invite { email: string; role: ProjectRole; guestUntil: string | null }
export interface ProjectRules { name: string; notebookPattern: string; claimHours: number; reviewDays: number; peerReview: boolean }
export const useCreateProject = () => useProjectAct<{ key: string; name: string }, ProjectResponse>((request) => api.post('/api/projects', request, 'projectResponse'), project);
export const useChangeProject = (id: string) => useProjectAct<ProjectRules, ProjectResponse>((request) => api.put(`/api/projects/${id}`, request, 'projectResponse'), project);
export const useInvite = (id: string) => useProjectAct<Invite, ProjectResponse>((request) => api.post(`/api/projects/${id}/invitations`, request, 'projectResponse'), project);
export const useWithdrawInvitation = (id: string) =>
  useProjectAct<{ invitationId: string }, { done: true }>(({ invitationId }) => api.delete(`/api/projects/${id}/invitations/${invitationId}`, {}, 'done'));
export const useChangeMember = (id: string) => useProjectAct<{ userId: string; role: ProjectRole; guestUntil: string | null }, ProjectResponse>(
  ({ userId, ...change }) => api.put(`/api/projects/${id}/members/${userId}`, change, 'projectResponse'), project);
export const useRemoveMember = (id: string) =>
  useProjectAct<{ userId: string }, { done: true }>(({ userId }) => api.delete(`/api/projects/${id}/members/${userId}`, {}, 'done'));
