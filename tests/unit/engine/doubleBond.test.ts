import fc from 'fast-check';

import { quickLook, registryFrom, type Registry } from '@/shared/engine';
import { studentDensity } from '@/shared/engine/math/student';
import { plainText } from '@/shared/format/richText';
import type { DoubleBondInput, QuickLookAnswer } from '@/shared/types/answer';
import type { AlkeneCompound } from '@/shared/types/relation';
import { heldForTests } from '../../helpers/registry';

const registry = heldForTests();
function answer(j: string, left: string | [string, string] | null, right: string | [string, string] = 'C', more: Partial<DoubleBondInput> = {}): QuickLookAnswer {
  const pair = (g: string | [string, string]): [string, string] => (typeof g === 'string' ? ['H', g] : g);
  const result = quickLook({ bond: 'double', j, groups: left === null ? null : { left: pair(left), right: pair(right) }, ...more }, registry);
  if (result.state !== 'answered') throw new Error(JSON.stringify(result));
  return result;
}
const said = (a: QuickLookAnswer): string => `${a.grade} ${a.double?.geometry ?? 'none'}`;

describe('two carbon groups', () => {
  it.each([
    ['15.8', 'C(=O,O)', 'C(=C,C)', 'assigned trans'], ['15.1', 'C(H,H,H)', 'C(H,H,H)', 'assigned trans'], ['10.9', 'C(H,H,H)', 'C(H,H,H)', 'assigned cis'],
    ['11.4', 'C(=O,O)', 'C(H,H,H)', 'tentative cis'], ['14.2', 'C', 'C', 'tentative trans'], ['12.6', 'C', 'C', 'not-decided none'],
  ])('%s Hz between %s and %s: %s', (j, left, right, verdict) => expect(said(answer(j, left, right))).toBe(verdict));
  it('keeps tentative what lies within 2σ of the stretch that decides nothing', () => {
    expect(said(answer('14.5', 'C', 'C', { se: '0.4' }))).toBe('tentative trans');
    expect(answer('15.5', 'C', 'C', { se: '0.9' }).grade).not.toBe('assigned');
  });
  it('does not give a value far from both classes to the nearer side', () => {
    for (const j of ['3.0', '24.0', '40.0']) expect(answer(j, 'C', 'C').grade).toBe('not-decided');
  });
});

describe('the stretches that decide nothing', () => {
  const guards: [string, string, number, number][] = [
    ['C', 'C', 11.5, 14.0], ['Si', 'C', 12, 20], ['Ge', 'C', 12, 20], ['Sn', 'C', 12, 20], ['B', 'C', 12, 20], ['Li', 'C', 12, 20], ['Mg', 'C', 12, 20], ['F', 'C', 5, 13], ['F', 'F', 5, 13],
    ...['Cl', 'Br', 'I', 'O', 'N', 'S', 'Se'].map((e): [string, string, number, number] => [e, 'C', 9.5, 14.5]), ['Cl', 'Cl', 9.5, 14.5], ['O', 'N', 9.5, 14.5],
  ];
  it.each(guards)('%s beside %s: %d to %d Hz', (left, right, low, high) => {
    fc.assert(fc.property(fc.double({ min: low, max: high, noNaN: true }), fc.double({ min: 0.05, max: 2, noNaN: true }), (j, se) => {
      expect(answer(String(j), left, right, { se: se.toFixed(3) }).grade).toBe('not-decided');
    }), { examples: [[low, 0.2], [high, 0.2]], numRuns: 30 });
  });
  // measured compounds behind the traps: 12.8 is cis in a vinylstannane, 14.75 cis in a vinylsilane, 9.5 trans in 1,2-difluoroethene, 12.1 trans in
  // 1,2-dichloroethene (coupling tables of H. J. Reich, NMR course notes)
  it.each([['12.8', 'Sn', 'C', 'trans'], ['14.75', 'Si', 'C', 'trans'], ['9.5', 'F', 'F', 'cis'], ['12.1', 'Cl', 'Cl', 'cis'], ['12.8', 'I', 'C', 'trans'], ['19.0', 'Li', 'C', 'trans']])('never calls %s Hz beside %s, %s %s', (j, left, right, wrong) => {
    expect(answer(j, left, right).double?.geometry).not.toBe(wrong);
  });
});

