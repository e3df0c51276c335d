import { parseChecks } from '@/server/measure/check/readCheckFile';
import { reportLines, type Judged } from '@/server/measure/check/report';
import type { Outcome } from '@/server/measure/check/types';
import { endsFrom } from '@/server/measure/check/adapters/doubleBond';
import { refusedOr } from '@/server/measure/check/adapters/quickLook';
import { withoutStereo } from '@/server/measure/score/alkenes';
import { shareOf } from '@/server/measure/score/wilson';

const judged = (id: string, family: string, outcome: Outcome, how = 'seen: a table', inReference = false): Judged => ({
  check: { id, family, relation: 'some relation', given: { J: 7 }, expect_kind: 'verdict', expected: ['cis'], how, in_reference: inReference },
  judgement: { outcome, expected: '["cis"]', came: 'trans', reason: '' },
});

describe('the report of check', () => {
  const lines = reportLines([
    judged('a-1', 'alkene', 'passed', 'seen: a table', true), judged('a-2', 'alkene', 'failed'), judged('a-3', 'alkene', 'abstained', 'from memory'),
    judged('p-1', 'pair_order', 'passed', 'common practice, no source'), judged('r-1', 'ring', 'not covered'),
  ]);

  it('gives each family a line, and sorting tasks one of their own', () => {
    expect(lines).toContain('alkene: 1 passed, 1 failed, 1 abstained, 0 not covered');
    expect(lines).toContain('ring: 0 passed, 0 failed, 0 abstained, 1 not covered');
    expect(lines).toContain('pair_order (by itself): 1 passed, 0 failed, 0 abstained, 0 not covered');
  });
  it('shows a failing check with what was given, expected and came', () => {
    const at = lines.indexOf('Failed:');
    expect(lines.slice(at, at + 4)).toEqual(['Failed:', '  a-2 [some relation] given {"J":7}', '    expected ["cis"]', '    came trans']);
  });
  it('counts by provenance and by whether the reference prints the value', () => {
    expect(lines).toContain('  from memory: 0 passed, 0 failed, 1 abstained, 0 not covered');
    expect(lines).toContain('  common practice, no source: 1 passed, 0 failed, 0 abstained, 0 not covered');
    expect(lines).toContain('  in the reference: 1 passed, 0 failed, 0 abstained, 0 not covered');
  });
  it('ends with the sum of all checks', () => {
    expect(lines.at(-1)).toBe('2 passed, 1 failed, 1 abstained, 1 not covered');
  });
});

describe('a check file', () => {
  const one = { id: 'a', family: 'alkene', relation: 'r', given: { J: 1 }, expect_kind: 'value', expected: 1, source: 's', how: 'seen', for_reader: { name: 'told to nobody' } };
  it('is read without what is for readers only', () => {
    expect(parseChecks([one], 'file')[0]).not.toHaveProperty('for_reader');
    expect(parseChecks({ checks: [one] }, 'file')).toHaveLength(1);
  });
  it('is refused in one sentence when it is something else', () => {
    expect(() => parseChecks([{ ...one, expect_kind: 'guess' }], 'that.json')).toThrow(/^that\.json is not a check file: 0\.expect_kind/);
  });
});

describe('putting a check to the product', () => {
  it('puts one group on each carbon', () => {
    expect(endsFrom(['Br', 'C'])).toEqual({ left: ['Br', 'H'], right: ['C', 'H'] });
    expect(endsFrom('two carbons')).toEqual({ left: ['C', 'H'], right: ['C', 'H'] });
    expect(endsFrom(['Br'])).toBeUndefined();
    expect(endsFrom('one thing or another')).toBeUndefined();
  });
  it('takes a refusal of a value for an abstention, but not a request it put wrongly', () => {
    const problem = (errors: object[]) => ({ status: 422, body: { type: 'about:blank', title: 'Check the fields.', status: 422, detail: 'Some fields cannot be used.', errors } });
    expect(refusedOr(problem([{ pointer: '#/j', detail: 'Type a coupling.', code: 'empty' }]))).toMatchObject({ kind: 'answer', words: ['not decided'], actions: ['error'] });
    expect(refusedOr(problem([{ pointer: '#/groups', detail: 'Unknown.' }]))).toMatchObject({ kind: 'unanswered' });
    expect(refusedOr({ status: 404, body: null })).toMatchObject({ kind: 'unanswered' });
  });
});

describe('the score of a set', () => {
  it('never shows the product a mark of geometry', () => {
    expect(withoutStereo('C/C=C\\C')).toBe('CC=CC');
    expect(withoutStereo('N[C@@H](C)/C=C/[C@H](O)C')).toBe('N[CH](C)C=C[CH](O)C');
  });
  it('gives Wilson intervals', () => {
    // 0 of 10: upper limit z²/(n + z²) = 3.8415/13.8415, worked by hand from Wilson's formula
    expect(shareOf(0, 10)).toEqual({ count: 0, of: 10, share: 0, interval95: [0, 0.2775] });
    // 8 of 10: centre (0.8 + 0.19207)/1.38415 = 0.71674, half width 0.22657, worked by hand
    expect(shareOf(8, 10).interval95).toEqual([0.4902, 0.9433]);
    expect(shareOf(0, 0).interval95).toBeNull();
  });
});
