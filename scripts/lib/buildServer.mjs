import { existsSync, mkdirSync, readdirSync, writeFileSync } from 'node:fs';
import { hashOf, readStamp } from './hash.mjs';
import { SetupError, step } from './log.mjs';
import { inRoot } from './paths.mjs';

const SOURCES = ['server', 'shared', 'tsconfig.json', 'package.json', 'scripts/lib/buildServer.mjs'];
const wantedStamp = () => hashOf(SOURCES);
const stampFile = (part) => inRoot('build', `.${part}-stamp`);

/** The stamp of the server that is built now; it changes with its sources, migrations among them. */
export const serverStamp = () => readStamp(stampFile('server'));

/** The server and one file for each of its worker threads. */
function serverEntries() {
  const workers = existsSync(inRoot('server', 'workers')) ? readdirSync(inRoot('server', 'workers')).filter((name) => /^[^.]+\.ts$/.test(name)) : [];
  return {
    server: inRoot('server', 'index.ts'),
    ...Object.fromEntries(workers.map((name) => [`workers/${name.slice(0, -3)}`, inRoot('server', 'workers', name)])),
  };
}

/** Bundles entry points into build/ when their sources changed; packages stay in node_modules. */
async function ensureBuilt(part, label, entryPoints) {
  const stamp = wantedStamp();
  if (readStamp(stampFile(part)) === stamp && existsSync(inRoot('build', `${part}.mjs`))) return;
  await step(label, async () => {
    const { build } = await import('esbuild');
    mkdirSync(inRoot('build'), { recursive: true });
    await build({
      entryPoints: entryPoints(),
      outdir: inRoot('build'),
      outExtension: { '.js': '.mjs' },
      bundle: true,
      packages: 'external',
      platform: 'node',
      format: 'esm',
      target: 'node20',
      sourcemap: true,
      logLevel: 'silent',
      tsconfig: inRoot('tsconfig.json'),
    }).catch((error) => { throw new SetupError(`${label} failed.\n${error.message}`); });
    writeFileSync(stampFile(part), stamp);
  });
}

export const ensureServer = () => ensureBuilt('server', 'Building the server', serverEntries);

/** The adapters behind check, score and bench, built only when one of these is run. */
export const ensureMeasure = () => ensureBuilt('measure', 'Building the measuring commands', () => ({ measure: inRoot('server', 'measure', 'main.ts') }));
