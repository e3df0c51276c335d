import type { Browser, Page } from 'playwright-core';
import { quickText } from '@/shared/text/quick';
import { uiText } from '@/shared/text/ui';
import { GRADE_WORDS } from '@/shared/format/words';
import { openBrowser, PHONE, until, visit, WIDE, WIDTHS } from '../helpers/browser';

let browser: Browser;
beforeAll(async () => { browser = await openBrowser(); });
afterAll(() => browser.close());

/** The parts of the screen by the names a screen reader hears. */
const parts = (page: Page) => {
  const answer = page.getByRole('region', { name: uiText.calculatedAnswer });
  return {
    answer,
    headline: answer.getByRole('heading'),
    j: page.getByRole('textbox', { name: quickText.measuredSpoken }),
    error: page.getByRole('textbox', { name: quickText.errorSpoken }),
    marker: page.getByRole('slider'),
    curve: page.getByRole('img', { name: /^Curve of J/ }),
    ladder: page.getByRole('img', { name: /^Ladder of/ }),
  };
};
const press = (page: Page, name: string | RegExp) => page.getByRole('button', { name, exact: typeof name === 'string' }).click();
/** The dot on the curve that stands at the dial's angle. */
const dotAt = (page: Page) => parts(page).curve.locator('circle[r="6"]').evaluate((dot) => [dot.getAttribute('cx'), dot.getAttribute('cy')].map(Number));

describe.each(WIDTHS)('a newcomer with one J on a %s', (_name, viewport) => {
  it('reads angles of a single bond, turns the dial, and finds the same numbers in the table', async () => {
    await visit(browser, { viewport }, async ({ page }) => {
      await page.goto('/');
      const { j, answer, headline, marker, curve } = parts(page);
      await headline.filter({ hasText: 'to begin' }).waitFor();
      expect(await j.evaluate((field) => field === document.activeElement)).toBe(true);
      await page.keyboard.type('8.9');
      await headline.filter({ hasText: '8.9' }).waitFor();
      expect(await answer.innerText()).toContain(GRADE_WORDS['not-decided']); // 8.9 Hz without groups fits nearly every angle

      await press(page, /^Groups/);
      const sheet = page.getByRole('dialog', { name: quickText.groupsTitle });
      expect(await sheet.getByRole('button', { name: quickText.useGroups }).isDisabled()).toBe(true);
      for (const group of ['aryl', 'OR, OC(O)R', 'OH', 'CH₂R']) await sheet.getByRole('group').getByRole('button', { name: group, exact: true }).click();
      await sheet.getByRole('button', { name: quickText.useGroups }).click();
      await press(page, /^This bond/);
      await page.getByRole('dialog').getByRole('radio', { name: quickText.turnings.ring }).click();
      await answer.getByText(GRADE_WORDS.tentative, { exact: true }).waitFor(); // one J alone is tentative at most
      await page.getByRole('button', { name: /Haasnoot, de Leeuw, Altona 1980/ }).waitFor();

      const roots = page.getByRole('group', { name: quickText.rootsLabel }).getByRole('button');
      await until(() => roots.count(), (count) => count === 2, 'two roots');
      const [first = '', last = ''] = await roots.allInnerTexts();
      await until(() => curve.getAttribute('aria-label').then((label) => label ?? ''), (label) => label.includes(`Roots: ${first}`) && label.includes(last) && /Allowed: .+°/.test(label), 'roots and arcs in the name of the curve');

      expect(await roots.nth(1).getAttribute('aria-pressed')).toBe('true');
      const before = await dotAt(page);
      const angle = Number(await marker.getAttribute('aria-valuenow'));
      await marker.focus();
      for (let step = 0; step < 3; step += 1) await page.keyboard.press('ArrowRight');
      expect(Number(await marker.getAttribute('aria-valuenow'))).toBe(angle + 3);
      expect(await marker.getAttribute('aria-valuetext')).toMatch(/Newman projection, dihedral angle .+; this relation gives \d+\.\d/);
      const after = await dotAt(page);
      expect(after[0]).toBeGreaterThan(before[0]!);
      expect(after[1]).not.toBeCloseTo(before[1]!, 1);
      await roots.first().click();
      expect(Number(await marker.getAttribute('aria-valuenow'))).toBe(Number(first.replace('−', '-').replace('°', '')));
      expect(await dotAt(page)).not.toEqual(after);

      await press(page, quickText.curveTable);
      const table = page.getByRole('table', { name: quickText.tableRoots });
      expect((await table.getByRole('rowheader').allInnerTexts()).map((cell) => Math.round(Number(cell.replace('−', '-').replace('°', ''))))).toEqual([first, last].map((cell) => Number(cell.replace('−', '-').replace('°', ''))));
      await page.getByText(quickText.wouldDecide, { exact: true }).waitFor();
      await page.getByText(quickText.cannotTell, { exact: true }).waitFor();
    });
  });

  it('decides a double bond where the published classes do, and leaves it open where they do not', async () => {
    await visit(browser, { viewport }, async ({ page }) => {
      await page.goto('/');
      const { j, answer, headline, ladder } = parts(page);
      await page.getByRole('radio', { name: quickText.bonds.double }).click();
      const pick = async (label: string, group: string) => {
        await press(page, new RegExp(`^${label}`));
        await page.getByRole('dialog', { name: label }).getByRole('button', { name: group, exact: true }).click();
      };
      await j.fill('12.4');
      await pick(quickText.slots.leftUpper, 'OR, OC(O)R');
      await pick(quickText.slots.rightUpper, 'CH₂R');
      await headline.filter({ hasText: /12\.4.*between the cis and the trans values known with one oxygen/ }).waitFor();
      expect(await answer.innerText()).toContain(GRADE_WORDS['not-decided']);
      expect(await answer.innerText()).not.toMatch(/\d in 100|\d %/); // no odds beside an answer that is open
      await page.getByText('The other isomer’s J', { exact: true }).waitFor();

      await pick(quickText.slots.leftUpper, 'aryl');
      await pick(quickText.slots.rightUpper, 'CO₂R');
      await j.fill('16.0');
      await headline.filter({ hasText: /^Trans \(E\): 16\.0/ }).waitFor();
      expect(await answer.innerText()).toContain(GRADE_WORDS.assigned);
      await until(() => ladder.getAttribute('aria-label').then((label) => label ?? ''), (label) => /cis .+trans .+Measured 16\.0/.test(label), 'the ladder with the reading');
      await press(page, quickText.ladderTable);
      await page.getByRole('table').getByRole('row').nth(2).waitFor();
    });
  });

  it('gets a mistyped value mended in place, and loses nothing of it', async () => {
    await visit(browser, { viewport }, async ({ page, expectRefusal }) => {
      expectRefusal(/^422 POST \/api\/quick-look$/);
      await page.goto('/');
      const { j, error, headline, answer } = parts(page);
      const strip = (text: string | RegExp) => headline.filter({ hasText: text }).waitFor();

      await j.fill('9,6');
      await page.getByText('Decimal comma: 9,6 is read as 9.6').waitFor();
      await strip('9.6');

      await j.fill('0.02');
      await strip(quickText.refused);
      await page.getByText(/was it read in ppm/).first().waitFor();
      expect(await j.getAttribute('aria-invalid')).toBe('true');
      await page.getByRole('textbox', { name: quickText.field.replaceAll('_', '') }).fill('400'); // the field unfolds by itself
      await press(page, /^Use 8\.0/);
      expect(await j.inputValue()).toBe('8.0'); // 0.02 ppm x 400 MHz
      await strip('8.0');

      await error.fill('0');
      await page.getByText(/± 0 is no error/).waitFor();
      expect(await error.inputValue()).toBe('0');
      await press(page, /^Use 0\.2/);
      await strip('8.0');

      await j.fill('nine');
      await page.getByText(/“nine” in J is not a number/).waitFor();
      expect(await j.inputValue()).toBe('nine');
      await j.fill('ca. 7');
      await page.getByText(/Read as 7 ± 1\.0.*typed as about/).waitFor();
      await j.fill('');
      await strip('to begin');
      expect(await answer.innerText()).not.toMatch(/NaN|undefined/);
    });
  });
});

