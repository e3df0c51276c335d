import { execFile } from 'node:child_process';
import { randomUUID } from 'node:crypto';
import path from 'node:path';
import { promisify } from 'node:util';

import bcrypt from 'bcryptjs';
import { createConnection } from 'mariadb';

import { prepared } from '@/server/auth/passwords';
import { answer, conditions, content, doubleBond, eAndZ, G, reading } from '@/server/db/demo/content/build';
import { contentHash } from '@/server/features/cases/hash';
import { listingOf, searchTextOf } from '@/server/features/cases/listing';
import { relationRegistry } from '@/server/relations/registry';
import { canonicalJson, caseTrail } from '@/shared/engine';
import type { CaseContent } from '@/shared/types/case';

import { setting } from '../lib/productServer';
import { drawFrom } from '../lib/draw';

const run = promisify(execFile);

export const LOG_EMAIL = 'bench@team.example';
export const LOG_PASSWORD = 'bench-of-the-log';
/** stands in the first 30 cases of either log: the answer has the same size, so that the size of the log is what differs */
export const SEARCHED = 'palladium';
const WITH_SEARCHED = 30;
/** stands in every third case: 34 hits in the small log, 3,334 in the large one, all of which are counted */
export const COMMON_WORD = 'amide';

const BATCH = 500;

/** A migrated schema beside the one that the wrapper script made, with the same two users. */
export async function makeSchema(name: string, root: string): Promise<{ appUrl: string; ownerUrl: string }> {
  const at = (url: string): string => {
    const moved = new URL(url);
    moved.pathname = `/${name}`;
    return moved.toString();
  };
  const connection = await createConnection(setting('DATABASE_OWNER_URL'));
  try {
    await connection.query(`CREATE DATABASE \`${name}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci`);
  } finally {
    await connection.end();
  }
  const urls = { appUrl: at(setting('DATABASE_URL')), ownerUrl: at(setting('DATABASE_OWNER_URL')) };
  await run(process.execPath, [path.join(root, 'build', 'server.mjs'), 'migrate'], { cwd: root, env: { ...process.env, DATABASE_URL: urls.appUrl, DATABASE_OWNER_URL: urls.ownerUrl } });
  return urls;
}

/** One person, one project, and `count` cases with content, trail, hash and search text as the product writes them. */
export async function fillLog(ownerUrl: string, count: number): Promise<void> {
  const registry = relationRegistry();
  const connection = await createConnection(ownerUrl);
  const now = new Date();
  const [userId, projectId] = [randomUUID(), randomUUID()];
  try {
    await connection.query('INSERT INTO users (id, email, name, password_hash, created_at, updated_at) VALUES (?, ?, ?, ?, ?, ?)',
      [userId, LOG_EMAIL, 'Bench', await bcrypt.hash(prepared(LOG_PASSWORD), 4), now, now]);
    await connection.query('INSERT INTO projects (id, project_key, name, next_case_number, created_by, created_at, updated_at) VALUES (?, ?, ?, ?, ?, ?, ?)',
      [projectId, 'BEN', 'Bench log', count + 1, userId, now, now]);
    await connection.query('INSERT INTO memberships (project_id, user_id, role, joined_at) VALUES (?, ?, ?, ?)', [projectId, userId, 'lead', now]);
    for (let from = 0; from < count; from += BATCH) {
      const rows = Array.from({ length: Math.min(BATCH, count - from) }, (_, index) => caseOf(from + index));
      const written = rows.map((one, index) => {
        const number = from + index + 1;
        const code = `BEN-${String(number).padStart(4, '0')}`;
        const trail = caseTrail(one, registry);
        const [contentText, trailText] = [canonicalJson(one), canonicalJson(trail)];
        const listing = listingOf(one, trail);
        const at = new Date(now.getTime() - (count - number) * 60_000);
        return { id: randomUUID(), number, code, at, listing, contentText, trailText, hash: contentHash(contentText, trailText, []), engine: trail.engineVersion, search: searchTextOf(code, 'Bench', one, listing), tags: one.tags };
      });
      await connection.batch(
        `INSERT INTO cases (id, project_id, number, code, code_order, author_id, question, content_hash, compound, batch, notebook, key_label, key_j_text,
           answer_grade, answer_text, answer_judged, created_at, changed_at, changed_by_id, search_text) VALUES (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)`,
        written.map(({ id, number, code, at, listing, hash, search }) => [id, projectId, number, code, `BEN${String(number).padStart(10, '0')}`, userId, listing.question, hash, listing.compound,
          listing.batch, listing.notebook, listing.keyLabel, listing.keyJText, listing.answerGrade, listing.answerText, listing.answerJudged ? 1 : 0, at, at, userId, search]));
      await connection.batch(
        'INSERT INTO case_revisions (case_id, number, content, trail, content_hash, engine_version, saved_by_id, saved_by_name, saved_at) VALUES (?, 1, ?, ?, ?, ?, ?, ?, ?)',
        written.map(({ id, contentText, trailText, hash, engine, at }) => [id, contentText, trailText, hash, engine, userId, 'Bench', at]));
      await connection.batch('INSERT INTO case_tags (case_id, project_id, tag) VALUES (?, ?, ?)', written.flatMap(({ id, tags }) => tags.map((tag) => [id, projectId, tag])));
    }
    // a log that grew over years has statistics; one that was written in a minute has none yet
    await connection.query('ANALYZE TABLE cases, case_tags, case_counts');
  } finally {
    await connection.end();
  }
}

/** Cases that differ in name, batch, number and tag as a log of years would. */
function caseOf(index: number): CaseContent {
  const draw = drawFrom(index + 1);
  const one = <T>(list: readonly T[]): T => list[Math.floor(draw() * list.length)] as T;
  const kind = index % 3 === 0 ? 'amide' : one(['ester', 'nitrile', 'ketone', 'acid']);
  const jHz = (10 + draw() * 7).toFixed(1);
  const decided = Number(jHz) >= 14.5;
  return content({
    question: `${one(['Styryl', 'Crotyl', 'Cinnamyl', 'Dienyl'])} ${kind} ${index + 1}: E or Z?`,
    compound: { name: `${one(['N-benzyl', 'N-isobutyl', '4-fluoro', '2-methoxy'])}-${one(['phenyl', 'pyridyl', 'thienyl', 'naphthyl'])}propenoic ${kind} ${index + 1}`, batch: `B-${1000 + index}`, notebook: `NB-${Math.floor(index / 20)}-${index % 20}`, structureNote: index < WITH_SEARCHED ? 'Made with palladium on carbon.' : 'Made without a metal.' },
    conditions: conditions('500.13', one(['CDCl3', 'DMSO-d6', 'CD3OD'])),
    readings: [reading('r1', ['H-2', 'H-3'], jHz, { partner: jHz })],
    calculations: [doubleBond('c1', 'r1', { left: [G.aryl, G.h], right: [G.amide, G.h] })],
    candidates: eAndZ(),
    answer: decided ? answer('assigned', 'e', 'E.', 'Inside the trans class.') : answer('not-decided', null, 'Not decided.', 'In the open band.'),
    tags: [kind, one(['crude', 'pure', 'repeat'])],
  });
}
