import { randomBytes } from 'node:crypto';
import type { Browser, Page } from 'playwright-core';
import type { CaseResponse } from '@/shared/contracts/cases';
import { problemText } from '@/shared/text/problems';
import { uiAccount } from '@/shared/text/uiAccount';
import { uiCases } from '@/shared/text/uiCases';
import { roleWords, uiTeam } from '@/shared/text/uiTeam';
import { uiText } from '@/shared/text/ui';
import { openBrowser, PHONE, until, visit, WIDE } from '../helpers/browser';
import { draft } from '../helpers/caseWork';
import { callerOf, makePerson, makeScene, openAs, sql, visitAs } from '../helpers/people';
import { PASSWORD } from '../helpers/password';

let browser: Browser;
beforeAll(async () => { browser = await openBrowser(); });
afterAll(() => browser.close());

const say = uiTeam.project;
const press = (page: Page, name: string | RegExp) => page.getByRole('button', { name, exact: typeof name === 'string' }).first().click();
const role = (page: Page, word: string) => page.getByRole('dialog').getByRole('radio', { name: new RegExp(`^${word}`) }).click();
const dayFrom = (days: number) => new Date(Date.now() + days * 24 * 3600 * 1000).toISOString().slice(0, 10);

it('takes a new person in by invitation; a change of role holds at once, and a guest leaves when the day is over', async () => {
  // a project of the demo's kind: the mailbox page shows its invitations
  const { projectId, projectName, people: { lead } } = await makeScene({ lead: 'lead' }, { isDemo: true });
  const email = `mila.${randomBytes(3).toString('hex')}@partner.example`;
  const leading = await openAs(browser, lead, { viewport: WIDE });
  const { page } = leading;
  await page.goto(`/team/${projectId}`);
  await press(page, say.invite);
  await page.getByRole('textbox', { name: uiAccount.email }).fill(email);
  await role(page, roleWords.reader);
  await press(page, say.inviteAct);
  await page.getByRole('dialog').waitFor({ state: 'detached' });
  await page.getByText(email, { exact: true }).waitFor();

  await visit(browser, { viewport: PHONE }, async ({ page: own, context, expectRefusal }) => {
    const link = own.getByRole('link', { name: uiAccount.mailbox.open });
    await own.goto('/mailbox');
    // each mail is a card: the one to this address holds the link
    const mails = own.locator('div', { has: own.getByText(uiAccount.mailbox.to(email), { exact: true }), hasText: projectName }).filter({ has: link });
    await until(async () => { if (await mails.count() === 0) await own.reload(); await link.first().waitFor(); return mails.count(); }, (count) => count > 0, 'the mail');
    await mails.last().getByRole('link', { name: uiAccount.mailbox.open }).first().click();
    await own.getByRole('heading', { level: 1, name: uiAccount.invitation.title(projectName) }).waitFor();
    await own.getByText(uiAccount.invitation.lead(lead.name, roleWords.reader)).waitFor();
    await press(own, uiAccount.invitation.accept); // nothing typed yet: told in place
    await own.getByText(uiAccount.nameEmpty).waitFor();
    await own.getByRole('textbox', { name: uiAccount.name }).fill('Mila Brandt');
    await own.getByRole('textbox', { name: uiAccount.password, exact: true }).fill(PASSWORD);
    await press(own, uiAccount.invitation.accept);
    await own.getByRole('heading', { level: 1, name: uiCases.list.title }).waitFor();

    const caller = callerOf(context);
    const open = () => caller.post<CaseResponse>('/api/cases', { projectId, question: 'May Mila write?' });
    expect((await open()).status).toBe(403);
    await own.goto('/cases/new');
    await own.getByText(uiCases.fresh.noProject).waitFor();

    await page.reload();
    await press(page, `${say.change}, Mila Brandt`);
    await role(page, roleWords.chemist);
    await press(page, say.save);
    await page.getByRole('dialog').waitFor({ state: 'detached' });
    expect((await open()).status).toBe(201); // the same session, the next request
    await own.reload();
    await own.getByRole('textbox', { name: uiCases.fresh.question }).waitFor();

    // an end date: a past day is refused in place, a day to come is kept, and when it is over the project is gone
    leading.expectRefusal(/^422 PUT \/api\/projects\//);
    await press(page, `${say.change}, Mila Brandt`);
    const until_ = page.getByRole('textbox', { name: say.guestUntil });
    await until_.fill('soon');
    await press(page, say.save);
    await page.getByText(say.dayError).waitFor();
    await until_.fill(dayFrom(-2));
    await press(page, say.save);
    await page.getByRole('dialog').getByText(problemText.endInPast).waitFor();
    await until_.fill(dayFrom(3));
    await press(page, say.save);
    await page.getByRole('dialog').waitFor({ state: 'detached' });
    await page.getByText(/^guest until/).first().waitFor();
    expect((await open()).status).toBe(201);
    await sql('UPDATE memberships SET guest_until = ? WHERE project_id = ? AND user_id = (SELECT id FROM users WHERE email = ?)', [dayFrom(-1), projectId, email]);
    expect((await open()).status).toBe(404);
    expectRefusal(/^404 GET \/api\/projects\//);
    await own.goto(`/team/${projectId}`);
    await own.getByText(say.missing).first().waitFor();
  });
  await page.reload();
  await page.getByText(/^guest, ended/).first().waitFor();
  expect(leading.findings.errors.concat(leading.findings.refused, leading.findings.elsewhere)).toEqual([]);
  await leading.close();
});

it('shuts an account out at once when an administrator disables it', async () => {
  const name = `Jonas Verhey ${randomBytes(2).toString('hex')}`;
  const [administrator, person] = await Promise.all([makePerson('Hedda Sworn', { siteRole: 'administrator' }), makePerson(name)]);
  const own = await openAs(browser, person, { viewport: PHONE });
  await own.page.goto('/cases');
  await own.page.getByRole('heading', { level: 1, name: uiCases.list.title }).waitFor();
  await visitAs(browser, administrator, { viewport: WIDE }, async ({ page, caller }) => {
    await page.goto('/admin');
    await press(page, `${uiAccount.admin.disable}, ${name}`);
    await page.getByRole('dialog', { name: uiAccount.admin.askDisable(name) }).getByRole('button', { name: uiAccount.admin.disable }).click();
    await page.getByRole('button', { name: `${uiAccount.admin.enable}, ${name}` }).waitFor();
    expect((await own.caller.get('/api/cases')).status).toBe(401);
    const again = await own.caller.post('/api/session', { email: person.email, password: person.password });
    expect([again.status, again.body.detail]).toEqual([403, problemText.accountDisabled]);
    // an administrator manages accounts and sees no case by that
    const { projectId, people: { author } } = await makeScene({ author: 'chemist' });
    const writing = await openAs(browser, author);
    const one = await draft(writing.caller, projectId);
    await writing.close();
    expect((await caller.get(`/api/cases/${one.id}`)).status).toBe(404);
  });
  own.expectRefusal(/^401 /);
  await own.page.getByRole('link', { name: uiText.places.reviews }).click();
  await own.page.getByText(/You are signed out/).first().waitFor();
  await own.close();
});

it('sets a new password by the mail of a forgotten one, and ends every other session', async () => {
  const person = await makePerson('Signe Halloran');
  const other = await openAs(browser, person);
  await visit(browser, { viewport: PHONE }, async ({ page }) => {
    await page.goto('/forgot');
    await page.getByRole('textbox', { name: uiAccount.email }).fill(person.email);
    await press(page, uiAccount.forgot.act);
    await page.getByText(uiAccount.forgot.sent(person.email)).waitFor();
    const [mail] = await until(() => sql('SELECT link FROM mailbox WHERE recipient = ?', [person.email]), (rows) => rows.length === 1, 'the mail');
    await page.goto(new URL(String(mail?.['link'])).pathname);
    const next = page.getByRole('textbox', { name: uiAccount.newPassword, exact: true });
    await next.fill('short');
    await press(page, uiAccount.reset.act);
    await page.getByText(uiAccount.tooShort(5)).waitFor();
    await next.fill('another angle altogether');
    await press(page, uiAccount.reset.act);
    await page.getByRole('heading', { name: uiAccount.reset.doneTitle }).first().waitFor();
  });
  expect((await other.caller.get('/api/cases')).status).toBe(401);
  const [old, fresh] = [await other.caller.post('/api/session', { email: person.email, password: person.password }), await other.caller.post('/api/session', { email: person.email, password: 'another angle altogether' })];
  expect([old.status, fresh.status]).toEqual([403, 200]);
  await other.close();
});
