import { PASSWORD, testServer, type TestPerson, type TestServer } from '@/tests/helpers/server';
import { UserModel } from '@/server/db/models/UserModel';
import type { SessionResponse } from '@/shared/contracts/session';

let server: TestServer;
let ada: TestPerson;
let boris: TestPerson;
beforeAll(async () => {
  server = await testServer();
  ada = await server.person('Ada Lund');
  boris = await server.person('Boris Vale');
  await server.project('HAZ', [{ who: ada, role: 'chemist' }, { who: boris, role: 'lead' }]);
});
afterAll(() => server.stop());

const cookieOf = (headers: Record<string, unknown>): string => ([headers['set-cookie']].flat()[0] as string | undefined) ?? '';

describe('signing in', () => {
  it('says nobody before and who after', async () => {
    const visitor = server.visitor();
    const before = await visitor.get<SessionResponse>('/api/session');
    expect(before.body).toEqual({ user: null, reviewsWaiting: 0, demo: null });
    expect(before.headers['set-cookie']).toBeUndefined();
    const after = await visitor.post<SessionResponse>('/api/session', { email: ` ${ada.email.toUpperCase()} `, password: PASSWORD });
    expect(after.status).toBe(200);
    expect(after.body.user).toMatchObject({ id: ada.id, name: 'Ada Lund', siteRole: 'member', projects: [{ key: 'HAZ', role: 'chemist', guestUntil: null }] });
    expect((await visitor.get<SessionResponse>('/api/session')).body.user?.id).toBe(ada.id);
    expect(after.headers['cache-control']).toBe('no-store');
  });

  it('keeps the cookie from scripts and other sites', async () => {
    const { headers } = await server.visitor().post('/api/session', { email: ada.email, password: PASSWORD });
    expect(cookieOf(headers)).toMatch(/^tb\.sid=.*; Path=\/; .*HttpOnly; SameSite=Lax$/);
    expect(cookieOf(headers)).not.toMatch(/Secure/);
  });

  it('answers an unknown address and a wrong password alike', async () => {
    const wrong = await server.visitor().post('/api/session', { email: ada.email, password: 'not her password' });
    const unknown = await server.visitor().post('/api/session', { email: 'nobody@team.example', password: PASSWORD });
    for (const answer of [wrong, unknown]) expect(answer.status).toBe(403);
    const { requestId: _a, ...one } = wrong.body;
    const { requestId: _b, ...other } = unknown.body;
    expect(other).toEqual(one);
    expect(one.detail).toBe('The address or the password is not right.');
  });

  it('gives a new session id, so that one planted before is worth nothing', async () => {
    const visitor = server.visitor();
    const first = cookieOf((await visitor.post('/api/session', { email: ada.email, password: PASSWORD })).headers);
    const second = cookieOf((await visitor.post('/api/session', { email: boris.email, password: PASSWORD })).headers);
    expect(second.split(';')[0]).not.toBe(first.split(';')[0]);
    const old = server.visitor();
    const answer = await old.agent.get('/api/session').set('Cookie', first.split(';')[0] ?? '');
    expect((answer.body as SessionResponse).user).toBeNull();
  });

  it('takes no session id that the server did not sign', async () => {
    const [row] = await server.database.asApp('SELECT sid FROM sessions LIMIT 1');
    const answer = await server.visitor().agent.get('/api/session').set('Cookie', `tb.sid=${String(row?.sid)}`);
    expect((answer.body as SessionResponse).user).toBeNull();
  });

  it('ends after twelve hours, whatever was done in them', async () => {
    const client = await server.signedIn(ada);
    server.pass(11 * 3600_000);
    expect((await client.get<SessionResponse>('/api/session')).body.user?.id).toBe(ada.id);
    server.pass(2 * 3600_000);
    expect((await client.get<SessionResponse>('/api/session')).body.user).toBeNull();
    expect((await client.get('/api/team')).status).toBe(401);
  });
});

