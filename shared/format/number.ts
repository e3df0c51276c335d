import type { Degrees, Hz } from '../types/units';

export const NBSP = '\u00a0';
export const MINUS = '\u2212';

/** A number to so many decimals with a true minus; never "−0.0". The only place where a number is rounded. */
export function fixed(value: number, decimals: number): string {
  // the nudge undoes binary representation, so that 12.45 prints 12.5 and not 12.4
  const text = (Math.abs(value) * (1 + 4 * Number.EPSILON)).toFixed(decimals);
  return value < 0 && Number(text) !== 0 ? `${MINUS}${text}` : text;
}

/** A coupling with its unit, to 0.1 Hz unless told. */
export const hz = (value: Hz, decimals = 1): string => `${fixed(value, decimals)}${NBSP}Hz`;

/** A coupling with as many decimals as were typed, at least one when rounding would change it. */
export function hzAsTyped(reading: { jHz: Hz; decimals: number; limit?: 'none' | 'upper' | 'lower' }): string {
  const sign = reading.limit === 'upper' ? `<${NBSP}` : reading.limit === 'lower' ? `>${NBSP}` : '';
  return `${sign}${hz(reading.jHz, reading.decimals)}`;
}

/** Two couplings, smaller first. */
export const hzRange = (from: Hz, to: Hz, decimals = 1): string => `${fixed(from, decimals)} to ${fixed(to, decimals)}${NBSP}Hz`;

/** An angle in whole degrees (no space before °). */
export const degree = (value: Degrees, decimals = 0): string => `${fixed(value, decimals)}°`;

/** From one angle to another, both brought into −180 to 180. */
export function degreeRange(from: Degrees, to: Degrees, decimals = 0): string {
  const inside = (v: Degrees): Degrees => (v > 180 ? v - 360 : v);
  return `${degree(inside(from), decimals)} to ${degree(inside(to), decimals)}`;
}

/** A weight as whole numbers in a hundred; the ends are never called certain. */
export function inHundred(weight: number): string {
  if (weight > 0.995) return 'more than 99 in 100';
  if (weight < 0.005) return 'less than 1 in 100';
  return `${Math.round(weight * 100)} in 100`;
}
