import fc from 'fast-check';

import { relationRegistry } from '@/server/relations/registry';
import { gapsBeforeReview } from '@/server/features/cases/gaps';
import { addendumHash, contentHash, signatureHash } from '@/server/features/cases/hash';
import { decodeCursor, pageStatement } from '@/server/features/cases/list';
import { listingOf } from '@/server/features/cases/listing';
import { formerNames, normalised, checkReferences } from '@/server/features/cases/normalise';
import { searchPatterns, searchQuery, searchText } from '@/server/features/cases/searchText';
import { targetLabel } from '@/server/features/cases/targets';
import { Problem } from '@/server/http/problems';
import { canonicalJson, caseTrail } from '@/shared/engine';
import { formulaDigits } from '@/shared/format/formula';
import type { CaseContent } from '@/shared/types/case';
import { answerOf, cinnamate, dihedral } from '@/tests/helpers/caseContent';

const registry = relationRegistry();
const trailOf = (content: CaseContent) => caseTrail(content, registry);
const pointers = (content: CaseContent): string[] => gapsBeforeReview(content, trailOf(content)).map(({ pointer }) => pointer);

describe('gaps before review', () => {
  it('has none in a whole case, decided or not', () => {
    expect(pointers(cinnamate())).toEqual([]);
    expect(pointers(dihedral())).toEqual([]);
  });
  const first = cinnamate().readings[0]!;
  it.each<[string, Partial<CaseContent>, string]>([
    ['no reading', { readings: [], calculations: [] }, '#/content/readings'],
    ['no calculation', { calculations: [] }, '#/content/calculations'],
    ['a reading that cannot be read', { readings: [{ ...first, j: 'broad' }] }, '#/content/readings/0/j'],
    ['a ± of zero', { readings: [{ ...first, se: '0' }] }, '#/content/readings/0/se'],
    ['a field that cannot be', { conditions: { ...cinnamate().conditions, fieldMHz: '5' } }, '#/content/conditions/fieldMHz'],
    ['text in a reading that no calculation uses', { readings: [first, { ...first, id: 'r2', j: 'wide' }] }, '#/content/readings/1/j'],
    ['no answer', { answer: null }, '#/content/answer'],
    ['no reasons', { answer: { ...cinnamate().answer!, reasons: ' ' } }, '#/content/answer/reasons'],
    ['an answer without a candidate', { answer: { ...cinnamate().answer!, candidateId: null } }, '#/content/answer/candidateId'],
    ['an answer that names nothing', { answer: { ...cinnamate().answer!, candidateId: 'gone' } }, '#/content/answer/candidateId'],
    ['one candidate', { candidates: cinnamate().candidates.slice(0, 1) }, '#/content/candidates'],
    ['a candidate without a name', { candidates: cinnamate().candidates.map((one) => ({ ...one, name: '' })) }, '#/content/candidates/0/name'],
    ['another answer than the calculated one without a reason', { answer: answerOf({ grade: 'not-decided' }) }, '#/content/answer/overrideReason'],
  ])('tells %s at its field', (_what, more, pointer) => {
    expect(pointers(cinnamate(more))).toContain(pointer);
  });
  it('says each in one sentence', () => {
    for (const { detail } of gapsBeforeReview(cinnamate({ readings: [], calculations: [], answer: null }), trailOf(cinnamate({ readings: [], calculations: [], answer: null })))) {
      expect(detail).toMatch(/^[A-Z].*[.:]/);
    }
  });
  it('lets a single candidate stand when nothing is decided', () => {
    const content = cinnamate({ candidates: cinnamate().candidates.slice(0, 1), answer: answerOf({}) });
    expect(pointers(content)).toEqual([]);
  });
});

