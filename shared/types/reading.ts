import type { Degrees, Hz } from './units';

/** How a typed value was read. `typed` is kept as typed, digits and all; '' where an answer needs no J (no vicinal path). */
export interface HzReading {
  typed: string;
  /** central value; for a limit the bound itself */
  jHz: Hz;
  /** digits after the decimal mark as typed */
  decimals: number;
  /** "< 1.5" is an upper limit: the interval 0 to 1.5, never 0 */
  limit: 'none' | 'upper' | 'lower';
  /** one standard error */
  seHz: Hz;
  seSource: 'typed' | 'default' | 'approximate';
}

/** What was understood from a value that is fine but was not typed plainly (decimal comma, unit typed in, "ca."). */
export interface InputNote {
  field: FieldName;
  code: 'decimal-comma' | 'unit-typed' | 'approximate' | 'default-error' | 'limit' | 'range' | 'sign-dropped' | 'digits-coarse' | 'stereo-ignored';
  text: string;
}

export type FieldName =
  | 'j' | 'se' | 'partner' | 'fieldMHz' | 'groups' | 'groups.front' | 'groups.rear' | 'groups.left' | 'groups.right'
  | 'ringSize' | 'smiles' | 'relation' | 'turning' | 'temperatureK' | 'phiDeg';

/** One button that mends a field: what it says and what it puts there. */
export interface Mend {
  label: string;
  field: FieldName;
  value: string;
}

/** A value that cannot be used, in one sentence: what, where, how to mend it. */
export interface FieldProblem {
  field: FieldName;
  code: string;
  sentence: string;
  mends: Mend[];
}

export type Sector = 'sp' | '+sc' | '+ac' | 'ap' | '-ac' | '-sc';

/** One φ in (−180, 180] at which the relation gives the measured J exactly. */
export interface Root {
  phiDeg: Degrees;
  sector: Sector;
}

/** Allowed stretch of φ, from in (−180, 180]; `toDeg` may run past 180 to close the circle (never more than from + 360).
 * The whole circle is −180 to 180. */
export interface Arc {
  fromDeg: Degrees;
  toDeg: Degrees;
  sectors: Sector[];
}
