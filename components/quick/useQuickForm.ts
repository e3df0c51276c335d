import { useLocalSearchParams } from 'expo-router';
import { useCallback, useEffect, useMemo, useState } from 'react';

import type { QuickLookRequest } from '@/shared/contracts/quickLook';

import { emptyForm, fromQuery, isAsked, toQuery, toRequest, withField, type QuickForm } from './form';

/** The inputs of this tab, so that a look at another place and back finds them again; the address holds them for a reload. */
const KEPT_AT = 'throughbond.quick';
const readKept = (): string => {
  try { return window.sessionStorage.getItem(KEPT_AT) ?? ''; } catch { return ''; }
};
const keep = (query: string) => {
  try { window.sessionStorage.setItem(KEPT_AT, query); } catch { /* the address still holds them */ }
};

/** What the address held when the screen opened; while the router is on its way here from another screen, that is still the other's address. */
const startQuery = (routed: Record<string, string | string[]>): string => {
  if (window.location.pathname === '/') return window.location.search;
  return new URLSearchParams(Object.entries(routed).filter((entry): entry is [string, string] => typeof entry[1] === 'string')).toString();
};

const WRITE_REST_MS = 250;

export interface QuickFormHandle {
  form: QuickForm;
  set: (change: Partial<QuickForm>) => void;
  /** by the name that the server gives a field */
  setField: (field: string, value: string) => void;
  clear: () => void;
  /** null while there is nothing to ask; the same object while its content is the same */
  request: QuickLookRequest | null;
  /** address of this page with these inputs */
  link: () => string;
}

export function useQuickForm(): QuickFormHandle {
  const routed = useLocalSearchParams();
  const [form, setForm] = useState(() => fromQuery(startQuery(routed) || readKept()));
  const query = toQuery(form);
  useEffect(() => {
    // replaced, not pushed: Back leaves the quick look and does not undo key presses. The router's own state of the entry stays.
    const timer = setTimeout(() => {
      keep(query);
      if (window.location.pathname === '/' && window.location.search !== query) window.history.replaceState(window.history.state, '', `/${query}`);
    }, WRITE_REST_MS);
    return () => clearTimeout(timer);
  }, [query]);
  const body = isAsked(form) ? JSON.stringify(toRequest(form)) : null;
  const request = useMemo(() => (body === null ? null : (JSON.parse(body) as QuickLookRequest)), [body]);
  const set = useCallback((change: Partial<QuickForm>) => setForm((now) => ({ ...now, ...change })), []);
  const setField = useCallback((field: string, value: string) => setForm((now) => withField(now, field, value)), []);
  const clear = useCallback(() => setForm((now) => emptyForm(now.bond)), []);
  const link = useCallback(() => `${window.location.origin}/${query}`, [query]);
  return { form, set, setField, clear, request, link };
}
