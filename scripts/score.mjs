// npm run -s score -- SET FILE [--out LINES]: scores the product's answers over a set of records.
import { measure } from './lib/measure.mjs';

await measure('score', process.argv.slice(2), { least: 2, usage: 'npm run -s score -- SET FILE [--out LINES]   LINES gets one JSON line a record' });
