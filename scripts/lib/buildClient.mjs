import { cpSync, existsSync, mkdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { compressFolder, listFiles } from './compress.mjs';
import { hashOf, readStamp } from './hash.mjs';
import { step } from './log.mjs';
import { inRoot } from './paths.mjs';
import { mustRun } from './run.mjs';

const SOURCES = ['app', 'components', 'shared', 'assets', 'public', 'app.json', 'babel.config.js', 'metro.config.js', 'package.json', 'package-lock.json', 'tsconfig.json', 'scripts/lib/buildClient.mjs', 'scripts/lib/compress.mjs'];
const DAY_MS = 24 * 3600 * 1000;
const HASHED = /[-.][0-9a-f]{32}\./;

export const distDir = () => inRoot('dist');
const stampOf = (folder) => path.join(folder, '.stamp');
const retiredOf = (folder) => path.join(folder, '.retired.json');

const wantedStamp = () => hashOf(SOURCES);

/** Whether the web client in dist/ was made from other sources than those here. */
export const clientDue = () => readStamp(stampOf(distDir())) !== wantedStamp();

/**
 * Copies hashed files that the new build no longer has from the old one: a page opened before the change still asks
 * for them. Each stays for a day after it was retired.
 * @returns {Record<string, number>} when each kept file was retired
 */
export function keepRetired(oldDir, newDir, nowMs) {
  if (!existsSync(oldDir)) return {};
  const before = existsSync(retiredOf(oldDir)) ? JSON.parse(readFileSync(retiredOf(oldDir), 'utf8')) : {};
  const fresh = new Set(listFiles(newDir));
  const retired = {};
  for (const name of listFiles(oldDir)) {
    if (!HASHED.test(name) || fresh.has(name)) continue;
    const since = before[name] ?? nowMs;
    if (nowMs - since > DAY_MS) continue;
    mkdirSync(path.dirname(path.join(newDir, name)), { recursive: true });
    cpSync(path.join(oldDir, name), path.join(newDir, name));
    retired[name] = since;
  }
  return retired;
}

/** Builds the web client into dist/ and compresses it, when its sources changed. */
export async function ensureClient() {
  const stamp = wantedStamp();
  if (readStamp(stampOf(distDir())) === stamp) return;
  const next = inRoot('build', 'client');
  const store = inRoot('build', 'compressed');
  rmSync(next, { recursive: true, force: true });
  mkdirSync(store, { recursive: true });
  await step('Building the web client (about a minute the first time)', () =>
    mustRun('Building the web client', process.execPath, [inRoot('node_modules', 'expo', 'bin', 'cli'), 'export', '--platform', 'web', '--output-dir', next], {
      env: { ...process.env, NODE_ENV: 'production', CI: '1', EXPO_OFFLINE: '1', EXPO_NO_TELEMETRY: '1', EXPO_NO_DOTENV: '1' },
    }));
  rmSync(path.join(next, 'metadata.json'), { force: true }); // Expo's list for its own hosting, of no use to a browser
  await step('Compressing the web client', () => compressFolder(next, store));
  writeFileSync(retiredOf(next), JSON.stringify(keepRetired(distDir(), next, Date.now())));
  writeFileSync(stampOf(next), stamp);
  const old = inRoot('build', 'client-old');
  rmSync(old, { recursive: true, force: true });
  if (existsSync(distDir())) renameSync(distDir(), old);
  renameSync(next, distDir());
  rmSync(old, { recursive: true, force: true });
}
