import { PASSWORD, testServer, type Client, type TestPerson, type TestServer } from '@/tests/helpers/server';
import { UserModel } from '@/server/db/models/UserModel';
import type { AdminUsersResponse, ProjectResponse, TeamResponse } from '@/shared/contracts/team';

let server: TestServer;
let root: TestPerson;
let lead: TestPerson;
let chemist: TestPerson;
let outsider: TestPerson;
let projectId: string;
let asRoot: Client;
let asLead: Client;
let asChemist: Client;
let asOutsider: Client;

beforeAll(async () => {
  server = await testServer();
  root = await server.person('Root Admin', { siteRole: 'administrator' });
  lead = await server.person('Lea Moor');
  chemist = await server.person('Chen Baker');
  outsider = await server.person('Otto Side');
  projectId = await server.project('HAZ', [{ who: lead, role: 'lead' }, { who: chemist, role: 'chemist' }]);
  [asRoot, asLead, asChemist, asOutsider] = [await server.signedIn(root), await server.signedIn(lead), await server.signedIn(chemist), await server.signedIn(outsider)];
});
afterAll(() => server.stop());

describe('projects', () => {
  it('are listed to their people; to an administrator all, without a role', async () => {
    expect((await asChemist.get<TeamResponse>('/api/team')).body).toMatchObject({
      projects: [{ id: projectId, key: 'HAZ', yourRole: 'chemist', may: { invite: false, changeMembers: false, changeSettings: false } }], mayCreateProject: false, mayAdminister: false,
    });
    expect((await asOutsider.get<TeamResponse>('/api/team')).body.projects).toEqual([]);
    expect((await asRoot.get<TeamResponse>('/api/team')).body).toMatchObject({ projects: [{ id: projectId, yourRole: null, may: { invite: false } }], mayCreateProject: true, mayAdminister: true });
  });

  it('are opened by administrators, who lead them first; a key stands once', async () => {
    const { status, body } = await asRoot.post<ProjectResponse>('/api/projects', { key: ' new1 ', name: 'New things' });
    expect(status).toBe(201);
    expect(body).toMatchObject({ key: 'NEW1', name: 'New things', yourRole: 'lead', members: [{ name: 'Root Admin', role: 'lead', isYou: true }], log: [{ by: 'Root Admin', text: 'Opened the project.' }] });
    expect((await asRoot.post('/api/projects', { key: 'NEW1', name: 'Again' })).body.errors).toEqual([{ pointer: '#/key', detail: 'Another project has this key; choose another.' }]);
    expect((await asLead.post('/api/projects', { key: 'MINE', name: 'Mine' })).status).toBe(403);
  });

  it('of others are not there', async () => {
    const paths = [`/api/projects/${projectId}`, `/api/projects/00000000-0000-4000-8000-000000000000`];
    const answers = await Promise.all(paths.map((path) => asOutsider.get(path)));
    expect(answers.map(({ status }) => status)).toEqual([404, 404]);
    expect(answers[0]?.body.detail).toBe(answers[1]?.body.detail);
    for (const act of [
      () => asOutsider.put(`/api/projects/${projectId}`, { name: 'X', notebookPattern: '', claimHours: 1, reviewDays: 1, peerReview: false }),
      () => asOutsider.post(`/api/projects/${projectId}/invitations`, { email: 'a@b.example', role: 'lead', guestUntil: null }),
      () => asOutsider.put(`/api/projects/${projectId}/members/${lead.id}`, { role: 'reader', guestUntil: null }),
      () => asOutsider.delete(`/api/projects/${projectId}/members/${chemist.id}`),
    ]) expect((await act()).status).toBe(404);
  });

  it('change their rules by a lead, and the log says from what to what', async () => {
    const rules = { name: 'Project HAZ', notebookPattern: 'HZ-114', claimHours: 48, reviewDays: 5, peerReview: true };
    expect((await asChemist.put(`/api/projects/${projectId}`, rules)).status).toBe(403);
    const { body } = await asLead.put<ProjectResponse>(`/api/projects/${projectId}`, rules);
    expect(body).toMatchObject(rules);
    expect(body.log[0]).toMatchObject({ by: 'Lea Moor', text: 'Changed form of notebook pages from nothing to HZ-114; hours a reviewer holds a case from 24 to 48; days until a review is due from 7 to 5; chemists review each other from no to yes.' });
    const again = await asLead.put<ProjectResponse>(`/api/projects/${projectId}`, rules);
    expect(again.body.log).toHaveLength(body.log.length);
    expect((await asLead.put(`/api/projects/${projectId}`, { ...rules, claimHours: 0 })).body.errors).toEqual([{ pointer: '#/claimHours', detail: 'At least 1.', code: 'too-small' }]);
  });
});

