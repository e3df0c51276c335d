import fc from 'fast-check';

import { quickLook } from '@/shared/engine';
import { readField, readHz, withError } from '@/shared/engine/input/readHz';
import type { SingleBondInput } from '@/shared/types/answer';
import { heldForTests } from '../../helpers/registry';

const registry = heldForTests();

function read(typed: string, se?: string, fieldMHz: number | null = null) {
  const first = readHz(typed, 'j', fieldMHz);
  if ('problem' in first) throw new Error(first.problem.sentence);
  const full = withError(first, se);
  if ('problem' in full) throw new Error(full.problem.sentence);
  return { ...full.reading, codes: full.notes.map((n) => n.code) };
}
function refusal(typed: string, fieldMHz: number | null = null) {
  const first = readHz(typed, 'j', fieldMHz);
  if (!('problem' in first)) throw new Error(`${typed} was read`);
  return first.problem;
}

describe('a coupling as typed', () => {
  it.each([
    ['9.6', 9.6, 1, []], ['9,6', 9.6, 1, ['decimal-comma']], ['9.6 Hz', 9.6, 1, ['unit-typed']], ['9.6\u00a0Hz', 9.6, 1, ['unit-typed']], ['J = 9.6', 9.6, 1, []],
    ['³J(H,H) = 8.9 Hz', 8.9, 1, ['unit-typed']], ['7.60', 7.6, 2, []], ['\u22122.0', -2, 1, []], ['–2.0', -2, 1, []], ['.5', 0.5, 1, []], ['+9.6', 9.6, 1, []],
  ])('%s', (typed, jHz, decimals, codes) => {
    const found = read(typed);
    expect(found).toMatchObject({ jHz, decimals, limit: 'none', seHz: 0.2, seSource: 'default', typed });
    expect(found.codes).toEqual([...codes, 'default-error']);
  });

  it.each([['ca. 7'], ['ca 7'], ['~7'], ['≈ 7'], ['about 7']])('%s is 7 ± 1 with a note', (typed) => {
    expect(read(typed)).toMatchObject({ jHz: 7, seHz: 1, seSource: 'approximate', codes: ['approximate'] });
    // a smaller ± typed beside it does not make "about" exact; a larger one stands
    expect(read(typed, '0.2').seHz).toBe(1);
    expect(read(typed, '1.5').seHz).toBe(1.5);
  });

  it.each([['<1.5', 'upper', 1.5], ['< 1,5', 'upper', 1.5], ['≤ 1.5 Hz', 'upper', 1.5], ['> 12', 'lower', 12], ['< 0.2', 'upper', 0.2]] as const)('%s is a limit, never 0', (typed, limit, jHz) => {
    expect(read(typed)).toMatchObject({ limit, jHz });
    expect(read(typed).codes).toContain('limit');
  });

  it('carries the rounding error of a whole number, unless ± was typed', () => {
    expect(read('12').seHz).toBeCloseTo(1 / Math.sqrt(12), 12);
    expect(read('12').codes).toContain('digits-coarse');
    expect(read('12', '0.1').seHz).toBe(0.1);
    expect(read('12.0').codes).not.toContain('digits-coarse');
  });

  it('reads a range and a ± typed in the same field', () => {
    expect(read('7.0-7.5')).toMatchObject({ jHz: 7.25, seHz: 0.25 });
    expect(read('9.6 ± 0.3')).toMatchObject({ jHz: 9.6, seHz: 0.3, seSource: 'typed' });
  });

  it.each([
    ['', 'empty'], ['   ', 'empty'], ['abc', 'not-a-number'], ['1e3', 'not-a-number'], ['7..2', 'not-a-number'], ['NaN', 'not-a-number'], ['7.2, 6.1', 'two-numbers'],
    ['15.8,6.2', 'two-numbers'], ['7.2 6.1', 'two-numbers'], ['0', 'zero'], ['0.0', 'zero'], ['160', 'too-large'], ['-61', 'too-large'], ['0.0072', 'ppm-suspected'],
    ['0.2', 'ppm-suspected'], ['0.02 ppm', 'ppm'], ['0.0096 kHz', 'unit'], ['9.6 MHz', 'unit'], ['< -1', 'limit-negative'], ['9'.repeat(41), 'too-long'],
  ])('%s is refused as %s in one sentence', (typed, code) => {
    const problem = refusal(typed);
    expect(problem.code).toBe(code);
    expect(problem.field).toBe('j');
    expect(problem.sentence.length).toBeGreaterThan(10);
    expect(problem.sentence).not.toMatch(/!/);
  });

  it('offers what mends it', () => {
    expect(refusal('0.0178', 500).mends).toEqual([{ label: 'Use 8.9\u00a0Hz', field: 'j', value: '8.9' }]);
    expect(refusal('0.0178').mends).toEqual([]);
    expect(refusal('0.02 ppm', 400).mends.map((m) => m.value)).toEqual(['8.0']);
    expect(refusal('0.0096 kHz').mends.map((m) => m.value)).toEqual(['9.6']);
    expect(refusal('7.2, 6.1').mends.map((m) => m.value)).toEqual(['7.2', '6.1']);
    expect(refusal('0').mends.map((m) => m.value)).toEqual(['< 1']);
    expect(read(refusal('0').mends[0]?.value ?? '').limit).toBe('upper');
  });

  it('never throws and never reads what it cannot show', () => {
    fc.assert(fc.property(fc.string({ maxLength: 50 }), fc.option(fc.integer({ min: 20, max: 1500 }), { nil: null }), (typed, field) => {
      const result = readHz(typed, 'j', field);
      if ('problem' in result) expect(result.problem.sentence.length).toBeGreaterThan(0);
      else expect(Number.isFinite(result.reading.jHz) && result.reading.jHz !== 0).toBe(true);
    }));
  });
});

