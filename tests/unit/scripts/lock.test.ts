import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { loadScript } from '../../helpers/scripts';

const { holderOf, startOf, takeLock, waitForLock } = loadScript<typeof import('../../../scripts/lib/lock.mjs')>('lock.mjs');

let folder: string;
let file: string;
beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'throughbond-lock-'));
  file = path.join(folder, 'lock');
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));

const noLivingProcess = { pid: 4_194_400, began: '1' }; // above the highest number Linux gives out

describe('the lock', () => {
  it('is held by one, names its holder, and is free again when released', () => {
    const lock = takeLock(file, { address: 'http://localhost:4300' });
    expect(lock.held).toBe(true);
    expect(takeLock(file)).toMatchObject({ held: false, holder: { pid: process.pid, address: 'http://localhost:4300' } });
    if (lock.held) {
      lock.note({ port: 3307 });
      expect(holderOf(file)).toMatchObject({ pid: process.pid, port: 3307 });
      lock.release();
    }
    expect(existsSync(file)).toBe(false);
    expect(readdirSync(folder)).toEqual([]);
  });

  it('is taken over from a holder that is gone', () => {
    writeFileSync(file, JSON.stringify(noLivingProcess));
    expect(holderOf(file)).toBeNull();
    expect(takeLock(file).held).toBe(true);
  });

  it('is taken over when another process has got the number of its holder', () => {
    writeFileSync(file, JSON.stringify({ pid: process.pid, began: `${startOf(process.pid)}9` }));
    expect(takeLock(file).held).toBe(true);
  });

  it('is taken over when a crash left it empty', () => {
    writeFileSync(file, '');
    expect(takeLock(file).held).toBe(true);
  });

  it('goes to exactly one of many that find a dead one at the same moment', async () => {
    writeFileSync(file, JSON.stringify(noLivingProcess));
    const code = `import { takeLock } from ${JSON.stringify(path.resolve('scripts/lib/lock.mjs'))};
      process.stdin.once('data', () => { process.stdout.write(takeLock(${JSON.stringify(file)}).held ? 'held' : 'refused'); process.stdin.once('data', () => process.exit()); });
      process.stdout.write('ready ');`;
    const racers = Array.from({ length: 6 }, () => spawn(process.execPath, ['--input-type=module', '-e', code], { stdio: ['pipe', 'pipe', 'inherit'] }));
    const said = racers.map(() => '');
    const all = (pattern: RegExp) => new Promise<void>((resolve) => {
      const look = () => { if (said.every((text) => pattern.test(text))) resolve(); };
      racers.forEach((racer) => racer.stdout.on('data', look));
      look();
    });
    racers.forEach((racer, i) => racer.stdout.on('data', (chunk: Buffer) => { said[i] += chunk.toString(); }));
    await all(/ready /);
    racers.forEach((racer) => racer.stdin.write('go'));
    await all(/held|refused/);
    const holders = said.filter((text) => text.endsWith('held'));
    expect(holders).toHaveLength(1);
    expect(racers.map((racer) => racer.pid)).toContain((JSON.parse(readFileSync(file, 'utf8')) as { pid: number }).pid);
    racers.forEach((racer) => racer.stdin.write('end'));
    await Promise.all(racers.map((racer) => new Promise((resolve) => { racer.once('exit', resolve); })));
  });

  it('is waited for, and the wait is told once', async () => {
    const first = takeLock(file);
    const told: number[] = [];
    const waiting = waitForLock(file, { timeoutMs: 20_000, onWait: ({ pid }) => { told.push(pid); } });
    if (first.held) setTimeout(first.release, 50);
    expect((await waiting)?.held).toBe(true);
    expect(told).toEqual([process.pid]);
  });
});