describe('what caps a grade at tentative', () => {
  const changed = (change: (c: AlkeneCompound) => AlkeneCompound | null) => registryFrom(registry.rows.map((row) =>
    (row.kind === 'class-table' ? { ...row, compounds: row.compounds.flatMap((c) => change(c) ?? []) } : row)));
  const cinnamate = (held: Registry) => quickLook({ bond: 'double', j: '15.8', groups: { left: ['H', 'C(=O,O)'], right: ['H', 'C(=C,C)'] } }, held);
  it('a value of the class from memory', () => {
    expect(cinnamate(registry)).toMatchObject({ grade: 'assigned' });
    const recalled = cinnamate(changed((c) => (c.name === 'but-2-ene' ? { ...c, provenance: 'memory' } : c)));
    expect(recalled).toMatchObject({ grade: 'tentative', double: { geometry: 'trans' } });
    expect(recalled.state === 'answered' && recalled.cautions.map((c) => c.id)).toContain('from-memory');
  });
  it('a class that holds one compound each way', () => {
    expect(cinnamate(changed((c) => (c.name === 'methyl but-2-enoate' ? null : c)))).toMatchObject({ grade: 'tentative' });
  });
  it('a vinyl group at about 10 Hz leaves it open, because the single bond gives the same', () => {
    expect(said(answer('10.4', 'C(=C,H)', 'C(H,H,H)'))).toBe('not-decided none');
    expect(said(answer('15.3', 'C(=C,H)', 'C(H,H,H)'))).toBe('assigned trans');
  });
});

describe('groups not given', () => {
  it('are never assigned, and tentative only at the ends', () => {
    fc.assert(fc.property(fc.double({ min: 0.4, max: 30, noNaN: true }), (j) => {
      const a = answer(String(j), null);
      expect(a.grade).not.toBe('assigned');
      if (a.grade === 'tentative') expect((j >= 15 && a.double?.geometry === 'trans') || (j >= 6 && j <= 10 && a.double?.geometry === 'cis')).toBe(true);
      expect(a.double?.descriptor).toBeNull();
    }));
    expect(said(answer('16.0', null))).toBe('tentative trans');
    expect(said(answer('8.0', null))).toBe('tentative cis');
    expect(said(answer('12.0', null))).toBe('not-decided none');
  });
  it('put the groups first among what to measure next', () => expect(answer('12.0', null).measureNext[0]?.id).toBe('give-groups'));
});

describe('a class without values', () => {
  it.each(['P(=O,O,O)', 'As', 'Te'])('%s is not judged at any J', (element) => {
    fc.assert(fc.property(fc.double({ min: 0.4, max: 25, noNaN: true }), (j) => expect(answer(String(j), element).grade).toBe('not-decided')), { numRuns: 20 });
  });
});

describe('likelihoods', () => {
  it('stay below 1 together and follow J', () => {
    fc.assert(fc.property(fc.double({ min: 0.4, max: 30, noNaN: true }), fc.constantFrom('C', 'O', 'Cl', 'S', 'F', 'Si', 'N'), (j, element) => {
      const a = answer(String(j), element);
      const list = a.double?.likelihoods ?? [];
      const sum = list.reduce((s, l) => s + l.weight, 0);
      // inside the stretch that decides nothing no odds are given: they would name the nearer side after all
      if (list.length === 0) expect(a.grade).toBe('not-decided');
      else expect(sum > 0 && sum < 1).toBe(true);
    }));
  });
  it('carry the grade: assigned from 0.95, tentative from 0.80', () => {
    fc.assert(fc.property(fc.double({ min: 0.4, max: 25, noNaN: true }), fc.constantFrom('C', 'O', 'Cl', 'S', 'F', 'Si', 'N'), (j, element) => {
      const a = answer(String(j), element);
      if (a.grade === 'assigned') expect(a.likelihood).toBeGreaterThanOrEqual(0.95);
      if (a.grade === 'tentative') expect(a.likelihood).toBeGreaterThanOrEqual(0.8);
    }));
  });
  // two-sided 5 % points of Student's t: 2.5706 at 5, 2.3060 at 8 degrees of freedom (any table of the distribution)
  it.each([[5, 2.5706], [8, 2.306]])('use the t density with %d degrees of freedom', (freedom, point) => {
    const n = 20_000;
    let inside = 0;
    for (let i = 0; i < n; i += 1) inside += studentDensity(-point + ((i + 0.5) * 2 * point) / n, 0, 1, freedom) * ((2 * point) / n);
    expect(inside).toBeCloseTo(0.95, 4);
  });
});

