import request from 'supertest';

import { testServer, type Client, type TestServer } from '@/tests/helpers/server';
import { allRoutes } from '@/server/features';
import type { HealthResponse } from '@/shared/contracts/health';
import type { ProblemBody } from '@/shared/contracts/problem';
import { quickLookResponse, type DoubleBondsResponse, type QuickLookResponse } from '@/shared/contracts/quickLook';
import { relationsResponse, type EvaluateResponse, type InvertResponse, type RelationsResponse } from '@/shared/contracts/relations';
import { ENGINE_VERSION, quickLook, registryFromJson } from '@/shared/engine';

let server: TestServer;
let visitor: Client;
beforeAll(async () => {
  server = await testServer();
  visitor = server.visitor();
});
afterAll(() => server.stop());

const look = <T = QuickLookResponse>(body: object) => visitor.post<T>('/api/quick-look', body);
const crotonate = { left: ['H', 'C(H,H,H)'], right: ['H', 'C(=O,O)'] };

describe('a quick look', () => {
  it('is answered to anybody, as the engine answers, within its contract', async () => {
    const input = { bond: 'double' as const, j: '15.8', groups: { left: ['H', 'C(H,H,H)'] as [string, string], right: ['H', 'C(=O,O)'] as [string, string] } };
    const { status, body } = await look(input);
    expect(status).toBe(200);
    expect(quickLookResponse.parse(body)).toEqual(body);
    expect(body).toEqual(JSON.parse(JSON.stringify(quickLook(input, server.deps.relations))));
  });

  it('takes a number for what is typed, and a JSON null for nothing', async () => {
    const typed = await look({ bond: 'single', j: '7.5', se: '0.3' });
    const numbers = await look({ bond: 'single', j: 7.5, se: 0.3, partner: null, fieldMHz: null, groups: null });
    expect(numbers.body).toEqual(typed.body);
  });

  it('is the same, digit by digit, each time', async () => {
    const ask = () => look({ bond: 'single', j: '9.6', groups: { front: ['H', 'O(H)'], rear: ['C(C,H,H)', 'O(C)'] } });
    expect((await ask()).text).toBe((await ask()).text);
  });

  it('of a value that cannot be used names each field with its mends', async () => {
    const { status, body } = await look<ProblemBody>({ bond: 'double', j: '0.0158', se: '0', fieldMHz: '500' });
    expect(status).toBe(422);
    expect(body.type).toBe('/problems/invalid-input');
    expect(body.errors?.map(({ pointer }) => pointer).sort()).toEqual(['#/j', '#/se']);
    for (const error of body.errors ?? []) {
      expect(error.code).toBeTruthy();
      expect(error.detail).toMatch(/[.?]$/);
      expect(error.mends?.length).toBeGreaterThan(0);
    }
  });

  it('of null is refused, never read as 0', async () => expect((await look({ bond: 'single', j: null })).status).toBe(422));
});

describe('a SMILES in place of groups', () => {
  it('gives the answer of its groups, and says that its stereo marks were ignored', async () => {
    const bySmiles = await look({ bond: 'double', j: '15.8', smiles: 'C/C=C\\C(=O)OC' });
    const byGroups = await look({ bond: 'double', j: '15.8', groups: crotonate });
    const { notes, ...rest } = bySmiles.body;
    const { notes: plainNotes, ...plainRest } = byGroups.body;
    expect(rest).toEqual(plainRest);
    expect(notes).toEqual([...plainNotes, expect.objectContaining({ field: 'smiles', code: 'stereo-ignored' })]);
  });

  it('with two different C=C asks which one; each choice can be sent back', async () => {
    const { body } = await look({ bond: 'double', j: '15.8', smiles: 'CC=CCC=CC(=O)O' });
    if (body.state !== 'question') throw new Error(`a question was due, not ${body.state}`);
    expect(body.field).toBe('smiles');
    expect(body.choices).toHaveLength(2);
    for (const { value } of body.choices) expect((await look({ bond: 'double', j: '15.8', ...JSON.parse(value) as object })).body.state).toBe('answered');
  });

  it.each([['C((', 'unfinished'], ['CCO', 'No C=C'], ['not a smiles', 'could not be read']])('%s is refused in its field', async (smiles, part) => {
    const { status, body } = await look<ProblemBody>({ bond: 'double', j: '15.8', smiles });
    expect([status, body.errors?.[0]?.pointer]).toEqual([422, '#/smiles']);
    expect(body.detail).toContain(part);
  });

  it('beside groups is one too many', async () => expect((await look<ProblemBody>({ bond: 'double', j: '15.8', smiles: 'CC=CC', groups: crotonate })).body.errors?.[0]?.pointer).toBe('#/smiles'));

  it('is read by itself as well', async () => {
    const found = await visitor.post<DoubleBondsResponse>('/api/structures/double-bonds', { smiles: 'CC=CC(=O)OC' });
    expect(found.body.bonds).toMatchObject([{ groups: { left: ['H', 'C(H,H,H)'], right: ['H', 'C(=O,O)'] }, ringSize: null }]);
    expect((await visitor.post('/api/structures/double-bonds', { smiles: 'C((' })).body.errors?.[0]?.pointer).toBe('#/smiles');
  });
});

