import fc from 'fast-check';

import { putReading, removeReading } from '@/components/cases/logic/edits';
import { differences, merge, partsOf, same, sameParts, united, usualChoice, valueAt, type Side } from '@/components/cases/logic/versions';
import type { CaseContent, Reading } from '@/shared/types/case';

import { content, reading } from './contents';

const withJ = (from: CaseContent, id: string, j: string) => putReading(from, { ...from.readings.find((row) => row.id === id)!, j });

describe('two versions of a case', () => {
  const base = content();

  it('finds no difference between a content and its copy, whatever the order of keys', () => {
    const copy = JSON.parse(JSON.stringify(base)) as CaseContent;
    const turned = Object.fromEntries(Object.entries(copy).reverse()) as unknown as CaseContent;
    expect(differences(base, base, turned)).toEqual([]);
    expect(merge(base, base, turned)).toEqual(base);
  });

  it('asks where both changed the same figure, and shows all three values with their unit', () => {
    const [found, ...rest] = differences(base, withJ(base, 'r2', '4.7'), withJ(base, 'r2', '4.4'));
    expect(rest).toEqual([]);
    expect(found).toEqual({
      path: 'readings.r2.j', label: '_J_, H3–H4eq', was: '4.6\u00A0Hz', mine: '4.7\u00A0Hz', theirs: '4.4\u00A0Hz', changedBy: 'both', isFigure: true,
    });
  });

  it('takes each side where only that side changed', () => {
    const mine = withJ(base, 'r2', '4.7');
    const theirs = { ...base, conditions: { ...base.conditions, solvent: 'C6D6' } };
    const merged = merge(base, mine, theirs);
    expect(merged.readings[1]!.j).toBe('4.7');
    expect(merged.conditions.solvent).toBe('C6D6');
  });

  it('follows the choice, also against the usual one', () => {
    const mine = withJ(base, 'r2', '4.7');
    const theirs = withJ({ ...base, question: 'Their question' }, 'r2', '4.4');
    expect(merge(base, mine, theirs).readings[1]!.j).toBe('4.7');
    expect(merge(base, mine, theirs, { 'readings.r2.j': 'theirs' }).readings[1]!.j).toBe('4.4');
    expect(merge(base, mine, theirs, { question: 'mine' }).question).toBe(base.question);
  });

  it('keeps a row that I added, behind the one it followed', () => {
    const added = reading('r9', { atomA: 'H5', atomB: 'H6' });
    const mine = { ...base, readings: [base.readings[0]!, added, base.readings[1]!] };
    const theirs = { ...base, readings: [...base.readings, reading('r8')] };
    expect(merge(base, mine, theirs).readings.map((row) => row.id)).toEqual(['r1', 'r9', 'r2', 'r8']);
  });

  it('treats a removed row that the other side changed as one question about the whole row', () => {
    const mine = removeReading(base, 'r1');
    const theirs = withJ(base, 'r1', '9.1');
    const about = differences(base, mine, theirs).find((each) => each.path === 'readings.r1')!;
    expect(about).toMatchObject({ label: 'Reading H2–H3', mine: null, theirs: 'H2–H3, 9.1\u00A0Hz', changedBy: 'both' });
    expect(merge(base, mine, theirs, { 'readings.r1': 'theirs' }).readings.map((row) => row.j)).toContain('9.1');
    expect(merge(base, mine, theirs, { 'readings.r1': 'mine' }).readings.map((row) => row.id)).toEqual(['r2']);
  });

  it('leaves no link to a row that is gone', () => {
    const merged = merge(base, removeReading(base, 'r1'), { ...base, question: 'Other' });
    expect(merged.calculations).toEqual([]);
    expect(merged.candidates[0]!.claims).toEqual([]);
  });

  it('unites tags: an addition on either side stays, a removal on either side holds', () => {
    expect(united(['a', 'b'], ['b', 'c'], ['a', 'b', 'd'])).toEqual(['b', 'd', 'c']);
  });

  it('keeps every former name of the compound', () => {
    const mine = { ...base, compound: { ...base.compound, formerNames: ['Old 1'] } };
    const theirs = { ...base, compound: { ...base.compound, formerNames: ['Old 2'] } };
    expect(merge(base, mine, theirs).compound.formerNames.toSorted()).toEqual(['Old 1', 'Old 2']);
  });

  it('asks about an answer that only one side gave, as a whole', () => {
    const answer = { grade: 'assigned' as const, candidateId: 'c1', statement: 'E', reasons: 'J', leftOpen: '', overrideReason: '' };
    expect(differences(base, { ...base, answer }, base)).toEqual([
      { path: 'answer', label: 'Answer', was: null, mine: 'assigned: E', theirs: null, changedBy: 'mine', isFigure: false },
    ]);
  });

  it('counts only filled parts as the same', () => {
    const blank = content({ compound: { name: '', batch: '', notebook: '', structureNote: '', formerNames: [] } });
    expect(sameParts(blank, blank)).toBeLessThan(sameParts(base, base));
  });
});

