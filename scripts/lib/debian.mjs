import { accessSync, constants } from 'node:fs';
import path from 'node:path';
import { SetupError, say, step } from './log.mjs';
import { pause, run, tail } from './run.mjs';

/** The programs the product calls, each with the Debian package that brings it. */
export const PROGRAMS = {
  mariadb: { package: 'mariadb-server', needs: ['mariadbd', 'mariadb-install-db'] },
  chromium: { package: 'chromium', needs: ['chromium'] },
  poppler: { package: 'poppler-utils', needs: ['pdftotext', 'pdftoppm'] },
};

const folders = () => [...new Set([...(process.env.PATH ?? '').split(':'), '/usr/sbin', '/usr/bin', '/sbin', '/bin'])].filter(Boolean);

/** Where a program lies, looked for in PATH and the system's folders (mariadbd is in /usr/sbin, off many PATHs). */
export function findProgram(name) {
  for (const folder of folders()) {
    const file = path.join(folder, name);
    try {
      accessSync(file, constants.X_OK);
      return file;
    } catch {
      // not in this folder
    }
  }
  return null;
}

/** The Debian packages that are missing for these programs. */
export function missingPackages(keys, find = findProgram) {
  return keys.map((key) => PROGRAMS[key]).filter(({ needs }) => needs.some((name) => !find(name))).map((entry) => entry.package);
}

/** What apt says while another apt or dpkg holds its locks. */
export const isAptBusy = (output) => /Could not get lock|Unable to acquire the dpkg frontend lock|Unable to lock (the administration )?directory/.test(output);

/** Runs apt-get, trying again for up to two minutes while another apt is at work. */
async function apt(args, { waitMs = 120_000 } = {}) {
  const until = Date.now() + waitMs;
  let told = false;
  for (;;) {
    const { code, output } = await run('apt-get', ['-q', ...args], { cwd: '/', env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C' } });
    if (code === 0) return;
    if (!isAptBusy(output)) throw new SetupError(`apt-get ${args[0]} failed.\n${tail(output, 8)}`);
    if (Date.now() > until) throw new SetupError('Another apt has been at work for two minutes; start again when it has finished.');
    if (!told) say('Another apt is at work; waiting for it up to two minutes …');
    told = true;
    await pause(2000);
  }
}

/** Installs what is missing when run as root on Debian; otherwise ends with the command to run. */
export async function ensurePackages(keys) {
  const missing = missingPackages(keys);
  if (missing.length === 0) return;
  const command = `apt-get install --no-install-recommends ${missing.join(' ')}`;
  const aptThere = findProgram('apt-get') !== null;
  if (!aptThere) throw new SetupError(`Throughbond needs the programs of Debian's ${missing.join(', ')}, and this system has no apt-get; install them and start again.`);
  if (process.getuid?.() !== 0) throw new SetupError(`Throughbond needs Debian's ${missing.join(', ')}; run "sudo ${command}" and start again.`);
  await step(`Installing Debian's ${missing.join(', ')}`, async () => {
    await apt(['update']);
    await apt(['install', '-y', '--no-install-recommends', ...missing]);
  });
  const still = missingPackages(keys);
  if (still.length > 0) throw new SetupError(`apt-get finished, but the programs of ${still.join(', ')} are not there; run "${command}" by hand and read what it says.`);
}
