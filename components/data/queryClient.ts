import type { DefaultOptions } from '@tanstack/react-query';

import { ApiProblem } from './problems';

/** What was asked wrongly is not asked again; what did not arrive is tried twice more. */
export const shouldRetry = (failures: number, error: unknown): boolean =>
  failures < 2 && !(error instanceof ApiProblem && error.status >= 400 && error.status < 500);

export const STALE = { never: Infinity, minute: 60_000, always: 0 } as const;

export const queryDefaults: DefaultOptions = {
  // the browser's own word on being online is often wrong in a basement: the request itself tells
  queries: { retry: shouldRetry, retryDelay: (attempt) => 400 * 2 ** attempt, staleTime: STALE.always, refetchOnWindowFocus: true, networkMode: 'always' },
  mutations: { retry: false, networkMode: 'always' },
};
