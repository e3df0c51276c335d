import { mkdtempSync, rmSync, chmodSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { spawn } from 'node:child_process';
import { openDatabase, TEST_SCHEMAS } from './database.mjs';
import { endWith } from './log.mjs';
import { inRoot, root } from './paths.mjs';
import { onStopSignal } from './product.mjs';
import { migrate, serverEnv } from './server.mjs';
import { setUp } from './setup.mjs';

/**
 * Runs one of the measuring commands (check, score, bench) on throw-away data of its own, so that it never meets real
 * cases and never waits for a running product. Only the command's own figures go to stdout.
 * @param {'check' | 'score' | 'bench'} command
 * @param {string[]} args what the person wrote after the command
 * @param {{ programs?: ('chromium' | 'poppler')[], client?: boolean, usage: string, least: number }} needs
 */
export async function measure(command, args, { programs = [], client = false, usage, least }) {
  if (args.includes('--help') || args.length < least) {
    process.stderr.write(`${usage}\n`);
    process.exit(args.includes('--help') ? 0 : 2);
  }
  const toStop = [];
  const stopAll = async () => {
    while (toStop.length > 0) await toStop.pop()();
  };
  onStopSignal(stopAll);
  try {
    await setUp({ programs: ['mariadb', ...programs], client, measure: true });
    const folder = mkdtempSync(path.join(tmpdir(), `throughbond-${command}-`));
    chmodSync(folder, 0o711); // the database's user must pass through
    toStop.push(async () => rmSync(folder, { recursive: true, force: true }));
    const dataDir = path.join(folder, 'data');
    const db = await openDatabase(dataDir, { schemas: TEST_SCHEMAS });
    toStop.push(db.stop);
    await migrate({ dataDir, db });
    const code = await new Promise((resolve, reject) => {
      const child = spawn(process.execPath, [inRoot('build', 'measure.mjs'), command, ...args], {
        // paths in the arguments are the person's: npm puts us into the checkout and tells where they stood
        cwd: process.env.INIT_CWD ?? process.cwd(), stdio: ['ignore', 'inherit', 'inherit'], env: { ...serverEnv({ dataDir, ...db }), PROJECT_ROOT: root },
      });
      child.on('error', reject);
      child.on('exit', (status) => resolve(status ?? 1));
      toStop.push(async () => { child.kill('SIGTERM'); });
    });
    await stopAll();
    process.exit(code);
  } catch (error) {
    await stopAll();
    endWith(error);
  }
}
