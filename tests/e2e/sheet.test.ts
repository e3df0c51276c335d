import { execFile } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import type { Browser, Page } from 'playwright-core';
import type { CaseContent } from '@/shared/types/case';
import { GRADE_WORDS } from '@/shared/format/words';
import { sheetText } from '@/shared/text/sheet';
import { uiCaseParts as parts } from '@/shared/text/uiCaseParts';
import { uiCases } from '@/shared/text/uiCases';
import { openBrowser, PHONE, visit } from '../helpers/browser';
import { answerOf, cinnamate, dihedral } from '../helpers/caseContent';
import { draft, signedCase } from '../helpers/caseWork';
import { makeScene, openAs, visitAs } from '../helpers/people';

let browser: Browser;
let folder: string;
beforeAll(async () => {
  browser = await openBrowser();
  folder = mkdtempSync(path.join(tmpdir(), 'throughbond-sheet-'));
});
afterAll(async () => {
  await browser.close();
  rmSync(folder, { recursive: true, force: true });
});

const run = async (program: string, ...args: string[]): Promise<string> => (await promisify(execFile)(program, args, { maxBuffer: 20_000_000 })).stdout;

/** The sheet as the page's own link gives it. */
async function throughPage(page: Page, caseId: string, name: string): Promise<string> {
  await page.goto(`/cases/${caseId}/sheet`);
  const href = await page.getByRole('link', { name: uiCases.sheet.open }).getAttribute('href');
  const base64 = await page.evaluate(async (address) => {
    const response = await fetch(address);
    if (!response.ok || response.headers.get('content-type') !== 'application/pdf') throw new Error(`${response.status} ${response.headers.get('content-type')}`);
    const bytes = new Uint8Array(await response.arrayBuffer());
    let text = '';
    for (let at = 0; at < bytes.length; at += 32_768) text += String.fromCharCode(...bytes.subarray(at, at + 32_768));
    return btoa(text);
  }, href!);
  const file = path.join(folder, `${name}.pdf`);
  writeFileSync(file, Buffer.from(base64, 'base64'));
  return file;
}

/** The text of each page. */
async function pagesOf(file: string): Promise<string[]> {
  const pages = (await run('pdftotext', '-layout', '-enc', 'UTF-8', file, '-')).split('\f');
  return pages.slice(0, -1);
}

/** Share of a page that is not paper, and how many shades there are: a blank or black page has neither. */
async function inkOf(file: string, page: number): Promise<{ share: number; shades: number }> {
  const root = path.join(folder, 'page');
  await run('pdftoppm', '-gray', '-r', '40', '-f', String(page), '-l', String(page), '-singlefile', file, root);
  const bytes = readFileSync(`${root}.pgm`);
  const head = /^P5\s+\d+\s+\d+\s+\d+\s/.exec(bytes.subarray(0, 40).toString('latin1'))?.[0].length ?? 0;
  const pixels = bytes.subarray(head);
  return { share: pixels.filter((shade) => shade < 200).length / pixels.length, shades: new Set(pixels).size };
}

/** Both halves of every case: what the relation made of it, and what the sheet must say. */
const STORIES: [string, CaseContent, RegExp[]][] = [
  ['a decided double bond', cinnamate(), [/Cinnamate 4: E or Z\?/, /15\.90\s+/, /E, the phenyl and the ester on opposite sides/, /assigned/]],
  ['an angle that stays tentative', dihedral(), [/Pyranol 7/, /8\.9/, /−\d+/, /φ/, /tentative/, /Haasnoot/]],
  ['a case that is not decided', cinnamate({ question: 'Enol ether 5: E or Z?', readings: [{ ...cinnamate().readings[0]!, j: '12.4', partner: '' }], calculations: [{ id: 'c1', readingId: 'r1', bond: 'double', groups: { left: ['O(C)', 'H'], right: ['C(C,H,H)', 'H'] }, ringSize: null }], answer: answerOf({}) }),
    [/Enol ether 5/, /12\.4/, /not decided/, /The other isomer/]],
];

