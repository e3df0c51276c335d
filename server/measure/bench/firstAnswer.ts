import type { Browser } from 'playwright-core';

import { startProduct } from '../lib/productServer';
import { openBrowser, visit } from './browser';
import { atMost, type Figure, median, rounded, tell } from './figure';
import { openQuickLook, typedToPainted, typedToPlotted } from './quickLookPage';

const THROTTLING = 4;
/** different values, so that nothing on screen can be the answer to the one before */
const VALUES = ['9.6', '3.4', '11.2', '2.7', '8.9', '4.4', '10.3', '3.9', '12.1', '9.1', '2.2'];
const COLD_RUNS = 5;

/** From the last key press to the painted answer strip and to the drawn plots, on a processor slowed four times. */
export async function firstAnswer(): Promise<Figure[]> {
  const server = await startProduct();
  const browser = await openBrowser();
  try {
    const cold: { answer: number; plots: number }[] = [];
    for (let round = 0; round < COLD_RUNS; round += 1) {
      tell(`first answer: cold page ${round + 1} of ${COLD_RUNS}`);
      cold.push({ answer: await onColdPage(browser, server.url, typedToPainted), plots: await onColdPage(browser, server.url, typedToPlotted) });
    }
    tell('first answer: on an open page');
    const warm = await onOpenPage(browser, server.url);
    const all = [...warm, ...cold.map(({ answer }) => answer)];
    const [answerMs, plotsMs] = [median(all), median(cold.map(({ plots }) => plots))];
    return [
      { name: 'first-answer-ms', value: rounded(answerMs), unit: 'ms', runs: all.length, ...atMost(300, answerMs), coldMs: rounded(median(cold.map(({ answer }) => answer))), openPageMs: rounded(median(warm)), throttling: THROTTLING },
      { name: 'plots-ms', value: rounded(plotsMs), unit: 'ms', runs: COLD_RUNS, ...atMost(1000, plotsMs), throttling: THROTTLING },
    ];
  } finally {
    await browser.close();
    await server.stop();
  }
}

/** A page with an empty cache, loaded and at rest as it is for whoever reads it first; the parts behind the answer still have to come over the wire. */
async function onColdPage(browser: Browser, url: string, measure: typeof typedToPainted): Promise<number> {
  const { context, page, cdp } = await visit(browser);
  try {
    await cdp.send('Emulation.setCPUThrottlingRate', { rate: THROTTLING });
    await openQuickLook(page, url);
    await page.waitForLoadState('networkidle');
    return await measure(page, '9.6');
  } finally {
    await context.close();
  }
}

async function onOpenPage(browser: Browser, url: string): Promise<number[]> {
  const { context, page, cdp } = await visit(browser);
  try {
    await openQuickLook(page, url);
    await typedToPlotted(page, '7.7');
    await cdp.send('Emulation.setCPUThrottlingRate', { rate: THROTTLING });
    const times: number[] = [];
    for (const value of VALUES) times.push(await typedToPainted(page, value));
    return times;
  } finally {
    await context.close();
  }
}
