import { createHash, randomUUID } from 'node:crypto';
import { createReadStream, type ReadStream } from 'node:fs';
import { mkdir, open, rename, rm, stat } from 'node:fs/promises';
import path from 'node:path';

/** Files on the disk under their own hash: the same bytes are kept once, and a name from outside never becomes a path. */
export interface Blobs {
  /** Writes whole or not at all, and waits until the disk has it. @returns the SHA-256 of the bytes */
  put: (bytes: Buffer) => Promise<string>;
  /** null when the bytes are not there or not of this length */
  open: (sha256: string, bytes: number) => Promise<ReadStream | null>;
}

/** Two letters of the hash make a folder, so that no folder grows too long. */
const placeOf = (root: string, sha256: string) => path.join(root, sha256.slice(0, 2), sha256);

async function lengthOf(file: string): Promise<number | null> {
  try {
    return (await stat(file)).size;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
    throw error;
  }
}

export function fileBlobs(dataDir: string): Blobs {
  const root = path.join(dataDir, 'attachments');
  return {
    put: async (bytes) => {
      const sha256 = createHash('sha256').update(bytes).digest('hex');
      const place = placeOf(root, sha256);
      if ((await lengthOf(place)) === bytes.length) return sha256;
      await mkdir(path.dirname(place), { recursive: true, mode: 0o700 });
      const half = `${place}.${randomUUID()}`;
      try {
        const file = await open(half, 'wx', 0o600);
        try {
          await file.writeFile(bytes);
          await file.sync();
        } finally {
          await file.close();
        }
        await rename(half, place);
      } catch (error) {
        await rm(half, { force: true });
        throw error;
      }
      return sha256;
    },
    open: async (sha256, bytes) => {
      if (!/^[0-9a-f]{64}$/.test(sha256)) return null;
      const place = placeOf(root, sha256);
      return (await lengthOf(place)) === bytes ? createReadStream(place) : null;
    },
  };
}
