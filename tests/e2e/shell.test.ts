import type { Browser } from 'playwright-core';
import { axeFindings, openBrowser, openPage, PHONE, product, WIDE } from '../helpers/browser';

let browser: Browser;
beforeAll(async () => { browser = await openBrowser(); });
afterAll(() => browser.close());

const clean = { errors: [], elsewhere: [], serverErrors: [] };

describe.each([['phone', PHONE], ['wide screen', WIDE]] as const)('the first page on a %s', (_name, viewport) => {
  it.each(['light', 'dark'] as const)('paints in the %s theme without an error and without a serious finding', async (colorScheme) => {
    const { page, findings, close } = await openPage(browser, { viewport, colorScheme });
    await page.goto('/');
    await page.getByRole('heading').first().waitFor();
    expect(await axeFindings(page)).toEqual([]);
    expect(findings).toEqual(clean);
    await close();
  });

  it('uses the fonts that ship and does not scroll sideways', async () => {
    const { page, findings, close } = await openPage(browser, { viewport });
    const fonts: string[] = [];
    page.on('response', (response) => { if (response.url().endsWith('.woff2')) fonts.push(`${response.status()} ${response.headers()['cache-control']}`); });
    await page.goto('/');
    await page.getByRole('heading').first().waitFor();
    const families = await page.evaluate(async () => [...await document.fonts.ready].filter((face) => face.status === 'loaded').map((face) => face.family.replaceAll('"', '')));
    expect(new Set(families)).toEqual(new Set(['Brygada 1918', 'Source Sans 3']));
    expect(new Set(fonts)).toEqual(new Set(['200 public, max-age=31536000, immutable']));
    expect(await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth)).toBeLessThanOrEqual(0);
    expect(findings).toEqual(clean);
    await close();
  });
});

it('says what is missing when scripts are off', async () => {
  const { page, close } = await openPage(browser, { javaScriptEnabled: false });
  await page.goto('/cases');
  expect(await page.locator('noscript').innerText()).toContain('switch it on for this address');
  await close();
});

it('can be put on a home screen', async () => {
  const { address } = product();
  const manifest = await (await fetch(`${address}/manifest.webmanifest`)).json() as { start_url: string; icons: { src: string; sizes: string }[] };
  expect(manifest.start_url).toBe('/');
  for (const { src } of manifest.icons) {
    const icon = await fetch(`${address}${src}`);
    expect([icon.status, icon.headers.get('content-type')]).toEqual([200, 'image/png']);
  }
});

it('keeps its list of routes to itself', async () => {
  const { page, close } = await openPage(browser);
  await page.goto('/_sitemap');
  await page.getByRole('heading').first().waitFor();
  expect(await page.locator('body').innerText()).not.toMatch(/sitemap/i);
  await close();
});
