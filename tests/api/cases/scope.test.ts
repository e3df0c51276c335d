import { randomUUID } from 'node:crypto';

import { allRoutes } from '@/server/features';
import type { Route } from '@/server/http/route';
import type { CaseListResponse, CaseResponse } from '@/shared/contracts/cases';
import type { ReviewsResponse } from '@/shared/contracts/reviews';
import { cinnamate } from '@/tests/helpers/caseContent';
import { claim, draft, ok, submit } from '@/tests/helpers/caseWork';
import { PASSWORD, testServer, type Client, type TestServer } from '@/tests/helpers/server';

let server: TestServer;
let author: Client;
let outsider: Client;
let administrator: Client;
let guest: Client;
let reader: Client;
let one: CaseResponse;
let ids: { queryId: string; commentId: string; attachmentId: string };
let routes: Route[];
beforeAll(async () => {
  server = await testServer();
  const [mira, rafe, otto, anna, gus, rita] = await Promise.all([
    server.person('Mira Adeyemi'), server.person('Rafe Okonjo'), server.person('Otto Lind'), server.person('Anna Site', { siteRole: 'administrator' }), server.person('Gus Gone'), server.person('Rita Reads'),
  ]);
  const projectId = await server.project('HAZ', [{ who: mira, role: 'chemist' }, { who: rafe, role: 'reviewer' }, { who: gus, role: 'chemist', guestUntil: '2020-01-01' }, { who: rita, role: 'reader' }]);
  await server.project('ELM', [{ who: otto, role: 'lead' }]);
  const reviewer = await server.signedIn(rafe);
  [author, outsider, administrator, guest, reader] = await Promise.all([server.signedIn(mira), server.signedIn(otto), server.signedIn(anna), server.signedIn(gus), server.signedIn(rita)]);
  const first = await draft(author, projectId);
  const file = await author.agent.post(`/api/cases/${first.id}/attachments`).set('Content-Type', 'application/octet-stream').set('X-File-Name', 'list.csv').send(Buffer.from('a,b\n1,2\n'));
  const sent = await submit(author, first);
  await claim(reviewer, sent.id);
  const asked = ok(await reviewer.post<CaseResponse>(`/api/cases/${sent.id}/queries`, { step: 'domain', text: 'Why?' }));
  one = ok(await author.post<CaseResponse>(`/api/cases/${sent.id}/comments`, { target: 'question', text: 'Note.' }));
  ids = { queryId: asked.review.queries[0]!.id, commentId: one.comments[0]!.id, attachmentId: (file.body as { id: string }).id };
  routes = allRoutes(server.deps).filter(({ path }) => /^\/api\/(cases\/:|queries|comments|attachments)/.test(path));
});
afterAll(() => server.stop());

/** A request that would be fine for somebody who may. */
const bodyFor = (path: string): object => {
  const seen = { seenVersion: one.version };
  if (path.endsWith('/submit')) return { ...seen, password: PASSWORD };
  if (/\/(withdraw|supersede)$/.test(path)) return { ...seen, reason: 'A reason.' };
  if (path.endsWith('/reopen')) return seen;
  if (path.endsWith('/checks')) return { step: 'domain', checked: true, revision: one.revision };
  if (path.endsWith('/queries')) return { step: 'domain', text: 'Why?' };
  if (path.endsWith('/messages')) return { text: 'Because.' };
  if (path.endsWith('/comments')) return { target: 'question', text: 'Note.' };
  if (path.endsWith('/resolve')) return { resolved: true };
  if (path.endsWith('/sign')) return { ...seen, contentHash: one.contentHash, meaning: 'review', password: PASSWORD };
  if (path.endsWith('/addenda')) return { text: 'Late.', password: PASSWORD };
  if (path === '/api/cases/:caseId') return { ...seen, content: one.content };
  return {};
};
const fill = (path: string, caseId: string): string => path.replace(':caseId', caseId).replace(':queryId', ids.queryId).replace(':commentId', ids.commentId).replace(':attachmentId', ids.attachmentId).replace(':revision', '1');
const ask = async (client: Client, route: Route, caseId: string): Promise<number> => {
  const path = fill(route.path, caseId) + (route.path.endsWith('/compare') ? '?from=1&to=2' : '');
  if (route.uploadBytes !== null) return (await client.agent.post(path).set('Content-Type', 'application/octet-stream').set('X-File-Name', 'a.txt').send(Buffer.from('text'))).status;
  if (route.method === 'get') return (await client.get(path)).status;
  return (route.method === 'put' ? await client.put(path, bodyFor(route.path)) : await client.post(path, bodyFor(route.path))).status;
};

it('covers every route that names a case, a query, a comment or a file', () => {
  expect(routes.length).toBeGreaterThanOrEqual(22);
});

it('answers "not found" to somebody of another project, to a site administrator and to a guest whose time is over', async () => {
  for (const route of routes) {
    for (const [name, client] of Object.entries({ outsider, administrator, guest })) expect([name, route.method, route.path, await ask(client, route, one.id)]).toEqual([name, route.method, route.path, 404]);
  }
});

it('answers the same to an id that nobody has', async () => {
  for (const route of routes.filter(({ path }) => path.includes(':caseId'))) expect([route.path, await ask(author, route, randomUUID())]).toEqual([route.path, 404]);
});

it('asks everybody else to sign in', async () => {
  for (const route of routes) expect([route.path, await ask(server.visitor(), route, one.id)]).toEqual([route.path, 401]);
});

it('lets a reader read everything and change nothing', async () => {
  for (const route of routes) expect([route.method, route.path, await ask(reader, route, one.id)]).toEqual([route.method, route.path, route.method === 'get' ? 200 : 403]);
});

