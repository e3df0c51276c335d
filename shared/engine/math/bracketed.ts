/**
 * The place in [x0, x1] where a function that rises or falls throughout crosses zero.
 * Newton's step where it stays inside the bracket, otherwise half the bracket: never slower than bisection, and it
 * cannot leave the bracket.
 * @param value  function
 * @param slope  its derivative
 * @param y0     value(x0); must differ in sign from y1
 */
export function bracketedRoot(
  value: (x: number) => number,
  slope: (x: number) => number,
  x0: number,
  x1: number,
  y0: number,
  y1: number,
): number {
  if (y0 === 0) return x0;
  if (y1 === 0) return x1;
  // `low` is the end where the function is negative
  let low = y0 < 0 ? x0 : x1;
  let high = y0 < 0 ? x1 : x0;
  let x = x0 - (y0 * (x1 - x0)) / (y1 - y0);
  for (let step = 0; step < 100; step += 1) {
    const y = value(x);
    if (y === 0) return x;
    if (y < 0) low = x;
    else high = x;
    const newton = x - y / slope(x);
    const inside = newton > Math.min(low, high) && newton < Math.max(low, high);
    // Newton alone may creep along one side; every eighth step halves the bracket instead
    const next = inside && step % 8 !== 7 ? newton : (low + high) / 2;
    if (Math.abs(next - x) <= 2e-16 * Math.max(1, Math.abs(x))) return next;
    x = next;
  }
  return x;
}
