import { QueryTypes } from 'sequelize';
import type { z } from 'zod';

import type { Actor } from '@/server/auth/actor';
import { Problem } from '@/server/http/problems';
import type { caseListQuery, CaseListResponse, CaseRow } from '@/shared/contracts/cases';
import { LIMITS } from '@/shared/limits';
import { casesText } from '@/shared/text/cases';
import type { Grade } from '@/shared/types/answer';
import type { CaseState } from '@/shared/types/case';
import type { CaseDeps } from './deps';
import { searchPatterns, searchQuery } from './searchText';

export type ListQuery = z.output<typeof caseListQuery>;
type Sort = NonNullable<ListQuery['sort']>;

/** Column, direction and index of each order; ties are broken by id, so that a page ends at one place only. */
const ORDERS: Readonly<Record<Sort, { column: string; descending: boolean; index: string }>> = {
  changed: { column: 'changed_at', descending: true, index: 'cases_changed' },
  created: { column: 'created_at', descending: true, index: 'cases_created' },
  code: { column: 'code_order', descending: true, index: 'cases_code' },
  due: { column: 'due_order', descending: false, index: 'cases_due' },
};

export interface Statement {
  sql: string;
  replacements: Record<string, unknown>;
}

interface Filter {
  where: string[];
  replacements: Record<string, unknown>;
}

/** Everything but the project: what a search or a chip asks for. `inText` leaves the search to who looks into the text itself. */
function filterOf(query: ListQuery, inText = false): Filter {
  const where: string[] = [];
  const replacements: Record<string, unknown> = {};
  const search = query.q && !inText ? searchQuery(query.q) : null;
  if (search !== null) {
    where.push('MATCH (c.search_text) AGAINST (:search IN BOOLEAN MODE)');
    replacements.search = search;
  }
  if (query.state) { where.push('c.state = :state'); replacements.state = query.state; }
  if (query.grade) { where.push('c.answer_grade = :grade'); replacements.grade = query.grade; }
  if (query.person) { where.push('(c.author_id = :person OR c.reviewer_id = :person)'); replacements.person = query.person; }
  if (query.compound) { where.push('c.compound = :compound'); replacements.compound = query.compound; }
  if (query.tag) {
    where.push('EXISTS (SELECT 1 FROM case_tags t WHERE t.case_id = c.id AND t.project_id = c.project_id AND t.tag = :tag)');
    replacements.tag = query.tag;
  }
  return { where, replacements };
}

const encodeCursor = (value: string, id: string) => Buffer.from(JSON.stringify([value, id])).toString('base64url');
/** @throws Problem when the text is no cursor of ours */
export function decodeCursor(cursor: string): { value: string; id: string } {
  try {
    const parsed: unknown = JSON.parse(Buffer.from(cursor, 'base64url').toString('utf8'));
    if (Array.isArray(parsed) && parsed.length === 2 && parsed.every((part): part is string => typeof part === 'string' && part.length <= 40)) {
      return { value: parsed[0]!, id: parsed[1]! };
    }
  } catch {
    // told below, as any other text that is no cursor
  }
  throw new Problem('invalid-input', casesText.staleCursor, { errors: [{ pointer: '#/cursor', detail: casesText.staleCursor }] });
}

const plainDate = (value: string): boolean => /^\d{4}-\d\d-\d\d( \d\d:\d\d:\d\d\.\d{3})?$/.test(value);

/**
 * The ids of one page, newest first. Each project is read along its own index and stops after one page, and the few rows are
 * merged: the cost does not grow with the log. A search goes through the full-text index in one piece.
 */
