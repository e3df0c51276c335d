import type { Browser, BrowserContext, CDPSession, Page } from 'playwright-core';

const ARGS = ['--no-sandbox', '--disable-dev-shm-usage', '--disable-gpu', '--disable-background-networking', '--disable-component-update', '--disable-sync', '--disable-quic', '--no-first-run'];

/** a busy machine takes its time; what is measured is measured elsewhere */
const PATIENCE_MS = 120_000;

export async function openBrowser(): Promise<Browser> {
  const { chromium } = await import('playwright-core');
  return chromium.launch({ executablePath: '/usr/bin/chromium', args: ARGS });
}

export interface Visit {
  context: BrowserContext;
  page: Page;
  cdp: CDPSession;
  /** body bytes of every script as they came over the wire, by address */
  scripts: Map<string, number>;
}

/** A page with an empty cache that counts the compressed bytes of each script it loads. */
export async function visit(browser: Browser, viewport = { width: 390, height: 844 }): Promise<Visit> {
  const context = await browser.newContext({ viewport, locale: 'en-GB', reducedMotion: 'reduce' });
  const page = await context.newPage();
  page.setDefaultTimeout(PATIENCE_MS);
  const cdp = await context.newCDPSession(page);
  await cdp.send('Network.enable');
  const scripts = new Map<string, number>();
  const urls = new Map<string, string>();
  cdp.on('Network.responseReceived', ({ requestId, type, response }) => {
    if (type === 'Script') urls.set(requestId, response.url);
  });
  // only the body counts here: headers differ between the two servers
  cdp.on('Network.dataReceived', ({ requestId, encodedDataLength }) => {
    const url = urls.get(requestId);
    if (url !== undefined) scripts.set(url, (scripts.get(url) ?? 0) + encodedDataLength);
  });
  return { context, page, cdp, scripts };
}

export const totalBytes = (scripts: ReadonlyMap<string, number>): number => [...scripts.values()].reduce((sum, bytes) => sum + bytes, 0);
