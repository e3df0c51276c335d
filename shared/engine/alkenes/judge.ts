import type { DoubleBondGeometry, Grade } from '../../types/answer';
import type { HzReading } from '../../types/reading';
import type { AlkeneClassModel, ClassTableRow } from '../../types/relation';
import type { Fraction, Hz } from '../../types/units';
import { studentDensity } from '../math/student';
import { GEOMETRIES, tableParameter } from './model';

/** Why a class verdict is what it is. */
export type VerdictReason =
  | 'inside' | 'near-edge' | 'outside-range' | 'likelihood' | 'undecided-stretch' | 'neither' | 'no-values' | 'limit' | 'from-memory' | 'few';

export interface ClassVerdict {
  grade: Grade;
  geometry: DoubleBondGeometry | null;
  reason: VerdictReason;
  /** even priors; what is missing from 1 belongs to "neither" */
  likelihoods: { geometry: DoubleBondGeometry; weight: Fraction }[];
  likelihood: Fraction | null;
}

/** The stretch in which the class decides nothing; fluorine beside another hetero atom reaches lower. */
export function undecidedStretch(model: AlkeneClassModel, elements: readonly string[], row: ClassTableRow): [Hz, Hz] | null {
  if (model.undecidedHz === null || model.id !== 'two-hetero' || !elements.includes('F')) return model.undecidedHz;
  const fluorine = row.classes.find((c) => c.id === 'f')?.undecidedHz ?? model.undecidedHz;
  return [Math.min(model.undecidedHz[0], fluorine[0]), Math.max(model.undecidedHz[1], fluorine[1])];
}

/** Weights of the geometries for one coupling; geminal is compared by size, because its sign is not seen. */
function weigh(row: ClassTableRow, model: AlkeneClassModel, reading: HzReading, possible: readonly DoubleBondGeometry[]): ClassVerdict['likelihoods'] {
  const densities = possible.flatMap((geometry) => {
    const d = model.distributions[geometry];
    if (!d) return [];
    const j = geometry === 'geminal' ? Math.abs(reading.jHz) : reading.jHz;
    return [{ geometry, density: studentDensity(j, d.meanHz, Math.hypot(d.scaleHz, reading.seHz), d.degreesOfFreedom) }];
  });
  // a share for couplings of neither class keeps a value far from both from going to the nearer side
  const neither = tableParameter(row, 'p') / tableParameter(row, 'R');
  const total = densities.reduce((s, { density }) => s + density, neither);
  return densities.map(({ geometry, density }) => ({ geometry, weight: density / total }));
}

/**
 * What a class says of one coupling.
 * assigned: likelihood ≥ 0.95, every value of the class seen, at least two compounds each way (three where the class mixes elements), and J more than 2σ (σ the
 * error of the reading) outside the undecided stretch and within the values held, widened by the class's spread.
 * tentative: likelihood ≥ 0.80. Anything else, and anything within the undecided stretch: not decided.
 */
export function judgeClass(
  row: ClassTableRow,
  model: AlkeneClassModel,
  elements: readonly string[],
  reading: HzReading,
  possible: readonly DoubleBondGeometry[] = GEOMETRIES,
): ClassVerdict {
  const held = possible.filter((g) => model.distributions[g] !== null);
  const none: ClassVerdict = { grade: 'not-decided', geometry: null, reason: 'no-values', likelihoods: [], likelihood: null };
  if (held.length < Math.min(2, possible.length)) return none;
  if (reading.limit !== 'none') return { ...none, reason: 'limit' };
  // odds beside "not decided" would say the nearer side after all, so inside the stretch none are given
  const stretch = undecidedStretch(model, elements, row);
  if (stretch && reading.jHz >= stretch[0] && reading.jHz <= stretch[1]) return { ...none, reason: 'undecided-stretch' };
  const likelihoods = weigh(row, model, reading, possible);
  const best = likelihoods.reduce((a, b) => (b.weight > a.weight ? b : a));
  const open = (reason: VerdictReason): ClassVerdict => ({ grade: 'not-decided', geometry: null, reason, likelihoods, likelihood: best.weight });
  if (best.weight < tableParameter(row, 'tentative')) {
    const shared = likelihoods.reduce((s, l) => s + l.weight, 0);
    return open(shared < tableParameter(row, 'tentative') ? 'neither' : 'likelihood');
  }
  const verdict = (grade: Grade, reason: VerdictReason): ClassVerdict => ({ grade, geometry: best.geometry, reason, likelihoods, likelihood: best.weight });
  const own = model.distributions[best.geometry];
  if (!own) return none;
  if (best.weight < tableParameter(row, 'assigned')) return verdict('tentative', 'likelihood');
  const both = held.map((g) => model.distributions[g]);
  if (both.some((d) => d?.values.some((v) => v.provenance !== 'seen'))) return verdict('tentative', 'from-memory');
  if (both.some((d) => (d?.count ?? 0) < (model.mixed ? 3 : 2))) return verdict('tentative', 'few');
  const twoSigma = 2 * reading.seHz;
  const gap = stretch === null ? Infinity : Math.max(stretch[0] - reading.jHz, reading.jHz - stretch[1]);
  if (gap <= twoSigma) return verdict('tentative', 'near-edge');
  const j = best.geometry === 'geminal' ? Math.abs(reading.jHz) : reading.jHz;
  if (j < own.rangeHz[0] - own.spreadHz || j > own.rangeHz[1] + own.spreadHz) return verdict('tentative', 'outside-range');
  return verdict('assigned', 'inside');
}

/** Groups not given: never assigned; tentative from 15 Hz up or from 6 to 10 Hz (common practice, no source). */
export function judgeWithoutGroups(reading: HzReading): ClassVerdict {
  const verdict = (grade: Grade, geometry: DoubleBondGeometry | null, reason: VerdictReason): ClassVerdict => ({ grade, geometry, reason, likelihoods: [], likelihood: null });
  if (reading.limit !== 'none') return verdict('not-decided', null, 'limit');
  if (reading.jHz >= 15 && reading.jHz <= 18) return verdict('tentative', 'trans', 'likelihood');
  if (reading.jHz >= 6 && reading.jHz <= 10) return verdict('tentative', 'cis', 'likelihood');
  return verdict('not-decided', null, 'undecided-stretch');
}
