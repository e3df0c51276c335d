import type { RingSize } from '@/shared/types/answer';
import type { Calculation, Candidate, CandidateClaim, CaseContent, Conditions, Evidence, PersonAnswer, Reading } from '@/shared/types/case';
import type { GroupText } from '@/shared/types/group';

/** Small builders, so that each demo case reads as the chemistry it tells. All values are as a person would have typed them. */
type Pair = [GroupText, GroupText];

export const conditions = (fieldMHz: string, solvent: string, temperatureK = '298', concentration = ''): Conditions => ({ fieldMHz, solvent, temperatureK, concentration });

export const reading = (id: string, atoms: [string, string], j: string, more: Partial<Reading> = {}): Reading => ({
  id, atomA: atoms[0], atomB: atoms[1], nuclei: '1H,1H', path: '3J', j, se: '0.2', partner: '', sign: 'not-measured', where: '', method: '1D, first order', note: '', ...more,
});

export const doubleBond = (id: string, readingId: string, groups: { left: Pair; right: Pair } | null, ringSize: RingSize | null = null): Calculation => ({
  id, readingId, bond: 'double', groups, ringSize,
});

export const singleBond = (
  id: string, readingId: string, groups: { front: Pair; rear: Pair } | null, turning: 'free' | 'ring' | 'unknown', relation = 'default',
): Calculation => ({ id, readingId, bond: 'single', groups, turning, relation });

export const geometry = (calculationId: string, value: 'cis' | 'trans'): CandidateClaim => ({ calculationId, kind: 'geometry', geometry: value });
export const angle = (calculationId: string, fromDeg: number, toDeg: number): CandidateClaim => ({ calculationId, kind: 'angle', fromDeg, toDeg });

export const candidate = (id: string, name: string, claims: CandidateClaim[], description = ''): Candidate => ({ id, name, description, claims });

/** The usual two: E and Z of one CH=CH whose coupling is calculation `c1`. */
export const eAndZ = (calculationIds: string[] = ['c1']): Candidate[] => [
  candidate('e', 'E', calculationIds.map((id) => geometry(id, 'trans')), 'The two hydrogens on opposite sides.'),
  candidate('z', 'Z', calculationIds.map((id) => geometry(id, 'cis')), 'The two hydrogens on the same side.'),
];

export const evidence = (id: string, kind: Evidence['kind'], bearing: Evidence['bearing'], candidateId: string | null, text: string): Evidence => ({
  id, kind, text, bearing, candidateId, attachmentIds: [],
});

export const answer = (grade: PersonAnswer['grade'], candidateId: string | null, statement: string, reasons: string, more: Partial<PersonAnswer> = {}): PersonAnswer => ({
  grade, candidateId, statement, reasons, leftOpen: '', overrideReason: '', ...more,
});

interface Parts {
  question: string;
  compound: { name: string; batch: string; notebook: string; structureNote: string };
  conditions: Conditions;
  readings: Reading[];
  calculations: Calculation[];
  candidates: Candidate[];
  evidence?: Evidence[];
  answer?: PersonAnswer | null;
  tags?: string[];
}

export const content = (parts: Parts): CaseContent => ({
  format: 1,
  question: parts.question,
  compound: { ...parts.compound, formerNames: [] },
  conditions: parts.conditions,
  readings: parts.readings,
  calculations: parts.calculations,
  candidates: parts.candidates,
  evidence: parts.evidence ?? [],
  answer: parts.answer ?? null,
  tags: parts.tags ?? [],
});

/** Groups named once, so that the same group is written the same way in every case. */
export const G = {
  h: 'H', methyl: 'C(H,H,H)', ethylChain: 'C(C,H,H)', branched: 'C(C,C,H)', aryl: 'C(=C,C)', amide: 'C(=O,N)', ester: 'C(=O,O)', ketone: 'C(=O,C)',
  ch2O: 'C(O,H,H)', ch2N: 'C(N,H,H)', chO: 'C(C,O,H)', hydroxy: 'O(H)', alkoxy: 'O(C)', fluoro: 'F', bromo: 'Br', silyl: 'Si(C,C,C)', sulfonyl: 'S(=O,=O,C)', nitrile: 'C(#N)',
  amine: 'N(C,C)', amideN: 'N(C,H)',
} as const;