it.each(STORIES)('the sheet of %s says it all as text, tagged, and marks every page as a draft', async (name, content, wanted) => {
  const { projectId, people: { author } } = await makeScene({ author: 'chemist' });
  await visitAs(browser, author, { viewport: PHONE }, async ({ page, caller }) => {
    const one = await draft(caller, projectId, content);
    const file = await throughPage(page, one.id, name.replaceAll(' ', '-'));
    const pages = await pagesOf(file);
    const text = pages.join('\n');
    for (const pattern of [...wanted, /³J/, /±/, /0\.2/, new RegExp(one.code), /Europe\/Berlin/]) expect(text).toMatch(pattern);
    expect(text.replace(/\s/g, '')).toContain(one.contentHash.slice(0, 16));
    expect(text).not.toMatch(/NaN|undefined|\[object|_[A-Za-z]_|\uFFFD/);
    pages.forEach((each, at) => {
      expect([at + 1, each]).toEqual([at + 1, expect.stringContaining(sheetText.draft)]);
      expect(each).toMatch(new RegExp(`\\b${at + 1}\\b.*\\b${pages.length}\\b`)); // page numbers
    });
    const info = await run('pdfinfo', file);
    expect(info).toMatch(/^Tagged:\s+yes$/m);
    expect(info).toMatch(/^Page size:.*A4/m);
    const fonts = (await run('pdffonts', file)).split('\n').slice(2).filter((line) => line.trim() !== '');
    expect(fonts.length).toBeGreaterThan(0);
    for (const font of fonts) expect(font).toMatch(/\byes yes yes\b/); // embedded, subset, with Unicode
    for (let at = 1; at <= pages.length; at += 1) {
      const { share, shades } = await inkOf(file, at);
      expect([at, share > 0.004 && share < 0.5, shades > 20]).toEqual([at, true, true]);
    }
  });
});

it('a signed sheet names who signed what and when, bears no draft mark, and comes out the same each time', async () => {
  const { projectId, people: { author, reviewer } } = await makeScene({ author: 'chemist', reviewer: 'reviewer' });
  const reviewing = await openAs(browser, reviewer);
  await visitAs(browser, author, { acceptDownloads: true }, async ({ page, caller }) => {
    const signed = await signedCase(caller, reviewing.caller, projectId);
    const file = await throughPage(page, signed.id, 'signed');
    const pages = await pagesOf(file);
    for (const each of pages) expect(each).not.toContain(sheetText.draft);
    const text = pages.join('\n');
    for (const word of [author.name, reviewer.name, parts.trail.meaning.review, parts.trail.meaning.authorship, GRADE_WORDS.assigned]) expect(text).toContain(word);
    expect(text).toContain(new Date(signed.signatures.at(-1)!.at).toLocaleDateString('en-GB', { year: 'numeric', timeZone: 'Europe/Berlin' }));
    const link = page.getByRole('link', { name: uiCases.sheet.download });
    const [download] = await Promise.all([page.waitForEvent('download'), link.click()]);
    expect(download.suggestedFilename()).toBe(`${signed.code}-r${signed.revision}.pdf`);
    expect(readFileSync(await download.path()).equals(readFileSync(file))).toBe(true);
    await page.getByText(uiCases.sheet.signedMark).waitFor();
    // the line for a report keeps the digits as typed
    await page.getByText(/J.*15\.90/).first().waitFor();
  });
  await reviewing.close();
});

it('a sheet on Letter paper is a choice of the page', async () => {
  const { projectId, people: { author } } = await makeScene({ author: 'chemist' });
  await visitAs(browser, author, { viewport: PHONE }, async ({ page, caller }) => {
    const one = await draft(caller, projectId);
    await page.goto(`/cases/${one.id}/sheet`);
    await page.getByRole('radio', { name: uiCases.sheet.letter }).click();
    const href = await page.getByRole('link', { name: uiCases.sheet.open }).getAttribute('href');
    const response = await page.context().request.get(href!);
    const file = path.join(folder, 'letter.pdf');
    writeFileSync(file, await response.body());
    expect(await run('pdfinfo', file)).toMatch(/^Page size:.*letter/im);
  });
});

it('the way to a sheet without an account leads through signing in', async () => {
  await visit(browser, {}, async ({ context }) => {
    expect((await context.request.get('/api/cases/00000000-0000-4000-8000-000000000000/sheet.pdf')).status()).toBe(401);
  });
});
