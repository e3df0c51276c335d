import { existsSync, mkdirSync } from 'node:fs';
import { clientDue, ensureClient } from './buildClient.mjs';
import { ensureMeasure, ensureServer } from './buildServer.mjs';
import { ensurePackages, missingPackages } from './debian.mjs';
import { NEEDS, checkDisk } from './disk.mjs';
import { SetupError, say } from './log.mjs';
import { waitForLock } from './lock.mjs';
import { ensureNodeModules, nodeModulesDue } from './nodeModules.mjs';
import { inRoot, root, wantedDataDir } from './paths.mjs';

function checkNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19)) throw new SetupError(`Throughbond needs Node 20.19 or later, and this is ${process.versions.node}; install Node 20 and start again.`);
}

/** Bytes that the steps which are due will take. */
function bytesDue({ programs, client }) {
  const missing = missingPackages(programs);
  return (nodeModulesDue() ? NEEDS.nodeModules : 0) + (missing.includes('mariadb-server') ? NEEDS.mariadb : 0)
    + (missing.includes('chromium') ? NEEDS.chromium : 0) + (client && clientDue() ? NEEDS.client : 0);
}

/** Runs both to their end before the first failure is told, so that nothing goes on behind a sentence. */
async function together(...works) {
  const results = await Promise.allSettled(works.map((work) => work()));
  const failed = results.find((result) => result.status === 'rejected');
  if (failed) throw failed.reason;
}

/**
 * Does all the set-up that is due in this checkout: Debian packages, node modules, client and server builds. Two
 * commands at once take turns.
 * @param {{ programs: ('mariadb' | 'chromium' | 'poppler')[], client?: boolean, measure?: boolean }} wanted
 */
export async function setUp({ programs, client = false, measure = false }) {
  checkNode();
  mkdirSync(inRoot('build'), { recursive: true });
  const lock = await waitForLock(inRoot('build', 'setup.lock'), {
    timeoutMs: 20 * 60_000,
    onWait: ({ pid }) => say(`Another Throughbond command (process ${pid}) is setting up; waiting for it …`),
  });
  if (!lock) throw new SetupError('Another Throughbond command has been setting up for twenty minutes; stop it and start again.');
  try {
    await checkDisk(root, bytesDue({ programs, client }));
    if (!existsSync(wantedDataDir())) await checkDisk(wantedDataDir(), NEEDS.database);
    await together(() => ensurePackages(programs), () => ensureNodeModules());
    await ensureServer();
    if (measure) await ensureMeasure();
    if (client) await ensureClient();
  } finally {
    lock.release();
  }
}

