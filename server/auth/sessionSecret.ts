import { randomBytes } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import path from 'node:path';

/** The key that signs session cookies: random, made once, in a file of the data directory that only its owner can read. */
export function sessionSecret(dataDir: string): string {
  const folder = path.join(dataDir, 'secrets');
  const file = path.join(folder, 'session');
  if (!existsSync(file)) {
    mkdirSync(folder, { recursive: true, mode: 0o700 });
    const half = `${file}.${process.pid}`;
    writeFileSync(half, randomBytes(32).toString('base64url'), { mode: 0o600 });
    renameSync(half, file); // whole or not at all, even if the process ends here
  }
  return readFileSync(file, 'utf8').trim();
}
