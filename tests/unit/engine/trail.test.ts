import fc from 'fast-check';

import { canonicalJson, caseTrail, contentFromQuickLook, diffContent, quickLook } from '@/shared/engine';
import type { QuickLookInput } from '@/shared/types/answer';
import type { CaseContent, Reading } from '@/shared/types/case';
import { heldForTests } from '../../helpers/registry';

const registry = heldForTests();
const alkene = (j: string): QuickLookInput => ({ bond: 'double', j, se: '0.2', fieldMHz: '500', groups: { left: ['H', 'C(=O,O)'], right: ['H', 'C(=C,C)'] } });
const bond: QuickLookInput = { bond: 'single', j: '9.6', se: '0.3', groups: { front: ['O(C)', 'C(H,H,H)'], rear: ['C(H,H,H)', 'H'] }, turning: 'ring' };
const kept = (input: QuickLookInput): CaseContent => contentFromQuickLook(input, quickLook(input, registry));

function twoReadings(): CaseContent {
  const content = kept(alkene('15.8'));
  const reading: Reading = { ...(content.readings[0] as Reading), id: 'r2', atomA: 'H5', atomB: 'H6', j: '10.8', se: '0.2' };
  return {
    ...content,
    readings: [{ ...(content.readings[0] as Reading), atomA: 'H2', atomB: 'H3' }, reading],
    calculations: [...content.calculations, { id: 'c2', readingId: 'r2', bond: 'double', groups: { left: ['H', 'C'], right: ['H', 'C'] } }],
    candidates: [
      ['EE', 'trans', 'trans'], ['EZ', 'trans', 'cis'], ['ZE', 'cis', 'trans'], ['ZZ', 'cis', 'cis'],
    ].map(([name = '', a, b]) => ({
      id: name, name, description: '',
      claims: [{ calculationId: 'c1', kind: 'geometry', geometry: a === 'cis' ? 'cis' : 'trans' }, { calculationId: 'c2', kind: 'geometry', geometry: b === 'cis' ? 'cis' : 'trans' }],
    })),
  };
}

describe('a quick look kept as a case', () => {
  it.each([['double', alkene('15.8')], ['single', bond]] as const)('%s bond: holds every number as typed and gives the same digits again', (_name, input) => {
    const content = kept(input);
    expect(content.readings[0]).toMatchObject({ j: input.j, se: input.se, path: '3J', nuclei: 'H,H' });
    expect(content.conditions.fieldMHz).toBe(input.fieldMHz ?? '');
    const trail = caseTrail(content, registry);
    const own = quickLook(input, registry);
    const again = trail.calculations[0]?.result;
    if (own.state !== 'answered' || again?.state !== 'answered') throw new Error('not answered');
    expect(again.single).toEqual(own.single);
    expect(again.double).toEqual(own.double);
    expect(again.headline).toBe(own.headline);
  });
  it('names both geometries, and one candidate for each arc', () => {
    expect(kept(alkene('15.8')).candidates.map((c) => c.name)).toEqual(['Z (cis)', 'E (trans)']);
    expect(kept(bond).candidates).toHaveLength(3);
  });
  it('leaves geometries untested where no vicinal path is there, and gives none in a small ring', () => {
    const crowded = kept({ bond: 'double', j: '1.5', groups: { left: ['C(H,H,H)', 'C(=O,O)'], right: ['H', 'C(H,H,H)'] } });
    expect(caseTrail(crowded, registry)).toMatchObject({ notTested: ['E (cis)', 'Z (trans)'], answer: { grade: 'not-decided', candidateId: null } });
    expect(kept({ bond: 'double', j: '10.1', ringSize: 6 }).candidates).toEqual([]);
  });
  it('carries a question or a refusal without candidates', () => {
    const asked: QuickLookInput = { bond: 'single', j: '-7.0' };
    expect(kept(asked)).toMatchObject({ candidates: [], readings: [{ j: '-7.0', sign: 'negative' }] });
    const trail = caseTrail(kept(asked), registry);
    expect(trail.calculations[0]?.result.state).toBe('question');
    expect(trail.answer.grade).toBe('not-decided');
  });
});

