import { mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { brotliDecompressSync, gunzipSync } from 'node:zlib';
import { loadScript } from '../../helpers/scripts';

const { keepRetired } = loadScript<typeof import('../../../scripts/lib/buildClient.mjs')>('buildClient.mjs');
const { compressFolder } = loadScript<typeof import('../../../scripts/lib/compress.mjs')>('compress.mjs');
const { countResults, filesThatDidNotRun, testFilesOnDisk } = loadScript<typeof import('../../../scripts/lib/testFiles.mjs')>('testFiles.mjs');

const HOUR = 3_600_000;
let folder: string;
const at = (...parts: string[]) => path.join(folder, ...parts);
beforeEach(() => { folder = mkdtempSync(path.join(tmpdir(), 'throughbond-build-')); });
afterEach(() => rmSync(folder, { recursive: true, force: true }));

describe('a new web client', () => {
  const chunk = (letter: string) => `page-${letter.repeat(32)}.js`;
  const make = (name: string, files: string[], retired?: Record<string, number>) => {
    mkdirSync(at(name), { recursive: true });
    files.forEach((file) => writeFileSync(at(name, file), file));
    if (retired) writeFileSync(at(name, '.retired.json'), JSON.stringify(retired));
  };

  it('keeps chunks of the one before for a day, and nothing else of it', () => {
    const now = 1_000 * HOUR;
    make('old', [chunk('a'), chunk('b'), chunk('c'), chunk('d'), 'index.html'], { [chunk('c')]: now - 23 * HOUR, [chunk('d')]: now - 25 * HOUR });
    make('new', [chunk('a')]);
    expect(keepRetired(at('old'), at('new'), now)).toEqual({ [chunk('b')]: now, [chunk('c')]: now - 23 * HOUR });
    expect(readdirSync(at('new')).sort()).toEqual([chunk('a'), chunk('b'), chunk('c')]);
  });

  it('has nothing to keep the first time', () => {
    make('new', []);
    expect(keepRetired(at('old'), at('new'), 0)).toEqual({});
  });

  it('is compressed so that each form unpacks to the same bytes', async () => {
    mkdirSync(at('dist', 'deep'), { recursive: true });
    mkdirSync(at('store'));
    const script = 'export const angle = 60;\n'.repeat(200);
    writeFileSync(at('dist', 'deep', 'x.js'), script);
    writeFileSync(at('dist', 'small.css'), 'a{}');
    writeFileSync(at('dist', 'font.woff2'), script);
    for (const _round of ['made', 'from the store']) {
      await compressFolder(at('dist'), at('store'));
      expect(brotliDecompressSync(readFileSync(at('dist', 'deep', 'x.js.br'))).toString()).toBe(script);
      expect(gunzipSync(readFileSync(at('dist', 'deep', 'x.js.gz'))).toString()).toBe(script);
      expect(readdirSync(at('dist')).sort()).toEqual(['deep', 'font.woff2', 'small.css']);
      expect(readdirSync(at('store'))).toHaveLength(2);
    }
  });
});

describe('the count of tests', () => {
  it('names each test file that no project ran', () => {
    mkdirSync(at('unit', 'deep'), { recursive: true });
    mkdirSync(at('forgotten'));
    ['unit/a.test.ts', 'unit/deep/b.test.tsx', 'forgotten/c.spec.ts', 'unit/helper.ts'].forEach((name) => writeFileSync(at(name), ''));
    const onDisk = testFilesOnDisk(folder);
    expect(onDisk).toEqual([at('forgotten/c.spec.ts'), at('unit/a.test.ts'), at('unit/deep/b.test.tsx')]);
    expect(filesThatDidNotRun(onDisk, [at('unit/a.test.ts'), at('unit/deep/b.test.tsx')])).toEqual([at('forgotten/c.spec.ts')]);
  });

  it('counts a file that broke before its first test, and a skipped test, as failures', () => {
    const file = (status: string, ...tests: string[]) => ({ status, assertionResults: tests.map((result) => ({ status: result })) });
    const testResults = [file('passed', 'passed', 'passed'), file('failed', 'passed', 'failed'), file('failed'), file('passed', 'pending')];
    expect(countResults({ numPassedTests: 3, numFailedTests: 1, numPendingTests: 1, numTodoTests: 0, testResults })).toEqual({ passed: 3, failed: 3 });
    expect(countResults({ numPassedTests: 3, numFailedTests: 1, numPendingTests: 1, numTodoTests: 0, testResults }, { someOnly: true }).failed).toBe(2);
  });
});