describe('signing out', () => {
  it('ends the session on the server too', async () => {
    const client = await server.signedIn(ada);
    const cookie = (await client.post<SessionResponse>('/api/session', { email: ada.email, password: PASSWORD })).headers['set-cookie']?.[0]?.split(';')[0] ?? '';
    expect((await client.delete<SessionResponse>('/api/session')).body.user).toBeNull();
    const replay = await server.visitor().agent.get('/api/session').set('Cookie', cookie);
    expect((replay.body as SessionResponse).user).toBeNull();
  });

  it('everywhere ends every device at its next request, and nobody else', async () => {
    const [phone, desk, other] = [await server.signedIn(ada), await server.signedIn(ada), await server.signedIn(boris)];
    expect((await phone.post('/api/session/end-all')).status).toBe(200);
    for (const device of [phone, desk]) expect((await device.get<SessionResponse>('/api/session')).body.user).toBeNull();
    expect((await other.get<SessionResponse>('/api/session')).body.user?.id).toBe(boris.id);
  });
});

describe('what changes while somebody is signed in', () => {
  it('a shut account is refused at once', async () => {
    const cara = await server.person('Cara Holt');
    const client = await server.signedIn(cara);
    await UserModel.update({ status: 'disabled' }, { where: { id: cara.id } });
    expect((await client.get('/api/team')).status).toBe(401);
    const again = await server.visitor().post('/api/session', { email: cara.email, password: PASSWORD });
    expect(again.status).toBe(403);
    expect(again.body.detail).toMatch(/disabled/);
  });

  it('a guest is in the project through the last day and not on the next', async () => {
    const guest = await server.person('Gina Reed');
    const today = new Date(server.deps.now()).toISOString().slice(0, 10);
    await server.project('GST', [{ who: boris, role: 'lead' }, { who: guest, role: 'chemist', guestUntil: today }]);
    const client = await server.signedIn(guest);
    expect((await client.get<SessionResponse>('/api/session')).body.user?.projects).toMatchObject([{ key: 'GST', guestUntil: today }]);
    const midnight = Date.parse(`${today}T00:00:00Z`) + 24 * 3600_000;
    const toMidnight = midnight - server.deps.now().getTime();
    server.pass(toMidnight + 1000);
    const fresh = await server.signedIn(guest);
    expect((await fresh.get<SessionResponse>('/api/session')).body.user?.projects).toEqual([]);
  });
});

describe('tries', () => {
  // counted by the quarter of an hour: begin at its start, so that none ends in the middle of a test
  beforeEach(() => server.pass(900_000 - (server.deps.now().getTime() % 900_000)));

  it('are counted for an address, wherever they come from, and right ones cost nothing', async () => {
    const dora = await server.person('Dora Finch');
    for (let i = 0; i < 12; i += 1) expect((await server.visitor().post('/api/session', { email: dora.email, password: PASSWORD })).status).toBe(200);
    for (let i = 0; i < 8; i += 1) expect((await server.visitor().post('/api/session', { email: dora.email, password: `wrong ${i}` })).status).toBe(403);
    const refused = await server.visitor().post('/api/session', { email: dora.email, password: PASSWORD });
    expect(refused.status).toBe(429);
    expect(refused.body.retryAfterS).toBeGreaterThan(0);
    expect(Number(refused.headers['retry-after'])).toBe(refused.body.retryAfterS);
    expect((await server.visitor().post('/api/session', { email: ada.email, password: PASSWORD })).status).toBe(200);
    server.pass(15 * 60_000);
    expect((await server.visitor().post('/api/session', { email: dora.email, password: PASSWORD })).status).toBe(200);
  });

  it('made at the same moment are all counted', async () => {
    const emil = await server.person('Emil Frost');
    const tries = await Promise.all(Array.from({ length: 12 }, () => server.visitor().post('/api/session', { email: emil.email, password: 'wrong' })));
    expect(tries.filter(({ status }) => status === 403)).toHaveLength(8);
    expect(tries.filter(({ status }) => status === 429)).toHaveLength(4);
  });

  it('from one place are counted too, over all addresses, and no address stands in the table', async () => {
    const tries = [];
    for (let i = 0; i < 61; i += 1) tries.push((await server.visitor().post('/api/session', { email: `guess${i}@team.example`, password: 'wrong' })).status);
    expect(tries.at(-1)).toBe(429);
    const rows = await server.database.asOwner('SELECT bucket FROM rate_counters');
    for (const { bucket } of rows) expect(bucket).toMatch(/^[0-9a-f]{64}$/);
  });
});
