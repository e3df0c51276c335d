import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import path from 'node:path';
import { chromium, type Browser, type BrowserContext, type BrowserContextOptions, type Page } from 'playwright-core';

/** The two widths that every screen is tested at. */
export const PHONE = { width: 390, height: 844 } as const;
export const WIDE = { width: 1280, height: 900 } as const;

interface Product {
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

/** What went wrong on a page, seen from outside; an end-to-end test expects each list to be empty. */
export interface Findings {
  /** console errors and uncaught exceptions, refusals by the content security policy among them */
  errors: string[];
  /** requests to anything but the product's own address */
  elsewhere: string[];
  /** answers with a status from 500 */
  serverErrors: string[];
}

export interface OpenPage {
  context: BrowserContext;
  page: Page;
  findings: Findings;
  close: () => Promise<void>;
}

/** A page in a profile of its own (own cookies and storage), watched from its first request. */
export async function openPage(browser: Browser, options: BrowserContextOptions = {}): Promise<OpenPage> {
  const { address } = product();
  const context = await browser.newContext({ baseURL: address, viewport: WIDE, locale: 'en-GB', timezoneId: 'Europe/Berlin', reducedMotion: 'reduce', ...options });
  const findings: Findings = { errors: [], elsewhere: [], serverErrors: [] };
  const page = await context.newPage();
  page.on('console', (message) => {
    if (message.type() === 'error') findings.errors.push(message.text());
  });
  page.on('pageerror', (error) => findings.errors.push(String(error)));
  page.on('request', (request) => {
    if (!request.url().startsWith(address) && !/^(data|blob):/.test(request.url())) findings.elsewhere.push(request.url());
  });
  page.on('response', (response) => {
    if (response.status() >= 500) findings.serverErrors.push(`${response.status()} ${response.url()}`);
  });
  return { context, page, findings, close: () => context.close() };
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
  await page.evaluate(readFileSync(axeFile, 'utf8'));
  const { violations } = await page.evaluate<AxeResult>('axe.run(document, { resultTypes: ["violations"] })');
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .map(({ id, impact, help, nodes }) => ({ rule: id, impact: impact ?? '', what: help, where: nodes.slice(0, 5).map(({ target, html }) => `${target.join(' ')}: ${html.slice(0, 160)}`) }));
}
