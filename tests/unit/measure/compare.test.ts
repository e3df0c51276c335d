import { judge, near, sameList, sameMap, tidyLines } from '@/server/measure/check/compare';
import type { Came, Check } from '@/server/measure/check/types';

const check = (more: Partial<Check>): Check => ({ id: 'x-1', family: 'vicinal_HH', relation: 'any', given: {}, expect_kind: 'value', expected: 4, how: 'seen', ...more });
const answer = (words: string[], more: Partial<Extract<Came, { kind: 'answer' }>> = {}): Came => ({ kind: 'answer', words, actions: [], printsAngle: false, reason: '', ...more });
const outcome = (more: Partial<Check>, came: Came): string => judge(check(more), came).outcome;

describe('value', () => {
  const given = { expect_kind: 'value', expected: 4, tolerance: 0.005 } as const;
  it('passes inside the tolerance and at its very edge', () => {
    expect(outcome(given, { kind: 'value', value: 4.004 })).toBe('passed');
    expect(outcome(given, { kind: 'value', value: 4.005 })).toBe('passed');
    expect(outcome(given, { kind: 'value', value: 3.995 })).toBe('passed');
  });
  it('fails outside it, on something that is no number, and on an answer of another kind', () => {
    expect(outcome(given, { kind: 'value', value: 4.0051 })).toBe('failed');
    expect(outcome(given, { kind: 'value', value: Number.NaN })).toBe('failed');
    expect(outcome(given, { kind: 'list', values: [4] })).toBe('failed');
  });
  it('needs equality where no tolerance is given', () => {
    expect(outcome({ expect_kind: 'value', expected: 4 }, { kind: 'value', value: 4.0001 })).toBe('failed');
    expect(outcome({ expect_kind: 'value', expected: 4 }, { kind: 'value', value: 4 })).toBe('passed');
  });
  it('counts "not decided" as an abstention', () => {
    expect(outcome(given, answer(['not decided']))).toBe('abstained');
  });
});

describe('list', () => {
  const angles = { family: 'inverse', expect_kind: 'list', expected: [41.25, 130.68], tolerance: 0.05, unit: 'deg' } as const;
  it('takes angles of an inverse in any order', () => {
    expect(outcome(angles, { kind: 'list', values: [130.7, 41.2] })).toBe('passed');
  });
  it('needs every root and no further one', () => {
    expect(outcome(angles, { kind: 'list', values: [41.25] })).toBe('failed');
    expect(outcome(angles, { kind: 'list', values: [41.25, 130.68, 130.7] })).toBe('failed');
    expect(outcome(angles, { kind: 'list', values: [41.25, 41.25] })).toBe('failed');
  });
  it('keeps the printed order in every other family', () => {
    expect(outcome({ ...angles, family: 'ring' }, { kind: 'list', values: [130.68, 41.25] })).toBe('failed');
    expect(outcome({ ...angles, family: 'ring' }, { kind: 'list', values: [41.25, 130.68] })).toBe('passed');
  });
  it('pairs one to one even where a nearer partner is taken', () => {
    expect(sameList([10.09, 10.0], [10.0, 10.05], 0.05, true)).toBe(true);
    expect(sameList([10.09, 10.12], [10.0, 10.05], 0.05, true)).toBe(false);
  });
});

describe('map', () => {
  it('compares key by key, numbers within the tolerance and text exactly', () => {
    expect(sameMap({ cis: 10.9, trans: 15.1, extra: 1 }, { cis: 10.9, trans: 15.1 }, 0.01)).toBe(true);
    expect(sameMap({ cis: 10.9 }, { cis: 10.9, trans: 15.1 }, 0.01)).toBe(false);
    expect(sameMap({ cis: 15.1, trans: 10.9 }, { cis: 10.9, trans: 15.1 }, 0.01)).toBe(false);
    expect(sameMap({ H1: 'axial' }, { H1: 'axial' }, 0.01)).toBe(true);
    expect(sameMap({ H1: 'Axial' }, { H1: 'axial' }, 0.01)).toBe(false);
  });
  it('lets "not decided" pass only where the check says so', () => {
    expect(outcome({ expect_kind: 'map-or-not-decided', expected: { cis: 1 } }, answer(['not decided']))).toBe('passed');
    expect(outcome({ expect_kind: 'map', expected: { cis: 1 } }, answer(['not decided']))).toBe('abstained');
  });
  it('drops weak lines, adds up coinciding ones and compares intensities tightly', () => {
    expect(tidyLines([[1, 0.001], [5, 1], [5.001, 1], [9, 2]])).toEqual([[9, 2], [5.001, 2]]);
    expect(sameMap({ lines: [[5, 1], [1, 1]] }, { lines: [[1, 1], [5, 1]] }, 0.002)).toBe(true);
    expect(sameMap({ lines: [[5, 1.002], [1, 1]] }, { lines: [[5, 1], [1, 1]] }, 0.002)).toBe(false);
  });
});

