import { spawn } from 'node:child_process';
import { chmodSync, existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { loadScript } from '../helpers/scripts';
import { withConnection } from '../setup/schemaTemplate.cjs';

const { openDatabase, serversOn } = loadScript<typeof import('../../scripts/lib/database.mjs')>('database.mjs');

let folder: string;
let dataDir: string;
beforeAll(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'throughbond-private-'));
  chmodSync(folder, 0o711); // the database's user must pass through
  dataDir = path.join(folder, 'a folder with blanks');
});
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const query = (url: string, sql: string) => withConnection(url, (connection) => connection.query<Record<string, unknown>[]>({ sql, bigIntAsNumber: true }));
const count = async (url: string) => (await query(url, 'SELECT COUNT(*) AS n FROM kept'))[0]?.n;
const servers = () => serversOn(path.join(dataDir, 'mariadb'));

/** Asks again until the answer comes, for something that is on its way back. */
async function eventually<T>(ask: () => Promise<T>): Promise<T> {
  for (let left = 200; ; left -= 1) {
    try {
      return await ask();
    } catch (error) {
      if (left === 0) throw error;
      await new Promise((resolve) => { setTimeout(resolve, 100); });
    }
  }
}

it('is made, refuses a second start, outlives kill -9, and keeps what it acknowledged', async () => {
  const first = await openDatabase(dataDir);
  expect(first.fresh).toBe(true);
  await query(first.ownerUrl, 'CREATE TABLE kept (id INT AUTO_INCREMENT PRIMARY KEY)');
  await query(first.ownerUrl, 'INSERT INTO kept VALUES (NULL)');

  await expect(openDatabase(dataDir)).rejects.toThrow(new RegExp(`^Throughbond already runs on the data in .+ \\(process ${process.pid}\\); stop it first, or set DATA_DIR to another folder\\.$`));
  const joined = await openDatabase(dataDir, { mayJoin: true });
  expect(joined).toMatchObject({ joined: true, port: first.port });
  await joined.stop(); // leaves the one that others use alone

  const [server] = servers();
  expect(server).toBeDefined();
  process.kill(server ?? 0, 'SIGKILL');
  expect(await eventually(() => count(first.ownerUrl))).toBe(1);
  expect(servers()).not.toContain(server);

  await first.stop();
  expect(servers()).toEqual([]);
  expect(existsSync(path.join(dataDir, 'throughbond.lock'))).toBe(false);
});

it('stops the server that a killed start left behind and goes on with its data', async () => {
  const code = `import { openDatabase } from ${JSON.stringify(path.resolve('scripts/lib/database.mjs'))};
    await openDatabase(${JSON.stringify(dataDir)}); process.stdout.write('up'); setInterval(() => undefined, 1e6);`;
  const starter = spawn(process.execPath, ['--input-type=module', '-e', code], { stdio: ['ignore', 'pipe', 'inherit'] });
  await new Promise((resolve) => { starter.stdout.once('data', resolve); });
  const [left] = servers();
  starter.kill('SIGKILL');
  await new Promise((resolve) => { starter.once('exit', resolve); });
  expect(servers()).toEqual([left]);

  const next = await openDatabase(dataDir);
  expect(next.fresh).toBe(false);
  expect(servers()).not.toContain(left);
  expect(await count(next.ownerUrl)).toBe(1);
  await next.stop();
});

it('lets nobody in without a password', async () => {
  const db = await openDatabase(dataDir);
  for (const user of ['root', 'throughbond_owner', 'throughbond_app', '']) {
    await expect(query(`mariadb://${user}@127.0.0.1:${db.port}/throughbond`, 'SELECT 1')).rejects.toThrow(/Access denied/);
  }
  await db.stop();
});
