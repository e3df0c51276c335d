import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import path from 'node:path';

/** Reads the named secret of a data directory, making a random one in a file that only its owner can read. */
export function secretOf(dataDir, name) {
  const folder = path.join(dataDir, 'secrets');
  const file = path.join(folder, name);
  if (!existsSync(file)) {
    mkdirSync(folder, { recursive: true, mode: 0o700 });
    const half = `${file}.${process.pid}`;
    writeFileSync(half, randomBytes(24).toString('base64url'), { mode: 0o600 });
    renameSync(half, file); // whole or not at all, even if the process dies here
  }
  return readFileSync(file, 'utf8').trim();
}
