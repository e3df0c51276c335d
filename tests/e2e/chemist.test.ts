import { readFileSync } from 'node:fs';
import type { Browser, Page } from 'playwright-core';
import type { CaseResponse } from '@/shared/contracts/cases';
import { GRADE_WORDS, STATE_WORDS } from '@/shared/format/words';
import { quickText } from '@/shared/text/quick';
import { fieldWords } from '@/shared/text/uiCaseFields';
import { uiCaseParts as parts } from '@/shared/text/uiCaseParts';
import { uiAccount } from '@/shared/text/uiAccount';
import { uiCases } from '@/shared/text/uiCases';
import { uiText } from '@/shared/text/ui';
import { problemText } from '@/shared/text/problems';
import { openBrowser, PHONE, until, visit, WIDE } from '../helpers/browser';
import { cinnamate } from '../helpers/caseContent';
import { draft, ok } from '../helpers/caseWork';
import { callerOf, makeScene, visitAs, type SignedInPage } from '../helpers/people';
import { PASSWORD } from '../helpers/password';

let browser: Browser;
beforeAll(async () => { browser = await openBrowser(); });
afterAll(() => browser.close());

const press = (page: Page, name: string | RegExp) => page.getByRole('button', { name, exact: typeof name === 'string' }).first().click();
const caseIdOf = (page: Page): string => /\/cases\/([0-9a-f-]{36})/.exec(page.url())?.[1] ?? '';
const onServer = (page: Page) => page.getByText(/^On the server since/).first().waitFor();
const held = async ({ caller, page }: SignedInPage): Promise<CaseResponse> => ok(await caller.get<CaseResponse>(`/api/cases/${caseIdOf(page)}`));
const dialog = (page: Page, name?: string | RegExp) => page.getByRole('dialog', name === undefined ? undefined : { name });

it('opens a case and types its readings by keyboard alone; every save is said, and a reload keeps all', async () => {
  const { people: { author } } = await makeScene({ author: 'chemist' });
  await visitAs(browser, author, { viewport: WIDE }, async (open) => {
    const { page } = open;
    await page.goto('/cases');
    await page.getByText(uiCases.list.emptyLead).waitFor();
    await page.getByRole('link', { name: uiCases.list.newCase }).first().click();
    await page.getByRole('heading', { level: 1, name: uiCases.fresh.title }).waitFor();
    const question = page.getByRole('textbox', { name: uiCases.fresh.question });
    await until(() => question.evaluate((field) => field === document.activeElement), Boolean, 'the cursor in the question');
    await page.keyboard.type('Cinnamate 9: E or Z?');
    await page.keyboard.press('Tab');
    await page.keyboard.type('Cinnamate 9');
    await page.keyboard.press('Enter');
    await page.getByRole('heading', { level: 1, name: 'Cinnamate 9: E or Z?' }).waitFor();

    const add = page.getByRole('button', { name: parts.readings.add });
    await add.focus();
    await page.keyboard.press('Enter');
    await dialog(page, parts.readings.newTitle).waitFor();
    const type = async (...fields: string[]) => { for (const [at, text] of fields.entries()) { if (at > 0) await page.keyboard.press('Tab'); await page.keyboard.type(text); } };
    await type('H2', 'H3', '15,90', '0.2', '15.9'); // a comma, and two digits after it
    await page.keyboard.press('Enter');
    const atomA = page.getByRole('textbox', { name: fieldWords.readings.atomA });
    await until(() => atomA.inputValue(), (value) => value === 'H3', 'the next reading, beginning at the last atom');
    await type('H4', '6.2');
    await page.keyboard.press('Enter');
    await until(() => atomA.inputValue(), (value) => value === 'H4', 'a third reading');
    await page.keyboard.press('Escape'); // from inside a field
    await dialog(page).waitFor({ state: 'detached' });
    await until(() => held(open), ({ content: { readings } }) => readings.length === 2, 'both readings on the server');
    await onServer(page);
    const rows = page.getByRole('table', { name: parts.readings.title }).getByRole('row');
    const shown = async () => (await rows.allInnerTexts()).slice(1).map((row) => row.replace(/\s+/g, ' ').trim());
    const before = await shown();
    expect(before).toHaveLength(2);
    expect(before[0]).toMatch(/^H2–H3 15,90 0\.2 15\.9/); // digits as typed
    const { content, revision } = await held(open);
    expect(content.readings.map(({ atomA: a, atomB: b, j }) => [a, b, j])).toEqual([['H2', 'H3', '15,90'], ['H3', 'H4', '6.2']]);
    expect(revision).toBeGreaterThan(1);
    await page.reload();
    await rows.nth(2).waitFor();
    expect(await shown()).toEqual(before);
  });
});

