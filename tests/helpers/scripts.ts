import { createRequire } from 'node:module';
import path from 'node:path';
import { buildSync } from 'esbuild';

const folder = path.join(__dirname, '..', '..', 'scripts', 'lib');

/**
 * Loads a module of scripts/lib. These are .mjs files, so that node runs them before anything is installed, and jest
 * loads no .mjs; here one is turned into CommonJS first.
 */
export function loadScript<T>(name: string): T {
  const file = path.join(folder, name);
  const { outputFiles } = buildSync({ entryPoints: [file], bundle: true, write: false, platform: 'node', format: 'cjs', packages: 'external', target: 'node20', define: { 'import.meta.url': '__url' } });
  const loaded = { exports: {} };
  const code = `const __url = ${JSON.stringify(`file://${file}`)};\n${outputFiles[0]?.text ?? ''}`;
  // eslint-disable-next-line @typescript-eslint/no-implied-eval -- the only way to run text as a module here; the text is our own file
  const run = new Function('module', 'exports', 'require', code) as (module: object, exports: object, require: NodeJS.Require) => void;
  run(loaded, loaded.exports, createRequire(file));
  return loaded.exports as T;
}
