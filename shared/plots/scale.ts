/** A straight scale from a stretch of values to a stretch of the drawing. */
export interface Scale {
  (value: number): number;
}

export function linearScale(domain: readonly [number, number], range: readonly [number, number]): Scale {
  const [d0, d1] = domain;
  const [r0, r1] = range;
  return (value) => r0 + ((value - d0) / (d1 - d0)) * (r1 - r0);
}

/** Two decimals are finer than any printer or screen; fixed digits keep a drawing the same on every machine. */
export const coordinate = (value: number): string => {
  const rounded = value.toFixed(2);
  return rounded === '-0.00' ? '0.00' : rounded;
};

/** SVG path data through points. */
export const polyline = (points: readonly (readonly [number, number])[]): string =>
  points.map(([x, y], index) => `${index === 0 ? 'M' : 'L'}${coordinate(x)} ${coordinate(y)}`).join('');

/** Largest of 2, 4, 5, 10 … Hz that gives at least three and at most seven steps up to `topHz`. */
export function stepFor(topHz: number): number {
  for (const step of [1, 2, 4, 5, 10, 20]) if (topHz / step <= 7) return step;
  return 50;
}
