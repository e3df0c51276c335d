import { Refusal } from '../lib/refusal';
import { type Figure, tell } from './figure';

interface Bench {
  figures: string[];
  /** runs only when one of its figures is named */
  onlyNamed?: true;
  run: () => Promise<Figure[]>;
}

/** Each bench gives one or more figures; modules load when they run, so that one figure doesn't need the tools of another. */
const BENCHES: readonly Bench[] = [
  { figures: ['invert-hla-ms'], run: async () => (await import('./invert')).invertHla() },
  { figures: ['quick-look-rps-ratio', 'quick-look-p99-ratio', 'server-rss-mb'], run: async () => (await import('./quickLookLoad')).quickLookLoad() },
  { figures: ['case-log-10k-ratio'], run: async () => (await import('./caseLog')).caseLog() },
  { figures: ['first-load-js-ratio', 'quick-look-js-kb'], run: async () => (await import('./firstLoad')).firstLoad() },
  { figures: ['first-answer-ms', 'plots-ms'], run: async () => (await import('./firstAnswer')).firstAnswer() },
  { figures: ['restart-s'], run: async () => (await import('./startTimes')).restart() },
  { figures: ['start-fresh-s'], onlyNamed: true, run: async () => (await import('./startTimes')).freshStart() },
];

/** Prints one JSON line a figure as soon as it is there. A bench that fails is told on stderr, and the others still run. */
export async function runBench(names: string[]): Promise<number> {
  const known = BENCHES.flatMap((bench) => bench.figures);
  const stranger = names.find((name) => !known.includes(name));
  if (stranger !== undefined) throw new Refusal(`There is no figure "${stranger}": ${known.join(', ')}.`);
  let failed = 0;
  for (const bench of BENCHES) {
    const wanted = names.length === 0 ? (bench.onlyNamed ? [] : bench.figures) : bench.figures.filter((figure) => names.includes(figure));
    if (wanted.length === 0) continue;
    try {
      for (const figure of await bench.run()) {
        if (wanted.includes(figure.name)) process.stdout.write(`${JSON.stringify(figure)}\n`);
      }
    } catch (error) {
      failed += 1;
      tell(`${wanted.join(', ')}: ${error instanceof Error ? (error.stack ?? error.message) : String(error)}`);
    }
  }
  return failed > 0 ? 1 : 0;
}
