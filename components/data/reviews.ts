import { queryOptions, useQuery } from '@tanstack/react-query';

import type { ReviewsResponse, SignRequest } from '@/shared/contracts/reviews';
import type { ReviewStep } from '@/shared/types/trail';

import { api } from './api';
import { caseKeys, useCaseAct } from './cases';
import type { ApiProblem } from './problems';

export const reviewsOptions = queryOptions<ReviewsResponse, ApiProblem>({
  queryKey: caseKeys.reviews, queryFn: ({ signal }) => api.get('/api/reviews', 'reviewsResponse', { signal }),
});
export const useReviews = (enabled: boolean) => useQuery({ ...reviewsOptions, enabled });

const none = () => ({});
export const useClaim = () => useCaseAct<{ caseId: string }>(({ caseId }) => `/api/cases/${caseId}/claim`, none);
export const useRelease = (id: string) => useCaseAct<void>(() => `/api/cases/${id}/release`, none);
export const useCheck = (id: string) => useCaseAct<{ step: ReviewStep; checked: boolean; revision: number }>(() => `/api/cases/${id}/checks`, (request) => request);
export const useOpenQuery = (id: string) => useCaseAct<{ step: ReviewStep; stepKey: string | null; text: string }>(() => `/api/cases/${id}/queries`, (request) => request);
export const useReply = () => useCaseAct<{ queryId: string; text: string }>(({ queryId }) => `/api/queries/${queryId}/messages`, ({ text }) => ({ text }));
export const useCloseQuery = () => useCaseAct<{ queryId: string; text?: string }>(({ queryId }) => `/api/queries/${queryId}/close`, ({ text }) => (text ? { text } : {}));
export const useSign = (id: string) => useCaseAct<SignRequest>(() => `/api/cases/${id}/sign`, (request) => request);
export const useAddendum = (id: string) => useCaseAct<{ text: string; password: string }>(() => `/api/cases/${id}/addenda`, (request) => request);
