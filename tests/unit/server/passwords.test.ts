import path from 'node:path';
import { pathToFileURL } from 'node:url';
import bcrypt from 'bcryptjs';

import { passwordPool, prepared } from '@/server/auth/passwords';
import { startThread } from '@/server/threads';

const file = pathToFileURL(path.resolve(__dirname, '../../../server/workers/passwords.ts'));
const started: ReturnType<typeof startThread>[] = [];
const pool = passwordPool({
  start: () => {
    const thread = startThread(file);
    started.push(thread);
    return thread;
  },
  lanes: 2, cost: 4,
});
afterAll(() => pool.close());

it('hashes in threads, each time with a salt of its own', async () => {
  const [one, other] = await Promise.all([pool.hash('seven bonds apart'), pool.hash('seven bonds apart')]);
  expect(one).toMatch(/^\$2[aby]\$04\$/);
  expect(other).not.toBe(one);
  expect(await pool.matches('seven bonds apart', one)).toBe(true);
  expect(await pool.matches('seven bonds apart ', one)).toBe(false);
  expect(await bcrypt.compare(prepared('seven bonds apart'), other)).toBe(true);
  expect(started).toHaveLength(2);
});

it('reads a long pass phrase to its end', async () => {
  const long = 'x'.repeat(100);
  const stored = await pool.hash(`${long}a`);
  expect(await pool.matches(`${long}b`, stored)).toBe(false);
});

it('takes an accent typed as one sign or as two for the same', async () => {
  expect(await pool.matches('Ångström units'.normalize('NFD'), await pool.hash('Ångström units'.normalize('NFC')))).toBe(true);
});

it('answers no for a missing account, after a comparison all the same', async () => {
  expect(await pool.matches('anything at all', null)).toBe(false);
});

it('starts a thread anew when one dies, and fails what it was doing', async () => {
  const before = started.length;
  await Promise.all(started.map((thread) => thread.terminate()));
  const stored = await pool.hash('still there');
  expect(await pool.matches('still there', stored)).toBe(true);
  expect(started.length).toBeGreaterThan(before);
});
