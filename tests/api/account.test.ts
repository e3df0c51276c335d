import { testServer, PASSWORD, type TestPerson, type TestServer } from '@/tests/helpers/server';
import { MailModel } from '@/server/db/models/MailModel';
import type { SessionResponse } from '@/shared/contracts/session';

let server: TestServer;
let ada: TestPerson;
beforeAll(async () => {
  server = await testServer({ PUBLIC_URL: 'https://bond.example' });
  ada = await server.person('Ada Lund');
});
afterAll(() => server.stop());

const NEXT = 'another phrase of ten';

/** The token in the newest mail to an address. */
async function tokenFor(email: string, kind: 'reset' | 'invitation'): Promise<string> {
  await server.deps.mail.settled();
  const mail = await MailModel.findOne({ where: { recipient: email }, order: [['id', 'DESC']] });
  const found = new RegExp(`^https://bond\\.example/${kind}/([\\w-]{43})$`).exec(mail?.link ?? '');
  return found?.[1] ?? `no ${kind} link in ${mail?.link ?? 'no mail'}`;
}
const signIn = (email: string, password: string) => server.visitor().post<SessionResponse>('/api/session', { email, password });

describe('a forgotten password', () => {
  it('is asked for with the same answer whether there is an account or not', async () => {
    const [known, unknown] = [await server.visitor().post('/api/password/forgot', { email: ada.email }), await server.visitor().post('/api/password/forgot', { email: 'nobody@team.example' })];
    expect([known.status, unknown.status]).toEqual([200, 200]);
    expect(unknown.body).toEqual(known.body);
    await server.deps.mail.settled();
    expect(await MailModel.count({ where: { recipient: ada.email } })).toBe(1);
    expect(await MailModel.count({ where: { recipient: 'nobody@team.example' } })).toBe(0);
  });

  it('is replaced once by the link of the mail, and every session ends', async () => {
    const bea = await server.person('Bea Roth');
    const desk = await server.signedIn(bea);
    await server.visitor().post('/api/password/forgot', { email: bea.email });
    const token = await tokenFor(bea.email, 'reset');
    expect((await server.visitor().post('/api/password/reset', { token, next: NEXT })).status).toBe(200);
    expect((await desk.get<SessionResponse>('/api/session')).body.user).toBeNull();
    expect((await signIn(bea.email, PASSWORD)).status).toBe(403);
    expect((await signIn(bea.email, NEXT)).status).toBe(200);
    const again = await server.visitor().post('/api/password/reset', { token, next: 'a third phrase of ten' });
    expect([again.status, again.body.detail]).toEqual([410, 'This link has been used already; ask for a new one.']);
    await server.deps.mail.settled();
    expect((await MailModel.findOne({ where: { recipient: bea.email }, order: [['id', 'DESC']] }))?.subject).toBe('Your password was changed');
  });

  it('with two links: using one ends the other', async () => {
    const cleo = await server.person('Cleo Marsh');
    await server.visitor().post('/api/password/forgot', { email: cleo.email });
    const first = await tokenFor(cleo.email, 'reset');
    await server.visitor().post('/api/password/forgot', { email: cleo.email });
    const second = await tokenFor(cleo.email, 'reset');
    expect(second).not.toBe(first);
    expect((await server.visitor().post('/api/password/reset', { token: second, next: NEXT })).status).toBe(200);
    expect((await server.visitor().post('/api/password/reset', { token: first, next: NEXT })).status).toBe(410);
  });

  it('used by two at the same moment: one wins', async () => {
    const dan = await server.person('Dan Ives');
    await server.visitor().post('/api/password/forgot', { email: dan.email });
    const token = await tokenFor(dan.email, 'reset');
    const answers = await Promise.all(['first phrase here', 'second phrase here'].map((next) => server.visitor().post('/api/password/reset', { token, next })));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 410]);
  });

  it('has a link that runs out after an hour, and is kept as a hash', async () => {
    const eva = await server.person('Eva Stone');
    await server.visitor().post('/api/password/forgot', { email: eva.email });
    const token = await tokenFor(eva.email, 'reset');
    const rows = await server.database.asOwner('SELECT token_hash FROM password_resets');
    expect(JSON.stringify(rows)).not.toContain(token);
    server.pass(3600_000 + 1000);
    expect((await server.visitor().post('/api/password/reset', { token, next: NEXT })).body.detail).toBe('This link has run out; ask for a new one.');
    expect((await server.visitor().post('/api/password/reset', { token: 'x'.repeat(43), next: NEXT })).status).toBe(410);
  });

  it('is mailed three times an hour at most', async () => {
    server.pass(3600_000 - (server.deps.now().getTime() % 3600_000));
    const fay = await server.person('Fay Quinn');
    const tries = [];
    for (let i = 0; i < 4; i += 1) tries.push((await server.visitor().post('/api/password/forgot', { email: fay.email })).status);
    expect(tries).toEqual([200, 200, 200, 429]);
  });

  it('of a shut account brings no mail', async () => {
    const gus = await server.person('Gus Shaw', { status: 'disabled' });
    await server.visitor().post('/api/password/forgot', { email: gus.email });
    await server.deps.mail.settled();
    expect(await MailModel.count({ where: { recipient: gus.email } })).toBe(0);
  });
});

