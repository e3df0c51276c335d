import type { ParameterSet } from '../../types/relation';
import type { Periodic } from '../math/periodic';

/**
 * Karplus 1959: J = J0 cos²φ + K for |φ| ≤ 90°, J180 cos²φ + K beyond, in hertz (J. Chem. Phys. 1959, 30, 11).
 * Even in φ; both branches give K at 90°, with slope 0, so every quarter circle rises or falls throughout.
 * The small negative value at 90° is an artefact of the formula and is not cut off.
 */
export function twoBranch(set: ParameterSet): Periodic {
  const { J0, J180, K } = set.values;
  if (J0 === undefined || J180 === undefined || K === undefined) throw new RangeError('a two-branch row needs J0, J180 and K');
  const factor = (c: number): number => (c >= 0 ? J0 : J180);
  const value = (phi: number): number => {
    const c = Math.cos(phi);
    return factor(c) * c * c + K;
  };
  const slope = (phi: number): number => {
    const c = Math.cos(phi);
    return -2 * factor(c) * c * Math.sin(phi);
  };
  return { value, slope, turns: [-Math.PI / 2, 0, Math.PI / 2, Math.PI], peaks: [K, J0 + K, K, J180 + K], even: true };
}
