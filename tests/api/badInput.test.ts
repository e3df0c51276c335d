import { z } from 'zod';

import { testServer, type Client, type TestPerson, type TestServer } from '@/tests/helpers/server';
import { allRoutes } from '@/server/features';
import type { Route } from '@/server/http/route';
import { problemBody } from '@/shared/contracts/problem';
import { LIMITS } from '@/shared/limits';

let server: TestServer;
let root: TestPerson;
let client: Client;
let visitor: Client;
let routes: Route[];
beforeAll(async () => {
  server = await testServer();
  root = await server.person('Root Admin', { siteRole: 'administrator' });
  await server.project('HAZ', [{ who: root, role: 'lead' }]);
  visitor = server.visitor();
  routes = allRoutes(server.deps);
});
afterAll(() => server.stop());
// The counters of tries are tested elsewhere, and a route that signs out must not spoil the next test.
beforeEach(async () => {
  await server.database.asOwner('DELETE FROM rate_counters');
  client = await server.signedIn(root);
});

const NOWHERE = '00000000-0000-4000-8000-000000000000';
/** An address of the route that names nothing that is there. */
const pathOf = ({ path }: Route, fill = NOWHERE) => path.replace(/:(\w+)/g, fill);
const named = (one: Route) => `${one.method.toUpperCase()} ${one.path}`;

interface Told {
  route: string;
  status: number;
  problem: boolean;
}
/** Sends the same to every route that takes a body, and says how each answered. */
async function toAll(chosen: readonly Route[], send: (one: Route) => Promise<{ status: number; headers: Record<string, unknown>; body: unknown }>): Promise<Told[]> {
  const told: Told[] = [];
  for (const one of chosen) {
    const { status, headers, body } = await send(one);
    const isProblem = /^application\/problem\+json/.test(String(headers['content-type'])) && problemBody.safeParse(body).success;
    told.push({ route: named(one), status, problem: isProblem });
  }
  return told;
}
/** All but those that would end this very session, which then answers 401 for the rest. */
const staysIn = ({ path, method }: Route) => !(path === '/api/session/end-all' || (path === '/api/session' && method === 'delete'));
const takingJson = () => routes.filter((one) => one.body !== null && staysIn(one));
const expectRefusals = (told: Told[], statuses: readonly number[]) => {
  expect(told.length).toBeGreaterThan(0);
  expect(told.filter(({ status, problem }) => !problem || !statuses.includes(status))).toEqual([]);
};
const raw = (one: Route, body: string, type = 'application/json'): Promise<{ status: number; headers: Record<string, unknown>; body: unknown }> => client.agent[one.method](pathOf(one)).set('Content-Type', type).send(body).then();

it('the table holds every kind of route', () => {
  expect(new Set(routes.map(({ method }) => method))).toEqual(new Set(['get', 'post', 'put', 'delete']));
  expect(takingJson().length).toBeGreaterThan(15);
  expect(new Set(routes.map(named)).size).toBe(routes.length);
});

describe('every route that takes JSON', () => {
  it.each(['{"bond": ', '"text"', 'null', '\u0000', '{"a":1}{"b":2}'])('refuses %j', async (text) => {
    expectRefusals(await toAll(takingJson(), (one) => raw(one, text)), [400, 404, 409, 415, 422]);
  });

  it.each([['a list', []], ['a field that is not there', { nothingOfOurs: 1 }], ['a field of the prototype', JSON.parse('{"__proto__":{"isDemo":true},"constructor":{}}') as object]])('refuses %s', async (_name, body) => {
    // a route whose body may be empty takes one without fields; it must still refuse a field it does not know
    expectRefusals(await toAll(takingJson(), (one) => raw(one, JSON.stringify(body))), [404, 409, 422]);
  });

  it('refuses more than it takes in one go', async () => {
    const large = JSON.stringify({ text: 'x'.repeat(LIMITS.jsonBytes) });
    expectRefusals(await toAll(takingJson(), (one) => raw(one, large)), [413]);
  });

  it('refuses another kind of body', async () => {
    for (const type of ['text/plain', 'application/xml', 'application/x-www-form-urlencoded']) {
      expectRefusals(await toAll(takingJson(), (one) => raw(one, '{}', type)), [415]);
    }
  });

  it('refuses an encoding it does not know, and a broken one', async () => {
    for (const encoding of ['gzip', 'br', 'made-up']) {
      expectRefusals(await toAll(takingJson(), (one) => client.agent[one.method](pathOf(one)).set('Content-Type', 'application/json').set('Content-Encoding', encoding).send('{}').then()), [400, 415]);
    }
    expectRefusals(await toAll(takingJson(), (one) => raw(one, '{}', 'application/json; charset=klingon')), [415]);
  });
});

/** Values of every wrong kind for one field. */
const WRONG: readonly unknown[] = [null, -1, 1e308, ' ', 'x'.repeat(5000), ['x'], { a: 1 }, '\u0000\ud800', "'; DROP TABLE users; --"];

