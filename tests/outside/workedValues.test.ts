/**
 * Worked values and measurements for single relations.
 * Worked values: computed twice by independent evaluations (powers of cosine; complex exponentials) that agree to 1e-9,
 * from the published parameters (Haasnoot, de Leeuw, Altona, Tetrahedron 1980, 36, 2783; Karplus 1959, 1963).
 */
import { evaluate, invert } from '@/shared/engine';
import { alkeneModel } from '@/shared/engine/alkenes/model';
import type { GeneralisedRow, Substituent } from '@/shared/types/relation';
import { angleRow, heldForTests } from '../helpers/registry';

const s = (dchiAlpha: number, dchiBeta: number[], xi: 1 | -1): Substituent => ({ dchiAlpha, dchiBeta, xi });
const glucose = (o1: 1 | -1): Substituent[] => [s(1.3, [], o1), s(1.3, [0.4], o1 === 1 ? -1 : 1), s(1.3, [], 1), s(0.4, [1.3, 0.4], -1)];

const WORKED: [string, string, number, Substituent[], number][] = [
  ['β-D-glucopyranose H1–H2', 'E', 180, glucose(1), 7.872],
  ['α-D-glucopyranose H1–H2', 'E', 58, glucose(-1), 3.012],
  ['cyclohexane ax–ax', 'C', 180, [s(0.4, [0.4], 1), s(0.4, [0.4], -1)], 13.436],
  ['cyclohexane ax–eq', 'C', 57, [s(0.4, [0.4], -1), s(0.4, [0.4], 1)], 3.588],
  ['cyclohexane eq–eq', 'C', 60, [s(0.4, [0.4], -1), s(0.4, [0.4], -1)], 2.938],
  ['three substituents O, C / C', 'D', 60, [s(1.3, [], 1), s(0.4, [], -1), s(0.4, [], 1)], 4.1095],
  ['one F', 'B', -60, [s(1.7, [], 1)], 0.9444],
];

describe('generalised equation', () => {
  const row = angleRow('vicinal-hh/generalised-1980') as GeneralisedRow;
  it.each(WORKED)('%s', (_name, set, phiDeg, substituents, printed) => {
    expect(Math.abs(evaluate(row, { set, substituents, phiDeg }) - printed)).toBeLessThan(0.0006);
  });
  // the guard of all others: P1 of any set, changed by 1 %, must be seen by a value that we did not make
  it.each(['B', 'C', 'D', 'E'])('set %s: a change of P1 by 1 %% is seen', (id) => {
    const changed: GeneralisedRow = { ...row, parameterSets: row.parameterSets.map((p) => (p.id === id ? { ...p, values: { ...p.values, P1: (p.values.P1 ?? 0) * 1.01 } } : p)) };
    const seen = WORKED.filter(([, set]) => set === id).some(([, set, phiDeg, substituents, printed]) => Math.abs(evaluate(changed, { set, substituents, phiDeg }) - printed) >= 0.0006);
    expect(seen).toBe(true);
  });
  // ξ sanity: at φ = +60 the substituent with ξ = −1 is anti to the far proton and must lower J when it is oxygen
  it('lowers J by an oxygen anti to the far proton', () => {
    const anti = evaluate(row, { set: 'B', substituents: [s(1.3, [], -1)], phiDeg: 60 });
    const gauche = evaluate(row, { set: 'B', substituents: [s(1.3, [], 1)], phiDeg: 60 });
    const bare = evaluate(row, { set: 'B', substituents: [], phiDeg: 60 });
    expect(anti).toBeLessThan(bare - 1);
    expect(gauche).toBeGreaterThan(bare);
  });
  // groups on the path give the same: front at −120° is anti at +60°
  it('reads the same from groups on the path', () => {
    const groups = (front: [string, string]) => ({ front, rear: ['H', 'H'] as [string, string] });
    expect(evaluate(row, { groups: groups(['H', 'O(H)']), phiDeg: 60 })).toBeCloseTo(evaluate(row, { set: 'B', substituents: [s(1.3, [], -1)], phiDeg: 60 }), 12);
    expect(evaluate(row, { groups: groups(['O(H)', 'H']), phiDeg: 60 })).toBeCloseTo(evaluate(row, { set: 'B', substituents: [s(1.3, [], 1)], phiDeg: 60 }), 12);
  });
  it('reads β-D-glucopyranose from its groups', () => {
    // H1 in front at 0°, seen towards C2: O1 clockwise, O5 counter-clockwise; behind, O2 has ξ + at −120° and C3 ξ − at +120°
    const j = evaluate(row, { groups: { front: ['O(H)', 'O(C)'], rear: ['C(O,C,H)', 'O(H)'] }, phiDeg: 180 });
    expect(Math.abs(j - 7.872)).toBeLessThan(0.0006);
    // measured 7.8 to 8.0 Hz in β-glucosides (J. Biol. Chem. 2008, 283, 21120; Carbohydr. Res. 2006, 341, 2055)
    expect(j).toBeGreaterThan(7.8 - 0.5);
    expect(j).toBeLessThan(8.0 + 0.5);
  });
});

