import { createInterface } from 'node:readline/promises';
import { Writable } from 'node:stream';
import { SetupError } from './log.mjs';

/** Whether there is a person at the other end who can be asked. */
export const canAsk = () => Boolean(process.stdin.isTTY && process.stderr.isTTY);

/**
 * Asks one question on the terminal.
 * @param {string} question
 * @param {{ hidden?: boolean }} [options] hidden: what is typed is not shown
 */
export async function ask(question, { hidden = false } = {}) {
  let muted = false;
  const output = new Writable({
    write(chunk, encoding, done) {
      if (!muted) process.stderr.write(chunk, encoding);
      done();
    },
  });
  const lines = createInterface({ input: process.stdin, output, terminal: true });
  const closed = new Promise((_resolve, reject) => { lines.once('SIGINT', () => reject(new SetupError('Nothing was changed.'))); });
  try {
    const answer = lines.question(question);
    muted = hidden;
    return (await Promise.race([answer, closed])).trim();
  } finally {
    if (hidden) process.stderr.write('\n');
    lines.close();
  }
}

/** A new password, typed twice without being shown. */
export async function askPassword(question) {
  for (;;) {
    const first = await ask(question, { hidden: true });
    if (first === await ask('The same once more: ', { hidden: true })) return first;
    process.stderr.write('The two differ; type it again.\n');
  }
}