describe('the computed answer', () => {
  it('is the one candidate left, with the weakest grade that excluded the others', () => {
    expect(caseTrail(kept(alkene('15.8')), registry).answer).toMatchObject({ grade: 'assigned', candidateId: 'trans' });
    expect(caseTrail(kept(alkene('14.3')), registry).answer).toMatchObject({ grade: 'tentative', candidateId: 'trans' });
    expect(caseTrail(twoReadings(), registry).answer).toMatchObject({ grade: 'assigned', candidateId: 'EZ' });
    const weaker = twoReadings();
    weaker.readings = weaker.readings.map((r) => (r.id === 'r2' ? { ...r, j: '11.3' } : r));
    expect(caseTrail(weaker, registry).answer).toMatchObject({ grade: 'tentative', candidateId: 'EZ' });
  });
  it('is not decided with one candidate, an untested one, several left, or none left', () => {
    const content = kept(alkene('15.8'));
    const answer = (c: CaseContent) => caseTrail(c, registry).answer;
    const untested = { id: 'x', name: 'third', description: '', claims: [] };
    expect(answer({ ...content, candidates: [] })).toMatchObject({ grade: 'not-decided', candidateId: null });
    expect(answer({ ...content, candidates: content.candidates.slice(1) })).toMatchObject({ grade: 'not-decided', candidateId: null });
    expect(answer({ ...content, candidates: [...content.candidates, untested] })).toMatchObject({ grade: 'not-decided', headline: 'third was not tested' });
    expect(answer(kept(alkene('12.4')))).toMatchObject({ grade: 'not-decided', candidateId: null });
    expect(answer({ ...content, candidates: content.candidates.map((c) => ({ ...c, claims: [{ calculationId: 'c1', kind: 'geometry', geometry: 'cis' }] })) })).toMatchObject({ grade: 'not-decided', headline: 'None of these fits' });
  });
  it('keeps angles tentative, and excludes an angle only outside every arc of a graded answer', () => {
    const content = kept(bond);
    const claim = (id: string, fromDeg: number, toDeg: number) => ({ id, name: id, description: '', claims: [{ calculationId: 'c1', kind: 'angle' as const, fromDeg, toDeg }] });
    const pair = { ...content, candidates: [claim('anti', 150, 200), claim('gauche', 50, 70)] };
    expect(caseTrail(pair, registry).answer).toMatchObject({ grade: 'tentative', candidateId: 'anti' });
    // written from the other side of the circle it is the same stretch
    expect(caseTrail({ ...pair, candidates: [claim('anti', -210, -160), claim('gauche', 410, 430)] }, registry).answer).toMatchObject({ grade: 'tentative', candidateId: 'anti' });
    // an average supports no angle, so it excludes none
    const turning = { ...pair, readings: pair.readings.map((r) => ({ ...r, j: '6.9' })), calculations: pair.calculations.map((c) => ({ ...c, turning: 'free' as const })) };
    expect(caseTrail(turning, registry).candidates.map((c) => c.status)).toEqual(['open', 'open']);
  });
  it('is withheld where the partners differ', () => {
    const content = kept(alkene('15.8'));
    const differ = { ...content, readings: content.readings.map((r) => ({ ...r, partner: '14.9' })) };
    expect(caseTrail(differ, registry).answer.grade).toBe('not-decided');
  });
  it('does not rest on a reading over another path or between other nuclei', () => {
    const content = kept(alkene('15.8'));
    for (const more of [{ path: '2J' as const }, { path: '4J' as const }, { nuclei: 'C,H' }]) {
      const trail = caseTrail({ ...content, readings: content.readings.map((r) => ({ ...r, ...more })) }, registry);
      expect(trail.calculations[0]?.result).toMatchObject({ state: 'refused', problems: [{ code: 'path' }] });
      expect(trail.answer.grade).toBe('not-decided');
    }
    for (const nuclei of ['', '1H,1H', '¹H–¹H', 'HH']) {
      expect(caseTrail({ ...content, readings: content.readings.map((r) => ({ ...r, nuclei })) }, registry).answer.grade).toBe('assigned');
    }
  });
  it('says which reading a calculation misses', () => {
    const content = kept(alkene('15.8'));
    expect(caseTrail({ ...content, readings: [] }, registry).calculations[0]?.result).toMatchObject({ state: 'refused', problems: [{ code: 'no-reading' }] });
  });
});

