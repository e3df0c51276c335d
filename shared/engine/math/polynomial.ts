import { bracketedRoot } from './bracketed';

/** Value at x of c[0] + c[1] x + c[2] x² + … */
export function polynomialAt(c: readonly number[], x: number): number {
  let y = 0;
  for (let i = c.length - 1; i >= 0; i -= 1) y = y * x + (c[i] ?? 0);
  return y;
}

/** Real roots of a x² + b x + c, ascending; written so that no digits cancel. A double root comes once. */
export function quadraticRoots(a: number, b: number, c: number): number[] {
  if (a === 0) return b === 0 ? [] : [-c / b];
  const discriminant = b * b - 4 * a * c;
  // within rounding of a double root: one root
  if (Math.abs(discriminant) <= 4 * Number.EPSILON * b * b) return [-b / (2 * a)];
  if (discriminant < 0) return [];
  const q = -(b + (b < 0 ? -1 : 1) * Math.sqrt(discriminant)) / 2;
  return q === 0 ? [0] : [q / a, c / q].sort((x, y) => x - y);
}

/**
 * Every real root of c[0] + c[1] x + … (degree 2 or more) in [lo, hi], ascending.
 * Between two neighbouring roots of the derivative a polynomial rises or falls throughout (Rolle), so each such piece
 * holds one root or none, and a sign tells which: no root can be missed. A piece that only touches zero within
 * rounding counts as a root.
 */
export function polynomialRoots(c: readonly number[], lo: number, hi: number): number[] {
  const scale = c.reduce((s, v) => s + Math.abs(v), 0);
  if (scale === 0 || c.length < 3) return [];
  if (c.length === 3) return quadraticRoots(c[2] ?? 0, c[1] ?? 0, c[0] ?? 0).filter((x) => x >= lo && x <= hi);
  const derivative = c.slice(1).map((v, i) => v * (i + 1));
  const value = (x: number): number => polynomialAt(c, x);
  const slope = (x: number): number => polynomialAt(derivative, x);
  const places = [lo, ...polynomialRoots(derivative, lo, hi), hi];
  const touch = 1e-13 * scale;
  const found: number[] = [];
  let x0 = lo;
  let y0 = value(lo);
  for (const x1 of places) {
    const y1 = value(x1);
    if (Math.abs(y1) <= touch) found.push(x1);
    else if (Math.abs(y0) > touch && y0 < 0 !== y1 < 0) found.push(bracketedRoot(value, slope, x0, x1, y0, y1));
    x0 = x1;
    y0 = y1;
  }
  return found.filter((x, i) => i === 0 || x !== found[i - 1]);
}
