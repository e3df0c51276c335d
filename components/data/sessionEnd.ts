import { useSyncExternalStore } from 'react';
import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query';

import type { SessionResponse } from '@/shared/contracts/session';

import { ApiProblem } from './problems';
import { queryDefaults } from './queryClient';
import { sessionKeys } from './session';

/** A session that ended while someone was at work: the shell says so and what was typed stays. Signing out by hand is no such end. */
let ended = false;
const listeners = new Set<() => void>();
function set(next: boolean) {
  if (ended === next) return;
  ended = next;
  listeners.forEach((tell) => tell());
}
const subscribe = (tell: () => void) => {
  listeners.add(tell);
  return () => { listeners.delete(tell); };
};
export const useSessionEnded = (): boolean => useSyncExternalStore(subscribe, () => ended);
/** After signing in again, or signing out by hand. */
export const sessionSettled = () => set(false);

/** The one query client of the page: any answer "not signed in" to someone who was ends the session on screen. */
export function createQueryClient(): QueryClient {
  const notice = (error: unknown) => {
    if (!(error instanceof ApiProblem) || !error.is('not-signed-in')) return;
    const session = client.getQueryData<SessionResponse>(sessionKeys.session);
    if (!session?.user) return;
    client.setQueryData<SessionResponse>(sessionKeys.session, { ...session, user: null, reviewsWaiting: 0 });
    set(true);
  };
  const client: QueryClient = new QueryClient({
    defaultOptions: queryDefaults,
    queryCache: new QueryCache({ onError: notice }),
    mutationCache: new MutationCache({ onError: notice }),
  });
  return client;
}
