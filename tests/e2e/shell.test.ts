import type { Browser } from 'playwright-core';
import { openBrowser, product, visit, WIDTHS } from '../helpers/browser';

let browser: Browser;
beforeAll(async () => { browser = await openBrowser(); });
afterAll(() => browser.close());

it.each(WIDTHS)('uses the fonts that ship and no others on a %s', async (_name, viewport) => {
  await visit(browser, { viewport }, async ({ page }) => {
    const fonts: string[] = [];
    page.on('response', (response) => { if (response.url().endsWith('.woff2')) fonts.push(`${response.status()} ${response.headers()['cache-control']}`); });
    await page.goto('/');
    await page.getByRole('heading').first().waitFor();
    const families = await page.evaluate(async () => [...await document.fonts.ready].filter((face) => face.status === 'loaded').map((face) => face.family.replaceAll('"', '')));
    expect(new Set(families)).toEqual(new Set(['Brygada 1918', 'Source Sans 3']));
    expect(new Set(fonts)).toEqual(new Set(['200 public, max-age=31536000, immutable']));
  });
});

it('says what is missing when scripts are off', async () => {
  await visit(browser, { javaScriptEnabled: false }, async ({ page }) => {
    await page.goto('/cases');
    expect(await page.locator('noscript').innerText()).toContain('switch it on for this address');
  });
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
  await visit(browser, {}, async ({ page }) => {
    await page.goto('/_sitemap');
    await page.getByRole('heading').first().waitFor();
    expect(await page.locator('body').innerText()).not.toMatch(/sitemap/i);
  });
});

it('moves between places, back, and to an address of its own without loading the page again', async () => {
  await visit(browser, {}, async ({ page }) => {
    const title = (name?: string) => page.getByRole('heading', { level: 1, name }).first();
    await page.goto('/help/glossary');
    await title().waitFor();
    const first = await title().innerText();
    await page.evaluate(() => { document.body.dataset.sameLoad = 'yes'; });
    for (const place of ['Relations', 'Quick look']) {
      await page.getByRole('link', { name: place, exact: true }).first().click();
      await title(place).waitFor();
    }
    await page.goBack();
    await page.goBack();
    await title(first).waitFor();
    expect(new URL(page.url()).pathname).toBe('/help/glossary');
    expect(await page.evaluate(() => document.body.dataset.sameLoad)).toBe('yes');
    await page.reload();
    await title(first).waitFor();
    await page.goto('/leads/nowhere');
    await title().waitFor();
  });
});
