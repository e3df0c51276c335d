// npm run -s check -- FILE: puts every check of a file to the product and counts what it answered.
import { measure } from './lib/measure.mjs';

await measure('check', process.argv.slice(2), { least: 1, usage: 'npm run -s check -- FILE   FILE holds checks as JSON: id, family, relation, given, expect_kind, expected, …' });
