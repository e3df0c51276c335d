import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { chownSync, existsSync, mkdirSync, readFileSync, rmdirSync } from 'node:fs';
import path from 'node:path';
import { SetupError, say } from './log.mjs';
import { root, wantedDataDir } from './paths.mjs';

/** The system account the database runs as: the one of Debian's package when we are root, otherwise ourselves. */
export function databaseAccount() {
  if (process.getuid?.() !== 0) return null;
  const line = readFileSync('/etc/passwd', 'utf8').split('\n').find((entry) => entry.startsWith('mysql:'));
  if (!line) throw new SetupError('The database must not run as root, and the user "mysql" is missing; run "useradd --system mysql" and start again.');
  const [name, , uid, gid] = line.split(':');
  return { name, uid: Number(uid), gid: Number(gid) };
}

/** Makes a folder that belongs to the database's account and tells whether that account can work in it. */
function usableBy(account, folder) {
  try {
    mkdirSync(folder, { recursive: true });
  } catch {
    return false;
  }
  if (!account) return true;
  chownSync(folder, account.uid, account.gid);
  const asked = spawnSync('/bin/sh', ['-c', 'test -w "$1" && test -x "$1"', 'sh', folder], { cwd: '/', uid: account.uid, gid: account.gid });
  if (asked.status === 0) return true;
  try {
    rmdirSync(folder); // only ever an empty one: nothing is left where nothing will be kept
  } catch {
    // it holds something, so it stays
  }
  return false;
}

/** Whether a database was already made in this data directory. */
export const hasDatabase = (dataDir) => existsSync(path.join(dataDir, 'mariadb', 'mysql'));

/** The other place for a data directory, one for each wanted place, so that the next start finds it again. */
export function fallbackFor(wanted) {
  return `/var/lib/throughbond-${createHash('sha256').update(wanted).digest('hex').slice(0, 8)}`;
}

/**
 * The data directory to use. A folder above the wanted one may shut the database's account out (a clone under a
 * private home): then a place it can reach is taken and named. A database already made stays where it is.
 */
export function chooseDataDir({ env = process.env, account = databaseAccount() } = {}) {
  const wanted = wantedDataDir(env);
  const fallback = fallbackFor(wanted);
  if (account && !hasDatabase(wanted) && hasDatabase(fallback)) {
    say(`The data directory is ${fallback}, chosen at an earlier start because the database's user could not reach ${wanted}.`);
    return fallback;
  }
  if (usableBy(account, path.join(wanted, 'mariadb'))) return wanted;
  if (account && !hasDatabase(wanted) && usableBy(account, path.join(fallback, 'mariadb'))) {
    say(`The database's user "${account.name}" cannot reach ${wanted}, so the data directory is ${fallback}; set DATA_DIR to choose another.`);
    return fallback;
  }
  throw new SetupError(`The database ${account ? `(user "${account.name}") ` : ''}cannot use ${wanted}; set DATA_DIR to a folder that it can reach${wanted.startsWith(root) ? ' outside this private folder' : ''}.`);
}
