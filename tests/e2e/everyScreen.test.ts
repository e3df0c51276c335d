import type { Browser, Page } from 'playwright-core';
import type { CaseListResponse } from '@/shared/contracts/cases';
import { quickText } from '@/shared/text/quick';
import { uiAccount } from '@/shared/text/uiAccount';
import { uiCases } from '@/shared/text/uiCases';
import { uiReviews } from '@/shared/text/uiReviews';
import { uiTeam } from '@/shared/text/uiTeam';
import { uiText } from '@/shared/text/ui';
import { CASE_STATES, type CaseState } from '@/shared/types/case';
import type { ProjectResponse, TeamResponse } from '@/shared/contracts/team';
import { axeFindings, CLEAN, openBrowser, openPage, overflowing, PHONE, until, WIDE, WIDTHS, type OpenPage, type PageOptions } from '../helpers/browser';
import { ok } from '../helpers/caseWork';
import { demoPerson, makeScene, openAs, sql, type SignedInPage } from '../helpers/people';

/** What the routes of cases and projects are tried with, from the demo. */
interface Known { cases: Record<CaseState, { id: string; code: string; question: string }>; project: { id: string; name: string }; invitation: string; reset: string }
let browser: Browser;
let known: Known;

/** The link of the newest mail to this address; the mailbox page shows the demo's mails alone. */
async function linkTo(email: string): Promise<string> {
  // a mail leaves after the answer that caused it
  const [mail] = await until(() => sql('SELECT link FROM mailbox WHERE recipient = ? ORDER BY id DESC LIMIT 1', [email]), (rows) => rows.length === 1, `a mail to ${email}`);
  return new URL(String(mail?.['link'])).pathname;
}

beforeAll(async () => {
  const made = makeScene({ lead: 'lead' });
  browser = await openBrowser();
  const joris = await openAs(browser, demoPerson('joris'));
  const cases = {} as Known['cases'];
  for (const state of CASE_STATES) {
    const { cases: [row] } = ok(await joris.caller.get<CaseListResponse>(`/api/cases?state=${state}&limit=1`));
    if (!row) throw new Error(`The demo has no case that is ${state}.`);
    cases[state] = row;
  }
  const { projects: [project] } = ok(await joris.caller.get<TeamResponse>('/api/team'));
  await joris.close();
  const { projectId, people: { lead } } = await made;
  const leading = await openAs(browser, lead);
  const guest = `guest.${projectId.slice(0, 6)}@e2e.example`;
  ok(await leading.caller.post<ProjectResponse>(`/api/projects/${projectId}/invitations`, { email: guest, role: 'reader', guestUntil: null }), 201);
  ok(await leading.caller.post('/api/password/forgot', { email: lead.email }));
  await leading.close();
  known = { cases, project: { id: project!.id, name: project!.name }, invitation: await linkTo(guest), reset: await linkTo(lead.email) };
});
afterAll(() => browser.close());

/** The address, the heading of level 1, and the page's title where it says more. */
type Place = [name: string, path: () => string, heading: () => string | RegExp, title?: () => string];
const caseOf = (state: CaseState) => known.cases[state];
const answered = async (page: Page) => { await page.getByRole('region', { name: uiText.calculatedAnswer }).getByRole('heading').filter({ hasNotText: quickText.begin.replaceAll('_', '') }).filter({ hasNotText: quickText.working }).first().waitFor(); };