describe('what is kept of a content', () => {
  it('never loses an earlier name, whatever a client sends', () => {
    const before = cinnamate();
    const renamed = normalised(cinnamate({ compound: { ...before.compound, name: 'B', formerNames: ['invented'] } }), before);
    expect(renamed.compound.formerNames).toEqual(['Cinnamate 4']);
    const again = normalised(cinnamate({ compound: { ...before.compound, name: 'C', formerNames: [] } }), renamed);
    expect(again.compound.formerNames).toEqual(['B', 'Cinnamate 4']);
    expect(formerNames(again.compound, 'Cinnamate 4')).toEqual(['C', 'B']);
    expect(formerNames({ name: '', formerNames: [] }, 'A')).toEqual([]);
  });
  it('keeps a tag once', () => {
    expect(normalised(cinnamate({ tags: ['A', 'a', ' A ', 'b'] }), null).tags).toEqual(['A', 'b']);
  });
  it('refuses rows that cannot be told apart, and names that lead nowhere', () => {
    const reading = cinnamate().readings[0]!;
    const wrong = (content: CaseContent): string[] => {
      try {
        checkReferences(content, new Set());
      } catch (error) {
        return (error as Problem).extra.errors?.map(({ pointer }) => pointer) ?? [];
      }
      return [];
    };
    expect(wrong(cinnamate())).toEqual([]);
    expect(wrong(cinnamate({ readings: [reading, reading] }))).toEqual(['#/content/readings/1/id']);
    expect(wrong(cinnamate({ readings: [] }))).toEqual(['#/content/calculations/0/readingId']);
    expect(wrong(cinnamate({ evidence: [{ id: 'e1', kind: 'noe', text: '', bearing: 'for', candidateId: null, attachmentIds: ['7a0e4c0e-5d53-4a1e-9a39-0a4a6a2f2a11'] }] }))).toEqual(['#/content/evidence/0/attachmentIds/0']);
  });
});

describe('hashes', () => {
  const content = canonicalJson(cinnamate());
  const trail = canonicalJson(trailOf(cinnamate()));
  const file = { id: 'f', sha256: 'a'.repeat(64) };
  it('change with one byte of content, trail or a cited file, and with nothing else', () => {
    const hash = contentHash(content, trail, [file]);
    expect(hash).toMatch(/^[0-9a-f]{64}$/);
    expect(contentHash(canonicalJson(cinnamate()), canonicalJson(trailOf(cinnamate())), [file])).toBe(hash);
    expect(contentHash(content.replace('15.90', '15.91'), trail, [file])).not.toBe(hash);
    expect(contentHash(content, `${trail} `, [file])).not.toBe(hash);
    expect(contentHash(content, trail, [{ ...file, sha256: 'b'.repeat(64) }])).not.toBe(hash);
    expect(contentHash(content, trail, [])).not.toBe(hash);
    const two = [file, { id: 'g', sha256: 'c'.repeat(64) }];
    expect(contentHash(content, trail, two)).toBe(contentHash(content, trail, [...two].reverse()));
  });
  it('of a signature cover name, time and meaning; of an addendum its text and the one before', () => {
    const at = new Date('2026-12-01T10:00:00Z');
    const signature = { caseId: 'c', revision: 2, meaning: 'review', signerId: 's', signerName: 'Rafe', signedAt: at, contentHash: 'a'.repeat(64) };
    const all = [signature, { ...signature, meaning: 'approval' }, { ...signature, signerName: 'Raf' }, { ...signature, signedAt: new Date(at.getTime() + 1) }, { ...signature, revision: 3 }];
    expect(new Set(all.map(signatureHash)).size).toBe(all.length);
    const addendum = { caseId: 'c', number: 1, text: 'x', byId: 's', byName: 'Rafe', at, previousHash: 'a'.repeat(64) };
    expect(new Set([addendum, { ...addendum, text: 'y' }, { ...addendum, previousHash: 'b'.repeat(64) }].map(addendumHash)).size).toBe(3);
  });
});