/** Random edits of a case: figures, texts, rows added and removed. */
const word = fc.constantFrom('', '4.4', '4.40', '< 1.5', 'CDCl3', 'ä', 'J = 7');
const rowId = fc.constantFrom('r1', 'r2', 'r3', 'r4');
const edit: fc.Arbitrary<(from: CaseContent) => CaseContent> = fc.oneof(
  word.map((q) => (from: CaseContent) => ({ ...from, question: q || 'Q' })),
  word.map((s) => (from: CaseContent) => ({ ...from, conditions: { ...from.conditions, solvent: s } })),
  fc.tuple(rowId, word).map(([id, j]) => (from: CaseContent) => putReading(from, { ...(from.readings.find((row) => row.id === id) ?? reading(id)), j })),
  rowId.map((id) => (from: CaseContent) => removeReading(from, id)),
  word.map((t) => (from: CaseContent) => ({ ...from, answer: { grade: 'tentative' as const, candidateId: 'c2', statement: t, reasons: t, leftOpen: '', overrideReason: '' } })),
);
const version = fc.array(edit, { maxLength: 5 }).map((edits) => edits.reduce((from, each) => each(from), content()));
const side: fc.Arbitrary<Side> = fc.constantFrom('mine', 'theirs');

describe('laws of merging', () => {
  it('all mine is my version, all theirs is theirs, part by part', () => fc.assert(fc.property(version, version, version, side, (base, mine, theirs, chosen) => {
    const choices = Object.fromEntries(differences(base, mine, theirs).map((each) => [each.path, chosen]));
    const merged = merge(base, mine, theirs, choices);
    const wanted = chosen === 'mine' ? mine : theirs;
    for (const path of partsOf(mine, theirs)) expect(same(valueAt(merged, path), valueAt(wanted, path))).toBe(true);
  })));

  it('each part of the union comes from one of the two sides: nothing is invented, nothing is lost unchosen', () => fc.assert(fc.property(version, version, version, (base, mine, theirs) => {
    const merged = merge(base, mine, theirs);
    for (const each of differences(base, mine, theirs)) {
      const from = usualChoice(each) === 'mine' ? mine : theirs;
      expect(same(valueAt(merged, each.path), valueAt(from, each.path))).toBe(true);
    }
  })));

  it('with one side unchanged the other wins whole', () => fc.assert(fc.property(version, version, (base, changed) => {
    expect(same(merge(base, changed, base), changed) || sameRows(merge(base, changed, base), changed)).toBe(true);
    expect(same(merge(base, base, changed), changed)).toBe(true);
  })));

  it('never leaves two rows with one id', () => fc.assert(fc.property(version, version, version, (base, mine, theirs) => {
    const ids = merge(base, mine, theirs).readings.map((row: Reading) => row.id);
    expect(new Set(ids).size).toBe(ids.length);
  })));
});

/** The same rows, order aside: where only I removed and added rows again, theirs gives the order. */
function sameRows(a: CaseContent, b: CaseContent): boolean {
  const sorted = (from: CaseContent) => ({ ...from, readings: from.readings.toSorted((x, y) => x.id.localeCompare(y.id)) });
  return same(sorted(a), sorted(b));
}
