import { QueryTypes } from 'sequelize';

import { countStatement, pageStatement, type ListQuery, type Statement } from '@/server/features/cases/list';
import { searchText } from '@/server/features/cases/searchText';
import type { CaseListResponse } from '@/shared/contracts/cases';
import { ok } from '@/tests/helpers/caseWork';
import { testServer, type Client, type TestServer } from '@/tests/helpers/server';

/** A log of ten thousand cases: what is asserted is the way the database takes, never a time. */
const MANY = 10_000;
let server: TestServer;
let author: Client;
let projectId: string;
beforeAll(async () => {
  server = await testServer();
  const mira = await server.person('Mira Adeyemi');
  projectId = await server.project('LOG', [{ who: mira, role: 'chemist' }]);
  author = await server.signedIn(mira);
  const words = (n: string) => `CONCAT('${searchText(['amide'])} q', ${n}, ' q', ${n}, 'x')`;
  await server.database.asOwner(
    `INSERT INTO cases (id, project_id, number, code, code_order, author_id, question, content_hash, compound, answer_grade, answer_text, created_at, changed_at, changed_by_id, search_text)
     SELECT UUID(), ?, seq, CONCAT('LOG-', LPAD(seq, 4, '0')), CONCAT('LOG-', LPAD(seq, 9, '0')), ?, CONCAT('Amide ', seq), REPEAT('a', 64), CONCAT('Amide ', seq),
            IF(seq MOD 3 = 0, 'not-decided', 'assigned'), 'E', NOW(3) - INTERVAL seq MINUTE, NOW(3) - INTERVAL seq SECOND, ?, ${words('seq')}
       FROM seq_1_to_${MANY}`, [projectId, mira.id, mira.id]);
  await server.database.asOwner("INSERT INTO case_tags (case_id, project_id, tag) SELECT id, project_id, CONCAT('tag ', number MOD 7) FROM cases");
  await server.database.asOwner('ANALYZE TABLE cases, case_tags');
}, 120_000);
afterAll(() => server.stop());

interface Plan { table: string | null; type: string | null; key: string | null; rows: number | string | null; Extra: string | null }
const explain = ({ sql, replacements }: Statement): Promise<Plan[]> => server.deps.db.query<Plan>(`EXPLAIN ${sql}`, { replacements, type: QueryTypes.SELECT });

it.each<[NonNullable<ListQuery['sort']>, string]>([['changed', 'cases_changed'], ['created', 'cases_created'], ['code', 'cases_code'], ['due', 'cases_due']])('reads a page sorted by %s along its index, without sorting', async (sort, index) => {
  for (const query of [{ sort }, { sort, cursor: ok(await author.get<CaseListResponse>(`/api/cases?sort=${sort}`)).nextCursor! }]) {
    const [plan] = await explain(pageStatement(query, [projectId], 26));
    expect(plan).toMatchObject({ key: index });
    expect(plan?.type).toMatch(/^(ref|range)$/);
    expect(plan?.Extra ?? '').not.toMatch(/filesort|temporary/);
  }
});

it('filters by state along the index of states', async () => {
  const [plan] = await explain(pageStatement({ state: 'draft' }, [projectId], 26));
  expect(plan?.key).toBe('cases_state_changed');
  expect(plan?.Extra ?? '').not.toMatch(/filesort/);
});

it('searches through the full-text index', async () => {
  for (const statement of [pageStatement({ q: '4711' }, [projectId], 26), countStatement({ q: '4711' }, [projectId])]) {
    const [plan] = await explain(statement);
    expect(plan).toMatchObject({ type: 'fulltext', key: 'cases_search' });
  }
  const found = ok(await author.get<CaseListResponse>('/api/cases?q=4711x'));
  expect(found.cases.map(({ code }) => code)).toEqual(['LOG-4711']);
});

it('counts from the counters that triggers keep, and they are exact', async () => {
  const [plan] = await explain(countStatement({}, [projectId]));
  expect(Number(plan?.rows)).toBeLessThan(50);
  expect(plan?.table).toBe('c');
  expect(countStatement({}, [projectId]).sql).toContain('case_counts');
  const list = ok(await author.get<CaseListResponse>('/api/cases'));
  expect(list).toMatchObject({ total: MANY, open: MANY, notDecided: Math.floor(MANY / 3) });
  expect(list.filters.tags).toHaveLength(7);
});

it('lists people and tags by hopping along an index', async () => {
  const db = server.deps.db;
  const replacements = { projects: [projectId] };
  for (const [sql, key] of [
    ['SELECT project_id, author_id FROM cases WHERE project_id IN (:projects) GROUP BY project_id, author_id', 'cases_author'],
    ['SELECT project_id, tag FROM case_tags WHERE project_id IN (:projects) GROUP BY project_id, tag', 'case_tags_tag'],
  ] as const) {
    const [plan] = await db.query<Plan>(`EXPLAIN ${sql}`, { replacements, type: QueryTypes.SELECT });
    expect(plan?.key).toBe(key);
    expect(plan?.Extra).toMatch(/Using index for group-by/);
  }
});

it('pages to the end of a large log without missing or doubling a case', async () => {
  const seen = new Set<string>();
  let cursor: string | null = null;
  for (let page = 0; page < 5; page += 1) {
    const answer: CaseListResponse = ok(await author.get<CaseListResponse>(`/api/cases?limit=100${cursor ? `&cursor=${cursor}` : ''}`));
    for (const { code } of answer.cases) seen.add(code);
    cursor = answer.nextCursor;
  }
  expect(seen.size).toBe(500);
  expect(seen.has('LOG-0500')).toBe(true);
});
