import { mkdirSync, mkdtempSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import http from 'node:http';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { loadScript } from '../../helpers/scripts';

const { diskSentence } = loadScript<typeof import('../../../scripts/lib/disk.mjs')>('disk.mjs');
const { hashOf } = loadScript<typeof import('../../../scripts/lib/hash.mjs')>('hash.mjs');
const { sameAsLock } = loadScript<typeof import('../../../scripts/lib/nodeModules.mjs')>('nodeModules.mjs');
const { isAptBusy, missingPackages } = loadScript<typeof import('../../../scripts/lib/debian.mjs')>('debian.mjs');
const { freePort, greets, isFree } = loadScript<typeof import('../../../scripts/lib/port.mjs')>('port.mjs');
const { secretOf } = loadScript<typeof import('../../../scripts/lib/secrets.mjs')>('secrets.mjs');
const { initSql } = loadScript<typeof import('../../../scripts/lib/database.mjs')>('database.mjs');
const { fallbackFor } = loadScript<typeof import('../../../scripts/lib/dataDir.mjs')>('dataDir.mjs');

let folder: string;
beforeEach(() => { folder = mkdtempSync(path.join(tmpdir(), 'throughbond-unit-')); });
afterEach(() => rmSync(folder, { recursive: true, force: true }));

describe('free disk', () => {
  it('says in one sentence how much is needed and how much is left', () => {
    expect(diskSentence(1_350_000_000, 460_000_000, '/srv')).toBe(
      'Throughbond needs 1.4 GB of free disk for its set-up, but /srv has 0.4 GB left; free some space and start again.');
  });
  it('says nothing when there is enough', () => expect(diskSentence(10, 10, '/srv')).toBeNull());
});

describe('stamps', () => {
  const write = (name: string, text: string) => writeFileSync(path.join(folder, name), text);
  it('change with a content, a name and a new file, and with nothing else', () => {
    mkdirSync(path.join(folder, 'a'));
    write('a/one.ts', '1');
    write('b.json', '{}');
    const stamp = () => hashOf(['a', 'b.json', 'absent'], folder);
    const first = stamp();
    expect(stamp()).toBe(first);
    write('c.txt', 'not a source');
    expect(stamp()).toBe(first);
    write('a/one.ts', '2');
    const second = stamp();
    write('a/two.ts', '');
    const third = stamp();
    renameSync(path.join(folder, 'a/two.ts'), path.join(folder, 'a/three.ts'));
    expect(new Set([first, second, third, stamp()]).size).toBe(4);
  });
  it('know node_modules by what npm itself recorded', () => {
    const lock = { packages: { '': { version: '1' }, 'node_modules/a': { version: '1.0.0' }, 'node_modules/other-system': { version: '2.0.0', optional: true } } };
    expect(sameAsLock(lock, { packages: { 'node_modules/a': { version: '1.0.0' } } })).toBe(true);
    expect(sameAsLock(lock, { packages: { 'node_modules/a': { version: '1.0.1' } } })).toBe(false);
    expect(sameAsLock(lock, { packages: {} })).toBe(false);
    expect(sameAsLock(lock, { packages: { 'node_modules/a': { version: '1.0.0' }, 'node_modules/more': { version: '1.0.0' } } })).toBe(false);
  });
});

describe('Debian packages', () => {
  it('are asked for by the programs that are missing', () => {
    const present = new Set(['mariadbd', 'pdftotext', 'pdftoppm']);
    const find = (name: string) => (present.has(name) ? `/usr/bin/${name}` : null);
    expect(missingPackages(['mariadb', 'chromium', 'poppler'], find)).toEqual(['mariadb-server', 'chromium']);
  });
  it.each([
    'E: Could not get lock /var/lib/dpkg/lock-frontend. It is held by process 812 (apt-get)',
    'E: Unable to acquire the dpkg frontend lock (/var/lib/dpkg/lock-frontend), is another process using it?',
    'E: Unable to lock directory /var/lib/apt/lists/',
  ])('wait for another apt: %s', (line) => expect(isAptBusy(line)).toBe(true));
  it('do not wait for a package that does not exist', () => expect(isAptBusy('E: Unable to locate package nothing')).toBe(false));
});

describe('ports', () => {
  it('are free when given and taken when somebody listens', async () => {
    const port = await freePort();
    expect(await isFree(port)).toBe(true);
    const server = http.createServer().listen(port);
    await new Promise((resolve) => { server.once('listening', resolve); });
    try {
      expect((server.address() as AddressInfo).port).toBe(port);
      expect(await isFree(port)).toBe(false);
      expect(await greets(port, 200)).toBe(false); // a web server says nothing first, so it is no MariaDB
    } finally {
      server.close();
    }
    expect(await greets(port, 200)).toBe(false);
  });
});

describe('secrets', () => {
  it('are made once, long, different, and readable by their owner only', () => {
    const one = secretOf(folder, 'database-app');
    expect(secretOf(folder, 'database-app')).toBe(one);
    expect(secretOf(folder, 'database-owner')).not.toBe(one);
    expect(one).toMatch(/^[\w-]{32}$/);
    expect(statSync(path.join(folder, 'secrets', 'database-app')).mode & 0o777).toBe(0o600);
    expect(statSync(path.join(folder, 'secrets')).mode & 0o777).toBe(0o700);
  });
});

describe('the database', () => {
  const sql = initSql({ rootPassword: 'r', ownerPassword: 'o', appPassword: 'a' });
  it('gives the application user no right of its own', () => {
    const grants = sql.split('\n').filter((line) => line.startsWith('GRANT'));
    expect(grants).toEqual(["GRANT ALL PRIVILEGES ON `throughbond`.* TO 'throughbond_owner'@'127.0.0.1' WITH GRANT OPTION;"]);
  });
  it('holds one whole statement a line, as an init file must', () => {
    for (const line of sql.trimEnd().split('\n')) expect(line).toMatch(/^[A-Z].*;$/);
  });
  it('finds the same other place for the same wanted one', () => {
    expect(fallbackFor('/root/clone/.data')).toBe(fallbackFor('/root/clone/.data'));
    expect(fallbackFor('/root/clone/.data')).not.toBe(fallbackFor('/root/other/.data'));
    expect(fallbackFor('/root/clone/.data')).toMatch(/^\/var\/lib\/throughbond-[0-9a-f]{8}$/);
  });
});
