import { spawn } from 'node:child_process';
import { SetupError } from './log.mjs';
import { root } from './paths.mjs';

/** The last lines of a text, for telling why a command failed without flooding the terminal. */
export function tail(text, lines = 25) {
  return text.trimEnd().split('\n').slice(-lines).join('\n');
}

/**
 * Runs a command to its end and returns what it wrote.
 * @param {string} command
 * @param {string[]} args
 * @param {{ cwd?: string, env?: NodeJS.ProcessEnv, stdio?: 'collect' | 'show', account?: { uid: number, gid: number } | null }} [options]
 *   `show` passes the output on to the terminal (stdout as it is) in place of collecting it; `account` runs it as another user
 * @returns {Promise<{ code: number, output: string }>}
 */
export function run(command, args, { cwd = root, env = process.env, stdio = 'collect', account = null } = {}) {
  return new Promise((resolve, reject) => {
    const child = spawn(command, args, { cwd, env, stdio: stdio === 'show' ? 'inherit' : ['ignore', 'pipe', 'pipe'], ...(account ? { uid: account.uid, gid: account.gid } : {}) });
    let output = '';
    const add = (chunk) => {
      output += chunk;
      if (output.length > 4_000_000) output = output.slice(-2_000_000);
    };
    child.stdout?.setEncoding('utf8').on('data', add);
    child.stderr?.setEncoding('utf8').on('data', add);
    child.on('error', reject);
    child.on('close', (code, signal) => resolve({ code: code ?? (signal ? 1 : 0), output }));
  });
}

/** Like run, but a failure ends the set-up with the command's last lines. */
export async function mustRun(what, command, args, options) {
  const { code, output } = await run(command, args, options);
  if (code !== 0) throw new SetupError(`${what} failed (exit code ${code}).\n${tail(output)}`);
  return output;
}

/** A promise that settles after so many milliseconds. */
export const pause = (ms) => new Promise((resolve) => { setTimeout(resolve, ms); });
