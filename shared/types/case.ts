import type { DoubleBondInput, Grade, SingleBondInput } from './answer';

export const CASE_STATES = ['draft', 'in-review', 'queried', 'signed', 'superseded', 'withdrawn'] as const;
export type CaseState = (typeof CASE_STATES)[number];

export const EVIDENCE_KINDS = ['noe', 'other-coupling', 'x-ray', 'synthesis', 'literature', 'other'] as const;
export type EvidenceKind = (typeof EVIDENCE_KINDS)[number];

export const COUPLING_PATHS = ['1J', '2J', '3J', '4J', '5J'] as const;
export type CouplingPath = (typeof COUPLING_PATHS)[number];

export const SIGN_STATES = ['not-measured', 'positive', 'negative'] as const;
export type SignState = (typeof SIGN_STATES)[number];

export interface Compound {
  name: string;
  batch: string;
  notebook: string;
  structureNote: string;
  /** earlier names, newest first; a correction never erases one */
  formerNames: string[];
}

/** Numbers as typed; '' = not told. */
export interface Conditions {
  fieldMHz: string;
  solvent: string;
  temperatureK: string;
  concentration: string;
}

/** One measured coupling. `j`, `se` and `partner` are kept as typed. */
export interface Reading {
  id: string;
  atomA: string;
  atomB: string;
  nuclei: string;
  path: CouplingPath;
  j: string;
  se: string;
  partner: string;
  sign: SignState;
  where: string;
  method: string;
  note: string;
}

/** A claim about what a candidate makes of one calculation: a geometry of a double bond, or a stretch of φ. */
export type CandidateClaim =
  | { calculationId: string; kind: 'geometry'; geometry: 'cis' | 'trans' }
  | { calculationId: string; kind: 'angle'; fromDeg: number; toDeg: number };

export interface Candidate {
  id: string;
  name: string;
  description: string;
  claims: CandidateClaim[];
}

export interface Evidence {
  id: string;
  kind: EvidenceKind;
  text: string;
  bearing: 'for' | 'against' | 'neutral';
  /** the candidate it speaks of; null = the case as a whole */
  candidateId: string | null;
  attachmentIds: string[];
}

/** How a reading is turned into geometry: the quick look's inputs without the numbers, which live in the reading. */
export type Calculation =
  | ({ id: string; readingId: string } & Omit<SingleBondInput, 'j' | 'se' | 'partner' | 'fieldMHz'>)
  | ({ id: string; readingId: string } & Omit<DoubleBondInput, 'j' | 'se' | 'partner' | 'fieldMHz'>);

/** What the person concluded. `candidateId` null with grade not-decided = open; 'none' = none of these. */
export interface PersonAnswer {
  grade: Grade;
  candidateId: string | null;
  statement: string;
  reasons: string;
  leftOpen: string;
  /** required when grade or candidate differ from the computed answer */
  overrideReason: string;
}

/** The whole content of a case: what a revision holds and a signature binds to. */
export interface CaseContent {
  format: 1;
  question: string;
  compound: Compound;
  conditions: Conditions;
  readings: Reading[];
  calculations: Calculation[];
  candidates: Candidate[];
  evidence: Evidence[];
  answer: PersonAnswer | null;
  tags: string[];
}
