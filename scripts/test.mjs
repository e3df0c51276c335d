// npm test: all set-up, then types, lint, the direction of imports, and every test. The last line is the count.
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { SetupError, say, step } from './lib/log.mjs';
import { inRoot, root } from './lib/paths.mjs';
import { run, tail } from './lib/run.mjs';
import { setUp } from './lib/setup.mjs';
import { countResults, filesThatDidNotRun, testFilesOnDisk } from './lib/testFiles.mjs';

const only = process.argv.slice(2); // arguments go to jest: then only those tests run, and types and lint are left out
const bin = (...parts) => inRoot('node_modules', ...parts);
let passed = 0;
let failed = 0;

/** One check that counts as one test. */
function count(name, problem) {
  if (!problem) {
    passed += 1;
    return;
  }
  failed += 1;
  say(`\n✗ ${name}\n${problem}\n`);
}

async function check(name, args) {
  await step(name, async () => {
    const { code, output } = await run(process.execPath, args, { env: { ...process.env, FORCE_COLOR: '0' } });
    count(name, code === 0 ? null : tail(output, 80));
  });
}

const checks = async () => {
  await Promise.all([
    check('Types (tsc)', [bin('typescript', 'bin', 'tsc'), '--noEmit', '-p', root]),
    check('Lint (eslint)', [bin('eslint', 'bin', 'eslint.js'), '.', '--max-warnings', '0']),
  ]);
  const folders = ['app', 'components', 'server', 'shared', 'scripts', 'tests'].filter((folder) => existsSync(inRoot(folder)));
  await check('Direction of imports (dependency-cruiser)', [bin('dependency-cruiser', 'bin', 'dependency-cruise.mjs'), '--config', inRoot('.dependency-cruiser.cjs'), ...folders]);
};

async function tests() {
  const folder = mkdtempSync(path.join(tmpdir(), 'throughbond-results-'));
  const outputFile = path.join(folder, 'results.json');
  try {
    const { code } = await run(process.execPath, [bin('jest', 'bin', 'jest.js'), '--ci', '--maxWorkers=2', '--json', `--outputFile=${outputFile}`, ...only], {
      stdio: 'show', env: { ...process.env, NODE_ENV: 'test', FORCE_COLOR: '0' },
    });
    if (!existsSync(outputFile)) return count('Tests (jest)', `jest ended with exit code ${code} before it could count.`);
    const results = JSON.parse(readFileSync(outputFile, 'utf8'));
    const counted = countResults(results, { someOnly: only.length > 0 });
    passed += counted.passed;
    failed += counted.failed;
    if (code !== 0 && counted.failed === 0) count('Tests (jest)', `jest ended with exit code ${code} although no test failed.`);
    if (only.length > 0) return undefined;
    const idle = filesThatDidNotRun(testFilesOnDisk(inRoot('tests')), results.testResults.map(({ name }) => name));
    return count('Every test file on disk ran', idle.length > 0 ? `These did not:\n${idle.join('\n')}` : null);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

try {
  await setUp({ programs: ['mariadb', 'chromium', 'poppler'], client: true });
  if (only.length === 0) await checks();
  await tests();
} catch (error) {
  count('Set-up', error instanceof SetupError ? error.message : (error?.stack ?? String(error)));
}
process.stdout.write(`\n${passed} passed, ${failed} failed\n`);
process.exitCode = failed > 0 || passed === 0 ? 1 : 0;
