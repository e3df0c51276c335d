// Progress goes to stderr: stdout stays free for the one line with the address and for the figures of check, score
// and bench.

/** One line of progress. */
export function say(text) {
  process.stderr.write(`${text}\n`);
}

/** A set-up that cannot go on for a reason the person can mend; its message is one sentence for them. */
export class SetupError extends Error {}

/**
 * Says what is being done, every fifteen seconds that it still is, and how long it took.
 * @template T
 * @param {string} label
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function step(label, work) {
  const began = Date.now();
  const seconds = () => Math.round((Date.now() - began) / 1000);
  say(`${label} …`);
  const pulse = setInterval(() => say(`${label}: still at it after ${seconds()} s`), 15_000);
  try {
    const result = await work();
    if (Date.now() - began >= 1000) say(`${label}: done in ${seconds()} s`);
    return result;
  } finally {
    clearInterval(pulse);
  }
}

/** Ends the process with one sentence for a mistake that can be mended, with the stack for one that cannot. */
export function endWith(error) {
  say(error instanceof SetupError ? error.message : `Unexpected: ${error?.stack ?? error}`);
  process.exit(1);
}
