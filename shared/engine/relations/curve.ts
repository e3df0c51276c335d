import type { AngleRow, ParameterSet, RelationRow, Substituent } from '../../types/relation';
import type { CurvePoint } from '../../types/answer';
import type { Arc, Root } from '../../types/reading';
import type { Degrees, Hz } from '../../types/units';
import { degrees, radians, wrapDegrees } from '../math/angles';
import { anglesAt, anglesBetween, fromHarmonics, reachOf, type Periodic } from '../math/periodic';
import { sectorOf, sectorsOf } from './angles';
import { generalisedHarmonics, setFor, substituentsOf, type PathGroups } from './generalised';
import { threeTermHarmonics } from './threeTerm';
import { twoBranch } from './twoBranch';

/** What a relation is read with: groups, or the substituents themselves; the plain forms need neither. */
export interface CurveInputs {
  groups?: PathGroups | null;
  substituents?: readonly Substituent[];
  /** letter of a parameter set; left out: by the number of groups */
  set?: string;
}

/** A relation with its groups put in: J as a function of φ, ready to be turned round. */
export interface Curve {
  row: AngleRow;
  set: ParameterSet;
  substituents: readonly Substituent[];
  periodic: Periodic;
  /** J(−φ) = J(φ): the halves are mirror images */
  even: boolean;
  readonly reach: { minHz: Hz; maxHz: Hz };
}

/** @throws RangeError when the row gives no angle (a class table) */
export function asAngleRow(row: RelationRow): AngleRow {
  if (row.kind === 'class-table') throw new RangeError(`${row.id} is a table of classes and gives no angle`);
  return row;
}

/**
 * Puts groups into a relation.
 * @throws RangeError when the generalised equation is given neither groups nor substituents, or a group it holds no Δχ for
 */
export function bindCurve(relation: RelationRow, inputs: CurveInputs = {}): Curve {
  const row = asAngleRow(relation);
  let substituents: readonly Substituent[] = [];
  let set: ParameterSet;
  let periodic: Periodic;
  if (row.kind === 'generalised') {
    if (!inputs.substituents && !inputs.groups) throw new RangeError(`${row.id} needs every group on the path`);
    substituents = inputs.substituents ?? (inputs.groups ? substituentsOf(row, inputs.groups) : []);
    set = setFor(row, substituents.length, inputs.set);
    periodic = fromHarmonics(generalisedHarmonics(set, substituents));
  } else {
    const only = row.parameterSets[0];
    if (!only) throw new RangeError(`${row.id} has no parameters`);
    set = only;
    periodic = row.kind === 'two-branch' ? twoBranch(set) : fromHarmonics(threeTermHarmonics(row, set));
  }
  return {
    row,
    set,
    substituents,
    periodic,
    even: periodic.even,
    get reach() {
      const [minHz, maxHz] = reachOf(periodic);
      return { minHz, maxHz };
    },
  };
}

/** J at φ (any finite angle in degrees). */
export const jAt = (curve: Curve, phiDeg: Degrees): Hz => curve.periodic.value(radians(wrapDegrees(phiDeg)));

/** Every φ in (−180, 180] at which the curve gives J, ascending; [] when none does. @throws RangeError when J is not finite */
export function rootsOf(curve: Curve, jHz: Hz): Root[] {
  if (!Number.isFinite(jHz)) throw new RangeError(`J must be finite, got ${jHz}`);
  return anglesAt(curve.periodic, jHz)
    .map((phi) => wrapDegrees(degrees(phi)))
    .sort((a, b) => a - b)
    .map((phiDeg) => ({ phiDeg, sector: sectorOf(phiDeg) }));
}

/** The arcs of φ on which low ≤ J ≤ high, ascending by their start; either bound may be infinite. */
export function arcsBetween(curve: Curve, lowHz: Hz, highHz: Hz): Arc[] {
  return anglesBetween(curve.periodic, lowHz, highHz)
    .map(([from, to]) => {
      const width = degrees(to - from);
      const fromDeg = width >= 360 - 1e-9 ? -180 : wrapDegrees(degrees(from));
      const toDeg = fromDeg + Math.min(width, 360);
      return { fromDeg, toDeg, sectors: sectorsOf(fromDeg, toDeg) };
    })
    .sort((a, b) => a.fromDeg - b.fromDeg);
}

/**
 * J of a relation at one angle.
 * @example evaluate(karplus1963, { phiDeg: 60 }) // 4
 */
export function evaluate(row: RelationRow, inputs: CurveInputs & { phiDeg: Degrees }): Hz {
  return jAt(bindCurve(row, inputs), inputs.phiDeg);
}

/**
 * Every angle that gives a J: all roots over (−180, 180], none missed (see math/periodic).
 * @example invert(karplus1963, 12) // ±162.0°
 */
export function invert(row: RelationRow, jHz: Hz, inputs: CurveInputs = {}): Root[] {
  return rootsOf(bindCurve(row, inputs), jHz);
}

/**
 * The arcs of φ whose J lies within `toleranceHz` of a measured one.
 * @throws RangeError when the tolerance is not a positive finite number
 */
export function allowedArcs(row: RelationRow, jHz: Hz, toleranceHz: Hz, inputs: CurveInputs = {}): Arc[] {
  if (!Number.isFinite(jHz)) throw new RangeError(`J must be finite, got ${jHz}`);
  if (!(toleranceHz > 0 && toleranceHz < Infinity)) throw new RangeError(`the tolerance must be above 0 Hz, got ${toleranceHz}`);
  return arcsBetween(bindCurve(row, inputs), jHz - toleranceHz, jHz + toleranceHz);
}

/** The curve from −180 to 180 in even steps, for plots and their table twins. */
export function curve(row: RelationRow, inputs: CurveInputs = {}, stepDeg: Degrees = 2): CurvePoint[] {
  if (!(stepDeg > 0 && stepDeg <= 180)) throw new RangeError(`the step must lie between 0 and 180 degrees, got ${stepDeg}`);
  const bound = bindCurve(row, inputs);
  const count = Math.round(360 / stepDeg);
  return Array.from({ length: count + 1 }, (_, i) => {
    const phiDeg = -180 + (360 * i) / count;
    return { phiDeg, jHz: bound.periodic.value(radians(phiDeg)) };
  });
}
