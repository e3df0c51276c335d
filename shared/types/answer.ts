import type { GroupText } from './group';
import type { Arc, FieldProblem, HzReading, InputNote, Root } from './reading';
import type { Provenance, SourcedHz } from './source';
import type { TrailStep } from './trail';
import type { Degrees, Fraction, Hz } from './units';

export const GRADES = ['assigned', 'tentative', 'not-decided'] as const;
export type Grade = (typeof GRADES)[number];

/** A relation as an answer cites it. */
export interface RelationRef {
  id: string;
  version: number;
  name: string;
  formula: string;
  citation: string;
  doi?: string;
  spreadHz: Hz;
  spreadProvenance: Provenance;
  provenance: Provenance;
}

/** A statement, raised by rule, that limits an answer. */
export interface Caution {
  id: CautionId;
  text: string;
}
export const CAUTION_IDS = [
  'relative-only', 'may-be-averaged', 'several-roots', 'out-of-domain', 'alkene-border', 'no-vicinal-path', 'sign-not-measured',
  'negative-vicinal', 'limit-used', 'partner-differs', 'larger-than-usual', 'smaller-than-usual', 'from-memory', 'common-practice',
  'cis-trans-not-ez', 'groups-not-given', 'ring-fact', 'symmetric-alkene', 'diene-single-bond', 'polar-carbon', 'sp2-neighbour',
  'beyond-reach', 'one-candidate', 'untested-candidate', 'candidates-conflict', 'relation-superseded', 'small-sample', 'exchange-partner', 'second-order', 'coarse-reading',
] as const;
export type CautionId = (typeof CAUTION_IDS)[number];

/** The next experiment, and what its result would mean. */
export interface NextMeasurement {
  id: string;
  title: string;
  detail: string;
}

export interface SingleBondInput {
  bond: 'single';
  /** as typed */
  j: string;
  se?: string;
  /** the splitting read at the partner, as typed */
  partner?: string;
  fieldMHz?: string;
  /** [at +120° (clockwise), at −120°] from the coupled H of that carbon, as seen from the front; null = not given */
  groups?: { front: [GroupText, GroupText]; rear: [GroupText, GroupText] } | null;
  /** does the bond turn freely (open chain), sit in a ring, or is it not told */
  turning?: 'free' | 'ring' | 'unknown';
  /** 'default' lets the domain choose; else id or id@version of a held relation */
  relation?: string;
}

export type RingSize = 3 | 4 | 5 | 6 | 7 | 8;

export interface DoubleBondInput {
  bond: 'double';
  j: string;
  se?: string;
  partner?: string;
  fieldMHz?: string;
  /** the two groups on each carbon, `H` included; null = not given */
  groups?: { left: [GroupText, GroupText]; right: [GroupText, GroupText] } | null;
  /** 8 stands for 8 and larger; null = not in a ring */
  ringSize?: RingSize | null;
}

export type QuickLookInput = SingleBondInput | DoubleBondInput;

export interface SingleBondFinding {
  roots: Root[];
  arcs: Arc[];
  coverage: Fraction;
  /** √(±² + spread²) */
  sigmaHz: Hz;
  reach: { minHz: Hz; maxHz: Hz };
  /** |φ| halves are mirror images (no substituent term) */
  even: boolean;
}

export type DoubleBondSetting = 'disubstituted' | 'terminal' | 'ring' | 'trisubstituted' | 'tetrasubstituted' | 'not-given';
export type DoubleBondGeometry = 'cis' | 'trans' | 'geminal';

export interface LadderRow {
  geometry: DoubleBondGeometry;
  /** over every class held */
  fullHz: [Hz, Hz];
  /** the class at hand; null when the class has no row for it */
  classHz: [Hz, Hz] | null;
  compounds: SourcedHz[];
}

export interface DoubleBondFinding {
  setting: DoubleBondSetting;
  classId: string | null;
  className: string | null;
  likelihoods: { geometry: DoubleBondGeometry; weight: Fraction }[];
  geometry: 'cis' | 'trans' | null;
  /** what each geometry is called with these groups; null when a tie or unknown neighbours leave no E/Z */
  descriptors: { cis: 'E' | 'Z'; trans: 'E' | 'Z' } | null;
  /** of the geometry above */
  descriptor: 'E' | 'Z' | null;
  descriptorNote: string | null;
  ladder: LadderRow[];
}

/** A complete answer to one measured coupling. Strings carry text markup (`_J_` = italic). */
export interface QuickLookAnswer {
  state: 'answered';
  engineVersion: string;
  bond: 'single' | 'double';
  reading: HzReading;
  partner: HzReading | null;
  notes: InputNote[];
  grade: Grade;
  /** likelihood of the geometry named; null when nothing is decided or the relation gives none */
  likelihood: Fraction | null;
  headline: string;
  detail: string;
  rulesOut: string[];
  cannotTell: string[];
  cautions: Caution[];
  /** "check first", when no angle or geometry gives this J */
  checkFirst: NextMeasurement[];
  measureNext: NextMeasurement[];
  relation: RelationRef | null;
  single: SingleBondFinding | null;
  double: DoubleBondFinding | null;
  steps: TrailStep[];
}

/** The engine needs one more fact before it answers. */
export interface QuickLookQuestion {
  state: 'question';
  engineVersion: string;
  bond: 'single' | 'double';
  field: FieldProblem['field'];
  question: string;
  why: string;
  reading: HzReading;
  notes: InputNote[];
  choices: { label: string; field: FieldProblem['field']; value: string }[];
}

export interface QuickLookRefusal {
  state: 'refused';
  engineVersion: string;
  bond: 'single' | 'double';
  problems: FieldProblem[];
}

export type QuickLookResult = QuickLookAnswer | QuickLookQuestion | QuickLookRefusal;

/** Angle and J at one place of a curve, for dial, marker and table. */
export interface CurvePoint {
  phiDeg: Degrees;
  jHz: Hz;
}
