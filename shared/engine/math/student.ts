/** ln Γ(x) for x > 0 by Lanczos' series (g = 7, nine terms); relative error below 1e-13. */
function logGamma(x: number): number {
  const c = [
    0.99999999999980993, 676.5203681218851, -1259.1392167224028, 771.32342877765313, -176.61502916214059, 12.507343278686905,
    -0.13857109526572012, 9.9843695780195716e-6, 1.5056327351493116e-7,
  ];
  const y = x - 1;
  const t = y + 7.5;
  const sum = c.reduce((s, v, i) => (i === 0 ? v : s + v / (y + i)), 0);
  return 0.5 * Math.log(2 * Math.PI) + (y + 0.5) * Math.log(t) - t + Math.log(sum);
}

/** Density of Student's t with `freedom` degrees of freedom, centre `mean` and scale `scale`. */
export function studentDensity(x: number, mean: number, scale: number, freedom: number): number {
  const z = (x - mean) / scale;
  const front = logGamma((freedom + 1) / 2) - logGamma(freedom / 2) - 0.5 * Math.log(freedom * Math.PI) - Math.log(scale);
  return Math.exp(front - ((freedom + 1) / 2) * Math.log1p((z * z) / freedom));
}
