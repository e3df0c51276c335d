import { arcChoices, angleOf, claimForm, claimsOf } from '@/components/cases/logic/claims';
import { fieldProblem, temperatureProblem } from '@/components/cases/logic/conditions';
import { addTag, moveReading, putCalculation, removeCandidate, removeReading } from '@/components/cases/logic/edits';
import { placeOf } from '@/components/cases/logic/fieldSentences';
import { bytesWords, fileProblem } from '@/components/cases/logic/fileCheck';
import { applyMend, calculationOf, formOf } from '@/components/cases/logic/mends';
import { checkReading, isProtonPair, nextAtoms } from '@/components/cases/logic/readingForm';
import { sheetFor } from '@/components/cases/logic/sheetFor';
import { LIMITS } from '@/shared/limits';
import type { Calculation } from '@/shared/types/case';

import { content, reading } from './contents';

const spectrum = content().conditions;

describe('a reading, told in its form', () => {
  it('names a ppm distance typed as Hz and mends it with the field of the case', () => {
    const { errors, problems } = checkReading(reading('r', { j: '0.0178' }), spectrum);
    expect(errors.j).toMatch(/ppm/);
    expect(problems[0]?.mends[0]).toMatchObject({ field: 'j', value: '8.9' });       // 0.0178 ppm × 500 MHz = 8.9 Hz, closed form
  });
  it('refuses an error of zero and takes a decimal comma with a note', () => {
    expect(checkReading(reading('r', { se: '0' }), spectrum).errors.se).toBeDefined();
    const comma = checkReading(reading('r', { j: '7,1' }), spectrum);
    expect(comma.errors).toEqual({});
    expect(comma.notes.map((note) => note.code)).toContain('decimal-comma');
  });
  it('asks for atoms and a number, and leaves other nuclei their own range', () => {
    expect(Object.keys(checkReading(reading('r', { atomB: ' ', j: '' }), spectrum).errors)).toEqual(['atoms', 'j']);
    expect(checkReading(reading('r', { nuclei: '13C,1H', path: '1J', j: '160' }), spectrum).errors).toEqual({});
    expect(isProtonPair({ nuclei: '¹H,¹H' }) && isProtonPair({ nuclei: 'H, H' }) && isProtonPair({ nuclei: '' })).toBe(true);
    expect(isProtonPair({ nuclei: '¹³C,¹H' })).toBe(false);
  });
  it('lets the atoms run on from one reading to the next', () => {
    expect(nextAtoms({ atomB: 'H3 ' })).toEqual({ atomA: 'H3', atomB: '' });
  });
});

describe('conditions', () => {
  it('takes 25 K for degrees Celsius and a small field for tesla', () => {
    expect(temperatureProblem('25')).toEqual({ kind: 'too-small', meant: '298' });           // 25 + 273.15 K
    expect(temperatureProblem('-20 °C')).toEqual({ kind: 'too-small', meant: '253' });
    expect(temperatureProblem('298')).toBeNull();
    expect(temperatureProblem('warm')).toEqual({ kind: 'not-a-number' });
    expect(fieldProblem('11.7')).toEqual({ kind: 'too-small', meant: '500' });                // 42.577 MHz/T, CODATA proton gyromagnetic ratio over 2π
    expect(fieldProblem('500.13 MHz')).toBeNull();
    expect(fieldProblem('')).toBeNull();
  });
});

describe('claims of a candidate', () => {
  it('reads a stretch from the first angle on, past 180° where it must', () => {
    expect(claimsOf({ kind: 'angle', from: '150', to: '−150' }, 'k')).toEqual([{ calculationId: 'k', kind: 'angle', fromDeg: 150, toDeg: 210 }]);
    expect(claimsOf({ kind: 'angle', from: '-60°', to: '60' }, 'k')).toEqual([{ calculationId: 'k', kind: 'angle', fromDeg: -60, toDeg: 60 }]);
    expect(claimsOf({ kind: 'angle', from: 'gauche', to: '60' }, 'k')).toBeNull();
    expect(claimsOf({ kind: 'none' }, 'k')).toEqual([]);
    expect(angleOf('541')).toBeNull();
  });
  it('shows again what was claimed', () => {
    const candidate = { id: 'c', name: 'x', description: '', claims: claimsOf({ kind: 'angle', from: '150', to: '-150' }, 'k1')! };
    expect(claimForm(candidate, content().calculations[0]!)).toEqual({ kind: 'angle', from: '150', to: '210' });
    expect(arcChoices(undefined)).toEqual([]);
  });
});

