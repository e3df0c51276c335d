import type { Page } from 'playwright-core';

import { GRADE_WORDS } from '@/shared/format/words';
import { quickText } from '@/shared/text/quick';
import { uiText } from '@/shared/text/ui';

/** How the bench drives the quick look: by the words and roles that a person or a screen reader meets. */
const STRIP = `[role="region"][aria-label="${uiText.calculatedAnswer}"]`;
const GRADES = Object.values(GRADE_WORDS);

/** The beginning of a label that is made from values. */
const startOf = (label: string): string => label.slice(0, label.indexOf('§'));
const DIAL = `[role="slider"][aria-label="${quickText.dialTurn.replaceAll('_', '')}"]`;
const CURVE = `[aria-label^="${startOf(quickText.curveLabel('§', ''))}"]`;

export const readingField = (page: Page) => page.getByLabel(quickText.measuredSpoken);

export async function openQuickLook(page: Page, url: string): Promise<void> {
  await page.goto(url);
  await readingField(page).waitFor();
}

/** Types a coupling and waits until its answer is painted. */
export async function typeReading(page: Page, value: string): Promise<void> {
  const watch = watchAnswer(page, value);
  await readingField(page).fill('');
  await readingField(page).pressSequentially(value);
  await watch;
}

/** Milliseconds from the last key press to the frame after the answer strip shows this value, not stale, with a grade. */
export async function typedToPainted(page: Page, value: string): Promise<number> {
  const watch = watchAnswer(page, value);
  await readingField(page).fill('');
  await readingField(page).pressSequentially(value);
  return watch;
}

/** The same to the frame in which both dial and curve stand. */
export async function typedToPlotted(page: Page, value: string): Promise<number> {
  const watch = page.evaluate(measure, { selectors: [DIAL, CURVE], words: [], value: '' });
  await readingField(page).pressSequentially(value);
  return watch;
}

const watchAnswer = (page: Page, value: string): Promise<number> => page.evaluate(measure, { selectors: [`${STRIP}:not([aria-busy="true"])`], words: GRADES, value: `${value}\u00a0Hz` });

/** Runs in the page: waits until every selector is there (the first with one of the words and the value in it) and that frame is painted. */
function measure({ selectors, words, value }: { selectors: string[]; words: string[]; value: string }): Promise<number> {
  return new Promise((resolve, reject) => {
    let lastKeyMs = Number.NaN;
    const onKey = (): void => {
      lastKeyMs = performance.now();
    };
    document.addEventListener('keydown', onKey, true);
    const isThere = (): boolean => selectors.every((selector, index) => {
      const text = document.querySelector(selector)?.textContent;
      return text !== undefined && text !== null && (index > 0 || words.length === 0 || (words.some((word) => text.includes(word)) && text.includes(value)));
    });
    const late = setTimeout(() => reject(new Error(`Not painted within 30 s: ${selectors.join(', ')} ${value}`)), 30_000);
    const check = (): void => {
      if (Number.isNaN(lastKeyMs) || !isThere()) return;
      observer.disconnect();
      clearTimeout(late);
      document.removeEventListener('keydown', onKey, true);
      // a message after the next frame arrives once that frame has been painted
      requestAnimationFrame(() => {
        const channel = new MessageChannel();
        channel.port1.onmessage = () => resolve(performance.now() - lastKeyMs);
        channel.port2.postMessage(null);
      });
    };
    const observer = new MutationObserver(check);
    observer.observe(document.body, { subtree: true, childList: true, characterData: true, attributes: true });
  });
}

/** Goes through all that the screen offers, so that whatever it loads late is loaded. */
export async function visitEveryPart(page: Page): Promise<void> {
  await page.locator(DIAL).first().waitFor();
  await page.locator(CURVE).first().waitFor();
  await openAndClose(page, quickText.groups);
  await openAndClose(page, quickText.relationBy);
  await page.getByRole('radio', { name: quickText.bonds.double }).click();
  await typeReading(page, '15.8');
  await page.locator(`[aria-label^="${startOf(quickText.ladderLabel('§', ''))}"]`).first().waitFor();
  await page.getByRole('button', { name: quickText.smiles }).click();
  await page.getByRole('textbox', { name: quickText.smilesLabel }).fill('CC=CC(=O)OC');
  await page.getByRole('button', { name: quickText.smilesRead }).click();
  await page.waitForLoadState('networkidle');
  await page.keyboard.press('Escape');
  await page.getByRole('radio', { name: quickText.bonds.single }).click();
}

async function openAndClose(page: Page, label: string): Promise<void> {
  await page.getByRole('button', { name: label }).first().click();
  await page.getByRole('dialog').waitFor();
  await page.keyboard.press('Escape');
  await page.getByRole('dialog').waitFor({ state: 'hidden' });
}
