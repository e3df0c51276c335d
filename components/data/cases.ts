import { infiniteQueryOptions, keepPreviousData, queryOptions, useInfiniteQuery, useMutation, useQuery, useQueryClient, type QueryClient } from '@tanstack/react-query';

import type {
  CaseListResponse, CaseResponse, CompareResponse, CreateCaseRequest, EventsResponse, RevisionsResponse, SaveCaseRequest,
} from '@/shared/contracts/cases';

import { api } from './api';
import type { ApiProblem } from './problems';
import { STALE } from './queryClient';
import { sessionKeys } from './session';

export const caseKeys = {
  lists: ['cases', 'list'] as const,
  list: (search: string) => ['cases', 'list', search] as const,
  one: (id: string) => ['cases', 'one', id] as const,
  history: (id: string) => ['cases', 'history', id] as const,
  reviews: ['reviews'] as const,
};

/** The log, page after page. `search` is the filter as a query string without a cursor. */
export const caseListOptions = (search: string) => infiniteQueryOptions<CaseListResponse, ApiProblem, { pages: CaseListResponse[] }, ReturnType<typeof caseKeys.list>, string | null>({
  queryKey: caseKeys.list(search),
  initialPageParam: null,
  queryFn: ({ pageParam, signal }) => api.get(`/api/cases?${search}${pageParam === null ? '' : `&cursor=${encodeURIComponent(pageParam)}`}`, 'caseListResponse', { signal }),
  getNextPageParam: (page) => page.nextCursor,
});
/** While another filter loads, the list of the last one stays in view. */
export const useCaseList = (search: string, enabled: boolean) => useInfiniteQuery({ ...caseListOptions(search), enabled, placeholderData: keepPreviousData });

export const caseOptions = (id: string) => queryOptions<CaseResponse, ApiProblem>({
  queryKey: caseKeys.one(id), staleTime: STALE.minute,
  queryFn: ({ signal }) => api.get(`/api/cases/${id}`, 'caseResponse', { signal }),
});
export const useCase = (id: string, enabled = true) => useQuery({ ...caseOptions(id), enabled });

/** The server's answer is the truth; everything that shows this case elsewhere is asked again. */
function keep(client: QueryClient, found: CaseResponse): CaseResponse {
  client.setQueryData(caseOptions(found.id).queryKey, found);
  void client.invalidateQueries({ queryKey: caseKeys.lists });
  void client.invalidateQueries({ queryKey: caseKeys.history(found.id) });
  void client.invalidateQueries({ queryKey: caseKeys.reviews });
  void client.invalidateQueries({ queryKey: sessionKeys.session });
  return found;
}

export function useCreateCase() {
  const client = useQueryClient();
  return useMutation<CaseResponse, ApiProblem, CreateCaseRequest>({
    mutationFn: (request) => api.post('/api/cases', request, 'caseResponse'),
    onSuccess: (found) => { keep(client, found); },
  });
}

export function useSaveCase(id: string) {
  const client = useQueryClient();
  return useMutation<CaseResponse, ApiProblem, SaveCaseRequest>({
    mutationFn: (request) => api.put(`/api/cases/${id}`, request, 'caseResponse'),
    onSuccess: (found) => { keep(client, found); },
  });
}

/** An act on a case that answers with the case as it then is: submit, withdraw, reopen, comments, and all acts of a review. */
export function useCaseAct<Request>(path: (request: Request) => string, body: (request: Request) => unknown) {
  const client = useQueryClient();
  return useMutation<CaseResponse, ApiProblem, Request>({
    mutationFn: (request) => api.post(path(request), body(request), 'caseResponse'),
    onSuccess: (found) => { keep(client, found); },
  });
}

export const useSubmitCase = (id: string) =>
  useCaseAct<{ seenVersion: number; dueOn: string | null; password: string }>(() => `/api/cases/${id}/submit`, (request) => request);
export const useWithdrawCase = (id: string) => useCaseAct<{ seenVersion: number; reason: string }>(() => `/api/cases/${id}/withdraw`, (request) => request);
export const useReopenCase = (id: string) => useCaseAct<{ seenVersion: number }>(() => `/api/cases/${id}/reopen`, (request) => request);
export const useComment = (id: string) => useCaseAct<{ target: string; text: string }>(() => `/api/cases/${id}/comments`, (request) => request);
export const useResolveComment = () => useCaseAct<{ commentId: string; resolved: boolean }>(({ commentId }) => `/api/comments/${commentId}/resolve`, ({ resolved }) => ({ resolved }));

export function useSupersedeCase(id: string) {
  const client = useQueryClient();
  return useMutation<{ newCaseId: string }, ApiProblem, { seenVersion: number; reason: string }>({
    mutationFn: (request) => api.post(`/api/cases/${id}/supersede`, request, 'supersedeResponse'),
    onSuccess: () => { void client.invalidateQueries({ queryKey: ['cases'] }); },
  });
}

export const revisionsOptions = (id: string) => queryOptions<RevisionsResponse, ApiProblem>({
  queryKey: [...caseKeys.history(id), 'revisions'], queryFn: ({ signal }) => api.get(`/api/cases/${id}/revisions`, 'revisionsResponse', { signal }),
});
export const useRevisions = (id: string, enabled: boolean) => useQuery({ ...revisionsOptions(id), enabled });
/** Two revisions never change: once compared, the answer is kept. */
export const useComparison = (id: string, from: number | null, to: number | null) => useQuery<CompareResponse, ApiProblem>({
  queryKey: ['cases', 'compare', id, from, to], enabled: from !== null && to !== null && from !== to, staleTime: STALE.never,
  queryFn: ({ signal }) => api.get(`/api/cases/${id}/compare?from=${from ?? ''}&to=${to ?? ''}`, 'compareResponse', { signal }),
});
export const useEvents = (id: string) => useQuery<EventsResponse, ApiProblem>({
  queryKey: [...caseKeys.history(id), 'events'], queryFn: ({ signal }) => api.get(`/api/cases/${id}/events`, 'eventsResponse', { signal }),
});
export const useSiText = (id: string) => useQuery<{ text: string }, ApiProblem>({
  queryKey: [...caseKeys.history(id), 'si'], queryFn: ({ signal }) => api.get(`/api/cases/${id}/si-text`, 'siTextResponse', { signal }),
});

export const sheetPath = (id: string, paper: 'A4' | 'Letter', revision: number, zone: string) =>
  `/api/cases/${id}/sheet.pdf?paper=${paper}&revision=${revision}&zone=${encodeURIComponent(zone)}`;
export const attachmentPath = (id: string) => `/api/attachments/${id}`;
