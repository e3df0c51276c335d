import { existsSync } from 'node:fs';
import path from 'node:path';

import { demo } from '@/server/db/demo';
import { DEMO_CASES } from '@/server/db/demo/content';
import { DEMO_PASSWORD, PEOPLE } from '@/server/db/demo/people';
import { AttachmentModel } from '@/server/db/models/AttachmentModel';
import { CaseModel } from '@/server/db/models/CaseModel';
import { CaseRevisionModel } from '@/server/db/models/CaseRevisionModel';
import { MembershipModel } from '@/server/db/models/MembershipModel';
import { ProjectModel } from '@/server/db/models/ProjectModel';
import { SignatureModel } from '@/server/db/models/SignatureModel';
import { UserModel } from '@/server/db/models/UserModel';
import type { Deps } from '@/server/deps';
import { contentOf, hashHolds } from '@/server/features/cases/store';
import type { CaseResponse } from '@/shared/contracts/cases';
import type { SessionResponse } from '@/shared/contracts/session';
import { canonicalJson, caseTrail } from '@/shared/engine';
import { CASE_STATES } from '@/shared/types/case';
import { heldForTests } from '../../helpers/registry';
import { testServer, type TestServer } from '../../helpers/server';

let server: TestServer;
/** the commands of the demo run with the owner's address beside the application's */
let deps: Deps;

beforeAll(async () => {
  server = await testServer();
  deps = { ...server.deps, env: { ...server.deps.env, databaseOwnerUrl: server.database.ownerUrl } };
  await demo.load(deps);
});
afterAll(() => server.stop());

const demoProjects = async (): Promise<string[]> => (await ProjectModel.findAll({ where: { isDemo: true } })).map(({ id }) => id);

describe('the loaded demo', () => {
  it('holds every case of the story, and every state a case can be in', async () => {
    const cases = await CaseModel.findAll({ where: { projectId: await demoProjects() } });
    expect(cases).toHaveLength(DEMO_CASES.length);
    expect(new Set(cases.map(({ state }) => state))).toEqual(new Set(CASE_STATES));
  });

  it('replays: every stored trail comes out of its content again to the last digit, and every hash holds', async () => {
    const revisions = await CaseRevisionModel.findAll();
    expect(revisions.length).toBeGreaterThan(DEMO_CASES.length);
    for (const revision of revisions) {
      expect(canonicalJson(caseTrail(contentOf(revision), heldForTests()))).toBe(revision.trail);
      expect(await hashHolds(revision)).toBe(true);
    }
  });

  it('is signed by its author and by somebody else, on the revision that stands', async () => {
    const signed = await CaseModel.findAll({ where: { state: ['signed', 'superseded'] } });
    expect(signed.length).toBeGreaterThanOrEqual(8);
    for (const { id, authorId, contentHash, revision } of signed) {
      const signatures = await SignatureModel.findAll({ where: { caseId: id, revision, contentHash } });
      expect(signatures.filter(({ meaning, signerId }) => meaning === 'authorship' && signerId === authorId)).toHaveLength(1);
      expect(signatures.some(({ meaning, signerId }) => meaning !== 'authorship' && signerId !== authorId)).toBe(true);
    }
  });

  it('shows an honest "not decided" that is signed, an override, a former name, and files byte for byte on the disk', async () => {
    const revisions = (await CaseRevisionModel.findAll()).map((revision) => ({ caseId: revision.caseId, content: contentOf(revision) }));
    const signedIds = new Set((await CaseModel.findAll({ where: { state: 'signed' } })).map(({ id }) => id));
    const signed = revisions.filter(({ caseId }) => signedIds.has(caseId)).map(({ content }) => content);
    expect(signed.some(({ answer }) => answer?.grade === 'not-decided')).toBe(true);
    expect(signed.some(({ answer }) => (answer?.overrideReason ?? '') !== '')).toBe(true);
    expect(revisions.some(({ content }) => content.compound.formerNames.length === 2)).toBe(true);
    const files = await AttachmentModel.findAll();
    expect(files).toHaveLength(2);
    for (const { sha256 } of files) expect(existsSync(path.join(deps.env.dataDir, 'attachments', sha256.slice(0, 2), sha256))).toBe(true);
  });

  it('lets each of its people in with the one password, and tells it on the sign-in page', async () => {
    const visitor = server.visitor();
    const { body } = await visitor.get<SessionResponse>('/api/session');
    expect(body.demo?.password).toBe(DEMO_PASSWORD);
    expect(body.demo?.accounts.map(({ email }) => email).sort()).toEqual(Object.values(PEOPLE).map(({ email }) => email).sort());
    for (const { email, name } of Object.values(PEOPLE)) {
      const signedIn = await server.visitor().post<SessionResponse>('/api/session', { email, password: DEMO_PASSWORD });
      expect(signedIn.body.user?.name).toBe(name);
    }
  });

  it('is not told twice', async () => {
    const before = await CaseModel.count();
    expect(await demo.isLoaded(deps)).toBe(true);
    expect(await demo.load(deps)).toMatch(/loaded already/);
    expect(await CaseModel.count()).toBe(before);
  });
});

