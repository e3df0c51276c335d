import type { Browser, Page } from 'playwright-core';
import type { CaseResponse } from '@/shared/contracts/cases';
import { casesText } from '@/shared/text/cases';
import { uiAccount } from '@/shared/text/uiAccount';
import { uiCaseParts as parts } from '@/shared/text/uiCaseParts';
import { uiCases } from '@/shared/text/uiCases';
import { uiReviews } from '@/shared/text/uiReviews';
import { uiTeam } from '@/shared/text/uiTeam';
import { openBrowser, PHONE, visit, WIDE } from '../helpers/browser';
import { claim, draft, ok, submit, type Caller } from '../helpers/caseWork';
import { makePerson, makeScene, openAs, visitAs, type Scene, type SignedInPage } from '../helpers/people';
import { PASSWORD } from '../helpers/password';

let browser: Browser;
let scene: Scene<'author' | 'second' | 'reviewer' | 'lead' | 'reader'>;
let writing: SignedInPage;
let asDraft: CaseResponse;
let inReview: CaseResponse;
beforeAll(async () => {
  browser = await openBrowser();
  scene = await makeScene({ author: 'chemist', second: 'chemist', reviewer: 'reviewer', lead: 'lead', reader: 'reader' });
  writing = await openAs(browser, scene.people.author, { viewport: WIDE });
  asDraft = await draft(writing.caller, scene.projectId);
  inReview = await submit(writing.caller, await draft(writing.caller, scene.projectId));
});
afterAll(() => browser.close());

const none = async (page: Page, ...names: string[]) => { for (const name of names) expect([name, await page.getByRole('button', { name, exact: true }).count()]).toEqual([name, 0]); };
/** Every act on a case, as a request. */
const acts = (one: CaseResponse): Record<string, (caller: Caller) => Promise<{ status: number; body: { detail: string } }>> => ({
  save: (caller) => caller.put(`/api/cases/${one.id}`, { seenVersion: one.version, content: one.content }),
  submit: (caller) => caller.post(`/api/cases/${one.id}/submit`, { seenVersion: one.version, password: PASSWORD }),
  claim: (caller) => caller.post(`/api/cases/${one.id}/claim`),
  check: (caller) => caller.post(`/api/cases/${one.id}/checks`, { step: 'domain', checked: true, revision: one.revision }),
  query: (caller) => caller.post(`/api/cases/${one.id}/queries`, { step: 'domain', text: 'Why?' }),
  sign: (caller) => caller.post(`/api/cases/${one.id}/sign`, { seenVersion: one.version, contentHash: one.contentHash, meaning: 'approval', password: PASSWORD }),
  withdraw: (caller) => caller.post(`/api/cases/${one.id}/withdraw`, { seenVersion: one.version, reason: 'Not mine' }),
  supersede: (caller) => caller.post(`/api/cases/${one.id}/supersede`, { seenVersion: one.version, reason: 'Not mine' }),
});
const refusals = async (one: CaseResponse, caller: Caller, names: string[] = Object.keys(acts(one))) =>
  Object.fromEntries(await Promise.all(names.map(async (name) => { const { status, body } = await acts(one)[name]!(caller); return [name, [status, body.detail]] as const; })));

it('an author cannot review or sign their own case, on screen or on the server', async () => {
  const { page, caller } = writing;
  await page.goto(`/cases/${inReview.id}`);
  await page.getByText(casesText.refused.ownCase).first().waitFor(); // the reason stands where the button would be
  await none(page, uiReviews.column.claim, uiReviews.column.sign, uiReviews.column.newQuery);
  const all = await refusals(inReview, caller, ['claim', 'check', 'query', 'sign']);
  expect(all).toEqual(Object.fromEntries(['claim', 'check', 'query', 'sign'].map((name) => [name, [403, casesText.refused.ownCase]])));
  await page.goto('/reviews');
  await page.getByText(uiReviews.yoursNote).waitFor();
  await none(page, `${uiReviews.take}, ${inReview.code}`);
});

it('somebody who saved a revision does not sign it either', async () => {
  const { people: { author, lead }, projectId } = scene;
  const leading = await openAs(browser, lead);
  const one = await draft(writing.caller, projectId);
  const touched = ok(await leading.caller.put<CaseResponse>(`/api/cases/${one.id}`, { seenVersion: one.version, content: { ...one.content, tags: ['seen by the lead'] } }));
  const sent = await submit(writing.caller, touched);
  const { claim: refused } = await refusals(sent, leading.caller, ['claim']);
  expect(refused).toEqual([403, casesText.refused.savedRevision(touched.revision)]);
  expect(author.id).not.toBe(lead.id);
  await leading.close();
});

it('a reader reads: nothing to edit is offered, and the server refuses every act', async () => {
  await visitAs(browser, scene.people.reader, { viewport: PHONE }, async ({ page, caller }) => {
    await page.goto(`/cases/${asDraft.id}`);
    await page.getByRole('table', { name: parts.readings.title }).waitFor();
    await none(page, parts.readings.add, parts.candidates.add, parts.evidence.add, parts.answer.edit, parts.answer.write, uiCases.act.submit, parts.evidence.attach);
    await page.getByText(casesText.refused.readerOnly).first().waitFor();
    for (const one of [asDraft, inReview]) for (const [name, [status]] of Object.entries(await refusals(one, caller))) expect([name, status]).toEqual([name, 403]);
    expect((await caller.post('/api/cases', { projectId: scene.projectId, question: 'Mine' })).status).toBe(403);
    await page.goto('/cases/new');
    await page.getByText(uiCases.fresh.noProject).waitFor();
  });
});

