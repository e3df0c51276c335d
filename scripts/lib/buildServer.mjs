import { existsSync, mkdirSync, readdirSync, writeFileSync } from 'node:fs';
import { hashOf, readStamp } from './hash.mjs';
import { step } from './log.mjs';
import { inRoot } from './paths.mjs';

const SOURCES = ['server', 'shared', 'tsconfig.json', 'package.json', 'scripts/lib/buildServer.mjs'];
const stampFile = inRoot('build', '.server-stamp');

const wantedStamp = () => hashOf(SOURCES);

/** The stamp of the server that is built now; it changes with its sources, migrations among them. */
export const serverStamp = () => readStamp(stampFile);

/** The entry points: the server, the measuring adapters, and one file for each worker thread. */
function entries() {
  const workers = existsSync(inRoot('server', 'workers')) ? readdirSync(inRoot('server', 'workers')).filter((name) => /^[^.]+\.ts$/.test(name)) : [];
  return {
    server: inRoot('server', 'index.ts'),
    ...(existsSync(inRoot('server', 'measure', 'main.ts')) ? { measure: inRoot('server', 'measure', 'main.ts') } : {}),
    ...Object.fromEntries(workers.map((name) => [`workers/${name.slice(0, -3)}`, inRoot('server', 'workers', name)])),
  };
}

/** Bundles the server into build/ when its sources changed; packages stay in node_modules. */
export async function ensureServer() {
  const stamp = wantedStamp();
  if (serverStamp() === stamp && existsSync(inRoot('build', 'server.mjs'))) return;
  await step('Building the server', async () => {
    const { build } = await import('esbuild');
    mkdirSync(inRoot('build'), { recursive: true });
    await build({
      entryPoints: entries(),
      outdir: inRoot('build'),
      outExtension: { '.js': '.mjs' },
      bundle: true,
      packages: 'external',
      platform: 'node',
      format: 'esm',
      target: 'node20',
      sourcemap: true,
      logLevel: 'error',
      tsconfig: inRoot('tsconfig.json'),
    });
    writeFileSync(stampFile, stamp);
  });
}