export function pageStatement(query: ListQuery, projectIds: readonly string[], limit: number, inText = false): Statement {
  const order = ORDERS[query.sort ?? 'changed'];
  const { where, replacements } = filterOf(query, inText);
  if (query.cursor) {
    const { value, id } = decodeCursor(query.cursor);
    if (order.column !== 'code_order' && !plainDate(value)) decodeCursor('');
    const sign = order.descending ? '<' : '>';
    where.push(`(c.${order.column} ${sign} :after OR (c.${order.column} = :after AND c.id ${sign} :afterId))`);
    replacements.after = value;
    replacements.afterId = id;
  }
  const direction = order.descending ? 'DESC' : 'ASC';
  const tail = `ORDER BY place ${direction}, id ${direction} LIMIT ${limit}`;
  const select = (source: string, project: string) =>
    `SELECT c.id AS id, c.${order.column} AS place FROM ${source} WHERE ${[project, ...where].join(' AND ')} ORDER BY c.${order.column} ${direction}, c.id ${direction} LIMIT ${limit}`;
  if (replacements.search !== undefined) {
    return { sql: select('cases c', 'c.project_id IN (:projects)'), replacements: { ...replacements, projects: [...projectIds] } };
  }
  const index = query.state && order.column === 'changed_at' ? 'cases_state_changed' : order.index;
  const parts = projectIds.map((projectId, i) => {
    replacements[`p${i}`] = projectId;
    return `(${select(`cases c FORCE INDEX (${index})`, `c.project_id = :p${i}`)})`;
  });
  return { sql: parts.length === 1 ? parts[0]! : `${parts.join(' UNION ALL ')} ${tail}`, replacements };
}

/** How many of the first cases are looked into before the full-text index is asked. */
const LOOKED_INTO = 200;

/**
 * A search among the first cases of the list alone. What many cases hold fills a page from there, without ordering thousands
 * of hits; when this gives less than a page, the full-text index answers.
 */
export function nearStatement(query: ListQuery, projectIds: readonly string[], limit: number): Statement {
  const { sql, replacements } = pageStatement(query, projectIds, LOOKED_INTO, true);
  const direction = ORDERS[query.sort ?? 'changed'].descending ? 'DESC' : 'ASC';
  const looks = searchPatterns(query.q ?? '').map((pattern, i) => {
    replacements[`look${i}`] = pattern;
    return `c.search_text LIKE :look${i} COLLATE utf8mb4_bin`;
  });
  return {
    sql: `SELECT t.id, t.place FROM (${sql}) t JOIN cases c ON c.id = t.id WHERE ${looks.join(' AND ')} ORDER BY t.place ${direction}, t.id ${direction} LIMIT ${limit}`, replacements,
  };
}

async function pageIds(deps: CaseDeps, query: ListQuery, projectIds: readonly string[], limit: number): Promise<string[]> {
  const read = async ({ sql, replacements }: Statement) => (await deps.db.query<{ id: string }>(sql, { replacements, type: QueryTypes.SELECT })).map(({ id }) => id);
  if (query.q && searchPatterns(query.q).length > 0) {
    const near = await read(nearStatement(query, projectIds, limit));
    if (near.length === limit) return near;
  }
  return read(pageStatement(query, projectIds, limit));
}

interface RawRow {
  id: string; code: string; code_order: string; project_id: string; project_name: string; question: string; compound: string; batch: string;
  key_label: string | null; key_j_text: string | null; answer_grade: Grade; answer_text: string; answer_judged: number; state: CaseState;
  author_id: string; author_name: string; reviewer_id: string | null; reviewer_name: string | null; held_until: Date | null; due_on: string | null;
  changed_at: Date; created_text: string; changed_text: string; due_text: string; revision: number; superseded_by: string | null;
}

async function rowsOf(deps: CaseDeps, ids: readonly string[]): Promise<RawRow[]> {
  if (ids.length === 0) return [];
  const rows = await deps.db.query<RawRow>(
    `SELECT c.id, c.code, c.code_order, c.project_id, p.name AS project_name, c.question, c.compound, c.batch, c.key_label, c.key_j_text, c.answer_grade, c.answer_text,
            c.answer_judged, c.state, c.author_id, a.name AS author_name, c.reviewer_id, r.name AS reviewer_name, c.held_until, DATE_FORMAT(c.due_on, '%Y-%m-%d') AS due_on,
            c.changed_at, DATE_FORMAT(c.changed_at, '%Y-%m-%d %H:%i:%s.%f') AS changed_text, DATE_FORMAT(c.created_at, '%Y-%m-%d %H:%i:%s.%f') AS created_text,
            DATE_FORMAT(c.due_order, '%Y-%m-%d') AS due_text, c.revision, s.code AS superseded_by
       FROM cases c JOIN projects p ON p.id = c.project_id JOIN users a ON a.id = c.author_id
       LEFT JOIN users r ON r.id = c.reviewer_id LEFT JOIN cases s ON s.id = c.superseded_by_id
      WHERE c.id IN (:ids)`, { replacements: { ids: [...ids] }, type: QueryTypes.SELECT });
  const byId = new Map(rows.map((row) => [row.id, row]));
  return ids.flatMap((id) => byId.get(id) ?? []);
}

