import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';

import type { Browser } from 'playwright-core';

import { startProduct } from '../lib/productServer';
import { openBrowser, totalBytes, visit } from './browser';
import { buildEmptyPage } from './emptyPage';
import { atMost, type Figure, rounded, tell } from './figure';
import { openQuickLook, typeReading, visitEveryPart } from './quickLookPage';
import { serveFolder } from './staticServer';

/** Compressed JavaScript up to the first painted answer, against an empty page of the same framework; and all that the screen ever loads. */
export async function firstLoad(): Promise<Figure[]> {
  const folder = await mkdtemp(path.join(tmpdir(), 'throughbond-empty-'));
  const browser = await openBrowser();
  try {
    tell('first load: building an empty page to compare with');
    const empty = await emptyBytes(browser, await buildEmptyPage(folder));
    tell('first load: opening the quick look');
    const { first, all, chunks } = await productBytes(browser);
    const ratio = first / empty;
    const kb = all / 1000;
    return [
      { name: 'first-load-js-ratio', value: rounded(ratio), unit: 'of an empty Expo Router page', runs: 1, ...atMost(1.25, ratio), bytes: first, emptyBytes: empty },
      { name: 'quick-look-js-kb', value: rounded(kb), unit: 'kB brotli', runs: 1, ...atMost(450, kb), chunks },
    ];
  } finally {
    await browser.close();
    await rm(folder, { recursive: true, force: true });
  }
}

async function emptyBytes(browser: Browser, dist: string): Promise<number> {
  const server = await serveFolder(dist);
  const { context, page, scripts } = await visit(browser);
  try {
    await page.goto(server.url);
    await page.getByText('Empty').waitFor();
    await page.waitForLoadState('networkidle');
    return totalBytes(scripts);
  } finally {
    await context.close();
    server.close();
  }
}

async function productBytes(browser: Browser): Promise<{ first: number; all: number; chunks: number }> {
  const server = await startProduct();
  const { context, page, scripts } = await visit(browser);
  try {
    await openQuickLook(page, server.url);
    await typeReading(page, '9.6');
    const first = totalBytes(scripts);
    await visitEveryPart(page);
    await page.waitForLoadState('networkidle');
    return { first, all: totalBytes(scripts), chunks: scripts.size };
  } finally {
    await context.close();
    await server.stop();
  }
}