describe('the relations', () => {
  it('come with their rows, from which a device runs the same engine', async () => {
    const { body } = await visitor.get<RelationsResponse>('/api/relations');
    expect(relationsResponse.parse(body)).toEqual(body);
    expect(body.engineVersion).toBe(ENGINE_VERSION);
    const device = registryFromJson(body.relations.map(({ row }) => row));
    const input = { bond: 'single' as const, j: '9.1', groups: { front: ['H', 'O(H)'] as [string, string], rear: ['C(C,H,H)', 'O(C)'] as [string, string] } };
    expect(quickLook(input, device)).toEqual(quickLook(input, server.deps.relations));
  });

  it('are not sent again to who has them', async () => {
    const first = await request(server.app).get('/api/relations');
    const etag = first.headers.etag ?? '';
    expect(etag).toMatch(/^"[0-9a-f]{20}"$/);
    const again = await request(server.app).get('/api/relations').set('If-None-Match', `W/${etag}`);
    expect([again.status, again.text]).toEqual([304, '']);
  });

  const post = <T = ProblemBody>(act: 'evaluate' | 'invert', body: object) => visitor.post<T>(`/api/relations/${act}`, body);

  it('give J from an angle: 7 − cos 60° + 5 cos 120° = 4 Hz, by hand', async () => {
    const { body } = await post<EvaluateResponse>('evaluate', { relation: 'vicinal-hh/karplus-1963', phiDeg: 60 });
    expect(body.jHz).toBeCloseTo(4, 10);
    expect(body.relation).toMatchObject({ id: 'vicinal-hh/karplus-1963', version: 1 });
  });

  it('give every angle from J, and arcs only with a tolerance', async () => {
    const asked = { relation: 'vicinal-hh/karplus-1963@1', jHz: 4 };
    const { body } = await post<InvertResponse>('invert', asked);
    expect(body.arcs).toEqual([]);
    expect(body.roots.map(({ phiDeg }) => Math.round(phiDeg * 1000) / 1000)).toContain(60);
    for (const { phiDeg } of body.roots) expect((await post<EvaluateResponse>('evaluate', { relation: asked.relation, phiDeg })).body.jHz).toBeCloseTo(4, 8);
    expect((await post<InvertResponse>('invert', { ...asked, toleranceHz: 0.5 })).body.arcs.length).toBeGreaterThan(0);
  });

  const general = 'vicinal-hh/generalised-1980';
  it.each<[string, object, string]>([
    ['an unknown relation', { relation: 'vicinal-hh/none', phiDeg: 0 }, '#/relation'],
    ['a table of classes', { relation: 'alkene-hh/class-values', phiDeg: 0 }, '#/relation'],
    ['the generalised equation without groups', { relation: general, phiDeg: 0 }, '#/groups'],
    ['a group without its neighbours', { relation: general, phiDeg: 0, groups: { front: ['C', 'H'], rear: ['H', 'H'] } }, '#/groups'],
    ['a group without an electronegativity', { relation: general, phiDeg: 0, groups: { front: ['S(C)', 'H'], rear: ['H', 'H'] } }, '#/groups'],
    ['a group that is none', { relation: general, phiDeg: 0, groups: { front: ['??', 'H'], rear: ['H', 'H'] } }, '#/groups/front/0'],
    ['groups and substituents', { relation: general, phiDeg: 0, substituents: [], groups: { front: ['H', 'H'], rear: ['H', 'H'] } }, '#/substituents'],
    ['an angle beyond the circle', { relation: general, phiDeg: 400 }, '#/phiDeg'],
  ])('refuse %s', async (_name, body, pointer) => {
    const answer = await post('evaluate', body);
    expect([answer.status, answer.body.errors?.[0]?.pointer]).toEqual([422, pointer]);
  });
});

describe('the server tells of itself', () => {
  it('whether it is well', async () => {
    const { status, body: { uptimeS, ...rest } } = await visitor.get<HealthResponse>('/api/health');
    expect([status, rest]).toEqual([200, { status: 'ok', version: '1.0.0', engineVersion: ENGINE_VERSION, database: 'ok', schema: 'current', demo: false }]);
    expect(Number.isInteger(uptimeS)).toBe(true);
  });

  it('when the schema is behind', async () => {
    await server.database.asOwner('DELETE FROM schema_migrations WHERE name = ?', ['011-mailbox']);
    const { status, body } = await visitor.get<object>('/api/health');
    expect([status, body]).toEqual([503, expect.objectContaining({ status: 'degraded', database: 'ok', schema: 'behind' })]);
    await server.database.asOwner('INSERT INTO schema_migrations (name) VALUES (?)', ['011-mailbox']);
  });

  it('which routes it has, all of them and no more', async () => {
    const { body } = await visitor.get<{ openapi: string; paths: Record<string, Record<string, { responses: object }>> }>('/api/openapi.json');
    expect(body.openapi).toBe('3.1.0');
    const told = Object.entries(body.paths).flatMap(([path, acts]) => Object.keys(acts).map((method) => `${method} ${path}`));
    expect(told.sort()).toEqual(allRoutes(server.deps).map(({ method, path }) => `${method} ${path.replace(/:(\w+)/g, '{$1}')}`).sort());
    for (const acts of Object.values(body.paths)) for (const act of Object.values(acts)) expect(act.responses).toHaveProperty('default');
  });

  it('on a page without script or inline style', async () => {
    const { text, headers } = await visitor.get<object>('/api/docs');
    expect(headers['content-type']).toMatch(/^text\/html/);
    expect(text).not.toMatch(/<script|<style| style=| on[a-z]+=/);
    for (const { path } of allRoutes(server.deps)) expect(text).toContain(`<code>${path}</code>`);
    expect((await visitor.get<object>('/api/docs.css')).headers['content-type']).toMatch(/^text\/css/);
  });
});

it('keeps answering quick looks and says so when the database is gone', async () => {
  await server.deps.db.close();
  expect((await look({ bond: 'single', j: '7.6' })).status).toBe(200);
  const health = await visitor.get<object>('/api/health');
  expect([health.status, health.body]).toEqual([503, expect.objectContaining({ status: 'degraded', database: 'unreachable' })]);
});
