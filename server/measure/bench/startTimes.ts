import { type ChildProcess, execFile, spawn } from 'node:child_process';
import { chmod, mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';

import { freePort, projectRoot } from '../lib/productServer';
import { Refusal } from '../lib/refusal';
import { type Figure, median, rounded, tell } from './figure';

const run = promisify(execFile);
const RESTARTS = 3;
const READY = 'Throughbond is ready at';
const FRESH_WITHIN_MS = 30 * 60_000;

/** From `npm start` to the line with the address, on data that is there already. */
export async function restart(): Promise<Figure[]> {
  const folder = await openFolder('restart');
  try {
    const dataDir = path.join(folder, 'data');
    tell('restart: a first start, which makes the data');
    await (await start(projectRoot(), dataDir)).stop();
    const seconds: number[] = [];
    for (let round = 0; round < RESTARTS; round += 1) {
      const started = await start(projectRoot(), dataDir);
      seconds.push(started.seconds);
      await started.stop();
      tell(`restart: ${round + 1} of ${RESTARTS}`);
    }
    return [{ name: 'restart-s', value: rounded(median(seconds)), unit: 's', runs: RESTARTS }];
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}

/** From a fresh clone, without node modules, to the line with the address; the Debian packages of this machine stay as they are. */
export async function freshStart(): Promise<Figure[]> {
  const folder = await openFolder('fresh');
  try {
    const clone = path.join(folder, 'clone');
    await run('git', ['clone', '--quiet', projectRoot(), clone]);
    tell('fresh start: installing, building and loading the demo; this takes minutes');
    const started = await start(clone, path.join(folder, 'data'));
    await started.stop();
    return [{ name: 'start-fresh-s', value: rounded(started.seconds), unit: 's', runs: 1 }];
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}

async function openFolder(name: string): Promise<string> {
  const folder = await mkdtemp(path.join(tmpdir(), `throughbond-${name}-`));
  await chmod(folder, 0o711); // the database's user must pass through
  return folder;
}

interface Started {
  seconds: number;
  stop: () => Promise<void>;
}

async function start(checkout: string, dataDir: string): Promise<Started> {
  const port = await freePort();
  const env: NodeJS.ProcessEnv = { ...process.env, PORT: String(port), DATA_DIR: dataDir };
  // the bench's own private database must not be taken for a database that the person named
  for (const name of ['DATABASE_URL', 'DATABASE_OWNER_URL', 'DIST_DIR', 'NODE_ENV', 'PROJECT_ROOT']) delete env[name];
  const begun = process.hrtime.bigint();
  const child = spawn(process.execPath, [path.join(checkout, 'scripts', 'start.mjs')], { cwd: checkout, env, stdio: ['ignore', 'pipe', 'pipe'] });
  await ready(child);
  const seconds = Number(process.hrtime.bigint() - begun) / 1e9;
  return { seconds, stop: () => stop(child) };
}

function ready(child: ChildProcess): Promise<void> {
  return new Promise((resolve, reject) => {
    let output = '';
    const late = setTimeout(() => {
      child.kill('SIGTERM');
      reject(new Refusal(`npm start was not ready within ${FRESH_WITHIN_MS / 60_000} minutes: ${output.slice(-600)}`));
    }, FRESH_WITHIN_MS);
    const read = (chunk: Buffer): void => {
      output += chunk.toString('utf8');
      if (!output.includes(READY)) return;
      clearTimeout(late);
      resolve();
    };
    child.stdout?.on('data', read);
    child.stderr?.on('data', read);
    child.once('exit', (code) => {
      clearTimeout(late);
      reject(new Refusal(`npm start ended with exit code ${code}: ${output.slice(-600)}`));
    });
  });
}

async function stop(child: ChildProcess): Promise<void> {
  if (child.exitCode !== null) return;
  const ended = new Promise<void>((resolve) => child.once('exit', () => resolve()));
  child.kill('SIGINT');
  await ended;
}