describe('the standard error', () => {
  const problem = (se: string) => {
    const first = readHz('9.6', 'j', null);
    const full = 'problem' in first ? first : withError(first, se);
    return 'problem' in full ? full.problem : null;
  };
  it('is 0.2 Hz when missing, with a note', () => expect(read('9.6')).toMatchObject({ seHz: 0.2, codes: ['default-error'] }));
  it.each([['0.3', 0.3], ['± 0.3', 0.3], ['0,3', 0.3], ['0.3 Hz', 0.3]])('%s is read', (se, value) => expect(read('9.6', se)).toMatchObject({ seHz: value, seSource: 'typed' }));
  it.each([['0', 'zero'], ['0.0', 'zero'], ['-0.2', 'negative'], ['x', 'not-a-number'], ['12', 'too-large'], ['1'.repeat(50), 'too-long']])('%s is refused with a mend', (se, code) => {
    expect(problem(se)).toMatchObject({ field: 'se', code, mends: [{ label: 'Use 0.2\u00a0Hz', field: 'se', value: '0.2' }] });
  });
});

describe('the field', () => {
  it.each([['500', 500], ['500 MHz', 500], ['499,87', 499.87], ['', null]])('%s', (typed, value) => expect(readField(typed)).toEqual({ fieldMHz: value }));
  it.each(['5', '50000', 'x'])('%s is refused', (typed) => expect(readField(typed)).toHaveProperty('problem.field', 'fieldMHz'));
});

describe('the gate of the quick look', () => {
  const single = (j: string, more: Partial<SingleBondInput> = {}) => quickLook({ bond: 'single', j, ...more }, registry);
  it('names every field that needs mending at once', () => {
    const result = single('abc', { se: '0', fieldMHz: 'x', partner: '160' });
    expect(result.state).toBe('refused');
    if (result.state === 'refused') expect(result.problems.map((p) => p.field).toSorted()).toEqual(['fieldMHz', 'j', 'partner', 'se']);
  });
  it('asks whether a negative vicinal J is a size', () => {
    expect(single('-7.0')).toMatchObject({ state: 'question', field: 'j', choices: [{ field: 'j', value: '7.0' }] });
  });
  it('answers the value that the choice puts in', () => expect(single('7.0').state).toBe('answered'));
  it('refuses a relation that is not held, and one for another bond', () => {
    expect(single('9.6', { relation: 'nothing/here' })).toMatchObject({ state: 'refused', problems: [{ field: 'relation', code: 'unknown-relation' }] });
    expect(single('9.6', { relation: 'alkene-hh/class-values' })).toMatchObject({ state: 'refused', problems: [{ code: 'wrong-relation' }] });
    expect(single('9.6', { relation: 'vicinal-hh/karplus-1963@1' }).state).toBe('answered');
  });
});
