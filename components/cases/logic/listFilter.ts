import { GRADES, type Grade } from '@/shared/types/answer';
import { CASE_STATES, type CaseState } from '@/shared/types/case';
import { LIMITS } from '@/shared/limits';

/** What a case list shows. It lives in the address, so that a link, a reload and the back button bring the same list. */
export interface CaseFilter {
  q?: string;
  project?: string;
  state?: CaseState;
  grade?: Grade;
  person?: string;
  tag?: string;
  sort?: CaseSort;
}
export const CASE_SORTS = ['changed', 'created', 'code', 'due'] as const;
export type CaseSort = (typeof CASE_SORTS)[number];
export const FILTER_KEYS = ['q', 'project', 'state', 'grade', 'person', 'tag', 'sort'] as const satisfies readonly (keyof CaseFilter)[];

type Params = Readonly<Record<string, string | string[] | undefined>>;

const one = (value: string | string[] | undefined): string | undefined => {
  const text = (Array.isArray(value) ? value[0] : value)?.trim();
  return text === undefined || text === '' ? undefined : text;
};
const oneOf = <T extends string>(value: string | undefined, allowed: readonly T[]): T | undefined => allowed.find((each) => each === value);
const isId = (value: string | undefined): string | undefined => (value !== undefined && /^[0-9a-f-]{36}$/i.test(value) ? value : undefined);

/** A filter out of an address. What the server would refuse (an unknown state, a cut-off id) is left out: the list then shows more, never an error. */
export function filterFrom(params: Params): CaseFilter {
  const sort = oneOf(one(params.sort), CASE_SORTS);
  return compact({
    q: one(params.q)?.slice(0, LIMITS.search),
    project: isId(one(params.project)),
    state: oneOf(one(params.state), CASE_STATES),
    grade: oneOf(one(params.grade), GRADES),
    person: isId(one(params.person)),
    tag: one(params.tag)?.slice(0, LIMITS.tag),
    sort: sort === 'changed' ? undefined : sort,
  });
}

/** The address's parameters for a filter; undefined takes one out of the address. */
export const paramsOf = (filter: CaseFilter): Record<(typeof FILTER_KEYS)[number], string | undefined> => ({
  q: filter.q || undefined, project: filter.project, state: filter.state, grade: filter.grade, person: filter.person, tag: filter.tag,
  sort: filter.sort === 'changed' ? undefined : filter.sort,
});

/** The query string of GET /api/cases. */
export function searchOf(filter: CaseFilter, cursor?: string): string {
  const search = new URLSearchParams();
  for (const key of FILTER_KEYS) { const value = paramsOf(filter)[key]; if (value !== undefined) search.set(key, value); }
  search.set('limit', String(LIMITS.pageSize));
  if (cursor !== undefined) search.set('cursor', cursor);
  return search.toString();
}

export const isFiltered = (filter: CaseFilter): boolean => FILTER_KEYS.some((key) => key !== 'sort' && filter[key] !== undefined);

function compact<T extends object>(value: T): T {
  return Object.fromEntries(Object.entries(value).filter(([, each]) => each !== undefined)) as T;
}
