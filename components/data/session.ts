import { queryOptions, useQuery } from '@tanstack/react-query';

import type { SessionResponse } from '@/shared/contracts/session';

import { api } from './api';
import { unreadableProblem, type ApiProblem } from './problems';
import { STALE } from './queryClient';

export const sessionKeys = { session: ['session'] as const };

const isRecord = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null && !Array.isArray(value);
const hasText = (value: Record<string, unknown>, ...names: string[]) => names.every((name) => typeof value[name] === 'string');

/**
 * The shell needs the session on every page, the quick look included, which loads no contract library: so this one answer is
 * guarded by hand. A test holds the guard to the contract.
 */
export function isSession(value: unknown): value is SessionResponse {
  if (!isRecord(value) || typeof value['reviewsWaiting'] !== 'number') return false;
  const { user, demo } = value;
  const userFits = user === null || (isRecord(user) && hasText(user, 'id', 'name', 'email', 'siteRole') && typeof user['isDemo'] === 'boolean'
    && Array.isArray(user['projects']) && user['projects'].every((project) => isRecord(project) && hasText(project, 'id', 'key', 'name', 'role')));
  const demoFits = demo === null || (isRecord(demo) && hasText(demo, 'password') && typeof demo['mailbox'] === 'boolean'
    && Array.isArray(demo['accounts']) && demo['accounts'].every((account) => isRecord(account) && hasText(account, 'email', 'name', 'role')));
  return userFits && demoFits;
}

export const sessionOptions = queryOptions<SessionResponse, ApiProblem>({
  queryKey: sessionKeys.session,
  staleTime: STALE.minute,
  queryFn: async ({ signal }) => {
    const answer = await api.raw.get('/api/session', { signal });
    if (!isSession(answer)) throw unreadableProblem();
    return answer;
  },
});

/** Who is signed in (`data.user`, null = nobody), the Reviews badge, and whether demo accounts exist. */
export const useSession = () => useQuery(sessionOptions);
