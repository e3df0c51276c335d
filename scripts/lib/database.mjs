import { spawn } from 'node:child_process';
import { chmodSync, chownSync, closeSync, existsSync, mkdirSync, mkdtempSync, openSync, readFileSync, readdirSync, renameSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { databaseAccount, hasDatabase } from './dataDir.mjs';
import { findProgram } from './debian.mjs';
import { readStamp } from './hash.mjs';
import { takeLock } from './lock.mjs';
import { SetupError, say } from './log.mjs';
import { freePort, greets } from './port.mjs';
import { mustRun, pause, tail } from './run.mjs';
import { secretOf } from './secrets.mjs';

export const SCHEMA = 'throughbond';
export const OWNER = 'throughbond_owner';
export const APP = 'throughbond_app';
const HOST = '127.0.0.1';

/** Schemas that the owner's rights cover in a test run: each test file makes its own. */
export const TEST_SCHEMAS = `${SCHEMA}\\_%`;

/**
 * What the server runs at each start, before it lets anyone in: passwords as in the secret files, the two users, the
 * schema. The owner makes tables and triggers and grants on them; the app user gets nothing here, each migration
 * grants what it may do, so that it can neither own a table nor drop a trigger. One statement a line (init-file).
 */
export function initSql({ rootPassword, ownerPassword, appPassword, schemas = SCHEMA }) {
  const user = (name) => `'${name}'@'${HOST}'`;
  return [
    `ALTER USER 'root'@'localhost' IDENTIFIED BY '${rootPassword}';`,
    "DELETE FROM mysql.global_priv WHERE (User = 'root' AND Host <> 'localhost') OR User = '';",
    'FLUSH PRIVILEGES;',
    `CREATE DATABASE IF NOT EXISTS \`${SCHEMA}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_520_ci;`,
    ...[[OWNER, ownerPassword], [APP, appPassword]].flatMap(([name, password]) => [
      `CREATE USER IF NOT EXISTS ${user(name)} IDENTIFIED BY '${password}';`,
      `ALTER USER ${user(name)} IDENTIFIED BY '${password}';`,
    ]),
    `GRANT ALL PRIVILEGES ON \`${SCHEMA}\`.* TO ${user(OWNER)} WITH GRANT OPTION;`,
    ...(schemas === SCHEMA ? [] : [`GRANT ALL PRIVILEGES ON \`${schemas}\`.* TO ${user(OWNER)} WITH GRANT OPTION;`]),
    '',
  ].join('\n');
}

/** The numbers of running MariaDB servers that work on this data folder. */
export function serversOn(folder) {
  return readdirSync('/proc').filter((name) => /^\d+$/.test(name)).filter((pid) => {
    try {
      return readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0').includes(`--datadir=${folder}`);
    } catch {
      return false;
    }
  }).map(Number);
}

const alive = (pid) => existsSync(`/proc/${pid}`);

async function stopProcess(pid, waitMs) {
  try {
    process.kill(pid, 'SIGTERM');
    for (const until = Date.now() + waitMs; alive(pid) && Date.now() < until;) await pause(20);
    if (alive(pid)) process.kill(pid, 'SIGKILL');
    while (alive(pid)) await pause(20);
  } catch (error) {
    if (error.code !== 'ESRCH') throw error;
  }
}

function program(name) {
  const file = findProgram(name);
  if (!file) throw new SetupError(`The program ${name} of Debian's mariadb-server is missing; run "apt-get install mariadb-server" as root and start again.`);
  return file;
}

/**
 * Makes an empty database beside its final place and moves it there when whole, so a broken-off try leaves nothing.
 * mariadb-install-db, a shell script, trips over blanks in a path; it is given a short link to the folder instead.
 */
async function createDatabase(dataDir, account, runDir) {
  const half = path.join(dataDir, 'mariadb.new');
  const link = path.join(runDir, 'new');
  rmSync(half, { recursive: true, force: true });
  mkdirSync(half, { recursive: true, mode: 0o700 });
  if (account) chownSync(half, account.uid, account.gid);
  symlinkSync(half, link);
  await mustRun('Making the database', program('mariadb-install-db'), ['--no-defaults', `--datadir=${link}`,
    '--auth-root-authentication-method=normal', '--skip-test-db', '--skip-name-resolve'], { cwd: '/', account });
  rmSync(link);
  renameSync(half, path.join(dataDir, 'mariadb'));
}

const TUNING = ['--character-set-server=utf8mb4', '--collation-server=utf8mb4_unicode_520_ci', '--default-time-zone=+00:00', '--skip-name-resolve',
  '--innodb-buffer-pool-size=64M', '--performance-schema=OFF', '--local-infile=OFF',
  '--sql-mode=STRICT_TRANS_TABLES,ERROR_FOR_DIVISION_BY_ZERO,NO_ENGINE_SUBSTITUTION'];
// For throw-away data only: a power cut may lose a second of writes, a killed process still loses none.
const FAST = ['--innodb-flush-log-at-trx-commit=2', '--innodb-doublewrite=OFF', '--max-connections=300'];

/** Starts the server on this port and returns its process once it greets. */
async function launch({ dataDir, account, port, runDir, init, fast }) {
  mkdirSync(runDir, { recursive: true, mode: 0o700 }); // a cleaner of /tmp may have taken it since
  if (account) chownSync(runDir, account.uid, account.gid);
  const initFile = path.join(runDir, 'init.sql');
  writeFileSync(initFile, init, { mode: 0o600 });
  if (account) chownSync(initFile, account.uid, account.gid);
  const logFile = path.join(dataDir, 'mariadb.log');
  const log = openSync(logFile, 'w', 0o600);
  const server = spawn(program('mariadbd'), ['--no-defaults', `--datadir=${path.join(dataDir, 'mariadb')}`, `--socket=${path.join(runDir, 's')}`,
    `--pid-file=${path.join(runDir, 'pid')}`, `--port=${port}`, `--bind-address=${HOST}`, ...(account ? [`--user=${account.name}`] : []), `--init-file=${initFile}`,
    ...TUNING, ...(fast ? FAST : ['--max-connections=60'])],
  { cwd: '/', stdio: ['ignore', log, log], detached: true }); // detached: Ctrl-C must reach the app first, the database last
  closeSync(log);
  let ended = false;
  server.once('exit', () => { ended = true; });
  server.once('error', () => { ended = true; });
  try {
    for (const until = Date.now() + 120_000; !(await greets(port, 500));) {
      if (ended || Date.now() > until) {
        if (!ended) await stopProcess(server.pid, 10_000);
        throw new SetupError(`The database did not start; the end of ${logFile}:\n${tail(readFileSync(logFile, 'utf8'), 12)}`);
      }
      await pause(30);
    }
  } finally {
    rmSync(initFile, { force: true });
  }
  return server;
}

const urlFor = (user, password, port) => `mariadb://${user}:${password}@${HOST}:${port}/${SCHEMA}`;
const describe = (dataDir, port) => ({
  port,
  appUrl: urlFor(APP, secretOf(dataDir, 'database-app'), port),
  ownerUrl: urlFor(OWNER, secretOf(dataDir, 'database-owner'), port),
});

/** Uses the database that another command of this product keeps running, waiting until it is up. */
async function join(dataDir, lockFile, holder) {
  for (const until = Date.now() + 60_000; Date.now() < until; await pause(100)) {
    const again = takeLock(lockFile);
    if (again.held) {
      again.release();
      return null;
    }
    if (again.holder.port && await greets(again.holder.port)) return { ...describe(dataDir, again.holder.port), fresh: false, joined: true, stop: async () => undefined };
  }
  throw new SetupError(`Process ${holder.pid} holds the data in ${dataDir}, but its database does not answer; stop that process and try again.`);
}

/**
 * Opens the private database of a data directory.
 * @param {string} dataDir
 * @param {{ mayJoin?: boolean, fast?: boolean, schemas?: string, account?: { name: string, uid: number, gid: number } | null }} [options]
 *   mayJoin: use the server of a running `npm start` in place of refusing; fast: throw-away data
 * @returns {Promise<{ port: number, appUrl: string, ownerUrl: string, fresh: boolean, joined: boolean, stop: () => Promise<void>, note?: (more: object) => void, serverPid?: () => number }>}
 */
export async function openDatabase(dataDir, { mayJoin = false, fast = false, schemas = SCHEMA, account = databaseAccount() } = {}) {
  mkdirSync(dataDir, { recursive: true });
  const lockFile = path.join(dataDir, 'throughbond.lock');
  let lock = takeLock(lockFile);
  if (!lock.held && mayJoin) {
    const joined = await join(dataDir, lockFile, lock.holder);
    if (joined) return joined;
    lock = takeLock(lockFile);
  }
  if (!lock.held) {
    const where = lock.holder.address ? ` at ${lock.holder.address}` : '';
    throw new SetupError(`Throughbond already runs on the data in ${dataDir} (process ${lock.holder.pid}${where}); stop it first, or set DATA_DIR to another folder.`);
  }
  try {
    return await start(dataDir, { lock, fast, schemas, account });
  } catch (error) {
    lock.release();
    throw error;
  }
}

/**
 * A folder for socket, pid file and the file of first statements; short, as a socket's path may have about 100
 * characters only. The one of a start that was killed is cleared away.
 */
function makeRunDir(dataDir, account) {
  const record = path.join(dataDir, 'run-dir');
  const before = readStamp(record);
  if (before && /^\/tmp\/throughbond-\w{6}$/.test(before)) rmSync(before, { recursive: true, force: true });
  const runDir = mkdtempSync('/tmp/throughbond-');
  writeFileSync(record, runDir);
  chmodSync(runDir, 0o700);
  if (account) chownSync(runDir, account.uid, account.gid);
  return runDir;
}

async function start(dataDir, { lock, fast, schemas, account }) {
  for (const pid of serversOn(path.join(dataDir, 'mariadb'))) {
    say(`Stopping the database server that an earlier start left behind (process ${pid}).`);
    await stopProcess(pid, 60_000);
  }
  const runDir = makeRunDir(dataDir, account);
  const port = await freePort();
  const init = initSql({ rootPassword: secretOf(dataDir, 'database-root'), ownerPassword: secretOf(dataDir, 'database-owner'), appPassword: secretOf(dataDir, 'database-app'), schemas });
  let stopping = false;
  let server;
  let lifted = [];
  const watch = () => server.once('exit', () => { if (!stopping) void lift(); });
  const boot = async () => {
    server = await launch({ dataDir, account, port, runDir, init, fast });
    server.unref();
    watch();
  };
  /** Starts the server again on its port after it was killed; five times in ten minutes at most. */
  async function lift() {
    lifted = [...lifted.filter((at) => at > Date.now() - 600_000), Date.now()];
    if (lifted.length > 5) return say(`The database ended for the sixth time in ten minutes and is left off; read ${path.join(dataDir, 'mariadb.log')}.`);
    say('The database ended unexpectedly; starting it again.');
    try {
      await boot();
      if (stopping) await stopProcess(server.pid, 60_000);
      else say('The database is back.');
    } catch (error) {
      say(`The database could not be started again: ${error.message}`);
    }
  }
  const fresh = !hasDatabase(dataDir);
  try {
    if (fresh) await createDatabase(dataDir, account, runDir);
    await boot();
  } catch (error) {
    rmSync(runDir, { recursive: true, force: true });
    throw error;
  }
  lock.note({ port });
  return {
    ...describe(dataDir, port), fresh, joined: false, note: lock.note, serverPid: () => server.pid,
    stop: async () => {
      stopping = true;
      await stopProcess(server.pid, 60_000);
      rmSync(runDir, { recursive: true, force: true });
      lock.release();
    },
  };
}