describe('the own account', () => {
  it('changes the password with the present one, here it goes on, elsewhere it ends', async () => {
    const hal = await server.person('Hal Byrd');
    const [here, there] = [await server.signedIn(hal), await server.signedIn(hal)];
    const wrong = await here.put('/api/account/password', { current: 'not it at all', next: NEXT });
    expect([wrong.status, wrong.body.errors?.[0]?.pointer]).toEqual([403, '#/current']);
    expect((await here.put('/api/account/password', { current: PASSWORD, next: PASSWORD })).body.errors?.[0]?.pointer).toBe('#/next');
    expect((await here.put('/api/account/password', { current: PASSWORD, next: 'short' })).status).toBe(422);
    const changed = await here.put<SessionResponse>('/api/account/password', { current: PASSWORD, next: NEXT });
    expect(changed.body.user?.id).toBe(hal.id);
    expect((await here.get<SessionResponse>('/api/session')).body.user?.id).toBe(hal.id);
    expect((await there.get<SessionResponse>('/api/session')).body.user).toBeNull();
    expect((await signIn(hal.email, NEXT)).status).toBe(200);
  });

  it('counts wrong tries of the present password', async () => {
    server.pass(900_000 - (server.deps.now().getTime() % 900_000));
    const ida = await server.person('Ida Cole');
    const client = await server.signedIn(ida);
    const tries = [];
    for (let i = 0; i < 9; i += 1) tries.push((await client.put('/api/account/password', { current: 'wrong one here', next: NEXT })).status);
    expect(tries).toEqual([...Array<number>(8).fill(403), 429]);
  });

  it('changes the name', async () => {
    const jan = await server.person('Jan Wells');
    const client = await server.signedIn(jan);
    expect((await client.put<SessionResponse>('/api/account/name', { name: '  Jan Wells-Rao ' })).body.user?.name).toBe('Jan Wells-Rao');
    expect((await client.get<SessionResponse>('/api/session')).body.user?.name).toBe('Jan Wells-Rao');
    expect((await client.put('/api/account/name', { name: '   ' })).body.errors?.[0]).toMatchObject({ pointer: '#/name' });
  });
});

