import type { Degrees } from '../../types/units';

export const RADIANS_PER_DEGREE = Math.PI / 180;

/** Degrees to radians. */
export const radians = (deg: Degrees): number => deg * RADIANS_PER_DEGREE;

/** Radians to degrees. */
export const degrees = (rad: number): Degrees => rad / RADIANS_PER_DEGREE;

/**
 * The same direction in (−180, 180].
 * @throws RangeError when the angle is not finite
 */
export function wrapDegrees(deg: Degrees): Degrees {
  if (!Number.isFinite(deg)) throw new RangeError(`an angle must be finite, got ${deg}`);
  // inside the range nothing is computed, so that no digit is lost
  if (deg > -180 && deg <= 180) return deg === 0 ? 0 : deg;
  const turned = (((deg + 180) % 360) + 360) % 360;
  return turned === 0 ? 180 : turned - 180;
}

/** Distance of two directions on the circle, 0 to 180. */
export const apartDeg = (a: Degrees, b: Degrees): Degrees => Math.abs(((((a - b + 180) % 360) + 360) % 360) - 180);