const OPEN_PLACES: Place[] = [
  ['the quick look', () => '/', () => quickText.title],
  ['a single bond, answered', () => '/?j=8.9&front=C(%3DC%2CC)~O(C)&rear=O(H)~C(C%2CH%2CH)&turning=ring', () => quickText.title],
  ['a double bond, answered', () => '/?bond=double&j=12.4&left=O(C)~H&right=C(C%2CH%2CH)~H', () => quickText.title],
  ['signing in', () => '/sign-in', () => uiAccount.signIn.title],
  ['a forgotten password', () => '/forgot', () => uiAccount.forgot.title],
  ['a new password', () => known.reset, () => uiAccount.reset.title],
  ['an invitation', () => known.invitation, () => /^Join /],
  ['the relations', () => '/relations', () => uiText.places.relations],
  ['one relation', () => `/relations/${encodeURIComponent('vicinal-hh/karplus-1963@1')}`, () => /Karplus 1963/],
  ['one relation by its own address', () => `/relations/${encodeURIComponent('alkene-hh/class-values')}`, () => /Double bonds by class/],
  ['help', () => '/help', () => uiText.help],
  ['the glossary', () => '/help/glossary', () => /Glossary|Words/],
  ['the demo mailbox', () => '/mailbox', () => uiAccount.mailbox.title],
  ['the account of nobody', () => '/account', () => uiAccount.account.title],
  ['the cases of nobody', () => '/cases', () => uiCases.list.title],
  ['no page', () => '/nowhere/at/all', () => uiText.notFoundTitle],
];
const SIGNED_IN_PLACES: Place[] = [
  ['the cases', () => '/cases', () => uiCases.list.title],
  ['the cases, filtered', () => '/cases?state=queried&sort=due', () => uiCases.list.title],
  ['a new case', () => '/cases/new', () => uiCases.fresh.title],
  ...CASE_STATES.map((state): Place => [`a case that is ${state}`, () => `/cases/${caseOf(state).id}`, () => caseOf(state).question, () => `${caseOf(state).code} · ${caseOf(state).question}`]),
  ['the history of a case', () => `/cases/${caseOf('signed').id}/history`, () => uiCases.history.title, () => `${caseOf('signed').code} · ${uiCases.history.title}`],
  ['the sheet of a case', () => `/cases/${caseOf('signed').id}/sheet`, () => uiCases.sheet.title, () => `${caseOf('signed').code} · ${uiCases.sheet.title}`],
  ['no such case', () => '/cases/00000000-0000-4000-8000-000000000000', () => uiCases.frame.missing],
  ['the reviews', () => '/reviews', () => uiReviews.title],
  ['the team', () => '/team', () => uiTeam.title],
  ['a project', () => `/team/${known.project.id}`, () => known.project.name],
  ['the account', () => '/account', () => uiAccount.account.title],
];

/** Nothing reaches past the edges, once the drawings have taken the width they are given. */
const fitsInWidth = (page: Page) => until(() => overflowing(page), (found) => found.length === 0, `a screen that fits in ${page.viewportSize()?.width} px`, 6_000);

/** One cold load: the right screen, its title, no sideways scrolling down to 320 px, and axe in both themes. */
async function looksRight({ page, findings }: OpenPage, [, path, heading, title]: Place, width: number): Promise<void> {
  await page.goto(path());
  const head = page.getByRole('heading', { level: 1 });
  await head.filter({ hasText: heading() }).waitFor();
  await page.waitForLoadState('networkidle');
  if (path().startsWith('/?')) await answered(page);
  const shown = (await head.innerText()).trim();
  expect(await head.count()).toBe(1);
  expect(await page.title()).toBe(`${title?.() ?? shown} · ${uiText.product}`);
  expect(await page.getByText(/NaN|undefined|\[object/).count()).toBe(0);
  await fitsInWidth(page);
  // a tall window: axe reads what can be seen, and the screens scroll within themselves
  await page.setViewportSize({ width, height: 3200 });
  expect({ light: await axeFindings(page) }).toEqual({ light: [] });
  await page.emulateMedia({ colorScheme: 'dark' });
  await page.locator('html[data-theme="dark"]').waitFor();
  expect({ dark: await axeFindings(page) }).toEqual({ dark: [] });
  await page.emulateMedia({ colorScheme: 'light' });
  await page.locator('html[data-theme="light"]').waitFor();
  await page.setViewportSize(width === PHONE.width ? PHONE : WIDE);
  if (width === PHONE.width) {
    await page.setViewportSize({ width: 320, height: 640 });
    await fitsInWidth(page);
    await page.setViewportSize(PHONE);
  }
  expect(findings).toEqual(CLEAN);
}

/** The pages of one width share a profile, as those of a person do; each screen is a load of its own. */
function places(list: Place[], open: (options: PageOptions) => Promise<OpenPage>) {
  describe.each(WIDTHS)('on a %s', (_name, viewport) => {
    let opened: OpenPage;
    beforeAll(async () => {
      opened = await open({ viewport });
      opened.expectRefusal(/^404 GET \/api\/cases\/0{8}-/);
    });
    afterAll(() => opened.close());
    it.each(list)('%s', async (...place) => {
      opened.findings.errors.length = 0; // what an earlier screen did wrong is told there
      opened.findings.refused.length = 0;
      await looksRight(opened, place, viewport.width);
    });
  });
}

describe('a deep link without an account opens', () => places(OPEN_PLACES, (options) => openPage(browser, options)));
describe('a deep link with an account opens', () => places(SIGNED_IN_PLACES, (options): Promise<SignedInPage> => openAs(browser, demoPerson('joris'), options)));
describe('a deep link of an administrator opens', () => places([['the accounts', () => '/admin', () => uiAccount.admin.title]], (options) => openAs(browser, demoPerson('petra'), options)));