it('names what cannot be read at its field, mends it with one press, and keeps a half-typed reading over a reload', async () => {
  const { projectId, people: { author } } = await makeScene({ author: 'chemist' });
  await visitAs(browser, author, { viewport: PHONE }, async (open) => {
    const { page, caller } = open;
    const one = await draft(caller, projectId);
    await page.goto(`/cases/${one.id}`);
    await press(page, parts.readings.add);
    const j = page.getByRole('textbox', { name: parts.readings.jSpoken });
    await page.getByRole('textbox', { name: fieldWords.readings.atomA }).fill('H4');
    await page.getByRole('textbox', { name: fieldWords.readings.atomB }).fill('H5');
    await j.fill('7.0');
    await page.getByRole('textbox', { name: parts.readings.seSpoken }).fill('0');
    await page.reload();
    await press(page, parts.readings.add);
    expect(await j.inputValue()).toBe('7.0');
    await press(page, parts.readings.next);
    await page.getByText(/± 0 is no error/).waitFor();
    await press(page, /^Use 0\.2/);
    await press(page, parts.readings.next);
    await until(() => j.inputValue(), (value) => value === '', 'the next, empty reading');
    await page.keyboard.press('Escape');
    const { content } = await until(() => held(open), ({ content: { readings } }) => readings.length === 2, 'the reading on the server');
    expect(content.readings.map((reading) => [reading.atomA, reading.j, reading.se])).toEqual([['H2', '15.90', '0.2'], ['H4', '7.0', '0.2']]);
    await onServer(page);
  });
});

it('calculates, names candidates, attaches a file, differs with a reason, and sends to review with the password', async () => {
  const { projectId, people: { author } } = await makeScene({ author: 'chemist', reviewer: 'reviewer' });
  await visitAs(browser, author, { viewport: WIDE }, async (open) => {
    const { page, caller, expectRefusal } = open;
    const one = ok(await caller.post<CaseResponse>('/api/cases', { projectId, question: 'Acid 3: E or Z?', compoundName: 'Acid 3' }), 201);
    const { readings: [reading] } = cinnamate();
    ok(await caller.put<CaseResponse>(`/api/cases/${one.id}`, { seenVersion: one.version, content: { ...one.content, readings: [reading] } }));
    await page.goto(`/cases/${one.id}`);

    // what is still missing is listed, each gap leading to its place
    expectRefusal(/^422 POST \/api\/cases\/[^/]+\/submit$/, /^403 POST \/api\/cases\/[^/]+\/submit$/);
    await press(page, uiCases.act.submit);
    const password = page.getByRole('textbox', { name: uiCases.act.password(author.email) });
    await password.fill(PASSWORD);
    await dialog(page).getByRole('button', { name: uiCases.act.submit }).click();
    await page.getByText(/things are missing/).waitFor();
    await dialog(page).getByRole('button', { name: new RegExp(`^${uiCases.act.gapsGo}`) }).first().click();
    await page.keyboard.press('Escape');

    await press(page, parts.calculation.addOf('H2–H3'));
    const sheet = dialog(page, parts.calculation.addTitle('H2–H3'));
    await sheet.getByRole('radio', { name: parts.calculation.double }).click();
    for (const [slot, group] of [[quickText.slots.leftUpper, 'aryl'], [quickText.slots.rightUpper, 'CO₂R']] as const) {
      await press(page, new RegExp(`^${slot}`));
      await dialog(page, slot).getByRole('button', { name: group, exact: true }).click();
    }
    await sheet.getByRole('button', { name: parts.calculation.save }).click();
    await page.getByRole('heading', { name: /^Trans \(E\): 15\.90/ }).waitFor();

    for (const [name, claim] of [['E', parts.candidates.trans], ['Z', parts.candidates.cis]] as const) {
      await press(page, parts.candidates.add);
      await page.getByRole('textbox', { name: parts.candidates.name }).fill(name);
      await dialog(page).getByRole('radio', { name: claim, exact: true }).click();
      await press(page, parts.candidates.save);
    }
    await page.getByText(parts.candidates.status.excluded, { exact: true }).first().waitFor();
    await page.getByText(parts.candidates.status.fits, { exact: true }).first().waitFor();

    const bytes = Buffer.concat([Buffer.from('\x89PNG\r\n\x1a\n', 'latin1'), readFileSync('/usr/bin/env').subarray(0, 30_000)]);
    await page.locator('input[type="file"]').setInputFiles({ name: 'NOE map Łódź.png', mimeType: 'image/png', buffer: bytes });
    const link = page.getByRole('link', { name: `${parts.evidence.download}, NOE map Łódź.png` });
    const [download] = await Promise.all([page.waitForEvent('download'), link.click()]);
    expect(download.suggestedFilename()).toBe('NOE map Łódź.png');
    expect(readFileSync(await download.path()).equals(bytes)).toBe(true);

    await press(page, parts.answer.write);
    await dialog(page).getByRole('radio', { name: GRADE_WORDS.tentative }).click();
    await dialog(page).getByRole('radio', { name: 'E', exact: true }).click();
    await page.getByRole('textbox', { name: parts.answer.statement }).fill('E, aryl and acid on opposite sides');
    await page.getByRole('textbox', { name: parts.answer.reasons }).fill('Inside the trans class; one sample only.');
    await press(page, parts.done);
    await page.getByText(parts.answer.overrideEmpty).waitFor(); // assigned was calculated
    await page.getByRole('textbox', { name: parts.answer.override }).fill('The sample may be a mixture.');
    await press(page, parts.done);
    await until(() => held(open), ({ content }) => content.answer?.overrideReason === 'The sample may be a mixture.', 'the answer on the server');
    await onServer(page);
    const judged = page.getByRole('region', { name: uiText.judgedAnswer });
    expect(await judged.innerText()).toContain('E, aryl and acid on opposite sides');
    const calculated = await page.getByRole('region', { name: uiText.calculatedAnswer }).innerText();
    expect(calculated).toContain(parts.answer.differs);
    expect(calculated).toContain('The sample may be a mixture.');
    expect(calculated).toContain(GRADE_WORDS.assigned);

    await press(page, uiCases.act.submit);
    await password.fill('not my password');
    await dialog(page).getByRole('button', { name: uiCases.act.submit }).click();
    await dialog(page).getByText(problemText.wrongPassword).waitFor();
    await password.fill(PASSWORD);
    await dialog(page).getByRole('button', { name: uiCases.act.submit }).click();
    await dialog(page).waitFor({ state: 'detached' });
    await page.getByText(STATE_WORDS['in-review'], { exact: true }).first().waitFor();
    expect(await page.getByRole('button', { name: parts.readings.add }).count()).toBe(0);
    const { state, signatures } = await held(open);
    expect([state, signatures.map(({ meaning, name }) => [meaning, name])]).toEqual(['in-review', [['authorship', author.name]]]);
  });
});

