import type { Caution, Grade, QuickLookAnswer, QuickLookQuestion, QuickLookRefusal, RelationRef } from './answer';

export const INKS = ['measured', 'calculated', 'judged'] as const;
export type Ink = (typeof INKS)[number];

/** The reviewer's check-list; each trail step belongs to at most one of them. */
export const REVIEW_STEPS = ['reciprocity', 'domain', 'second-root', 'other-evidence', 'alternatives'] as const;
export type ReviewStep = (typeof REVIEW_STEPS)[number];

/** One step of the reasoning, readable by itself and tied to what it used. */
export interface TrailStep {
  /** stable within a case: 'reading:<id>', 'relation:<calculationId>', 'roots:<calculationId>', 'candidates', 'answer' … */
  key: string;
  ink: Ink;
  reviewStep: ReviewStep | null;
  title: string;
  summary: string;
  inputs: { label: string; value: string; ref?: string }[];
  relation?: RelationRef;
  /** the printed formula, and the same with its numbers put in */
  formula?: string;
  worked?: string;
  flags: Caution[];
}

/** What one calculation says of what one candidate claims. */
export interface CandidateVerdict {
  calculationId: string;
  verdict: 'fits' | 'excluded' | 'open' | 'not-tested';
  why: string;
}

export interface CandidateFinding {
  candidateId: string;
  status: 'fits' | 'excluded' | 'open' | 'not-tested';
  verdicts: CandidateVerdict[];
}

/** The engine's own answer to a whole case. */
export interface ComputedAnswer {
  grade: Grade;
  candidateId: string | null;
  headline: string;
  detail: string;
}

/** Everything the engine makes of a case's content; stored with each revision and replayed to the same digits. */
export interface CaseTrail {
  format: 1;
  engineVersion: string;
  relations: RelationRef[];
  calculations: { calculationId: string; readingId: string; result: QuickLookAnswer | QuickLookQuestion | QuickLookRefusal }[];
  candidates: CandidateFinding[];
  /** names of what was not tested; stands at the top of the review */
  notTested: string[];
  answer: ComputedAnswer;
  cautions: Caution[];
  measureNext: { id: string; title: string; detail: string }[];
  steps: TrailStep[];
}
