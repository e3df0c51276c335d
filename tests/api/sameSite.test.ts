import request from 'supertest';

import { testServer, PASSWORD, type TestPerson, type TestServer } from '@/tests/helpers/server';
import type { ProblemBody } from '@/shared/contracts/problem';
import type { SessionResponse } from '@/shared/contracts/session';

let server: TestServer;
let ada: TestPerson;
beforeAll(async () => {
  server = await testServer({ PUBLIC_URL: 'https://bond.example', TRUST_PROXY: '1' });
  ada = await server.person('Ada Lund');
});
afterAll(() => server.stop());

const body = () => JSON.stringify({ email: ada.email, password: PASSWORD });
const post = (headers: Record<string, string>, sent = body()) => request(server.app).post('/api/session').set(headers).send(sent);

describe('a change', () => {
  const JSON_TYPE = { 'Content-Type': 'application/json' };
  it.each<[string, Record<string, string>, number]>([
    ['as JSON without more', JSON_TYPE, 200],
    ['with a charset', { 'Content-Type': 'Application/JSON; charset=utf-8' }, 200],
    ['from this site', { ...JSON_TYPE, Host: 'lab.example', Origin: 'http://lab.example', 'Sec-Fetch-Site': 'same-origin' }, 200],
    ['from the public address behind a proxy', { ...JSON_TYPE, Host: '10.0.0.7:4300', Origin: 'https://bond.example' }, 200],
    ['from another site', { ...JSON_TYPE, Host: 'lab.example', Origin: 'https://evil.example' }, 403],
    ['from the same host on another port', { ...JSON_TYPE, Host: 'lab.example', Origin: 'http://lab.example:8080' }, 403],
    ['from a page without an origin', { ...JSON_TYPE, Origin: 'null' }, 403],
    ['from a sister site', { ...JSON_TYPE, 'Sec-Fetch-Site': 'same-site' }, 403],
    ['across sites', { ...JSON_TYPE, 'Sec-Fetch-Site': 'cross-site' }, 403],
    ['as a form', { 'Content-Type': 'application/x-www-form-urlencoded' }, 415],
    ['as text', { 'Content-Type': 'text/plain' }, 415],
    ['as a form with files', { 'Content-Type': 'multipart/form-data; boundary=x' }, 415],
    ['as something that only begins like JSON', { 'Content-Type': 'application/jsonp' }, 415],
  ])('%s', async (_name, headers, status) => {
    const answer = await post(headers);
    expect(answer.status).toBe(status);
    if (status !== 200) expect(answer.headers['content-type']).toMatch(/^application\/problem\+json/);
    if (status !== 200) expect(answer.headers['set-cookie']).toBeUndefined();
  });

  it('from another site does nothing with this person’s cookie', async () => {
    const client = await server.signedIn(ada);
    const answer = await client.agent.post('/api/session/end-all').set('Origin', 'https://evil.example').send({});
    expect([answer.status, (answer.body as ProblemBody).detail]).toEqual([403, 'This request came from another site, so nothing was done; use the page of this site.']);
    const deleted = await client.agent.delete('/api/session').set('Sec-Fetch-Site', 'cross-site');
    expect(deleted.status).toBe(403);
    expect((await client.get<SessionResponse>('/api/session')).body.user?.id).toBe(ada.id);
  });
});

describe('behind a TLS proxy', () => {
  it('the cookie is secure and the browser is told to insist on TLS', async () => {
    const answer = await post({ 'Content-Type': 'application/json', 'X-Forwarded-Proto': 'https' });
    expect(String(answer.headers['set-cookie'])).toMatch(/; Secure/);
    expect(answer.headers['strict-transport-security']).toMatch(/max-age=31536000/);
  });

  it('the address that tries are counted for is the one the proxy names', async () => {
    server.pass(900_000 - (server.deps.now().getTime() % 900_000));
    const from = (address: string) => post({ 'Content-Type': 'application/json', 'X-Forwarded-For': address }, JSON.stringify({ email: `${Math.random()}@team.example`, password: 'wrong' }));
    const tries = [];
    for (let i = 0; i < 61; i += 1) tries.push((await from('192.0.2.1')).status);
    expect(tries.at(-1)).toBe(429);
    expect((await from('192.0.2.2')).status).toBe(403);
  });
});

describe('every answer', () => {
  it.each(['/api/health', '/api/session', '/api/relations', '/api/nothing', '/api/docs'])('%s carries the headers and a number', async (path) => {
    const { headers } = await request(server.app).get(path);
    expect(headers['x-request-id']).toMatch(/^[0-9a-f-]{36}$/);
    expect(headers['x-content-type-options']).toBe('nosniff');
    expect(headers['content-security-policy']).toMatch(/default-src 'none'.*frame-ancestors 'none'/);
    expect(headers['x-powered-by']).toBeUndefined();
  });

  it('of a route without a session reads none, whatever cookie comes', async () => {
    const cookie = String((await post({ 'Content-Type': 'application/json' })).headers['set-cookie']).split(';')[0] ?? '';
    expect(cookie).toMatch(/^tb\.sid=/);
    const asked = jest.spyOn(server.deps.db, 'query');
    const answer = await request(server.app).post('/api/quick-look').set('Cookie', cookie).send({ bond: 'single', j: '7.6' });
    expect(answer.status).toBe(200);
    expect(asked).not.toHaveBeenCalled();
    asked.mockRestore();
    expect(answer.headers['set-cookie']).toBeUndefined();
  });
});

// last, because the models of a process belong to the newest server
it('without a proxy named, its headers are worth nothing', async () => {
  const plain = await testServer();
  const person = await plain.person('Bo Plain');
  const answer = await request(plain.app).post('/api/session').set('X-Forwarded-Proto', 'https').send({ email: person.email, password: PASSWORD });
  expect(String(answer.headers['set-cookie'])).not.toMatch(/Secure/);
  expect(answer.headers['strict-transport-security']).toBeUndefined();
  await plain.stop();
});