describe('a load that was broken off', () => {
  it('is taken out and told anew', async () => {
    await UserModel.update({ passwordHash: '' }, { where: { email: PEOPLE.petra.email } });
    expect(await demo.load(deps)).toMatch(/^The demo is loaded/);
    expect(await CaseModel.count()).toBe(DEMO_CASES.length);
    expect(await UserModel.count({ where: { isDemo: true } })).toBe(5);
  });
});

describe('removing the demo beside real work', () => {
  const realRows = async (): Promise<unknown[]> => {
    const rows = await Promise.all([
      server.database.asOwner('SELECT * FROM projects WHERE is_demo = 0'),
      server.database.asOwner('SELECT c.* FROM cases c JOIN projects p ON p.id = c.project_id AND p.is_demo = 0'),
      server.database.asOwner('SELECT r.* FROM case_revisions r JOIN cases c ON c.id = r.case_id JOIN projects p ON p.id = c.project_id AND p.is_demo = 0'),
      server.database.asOwner('SELECT e.* FROM case_events e JOIN cases c ON c.id = e.case_id JOIN projects p ON p.id = c.project_id AND p.is_demo = 0'),
      server.database.asOwner("SELECT * FROM users WHERE email = 'rea.person@team.example'"),
    ]);
    return rows.map((each) => [...each]);
  };
  let realProject = '';
  let before: unknown[] = [];

  beforeAll(async () => {
    const real = await server.person('Rea Person');
    const wen = await UserModel.findOne({ where: { email: PEOPLE.wen.email }, rejectOnEmpty: true });
    realProject = await server.project('REAL', [{ who: real, role: 'lead' }]);
    await MembershipModel.create({ projectId: realProject, userId: wen.id, role: 'chemist', guestUntil: null, joinedAt: new Date() });
    const [demoProject] = await demoProjects();
    await MembershipModel.create({ projectId: demoProject ?? '', userId: real.id, role: 'chemist', guestUntil: null, joinedAt: new Date() });
    const client = await server.signedIn(real);
    const { body } = await client.post<CaseResponse>('/api/cases', { projectId: realProject, question: 'A real question' });
    const guest = server.visitor();
    await guest.post('/api/session', { email: PEOPLE.wen.email, password: DEMO_PASSWORD });
    expect((await guest.post(`/api/cases/${body.id}/comments`, { target: 'question', text: 'Asked from outside.' })).status).toBeLessThan(300);
    expect((await client.post('/api/cases', { projectId: demoProject, question: 'Real work in a demo project' })).status).toBeLessThan(300);
    before = await realRows();
  });

  it('stops, and says so, while a real person has work in a demo project', async () => {
    await expect(demo.remove(deps)).rejects.toThrow(/Rea Person.*--with-their-work/);
    expect(await CaseModel.count()).toBe(DEMO_CASES.length + 2);
  });

  it('takes every demo row and file, and leaves each real row as it was', async () => {
    expect(await demo.remove(deps, { withTheirWork: true })).toBe(`The demo is removed: 3 projects, ${DEMO_CASES.length + 1} cases and 4 accounts. 1 account that other projects name stays as a name, disabled.`);
    expect(await realRows()).toEqual(before);
    expect(await demo.isLoaded(deps)).toBe(false);
    for (const table of ['signatures', 'addenda', 'review_checks', 'review_queries', 'query_messages', 'attachments']) {
      expect(await server.database.asOwner(`SELECT COUNT(*) AS n FROM ${table}`)).toEqual([{ n: 0 }]);
    }
    expect(await server.database.asOwner("SELECT COUNT(*) AS n FROM users WHERE is_demo = 1")).toEqual([{ n: 0 }]);
    expect(await server.database.asOwner(`SELECT p.is_demo, CAST(COALESCE(SUM(n), 0) AS INT) AS n FROM case_counts JOIN projects p ON p.id = project_id GROUP BY p.is_demo`)).toEqual([{ is_demo: 0, n: 1 }]);
  });

  it('puts the guards back: the owner of the tables cannot remove a real row either', async () => {
    await expect(server.database.asOwner('DELETE FROM case_events')).rejects.toThrow(/only grows/);
    await expect(server.database.asOwner('DELETE FROM cases')).rejects.toThrow(/never removed|foreign key/i);
  });

  it('keeps the name of somebody whom a real case quotes, disabled, and frees the address for a later demo', async () => {
    expect(await server.database.asOwner('SELECT u.status, u.is_demo, c.by_name FROM comments c JOIN users u ON u.id = c.by_id')).toEqual([{ status: 'disabled', is_demo: 0, by_name: PEOPLE.wen.name }]);
    expect(await UserModel.count({ where: { email: Object.values(PEOPLE).map(({ email }) => email) } })).toBe(0);
  });
});
