import { spawn } from 'node:child_process';
import { readFileSync } from 'node:fs';
import path from 'node:path';

import { freePort, projectRoot, type RunningServer, startChild, startProduct, untilReady } from '../lib/productServer';
import { atLeast, atMost, type Figure, median, rounded, tell } from './figure';
import type { LoadResult } from './load';

const ROUNDS = 5;
const SECONDS = 5;
/** long enough for the engine's code to be compiled: some 30,000 answers */
const WARM_UP_SECONDS = 15;

const measureProgram = (): string => path.join(projectRoot(), 'build', 'measure.mjs');

/** Product and bare handler in turn, each in a process of its own, loaded by a third; the ratio of each round, then the median. */
export async function quickLookLoad(): Promise<Figure[]> {
  const bare = await startBare();
  const product = await startProduct();
  try {
    tell('quick look under load: warming up');
    await load(bare.url, WARM_UP_SECONDS);
    await load(product.url, WARM_UP_SECONDS);
    const rounds: { bare: LoadResult; product: LoadResult }[] = [];
    for (let round = 0; round < ROUNDS; round += 1) {
      // which one goes first changes each round, so that a slow minute of the machine hits both
      const first = round % 2 === 0 ? bare : product;
      const one = await load(first.url, SECONDS);
      const other = await load((first === bare ? product : bare).url, SECONDS);
      rounds.push(first === bare ? { bare: one, product: other } : { bare: other, product: one });
      tell(`quick look under load: round ${round + 1} of ${ROUNDS}`);
    }
    const rps = median(rounds.map((round) => round.product.rps / round.bare.rps));
    const p99 = median(rounds.map((round) => Math.max(1, round.product.p99Ms) / Math.max(1, round.bare.p99Ms)));
    const detail = {
      rps: rounded(median(rounds.map((round) => round.product.rps))), bareRps: rounded(median(rounds.map((round) => round.bare.rps))),
      p99Ms: median(rounds.map((round) => round.product.p99Ms)), bareP99Ms: median(rounds.map((round) => round.bare.p99Ms)),
    };
    const rss = residentMb(product.pid);
    return [
      { name: 'quick-look-rps-ratio', value: rounded(rps), unit: 'of a bare handler', runs: ROUNDS, ...atLeast(0.4, rps), ...detail },
      { name: 'quick-look-p99-ratio', value: rounded(p99), unit: 'of a bare handler', runs: ROUNDS, ...atMost(3, p99), ...detail },
      { name: 'server-rss-mb', value: rss, unit: 'MB', runs: 1, when: `after ${WARM_UP_SECONDS + ROUNDS * SECONDS} s of quick looks at 20 connections` },
    ];
  } finally {
    await product.stop();
    await bare.stop();
  }
}

async function startBare(): Promise<RunningServer> {
  const port = await freePort();
  const { child, output } = startChild([measureProgram(), 'child:bare', String(port)], process.env, projectRoot());
  return untilReady(child, output, port, '/ready');
}

function load(url: string, seconds: number): Promise<LoadResult> {
  return new Promise((resolve, reject) => {
    const child = spawn(process.execPath, [measureProgram(), 'child:load', url, String(seconds)], { stdio: ['ignore', 'pipe', 'inherit'] });
    let output = '';
    child.stdout.on('data', (chunk: Buffer) => { output += chunk.toString('utf8'); });
    child.once('error', reject);
    child.once('exit', (code) => (code === 0 ? resolve(JSON.parse(output) as LoadResult) : reject(new Error(`The load on ${url} failed.`))));
  });
}

/** Resident memory of a process, from /proc. */
export function residentMb(pid: number): number {
  const match = /^VmRSS:\s+(\d+) kB$/m.exec(readFileSync(`/proc/${pid}/status`, 'utf8'));
  if (match === null) throw new Error('No VmRSS in /proc.');
  return Math.round(Number(match[1]) / 1024);
}
