import { type ChildProcess, spawn } from 'node:child_process';
import { createServer } from 'node:net';
import path from 'node:path';
import { setTimeout as pause } from 'node:timers/promises';

import { Refusal } from './refusal';

const READY_WITHIN_MS = 60_000;
const STOP_WITHIN_MS = 3_000;

export interface RunningServer {
  url: string;
  port: number;
  pid: number;
  stop(): Promise<void>;
}

/** A setting that the wrapper script hands over. */
export function setting(name: 'PROJECT_ROOT' | 'DATABASE_URL' | 'DATABASE_OWNER_URL'): string {
  const value = (process.env as Record<string, string | undefined>)[name];
  if (value === undefined || value === '') throw new Refusal(`${name} is missing: run this through npm run check, score or bench.`);
  return value;
}

/** The checkout that the wrapper script started us from. */
export const projectRoot = (): string => setting('PROJECT_ROOT');

/** A port of the loopback address that nobody listens on at this moment. */
export function freePort(): Promise<number> {
  return new Promise((resolve, reject) => {
    const server = createServer();
    server.on('error', reject);
    server.listen(0, '127.0.0.1', () => {
      const address = server.address();
      server.close(() => (address !== null && typeof address === 'object' ? resolve(address.port) : reject(new Error('no port'))));
    });
  });
}

/** Everything still running, so that a stop signal leaves no process behind. */
const running = new Set<ChildProcess>();
export async function stopAll(): Promise<void> {
  await Promise.all([...running].map(stopChild));
}

export async function stopChild(child: ChildProcess): Promise<void> {
  running.delete(child);
  if (child.exitCode !== null || child.signalCode !== null) return;
  const ended = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  child.kill('SIGTERM');
  const late = await Promise.race([ended.then(() => false), pause(STOP_WITHIN_MS, true, { ref: false })]);
  if (late) child.kill('SIGKILL');
  await ended;
}

/** Starts a program and remembers it; its own lines go to our stderr only when it fails. */
export function startChild(args: string[], env: NodeJS.ProcessEnv, cwd: string): { child: ChildProcess; output: () => string } {
  const child = spawn(process.execPath, args, { env, cwd, stdio: ['ignore', 'pipe', 'pipe'] });
  running.add(child);
  child.once('exit', () => running.delete(child));
  let output = '';
  const keep = (chunk: Buffer): void => {
    output = (output + chunk.toString('utf8')).slice(-20_000);
  };
  child.stdout.on('data', keep);
  child.stderr.on('data', keep);
  return { child, output: () => output };
}

/** The built product on a free loopback port, in a process of its own, ready when /api/health answers. */
export async function startProduct(extra: Record<string, string> = {}): Promise<RunningServer> {
  const root = projectRoot();
  const port = await freePort();
  const { child, output } = startChild([path.join(root, 'build', 'server.mjs')], { ...process.env, PORT: String(port), ...extra }, root);
  return untilReady(child, output, port, '/api/health');
}

/** Waits until an address of this process answers. */
export async function untilReady(child: ChildProcess, output: () => string, port: number, probe: string): Promise<RunningServer> {
  const url = `http://127.0.0.1:${port}`;
  for (const until = Date.now() + READY_WITHIN_MS; Date.now() < until; await pause(40)) {
    if (child.exitCode !== null) throw new Refusal(`The server ended at its start: ${output().trim().slice(-600)}`);
    try {
      const answer = await fetch(`${url}${probe}`, { signal: AbortSignal.timeout(2000) });
      await answer.arrayBuffer();
      if (answer.ok) return { url, port, pid: child.pid ?? 0, stop: () => stopChild(child) };
    } catch {
      // not listening yet
    }
  }
  await stopChild(child);
  throw new Refusal(`The server did not answer within a minute: ${output().trim().slice(-600)}`);
}