describe('calculations in a case', () => {
  const double: Calculation = { id: 'k1', readingId: 'r1', bond: 'double', groups: { left: ['C(H,H,H)', 'H'], right: ['C(=O,O)', 'H'] }, ringSize: null };
  const single: Calculation = { id: 'k2', readingId: 'r1', bond: 'single', groups: { front: ['O(C)', 'H'], rear: ['C(C,H,H)', 'H'] }, turning: 'ring', relation: 'vicinal-hh/any' };
  it('go through the quick look\u2019s form and back unchanged', () => {
    for (const each of [double, single]) expect(calculationOf(formOf(each), { id: each.id, readingId: each.readingId })).toEqual(each);
  });
  it('take a mend where it belongs', () => {
    const start = { ...content(), calculations: [single] };
    expect(applyMend(start, 'k2', { field: 'j', value: '< 1' }).readings[0]!.j).toBe('< 1');
    expect(applyMend(start, 'k2', { field: 'fieldMHz', value: '600' }).conditions.fieldMHz).toBe('600');
    expect(applyMend(start, 'k2', { field: 'turning', value: 'free' }).calculations[0]).toMatchObject({ turning: 'free' });
    expect(applyMend(start, 'gone', { field: 'j', value: '1' })).toBe(start);
  });
  it('lose the claims on them when the kind of bond changes, and go with their reading', () => {
    const changed = putCalculation(content(), { id: 'k1', readingId: 'r1', bond: 'single', groups: null, turning: 'free' });
    expect(changed.candidates[0]!.claims).toEqual([]);
    expect(removeReading(content(), 'r1').calculations).toEqual([]);
  });
});

describe('rows', () => {
  it('cut every link to a removed candidate', () => {
    const answered = { ...content(), answer: { grade: 'assigned' as const, candidateId: 'c1', statement: '', reasons: '', leftOpen: '', overrideReason: '' } };
    const removed = removeCandidate(answered, 'c1');
    expect(removed.evidence[0]!.candidateId).toBeNull();
    expect(removed.answer!.candidateId).toBeNull();
    expect(removeCandidate({ ...answered, answer: { ...answered.answer, candidateId: 'none' } }, 'c1').answer!.candidateId).toBe('none');
  });
  it('keep one tag of a word and stop at the ends of a list', () => {
    expect(addTag(content(), '  Alkene ').tags).toEqual(['alkene']);
    expect(addTag(content(), 'NOE').tags).toEqual(['alkene', 'NOE']);
    expect(moveReading(content(), 'r1', -1).readings.map((row) => row.id)).toEqual(['r1', 'r2']);
    expect(moveReading(content(), 'r1', 1).readings.map((row) => row.id)).toEqual(['r2', 'r1']);
  });
});

describe('gaps and files', () => {
  it('lead each gap to the sheet in which it is mended', () => {
    expect(sheetFor('#/content/readings/1/j', content())).toEqual({ kind: 'reading', id: 'r2' });
    expect(sheetFor('#/content/calculations', content())).toEqual({ kind: 'calculation', readingId: 'r1', id: null });
    expect(sheetFor('#/content/answer/reasons', content())).toEqual({ kind: 'answer' });
    expect(sheetFor('#/content/conditions/fieldMHz', content())).toEqual({ kind: 'conditions' });
    expect(placeOf('#/password')).toBeNull();
  });
  it('refuse a file before it is sent, with its size in words', () => {
    expect(fileProblem({ name: 'a.pdf', size: LIMITS.attachmentBytes }, 0)).toBeUndefined();
    expect(fileProblem({ name: 'a.pdf', size: LIMITS.attachmentBytes + 1 }, 0)).toMatch(/10\.0\u00A0MB/);
    expect(fileProblem({ name: 'a.pdf', size: 0 }, 0)).toMatch(/empty/);
    expect(fileProblem({ name: 'a.pdf', size: 5 }, LIMITS.attachmentsPerCase)).toBeDefined();
    expect(bytesWords(2048)).toBe('2\u00A0kB');
  });
});