it('says that no angle gives a J which is too large, and what to check', async () => {
  await visit(browser, { viewport: PHONE }, async ({ page }) => {
    await page.goto(`/?j=15.5&front=${encodeURIComponent('C(=C,C)~O(C)')}&rear=${encodeURIComponent('O(H)~C(C,H,H)')}`);
    const { headline, answer, curve } = parts(page);
    await headline.filter({ hasText: 'No angle gives 15.5' }).waitFor();
    expect(await answer.innerText()).toMatch(/reaches from .+ to .+\sHz/);
    await page.getByText(quickText.checkFirst, { exact: true }).waitFor();
    await until(() => curve.getAttribute('aria-label').then((label) => label ?? ''), (label) => label.includes(`Roots: ${quickText.noneWord}`), 'a curve without a root');
    expect(await page.getByRole('group', { name: quickText.rootsLabel }).count()).toBe(0);
  });
});

it('asks for the groups when the chosen relation needs all of them, and opens them from the question', async () => {
  await visit(browser, { viewport: WIDE }, async ({ page }) => {
    await page.goto('/?j=8.9');
    const { headline, answer } = parts(page);
    await headline.filter({ hasText: '8.9' }).waitFor();
    await press(page, /chosen by the groups/);
    const relations = page.getByRole('dialog', { name: quickText.relationTitle });
    expect(await relations.getByRole('radio', { name: /Haasnoot/ }).isDisabled()).toBe(true); // and says why
    expect(await relations.getByRole('radio', { name: /Haasnoot/ }).innerText()).toContain('Groups not given');
    await page.keyboard.press('Escape');
    await page.goto('/?j=8.9&relation=vicinal-hh%2Fgeneralised-1980');
    await headline.filter({ hasText: /Which groups sit on the two carbons/ }).waitFor();
    await answer.getByRole('button', { name: quickText.groupsTitle }).click();
    const sheet = page.getByRole('dialog', { name: quickText.groupsTitle });
    for (let slot = 0; slot < 4; slot += 1) await sheet.getByRole('group').getByRole('button', { name: slot % 2 === 0 ? 'H' : 'CH₃', exact: true }).click();
    await sheet.getByRole('button', { name: quickText.useGroups }).click();
    await page.getByRole('group', { name: quickText.rootsLabel }).getByRole('button').first().waitFor();
  });
});

