import type { Browser, Page } from 'playwright-core';
import type { CaseResponse } from '@/shared/contracts/cases';
import { STATE_WORDS } from '@/shared/format/words';
import { problemText } from '@/shared/text/problems';
import { uiCaseParts as parts } from '@/shared/text/uiCaseParts';
import { uiCases } from '@/shared/text/uiCases';
import { stepWords, uiReviews } from '@/shared/text/uiReviews';
import { REVIEW_STEPS } from '@/shared/types/trail';
import { CLEAN, openBrowser, PHONE, until, WIDE } from '../helpers/browser';
import { draft, ok, signedCase, submit } from '../helpers/caseWork';
import { makeScene, openAs, visitAs } from '../helpers/people';
import { PASSWORD } from '../helpers/password';

let browser: Browser;
beforeAll(async () => { browser = await openBrowser(); });
afterAll(() => browser.close());

const press = (page: Page, name: string | RegExp) => page.getByRole('button', { name, exact: typeof name === 'string' }).first().click();
const state = (page: Page, word: string) => page.getByText(word, { exact: true }).first().waitFor();

it('takes a case from the worklist, asks at a step, gets the answer, and signs; then nothing in it moves', async () => {
  const { projectId, people: { author, reviewer } } = await makeScene({ author: 'chemist', reviewer: 'reviewer' });
  const writing = await openAs(browser, author, { viewport: PHONE });
  const reviewing = await openAs(browser, reviewer, { viewport: WIDE });
  const sent = await submit(writing.caller, await draft(writing.caller, projectId));
  const now = async () => ok(await reviewing.caller.get<CaseResponse>(`/api/cases/${sent.id}`));

  const { page } = reviewing;
  await page.goto('/reviews');
  await press(page, `${uiReviews.take}, ${sent.code}`);
  await page.waitForURL(`**/cases/${sent.id}`);
  await page.getByText(/held by you until/).waitFor();
  const sign = page.getByRole('button', { name: uiReviews.column.sign, exact: true });
  expect(await sign.isDisabled()).toBe(true);
  expect(await sign.evaluate((node) => document.getElementById(node.getAttribute('aria-describedby') ?? '')?.textContent ?? '')).not.toBe(''); // never dead without a reason
  for (const step of REVIEW_STEPS.filter((each) => each !== 'alternatives')) await press(page, `${uiReviews.column.check}, ${stepWords[step]}`);

  // the query is pinned to the step that was open
  const step = page.getByRole('region', { name: parts.trail.title }).getByRole('button').nth(1);
  await step.click();
  const stepTitle = await page.getByRole('dialog').getByRole('heading', { level: 2 }).innerText();
  await page.getByRole('dialog').getByRole('button', { name: uiReviews.column.newQuery }).click();
  await page.getByRole('textbox', { name: uiReviews.column.queryText }).fill('Was the splitting read at H3 as well?');
  await press(page, uiReviews.column.ask);
  const thread = page.getByRole('region', { name: /^Query 1/ });
  await thread.getByText('Was the splitting read at H3 as well?').waitFor();
  await state(page, STATE_WORDS.queried);
  await step.getByText(parts.trail.query(1)).waitFor();
  const [query] = (await now()).review.queries;
  const pinned = (await now()).trail.steps.findIndex(({ key }) => key === query?.stepKey);
  expect(stepTitle).toMatch(new RegExp(`^${pinned + 1}\\s`));

  // the author answers on a phone, in the thread; half-typed words survive a reload
  const phone = writing.page;
  await phone.goto(`/cases/${sent.id}`);
  const reply = phone.getByRole('textbox', { name: uiReviews.column.replyField(1) });
  await press(phone, uiReviews.column.replyField(1));
  await until(() => reply.evaluate((field) => field === document.activeElement), Boolean, 'the cursor in the reply');
  await phone.keyboard.type('Yes, 15.9 Hz at both.');
  await phone.reload();
  await until(() => reply.inputValue(), (value) => value === 'Yes, 15.9 Hz at both.', 'the reply typed before');
  await press(phone, uiReviews.column.send);
  await phone.getByText(uiReviews.column.states.answered, { exact: true }).waitFor();

  await page.reload();
  await thread.getByText('Yes, 15.9 Hz at both.').waitFor();
  await press(page, uiReviews.column.close(1));
  await press(page, uiReviews.column.showClosed(1));
  await until(async () => (await now()).review.queries.map((each) => each.state), (states) => states.join() === 'closed', 'a closed query');
  for (const each of (await now()).review.checks.filter((check) => check.state !== 'checked')) await press(page, `${uiReviews.column.check}, ${stepWords[each.step]}`);
  await until(() => sign.isDisabled(), (off) => !off, 'the way to sign');
  await sign.click();
  const sheet = page.getByRole('dialog', { name: uiReviews.signing.title(sent.revision) });
  await sheet.getByRole('radio', { name: new RegExp(uiReviews.signing.approval) }).click();
  const { contentHash } = await now();
  expect((await sheet.innerText()).replaceAll('\u00A0', '')).toContain(contentHash.slice(0, 12));
  const password = sheet.getByRole('textbox', { name: uiReviews.signing.password(reviewer.email) });
  reviewing.expectRefusal(/^403 POST \/api\/cases\/[^/]+\/sign$/);
  await sheet.getByRole('button', { name: uiReviews.signing.act(reviewer.name) }).click();
  await sheet.getByText(uiReviews.signing.passwordEmpty).waitFor();
  await password.fill('wrong password');
  await sheet.getByRole('button', { name: uiReviews.signing.act(reviewer.name) }).click();
  await sheet.getByText(problemText.wrongPassword).waitFor();
  await password.fill(PASSWORD);
  await sheet.getByRole('button', { name: uiReviews.signing.act(reviewer.name) }).click();
  await sheet.waitFor({ state: 'detached' });
  await state(page, STATE_WORDS.signed);
  await page.getByText(`${parts.trail.meaning.approval}: ${reviewer.name}`, { exact: true }).waitFor();
  const signed = await now();
  expect(signed.signatures.at(-1)).toMatchObject({ meaning: 'approval', name: reviewer.name, contentHash, revision: sent.revision });

  // read-only for both, on screen and on the server
  for (const open of [reviewing, writing]) {
    await open.page.goto(`/cases/${sent.id}`);
    await state(open.page, STATE_WORDS.signed);
    for (const name of [parts.readings.add, parts.candidates.add, parts.evidence.add, parts.answer.edit, uiCases.act.submit]) expect(await open.page.getByRole('button', { name, exact: true }).count()).toBe(0);
    const refused = await open.caller.put(`/api/cases/${sent.id}`, { seenVersion: signed.version, content: { ...signed.content, question: 'Changed after signing' }, reason: 'try' });
    expect([refused.status, refused.body.detail]).toEqual([409, expect.stringMatching(/signed/)]);
  }
  expect([reviewing.findings, writing.findings]).toEqual([CLEAN, CLEAN]);
  await reviewing.close();
  await writing.close();
});

