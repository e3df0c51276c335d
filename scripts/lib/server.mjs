import { spawn } from 'node:child_process';
import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { distDir } from './buildClient.mjs';
import { serverStamp } from './buildServer.mjs';
import { SetupError, step } from './log.mjs';
import { inRoot, root } from './paths.mjs';
import { pause, run, tail } from './run.mjs';

/** Settings of this product that pass from the person's environment to the server as they are. */
const PASSED = ['DEMO', 'TRUST_PROXY', 'PUBLIC_URL', 'SMTP_URL', 'MAIL_FROM'];

/** The environment of the server and its commands. Only commands that change the schema get the owner's address. */
export function serverEnv({ dataDir, appUrl, ownerUrl, port, extra = {} }) {
  const env = { ...process.env, NODE_ENV: 'production', DIST_DIR: distDir(), DATA_DIR: dataDir, DATABASE_URL: appUrl, ...extra };
  for (const name of PASSED) if (env[name] === '') delete env[name];
  if (port !== undefined) env.PORT = String(port);
  if (ownerUrl) env.DATABASE_OWNER_URL = ownerUrl;
  else delete env.DATABASE_OWNER_URL;
  return env;
}

export const builtServer = () => inRoot('build', 'server.mjs');

/** Runs a command of the server (`migrate`, `demo load`, …); a failure ends with what it said. */
export async function serverCommand(args, env, { show = false } = {}) {
  const { code, output } = await run(process.execPath, [builtServer(), ...args], { env, stdio: show ? 'show' : 'collect' });
  if (code !== 0) throw new SetupError(show ? 'Nothing was changed; the line above says why.' : tail(output, 12) || `The command "${args.join(' ')}" failed with exit code ${code}.`);
  return output;
}

/** Brings the schema up to date; on a private database only when the server changed since the last time. */
export async function migrate({ dataDir, db, external = false }) {
  const stampFile = path.join(dataDir, 'migrated');
  const stamp = serverStamp() ?? '';
  if (!external) {
    if (db.fresh) rmSync(stampFile, { force: true });
    if (existsSync(stampFile) && readFileSync(stampFile, 'utf8') === stamp) return;
  }
  await step('Bringing the database schema up to date', () => serverCommand(['migrate'], serverEnv({ dataDir, ...db })));
  if (!external) writeFileSync(stampFile, stamp);
}

/** Loads the demo at the first start of a private database (DEMO=0 leaves it out) or when DEMO=1 asks for it. */
export async function loadDemo({ dataDir, db, external = false, demo = process.env.DEMO }) {
  const pending = path.join(dataDir, 'first-start'); // stands until the first start got this far, crash or not
  if (!external && db.fresh) writeFileSync(pending, '');
  const first = !external && existsSync(pending);
  if (demo === '1' || (first && demo !== '0')) {
    await step('Loading the demo', () => serverCommand(['demo', 'load'], serverEnv({ dataDir, ...db })));
  }
  rmSync(pending, { force: true });
}

/**
 * Starts a server process and waits until /api/health answers.
 * @param {{ env: NodeJS.ProcessEnv, port: number, args?: string[], quiet?: boolean, onSpawn?: (stop: () => Promise<void>) => void }} options
 *   args: how node starts it, default the built server; quiet: keep its lines, show them only if it fails; onSpawn: gets the way to stop it as soon as it exists
 * @returns {Promise<{ child: import('node:child_process').ChildProcess, ended: Promise<number>, stop: () => Promise<void>, output: () => string }>}
 */
export async function startServer({ env, port, args = [builtServer()], quiet = false, onSpawn }) {
  const follow = inRoot('scripts', 'lib', 'followParent.mjs');
  const child = spawn(process.execPath, ['--import', follow, ...args], {
    cwd: root, env, detached: true, // its own group: Ctrl-C reaches it in our order, before the database
    stdio: ['ignore', quiet ? 'pipe' : 'inherit', quiet ? 'pipe' : 'inherit', 'ipc'],
  });
  let output = '';
  for (const stream of [child.stdout, child.stderr]) stream?.setEncoding('utf8').on('data', (text) => { output = (output + text).slice(-200_000); });
  let over = false;
  const ended = new Promise((resolve) => {
    child.once('error', () => resolve(1));
    child.once('exit', (code) => resolve(code ?? 1));
  });
  void ended.then(() => { over = true; });
  const stop = async () => {
    if (over) return;
    child.kill('SIGTERM');
    const patience = setTimeout(() => child.kill('SIGKILL'), 1500);
    await ended;
    clearTimeout(patience);
  };
  onSpawn?.(stop);
  for (const until = Date.now() + 60_000; ;) {
    if (over) throw new SetupError(quiet ? `The server ended at its start:\n${tail(output)}` : 'The server ended at its start; its own lines above say why.');
    if (Date.now() > until) {
      await stop();
      throw new SetupError(`The server did not answer on port ${port} within a minute.${quiet ? `\n${tail(output)}` : ''}`);
    }
    try {
      const answer = await fetch(`http://127.0.0.1:${port}/api/health`, { signal: AbortSignal.timeout(2000) });
      if (answer.ok) break;
    } catch {
      // not listening yet
    }
    await pause(40);
  }
  return { child, ended, stop, output: () => output };
}