describe('one group on =CH₂', () => {
  // styrene 17.3 / 10.7 / 1.1; vinyl bromide 15.2 / 7.1 (coupling tables of H. J. Reich, NMR course notes)
  it.each([['17.3', 'C(=C,C)', 'trans'], ['10.7', 'C(=C,C)', 'cis'], ['1.1', 'C(=C,C)', 'Geminal'], ['15.2', 'Br', 'trans'], ['7.1', 'Br', 'cis']])('%s Hz beside %s is %s', (j, group, which) => {
    const a = answer(j, ['H', 'H'], ['H', group]);
    expect(a.grade).not.toBe('not-decided');
    expect(a.headline.toLowerCase()).toContain(which.toLowerCase());
    expect(a.double).toMatchObject({ setting: 'terminal', descriptors: null });
    expect(a.cannotTell.join(' ')).toContain('no E or Z');
  });
  it('has only a geminal coupling with both groups on the other carbon', () => expect(said(answer('1.5', ['H', 'H'], ['C', 'C']))).toBe('not-decided none'));
  it('shows nothing in ethene', () => expect(answer('11.6', ['H', 'H'], ['H', 'H']).cautions.map((c) => c.id)).toContain('symmetric-alkene'));
});

describe('three and four groups', () => {
  it.each([[['C', 'C'], ['H', 'C'], 'trisubstituted'], [['C', 'C'], ['C', 'C'], 'tetrasubstituted']] as const)('%s = %s has no vicinal path, with or without a J', (left, right, setting) => {
    for (const j of ['1.5', '', '15.8']) {
      const a = answer(j, [left[0], left[1]], [right[0], right[1]]);
      expect(a).toMatchObject({ grade: 'not-decided', headline: 'No vicinal H,H coupling crosses this bond', double: { setting, geometry: null } });
      expect(a.measureNext.length).toBeGreaterThan(0);
    }
  });
  it('shows the ladder of ³J(C,H) with the part where both occur left pale', () => {
    const rows = answer('1.5', ['C', 'C'], ['H', 'C']).double?.ladder ?? [];
    expect(rows.map((r) => r.geometry)).toEqual(['cis', 'trans']);
    expect(rows[0]?.fullHz[0]).toBe(4.3);
    expect(rows[0]?.classHz?.[1]).toBe(7);
    expect(rows[1]?.fullHz[0]).toBe(7);
    expect(rows[1]?.classHz?.[0]).toBe(rows[0]?.fullHz[1]);
  });
});

describe('rings', () => {
  // parents: 1.3, 2.9, 5.6, 10.1, 11.0 Hz (coupling tables of H. J. Reich, NMR course notes)
  it.each([[3, '1.3'], [4, '2.9'], [5, '5.6'], [6, '10.1'], [7, '11.0']] as const)('of %d fit their parent, without an E/Z question', (ringSize, j) => {
    const a = answer(j, 'C', 'C', { ringSize });
    expect(said(a)).toBe('assigned cis');
    expect(a.double).toMatchObject({ setting: 'ring', descriptors: null, descriptor: null });
    expect(a.cautions.map((c) => c.id)).toContain('ring-fact');
  });
  it.each([[3, '10.0'], [5, '10.0'], [6, '5.6'], [6, '15.8'], [7, '3.0']] as const)('of %d do not fit %s Hz: nothing is decided', (ringSize, j) => {
    const a = answer(j, 'C', 'C', { ringSize });
    expect(said(a)).toBe('not-decided none');
    expect(a.checkFirst.length).toBeGreaterThan(0);
  });
  it('of an enone with carbon groups only are not held against rings that bear oxygen', () =>
    expect(answer('5.7', 'C(=O,C)', 'C(C,H,H)', { ringSize: 6 }).grade).toBe('not-decided'));
  it('with O or C=O at the bond are compared with such rings too', () => expect(answer('6.0', 'O(C)', 'C(C,H,H)', { ringSize: 6 }).grade).toBe('assigned'));
  it('of eight and more can be trans, tentative at most', () => {
    const a = answer('15.6', 'C(C,H,H)', 'C(C,H,H)', { ringSize: 8 });
    expect(said(a)).toBe('tentative trans');
    expect(a.detail).toContain('holds cis and trans');
    expect(said(answer('10.5', 'C(C,H,H)', 'C(C,H,H)', { ringSize: 8 }))).toBe('tentative cis');
  });
});