describe('plain forms', () => {
  // values at 0, 60, 90, 120, 180° as the reference prints them with each form (Karplus 1959 and 1963; NMR course notes of H. J. Reich)
  it.each([
    ['vicinal-hh/karplus-1963', [11, 4, 2, 5, 13]],
    ['vicinal-hh/karplus-1963-b', [12.4, 4.5, 2.2, 5.5, 14.4]],
    ['vicinal-hh/karplus-1963-c', [13, 4.5, 2, 5.5, 15]],
    ['vicinal-hh/three-term-776', [8.06, 2.79, 1.4, 3.89, 10.26]],
    ['vicinal-hh/karplus-1959', [8.22, 1.85, -0.28, 2.1, 9.22]],
  ])('%s', (id, printed) => {
    const found = [0, 60, 90, 120, 180].map((phiDeg) => evaluate(angleRow(id), { phiDeg }));
    found.forEach((j, i) => expect(Math.abs(j - (printed[i] ?? NaN))).toBeLessThan(0.0051));
  });
  // inverse examples of the first curve over 0–180°, printed to 0.1°
  it.each([[3.0, [68.3, 105.7]], [6.9, [41.3, 130.7]], [9.0, [27.4, 142.0]], [12, [162.0]], [13.1, []], [1.97, []]])('%d Hz has its roots', (j, printed) => {
    const roots = invert(angleRow('vicinal-hh/karplus-1963'), j).map((r) => r.phiDeg).filter((phi) => phi >= 0);
    expect(roots).toHaveLength(printed.length);
    roots.forEach((phi, i) => expect(Math.abs(phi - (printed[i] ?? NaN))).toBeLessThan(0.06));
  });
  // cyclohexane at −103 °C (Garbisch, J. Am. Chem. Soc. 1968, 90, 6543): within the spread stated with the row, and the checks of each row hold
  it.each(heldForTests().rows.flatMap((row) => (row.kind === 'class-table' ? [] : row.checks.map((c) => [`${row.id} ${c.name}`, row, c] as const))))('%s', (_name, row, check) => {
    const j = evaluate(row, { phiDeg: check.phiDeg, substituents: check.substituents, ...(check.set === '' ? {} : { set: check.set }) });
    expect(j).toBeGreaterThan(check.measuredHz[0] - check.toleranceHz);
    expect(j).toBeLessThan(check.measuredHz[1] + check.toleranceHz);
  });
});

describe('double-bond table', () => {
  const table = heldForTests().alkenes;
  if (!table) throw new Error('no class table is held');
  // coupling tables of H. J. Reich, University of Wisconsin, NMR course notes (public open-data copy)
  it.each([
    ['ethene', 11.6, 19.1], ['vinyl fluoride', 4.65, 12.75], ['trimethyl(vinyl)silane', 14.75, 20.42], ['vinyllithium', 19.0, 23.9], ['styrene', 10.7, 17.3],
    ['methyl vinyl ether', 7.0, 14.0], ['but-2-ene', 10.9, 15.1], ['1,2-dichloroethene', 5.3, 12.1], ['3-(tributylstannyl)prop-2-en-1-ol', 12.8, 19.2],
  ])('%s', (name, cis, trans) => {
    expect(table.row.compounds.find((c) => c.name === name)).toMatchObject({ cisHz: cis, transHz: trans });
  });
  // the table prints the columns swapped; the notes say in words that −2 Hz belongs to the cis isomer
  it('holds 1,2-difluoroethene the right way round', () => {
    expect(table.row.compounds.find((c) => c.name === '1,2-difluoroethene')).toMatchObject({ cisHz: -2, transHz: 9.5 });
  });
  it('holds trans above cis for every compound of which both are known', () => {
    for (const c of table.row.compounds) if (c.cisHz !== null && c.transHz !== null) expect(c.transHz).toBeGreaterThan(c.cisHz);
  });
  it('computes its distributions again from the compounds alone', () => {
    // two carbon groups, trans: 15.1, 15.5, 15.8, 16.0, 15 (the same tables); mean 15.48
    const again = alkeneModel(table.row).classes['c-c']?.distributions.trans;
    expect(again?.count).toBe(5);
    expect(again?.meanHz).toBeCloseTo((15.1 + 15.5 + 15.8 + 16.0 + 15) / 5, 12);
    expect(again?.rangeHz).toEqual([15, 16]);
  });
});