it('puts a signed addendum beside a signed case and leaves the case as it is', async () => {
  const { projectId, people: { author, reviewer } } = await makeScene({ author: 'chemist', reviewer: 'reviewer' });
  const reviewing = await openAs(browser, reviewer);
  await visitAs(browser, author, { viewport: PHONE }, async ({ page, caller }) => {
    const signed = await signedCase(caller, reviewing.caller, projectId);
    await page.goto(`/cases/${signed.id}`);
    await press(page, uiCases.frame.more);
    await press(page, new RegExp(`^${uiCases.act.addend}`));
    const sheet = page.getByRole('dialog', { name: uiCases.act.addendTitle });
    await sheet.getByRole('textbox', { name: uiCases.act.addendText }).fill('A second batch gave 15.8 Hz.');
    await sheet.getByRole('textbox', { name: uiCases.act.password(author.email) }).fill(PASSWORD);
    await sheet.getByRole('button', { name: uiCases.act.addend }).click();
    await sheet.waitFor({ state: 'detached' });
    await page.getByText('A second batch gave 15.8 Hz.').first().waitFor();
    await state(page, STATE_WORDS.signed);
    const after = ok(await caller.get<CaseResponse>(`/api/cases/${signed.id}`));
    expect(after.addenda.map(({ text, by }) => [text, by])).toEqual([['A second batch gave 15.8 Hz.', author.name]]);
    expect([after.contentHash, after.revision, after.signatures]).toEqual([signed.contentHash, signed.revision, signed.signatures]);
  });
  await reviewing.close();
});