it('a case of another project is as if it were not there', async () => {
  await visitAs(browser, await makePerson('Otto Nakagi'), { viewport: WIDE }, async ({ page, caller, expectRefusal }) => {
    for (const [name, [status]] of Object.entries(await refusals(asDraft, caller))) expect([name, status]).toEqual([name, 404]);
    for (const path of ['', '/revisions', '/revisions/1', '/compare?from=1&to=2', '/events', '/sheet.pdf', '/si-text']) expect([path, (await caller.get(`/api/cases/${asDraft.id}${path}`)).status]).toEqual([path, 404]);
    expect((await caller.get(`/api/projects/${scene.projectId}`)).status).toBe(404);
    const { text } = await caller.get(`/api/cases?q=${encodeURIComponent(asDraft.content.question)}`);
    expect(text).not.toContain(asDraft.id);
    expectRefusal(/^404 GET \/api\/(cases|projects)\//);
    for (const path of ['', '/history', '/sheet']) {
      await page.goto(`/cases/${asDraft.id}${path}`);
      await page.getByText(uiCases.frame.missingHint).waitFor();
      expect(await page.locator('body').innerText()).not.toContain(asDraft.content.compound.name);
    }
    await page.goto(`/team/${scene.projectId}`);
    await page.getByText(uiTeam.project.missing).first().waitFor();
  });
});

it('a reviewer signs only what they hold, after every check', async () => {
  const { people: { reviewer, lead }, projectId } = scene;
  const one = await submit(writing.caller, await draft(writing.caller, projectId));
  const leading = await openAs(browser, lead);
  await visitAs(browser, reviewer, { viewport: WIDE }, async ({ page, caller }) => {
    const { sign, check } = await refusals(one, caller, ['sign', 'check']);
    expect([sign, check]).toEqual([[409, casesText.refused.takeFirst], [409, casesText.refused.takeFirst]]);
    await claim(leading.caller, one.id);
    const { sign: held, claim: taken } = await refusals(one, caller, ['sign', 'claim']);
    for (const [status, sentence] of [held!, taken!]) expect([status, sentence]).toEqual([409, expect.stringContaining(`${lead.name} holds this case until`)]);
    await page.goto(`/cases/${one.id}`);
    await page.getByText(new RegExp(`${lead.name} holds this case`)).first().waitFor();
    await none(page, uiReviews.column.claim, uiReviews.column.sign);
    const [status, sentence] = (await refusals(one, leading.caller, ['sign'])).sign!;
    expect([status, sentence]).toEqual([409, expect.stringMatching(/^Sign opens when .+ checked\.$/)]);
  });
  await leading.close();
});

it('a chemist leads nothing and administers nothing', async () => {
  await visitAs(browser, scene.people.second, { viewport: PHONE }, async ({ page, caller }) => {
    const { projectId, people: { author } } = scene;
    await page.goto(`/team/${projectId}`);
    await page.getByText(author.email).waitFor();
    await none(page, uiTeam.project.invite, `${uiTeam.project.change}, ${author.name}`, uiTeam.project.saveSettings);
    const tried = [
      await caller.post(`/api/projects/${projectId}/invitations`, { email: 'a@b.example', role: 'lead', guestUntil: null }),
      await caller.put(`/api/projects/${projectId}/members/${author.id}`, { role: 'reader', guestUntil: null }),
      await caller.delete(`/api/projects/${projectId}/members/${author.id}`),
      await caller.get('/api/admin/users'),
      await caller.put(`/api/admin/users/${author.id}`, { siteRole: 'administrator', status: 'active' }),
      await caller.post('/api/projects', { key: 'NEW', name: 'New' }),
    ];
    expect(tried.map(({ status }) => status)).toEqual([403, 403, 403, 403, 403, 403]);
    await page.goto('/admin');
    await page.getByText(uiAccount.admin.refused).waitFor();
  });
});

it('a visitor gets nothing but the quick look, the relations and help; a page of another site gets nothing done', async () => {
  await visit(browser, {}, async ({ page, context, expectRefusal }) => {
    for (const path of ['/api/cases', `/api/cases/${asDraft.id}`, '/api/reviews', '/api/team', `/api/projects/${scene.projectId}`, '/api/admin/users']) expect([path, (await context.request.get(path)).status()]).toEqual([path, 401]);
    const foreign = await writing.context.request.post(`/api/cases/${asDraft.id}/withdraw`, { data: { seenVersion: asDraft.version, reason: 'x' }, headers: { origin: 'https://elsewhere.example' } });
    expect(foreign.status()).toBe(403);
    await page.goto('/');
    // from the page itself, as a script in it would try
    expectRefusal(/^401 POST \/api\/cases$/);
    expect(await page.evaluate(async (projectId) => (await fetch('/api/cases', { method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify({ projectId, question: 'x' }) })).status, scene.projectId)).toBe(401);
  });
  const { state } = ok(await writing.caller.get<CaseResponse>(`/api/cases/${asDraft.id}`));
  expect(state).toBe('draft');
});
