import { type Came, type Check, type Judgement, NOT_DECIDED, type Outcome } from './types';

/** Two sums of the same numbers in another order may differ in the last bits; a tolerance of 0.005 must not fail on that. */
const ROUNDING = 1e-9;
/** Line lists: weaker lines are dropped, lines nearer than this are one line, and intensities compare within the last. */
const WEAK_LINE = 0.005;
const SAME_LINE_HZ = 0.002;
const INTENSITY_TOLERANCE = 0.001;

/** Holds what came against what the check file expects. */
export function judge(check: Check, came: Came): Judgement {
  const result = (outcome: Outcome, reason = ''): Judgement => ({ outcome, expected: show(check), came: showCame(came), reason });
  if (came.kind === 'not-covered') return result('not covered', came.reason);

  if (came.kind === 'unanswered') return result('failed', came.reason);

  const words = came.kind === 'answer' ? came.words : [];
  const forbidden = (check.never ?? []).find((word) => words.includes(word) || (word === 'angle' && printsAngle(came)));
  if (forbidden !== undefined) return result('failed', `the answer states "${forbidden}", which it must never`);

  switch (check.expect_kind) {
    case 'value':
      return came.kind === 'value' && near(came.value, check.expected, check.tolerance ?? 0) ? result('passed') : undecided(came, check, result);
    case 'list':
      return came.kind === 'list' && sameList(came.values, check.expected, check.tolerance ?? 0, check.family === 'inverse')
        ? result('passed') : undecided(came, check, result);
    case 'map':
    case 'map-or-not-decided':
      if (came.kind === 'map' && sameMap(came.map, check.expected, check.tolerance ?? 0)) return result('passed');
      if (check.expect_kind === 'map-or-not-decided' && saysNotDecided(came)) return result('passed');
      return undecided(came, check, result);
    case 'range-contains':
      return came.kind === 'range' && typeof check.expected === 'number' && came.from - ROUNDING <= check.expected && check.expected <= came.to + ROUNDING
        ? result('passed') : undecided(came, check, result);
    case 'verdict':
      return words.some((word) => listed(check.expected).includes(word)) ? result('passed') : undecided(came, check, result);
    case 'action':
      return came.kind === 'answer' && came.actions.some((action) => listed(check.expected).includes(action))
        ? result('passed') : result('failed', 'a required action did not come');
    case 'property':
      return came.kind === 'property' && came.holds ? result('passed') : result('failed', came.kind === 'property' ? came.detail : 'no sampling came');
  }
}

function undecided(came: Came, check: Check, result: (outcome: Outcome, reason?: string) => Judgement): Judgement {
  if (saysNotDecided(came)) return result('abstained', came.kind === 'answer' ? came.reason : '');
  return result('failed', check.expect_kind === 'verdict' ? 'a graded answer outside the list' : 'a wrong value');
}

const saysNotDecided = (came: Came): boolean => came.kind === 'answer' && came.words.length > 0 && came.words.every((word) => word === NOT_DECIDED);
const printsAngle = (came: Came): boolean => came.kind === 'answer' && came.printsAngle;
const listed = (expected: unknown): unknown[] => (Array.isArray(expected) ? (expected as unknown[]) : [expected]);

/** A number within the tolerance of the other; text must be equal; nested lists compare item by item in order. */
export function near(came: unknown, expected: unknown, tolerance: number): boolean {
  if (typeof came === 'number' && typeof expected === 'number') return Number.isFinite(came) && Math.abs(came - expected) <= tolerance + ROUNDING;
  if (Array.isArray(came) && Array.isArray(expected)) return came.length === expected.length && came.every((item, index) => near(item, expected[index], tolerance));
  return typeof came === 'string' && came === expected;
}

/** Lists in the printed order, or (family inverse) in any order: each expected item finds a partner of its own. */
export function sameList(came: unknown[], expected: unknown, tolerance: number, anyOrder: boolean): boolean {
  if (!Array.isArray(expected) || came.length !== expected.length) return false;
  if (!anyOrder) return near(came, expected, tolerance);
  return pairUp(came, expected as unknown[], tolerance, new Set());
}

/** Plain search for a one-to-one pairing; lists here hold a handful of items, and a greedy choice may steal a partner. */
function pairUp(came: unknown[], expected: unknown[], tolerance: number, taken: ReadonlySet<number>): boolean {
  const [first, ...rest] = expected;
  if (expected.length === 0) return true;
  return came.some((item, index) => !taken.has(index) && near(item, first, tolerance) && pairUp(came, rest, tolerance, new Set([...taken, index])));
}

/** Key by key over the expected keys; a list of [position, intensity] pairs compares as a list of spectral lines. */
export function sameMap(came: Record<string, unknown>, expected: unknown, tolerance: number): boolean {
  if (typeof expected !== 'object' || expected === null) return false;
  return Object.entries(expected).every(([key, wanted]) => {
    const got = came[key];
    if (isLineList(wanted)) return isLineList(got) && sameLines(got, wanted, tolerance);
    return near(got, wanted, tolerance);
  });
}

type Line = [number, number];
const isLineList = (value: unknown): value is Line[] => Array.isArray(value) && value.length > 0
  && value.every((item) => Array.isArray(item) && item.length === 2 && item.every((part) => typeof part === 'number'));

function sameLines(came: Line[], expected: Line[], tolerance: number): boolean {
  const left = tidyLines(came);
  const right = tidyLines(expected);
  return left.length === right.length && left.every(([position, intensity], index) => {
    const other = right[index];
    return other !== undefined && near(position, other[0], tolerance) && near(intensity, other[1], INTENSITY_TOLERANCE);
  });
}

/** Weak lines dropped, coinciding lines added up, high frequency first. */
export function tidyLines(lines: Line[]): Line[] {
  const strongest = Math.max(...lines.map(([, intensity]) => intensity));
  const kept = lines.filter(([, intensity]) => intensity >= WEAK_LINE * strongest).sort((a, b) => b[0] - a[0]);
  const merged: Line[] = [];
  for (const [position, intensity] of kept) {
    const last = merged.at(-1);
    if (last !== undefined && last[0] - position <= SAME_LINE_HZ + ROUNDING) last[1] += intensity;
    else merged.push([position, intensity]);
  }
  return merged;
}

function show(check: Check): string {
  const tolerance = check.tolerance === undefined ? '' : ` ± ${check.tolerance}`;
  const never = check.never === undefined ? '' : `; never ${check.never.join(', ')}`;
  return `${JSON.stringify(check.expected)}${tolerance}${check.unit === undefined ? '' : ` ${check.unit}`}${never}`;
}

function showCame(came: Came): string {
  switch (came.kind) {
    case 'value': return String(came.value);
    case 'list': return JSON.stringify(came.values);
    case 'map': return JSON.stringify(came.map);
    case 'range': return `${came.from} to ${came.to}`;
    case 'answer': return `${[...came.words, ...came.actions.map((action) => `[${action}]`)].join(' ')}${came.reason === '' ? '' : ` (${came.reason})`}`;
    case 'property': return came.holds ? 'holds' : `does not hold: ${came.detail}`;
    case 'not-covered':
    case 'unanswered': return came.reason;
  }
}
