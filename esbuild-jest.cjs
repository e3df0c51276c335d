// Turns TypeScript and modern JavaScript into what jest runs: esbuild in place of babel, some ten times faster.
const { createHash } = require('node:crypto');
const path = require('node:path');
const { transformSync, version } = require('esbuild');

const LOADERS = { '.ts': 'ts', '.mts': 'ts', '.tsx': 'tsx', '.jsx': 'jsx', '.js': 'jsx', '.mjs': 'js' };

module.exports = {
  process(source, file) {
    const loader = LOADERS[path.extname(file)] ?? 'js';
    const { code } = transformSync(source, {
      loader,
      jsx: 'automatic',
      format: 'cjs',
      target: 'node20',
      sourcemap: 'inline',
      sourcefile: file,
      supported: { 'dynamic-import': false },
      // a module that asks where it lies gets the same answer as when it runs as an ES module
      define: { 'import.meta.url': '__importMetaUrl' },
      banner: "const __importMetaUrl = require('node:url').pathToFileURL(__filename).href;",
    });
    return { code };
  },
  getCacheKey: (source, file) => createHash('sha1').update(`${version}|2|${file}|${source}`).digest('hex'),
};
