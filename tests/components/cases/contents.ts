import type { CaseContent, Reading } from '@/shared/types/case';

import { emptyReading } from '@/components/cases/logic/edits';

/** An invented case, small enough to read in a failing test. */
export function reading(id: string, change: Partial<Reading> = {}): Reading {
  return { ...emptyReading(id), atomA: 'H2', atomB: 'H3', j: '8.9', se: '0.2', ...change };
}

export function content(change: Partial<CaseContent> = {}): CaseContent {
  return {
    format: 1, question: 'Enol ether 5: E or Z?',
    compound: { name: 'Enol ether 5', batch: 'B2', notebook: 'HZ-097', structureNote: '', formerNames: [] },
    conditions: { fieldMHz: '500', solvent: 'CDCl3', temperatureK: '298', concentration: '' },
    readings: [reading('r1'), reading('r2', { atomA: 'H3', atomB: 'H4eq', j: '4.6' })],
    calculations: [{ id: 'k1', readingId: 'r1', bond: 'double', groups: null, ringSize: null }],
    candidates: [{ id: 'c1', name: 'E', description: '', claims: [{ calculationId: 'k1', kind: 'geometry', geometry: 'trans' }] }, { id: 'c2', name: 'Z', description: '', claims: [] }],
    evidence: [{ id: 'e1', kind: 'noe', text: 'H1 to H4', bearing: 'for', candidateId: 'c1', attachmentIds: [] }],
    answer: null, tags: ['alkene'], ...change,
  };
}
