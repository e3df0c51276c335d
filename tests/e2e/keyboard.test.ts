import type { Browser, Page } from 'playwright-core';
import { quickText } from '@/shared/text/quick';
import { uiReviews } from '@/shared/text/uiReviews';
import { uiText } from '@/shared/text/ui';
import { openBrowser, PHONE, until, visit, WIDE } from '../helpers/browser';
import { checkAll, claim, draft, submit } from '../helpers/caseWork';
import { makeScene, openAs, visitAs } from '../helpers/people';
import { PASSWORD } from '../helpers/password';

let browser: Browser;
beforeAll(async () => { browser = await openBrowser(); });
afterAll(() => browser.close());

interface Stop { name: string; role: string; isMarked: boolean; isSeen: boolean; isInDialog: boolean }

/** Where the keyboard is: its spoken name, whether the focus can be seen, and whether anything covers it. */
const focused = (page: Page): Promise<Stop | null> => page.evaluate(() => {
  const node = document.activeElement as HTMLElement | null;
  if (!node || node === document.body) return null;
  const drawn = (one: Element | null) => {
    if (!one) return false;
    const { outlineStyle, outlineWidth, boxShadow } = getComputedStyle(one);
    return (outlineStyle !== 'none' && parseFloat(outlineWidth) >= 1) || boxShadow !== 'none';
  };
  const box = node.getBoundingClientRect();
  const [x, y] = [box.left + box.width / 2, box.top + Math.min(box.height / 2, 24)];
  const top = document.elementFromPoint(Math.min(Math.max(x, 1), innerWidth - 1), Math.min(Math.max(y, 1), innerHeight - 1));
  const labelled = (node.getAttribute('aria-labelledby') ?? '').split(' ').map((id) => document.getElementById(id)?.textContent ?? '').join(' ').trim();
  return {
    name: (node.getAttribute('aria-label') ?? (labelled || node.innerText || node.textContent) ?? '').replace(/\s+/g, ' ').trim().slice(0, 60),
    role: node.getAttribute('role') ?? node.tagName.toLowerCase(),
    // a field draws the mark on the box around it
    isMarked: drawn(node) || (/^(input|textarea)$/i.test(node.tagName) && drawn(node.parentElement)),
    isSeen: x >= 0 && x <= innerWidth && y >= 0 && y <= innerHeight && (top === node || node.contains(top) || (top?.contains(node) ?? false)),
    isInDialog: node.closest('[role="dialog"]') !== null,
  };
});

/** Goes on with Tab until the stop fits; every stop on the way is marked and in sight. */
async function tabTo(page: Page, fits: (stop: Stop) => boolean, what: string, key = 'Tab'): Promise<Stop[]> {
  const stops: Stop[] = [];
  for (let count = 0; count < 70; count += 1) {
    await page.keyboard.press(key);
    // the page may scroll or unfold what has the keyboard: that takes a moment, and then it must be seen
    const stop = await until(() => focused(page), (now) => now === null || (now.isMarked && now.isSeen), 'a stop of the keyboard in sight', 3_000);
    if (!stop) continue;
    stops.push(stop);
    if (fits(stop)) return stops;
  }
  throw new Error(`${what} is not reached by ${key}: ${stops.map(({ name }) => name).join(' | ')}`);
}
const called = (name: string) => (stop: Stop) => stop.name.startsWith(name);

it.each([['phone', PHONE], ['wide screen', WIDE]] as const)('a quick look goes by keyboard alone on a %s', async (_name, viewport) => {
  await visit(browser, { viewport }, async ({ page }) => {
    await page.goto('/relations');
    await page.getByRole('heading', { level: 1 }).waitFor();
    await page.goto('/');
    await page.getByRole('textbox', { name: quickText.measuredSpoken }).waitFor();
    await page.evaluate(() => { // the cursor stands in J at first; Tab begins at the top of the page again
      document.body.tabIndex = -1;
      document.body.focus();
      document.body.removeAttribute('tabindex');
    });

    // from the top: the way past the rail, then the kind of bond by arrow keys
    const [first] = await tabTo(page, called(uiText.skipToContent), 'the link past the rail');
    expect(first?.name).toBe(uiText.skipToContent); // before anything else
    await page.keyboard.press('Enter');
    expect(await page.evaluate(() => document.activeElement?.id)).toBe('main');
    await tabTo(page, (stop) => stop.role === 'radio', 'the kind of bond');
    await page.keyboard.press('ArrowRight');
    expect(await page.getByRole('radio', { name: quickText.bonds.double }).getAttribute('aria-checked')).toBe('true');
    await page.keyboard.press('ArrowLeft');
    await tabTo(page, called(quickText.measuredSpoken), 'J');
    await page.keyboard.type('10.8');
    await tabTo(page, called(quickText.groups), 'the groups');
    await page.keyboard.press('Enter');
    const sheet = page.getByRole('dialog', { name: quickText.groupsTitle });
    await sheet.waitFor();
    await until(() => focused(page), (stop) => stop?.isInDialog === true, 'the keyboard inside the sheet');
    for (const group of ['aryl', 'OR, OC(O)R', 'OH', 'CH₂R']) {
      await tabTo(page, (stop) => stop.name === group && stop.role === 'button', group);
      await page.keyboard.press('Enter');
    }
    const inside = await tabTo(page, called(quickText.useGroups), 'the end of the sheet');
    expect(inside.every((stop) => stop.isInDialog)).toBe(true);
    await page.keyboard.press('Enter');
    await sheet.waitFor({ state: 'detached' });
    expect((await focused(page))?.name).toContain(quickText.groups); // back where it was opened
    await page.getByRole('slider').waitFor();
    await tabTo(page, (stop) => stop.role === 'slider', 'the dial');
    const angle = Number(await page.getByRole('slider').getAttribute('aria-valuenow'));
    await page.keyboard.press('PageDown');
    expect(Number(await page.getByRole('slider').getAttribute('aria-valuenow'))).not.toBe(angle);
    await tabTo(page, called(quickText.curveTable.replaceAll('_', '')), 'the table of the curve');
    await page.keyboard.press('Enter');
    await page.getByRole('table', { name: quickText.tableCurve }).waitFor();
    await tabTo(page, called(quickText.keep), 'keeping it as a case', viewport === PHONE ? 'Tab' : 'Shift+Tab');
  });
});

