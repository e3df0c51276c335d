import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { promisify } from 'node:util';
import { brotliCompress, constants, gzip } from 'node:zlib';

const brotli = promisify(brotliCompress);
const zip = promisify(gzip);
const TEXT = /\.(js|mjs|css|html|svg|json|webmanifest|txt|map|ttf)$/;

/** Files below a folder, as paths relative to it. */
export function listFiles(folder, at = '') {
  return readdirSync(path.join(folder, at), { withFileTypes: true }).flatMap((entry) => {
    const name = path.join(at, entry.name);
    return entry.isDirectory() ? listFiles(folder, name) : [name];
  });
}

/**
 * Writes a .br (brotli 11) and a .gz beside each text file where they are smaller. It belongs to the build: at the
 * start of a server it would cost ten seconds. What was compressed before is taken from the store.
 */
export async function compressFolder(folder, store) {
  const files = listFiles(folder).filter((name) => TEXT.test(name));
  await Promise.all(files.map(async (name) => {
    const file = path.join(folder, name);
    const content = readFileSync(file);
    if (content.length < 512) return;
    const key = path.join(store, createHash('sha256').update(content).digest('hex'));
    const packed = async (ending, pack) => {
      if (existsSync(key + ending)) return readFileSync(key + ending);
      const made = await pack();
      writeFileSync(key + ending, made);
      return made;
    };
    const made = await Promise.all([
      packed('.br', () => brotli(content, { params: { [constants.BROTLI_PARAM_QUALITY]: 11, [constants.BROTLI_PARAM_SIZE_HINT]: content.length } })),
      packed('.gz', () => zip(content, { level: 9 })),
    ]);
    ['.br', '.gz'].forEach((ending, i) => {
      if (made[i].length < content.length) writeFileSync(file + ending, made[i]);
    });
  }));
}
