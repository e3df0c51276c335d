import { randomUUID } from 'node:crypto';

import { projectRoot, type RunningServer, startProduct } from '../lib/productServer';
import { Refusal } from '../lib/refusal';
import { COMMON_WORD, fillLog, LOG_EMAIL, LOG_PASSWORD, makeSchema, SEARCHED } from './caseLogData';
import { atMost, type Figure, median, rounded, tell } from './figure';

const SMALL = 100;
const LARGE = 10_000;
const ROUNDS = 60;
const WARM_UP = 10;

interface Log {
  server: RunningServer;
  cookie: string;
}

/**
 * First page and search of a log of 10,000 cases against one of 100, each in a schema and behind a server of its own, asked in
 * turn. The search finds the same 30 cases in both; a word that a third of all cases hold is told beside it.
 */
export async function caseLog(): Promise<Figure[]> {
  const logs: Log[] = [];
  try {
    for (const count of [SMALL, LARGE]) {
      tell(`case log: writing ${count} cases`);
      logs.push(await openLog(count));
    }
    const [small, large] = logs as [Log, Log];
    const paths = { firstPage: '/api/cases', search: `/api/cases?q=${SEARCHED}`, commonWord: `/api/cases?q=${COMMON_WORD}` };
    const ratio = { firstPage: 0, search: 0, commonWord: 0 };
    const detail: Record<string, number> = {};
    for (const [name, path] of Object.entries(paths) as [keyof typeof paths, string][]) {
      const times: { small: number[]; large: number[] } = { small: [], large: [] };
      for (let round = 0; round < WARM_UP + ROUNDS; round += 1) {
        const smallMs = await timed(small, path);
        const largeMs = await timed(large, path);
        if (round < WARM_UP) continue;
        times.small.push(smallMs);
        times.large.push(largeMs);
      }
      ratio[name] = median(times.large) / median(times.small);
      detail[`${name}Ratio`] = rounded(ratio[name]);
      detail[`${name}Ms`] = rounded(median(times.large));
      detail[`${name}SmallMs`] = rounded(median(times.small));
    }
    const worse = Math.max(ratio.firstPage, ratio.search);
    return [{ name: 'case-log-10k-ratio', value: rounded(worse), unit: 'of a log of 100 cases, the worse of first page and search', runs: ROUNDS, ...atMost(1.5, worse), ...detail }];
  } finally {
    for (const { server } of logs) await server.stop();
  }
}

async function openLog(count: number): Promise<Log> {
  const schema = await makeSchema(`throughbond_bench_${randomUUID().slice(0, 8)}`, projectRoot());
  await fillLog(schema.ownerUrl, count);
  const server = await startProduct({ DATABASE_URL: schema.appUrl });
  const answer = await fetch(`${server.url}/api/session`, {
    method: 'POST', headers: { 'content-type': 'application/json' }, body: JSON.stringify({ email: LOG_EMAIL, password: LOG_PASSWORD }),
  });
  const cookie = answer.headers.getSetCookie().map((line) => line.split(';')[0]).join('; ');
  if (!answer.ok || cookie === '') throw new Refusal(`Signing in to the bench's own log failed: ${answer.status} ${(await answer.text()).slice(0, 300)}`);
  const page = (await (await fetch(`${server.url}/api/cases`, { headers: { cookie } })).json()) as { total?: number };
  if (page.total !== count) throw new Refusal(`The log holds ${String(page.total)} cases, not ${count}.`);
  return { server, cookie };
}

async function timed({ server, cookie }: Log, path: string): Promise<number> {
  const begun = process.hrtime.bigint();
  const answer = await fetch(`${server.url}${path}`, { headers: { cookie } });
  const page = (await answer.json()) as { cases?: unknown[] };
  const ms = Number(process.hrtime.bigint() - begun) / 1e6;
  if (answer.status !== 200 || page.cases?.length !== 25) throw new Error(`${path} answered ${answer.status} with ${String(page.cases?.length)} cases, not a full page.`);
  return ms;
}
