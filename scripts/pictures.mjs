// node scripts/pictures.mjs: takes the pictures of the README from the running product, on throw-away data with the demo.
import { execFileSync } from 'node:child_process';
import { chmodSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { openDatabase } from './lib/database.mjs';
import { endWith, say } from './lib/log.mjs';
import { inRoot } from './lib/paths.mjs';
import { freePort } from './lib/port.mjs';
import { loadDemo, migrate, serverEnv, startServer } from './lib/server.mjs';
import { setUp } from './lib/setup.mjs';

const PASSWORD = 'couplings-2026'; // of the demo, as its sign-in page tells it
const PHONE = { width: 390, height: 844 };
const WIDE = { width: 1280, height: 860 };
const ARGS = ['--no-sandbox', '--disable-dev-shm-usage', '--disable-gpu', '--disable-background-networking', '--disable-component-update', '--disable-sync', '--disable-quic', '--no-first-run'];
const target = inRoot('docs', 'pictures');

/** What to show: who is signed in, where, how wide, and what must stand on the page before the picture is taken. */
const PICTURES = [
  { name: 'quick-single', view: PHONE, path: '/?j=9.6&front=C(N,H,H)~O(H)&rear=C(H,H,H)~C(C,H,H)&turning=ring', height: 1500 },
  { name: 'quick-double', view: PHONE, path: '/?bond=double&j=15.8&left=C(=C,C)~H&right=C(=O,N)~H', height: 1300 },
  { name: 'quick-wide', view: WIDE, path: '/?bond=double&j=12.6&left=C(=C,C)~H&right=C(=O,N)~H' },
  { name: 'cases', view: WIDE, who: 'joris.calder@team.example', path: '/cases' },
  { name: 'case', view: { width: 1280, height: 1100 }, who: 'amina.restell@team.example', code: 'VNL-0002' },
  { name: 'case-phone', view: PHONE, who: 'amina.restell@team.example', code: 'PIP-0001', height: 1200 },
  { name: 'reviews', view: PHONE, who: 'joris.calder@team.example', path: '/reviews' },
  { name: 'relations', view: WIDE, path: '/relations' },
];

async function take(browser, address, { name, view, who, path: where, code, height, theme = 'light' }) {
  const context = await browser.newContext({ baseURL: address, viewport: { ...view, height: height ?? view.height }, locale: 'en-GB', timezoneId: 'UTC', reducedMotion: 'reduce', colorScheme: theme });
  try {
    if (who) {
      const answer = await context.request.post('/api/session', { data: { email: who, password: PASSWORD } });
      if (!answer.ok()) throw new Error(`${who} could not sign in: ${await answer.text()}`);
    }
    const page = await context.newPage();
    const caseId = code ? (await (await context.request.get(`/api/cases?q=${code}`)).json()).cases[0].id : null;
    await page.goto(caseId ? `/cases/${caseId}` : where);
    await page.getByRole('heading', { level: 1 }).first().waitFor();
    await page.waitForLoadState('networkidle');
    await page.waitForTimeout(600);
    await page.screenshot({ path: path.join(target, `${name}.png`) });
    say(`docs/pictures/${name}.png`);
    return { context, caseId };
  } catch (error) {
    throw new Error(`The picture ${name} failed.`, { cause: error });
  } finally {
    if (code !== 'VNL-0002') await context.close();
  }
}

/** The first page of a summary sheet, drawn by poppler. */
async function sheet(context, caseId) {
  const pdf = await (await context.request.get(`/api/cases/${caseId}/sheet.pdf?paper=A4&zone=UTC`)).body();
  const file = path.join(target, 'sheet.pdf');
  writeFileSync(file, pdf);
  execFileSync('pdftoppm', ['-r', '80', '-png', '-f', '1', '-l', '1', '-singlefile', file, path.join(target, 'sheet')]);
  rmSync(file);
  say('docs/pictures/sheet.png');
}

const toStop = [];
try {
  await setUp({ programs: ['mariadb', 'chromium', 'poppler'], client: true });
  const folder = mkdtempSync(path.join(tmpdir(), 'throughbond-pictures-'));
  chmodSync(folder, 0o711); // the database's user must pass through
  toStop.push(async () => rmSync(folder, { recursive: true, force: true }));
  const dataDir = path.join(folder, 'data');
  const db = await openDatabase(dataDir);
  toStop.push(db.stop);
  await migrate({ dataDir, db });
  await loadDemo({ dataDir, db, demo: '1' });
  const port = await freePort();
  const server = await startServer({ port, quiet: true, env: serverEnv({ dataDir, appUrl: db.appUrl, port }) });
  toStop.push(server.stop);
  mkdirSync(target, { recursive: true });
  const { chromium } = await import('playwright-core');
  const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ARGS });
  toStop.push(() => browser.close());
  for (const picture of PICTURES) {
    const { context, caseId } = await take(browser, `http://localhost:${port}`, picture);
    if (picture.code === 'VNL-0002') await sheet(context, caseId);
  }
  while (toStop.length > 0) await toStop.pop()();
  process.exit(0);
} catch (error) {
  while (toStop.length > 0) await toStop.pop()();
  endWith(error);
}
