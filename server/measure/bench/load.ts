import { quickLookInputs } from './inputs';

export interface LoadResult {
  rps: number;
  p50Ms: number;
  p99Ms: number;
  total: number;
}

const CONNECTIONS = 20;
const INPUTS = 1000;

/** A process of its own, so that the load tool never shares an event loop with what it measures. */
export async function loadChild([url = '', seconds = '5']: string[]): Promise<number> {
  const requests = quickLookInputs(INPUTS).map((body) => ({
    method: 'POST' as const, path: '/api/quick-look', headers: { 'content-type': 'application/json' }, body: JSON.stringify(body),
  }));
  const { default: autocannon } = await import('autocannon');
  const result = await autocannon({ url, connections: CONNECTIONS, duration: Number(seconds), requests });
  if (result.errors > 0 || result.timeouts > 0 || result.non2xx > 0) {
    process.stderr.write(`${url}: ${result.errors} errors, ${result.timeouts} timeouts, ${result.non2xx} answers that are not 2xx\n`);
    return 1;
  }
  const figures: LoadResult = { rps: result.requests.average, p50Ms: result.latency.p50, p99Ms: result.latency.p99, total: result['2xx'] };
  process.stdout.write(`${JSON.stringify(figures)}\n`);
  return 0;
}