describe('other inputs', () => {
  it('allows a negative value only with its caution', () => {
    const a = answer('-2.0', 'F', 'F');
    expect(said(a)).toBe('tentative cis');
    expect(a.cautions.map((c) => c.id)).toContain('negative-vicinal');
    expect(a.notes.map((n) => n.code)).toContain('sign-dropped');
    expect(answer('-2.0', 'C', 'C').grade).toBe('not-decided');
  });
  it('decides nothing by a limit, but says what the limit rules out', () => {
    const a = answer('<1.5', 'C', 'C');
    expect(a.grade).toBe('not-decided');
    expect(a.rulesOut).toHaveLength(2);
    expect(answer('<13', 'C', 'C').rulesOut).toHaveLength(0);
  });
  it('asks for a missing group and refuses one that it cannot read', () => {
    expect(quickLook({ bond: 'double', j: '15.8', groups: { left: ['H', ''], right: ['H', 'C'] } }, registry)).toMatchObject({ state: 'question', field: 'groups.left' });
    expect(quickLook({ bond: 'double', j: '15.8', groups: { left: ['H', 'C'], right: ['H', 'CH3'] } }, registry)).toMatchObject({ state: 'refused', problems: [{ field: 'groups.right' }] });
  });
  it('does not mind which end is called left', () => {
    fc.assert(fc.property(fc.double({ min: 0.4, max: 25, noNaN: true }), (j) => {
      const a = answer(String(j), 'O(C)', 'C(=C,C)');
      const b = answer(String(j), 'C(=C,C)', 'O(C)');
      expect([a.grade, a.headline, a.likelihood]).toEqual([b.grade, b.headline, b.likelihood]);
    }), { numRuns: 30 });
  });
});

it('speaks as the sketch does about 12.4 Hz beside one oxygen', () => {
  const a = answer('12.4', 'O(C)', 'C(C,H,H)');
  expect(plainText(a.headline)).toBe('12.4\u00a0Hz lies between the cis and the trans values known with one oxygen');
  expect(plainText(a.detail)).toBe('It is 0.6\u00a0Hz below the smallest trans value and 5.4\u00a0Hz above the largest cis value we hold. Here trans is E and cis is Z.');
  expect(plainText(a.measureNext[0]?.detail ?? '')).toContain('Lower, by 6.0\u00a0Hz or more in every pair held');
  const cis = a.double?.ladder.find((r) => r.geometry === 'cis');
  expect(cis).toMatchObject({ classHz: [5.4, 7], fullHz: [-2, 19] });
  expect(cis?.compounds).toHaveLength(7);
});

it('says at most three sentences, whatever the bond', () => {
  fc.assert(fc.property(fc.double({ min: 0.4, max: 30, noNaN: true }), fc.constantFrom('C', 'O', 'Cl', 'S', 'F', 'Si', 'N', 'P', 'C(=C,H)'), fc.constantFrom(null, 3, 5, 6, 8) as fc.Arbitrary<DoubleBondInput['ringSize']>, (j, element, ringSize) => {
    const a = answer(j.toFixed(1), element, 'C', { ringSize: ringSize ?? null });
    expect(`${a.headline}. ${a.detail}`.split(/[.?](?:\s|$)/).filter((s) => s.trim() !== '').length).toBeLessThanOrEqual(3);
  }));
});