async function tagsOf(deps: CaseDeps, ids: readonly string[]): Promise<Map<string, string[]>> {
  const tags = new Map<string, string[]>();
  if (ids.length === 0) return tags;
  const rows = await deps.db.query<{ case_id: string; tag: string }>('SELECT case_id, tag FROM case_tags WHERE case_id IN (:ids) ORDER BY tag', { replacements: { ids: [...ids] }, type: QueryTypes.SELECT });
  for (const { case_id: id, tag } of rows) tags.set(id, [...(tags.get(id) ?? []), tag]);
  return tags;
}

const OPEN = new Set<CaseState>(['draft', 'in-review', 'queried']);
interface Counts { total: number; open: number; notDecided: number }

function sum(groups: readonly { state: CaseState; grade: Grade; n: number | string }[]): Counts {
  const counts: Counts = { total: 0, open: 0, notDecided: 0 };
  for (const { state, grade, n } of groups) {
    counts.total += Number(n);
    if (OPEN.has(state)) counts.open += Number(n);
    if (grade === 'not-decided') counts.notDecided += Number(n);
  }
  return counts;
}

/** Exact counts: from the kept counters where they know the answer, else along the index of the filter. */
export function countStatement(query: ListQuery, projectIds: readonly string[]): Statement {
  const { where, replacements } = filterOf(query);
  const counted = query.q || query.person || query.tag || query.compound;
  const source = counted
    ? `SELECT c.state, c.answer_grade AS grade, COUNT(*) AS n FROM cases c WHERE ${['c.project_id IN (:projects)', ...where].join(' AND ')} GROUP BY c.state, c.answer_grade`
    : `SELECT c.state, c.grade, SUM(c.n) AS n FROM case_counts c WHERE ${['c.project_id IN (:projects)', ...where.map((part) => part.replace('c.answer_grade', 'c.grade'))].join(' AND ')} GROUP BY c.state, c.grade`;
  return { sql: source, replacements: { ...replacements, projects: [...projectIds] } };
}

type Count = (query: ListQuery, projectIds: readonly string[]) => Promise<Counts>;
const KEPT = 300;

/**
 * Counts, exact at any time: one of a search is kept until the stamp of a project in it moves, and the database raises that
 * with every change that could alter a count.
 */
function counting(deps: CaseDeps): Count {
  const kept = new Map<string, Counts>();
  const fresh: Count = async (query, projectIds) => {
    const { sql, replacements } = countStatement(query, projectIds);
    return sum(await deps.db.query<{ state: CaseState; grade: Grade; n: number | string }>(sql, { replacements, type: QueryTypes.SELECT }));
  };
  return async (query, projectIds) => {
    if (!query.q) return fresh(query, projectIds);
    const stamps = await deps.db.query<{ project_id: string; stamp: string }>(
      'SELECT project_id, stamp FROM case_stamps WHERE project_id IN (:projects) ORDER BY project_id', { replacements: { projects: [...projectIds] }, type: QueryTypes.SELECT });
    const { q, state, grade, person, tag, compound } = query;
    const key = JSON.stringify([stamps.map(({ project_id: id, stamp }) => [id, stamp]), q, state, grade, person, tag, compound]);
    const known = kept.get(key);
    if (known) return known;
    const counts = await fresh(query, projectIds);
    const oldest = kept.size >= KEPT ? kept.keys().next().value : undefined;
    if (oldest !== undefined) kept.delete(oldest);
    kept.set(key, counts);
    return counts;
  };
}

