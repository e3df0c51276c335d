import { existsSync, readdirSync } from 'node:fs';
import path from 'node:path';

/** Every test file below a folder, whichever project is meant to run it. */
export function testFilesOnDisk(folder) {
  if (!existsSync(folder)) return [];
  return readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && /\.(test|spec)\.[cm]?[jt]sx?$/.test(entry.name))
    .map((entry) => path.join(entry.parentPath ?? entry.path, entry.name))
    .sort();
}

/** Test files that no project of jest ran: a test that is never run looks exactly like one that passes. */
export function filesThatDidNotRun(onDisk, ran) {
  const seen = new Set(ran);
  return onDisk.filter((file) => !seen.has(file));
}

/**
 * Counts what jest tells in its JSON. A file that broke before its first test counts as one failure, and so does a
 * test that was skipped, unless the person asked for some tests only.
 */
export function countResults(results, { someOnly = false } = {}) {
  const broken = results.testResults.filter((file) => file.status === 'failed' && file.assertionResults.every(({ status }) => status !== 'failed')).length;
  return { passed: results.numPassedTests, failed: results.numFailedTests + broken + (someOnly ? 0 : results.numPendingTests + results.numTodoTests) };
}