it('keeps the inputs in the address, over a reload and a look at another place', async () => {
  await visit(browser, { viewport: WIDE }, async ({ page }) => {
    await page.goto('/');
    const { j, error, headline } = parts(page);
    await page.getByRole('radio', { name: quickText.bonds.double }).click();
    await j.fill('16.0');
    await error.fill('0.3');
    await until(async () => page.url(), (url) => url.endsWith('/?bond=double&j=16.0&se=0.3'), 'the inputs in the address');
    await page.reload();
    await headline.filter({ hasText: '16.0' }).waitFor();
    expect([await j.inputValue(), await error.inputValue()]).toEqual(['16.0', '0.3']);
    expect(await page.getByRole('radio', { name: quickText.bonds.double }).getAttribute('aria-checked')).toBe('true');
    await page.getByRole('link', { name: uiText.places.relations }).click();
    await page.getByRole('heading', { level: 1, name: uiText.places.relations }).waitFor();
    await page.getByRole('link', { name: uiText.places.quick }).click();
    await until(() => j.inputValue(), (value) => value === '16.0', 'the reading typed before');
  });
});

it('copies the answer as text with its limits, and a link to the same inputs', async () => {
  await visit(browser, { viewport: PHONE, permissions: ['clipboard-read', 'clipboard-write'] }, async ({ page }) => {
    await page.goto('/?bond=double&j=16.0&left=C(%3DC%2CC)~H&right=C(%3DO%2CO)~H');
    await parts(page).headline.filter({ hasText: '16.0' }).waitFor();
    await press(page, quickText.copyText);
    const copied = await until(() => page.evaluate(() => navigator.clipboard.readText()), (text) => text !== '', 'text on the clipboard');
    expect(copied).toContain('³J(H,H) = 16.0 ± 0.2\u00A0Hz');
    expect(copied).toMatch(new RegExp(`^${GRADE_WORDS.assigned}: Trans \\(E\\)`, 'm'));
    for (const title of [quickText.cannotTell, quickText.wouldDecide, quickText.copyRelation]) expect(copied).toContain(title);
    expect(copied).not.toMatch(/_|NaN|undefined/);
    await press(page, quickText.copyLink);
    const link = await until(() => page.evaluate(() => navigator.clipboard.readText()), (text) => text.startsWith('http'), 'a link on the clipboard');
    await page.goto(link);
    await parts(page).headline.filter({ hasText: /^Trans \(E\): 16\.0/ }).waitFor();
  });
});

it('shows the answer to the last key press, whatever comes back in between', async () => {
  await visit(browser, { viewport: WIDE }, async ({ page }) => {
    // the first question is answered late, after the second one
    let held = 0;
    await page.route('**/api/quick-look', async (route) => {
      held += 1;
      if (held === 1) await new Promise((resolve) => setTimeout(resolve, 1500));
      await route.continue().catch(() => undefined); // given up meanwhile
    });
    await page.goto('/?bond=double');
    const { j, headline } = parts(page);
    await j.fill('5.1');
    await until(async () => held, (count) => count === 1, 'the first question');
    await j.fill('16.2');
    await headline.filter({ hasText: '16.2' }).waitFor();
    await new Promise((resolve) => setTimeout(resolve, 1600));
    expect(await headline.innerText()).toContain('16.2');
  });
});

it('says in place that the server is away, and answers by itself when it is back', async () => {
  await visit(browser, { viewport: PHONE }, async ({ page, context, expectNoNetwork }) => {
    await page.goto('/?j=9.6');
    const { j, headline, answer } = parts(page);
    await headline.filter({ hasText: '9.6' }).waitFor();
    expectNoNetwork();
    await context.setOffline(true);
    await j.fill('4.2');
    await page.getByText(/No connection since/).waitFor();
    expect(await j.inputValue()).toBe('4.2');
    expect(await answer.innerText()).not.toContain('4.2\u00A0Hz leaves');
    await context.setOffline(false);
    await headline.filter({ hasText: '4.2' }).waitFor();
    await page.getByText(/No connection since/).waitFor({ state: 'detached' });
  });
});
