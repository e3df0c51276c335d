import { z } from 'zod';

import { CAUTION_IDS } from '../types/answer';
import { grade, ink, reviewStep } from './common';

/** Shapes that the engine makes; the same in a quick look, a revision's trail and a check. */
export const provenance = z.enum(['seen', 'practice', 'memory']);
export const sector = z.enum(['sp', '+sc', '+ac', 'ap', '-ac', '-sc']);
export const fieldName = z.enum(['j', 'se', 'partner', 'fieldMHz', 'groups', 'groups.front', 'groups.rear', 'groups.left', 'groups.right',
  'ringSize', 'smiles', 'relation', 'turning', 'temperatureK', 'phiDeg']);

export const relationRef = z.object({
  id: z.string(), version: z.number().int(), name: z.string(), formula: z.string(), citation: z.string(), doi: z.string().optional(),
  spreadHz: z.number(), spreadProvenance: provenance, provenance,
});
export const caution = z.object({ id: z.enum(CAUTION_IDS), text: z.string() });
export const nextMeasurement = z.object({ id: z.string(), title: z.string(), detail: z.string() });
export const hzReading = z.object({
  typed: z.string(), jHz: z.number(), decimals: z.number().int(), limit: z.enum(['none', 'upper', 'lower']), seHz: z.number(),
  seSource: z.enum(['typed', 'default', 'approximate']),
});
export const inputNote = z.object({
  field: fieldName,
  code: z.enum(['decimal-comma', 'unit-typed', 'approximate', 'default-error', 'limit', 'range', 'sign-dropped', 'digits-coarse', 'stereo-ignored']),
  text: z.string(),
});
export const mend = z.object({ label: z.string(), field: fieldName, value: z.string() });
export const fieldProblem = z.object({ field: fieldName, code: z.string(), sentence: z.string(), mends: z.array(mend) });
export const root = z.object({ phiDeg: z.number(), sector });
export const arc = z.object({ fromDeg: z.number(), toDeg: z.number(), sectors: z.array(sector) });
export const trailStep = z.object({
  key: z.string(), ink, reviewStep: reviewStep.nullable(), title: z.string(), summary: z.string(),
  inputs: z.array(z.object({ label: z.string(), value: z.string(), ref: z.string().optional() })),
  relation: relationRef.optional(), formula: z.string().optional(), worked: z.string().optional(), flags: z.array(caution),
});

const hzRange = z.tuple([z.number(), z.number()]);
const geometry = z.enum(['cis', 'trans', 'geminal']);
const ezLetter = z.enum(['E', 'Z']);
export const singleBondFinding = z.object({
  roots: z.array(root), arcs: z.array(arc), coverage: z.number(), sigmaHz: z.number(),
  reach: z.object({ minHz: z.number(), maxHz: z.number() }), even: z.boolean(),
});
export const doubleBondFinding = z.object({
  setting: z.enum(['disubstituted', 'terminal', 'ring', 'trisubstituted', 'tetrasubstituted', 'not-given']),
  classId: z.string().nullable(), className: z.string().nullable(),
  likelihoods: z.array(z.object({ geometry, weight: z.number() })),
  geometry: z.enum(['cis', 'trans']).nullable(),
  descriptors: z.object({ cis: ezLetter, trans: ezLetter }).nullable(),
  descriptor: ezLetter.nullable(), descriptorNote: z.string().nullable(),
  ladder: z.array(z.object({
    geometry, fullHz: hzRange, classHz: hzRange.nullable(),
    compounds: z.array(z.object({ jHz: z.number(), name: z.string(), provenance, source: z.string() })),
  })),
});

export const quickLookAnswer = z.object({
  state: z.literal('answered'), engineVersion: z.string(), bond: z.enum(['single', 'double']),
  reading: hzReading, partner: hzReading.nullable(), notes: z.array(inputNote),
  grade, likelihood: z.number().nullable(), headline: z.string(), detail: z.string(),
  rulesOut: z.array(z.string()), cannotTell: z.array(z.string()), cautions: z.array(caution),
  checkFirst: z.array(nextMeasurement), measureNext: z.array(nextMeasurement),
  relation: relationRef.nullable(), single: singleBondFinding.nullable(), double: doubleBondFinding.nullable(),
  steps: z.array(trailStep),
});
export const quickLookQuestion = z.object({
  state: z.literal('question'), engineVersion: z.string(), bond: z.enum(['single', 'double']), field: fieldName,
  question: z.string(), why: z.string(), reading: hzReading, notes: z.array(inputNote),
  choices: z.array(z.object({ label: z.string(), field: fieldName, value: z.string() })),
});
export const quickLookRefusal = z.object({
  state: z.literal('refused'), engineVersion: z.string(), bond: z.enum(['single', 'double']), problems: z.array(fieldProblem),
});

export const caseTrail = z.object({
  format: z.literal(1), engineVersion: z.string(), relations: z.array(relationRef),
  calculations: z.array(z.object({
    calculationId: z.string(), readingId: z.string(),
    result: z.discriminatedUnion('state', [quickLookAnswer, quickLookQuestion, quickLookRefusal]),
  })),
  candidates: z.array(z.object({
    candidateId: z.string(), status: z.enum(['fits', 'excluded', 'open', 'not-tested']),
    verdicts: z.array(z.object({ calculationId: z.string(), verdict: z.enum(['fits', 'excluded', 'open', 'not-tested']), why: z.string() })),
  })),
  notTested: z.array(z.string()),
  answer: z.object({ grade, candidateId: z.string().nullable(), headline: z.string(), detail: z.string() }),
  cautions: z.array(caution), measureNext: z.array(nextMeasurement), steps: z.array(trailStep),
});
