import type { Browser, Page } from 'playwright-core';
import type { CaseResponse, RevisionResponse } from '@/shared/contracts/cases';
import { fieldWords } from '@/shared/text/uiCaseFields';
import { uiAccount } from '@/shared/text/uiAccount';
import { uiCaseParts as parts } from '@/shared/text/uiCaseParts';
import { uiCases } from '@/shared/text/uiCases';
import { uiText } from '@/shared/text/ui';
import { openBrowser, PHONE, until, WIDE } from '../helpers/browser';
import { draft, ok } from '../helpers/caseWork';
import { makeScene, openAs, visitAs, type SignedInPage } from '../helpers/people';

let browser: Browser;
beforeAll(async () => { browser = await openBrowser(); });
afterAll(() => browser.close());

const press = (page: Page, name: string | RegExp) => page.getByRole('button', { name, exact: typeof name === 'string' }).first().click();
const said = (page: Page, words: string | RegExp) => page.getByText(words).first().waitFor();
const onServer = (page: Page) => said(page, /^On the server since/);
const held = async ({ caller }: Pick<SignedInPage, 'caller'>, id: string): Promise<CaseResponse> => ok(await caller.get<CaseResponse>(`/api/cases/${id}`));
const keptKeys = (page: Page): Promise<string[]> => page.evaluate(() => Object.keys(localStorage).filter((key) => key.startsWith('tb.draft.')));
const showsCase = (page: Page) => page.getByRole('table', { name: parts.readings.title }).waitFor();
/** Changes the J of the first reading through its sheet. */
async function typeJ(page: Page, j: string): Promise<void> {
  await press(page, /^H2–H3/);
  await page.getByRole('textbox', { name: parts.readings.jSpoken }).fill(j);
  await press(page, parts.readings.save);
  await page.getByRole('dialog').waitFor({ state: 'detached' });
}

