import { createHash, randomBytes } from 'node:crypto';
import type { Worker } from 'node:worker_threads';

/** Slow on purpose: about a quarter of a second each, so it runs beside the event loop. */
export interface Passwords {
  hash: (password: string) => Promise<string>;
  /** with `stored` null (no such account) it takes as long and answers no */
  matches: (password: string, stored: string | null) => Promise<boolean>;
  close: () => Promise<void>;
}

export type PasswordTask = { act: 'hash'; text: string; cost: number } | { act: 'compare'; text: string; stored: string };
export type PasswordReply = { id: number; result: string | boolean } | { id: number; error: string };

/**
 * bcrypt reads 72 bytes and ignores the rest, so a long pass phrase would lose its end: it gets the SHA-256 of the whole
 * text. NFC, because the same letter typed on another keyboard may come as two code points.
 */
export const prepared = (password: string): string => createHash('sha256').update(`throughbond\n${password.normalize('NFC')}`).digest('base64');

/** bcrypt's work factor, 2^12 rounds; a higher one later changes new hashes only, as each hash names its own. */
export const PASSWORD_COST = 12;

interface Waiting {
  resolve: (value: string | boolean) => void;
  reject: (reason: Error) => void;
}

/** One worker thread that is started at its first task and started anew if it dies. */
function lane(start: () => Worker) {
  let worker: Worker | null = null;
  let nextId = 0;
  const waiting = new Map<number, Waiting>();
  const fail = (reason: Error) => {
    worker = null;
    for (const { reject } of waiting.values()) reject(reason);
    waiting.clear();
  };
  const started = (): Worker => {
    if (worker) return worker;
    const fresh = start();
    fresh.unref(); // an idle lane keeps no process up
    fresh.on('message', (reply: PasswordReply) => {
      const task = waiting.get(reply.id);
      waiting.delete(reply.id);
      if (waiting.size === 0) fresh.unref();
      if ('error' in reply) task?.reject(new Error(reply.error));
      else task?.resolve(reply.result);
    });
    fresh.once('error', fail);
    fresh.once('exit', () => {
      if (worker === fresh) fail(new Error('The password worker ended.'));
    });
    worker = fresh;
    return fresh;
  };
  return {
    load: () => waiting.size,
    run: (task: PasswordTask) => new Promise<string | boolean>((resolve, reject) => {
      const id = nextId++;
      waiting.set(id, { resolve, reject });
      const target = started();
      target.ref();
      target.postMessage({ id, ...task });
    }),
    close: async () => {
      await worker?.terminate();
    },
  };
}

/**
 * A small pool; tasks go to the lane with the fewest waiting.
 * @param options.start starts a thread on server/workers/passwords
 */
export function passwordPool({ start, lanes = 2, cost = PASSWORD_COST }: { start: () => Worker; lanes?: number; cost?: number }): Passwords {
  const pool = Array.from({ length: lanes }, () => lane(start));
  const run = (task: PasswordTask): Promise<string | boolean> => {
    const free = pool.reduce((best, one) => (one.load() < best.load() ? one : best));
    return free.run(task);
  };
  const hash = async (password: string): Promise<string> => String(await run({ act: 'hash', text: prepared(password), cost }));
  let decoy: Promise<string> | null = null;
  return {
    hash,
    matches: async (password, stored) => {
      // Unknown address: compare with a hash of the same cost, so that the time tells nothing.
      const against = stored ?? await (decoy ??= hash(randomBytes(24).toString('base64')));
      const same = await run({ act: 'compare', text: prepared(password), stored: against });
      return stored !== null && same === true;
    },
    close: async () => {
      await Promise.all(pool.map((one) => one.close()));
    },
  };
}