describe('search', () => {
  const finds = (text: string, typed: string): boolean => {
    const held = searchText([text]).split(' ');
    // both ways of asking must agree: LIKE over the text, and the prefix of a token
    const like = searchPatterns(typed).every((pattern) => searchText([text]).includes(pattern.slice(1, -1)));
    const prefix = (searchQuery(typed) ?? '').split(' ')          .every((word) => held.some((one) => one.startsWith(word.slice(1, -1))));
    expect(like).toBe(prefix);
    return prefix;
  };
  it.each([
    ['Aryl tetrahydropyranol HZ-114', 'pyranol'], ['HAZ-0027', 'haz-0027'], ['CDCl₃', 'cdcl3'], ['Łódź amide', 'łódź'], ['Müller', 'muller'], ['2,3-cis', '2'], ['φ sweep', 'φ'],
  ])('finds in "%s" what was typed as "%s"', (text, typed) => expect(finds(text, typed)).toBe(true));
  it('does not find what is not there, and no operator gets through', () => {
    expect(finds('Aryl tetrahydropyranol', 'furanol')).toBe(false);
    expect(searchQuery('+a -b* "c" (d) @2 ~e <f>')).toBe('+qa* +qb* +qc* +qd* +q2* +qe* +qf*');
    expect(searchQuery(' -- ')).toBeNull();
  });
  it('finds any piece of any word', () => {
    fc.assert(fc.property(fc.string({ unit: fc.constantFrom(...'abcdé123'), minLength: 1, maxLength: 12 }), fc.nat(11), fc.nat(11), (word, a, b) => {
      const [from, to] = [Math.min(a, b) % word.length, Math.max(a, b)];
      const piece = word.slice(from, to + 1);
      return piece === '' || finds(word, piece);
    }));
  });
});

describe('the log', () => {
  it('shows the person\'s answer before the calculated one, and the reading as typed', () => {
    const listing = listingOf(cinnamate(), trailOf(cinnamate()));
    expect(listing).toMatchObject({ keyLabel: 'H2–H3', keyJText: '15.90\u00a0Hz', answerGrade: 'assigned', answerJudged: true, answerText: 'E, the phenyl and the ester on opposite sides' });
    const open = cinnamate({ answer: null });
    expect(listingOf(open, trailOf(open))).toMatchObject({ answerJudged: false, answerGrade: trailOf(open).answer.grade });
  });
  it('reads each project along its index, and takes no cursor that is not its own', () => {
    const { sql } = pageStatement({ sort: 'changed' }, ['p', 'q'], 26);
    expect(sql.match(/FORCE INDEX \(cases_changed\)/g)).toHaveLength(2);
    for (const cursor of ['x', Buffer.from('["a"]').toString('base64url'), Buffer.from('{"a":1}').toString('base64url')]) expect(() => decodeCursor(cursor)).toThrow(Problem);
    expect(() => pageStatement({ cursor: Buffer.from('["now()","x"]').toString('base64url') }, ['p'], 2)).toThrow(Problem);
  });
  it('names the value of a comment', () => {
    const content = cinnamate();
    const names = ['case', 'question', 'compound/name', 'conditions.solvent', 'readings/r1/j', 'readings.r1', 'calculations/c1', 'candidates/e', 'answer/reasons', 'relation:c1'].map((target) => targetLabel(target, content, trailOf(content)));
    expect(names).toEqual(['the case', 'question', 'compound, name', 'conditions, solvent', 'H2–H3, j', 'H2–H3', 'calculation H2–H3', 'E', 'answer, reasons', 'Relation, H2–H3']);
    for (const target of ['readings/r9', 'compound/constructor', 'nothing', '../..']) expect(targetLabel(target, content, trailOf(content))).toBeNull();
  });
  it('prints formulas with their digits down, and leaves ratios alone', () => {
    expect(['CDCl3', 'DMSO-d6', 'C6D6', 'CD3OD/D2O 9:1', '10 mM'].map(formulaDigits)).toEqual(['CDCl₃', 'DMSO-d₆', 'C₆D₆', 'CD₃OD/D₂O 9:1', '10 mM']);
  });
});