/** What the chips offer: projects of the person, authors and tags in them. Both lists hop along an index, one step a name. */
async function filtersOf(deps: CaseDeps, who: Actor): Promise<CaseListResponse['filters']> {
  const projects = who.projects.map(({ id, key, name, role }) => ({ id, key, name, role }));
  if (projects.length === 0) return { projects, people: [], tags: [] };
  const replacements = { projects: [...who.projectIds] };
  const [people, tags] = await Promise.all([
    deps.db.query<{ id: string; name: string }>(
      `SELECT u.id, u.name FROM (SELECT DISTINCT author_id FROM (SELECT project_id, author_id FROM cases WHERE project_id IN (:projects) GROUP BY project_id, author_id) g) d
         JOIN users u ON u.id = d.author_id ORDER BY u.name`, { replacements, type: QueryTypes.SELECT }),
    deps.db.query<{ tag: string }>(
      `SELECT DISTINCT tag FROM (SELECT project_id, tag FROM case_tags WHERE project_id IN (:projects) GROUP BY project_id, tag) g ORDER BY tag LIMIT 200`, { replacements, type: QueryTypes.SELECT }),
  ]);
  return { projects, people, tags: tags.map(({ tag }) => tag) };
}

const placeOf = (row: RawRow, sort: Sort): string =>
  sort === 'code' ? row.code_order : sort === 'due' ? row.due_text : (sort === 'created' ? row.created_text : row.changed_text).slice(0, 23);

const present = (row: RawRow, tags: string[], now: Date): CaseRow => ({
  id: row.id, code: row.code, projectId: row.project_id, projectName: row.project_name, question: row.question, compound: row.compound, batch: row.batch,
  keyReading: row.key_label === null || row.key_j_text === null ? null : { label: row.key_label, jText: row.key_j_text },
  answer: { grade: row.answer_grade, text: row.answer_text, judged: row.answer_judged === 1 }, state: row.state,
  author: { id: row.author_id, name: row.author_name },
  reviewer: row.reviewer_id !== null && (row.state === 'signed' || row.state === 'superseded' || (row.held_until !== null && row.held_until > now)) ? { id: row.reviewer_id, name: row.reviewer_name ?? '' } : null,
  dueOn: row.due_on, changedAt: row.changed_at.toISOString(), revision: row.revision, tags, supersededBy: row.superseded_by,
});

/** One page of the log, always within the projects of the person. */
export const caseList = (deps: CaseDeps) => {
  const countOf = counting(deps);
  return async (who: Actor, query: ListQuery): Promise<CaseListResponse> => {
    const projectIds = query.project ? who.projectIds.filter((id) => id === query.project) : who.projectIds;
    if (query.project && projectIds.length === 0) throw new Problem('not-found', casesText.notFoundProject);
    if (query.cursor) decodeCursor(query.cursor);
    const filters = await filtersOf(deps, who);
    if (projectIds.length === 0) return { cases: [], nextCursor: null, total: 0, open: 0, notDecided: 0, filters, elsewhere: 0 };
    const limit = query.limit ?? LIMITS.pageSize;
    const sort = query.sort ?? 'changed';
    const narrowed = query.q !== undefined && query.q !== '' && [query.project, query.state, query.grade, query.person, query.tag, query.compound].some((one) => one !== undefined);
    const [ids, counts, everywhere] = await Promise.all([
      pageIds(deps, query, projectIds, limit + 1),
      countOf(query, projectIds),
      narrowed ? countOf({ q: query.q }, who.projectIds) : null,
    ]);
    const page = ids.slice(0, limit);
    const [rows, tags] = await Promise.all([rowsOf(deps, page), tagsOf(deps, page)]);
    const last = rows[rows.length - 1];
    return {
      cases: rows.map((row) => present(row, tags.get(row.id) ?? [], deps.now())),
      nextCursor: ids.length > limit && last ? encodeCursor(placeOf(last, sort), last.id) : null,
      ...counts, filters, elsewhere: everywhere ? Math.max(0, everywhere.total - counts.total) : 0,
    };
  };
};
