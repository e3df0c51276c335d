import { createWriteStream } from 'node:fs';
import { finished } from 'node:stream/promises';

import { readCheckFile, readJson } from './check/readCheckFile';
import { reportLines, tally } from './check/report';
import { runChecks } from './check/runCheck';
import { apiAt } from './lib/api';
import { startProduct, stopAll } from './lib/productServer';
import { Refusal } from './lib/refusal';
import { runScore } from './score/runScore';

/*
 * node build/measure.mjs check FILE | score SET FILE [--out LINES] | bench [NAME…]
 * Figures go to stdout and nothing else does; the wrapper scripts in scripts/ do the set-up and give us a database of our own.
 * The two commands that start with "child:" are processes of the bench itself.
 */
const COMMANDS: Record<string, (args: string[]) => Promise<number>> = {
  check,
  score,
  bench: async (names) => (await import('./bench/runBench')).runBench(names),
  'child:bare': async (args) => (await import('./bench/bareHandler')).bareHandler(args),
  'child:load': async (args) => (await import('./bench/load')).loadChild(args),
};

async function check([file]: string[]): Promise<number> {
  if (file === undefined) throw new Refusal('Name the check file: npm run -s check -- FILE');
  const checks = await readCheckFile(file);
  const server = await startProduct();
  try {
    const judged = await runChecks(checks, apiAt(server.url));
    process.stdout.write(`${reportLines(judged).join('\n')}\n`);
    return tally(judged).failed > 0 ? 1 : 0;
  } finally {
    await server.stop();
  }
}

async function score(args: string[]): Promise<number> {
  const [set, file] = args.filter((word, index) => word !== '--out' && args[index - 1] !== '--out');
  if (set === undefined || file === undefined) throw new Refusal('Name the set and the file: npm run -s score -- SET FILE [--out LINES]');
  const outAt = args.indexOf('--out');
  const outFile = outAt === -1 ? undefined : args[outAt + 1];
  if (outAt !== -1 && outFile === undefined) throw new Refusal('Name the file after --out.');
  const records = await readJson(file);
  const server = await startProduct();
  try {
    const { metrics, lines } = await runScore(set, records, apiAt(server.url));
    if (outFile !== undefined) {
      const stream = createWriteStream(outFile);
      for (const line of lines) stream.write(`${JSON.stringify(line)}\n`);
      stream.end();
      await finished(stream);
    }
    process.stdout.write(`${JSON.stringify(metrics)}\n`);
    return 0;
  } finally {
    await server.stop();
  }
}

async function main(): Promise<void> {
  const [command = '', ...args] = process.argv.slice(2);
  const run = COMMANDS[command];
  if (run === undefined) throw new Refusal('Commands: check FILE | score SET FILE [--out LINES] | bench [NAME…]');
  process.exitCode = await run(args);
}

for (const signal of ['SIGINT', 'SIGTERM'] as const) process.once(signal, () => void stopAll().finally(() => process.exit(1)));

main().catch(async (error: unknown) => {
  await stopAll();
  process.stderr.write(`${error instanceof Refusal ? error.message : error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`);
  process.exitCode = 2;
});
