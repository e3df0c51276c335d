import { linkSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { pause } from './run.mjs';

/**
 * When a process began, in clock ticks since boot: with its number it names a process for good. Null = not alive.
 * @param {number} pid
 * @returns {string | null}
 */
export function startOf(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return fields[0] === 'Z' ? null : fields[19];
  } catch {
    return null;
  }
}

/**
 * What the lock file says if its holder lives.
 * @param {string} file
 * @returns {{ pid: number, began: string, port?: number, address?: string } | null}
 */
export function holderOf(file) {
  try {
    const holder = JSON.parse(readFileSync(file, 'utf8'));
    return startOf(holder.pid) === holder.began ? holder : null;
  } catch {
    return null;
  }
}

/**
 * Takes a lock file for this process. A lock whose holder is gone is taken over.
 * @param {string} file
 * @param {object} [note] what others may read in it, for instance the address
 * @returns {{ held: true, release: () => void, note: (more: object) => void } | { held: false, holder: { pid: number } }}
 */
export function takeLock(file, note = {}) {
  const content = { pid: process.pid, began: startOf(process.pid), ...note };
  const mine = `${file}.${process.pid}`;
  for (let attempt = 0; attempt < 20; attempt += 1) {
    writeFileSync(mine, JSON.stringify(content), { mode: 0o600 });
    try {
      linkSync(mine, file); // creates the name only if it is free, and with its content already in it
      rmSync(mine, { force: true });
      return {
        held: true,
        release: () => { if (holderOf(file)?.pid === process.pid) rmSync(file, { force: true }); },
        note: (more) => {
          Object.assign(content, more);
          writeFileSync(mine, JSON.stringify(content), { mode: 0o600 });
          renameSync(mine, file);
        },
      };
    } catch (error) {
      rmSync(mine, { force: true });
      if (error.code !== 'EEXIST') throw error;
    }
    const holder = holderOf(file);
    if (holder) return { held: false, holder };
    setAside(file);
  }
  throw new Error(`The lock file ${file} could not be taken; remove it if no Throughbond command is running.`);
}

/** Moves a dead lock away; if a quicker process has just renewed it, puts the live one back. */
function setAside(file) {
  const aside = `${file}.stale.${process.pid}`;
  try {
    renameSync(file, aside);
    if (holderOf(aside)) linkSync(aside, file);
  } catch {
    // someone else moved it first: the next attempt sees what stands there now
  }
  rmSync(aside, { force: true });
}

/**
 * Takes the lock, waiting while another command holds it; `onWait` is called once with the holder.
 * @param {string} file
 * @param {{ onWait: (holder: { pid: number }) => void, timeoutMs: number }} options
 * @returns {Promise<{ held: true, release: () => void } | null>} null when the time is over
 */
export async function waitForLock(file, { onWait, timeoutMs }) {
  const until = Date.now() + timeoutMs;
  let told = false;
  for (;;) {
    const lock = takeLock(file);
    if (lock.held) return lock;
    if (!told) onWait(lock.holder);
    told = true;
    if (Date.now() > until) return null;
    await pause(250);
  }
}
