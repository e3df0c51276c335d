import { useQueryClient, type QueryClient } from '@tanstack/react-query';
import { useEffect } from 'react';

import type { SessionResponse } from '@/shared/contracts/session';

import { useSession } from './session';

export type User = NonNullable<SessionResponse['user']>;
const READER = ['reader'] as const;

/** Whose data this page holds: the person last seen signed in, also while the session is out. */
export const lastReader = (client: QueryClient): User | null => client.getQueryData<User>(READER) ?? null;
export const setLastReader = (client: QueryClient, user: User): void => {
  client.setQueryDefaults(READER, { gcTime: Infinity });
  client.setQueryData(READER, user);
};

/**
 * The person at this page. `user` is who is signed in now; `reader` stays when the session runs out in the middle of work,
 * so that what was typed keeps its owner and its place on screen.
 */
export function useReader(): { user: User | null; reader: User | null; isLoading: boolean; isSignedIn: boolean; session: ReturnType<typeof useSession> } {
  const client = useQueryClient();
  const session = useSession();
  const user = session.data?.user ?? null;
  useEffect(() => { if (user !== null) setLastReader(client, user); }, [client, user]);
  return { user, reader: user ?? lastReader(client), isLoading: session.data === undefined && !session.isError, isSignedIn: user !== null, session };
}
