import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync } from 'node:fs';
import path from 'node:path';
import { root } from './paths.mjs';

function* filesUnder(target) {
  if (!existsSync(target)) return;
  if (!statSync(target).isDirectory()) {
    yield target;
    return;
  }
  const entries = readdirSync(target, { withFileTypes: true }).sort((a, b) => (a.name < b.name ? -1 : 1));
  for (const entry of entries) yield* filesUnder(path.join(target, entry.name));
}

/**
 * A hash over the names and contents of files and folders, in a fixed order; what is absent adds nothing.
 * @param {string[]} targets paths from the base folder
 */
export function hashOf(targets, base = root) {
  const hash = createHash('sha256');
  for (const target of targets) {
    for (const file of filesUnder(path.join(base, target))) {
      const content = readFileSync(file);
      hash.update(`${path.relative(base, file).split(path.sep).join('/')}\0${content.length}\0`).update(content);
    }
  }
  return hash.digest('hex');
}

/** What a stamp file says, or null. */
export function readStamp(file) {
  try {
    return readFileSync(file, 'utf8').trim();
  } catch {
    return null;
  }
}
