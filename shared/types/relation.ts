import type { GroupText } from './group';
import type { Citation, Provenance, SourcedHz } from './source';
import type { DoubleBondGeometry } from './answer';
import type { Degrees, Hz } from './units';

export const RELATION_KINDS = ['three-term', 'two-branch', 'generalised', 'class-table'] as const;
export type RelationKind = (typeof RELATION_KINDS)[number];

/** One set of parameters of a row; `id` is '' where the row has only one. Angles are in degrees. */
export interface ParameterSet {
  id: string;
  /** when to take it, in words */
  use: string;
  /** number of non-H groups it is for; null = any number */
  groups: number | null;
  values: Record<string, number>;
  provenance: Provenance;
  source: string;
}

/** What a relation takes: name in the formula, unit, and what may be put there, in words. */
export interface RelationInput {
  name: string;
  label: string;
  unit: string;
  domain: string;
}

/** A substituent on the path as the generalised equation sees it. */
export interface Substituent {
  /** Δχ of the first atom against H */
  dchiAlpha: number;
  /** Δχ of the non-H atoms on it, the path carbon left out */
  dchiBeta: number[];
  /** +1 when it lies 120° clockwise of its own coupled H, seen from its carbon towards the other */
  xi: 1 | -1;
}

/** A value not made by us, against which the row is checked. */
export interface OutsideCheck {
  name: string;
  phiDeg: Degrees;
  set: string;
  substituents: Substituent[];
  /** as printed by the source, from and to */
  measuredHz: [Hz, Hz];
  /** largest miss that still counts as agreement */
  toleranceHz: Hz;
  provenance: Provenance;
  source: string;
}

interface RelationRowBase {
  /** immutable with `version`: any changed digit is a new version */
  id: string;
  version: number;
  /** doubtful: held because it is in use, but its source was not seen */
  status: 'current' | 'superseded' | 'doubtful';
  name: string;
  /** coupled path, e.g. H–C–C–H */
  path: string;
  nuclei: string;
  /** printed, with text markup */
  formula: string;
  /** the same for mathjs; angles (phi and parameters in degrees) are handed over in radians */
  mathFormula: string;
  parameterSets: ParameterSet[];
  /** parameters given in degrees */
  degreeParameters: string[];
  inputs: RelationInput[];
  /** where it holds, in words */
  domain: string[];
  spreadHz: Hz;
  /** spread where the row is used although a condition of its domain fails */
  spreadOutsideHz: Hz;
  spreadProvenance: Provenance;
  /** on what data the spread stands */
  spreadNote: string;
  citation: Citation;
  provenance: Provenance;
  provenanceNote: string;
  failures: string[];
  checks: OutsideCheck[];
  checkedBy: string;
}

export interface ThreeTermRow extends RelationRowBase {
  kind: 'three-term';
  /** fourier: A + B cos φ + C cos 2φ; power: A cos²φ + B cos φ + C. The same letters mean other numbers. */
  form: 'fourier' | 'power';
}

export interface TwoBranchRow extends RelationRowBase {
  kind: 'two-branch';
}

export interface GeneralisedRow extends RelationRowBase {
  kind: 'generalised';
  /** Δχ against H by element */
  electronegativity: { name: string; values: Record<string, number>; provenance: Provenance; source: string };
}

/** One compound of the double-bond table: the groups on each carbon and what was measured. */
export interface AlkeneCompound {
  name: string;
  left: [GroupText, GroupText];
  right: [GroupText, GroupText];
  /** null = not held; geminal by size */
  cisHz: Hz | null;
  transHz: Hz | null;
  geminalHz: Hz | null;
  /** listed, but left out of every distribution */
  doubtful: boolean;
  provenance: Provenance;
  source: string;
  note?: string;
}

/** A class of double bonds: which groups it means, and the stretch in which it decides nothing. */
export interface AlkeneClass {
  id: string;
  /** as in "known with …" */
  name: string;
  /** several elements in one class: its spread is its own and stays out of the pooled one */
  mixed: boolean;
  /** set by common practice; it only ever withholds an answer */
  undecidedHz: [Hz, Hz] | null;
  undecidedProvenance: Provenance;
}

export interface RingAlkene {
  ringSize: number;
  parent: SourcedHz;
  rangeHz: [Hz, Hz];
  source: string;
  provenance: Provenance;
  /** rings with O, N or C=O in or beside the CH=CH, and other compounds held */
  others: (SourcedHz & { bears: 'hetero' | 'conjugated' })[];
}

/** ³J(C,H) across C=C, for bonds without a vicinal H,H pair. */
export interface CarbonCoupling extends SourcedHz {
  geometry: Exclude<DoubleBondGeometry, 'geminal'>;
}

export interface ClassTableRow extends RelationRowBase {
  kind: 'class-table';
  classes: AlkeneClass[];
  compounds: AlkeneCompound[];
  rings: RingAlkene[];
  carbonCouplings: CarbonCoupling[];
}

export type AngleRow = ThreeTermRow | TwoBranchRow | GeneralisedRow;
export type RelationRow = AngleRow | ClassTableRow;

/** How the couplings of one geometry lie in one class: Student's t about `meanHz`. */
export interface ClassDistribution {
  count: number;
  meanHz: Hz;
  scaleHz: Hz;
  /** spread without the share that comes from few compounds */
  spreadHz: Hz;
  degreesOfFreedom: number;
  /** smallest and largest value held */
  rangeHz: [Hz, Hz];
  values: SourcedHz[];
}

/** One class ready for use. */
export interface AlkeneClassModel extends AlkeneClass {
  distributions: Record<DoubleBondGeometry, ClassDistribution | null>;
  /** trans − cis over the compounds held as both isomers; null when there is none */
  pairGapHz: [Hz, Hz] | null;
}

/** The class table with its distributions computed, made once when a registry is built. */
export interface AlkeneModel {
  row: ClassTableRow;
  classes: Readonly<Record<string, AlkeneClassModel>>;
  /** over every class */
  fullHz: Record<DoubleBondGeometry, [Hz, Hz]>;
}

/** The relations an answer may use. Handed in, never looked up: the engine has no state. */
export interface Registry {
  rows: readonly RelationRow[];
  /** by `id` (the current version) or `id@version` */
  find(ref: string): RelationRow | undefined;
  /** of the current class table; null when none is held */
  alkenes: AlkeneModel | null;
}
