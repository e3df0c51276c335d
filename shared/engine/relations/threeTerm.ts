import type { ParameterSet, ThreeTermRow } from '../../types/relation';
import type { Harmonics } from '../math/periodic';

const value = (set: ParameterSet, name: string): number => {
  const found = set.values[name];
  if (found === undefined) throw new RangeError(`parameter ${name} is missing`);
  return found;
};

/**
 * The three-term Karplus form as harmonics, J in hertz.
 * fourier: A + B cos φ + C cos 2φ; power: A cos²φ + B cos φ + C = (A/2 + C) + B cos φ + (A/2) cos 2φ.
 * Karplus, J. Am. Chem. Soc. 1963, 85, 2870. Domain: the row's. J − const is a quadratic in cos φ, even in φ.
 */
export function threeTermHarmonics(row: ThreeTermRow, set: ParameterSet): Harmonics {
  const a = value(set, 'A');
  const b = value(set, 'B');
  const c = value(set, 'C');
  return row.form === 'fourier' ? { a0: a, a1: b, b1: 0, a2: c, b2: 0 } : { a0: a / 2 + c, a1: b, b1: 0, a2: a / 2, b2: 0 };
}
