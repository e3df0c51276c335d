import { useEffect, useSyncExternalStore } from 'react';
import { useQueryClient } from '@tanstack/react-query';

import { api, onReach } from './api';

/** Is the server reached? Told by the requests themselves: a browser's own word on being online is often wrong. */
export type Connection = { state: 'online' } | { state: 'offline'; since: Date } | { state: 'back' };

const ONLINE: Connection = { state: 'online' };
const PROBE_MS = 5_000;
const BACK_SHOWN_MS = 4_000;
let connection: Connection = ONLINE;
const listeners = new Set<() => void>();

function set(next: Connection) {
  connection = next;
  listeners.forEach((tell) => tell());
}

function reached(ok: boolean) {
  if (!ok && connection.state !== 'offline') set({ state: 'offline', since: new Date() });
  if (ok && connection.state === 'offline') {
    set({ state: 'back' });
    setTimeout(() => { if (connection.state === 'back') set(ONLINE); }, BACK_SHOWN_MS);
  }
}
onReach(reached);

const subscribe = (tell: () => void) => {
  listeners.add(tell);
  return () => { listeners.delete(tell); };
};
const probe = () => void api.raw.get('/api/health').catch(() => undefined); // a failure has told the watchers already

export const useConnection = (): Connection => useSyncExternalStore(subscribe, () => connection);

/** Mounted once by the shell: asks again while the server is away, and loads anew what is on screen when it is back. */
export function useConnectionWatch(): Connection {
  const now = useConnection();
  const client = useQueryClient();
  const { state } = now;
  useEffect(() => {
    const wentOffline = () => reached(false);
    window.addEventListener('offline', wentOffline);
    window.addEventListener('online', probe);
    return () => {
      window.removeEventListener('offline', wentOffline);
      window.removeEventListener('online', probe);
    };
  }, []);
  useEffect(() => {
    if (state === 'back') void client.invalidateQueries();
    if (state !== 'offline') return undefined;
    const timer = setInterval(probe, PROBE_MS);
    return () => clearInterval(timer);
  }, [state, client]);
  return now;
}
