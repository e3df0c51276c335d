import { queryOptions, useMutation, useQuery } from '@tanstack/react-query';
import { useMemo } from 'react';

import type { EvaluateResponse, RelationSummary, RelationsResponse } from '@/shared/contracts/relations';
import { ENGINE_VERSION } from '@/shared/engine/version';
import { apiText } from '@/shared/text/uiApi';

import { api } from './api';
import { unreadableProblem, type ApiProblem } from './problems';
import { STALE } from './queryClient';

export const relationKeys = { all: ['relations'] as const };

const isRecord = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null;

/** Read by hand for the same reason as the quick look's answer; each row is read again by the engine before it calculates. */
function isRelations(value: unknown): value is RelationsResponse {
  return isRecord(value) && value['engineVersion'] === ENGINE_VERSION && Array.isArray(value['relations'])
    && value['relations'].every((relation) => isRecord(relation) && typeof relation['id'] === 'string' && isRecord(relation['row']));
}

export const relationsOptions = queryOptions<RelationsResponse, ApiProblem>({
  queryKey: relationKeys.all,
  staleTime: STALE.never,
  queryFn: async ({ signal }) => {
    const answer = await api.raw.get('/api/relations', { signal });
    if (!isRelations(answer)) throw unreadableProblem(apiText.olderPage);
    return answer;
  },
});

/** Every held relation, with the rows that the device's engine runs on. */
export const useRelations = () => useQuery(relationsOptions);

/** One relation by `id` (its current version) or `id@version`. */
export function useRelation(ref: string) {
  const query = useRelations();
  const relation = useMemo(() => query.data && findRelation(query.data.relations, ref), [query.data, ref]);
  return { ...query, relation };
}

export function findRelation(relations: readonly RelationSummary[], ref: string): RelationSummary | undefined {
  const [id, version] = ref.split('@');
  const versions = relations.filter((relation) => relation.id === id);
  if (version !== undefined) return versions.find((relation) => String(relation.version) === version);
  return versions.sort((a, b) => Number(b.status === 'current') - Number(a.status === 'current') || b.version - a.version)[0];
}

export interface EvaluateInput { relation: string; phiDeg: number; groups?: { front: [string, string]; rear: [string, string] } }

/** J from φ by the server, whose number is the one to quote. */
export const useEvaluate = () =>
  useMutation<EvaluateResponse, ApiProblem, EvaluateInput>({ mutationFn: (input) => api.post('/api/relations/evaluate', input, 'evaluateResponse') });
