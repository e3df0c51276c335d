// node scripts/assets.mjs: makes fonts, icons and the web shell from their sources. Its outputs are committed; run it
// again only when a source changes. Needs Chromium for the PNG icons.
import { createHash } from 'node:crypto';
import { mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import subsetFont from 'subset-font';
import { findProgram } from './lib/debian.mjs';
import { endWith, say } from './lib/log.mjs';
import { inRoot } from './lib/paths.mjs';
import { FONTS, wantedText } from './lib/fontPlan.mjs';
import { iconFiles, signSvg } from './lib/signSvg.mjs';

const hashOf = (content) => createHash('sha256').update(content).digest('hex').slice(0, 32);

/** Code points that a font draws, from its cmap by way of fontkit, which pdfkit brings along. */
async function codePointsOf(buffer) {
  const { create } = await import('fontkit');
  return new Set(create(buffer).characterSet);
}

async function makeFonts() {
  const webDir = inRoot('public', 'fonts');
  const pdfDir = inRoot('assets', 'fonts', 'pdf');
  for (const folder of [webDir, pdfDir]) {
    rmSync(folder, { recursive: true, force: true });
    mkdirSync(folder, { recursive: true });
  }
  const coverage = {};
  const faces = [];
  for (const font of FONTS) {
    const source = readFileSync(inRoot('node_modules', '@expo-google-fonts', ...font.file));
    const has = await codePointsOf(source);
    const text = [...wantedText(font.family)].filter((character) => has.has(character.codePointAt(0))).join('');
    const woff2 = await subsetFont(source, text, { targetFormat: 'woff2' });
    const name = `${font.name}-${hashOf(woff2)}.woff2`;
    writeFileSync(path.join(webDir, name), woff2);
    const ttf = await subsetFont(source, text, { targetFormat: 'truetype' });
    writeFileSync(path.join(pdfDir, `${font.name}.ttf`), ttf);
    faces.push({ ...font, name, bytes: woff2.length });
    const key = `${font.family} ${font.style}`;
    const drawn = [...text].sort().join('');
    if (coverage[key] !== undefined && coverage[key] !== drawn) throw new Error(`The weights of ${key} differ in what they draw.`);
    coverage[key] = drawn;
    say(`${name}  ${woff2.length} B, TTF ${ttf.length} B, ${[...text].length} characters`);
  }
  writeFileSync(inRoot('assets', 'fonts', 'coverage.json'), `${JSON.stringify(coverage, null, 2)}\n`);
  return faces;
}

/** Puts the faces into app.css and the preloads into index.html, between their marks. */
function writeShell(faces) {
  const between = (file, [open, close], lines) => {
    const before = readFileSync(file, 'utf8');
    const from = before.indexOf(open) + open.length;
    const to = before.indexOf(close);
    if (from < open.length || to < from) throw new Error(`${file} has lost its marks "${open}" and "${close}".`);
    writeFileSync(file, `${before.slice(0, from)}\n${lines.join('\n')}\n${before.slice(to)}`);
  };
  between(inRoot('public', 'app.css'), ['/* faces: made by scripts/assets.mjs */', '/* end of faces */'], faces.map((face) =>
    `@font-face { font-family: "${face.family}"; font-weight: ${face.weight}; font-style: ${face.style}; font-display: block; src: url("/fonts/${face.name}") format("woff2"); }`));
  between(inRoot('public', 'index.html'), ['<!-- preloads: made by scripts/assets.mjs -->', '<!-- end of preloads -->'], faces.filter((face) => face.preload).map((face) =>
    `    <link rel="preload" as="font" type="font/woff2" href="/fonts/${face.name}" crossorigin>`));
}

async function makeIcons() {
  const { chromium } = await import('playwright-core');
  const browser = await chromium.launch({ executablePath: findProgram('chromium') ?? undefined, args: ['--no-sandbox', '--disable-dev-shm-usage', '--disable-gpu', '--disable-background-networking', '--disable-component-update', '--disable-sync', '--no-first-run'] });
  try {
    for (const { name, size, svg } of iconFiles()) {
      if (name.endsWith('.svg')) {
        writeFileSync(inRoot('public', name), `${svg}\n`);
        continue;
      }
      const page = await browser.newPage({ viewport: { width: size, height: size } });
      await page.setContent(`<style>body{margin:0}svg{display:block;width:${size}px;height:${size}px}</style>${svg}`);
      writeFileSync(inRoot('public', name), await page.screenshot({ omitBackground: true }));
      await page.close();
    }
  } finally {
    await browser.close();
  }
  mkdirSync(inRoot('assets', 'icons'), { recursive: true });
  for (const [name, small] of [['sign.svg', false], ['sign-small.svg', true]]) writeFileSync(inRoot('assets', 'icons', name), `${signSvg({ small })}\n`);
  say(`Icons: ${readdirSync(inRoot('public')).filter((name) => /icon|favicon/.test(name)).join(', ')}`);
}

try {
  writeShell(await makeFonts());
  await makeIcons();
} catch (error) {
  endWith(error);
}
