import { testServer, type Client, type TestServer } from '@/tests/helpers/server';
import type { MailboxResponse } from '@/shared/contracts/team';

let server: TestServer;
beforeAll(async () => { server = await testServer({ PUBLIC_URL: 'https://bond.example' }); });
afterAll(() => server.stop());

const shown = async (client: Client) => {
  await server.deps.mail.settled();
  return (await client.get<MailboxResponse>('/api/mailbox')).body.messages.map(({ to, subject }) => `${to}: ${subject}`);
};

it('is not there without the demo, not even for an administrator', async () => {
  const root = await server.person('Root Admin', { siteRole: 'administrator' });
  await server.visitor().post('/api/password/forgot', { email: root.email });
  for (const client of [server.visitor(), await server.signedIn(root)]) expect((await client.get('/api/mailbox')).status).toBe(404);
});

it('shows a visitor the demo’s mails alone, and a real administrator all', async () => {
  const demo = await server.person('Dee Demo', { isDemo: true });
  const lead = await server.person('Lea Moor');
  const real = await server.project('REAL', [{ who: lead, role: 'lead' }]);
  const invented = await server.project('DEMO', [{ who: demo, role: 'lead' }], { isDemo: true });
  await (await server.signedIn(lead)).post(`/api/projects/${real}/invitations`, { email: 'secret@elsewhere.example', role: 'lead', guestUntil: null });
  await (await server.signedIn(demo)).post(`/api/projects/${invented}/invitations`, { email: 'guest@elsewhere.example', role: 'reader', guestUntil: null });
  await server.visitor().post('/api/password/forgot', { email: demo.email });

  const visible = ['dee.demo@team.example: Choose a new password', 'guest@elsewhere.example: Dee Demo invites you to Project DEMO'];
  const hidden = ['secret@elsewhere.example: Lea Moor invites you to Project REAL', 'root.admin@team.example: Choose a new password'];
  for (const client of [server.visitor(), await server.signedIn(demo), await server.signedIn(lead)]) expect(await shown(client)).toEqual(visible);
  const root = await server.signedIn({ id: '', name: '', email: 'root.admin@team.example' });
  expect((await shown(root)).sort()).toEqual([...visible, ...hidden].sort());

  const { body } = await server.visitor().get<MailboxResponse>('/api/mailbox');
  expect(body.messages[1]?.link).toMatch(/^https:\/\/bond\.example\/invitation\/[\w-]{43}$/);
  expect(body.messages[1]?.text).toContain(body.messages[1]?.link);
});

it('whoever joins a demo project belongs to the demo', async () => {
  const { body } = await server.visitor().get<MailboxResponse>('/api/mailbox');
  const token = body.messages.find(({ to }) => to === 'guest@elsewhere.example')?.link?.split('/').at(-1) ?? '';
  const joined = await server.visitor().post<{ user: { isDemo: boolean } }>(`/api/invitations/${token}/accept`, { name: 'Gail Guest', password: 'a phrase of ten' });
  expect(joined.body.user.isDemo).toBe(true);
});