it('every field of every body, set to any kind of value, is answered and never with 500', async () => {
  const failed: string[] = [];
  for (const one of takingJson()) {
    const described = z.toJSONSchema(one.body ?? z.unknown(), { io: 'input', unrepresentable: 'any' });
    const shapes = [described, ...described.oneOf ?? [], ...described.anyOf ?? []];
    const fields = [...new Set(shapes.flatMap((shape) => Object.keys((typeof shape === 'object' ? shape.properties : undefined) ?? {})))];
    for (const value of WRONG) {
      // all at once: a schema tells every field it refuses, and a field alone would only meet "this is missing" for the rest
      const { status, body } = await raw(one, JSON.stringify(Object.fromEntries(fields.map((field) => [field, value]))));
      if (status >= 500 || (status >= 400 && !problemBody.safeParse(body).success)) failed.push(`${named(one)} all ${JSON.stringify(value)?.slice(0, 60)}: ${status}`);
    }
  }
  expect(failed).toEqual([]);
});

describe('every address with a place for an id', () => {
  const withPlace = () => routes.filter(({ path }) => path.includes(':'));
  it.each([NOWHERE, '1', '%00', '%2e%2e%2f', "1' OR '1'='1", 'x'.repeat(3000)])('answers %j as not there', async (fill) => {
    const told = await toAll(withPlace(), (one) => client.agent[one.method](pathOf(one, encodeURI(fill).replace(/%25/g, '%'))).set('Content-Type', one.uploadBytes === null ? 'application/json' : 'application/octet-stream').send(one.uploadBytes === null ? '{}' : 'x').then());
    expectRefusals(told, [404, 410, 422]);
  });

  it('answers a broken percent sign as not there', async () => {
    expectRefusals(await toAll(withPlace(), (one) => client.agent[one.method](pathOf(one, '%E0%A4%A')).set('Content-Type', one.uploadBytes === null ? 'application/json' : 'application/octet-stream').send('{}').then()), [404]);
  });
});

it('every query is answered, whatever stands in it', async () => {
  const failed: string[] = [];
  for (const one of routes.filter(({ method }) => method === 'get')) {
    const known = one.query ? Object.keys(z.toJSONSchema(one.query, { io: 'input', unrepresentable: 'any' }).properties ?? {}) : [];
    for (const field of [...known, 'nothing']) {
      for (const value of ['', 'x'.repeat(2000), '-1', '%00', '%ZZ', "' OR 1=1", `a&${field}=b`]) {
        const { status } = await client.agent.get(`${pathOf(one)}?${field}=${value === '%ZZ' || value === '%00' || value.includes('&') ? value : encodeURIComponent(value)}`).then();
        if (status >= 500) failed.push(`${named(one)}?${field}=${value.slice(0, 30)}: ${status}`);
      }
    }
  }
  expect(failed).toEqual([]);
});

describe('a visitor', () => {
  it('is told to sign in on every route for people, before anything else is looked at', async () => {
    const closed = routes.filter(({ access }) => access === 'person' || access === 'administrator');
    const told = await toAll(closed, (one) => visitor.agent[one.method](pathOf(one)).set('Content-Type', 'application/json').send('{"bond": ').then());
    expectRefusals(told, [401]);
  });
  it('gets a problem for what is not there', async () => {
    for (const path of ['/api', '/api/', '/api/nothing', '/api/cases/../../etc/passwd', '/api/%E0%A4%A', '/nothing.js']) {
      const { status, body } = await visitor.get(path);
      expect([path, status, body.type]).toEqual([path, 404, '/problems/not-found']);
    }
  });
  it('gets a problem for a method that is not there', async () => {
    for (const method of ['put', 'patch', 'delete'] as const) {
      const answer = await visitor.agent[method]('/api/quick-look').set('Content-Type', 'application/json').send('{}');
      expect(answer.status).toBe(404);
    }
  });
});

it('what went wrong is told in one sentence for each field, with its place', async () => {
  const { status, body } = await client.put(`/api/projects/${NOWHERE}`, { name: 'x'.repeat(101), claimHours: 1.5, reviewDays: 'soon', peerReview: 'yes', 'a/b~c': 1 });
  expect(status).toBe(422);
  expect(body).toMatchObject({ type: '/problems/invalid-input', title: 'Some fields need attention', detail: 'Check the marked fields.' });
  expect(body.errors).toEqual([
    { pointer: '#/name', detail: 'At most 100 characters.', code: 'too-big' },
    { pointer: '#/notebookPattern', detail: 'This is missing: fill it in.', code: 'invalid-type' },
    { pointer: '#/claimHours', detail: 'This must be a whole number.', code: 'invalid-type' },
    { pointer: '#/reviewDays', detail: 'This must be a number.', code: 'invalid-type' },
    { pointer: '#/peerReview', detail: 'This must be yes or no.', code: 'invalid-type' },
    { pointer: '#/a~1b~0c', detail: 'There is no field "a/b~c" here; leave it out.', code: 'unknown-field' },
  ]);
});

it('and none of it was our fault', () => expect(server.logged()).not.toContain('request-failed'));
