import type { CaseContent, PersonAnswer } from '@/shared/types/case';

/** An invented cinnamate with one reading, both geometries as candidates, and an answer that follows the calculation. */
export const cinnamate = (more: Partial<CaseContent> = {}): CaseContent => ({
  format: 1,
  question: 'Cinnamate 4: E or Z?',
  compound: { name: 'Cinnamate 4', batch: 'B-17', notebook: 'TE-012-33', structureNote: '', formerNames: [] },
  conditions: { fieldMHz: '500', solvent: 'CDCl3', temperatureK: '298', concentration: '' },
  readings: [{ id: 'r1', atomA: 'H2', atomB: 'H3', nuclei: 'H,H', path: '3J', j: '15.90', se: '0.2', partner: '15.9', sign: 'not-measured', where: '6.42 ppm, d', method: '1D', note: '' }],
  calculations: [{ id: 'c1', readingId: 'r1', bond: 'double', groups: { left: ['C(=C,C)', 'H'], right: ['C(=O,O)', 'H'] }, ringSize: null }],
  candidates: [
    { id: 'e', name: 'E', description: '', claims: [{ calculationId: 'c1', kind: 'geometry', geometry: 'trans' }] },
    { id: 'z', name: 'Z', description: '', claims: [{ calculationId: 'c1', kind: 'geometry', geometry: 'cis' }] },
  ],
  evidence: [], answer: { grade: 'assigned', candidateId: 'e', statement: 'E, the phenyl and the ester on opposite sides', reasons: 'The coupling lies well inside the trans class.', leftOpen: '', overrideReason: '' },
  tags: ['cinnamates'],
  ...more,
});

export const answerOf = (more: Partial<PersonAnswer>): PersonAnswer => ({ grade: 'not-decided', candidateId: null, statement: '', reasons: 'One value alone.', leftOpen: 'Both geometries.', overrideReason: '', ...more });

/** Two carbons with every group given: an angle from the generalised equation, with two candidates that claim a stretch of it. */
export const dihedral = (more: Partial<CaseContent> = {}): CaseContent => cinnamate({
  question: 'Pyranol 7: 2,3-cis or trans?',
  compound: { name: 'Aryl tetrahydropyranol 7', batch: '', notebook: '', structureNote: '', formerNames: [] },
  readings: [{ id: 'r1', atomA: 'H2', atomB: 'H3', nuclei: 'H,H', path: '3J', j: '8.9', se: '0.2', partner: '9.0', sign: 'not-measured', where: '3.66 ppm, ddd', method: '', note: '' }],
  calculations: [{ id: 'c1', readingId: 'r1', bond: 'single', turning: 'ring', groups: { front: ['C(=C,C)', 'O(C)'], rear: ['O(H)', 'C(C,H,H)'] } }],
  candidates: [
    { id: 'trans', name: '2,3-trans', description: 'H2 and H3 axial', claims: [{ calculationId: 'c1', kind: 'angle', fromDeg: 160, toDeg: 200 }] },
    { id: 'cis', name: '2,3-cis', description: 'aryl axial', claims: [{ calculationId: 'c1', kind: 'angle', fromDeg: 40, toDeg: 80 }] },
  ],
  answer: answerOf({ grade: 'tentative', candidateId: 'trans', statement: '2,3-trans', reasons: 'The cis form gives no such coupling.' }),
  ...more,
});
