import { mkdirSync } from 'node:fs';
import { openDatabase } from './database.mjs';
import { chooseDataDir } from './dataDir.mjs';
import { SetupError } from './log.mjs';
import { wantedDataDir } from './paths.mjs';
import { isFree } from './port.mjs';

/** The port to listen on: PORT, or 4300. */
export function wantedPort(env = process.env) {
  const port = Number(env.PORT || 4300);
  if (!Number.isInteger(port) || port < 1 || port > 65535) throw new SetupError(`PORT is "${env.PORT}", but must be a whole number from 1 to 65535.`);
  return port;
}

/** Ends with one sentence when somebody else listens on the port. */
export async function claimPort(port) {
  if (!(await isFree(port))) throw new SetupError(`Port ${port} is in use by another program; stop it, or set PORT to another number.`);
}

/** Whether the person's own MariaDB is to be used. */
export const isExternal = (env = process.env) => Boolean(env.DATABASE_URL);

/**
 * The database to work with: the external one of DATABASE_URL, or the private one of the data directory.
 * @param {{ mayJoin?: boolean }} [options]
 */
export async function openData(options) {
  if (isExternal()) {
    const dataDir = wantedDataDir();
    mkdirSync(dataDir, { recursive: true });
    const db = { appUrl: process.env.DATABASE_URL, ownerUrl: process.env.DATABASE_OWNER_URL || undefined, fresh: false, joined: false, stop: async () => undefined };
    return { dataDir, db, external: true };
  }
  const dataDir = chooseDataDir();
  return { dataDir, db: await openDatabase(dataDir, options), external: false };
}

/** Calls `stop` once on Ctrl-C, a closed terminal or a polite kill, then leaves with the signal's usual exit code. */
export function onStopSignal(stop) {
  let stopping = false;
  for (const [signal, code] of [['SIGINT', 130], ['SIGTERM', 143], ['SIGHUP', 129]]) {
    process.on(signal, () => {
      if (stopping) return;
      stopping = true;
      void stop().finally(() => process.exit(code === 130 ? 0 : code));
    });
  }
  return () => stopping;
}