it('shows another project nothing in lists, counts and the worklist', async () => {
  const list = ok(await outsider.get<CaseListResponse>('/api/cases?q=cinnamate'));
  expect(list).toMatchObject({ cases: [], total: 0, open: 0, notDecided: 0, elsewhere: 0, filters: { people: [], tags: [] } });
  expect((await outsider.get(`/api/cases?project=${one.project.id}`)).status).toBe(404);
  expect(ok(await outsider.get<ReviewsResponse>('/api/reviews'))).toEqual({ heldByYou: [], waiting: [], heldByOthers: [], yourCases: [] });
  expect((await outsider.post('/api/cases', { projectId: one.project.id, question: 'Mine?' })).status).toBe(404);
  expect((await reader.post('/api/cases', { projectId: one.project.id, question: 'Mine?' })).status).toBe(403);
});

describe('bad input never harms, and is told in a sentence', () => {
  const reading = cinnamate().readings[0]!;
  it.each<[string, object]>([
    ['an unknown field', { ...cinnamate(), extra: 1 }],
    ['a number for text', { ...cinnamate(), question: 7 }],
    ['an empty question', cinnamate({ question: '  ' })],
    ['a question that is too long', cinnamate({ question: 'x'.repeat(201) })],
    ['too many readings', cinnamate({ readings: Array.from({ length: 101 }, (_, i) => ({ ...reading, id: `r${i}` })) })],
    ['a J that is too long', cinnamate({ readings: [{ ...reading, j: '1'.repeat(41) }] })],
    ['a row id with a space', cinnamate({ readings: [{ ...reading, id: 'a b' }] })],
    ['a path that is none', cinnamate({ readings: [{ ...reading, path: '9J' as '3J' }] })],
    ['a grade that is none', { ...cinnamate(), answer: { ...cinnamate().answer, grade: 'sure' } }],
    ['null for a list', { ...cinnamate(), candidates: null }],
    ['a ring of 12', { ...cinnamate(), calculations: [{ id: 'c1', readingId: 'r1', bond: 'double', ringSize: 12 }] }],
    ['an angle that is too large', cinnamate({ candidates: [{ id: 'a', name: 'a', description: '', claims: [{ calculationId: 'c1', kind: 'angle', fromDeg: 0, toDeg: 900 }] }] })],
    ['another case\'s file', cinnamate({ evidence: [{ id: 'e', kind: 'noe', text: '', bearing: 'for', candidateId: null, attachmentIds: [randomUUID()] }] })],
    ['a calculation without its reading', cinnamate({ readings: [] })],
  ])('%s', async (_what, content) => {
    const fresh = await draft(author, one.project.id);
    const answer = await author.put(`/api/cases/${fresh.id}`, { seenVersion: fresh.version, content });
    expect(answer.status).toBe(422);
    expect(answer.body.errors?.length).toBeGreaterThan(0);
    for (const { pointer, detail } of answer.body.errors ?? []) {
      expect(pointer).toMatch(/^#\/content/);
      expect(detail).toMatch(/^[A-Z].+/);
    }
    expect(ok(await author.get<CaseResponse>(`/api/cases/${fresh.id}`)).version).toBe(fresh.version);
  });

  it('odd text in groups and numbers is kept, and the trail says what it cannot read', async () => {
    const fresh = await draft(author, one.project.id);
    const odd = cinnamate({
      readings: [{ ...reading, j: '\u{1F600} 9,6', se: '−0', partner: '<' }],
      calculations: [{ id: 'c1', readingId: 'r1', bond: 'double', groups: { left: ['Xx(', 'H'], right: ["'; DROP TABLE cases; --", 'H'] } }, { id: 'c2', readingId: 'r1', bond: 'single', relation: 'nothing@99', groups: null }],
      candidates: [{ id: 'a', name: '\u202eevil', description: '', claims: [{ calculationId: 'gone', kind: 'geometry', geometry: 'cis' }] }],
    });
    const kept = ok(await author.put<CaseResponse>(`/api/cases/${fresh.id}`, { seenVersion: fresh.version, content: odd }));
    expect(kept.content).toEqual({ ...odd, tags: odd.tags });
    expect(kept.trail.calculations.map(({ result }) => result.state)).not.toContain('answered');
    expect((await author.get(`/api/cases/${fresh.id}/sheet.pdf`)).status).toBe(200);
  });

  it.each<[string, string]>([
    ['/api/cases?limit=0', 'limit'], ['/api/cases?limit=x', 'limit'], ['/api/cases?state=lost', 'state'], ['/api/cases?person=me', 'person'], ['/api/cases?nothing=1', 'nothing'],
    [`/api/cases?q=${'x'.repeat(201)}`, 'q'], ['/api/cases?q=a&q=b', 'q'],
  ])('%s', async (path, field) => {
    const answer = await author.get(path);
    expect(answer.status).toBe(422);
    expect(answer.body.errors?.map(({ pointer }) => pointer)).toEqual([`#/${field}`]);
  });

  it('an address that names nothing', async () => {
    for (const path of [`/api/cases/${one.id}/revisions/0`, `/api/cases/${one.id}/revisions/99`, `/api/cases/${one.id}/revisions/x`, '/api/cases/not-an-id']) expect([path, (await author.get(path)).status]).toEqual([path, 404]);
    expect((await author.get(`/api/cases/${one.id}/compare?from=1`)).status).toBe(422);
    expect((await author.get(`/api/cases/${one.id}/sheet.pdf?zone=Mars/Base`)).status).toBe(422);
    expect((await author.get(`/api/cases/${one.id}/sheet.pdf?paper=A5`)).status).toBe(422);
  });
});
