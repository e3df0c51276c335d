import { keepPreviousData, queryOptions, useMutation, useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';

import type { DoubleBondsResponse, QuickLookRequest, QuickLookResponse } from '@/shared/contracts/quickLook';
import { ENGINE_VERSION } from '@/shared/engine/version';
import { apiText } from '@/shared/text/uiApi';

import { api } from './api';
import { unreadableProblem, type ApiProblem } from './problems';
import { STALE } from './queryClient';

/** Rest after the last key before the server is asked. */
const DEBOUNCE_MS = 60;

export const quickLookKeys = { one: (request: QuickLookRequest) => ['quick-look', request] as const };

/**
 * The answer is not read against its contract here, because that library would double the weight of the first page: the
 * server that sends it has the same engine version or it is refused, and the server's own tests hold it to the contract.
 */
function isAnswer(value: unknown): value is QuickLookResponse {
  if (typeof value !== 'object' || value === null) return false;
  const { state, engineVersion } = value as { state?: unknown; engineVersion?: unknown };
  return (state === 'answered' || state === 'question') && engineVersion === ENGINE_VERSION;
}

/** An answer with what was asked: a drawing must not take its groups from an entry that came later. */
export interface LookedAt { request: QuickLookRequest; answer: QuickLookResponse }

const quickLookOptions = (request: QuickLookRequest) =>
  queryOptions<LookedAt, ApiProblem>({
    queryKey: quickLookKeys.one(request),
    // the same input gives the same answer, as long as the server has this engine
    staleTime: STALE.never,
    gcTime: STALE.minute,
    retry: false,
    queryFn: async ({ signal }) => {
      const answer = await api.raw.post('/api/quick-look', request, { signal, timeoutMs: 8_000 });
      if (!isAnswer(answer)) throw unreadableProblem(apiText.olderPage);
      return { request, answer };
    },
  });

/** The value, once it has rested. */
export function useRested<Value>(value: Value, restMs: number): Value {
  const [rested, setRested] = useState(value);
  useEffect(() => {
    if (Object.is(rested, value)) return undefined;
    const timer = setTimeout(() => setRested(value), restMs);
    return () => clearTimeout(timer);
  }, [value, rested, restMs]);
  return rested;
}

/**
 * Answers as one types: the request rests shortly, an outdated one is cancelled, and the last answer stays, marked stale, until
 * the next has come. `request` must keep its identity while its content is the same; null = nothing to ask.
 */
export function useQuickLook(request: QuickLookRequest | null) {
  const rested = useRested(request, DEBOUNCE_MS);
  const query = useQuery({ ...quickLookOptions(rested ?? { bond: 'single', j: '' }), enabled: rested !== null, placeholderData: keepPreviousData });
  const waiting = rested !== request || query.isPlaceholderData || query.isFetching;
  return { looked: request === null ? undefined : query.data, problem: waiting ? null : query.error, waiting: request !== null && waiting, refetch: query.refetch };
}

/** Which C=C a SMILES holds, with the groups on both ends. */
export const useDoubleBonds = () =>
  useMutation<DoubleBondsResponse, ApiProblem, string>({ mutationFn: (smiles) => api.post('/api/structures/double-bonds', { smiles }, 'doubleBondsResponse') });
