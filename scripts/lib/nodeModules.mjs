import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { hashOf, readStamp } from './hash.mjs';
import { say, step } from './log.mjs';
import { inRoot } from './paths.mjs';
import { mustRun } from './run.mjs';

const stampFile = inRoot('node_modules', '.throughbond-stamp');

/** Whether npm's own record of what it installed names the same packages and versions as the lock file. */
export function sameAsLock(lock, installed) {
  const versions = (packages, keep) => new Map(
    Object.entries(packages).filter(([name, entry]) => name !== '' && keep(entry)).map(([name, entry]) => [name, entry.version]),
  );
  const wanted = versions(lock.packages ?? {}, () => true);
  const present = versions(installed.packages ?? {}, () => true);
  for (const [name, version] of present) if (wanted.get(name) !== version) return false;
  // a package for another system (optional) may be absent, all others must be there
  for (const name of versions(lock.packages ?? {}, (entry) => !entry.optional).keys()) if (!present.has(name)) return false;
  return true;
}

const wantedStamp = () => `${hashOf(['package.json', 'package-lock.json'])} node ${process.versions.node.split('.')[0]}`;

/** Whether `npm ci` is due: node_modules is missing, broken off, or belongs to another package-lock.json. */
export function nodeModulesDue() {
  if (readStamp(stampFile) === wantedStamp()) return false;
  const record = inRoot('node_modules', '.package-lock.json');
  if (!existsSync(record)) return true;
  const read = (file) => JSON.parse(readFileSync(file, 'utf8'));
  if (readStamp(stampFile)?.endsWith(` node ${process.versions.node.split('.')[0]}`) === false) return true;
  if (!sameAsLock(read(inRoot('package-lock.json')), read(record))) return true;
  writeFileSync(stampFile, wantedStamp());
  return false;
}

/** Installs node_modules exactly as package-lock.json says when they are missing or stale. */
export async function ensureNodeModules() {
  if (!nodeModulesDue()) return;
  await step(existsSync(inRoot('node_modules')) ? 'Bringing node_modules up to date (npm ci)' : 'Installing node_modules (npm ci, about 2 minutes)', async () => {
    // under `npm start` npm names its own program; on its own, the one of the PATH is taken
    const [command, first] = process.env.npm_execpath?.endsWith('.js') ? [process.execPath, [process.env.npm_execpath]] : ['npm', []];
    await mustRun('npm ci', command, [...first, 'ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error']);
    writeFileSync(stampFile, wantedStamp());
  });
  say('node_modules are ready.');
}
