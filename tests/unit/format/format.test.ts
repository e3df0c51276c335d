import fc from 'fast-check';

import { dateOnly, dateTimeIn, dateTimeUtc } from '@/shared/format/date';
import { degree, degreeRange, fixed, hz, hzAsTyped, hzRange, inHundred } from '@/shared/format/number';
import { plainText, richText } from '@/shared/format/richText';
import { siText } from '@/shared/format/siText';
import { citationText } from '@/shared/format/words';
import type { CaseContent, Reading } from '@/shared/types/case';

describe('numbers', () => {
  it.each([[9.6, 1, '9.6'], [-2, 1, '−2.0'], [-0.04, 1, '0.0'], [0, 1, '0.0'], [12.45, 1, '12.5'], [1.005, 2, '1.01'], [180, 0, '180'], [-0.5, 0, '−1']])('%d to %d places is %s', (value, places, text) => expect(fixed(value, places)).toBe(text));
  it('keep number and unit together', () => {
    expect(hz(9.6)).toBe('9.6\u00a0Hz');
    expect(hzRange(0.9, 11.6)).toBe('0.9 to 11.6\u00a0Hz');
    expect(degree(-165.2)).toBe('−165°');
    expect(degreeRange(169, 203)).toBe('169° to −157°');
  });
  it('keep the digits as typed', () => {
    expect(hzAsTyped({ jHz: 7.6, decimals: 2 })).toBe('7.60\u00a0Hz');
    expect(hzAsTyped({ jHz: 1.5, decimals: 1, limit: 'upper' })).toBe('<\u00a01.5\u00a0Hz');
  });
  it.each([[0.999, 'more than 99 in 100'], [0.001, 'less than 1 in 100'], [0.876, '88 in 100']])('share %d is %s', (w, text) => expect(inHundred(w)).toBe(text));
});

describe('marked-up text', () => {
  it('splits into upright and italic runs', () => {
    expect(richText('³_J_ at _φ_ 60°')).toEqual([{ text: '³', italic: false }, { text: 'J', italic: true }, { text: ' at ', italic: false }, { text: 'φ', italic: true }, { text: ' 60°', italic: false }]);
  });
  it('keeps a lone underscore as text', () => {
    expect(plainText('a_b')).toBe('a_b');
    expect(plainText('__')).toBe('__');
  });
  it('loses no character but the marks', () => {
    fc.assert(fc.property(fc.array(fc.tuple(fc.string({ unit: fc.constantFrom('a', 'φ', ' ', '³', '(') }), fc.boolean()), { maxLength: 6 }), (runs) => {
      const kept = runs.filter(([text]) => text !== '');
      expect(plainText(kept.map(([text, italic]) => (italic ? `_${text}_` : text)).join(''))).toBe(kept.map(([text]) => text).join(''));
    }));
  });
});

describe('moments', () => {
  it('name their zone', () => {
    expect(dateTimeUtc('2026-12-01T14:07:30Z')).toBe('1 Dec 2026, 14:07 UTC');
    expect(dateTimeIn('2026-12-01T23:30:00Z', 'Europe/Berlin')).toMatch(/^2 Dec 2026, 00:30 (CET|GMT\+1)$/);
    expect(dateOnly('2026-09-30T23:30:00Z')).toBe('30 Sep 2026');
    expect(dateOnly('2026-09-30T23:30:00Z', 'Europe/Berlin')).toBe('1 Oct 2026');
  });
  it('that are none are refused', () => expect(() => dateTimeUtc('soon')).toThrow(RangeError));
});

it('prints a source as one line', () => {
  expect(citationText({ authors: 'Karplus, M.', year: 1963, where: 'J. Am. Chem. Soc. 85, 2870–2871' })).toBe('Karplus, M., J. Am. Chem. Soc. 85, 2870–2871 (1963)');
  expect(citationText({ authors: 'paper not seen', year: null, where: 'numbers in use' })).toBe('paper not seen, numbers in use');
});

describe('SI text', () => {
  const reading = (more: Partial<Reading>): Reading => ({ id: 'r', atomA: 'H2', atomB: 'H3', nuclei: 'H,H', path: '3J', j: '8.9', se: '', partner: '', sign: 'not-measured', where: '', method: '', note: '', ...more });
  const content = (readings: Reading[], conditions: Partial<CaseContent['conditions']> = {}): CaseContent => ({
    format: 1, question: '', compound: { name: '', batch: '', notebook: '', structureNote: '', formerNames: [] }, conditions: { fieldMHz: '', solvent: '', temperatureK: '', concentration: '', ...conditions },
    readings, calculations: [], candidates: [], evidence: [], answer: null, tags: [],
  });
  const line = (...readings: Partial<Reading>[]): string => siText(content(readings.map((r, i) => reading({ id: `r${i}`, ...r })))).replace(/\u00a0/g, ' ');

  it('gives J equally at both partners, digits as typed', () => expect(line({ j: '8.90' })).toBe('¹H NMR: H-2: J(2,3) = 8.90 Hz; H-3: J(2,3) = 8.90 Hz.'));
  it('says where the partner differs', () => expect(line({ partner: '9.1' })).toBe('¹H NMR: H-2: J(2,3) = 8.9 Hz; H-3: J(2,3) = 9.1 Hz (8.9 Hz at H-2).'));
  it('does not call 8.9 and 8,9 Hz different', () => expect(line({ partner: '8,9 Hz' })).toContain('H-3: J(2,3) = 8.9 Hz.'));
  it('keeps limits, signs and other paths', () => {
    expect(line({ j: '<1.5' })).toContain('J(2,3) < 1.5 Hz');
    expect(line({ j: '-13,2', path: '2J', atomA: 'H4ax', atomB: 'H4eq' })).toContain('H-4ax: ²J(4ax,4eq) = −13.2 Hz');
    expect(line({ j: 'ca. 7' })).toContain('= ca. 7 Hz');
  });
  it('sorts atoms by number and couplings by size', () => {
    expect(line({ atomA: 'H10', atomB: 'H9', j: '2.0' }, { atomA: 'H9', atomB: 'H8', j: '11.0' })).toBe('¹H NMR: H-8: J(9,8) = 11.0 Hz; H-9: J(9,8) = 11.0 Hz, J(10,9) = 2.0 Hz; H-10: J(10,9) = 2.0 Hz.');
  });
  it('names conditions that are known and is empty without readings', () => {
    expect(siText(content([reading({})], { fieldMHz: '500', solvent: 'CDCl₃', temperatureK: '298' }))).toMatch(/^¹H NMR \(500\u00a0MHz, CDCl₃, 298\u00a0K\): /);
    expect(siText(content([]))).toBe('');
  });
});