it('shows both versions when two people saved, and loses neither', async () => {
  const { projectId, people: { author, second } } = await makeScene({ author: 'chemist', second: 'chemist' });
  const other = await openAs(browser, second);
  await visitAs(browser, author, { viewport: PHONE }, async (open) => {
    const { page, caller, expectRefusal } = open;
    const one = await draft(caller, projectId);
    await page.goto(`/cases/${one.id}`);
    await showsCase(page);
    const theirs = { ...one.content, readings: [{ ...one.content.readings[0]!, j: '15.50' }], compound: { ...one.content.compound, batch: 'B-18' } };
    const saved = ok(await other.caller.put<CaseResponse>(`/api/cases/${one.id}`, { seenVersion: one.version, content: theirs }));
    expectRefusal(/^409 PUT \/api\/cases\//);
    await typeJ(page, '15.70');
    await page.getByRole('heading', { level: 1, name: uiCases.versions.title }).waitFor();
    await said(page, new RegExp(`${second.name} saved revision ${saved.revision}`));
    const both = page.getByRole('radiogroup', { name: 'J, H2–H3' });
    expect((await both.getByRole('radio').allInnerTexts()).map((text) => text.replace(/\s+/g, ' '))).toEqual([expect.stringMatching(/Yours.*15\.70 Hz/), expect.stringMatching(new RegExp(`${second.name}.*15\\.50 Hz`))]);
    const single = page.getByRole('radiogroup', { name: fieldWords.compound.batch });
    expect(await single.getByRole('radio', { name: new RegExp(second.name) }).getAttribute('aria-checked')).toBe('true');
    // neither is lost before the choice: the page may be left and opened again
    await page.reload();
    await both.getByRole('radio', { name: /Yours/ }).click();
    await press(page, uiCases.versions.save(saved.revision + 1));
    const { content, revision } = await until(() => held(open, one.id), (now) => now.revision > saved.revision, 'the chosen version on the server');
    await onServer(page);
    expect([content.readings[0]?.j, content.compound.batch, revision]).toEqual(['15.70', 'B-18', saved.revision + 1]);
    const theirRevision = ok(await caller.get<RevisionResponse>(`/api/cases/${one.id}/revisions/${saved.revision}`));
    expect(theirRevision.content.readings[0]?.j).toBe('15.50');
  });
  await other.close();
});

it('merges by itself what two people changed in different places', async () => {
  const { projectId, people: { author, second } } = await makeScene({ author: 'chemist', second: 'chemist' });
  const other = await openAs(browser, second);
  await visitAs(browser, author, { viewport: WIDE }, async (open) => {
    const { page, caller, expectRefusal } = open;
    const one = await draft(caller, projectId);
    await page.goto(`/cases/${one.id}`);
    await showsCase(page);
    ok(await other.caller.put<CaseResponse>(`/api/cases/${one.id}`, { seenVersion: one.version, content: { ...one.content, compound: { ...one.content.compound, notebook: 'RM-001-02' } } }));
    expectRefusal(/^409 PUT \/api\/cases\//);
    await typeJ(page, '15.80');
    // both changes stand on the page where they are chosen; the usual choice keeps both
    await page.getByRole('heading', { level: 1, name: uiCases.versions.title }).waitFor();
    await page.getByRole('button', { name: /^Save revision/ }).click();
    const { content } = await until(() => held(open, one.id), (now) => now.content.readings[0]?.j === '15.80', 'both changes on the server');
    await onServer(page);
    expect([content.readings[0]?.j, content.compound.notebook]).toEqual(['15.80', 'RM-001-02']);
  });
  await other.close();
});

it('keeps what is typed without a network, says so, and saves it by itself when the server is back', async () => {
  const { projectId, people: { author } } = await makeScene({ author: 'chemist' });
  await visitAs(browser, author, { viewport: PHONE }, async (open) => {
    const { page, context, caller, expectNoNetwork } = open;
    const one = await draft(caller, projectId);
    await page.goto(`/cases/${one.id}`);
    await showsCase(page);
    expectNoNetwork();
    await context.setOffline(true);
    await typeJ(page, '15.60');
    await said(page, /No connection since/);
    await said(page, uiCases.kept.offline);
    await said(page, '15.60');
    expect(await keptKeys(page)).toEqual([`tb.draft.${author.id}.case.${one.id}`]);
    await context.setOffline(false);
    await until(async () => (await held(open, one.id)).content.readings[0]?.j, (j) => j === '15.60', 'the change on the server');
    await onServer(page);
    expect(await keptKeys(page)).toEqual([]);

    // the page itself is lost while the server is away
    await context.setOffline(true);
    await typeJ(page, '15.65');
    await said(page, uiCases.kept.offline);
    await page.close();
    await context.setOffline(false);
    const again = await context.newPage();
    await again.goto(`/cases/${one.id}`);
    await said(again, '15.65');
    await until(async () => (await held(open, one.id)).content.readings[0]?.j, (j) => j === '15.65', 'the draft on the server');
  });
});

it('keeps what is typed when the session ends, and saves it after signing in again', async () => {
  const { projectId, people: { author } } = await makeScene({ author: 'chemist' });
  await visitAs(browser, author, { viewport: WIDE }, async (open) => {
    const { page, caller, expectRefusal } = open;
    const one = await draft(caller, projectId);
    await page.goto(`/cases/${one.id}`);
    await showsCase(page);
    ok(await caller.delete('/api/session'));
    expectRefusal(/^401 /);
    await typeJ(page, '15.55');
    await said(page, uiCases.kept.signedOut);
    await said(page, /You are signed out\./);
    await said(page, '15.55');
    await page.getByRole('link', { name: uiText.signIn, exact: true }).first().click();
    await page.getByRole('textbox', { name: uiAccount.email }).fill(author.email);
    await page.getByRole('textbox', { name: uiAccount.password, exact: true }).fill(author.password);
    await page.keyboard.press('Enter');
    await page.waitForURL(`**/cases/${one.id}`);
    await until(async () => (await held(open, one.id)).content.readings[0]?.j, (j) => j === '15.55', 'the change on the server');
    await onServer(page);
  });
});

it('wipes everything of a person from the device at sign-out, after saying what is not on the server', async () => {
  const { projectId, people: { author } } = await makeScene({ author: 'chemist' });
  await visitAs(browser, author, { viewport: PHONE }, async (open) => {
    const { page, context, caller } = open;
    const one = await draft(caller, projectId);
    await page.goto(`/cases/${one.id}`);
    await press(page, parts.readings.add);
    await page.getByRole('textbox', { name: fieldWords.readings.atomA }).fill('H9');
    expect(await keptKeys(page)).toHaveLength(1);
    await page.goto('/account');
    await press(page, uiAccount.account.signOut);
    const ask = page.getByRole('dialog', { name: uiAccount.account.signOut });
    await ask.getByText(uiAccount.account.unsent(1)).waitFor();
    await ask.getByRole('button', { name: uiAccount.account.signOutAnyway }).click();
    await page.getByRole('heading', { level: 1, name: uiAccount.signIn.title }).waitFor();
    expect(await keptKeys(page)).toEqual([]);
    expect(await page.evaluate(() => JSON.stringify({ ...localStorage, ...sessionStorage }))).not.toMatch(/H9|Cinnamate/);
    expect((await context.request.get('/api/cases')).status()).toBe(401);
    // what was read before is not shown to whoever comes next
    await page.goto(`/cases/${one.id}`);
    await said(page, uiCases.list.signInHint);
    await page.goBack();
    expect(await page.locator('body').innerText()).not.toContain('Cinnamate');
  });
});