describe('people of a project', () => {
  it('change by a lead only, at once, and stand in the log', async () => {
    const other = await server.person('Rita Vane');
    const id = await server.project('PPL', [{ who: lead, role: 'lead' }, { who: other, role: 'reader' }]);
    const asOther = await server.signedIn(other);
    const path = `/api/projects/${id}/members/${other.id}`;
    expect((await asOther.put(path, { role: 'lead', guestUntil: null })).status).toBe(403);
    const changed = await asLead.put<ProjectResponse>(path, { role: 'reviewer', guestUntil: '2099-01-31' });
    expect(changed.body.members.find(({ userId }) => userId === other.id)).toMatchObject({ role: 'reviewer', guestUntil: '2099-01-31' });
    expect(changed.body.log[0]?.text).toBe('Rita Vane is now reviewer, guest until 31 Jan 2099 (before: reader).');
    expect((await asOther.get<TeamResponse>('/api/team')).body.projects[0]?.yourRole).toBe('reviewer');
    expect((await asLead.delete(path)).body).toEqual({ done: true });
    expect((await asOther.get(`/api/projects/${id}`)).status).toBe(404);
    expect((await asLead.delete(path)).status).toBe(404);
  });

  it('leave by themselves', async () => {
    const guest = await server.person('Gail West');
    const id = await server.project('LVE', [{ who: lead, role: 'lead' }, { who: guest, role: 'chemist' }]);
    const asGuest = await server.signedIn(guest);
    expect((await asGuest.delete(`/api/projects/${id}/members/${guest.id}`)).status).toBe(200);
    expect((await asGuest.get<TeamResponse>('/api/team')).body.projects).toEqual([]);
  });

  it('keep one lead, also when two leads step down at the same moment', async () => {
    const second = await server.person('Sven Ode');
    const id = await server.project('ONE', [{ who: lead, role: 'lead' }, { who: second, role: 'lead' }]);
    const asSecond = await server.signedIn(second);
    const down = { role: 'chemist', guestUntil: null };
    const answers = await Promise.all([asLead.put(`/api/projects/${id}/members/${lead.id}`, down), asSecond.put(`/api/projects/${id}/members/${second.id}`, down)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 422]);
    const left = answers[0]?.status === 200 ? { who: second, as: asSecond } : { who: lead, as: asLead };
    expect((await left.as.put(`/api/projects/${id}/members/${left.who.id}`, down)).body.detail).toBe('A project keeps one lead; make somebody else lead first.');
    expect((await left.as.delete(`/api/projects/${id}/members/${left.who.id}`)).status).toBe(409);
  });

  it('as guests are not leads and do not end in the past', async () => {
    const path = `/api/projects/${projectId}/members/${chemist.id}`;
    expect((await asLead.put(path, { role: 'lead', guestUntil: '2099-01-01' })).body.errors?.[0]?.pointer).toBe('#/role');
    expect((await asLead.put(path, { role: 'reader', guestUntil: '2001-01-01' })).body.errors?.[0]?.pointer).toBe('#/guestUntil');
    expect((await asLead.post(`/api/projects/${projectId}/invitations`, { email: chemist.email, role: 'reader', guestUntil: null })).body.errors?.[0]?.pointer).toBe('#/email');
  });

  it('of a project whose leads are all shut are looked after by an administrator', async () => {
    const gone = await server.person('Gone Lead');
    const stays = await server.person('Stays Here');
    const id = await server.project('ORP', [{ who: gone, role: 'lead' }, { who: stays, role: 'chemist' }]);
    const path = `/api/projects/${id}/members/${stays.id}`;
    expect((await asRoot.put(path, { role: 'lead', guestUntil: null })).status).toBe(403);
    await UserModel.update({ status: 'disabled' }, { where: { id: gone.id } });
    expect((await asRoot.put(path, { role: 'reader', guestUntil: null })).body.errors?.[0]?.pointer).toBe('#/role');
    expect((await asRoot.put<ProjectResponse>(path, { role: 'lead', guestUntil: null })).body.members.find(({ userId }) => userId === stays.id)?.role).toBe('lead');
    expect((await asRoot.put(path, { role: 'reader', guestUntil: null })).status).toBe(403);
  });
});

