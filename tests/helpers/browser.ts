import { mkdirSync, readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import path from 'node:path';
import { chromium, type Browser, type BrowserContext, type BrowserContextOptions, type Page } from 'playwright-core';

/** The two widths that every screen is tested at. */
export const PHONE = { width: 390, height: 844 } as const;
export const WIDE = { width: 1280, height: 900 } as const;
export const WIDTHS = [['phone', PHONE], ['wide screen', WIDE]] as const;

export interface Product {
  address: string;
  port: number;
  dataDir: string;
  appUrl: string;
  ownerUrl: string;
}

/** The built product that the set-up of the end-to-end tests started, with the demo loaded. */
export function product(): Product {
  const file = process.env.TEST_PRODUCT as string | undefined; // Metro types every variable as any
  if (!file) throw new Error('No product: run this file in the project "e2e" of jest.');
  return JSON.parse(readFileSync(file, 'utf8')) as Product;
}

// Without the last five Chromium opens connections of its own, which would blur "nothing leaves loopback".
const ARGS = ['--no-sandbox', '--disable-dev-shm-usage', '--disable-gpu', '--disable-background-networking', '--disable-component-update', '--disable-sync', '--disable-quic', '--no-first-run'];

/** Debian's Chromium, without a window. Close it in afterAll. */
export const openBrowser = (): Promise<Browser> => chromium.launch({ executablePath: '/usr/bin/chromium', args: ARGS });

/** What went wrong on the pages of a context, seen from outside; at the end of a visit each list must be empty. */
export interface Findings {
  /** console errors, uncaught exceptions, and what the content security policy refused */
  errors: string[];
  /** requests to anything but the product's own address */
  elsewhere: string[];
  /** answers with a status from 500 */
  serverErrors: string[];
  /** answers with a status from 400 that the test did not announce with `expectRefusal` */
  refused: string[];
}

export interface OpenPage {
  context: BrowserContext;
  page: Page;
  findings: Findings;
  /** announces answers such as "422 POST /api/quick-look": they belong to the test */
  expectRefusal: (...which: RegExp[]) => void;
  /** announces that requests will not get through, because the test takes the network away */
  expectNoNetwork: () => void;
  close: () => Promise<void>;
}

export type PageOptions = BrowserContextOptions & { address?: string };

/** A page in a profile of its own (own cookies and storage), watched from its first request. */
export async function openPage(browser: Browser, { address = product().address, ...options }: PageOptions = {}): Promise<OpenPage> {
  const context = await browser.newContext({ baseURL: address, viewport: WIDE, locale: 'en-GB', timezoneId: 'Europe/Berlin', reducedMotion: 'reduce', ...options });
  context.setDefaultTimeout(20_000);
  const findings: Findings = { errors: [], elsewhere: [], serverErrors: [], refused: [] };
  const expected: RegExp[] = [];
  let network = true;
  // the browser itself writes a line for each answer from 400: those answers have lists of their own
  const isOwnList = (text: string) => /^Failed to load resource: the server responded with a status of/.test(text) || (!network && /^Failed to load resource: net::ERR_INTERNET_DISCONNECTED/.test(text));
  await context.addInitScript(() => {
    document.addEventListener('securitypolicyviolation', (event) => reportError(new Error(`The policy ${event.violatedDirective} refused ${event.blockedURI}`)));
  });
  context.on('console', (message) => {
    if (message.type() === 'error' && !isOwnList(message.text())) findings.errors.push(message.text());
  });
  context.on('weberror', (error) => findings.errors.push(String(error.error())));
  context.on('request', (request) => {
    if (!request.url().startsWith(`${address}/`) && !/^(data|blob):/.test(request.url())) findings.elsewhere.push(request.url());
  });
  context.on('response', (response) => {
    const line = `${response.status()} ${response.request().method()} ${response.url().replace(address, '')}`;
    if (response.status() >= 500) findings.serverErrors.push(line);
    else if (response.status() >= 400 && !expected.some((each) => each.test(line))) findings.refused.push(line);
  });
  return {
    context, page: await context.newPage(), findings,
    expectRefusal: (...which) => { expected.push(...which); },
    expectNoNetwork: () => { network = false; },
    close: () => context.close(),
  };
}

export const CLEAN: Findings = { errors: [], elsewhere: [], serverErrors: [], refused: [] };

/** Opens a page, works with it, and fails when anything went wrong on it that the test did not announce. */
export async function visit(browser: Browser, options: PageOptions, work: (open: OpenPage) => Promise<void>): Promise<void> {
  const open = await openPage(browser, options);
  try {
    await work(open);
    expect(open.findings).toEqual(CLEAN);
  } catch (error) {
    await keepPicture(open.page);
    const found = Object.values(open.findings).flat() as string[];
    if (error instanceof Error && found.length > 0) error.message += `\nOn the page: ${found.join('; ')}`;
    throw error;
  } finally {
    await open.close();
  }
}

/** With E2E_PICTURES=folder a failed visit leaves its last picture there. */
async function keepPicture(page: Page): Promise<void> {
  const folder = process.env.E2E_PICTURES as string | undefined;
  if (!folder) return;
  mkdirSync(folder, { recursive: true });
  const name = (expect.getState().currentTestName ?? 'test').replace(/[^\w]+/g, '-').slice(0, 120);
  await page.screenshot({ path: path.join(folder, `${name}.png`) }).catch(() => undefined); // the page may be gone
}

const axeFile = path.join(path.dirname(createRequire(__filename).resolve('axe-core/package.json')), 'axe.min.js');

export interface AxeFinding {
  rule: string;
  impact: string;
  what: string;
  where: string[];
}

interface AxeResult {
  violations: { id: string; impact: string | null; help: string; nodes: { target: string[]; html: string }[] }[];
}

/**
 * Serious and critical findings of axe-core on the page as it stands. axe runs through the debugger, so the page's
 * content security policy stays as it is.
 */
export async function axeFindings(page: Page): Promise<AxeFinding[]> {
  if (await page.evaluate('typeof axe') === 'undefined') await page.evaluate(readFileSync(axeFile, 'utf8'));
  const { violations } = await page.evaluate<AxeResult>('axe.run(document, { resultTypes: ["violations"] })');
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .map(({ id, impact, help, nodes }) => ({ rule: id, impact: impact ?? '', what: help, where: nodes.slice(0, 5).map(({ target, html }) => `${target.join(' ')}: ${html.slice(0, 160)}`) }));
}

/**
 * What reaches past the left or right edge of the window. Parts that scroll sideways within their own frame (wide
 * tables) may; parts that are cut off by a frame that does not scroll may not.
 */
export const overflowing = (page: Page): Promise<string[]> => page.evaluate(() => {
  const scrolls = (node: Element) => /auto|scroll/.test(getComputedStyle(node).overflowX) && node.scrollWidth > node.clientWidth;
  const found: string[] = [];
  if (document.documentElement.scrollWidth > innerWidth) found.push(`the page is ${document.documentElement.scrollWidth} wide`);
  for (const node of document.body.querySelectorAll('*')) {
    // a drawing is cut at its own edge: of its parts only words matter
    if (node instanceof SVGElement && !/^(svg|text)$/.test(node.tagName)) continue;
    const box = node.getBoundingClientRect();
    if (box.width < 2 || box.height < 2 || box.bottom < 0 || (box.right <= innerWidth + 1 && box.left >= -1)) continue;
    let frame = node.parentElement;
    while (frame && !scrolls(frame)) frame = frame.parentElement;
    if (!frame) found.push(`${node.tagName.toLowerCase()} from ${Math.round(box.left)} to ${Math.round(box.right)}: ${(node.textContent ?? '').slice(0, 60)}`);
  }
  return found.slice(0, 5);
});

/** Waits until `read` gives something that `fits`, and returns it; the last value seen is in the error. */
export async function until<T>(read: () => Promise<T>, fits: (value: T) => boolean, what: string, withinMs = 20_000): Promise<T> {
  const end = Date.now() + withinMs;
  for (;;) {
    const value = await read();
    if (fits(value)) return value;
    if (Date.now() > end) throw new Error(`${what} did not come; last seen: ${JSON.stringify(value)?.slice(0, 600)}`);
    await new Promise((resolve) => setTimeout(resolve, 60));
  }
}
