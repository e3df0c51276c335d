import { heldRelations } from '@/server/relations';
import { printedValue, verifyPrintedFormula } from '@/server/relations/printedFormula';
import { readRelations, verifyRelations } from '@/server/relations/registry';
import { relationSummary } from '@/shared/contracts/relations';
import { bindCurve, jAt, registryFrom, registryFromJson } from '@/shared/engine';
import { tableRows } from '@/shared/engine/relations/tables';
import type { GeneralisedRow, RelationRow, ThreeTermRow } from '@/shared/types/relation';
import { angleRow, heldForTests } from '../../helpers/registry';

const rows = heldForTests().rows;
const plain = angleRow('vicinal-hh/karplus-1963') as ThreeTermRow;
const generalised = angleRow('vicinal-hh/generalised-1980') as GeneralisedRow;

describe('every row', () => {
  it.each(rows.map((r) => [`${r.id}@${r.version}`, r] as const))('%s: every number says where it comes from', (_ref, row) => {
    for (const set of row.parameterSets) expect([set.source, set.provenance].every((s) => s.length > 0)).toBe(true);
    expect(row.spreadNote.length).toBeGreaterThan(10);
    expect(row.failures.length).toBeGreaterThan(0);
    if (row.provenance !== 'seen' || row.spreadProvenance !== 'seen') expect(`${row.spreadNote} ${row.provenanceNote}`).toMatch(/memory|practice|not seen/);
    if (row.kind === 'class-table') {
      for (const c of row.compounds) expect(c.source.length).toBeGreaterThan(10);
      for (const c of [...row.carbonCouplings, ...row.rings.flatMap((r) => [r.parent, ...r.others])]) expect(c.source.length).toBeGreaterThan(10);
    }
  });
  it.each(rows.map((r) => [r.id, r] as const))('%s: the printed formula, evaluated from its text, gives what the engine gives', async (_id, row) => {
    await expect(verifyPrintedFormula(row)).resolves.toBeUndefined();
  });
  it('is read the same on a device, from JSON', () => {
    const held = registryFromJson(JSON.parse(JSON.stringify(rows)) as unknown[]);
    expect(held.rows).toEqual(rows);
    expect(held.alkenes).toEqual(heldForTests().alkenes);
  });
});

describe('a slip in a table stops the start', () => {
  const withRow = (change: (row: Record<string, unknown>) => void): readonly unknown[] => {
    const copy = structuredClone(tableRows) as Record<string, unknown>[];
    change(copy[1] ?? {});
    return copy;
  };
  it.each<[string, (row: Record<string, unknown>) => void]>([
    ['a field missing', (r) => { delete r.spreadHz; }],
    ['a field unknown', (r) => { r.extra = 1; }],
    ['a number as text', (r) => { r.spreadHz = '1.5'; }],
    ['no source', (r) => { (r.parameterSets as Record<string, unknown>[])[0]!.source = ''; }],
    ['a printed formula that does not match', (r) => { r.mathFormula = 'A + B * cos(phi) + C * cos(phi)^2'; }],
    ['a formula that is none', (r) => { r.mathFormula = 'A +'; }],
    ['an unknown parameter', (r) => { (r.parameterSets as Record<string, unknown>[])[0]!.values = { A: 7, B: -1 }; }],
    ['the same id and version twice', (r) => { r.id = 'vicinal-hh/karplus-1959'; r.version = 1; }],
  ])('%s', async (_name, change) => {
    await expect((async () => verifyRelations(readRelations(withRow(change))))()).rejects.toThrow();
  });
  it('unchanged it starts', async () => {
    const held = readRelations(withRow(() => undefined));
    expect(held.rows).toHaveLength(tableRows.length);
    await expect(verifyRelations(held)).resolves.toBeUndefined();
  });
});

describe('versions', () => {
  const second: RelationRow = { ...plain, version: 2, parameterSets: plain.parameterSets.map((s) => ({ ...s, values: { ...s.values, A: 7.1 } })) };
  const old: RelationRow = { ...plain, status: 'superseded' };
  const held = registryFrom([old, second]);
  it('find the current one by id and any one by id@version', () => {
    expect(held.find(plain.id)?.version).toBe(2);
    expect(held.find(`${plain.id}@1`)?.version).toBe(1);
    expect(held.find(`${plain.id}@3`)).toBeUndefined();
  });
});

describe('the printed generalised equation', () => {
  it('is sensitive: another sign of ξ is seen', async () => {
    const set = generalised.parameterSets.find((s) => s.id === 'D');
    if (!set) throw new Error('set D is not held');
    const own = [{ dchiAlpha: 1.3, dchiBeta: [0.4], xi: 1 as const }];
    const other = [{ dchiAlpha: 1.3, dchiBeta: [0.4], xi: -1 as const }];
    expect(await printedValue(generalised, set, 60, own)).toBeCloseTo(jAt(bindCurve(generalised, { set: 'D', substituents: own }), 60), 9);
    expect(Math.abs((await printedValue(generalised, set, 60, other)) - jAt(bindCurve(generalised, { set: 'D', substituents: own }), 60))).toBeGreaterThan(0.5);
  });
});

describe('what the Relations page gets', () => {
  it('fits its contract and shows what the engine calculates for each check', async () => {
    const { summaries, registry } = await heldRelations();
    expect(summaries).toHaveLength(registry.rows.length);
    for (const s of summaries) expect(relationSummary.safeParse(s).success).toBe(true);
    const glucose = summaries.find((s) => s.id === generalised.id)?.checks[0];
    expect(glucose?.calculatedHz.toFixed(2)).toBe('7.87');
    expect(glucose?.measured).toBe('7.8 to 8.0\u00a0Hz');
  });
});