describe('accounts', () => {
  const change = (client: Client, id: string, siteRole: string, status: string) => client.put<AdminUsersResponse>(`/api/admin/users/${id}`, { siteRole, status });

  it('are an administrator’s to see and change', async () => {
    for (const client of [asLead, asChemist, asOutsider]) {
      expect((await client.get('/api/admin/users')).status).toBe(403);
      expect((await change(client, root.id, 'member', 'active')).status).toBe(403);
    }
    expect((await server.visitor().get('/api/admin/users')).status).toBe(401);
    const { body } = await asRoot.get<AdminUsersResponse>('/api/admin/users');
    expect(body.users.find(({ id }) => id === chemist.id)).toMatchObject({ name: 'Chen Baker', status: 'active', siteRole: 'member', projects: ['Project HAZ'] });
    expect(JSON.stringify(body)).not.toMatch(/password|\$2/i);
  });

  it('once shut are out at their next request, and can be opened again', async () => {
    const pia = await server.person('Pia Noll');
    const asPia = await server.signedIn(pia);
    expect((await change(asRoot, pia.id, 'member', 'disabled')).status).toBe(200);
    expect((await asPia.get('/api/team')).status).toBe(401);
    await change(asRoot, pia.id, 'member', 'active');
    expect((await asPia.get('/api/team')).status).toBe(401);
    expect((await server.visitor().post('/api/session', { email: pia.email, password: PASSWORD })).status).toBe(200);
    const events = await server.database.asApp('SELECT kind FROM account_events WHERE user_id = ?', [pia.id]);
    expect(events).toHaveLength(2);
  });

  it('keep one administrator, also when two step down at the same moment', async () => {
    const other = await server.person('Second Admin', { siteRole: 'administrator' });
    const asOther = await server.signedIn(other);
    expect((await change(asRoot, root.id, 'administrator', 'disabled')).status).toBe(422);
    const answers = await Promise.all([change(asRoot, root.id, 'member', 'active'), change(asOther, other.id, 'member', 'active')]);
    expect(answers.filter(({ status }) => status === 422)).toHaveLength(1);
    await UserModel.update({ siteRole: 'administrator' }, { where: { id: root.id } });
    await UserModel.update({ siteRole: 'member' }, { where: { id: other.id } });
  });

  it('of the invented example are all that its own administrator reaches', async () => {
    const demo = await server.person('Demo Admin', { siteRole: 'administrator', isDemo: true });
    const asDemo = await server.signedIn(demo);
    expect((await asDemo.get<AdminUsersResponse>('/api/admin/users')).body.users.map(({ name }) => name)).toEqual(['Demo Admin']);
    expect((await change(asDemo, root.id, 'member', 'disabled')).status).toBe(404);
    expect((await asDemo.get<TeamResponse>('/api/team')).body.projects).toEqual([]);
    expect((await asDemo.get(`/api/projects/${projectId}`)).status).toBe(404);
  });
});
