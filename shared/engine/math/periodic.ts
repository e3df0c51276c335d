import { polynomialRoots } from './polynomial';
import { bracketedRoot } from './bracketed';

/** A function of an angle (radians) that rises or falls throughout between neighbouring `turns`. */
export interface Periodic {
  value: (phi: number) => number;
  slope: (phi: number) => number;
  /** ascending within one turn of the circle; [] = the function is constant */
  turns: readonly number[];
  /** value at each turn */
  peaks: readonly number[];
  /** f(−φ) = f(φ) */
  even: boolean;
}

/** a0 + a1 cos φ + b1 sin φ + a2 cos 2φ + b2 sin 2φ: every ³J relation held is one of these. */
export interface Harmonics {
  a0: number;
  a1: number;
  b1: number;
  a2: number;
  b2: number;
}

/**
 * The angles where the sum of harmonics turns, found through x = tan(φ/2).
 * The derivative times (1 + x²)² is a quartic in x. Two charts, each a little more than half the circle, keep x
 * within ±1.01, so nothing is lost at 180°.
 */
function turningPoints({ a1, b1, a2, b2 }: Harmonics): number[] {
  const found: number[] = [];
  for (const centre of [0, Math.PI]) {
    const flip = centre === 0 ? 1 : -1;
    const cos1 = flip * b1;
    const sin1 = -flip * a1;
    const cos2 = 2 * b2;
    const sin2 = -2 * a2;
    const quartic = [cos1 + cos2, 2 * sin1 + 4 * sin2, -6 * cos2, 2 * sin1 - 4 * sin2, cos2 - cos1];
    for (const x of polynomialRoots(quartic, -1.01, 1.01)) {
      const phi = centre + 2 * Math.atan(x);
      found.push(phi > Math.PI ? phi - 2 * Math.PI : phi);
    }
  }
  found.sort((a, b) => a - b);
  // the charts overlap, so a turn near ±90° is found twice
  return found.filter((phi, i) => i === 0 || phi - (found[i - 1] ?? 0) > 1e-9);
}

/** Makes a sum of harmonics ready for inversion. */
export function fromHarmonics(h: Harmonics): Periodic {
  const { a0, a1, b1, a2, b2 } = h;
  const value = (phi: number): number => {
    const c = Math.cos(phi);
    const s = Math.sin(phi);
    return a0 + a1 * c + b1 * s + a2 * (c * c - s * s) + 2 * b2 * s * c;
  };
  const slope = (phi: number): number => {
    const c = Math.cos(phi);
    const s = Math.sin(phi);
    return b1 * c - a1 * s + 2 * b2 * (c * c - s * s) - 4 * a2 * s * c;
  };
  // found when first asked for: a single value of J needs no turns
  let found: { turns: number[]; peaks: number[] } | null = null;
  const turning = (): { turns: number[]; peaks: number[] } => {
    if (!found) {
      const turns = turningPoints(h);
      found = { turns, peaks: turns.map(value) };
    }
    return found;
  };
  return {
    value,
    slope,
    even: b1 === 0 && b2 === 0,
    get turns() {
      return turning().turns;
    },
    get peaks() {
      return turning().peaks;
    },
  };
}

/** The pieces between neighbouring turns, once around the circle. */
function pieces({ turns, peaks }: Periodic): { x0: number; x1: number; y0: number; y1: number }[] {
  return turns.map((x0, i) => {
    const last = i === turns.length - 1;
    return {
      x0,
      x1: last ? (turns[0] ?? 0) + 2 * Math.PI : (turns[i + 1] ?? 0),
      y0: peaks[i] ?? 0,
      y1: (last ? peaks[0] : peaks[i + 1]) ?? 0,
    };
  });
}

/** Smallest and largest value on the circle. */
export function reachOf(f: Periodic): [number, number] {
  if (f.peaks.length === 0) return [f.value(0), f.value(0)];
  return [Math.min(...f.peaks), Math.max(...f.peaks)];
}

/** Where f takes the value y on a piece whose ends lie on both sides of it. */
function crossing(f: Periodic, y: number, p: { x0: number; x1: number; y0: number; y1: number }): number {
  return bracketedRoot((x) => f.value(x) - y, f.slope, p.x0, p.x1, p.y0 - y, p.y1 - y);
}

/**
 * Every angle (radians, one turn of the circle) with f = y; [] when there is none or f is constant.
 * A turn that meets y exactly, or misses it by no more than rounding, is one root (the tangent case).
 */
export function anglesAt(f: Periodic, y: number): number[] {
  const [low, high] = reachOf(f);
  const rounding = 16 * Number.EPSILON * Math.max(Math.abs(low), Math.abs(high), Math.abs(y));
  const found: number[] = [];
  const count = f.turns.length;
  pieces(f).forEach((p, i) => {
    const before = f.peaks[(i + count - 1) % count] ?? p.y0;
    const miss = p.y0 - y;
    // all on one side: no crossing here, only a touch
    const touches = Math.abs(miss) <= rounding && miss > 0 === before > y && miss > 0 === p.y1 > y;
    if (miss === 0 || touches) found.push(p.x0);
    if (miss !== 0 && p.y1 !== y && p.y0 < y !== p.y1 < y) found.push(crossing(f, y, p));
  });
  // two roots at one turn, closer than doubles can tell their J apart, are the tangent case again
  return found.filter((x, i) => {
    const next = i + 1 < found.length ? found[i + 1] : (found[0] ?? 0) + 2 * Math.PI;
    return found.length === 1 || (next ?? 0) - x > 1e-7;
  });
}

/**
 * The stretches of angle (radians) with low ≤ f ≤ high; neighbours that meet are joined across turns and across 180°.
 * `low` may be −∞ and `high` +∞. The whole circle is [[−π, π]].
 */
export function anglesBetween(f: Periodic, low: number, high: number): [number, number][] {
  if (f.turns.length === 0) return f.value(0) >= low && f.value(0) <= high ? [[-Math.PI, Math.PI]] : [];
  const inside = (y: number): boolean => y >= low && y <= high;
  const out: [number, number][] = [];
  for (const p of pieces(f)) {
    if (Math.max(p.y0, p.y1) < low || Math.min(p.y0, p.y1) > high) continue;
    const from = inside(p.y0) ? p.x0 : crossing(f, p.y0 < low ? low : high, p);
    const to = inside(p.y1) ? p.x1 : crossing(f, p.y1 < low ? low : high, p);
    const before = out[out.length - 1];
    if (before && before[1] === from) before[1] = to;
    else out.push([from, to]);
  }
  const first = out[0];
  const last = out[out.length - 1];
  if (first && last && first[0] === f.turns[0] && last[1] === first[0] + 2 * Math.PI) {
    if (first === last) return [[-Math.PI, Math.PI]];
    first[0] = last[0] - 2 * Math.PI;
    out.pop();
  }
  return out.filter(([from, to]) => to > from);
}