describe('an invitation', () => {
  let lead: TestPerson;
  let projectId: string;
  beforeAll(async () => {
    lead = await server.person('Lea Moor');
    projectId = await server.project('INV', [{ who: lead, role: 'lead' }]);
  });
  const invite = async (email: string, more: object = {}): Promise<string> => {
    const client = await server.signedIn(lead);
    const { status, text } = await client.post(`/api/projects/${projectId}/invitations`, { email, role: 'chemist', guestUntil: null, ...more });
    if (status !== 201) throw new Error(`${status}: ${text}`);
    return tokenFor(email, 'invitation');
  };

  it('makes an account, joins the project and signs in, once', async () => {
    const token = await invite('new@elsewhere.example');
    const visitor = server.visitor();
    expect((await visitor.get(`/api/invitations/${token}`)).body).toEqual({
      email: 'new@elsewhere.example', projectName: 'Project INV', role: 'chemist', guestUntil: null, invitedBy: 'Lea Moor', hasAccount: false,
    });
    expect((await visitor.post(`/api/invitations/${token}/accept`, { password: NEXT })).body.errors?.[0]?.pointer).toBe('#/name');
    expect((await visitor.post(`/api/invitations/${token}/accept`, { name: 'Nia New', password: 'short' })).body.errors?.[0]?.pointer).toBe('#/password');
    const joined = await visitor.post<SessionResponse>(`/api/invitations/${token}/accept`, { name: 'Nia New', password: NEXT });
    expect(joined.body.user).toMatchObject({ name: 'Nia New', email: 'new@elsewhere.example', siteRole: 'member', projects: [{ key: 'INV', role: 'chemist' }] });
    expect((await visitor.get<SessionResponse>('/api/session')).body.user?.name).toBe('Nia New');
    expect((await server.visitor().get(`/api/invitations/${token}`)).status).toBe(410);
  });

  it('of an account asks for its own password', async () => {
    const max = await server.person('Max Tran');
    const token = await invite(max.email, { role: 'reviewer', guestUntil: '2099-12-31' });
    expect((await server.visitor().get<{ hasAccount: boolean }>(`/api/invitations/${token}`)).body.hasAccount).toBe(true);
    expect((await server.visitor().post(`/api/invitations/${token}/accept`, { password: NEXT })).status).toBe(403);
    const joined = await server.visitor().post<SessionResponse>(`/api/invitations/${token}/accept`, { password: PASSWORD });
    expect(joined.body.user?.projects).toMatchObject([{ key: 'INV', role: 'reviewer', guestUntil: '2099-12-31' }]);
  });

  it('accepted twice at the same moment joins once', async () => {
    const token = await invite('twice@elsewhere.example');
    const answers = await Promise.all([1, 2].map(() => server.visitor().post(`/api/invitations/${token}/accept`, { name: 'Tess Two', password: NEXT })));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 410]);
  });

  it('ends when it is withdrawn, replaced or two weeks old', async () => {
    const first = await invite('late@elsewhere.example');
    const second = await invite('late@elsewhere.example');
    expect((await server.visitor().get(`/api/invitations/${first}`)).body.detail).toBe('This invitation was withdrawn; ask the person who sent it.');
    const client = await server.signedIn(lead);
    const project = await client.get<{ invitations: { id: string; email: string }[] }>(`/api/projects/${projectId}`);
    const open = project.body.invitations.filter(({ email }) => email === 'late@elsewhere.example');
    expect(open).toHaveLength(1);
    expect((await client.delete(`/api/projects/${projectId}/invitations/${open[0]?.id}`)).body).toEqual({ done: true });
    expect((await server.visitor().post(`/api/invitations/${second}/accept`, { name: 'Lars Late', password: NEXT })).status).toBe(410);
    const third = await invite('late@elsewhere.example');
    server.pass(14 * 24 * 3600_000 + 1000);
    expect((await server.visitor().get(`/api/invitations/${third}`)).body.detail).toBe('This link has run out; ask for a new one.');
    expect((await server.visitor().get(`/api/invitations/${'x'.repeat(43)}`)).status).toBe(410);
  });

  it('is neither in the table nor in the log as it is in the mail', async () => {
    const token = await invite('secret@elsewhere.example');
    await server.visitor().get(`/api/invitations/${token}`);
    expect(JSON.stringify(await server.database.asOwner('SELECT * FROM invitations'))).not.toContain(token);
    expect(server.logged()).toContain('/api/invitations/:token');
    expect(server.logged()).not.toContain(token);
    expect(server.logged()).not.toContain('secret@elsewhere.example');
  });
});