describe('the trail', () => {
  it('has each step once, with its ink and its place in the review', () => {
    const { steps } = caseTrail(twoReadings(), registry);
    expect(new Set(steps.map((s) => s.key)).size).toBe(steps.length);
    expect(steps.map((s) => s.key)).toEqual(['reading:r1', 'reading:r2', 'relation:c1', 'grade:c1', 'relation:c2', 'grade:c2', 'evidence', 'candidates', 'answer']);
    expect(new Set(steps.map((s) => s.reviewStep))).toEqual(new Set(['reciprocity', 'domain', 'other-evidence', 'alternatives', null]));
    expect(caseTrail(kept(bond), registry).steps.find((s) => s.key === 'roots:c1')).toMatchObject({ reviewStep: 'second-root', ink: 'calculated' });
  });
  it('adds the person’s answer in judged ink and leaves the computed one beside it', () => {
    const content: CaseContent = { ...kept(alkene('15.8')), answer: { grade: 'not-decided', candidateId: 'none', statement: 'Left open', reasons: 'impure sample', leftOpen: 'all', overrideReason: 'impure' } };
    const { steps, answer } = caseTrail(content, registry);
    expect(steps[steps.length - 1]).toMatchObject({ key: 'judged', ink: 'judged', summary: 'Left open' });
    expect(answer.grade).toBe('assigned');
  });
  it('lists evidence without weighing it', () => {
    const content = kept(alkene('15.8'));
    const before = caseTrail(content, registry);
    const after = caseTrail({ ...content, evidence: [{ id: 'e1', kind: 'noe', text: 'strong', bearing: 'against', candidateId: 'trans', attachmentIds: [] }] }, registry);
    expect(after.answer).toEqual(before.answer);
    expect(after.steps.find((s) => s.key === 'evidence')?.summary).toContain('not weighed');
  });
  it('gives the same digits in any order of entries, and again after a round trip as JSON', () => {
    const content = twoReadings();
    const straight = caseTrail(content, registry);
    fc.assert(fc.property(fc.shuffledSubarray(content.readings, { minLength: 2 }), fc.shuffledSubarray(content.calculations, { minLength: 2 }), fc.shuffledSubarray(content.candidates, { minLength: 4 }), (readings, calculations, candidates) => {
      const turned = caseTrail({ ...content, readings, calculations, candidates }, registry);
      for (const c of turned.calculations) expect(c.result).toEqual(straight.calculations.find((s) => s.calculationId === c.calculationId)?.result);
      for (const c of turned.candidates) expect(c.status).toBe(straight.candidates.find((s) => s.candidateId === c.candidateId)?.status);
      expect([turned.answer.grade, turned.answer.candidateId]).toEqual([straight.answer.grade, straight.answer.candidateId]);
    }), { numRuns: 30 });
    expect(JSON.stringify(caseTrail(JSON.parse(JSON.stringify(content)) as CaseContent, registry))).toBe(JSON.stringify(straight));
  });
});

describe('two contents compared', () => {
  const a = twoReadings();
  it('are equal to themselves, and to themselves only', () => {
    expect(diffContent(a, structuredClone(a))).toEqual([]);
    expect(canonicalJson(a)).toBe(canonicalJson(JSON.parse(JSON.stringify(a))));
  });
  it.each<[string, (c: CaseContent) => void, string, string | null, string | null]>([
    ['question', (c) => { c.question = 'Other?'; }, 'question', a.question, 'Other?'],
    ['a digit', (c) => { c.readings[0] = { ...(c.readings[0] as Reading), j: '15.80' }; }, 'readings.r1.j', '15.8', '15.80'],
    ['compound', (c) => { c.compound = { ...c.compound, name: 'New' }; }, 'compound.name', '', 'New'],
    ['condition', (c) => { c.conditions = { ...c.conditions, solvent: 'CDCl3' }; }, 'conditions.solvent', '', 'CDCl3'],
    ['tags', (c) => { c.tags = ['a', 'b']; }, 'tags', '', 'a, b'],
  ])('%s', (_name, change, path, before, after) => {
    const b = structuredClone(a);
    change(b);
    expect(diffContent(a, b)).toMatchObject([{ path, before, after }]);
    expect(canonicalJson(a)).not.toBe(canonicalJson(b));
  });
  it('tell rows added, removed and put in another order', () => {
    const removed = { ...a, readings: a.readings.slice(0, 1) };
    expect(diffContent(a, removed)).toMatchObject([{ path: 'readings.r2', label: 'Reading H5–H6', after: null }]);
    expect(diffContent(removed, a)).toMatchObject([{ path: 'readings.r2', before: null }]);
    expect(diffContent(a, { ...a, readings: a.readings.toReversed() })).toMatchObject([{ path: 'readings', before: 'H2–H3, H5–H6', after: 'H5–H6, H2–H3' }]);
  });
  it('miss no change: whatever differs as JSON differs in the list', () => {
    const text = fc.string({ maxLength: 6 });
    fc.assert(fc.property(text, text, text, fc.array(text, { maxLength: 2 }), (question, j, name, tags) => {
      const b: CaseContent = { ...a, question, tags, readings: a.readings.map((r) => ({ ...r, j })), candidates: a.candidates.map((c) => ({ ...c, name })) };
      expect(diffContent(a, b).length > 0).toBe(canonicalJson(a) !== canonicalJson(b));
    }));
  });
});

describe('canonical JSON', () => {
  it('sorts keys at every depth and drops nothing else', () => {
    expect(canonicalJson({ b: [2, { d: null, c: 'x' }], a: 1, e: undefined })).toBe('{"a":1,"b":[2,{"c":"x","d":null}]}');
  });
  it('refuses numbers that JSON cannot hold', () => expect(() => canonicalJson({ a: NaN })).toThrow(RangeError));
  it('reads back as what went in', () => {
    fc.assert(fc.property(fc.jsonValue(), (value) => { expect(JSON.parse(canonicalJson(value))).toEqual(JSON.parse(JSON.stringify(value))); }));
  });
});
