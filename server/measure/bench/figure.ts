/** One line of `bench`: a figure with its unit and how many runs it is the median of. */
export interface Figure {
  name: string;
  value: number;
  unit: string;
  runs: number;
  limit?: string;
  ok?: boolean;
  [detail: string]: unknown;
}

export const median = (values: readonly number[]): number => {
  if (values.length === 0) throw new Error('A median of nothing.');
  const sorted = [...values].sort((a, b) => a - b);
  const middle = Math.floor(sorted.length / 2);
  const upper = sorted[middle] as number;
  return sorted.length % 2 === 1 ? upper : ((sorted[middle - 1] as number) + upper) / 2;
};

export const rounded = (value: number, digits = 3): number => Number(value.toPrecision(digits + 1));

export const atMost = (limit: number, value: number): Pick<Figure, 'limit' | 'ok'> => ({ limit: `<= ${limit}`, ok: value <= limit });
export const atLeast = (limit: number, value: number): Pick<Figure, 'limit' | 'ok'> => ({ limit: `>= ${limit}`, ok: value >= limit });

/** Progress goes to stderr: stdout carries figures and nothing else. */
export const tell = (line: string): void => void process.stderr.write(`${line}\n`);
