// npm run -s bench -- [NAME…]: measures speed and size, one JSON line a figure.
import { measure } from './lib/measure.mjs';

await measure('bench', process.argv.slice(2), { least: 0, client: true, programs: ['chromium'], usage: 'npm run -s bench -- [NAME…]   without a name every figure but start-fresh-s' });
