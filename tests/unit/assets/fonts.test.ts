import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { transformSync } from 'esbuild';

const root = path.resolve(__dirname, '..', '..', '..');
const read = (...parts: string[]) => readFileSync(path.join(root, ...parts), 'utf8');
const coverage = JSON.parse(read('assets', 'fonts', 'coverage.json')) as Record<string, string>;
const drawn = (face: string) => new Set(coverage[face] ?? '');

/** Characters that no font draws, since they only steer. */
const STEERING = new Set(['\n', '\r', '\t', '\u00ad', '\u200b', '\u2060']);

/** Files of a folder that can hold what a user reads, with the characters that stand outside comments. */
function charactersIn(folder: string): [file: string, characters: Set<string>][] {
  const at = path.join(root, folder);
  if (!existsSync(at)) return [];
  return readdirSync(at, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && /\.(ts|tsx|json)$/.test(entry.name))
    .map((entry) => {
      const file = path.join(entry.parentPath, entry.name);
      const text = readFileSync(file, 'utf8');
      const kept = file.endsWith('.json') ? text : transformSync(text, { loader: file.endsWith('x') ? 'tsx' : 'ts', charset: 'utf8', legalComments: 'none', jsx: 'preserve' }).code;
      return [path.relative(root, file), new Set(kept)];
    });
}

describe('fonts', () => {
  it.each(['shared', 'components', 'app'])('draw every character that %s can show', (folder) => {
    const sans = drawn('Source Sans 3 normal');
    const missing = charactersIn(folder).flatMap(([file, characters]) =>
      [...characters].filter((character) => !sans.has(character) && !STEERING.has(character)).map((character) => `${file}: ${character} U+${(character.codePointAt(0) ?? 0).toString(16).toUpperCase()}`));
    expect(missing).toEqual([]);
  });

  it('draw what formulas need in Source Sans 3, upright and italic', () => {
    for (const face of ['Source Sans 3 normal', 'Source Sans 3 italic']) {
      const has = drawn(face);
      expect([...'³⁴²¹⁻⁺₀₉±−×·°′″≤≥≈≠→ΔφψχξδναβθσπµÅŁź½✓■●◆□○△\u00a0'].filter((character) => !has.has(character))).toEqual([]);
    }
  });

  it('leave to Source Sans 3 what Brygada 1918 draws too light for a heading', () => {
    for (const face of ['Brygada 1918 normal', 'Brygada 1918 italic']) {
      const has = drawn(face);
      expect([...'()+=±×−≈≠→/'].filter((character) => has.has(character))).toEqual([]);
      expect([...'JPφξψ0123456789'].filter((character) => !has.has(character))).toEqual([]);
    }
  });

  it('are named by their content and asked for under that name', () => {
    const style = read('public', 'app.css');
    const names = readdirSync(path.join(root, 'public', 'fonts'));
    expect(names).toHaveLength(8);
    for (const name of names) {
      const hash = createHash('sha256').update(readFileSync(path.join(root, 'public', 'fonts', name))).digest('hex').slice(0, 32);
      expect(name).toMatch(new RegExp(`^[BS]\\d{3}i?-${hash}\\.woff2$`));
      expect(style).toContain(`url("/fonts/${name}")`);
    }
    const preloads = [...read('public', 'index.html').matchAll(/rel="preload".*href="\/fonts\/([^"]+)"/g)].map(([, name]) => name);
    expect(preloads).toHaveLength(2);
    expect(names).toEqual(expect.arrayContaining(preloads));
  });
});

describe('the web shell', () => {
  it('has no script or style of its own in the page', () => {
    const page = read('public', 'index.html');
    expect(page).not.toMatch(/<script|<style|style=|\son\w+="/);
    expect(page).toContain('<noscript>');
  });

  it('has every icon that the manifest and the page name', () => {
    const manifest = JSON.parse(read('public', 'manifest.webmanifest')) as { icons: { src: string }[] };
    const linked = [...read('public', 'index.html').matchAll(/(?:icon|manifest)" href="([^"]+)"/g)].map(([, address]) => address ?? '');
    expect(linked.length).toBeGreaterThanOrEqual(4);
    for (const address of [...manifest.icons.map(({ src }) => src), ...linked]) expect(existsSync(path.join(root, 'public', address))).toBe(true);
  });
});