describe('range-contains', () => {
  const given = { expect_kind: 'range-contains', expected: -12.4 } as const;
  it('passes when the stated range holds the value', () => {
    expect(outcome(given, { kind: 'range', from: -15, to: -10 })).toBe('passed');
    expect(outcome(given, { kind: 'range', from: -12.4, to: -10 })).toBe('passed');
    expect(outcome(given, { kind: 'range', from: -12, to: -10 })).toBe('failed');
  });
});

describe('verdict', () => {
  it('passes on a listed word and fails on a graded answer outside the list', () => {
    expect(outcome({ expect_kind: 'verdict', expected: ['trans'] }, answer(['trans', 'E']))).toBe('passed');
    expect(outcome({ expect_kind: 'verdict', expected: ['trans'] }, answer(['cis', 'Z']))).toBe('failed');
    expect(outcome({ expect_kind: 'verdict', expected: ['not decided'] }, answer(['tentative']))).toBe('failed');
  });
  it('counts "not decided" as passed where listed and as an abstention where not', () => {
    expect(outcome({ expect_kind: 'verdict', expected: ['not decided', 'trans'] }, answer(['not decided']))).toBe('passed');
    expect(outcome({ expect_kind: 'verdict', expected: ['trans'] }, answer(['not decided'], { reason: 'open band' }))).toBe('abstained');
  });
  it('fails on a word of `never` even beside a listed one', () => {
    expect(outcome({ expect_kind: 'verdict', expected: ['trans', 'not decided'], never: ['cis'] }, answer(['trans', 'cis']))).toBe('failed');
  });
  it('fails on an angle where none may be printed', () => {
    expect(outcome({ expect_kind: 'verdict', expected: ['not decided'], never: ['angle'] }, answer(['not decided'], { printsAngle: true }))).toBe('failed');
    expect(outcome({ expect_kind: 'verdict', expected: ['not decided'], never: ['angle'] }, answer(['not decided']))).toBe('passed');
  });
});

describe('action', () => {
  it('passes when one of the listed actions came', () => {
    expect(outcome({ expect_kind: 'action', expected: ['warn', 'ask'] }, answer(['not decided'], { actions: ['ask'] }))).toBe('passed');
  });
  it('fails, and never abstains, when none came', () => {
    expect(outcome({ expect_kind: 'action', expected: ['error'] }, answer(['not decided'], { actions: ['accept'] }))).toBe('failed');
  });
  it('looks at `never` here too', () => {
    expect(outcome({ expect_kind: 'action', expected: ['consistent'], never: ['E', 'Z'] }, answer(['cis', 'Z'], { actions: ['consistent'] }))).toBe('failed');
  });
});

describe('property, and what did not come', () => {
  it('passes a law that held in every sample', () => {
    expect(outcome({ expect_kind: 'property', expected: 'a law' }, { kind: 'property', holds: true, detail: '' })).toBe('passed');
    expect(outcome({ expect_kind: 'property', expected: 'a law' }, { kind: 'property', holds: false, detail: 'differs' })).toBe('failed');
    expect(outcome({ expect_kind: 'property', expected: 'a law' }, { kind: 'value', value: 1 })).toBe('failed');
  });
  it('tells "not covered" from a request that the API would not take', () => {
    expect(outcome({}, { kind: 'not-covered', reason: 'no such relation yet' })).toBe('not covered');
    expect(outcome({ expect_kind: 'verdict', expected: ['not decided'] }, { kind: 'unanswered', reason: 'unknown relation' })).toBe('failed');
  });
});

describe('near', () => {
  it('goes into nested lists and never takes a text for a number', () => {
    expect(near([[1, 2]], [[1.001, 2]], 0.01)).toBe(true);
    expect(near([[1, 2]], [[1.1, 2]], 0.01)).toBe(false);
    expect(near('4', 4, 1)).toBe(false);
  });
});
