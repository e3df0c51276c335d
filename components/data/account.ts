import { queryOptions, useMutation, useQuery, useQueryClient, type Query } from '@tanstack/react-query';

import type { InvitationView, SessionResponse, SignInRequest } from '@/shared/contracts/session';

import { api } from './api';
import { wipeDrafts } from './drafts';
import type { ApiProblem } from './problems';
import { lastReader, setLastReader } from './reader';
import { sessionKeys, sessionOptions } from './session';
import { sessionSettled } from './sessionEnd';

const isPersonal = (query: Query): boolean => query.queryKey[0] !== sessionKeys.session[0] && query.queryKey[0] !== 'relations' && query.queryKey[0] !== 'reader';

/** An act that answers with who is then asking. */
function useSessionAct<Request>(send: (request: Request) => Promise<SessionResponse>, isSignOut = false) {
  const client = useQueryClient();
  return useMutation<SessionResponse, ApiProblem, Request>({
    mutationFn: send,
    onSuccess: (session) => {
      if (isSignOut) wipeDrafts();
      sessionSettled();
      // what one person has read must not be there for the next: the cache goes unless the same person is back
      if (isSignOut || lastReader(client)?.id !== session.user?.id) client.removeQueries({ predicate: isPersonal });
      else void client.invalidateQueries({ predicate: isPersonal });
      if (session.user !== null) setLastReader(client, session.user);
      client.setQueryData(sessionOptions.queryKey, session);
    },
  });
}

export const useSignIn = () => useSessionAct<SignInRequest>((request) => api.post('/api/session', request, 'sessionResponse'));
export const useSignOut = () => useSessionAct<void>(() => api.delete('/api/session', {}, 'sessionResponse'), true);
export const useSignOutEverywhere = () => useSessionAct<void>(() => api.post('/api/session/end-all', {}, 'sessionResponse'), true);
export const useChangeName = () => useSessionAct<{ name: string }>((request) => api.put('/api/account/name', request, 'sessionResponse'));
export const useChangePassword = () => useSessionAct<{ current: string; next: string }>((request) => api.put('/api/account/password', request, 'sessionResponse'));
export const useAcceptInvitation = (token: string) =>
  useSessionAct<{ name?: string; password: string }>((request) => api.post(`/api/invitations/${encodeURIComponent(token)}/accept`, request, 'sessionResponse'));

export const useForgotPassword = () => useMutation<{ done: true }, ApiProblem, { email: string }>({ mutationFn: (request) => api.post('/api/password/forgot', request, 'done') });
export const useResetPassword = () => useMutation<{ done: true }, ApiProblem, { token: string; next: string }>({ mutationFn: (request) => api.post('/api/password/reset', request, 'done') });

export const invitationOptions = (token: string) => queryOptions<InvitationView, ApiProblem>({
  queryKey: ['invitation', token], queryFn: ({ signal }) => api.get(`/api/invitations/${encodeURIComponent(token)}`, 'invitationView', { signal }),
});
export const useInvitation = (token: string) => useQuery(invitationOptions(token));
