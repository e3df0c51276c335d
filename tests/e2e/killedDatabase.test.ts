import { chmodSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { CaseResponse, RevisionResponse, RevisionsResponse } from '@/shared/contracts/cases';
import type { ProblemBody } from '@/shared/contracts/problem';
import { cinnamate } from '../helpers/caseContent';
import { makeScene } from '../helpers/people';
import { loadScript } from '../helpers/scripts';

const { openDatabase } = loadScript<typeof import('../../scripts/lib/database.mjs')>('database.mjs');
const { serverCommand, serverEnv, startServer } = loadScript<typeof import('../../scripts/lib/server.mjs')>('server.mjs');
const { freePort } = loadScript<typeof import('../../scripts/lib/port.mjs')>('port.mjs');

type Database = Awaited<ReturnType<typeof openDatabase>>;
let folder: string;
let database: Database;
let address: string;
let server: Awaited<ReturnType<typeof startServer>>;

// a database and a server of its own: no other test may lose its ground
beforeAll(async () => {
  folder = mkdtempSync(path.join(tmpdir(), 'throughbond-kill-'));
  chmodSync(folder, 0o711); // the database's user must pass through
  const dataDir = path.join(folder, 'data');
  database = await openDatabase(dataDir);
  await serverCommand(['migrate'], serverEnv({ ...database, dataDir }));
  const port = await freePort();
  address = `http://localhost:${port}`;
  server = await startServer({ port, quiet: true, env: serverEnv({ dataDir, appUrl: database.appUrl, ownerUrl: undefined, port }) as NodeJS.ProcessEnv });
}, 240_000);
afterAll(async () => {
  await server?.stop();
  await database?.stop();
  rmSync(folder, { recursive: true, force: true });
});

const AT_ONCE = 6;

it('loses no save that was acknowledged when MariaDB is killed in the middle of many', async () => {
  const { projectId, people: { author } } = await makeScene({ author: 'chemist' }, {}, database.appUrl);
  let cookie = '';
  const ask = async <T>(method: string, target: string, body?: object): Promise<{ status: number; type: string; body: T }> => {
    const response = await fetch(`${address}${target}`, { method, headers: { 'content-type': 'application/json', ...(cookie === '' ? {} : { cookie }) }, body: body && JSON.stringify(body), signal: AbortSignal.timeout(30_000) });
    const set = response.headers.getSetCookie()[0];
    if (set) cookie = set.split(';')[0]!;
    return { status: response.status, type: response.headers.get('content-type') ?? '', body: await response.json() as T };
  };
  expect((await ask('POST', '/api/session', { email: author.email, password: author.password })).status).toBe(200);
  const cases = await Promise.all(Array.from({ length: AT_ONCE }, async () => (await ask<CaseResponse>('POST', '/api/cases', { projectId, question: 'Which?' })).body));

  /** What the server said it had saved: case, revision, the value typed. */
  const acknowledged: { id: string; revision: number; j: string }[] = [];
  const refused: { status: number; type: string; body: ProblemBody }[] = [];
  let killedAt = Infinity;
  let backAgain = false;
  let going = true;
  let broken = '';
  /** Saves one case over and over, as an editor does: after a refusal it reads where the case stands and goes on. */
  const saver = async ({ id, version }: CaseResponse, lane: number) => {
    for (let count = 0, seen = version; going; count += 1) {
      const j = `${lane + 1}.${String(count).padStart(4, '0')}`;
      const content = cinnamate({ readings: [{ ...cinnamate().readings[0]!, j }], calculations: [], candidates: [], answer: null });
      const answer = await ask<CaseResponse>('PUT', `/api/cases/${id}`, { seenVersion: seen, content });
      if (answer.status === 200) {
        acknowledged.push({ id, revision: answer.body.revision, j });
        seen = answer.body.version;
        if (acknowledged.length > killedAt + 30) backAgain = true;
        continue;
      }
      refused.push({ ...answer, body: answer.body as unknown as ProblemBody });
      await new Promise((resolve) => setTimeout(resolve, 100));
      const present = await ask<CaseResponse>('GET', `/api/cases/${id}`);
      if (present.status === 200) seen = present.body.version;
      else refused.push({ ...present, body: present.body as unknown as ProblemBody });
    }
  };
  const savers = Promise.all(cases.map(saver));
  savers.catch((error: Error) => { going = false; broken = `${error.message}, ${error.cause instanceof Error ? error.cause.message : ''}`; }); // told below, with what the server said
  const reached = async (what: () => boolean, why: string) => {
    for (const end = Date.now() + 60_000; !what();) {
      if (broken !== '') throw new Error(`${why}: ${broken}; the server said: ${server.output().slice(-1500)}`);
      if (Date.now() > end) { going = false; throw new Error(`${why}: ${acknowledged.length} acknowledged, ${refused.length} refused, last ${JSON.stringify(refused.at(-1))}`); }
      await new Promise((resolve) => setTimeout(resolve, 5));
    }
  };
  await reached(() => acknowledged.length >= 30, 'no saves before the kill');
  const before = database.serverPid?.() ?? 0;
  process.kill(before, 'SIGKILL');
  killedAt = acknowledged.length;
  await reached(() => refused.length > 0, 'the kill was not felt');
  await reached(() => backAgain, 'the server did not go on by itself');
  going = false;
  await savers;
  expect(database.serverPid?.()).not.toBe(before);

  // each refusal said what happened: away for a moment, or the case stands elsewhere because an unanswered save got in
  for (const { status, type, body } of refused) {
    expect([503, 409]).toContain(status);
    expect(type).toContain('application/problem+json');
    expect(body.detail).not.toBe('');
  }
  for (const { id } of cases) {
    const { body: { revisions } } = await ask<RevisionsResponse>('GET', `/api/cases/${id}/revisions`);
    const numbers = revisions.map(({ number }) => number).sort((a, b) => a - b);
    expect(numbers).toEqual(numbers.map((_, at) => at + 1)); // no hole, nothing twice
    const own = acknowledged.filter((each) => each.id === id);
    expect(own.length).toBeGreaterThan(0);
    for (const { revision, j } of [...own.filter((_, at) => at % 7 === 0), own.at(-1)!, ...own.slice(-6)]) {
      const { body } = await ask<RevisionResponse>('GET', `/api/cases/${id}/revisions/${revision}`);
      expect([revision, body.content.readings[0]?.j]).toEqual([revision, j]);
    }
    for (const { revision } of own) expect(numbers).toContain(revision);
  }
}, 240_000);