it('compares any two revisions field by field, the former name included', async () => {
  const { projectId, people: { author } } = await makeScene({ author: 'chemist' });
  await visitAs(browser, author, { viewport: PHONE }, async (open) => {
    const { page, caller } = open;
    const one = await draft(caller, projectId);
    await page.goto(`/cases/${one.id}`);
    await page.getByRole('button', { name: /^Compound/ }).click();
    await page.getByRole('textbox', { name: fieldWords.compound.name, exact: true }).fill('Cinnamate 4b');
    await press(page, parts.done);
    await until(() => held(open), ({ revision }) => revision === one.revision + 1, 'a revision');
    await page.getByText(/formerly Cinnamate 4$|formerly Cinnamate 4 /).first().waitFor();
    await press(page, uiCases.frame.more);
    await page.getByRole('link', { name: uiCases.frame.history }).click();
    await page.getByRole('heading', { name: uiCases.history.compare(one.revision, one.revision + 1) }).waitFor();
    const main = page.getByRole('main');
    await main.getByText('Cinnamate 4b', { exact: true }).waitFor();
    await page.goto(`/cases/${one.id}/history?from=1&to=${one.revision}`);
    await page.getByRole('heading', { name: uiCases.history.compare(1, one.revision) }).waitFor();
    await main.getByText(/15\.90/).first().waitFor();
    expect(await main.innerText()).not.toContain('Cinnamate 4b');
  });
});

it('keeps a quick look as a case after signing in, with nothing typed again', async () => {
  const { people: { author } } = await makeScene({ author: 'chemist' });
  await visit(browser, { viewport: PHONE }, async ({ page, context }) => {
    await page.goto('/');
    await page.getByRole('radio', { name: quickText.bonds.double }).click();
    await page.getByRole('textbox', { name: quickText.measuredSpoken }).fill('15,7');
    await page.getByRole('textbox', { name: quickText.errorSpoken }).fill('0.3');
    await page.getByRole('region', { name: uiText.calculatedAnswer }).getByRole('heading').filter({ hasText: '15.7' }).waitFor();
    await press(page, quickText.keep);
    await page.getByText(uiAccount.signIn.kept).waitFor();
    await page.getByRole('textbox', { name: uiAccount.email }).fill(author.email);
    await page.getByRole('textbox', { name: uiAccount.password, exact: true }).fill(author.password);
    await page.keyboard.press('Enter');
    await until(() => page.getByRole('textbox', { name: quickText.measuredSpoken }).inputValue(), (value) => value === '15,7', 'the reading typed before');
    await page.getByRole('region', { name: uiText.calculatedAnswer }).getByRole('heading').filter({ hasText: '15.7' }).waitFor();
    await press(page, quickText.keep);
    await page.waitForURL(/\/cases\/[0-9a-f-]{36}/);
    await page.getByRole('table', { name: parts.readings.title }).waitFor();
    const { content, trail } = ok(await callerOf(context).get<CaseResponse>(`/api/cases/${caseIdOf(page)}`));
    expect(content.readings.map(({ j, se, path }) => [j, se, path])).toEqual([['15,7', '0.3', '3J']]);
    expect(content.calculations.map(({ bond }) => bond)).toEqual(['double']);
    expect(trail.calculations[0]?.result).toMatchObject({ state: 'answered', reading: { jHz: 15.7, seHz: 0.3 } });
  });
});