it('signs by keyboard alone; the sheet holds the keyboard, Escape gives it back', async () => {
  const { projectId, people: { author, reviewer } } = await makeScene({ author: 'chemist', reviewer: 'reviewer' });
  const writing = await openAs(browser, author);
  await visitAs(browser, reviewer, { viewport: WIDE }, async ({ page, caller }) => {
    const sent = await submit(writing.caller, await draft(writing.caller, projectId));
    await claim(caller, sent.id);
    await checkAll(caller, sent);
    await page.goto(`/cases/${sent.id}`);
    const sign = page.getByRole('button', { name: uiReviews.column.sign, exact: true });
    await sign.focus();
    await page.keyboard.press('Enter');
    const sheet = page.getByRole('dialog', { name: uiReviews.signing.title(sent.revision) });
    await sheet.waitFor();
    // round and round: never outside
    const names = new Set<string>();
    for (let count = 0; count < 12; count += 1) {
      await page.keyboard.press('Tab');
      const stop = await until(() => focused(page), (now) => now?.isInDialog === true && now.isMarked && now.isSeen, 'the keyboard in the sheet, in sight', 3_000);
      names.add(stop!.name);
    }
    expect([...names].some((name) => name.startsWith(uiReviews.signing.act(reviewer.name)))).toBe(true);
    await page.keyboard.press('Escape');
    await sheet.waitFor({ state: 'detached' });
    expect((await focused(page))?.name).toBe(uiReviews.column.sign);
    await page.keyboard.press('Enter');
    await tabTo(page, (stop) => stop.name.startsWith('Password of') && stop.role === 'input', 'the password');
    await page.keyboard.type(PASSWORD);
    await page.keyboard.press('Enter');
    await sheet.waitFor({ state: 'detached' });
    await page.getByText(/^Review: /).first().waitFor();
  });
  await writing.close();
});

it('moves nothing by itself where less motion is wished, and turns the dial smoothly where it is not', async () => {
  const path = '/?j=8.9&front=C(%3DC%2CC)~O(C)&rear=O(H)~C(C%2CH%2CH)&turning=ring';
  const moving = (page: Page) => page.evaluate(() => document.getAnimations().filter((each) => each.playState === 'running' && Number(each.effect?.getComputedTiming().duration ?? 0) > 1).length);
  const turn = async (page: Page): Promise<Set<number>> => {
    await page.goto(path);
    await page.getByRole('group', { name: quickText.rootsLabel }).getByRole('button').first().waitFor();
    return page.evaluate(async (label) => {
      const slider = document.querySelector('[role="slider"]')!;
      const seen = new Set<string>();
      const watch = new MutationObserver(() => seen.add(slider.getAttribute('aria-valuenow') ?? ''));
      watch.observe(slider, { attributes: true, attributeFilter: ['aria-valuenow'] });
      document.querySelector<HTMLElement>(`[role="group"][aria-label="${label}"] [role="button"], [role="group"][aria-label="${label}"] button`)!.click();
      await new Promise((resolve) => setTimeout(resolve, 900));
      return [...seen].map(Number);
    }, quickText.rootsLabel).then((values) => new Set(values));
  };
  await visit(browser, { viewport: PHONE, reducedMotion: 'reduce' }, async ({ page }) => {
    expect((await turn(page)).size).toBe(1);
    expect(await moving(page)).toBe(0);
    for (const place of ['/cases', '/sign-in', '/help']) {
      await page.goto(place);
      await page.getByRole('heading', { level: 1 }).waitFor();
      expect(await moving(page)).toBe(0);
    }
  });
  await visit(browser, { viewport: PHONE, reducedMotion: 'no-preference' }, async ({ page }) => {
    expect((await turn(page)).size).toBeGreaterThan(1);
  });
});
