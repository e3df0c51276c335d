import { createRequire } from 'node:module';
import { fileURLToPath } from 'node:url';
import { Worker } from 'node:worker_threads';

/**
 * Starts a worker thread from its own file: the built one as it is, a TypeScript source (development, tests) through
 * tsx, which a thread does not inherit from its process.
 */
export function startThread(file: URL): Worker {
  if (!file.pathname.endsWith('.ts')) return new Worker(file, { execArgv: [] });
  const loader = createRequire(file).resolve('tsx/cjs');
  return new Worker(`require(${JSON.stringify(loader)}); require(${JSON.stringify(fileURLToPath(file))});`, { eval: true, execArgv: [] });
}
