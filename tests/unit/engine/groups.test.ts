import { comparePriority, groupLabel, groupOf, GROUP_PRESETS, parseGroup, printGroup } from '@/shared/engine';
import { nameGeometries } from '@/shared/engine/alkenes/descriptors';
import { kindOf, type AlkeneGroups } from '@/shared/engine/alkenes/classify';

const ends = (left: [string, string], right: [string, string]): AlkeneGroups => ({ left: [groupOf(left[0]), groupOf(left[1])], right: [groupOf(right[0]), groupOf(right[1])] });
const named = (left: [string, string], right: [string, string]) => nameGeometries(ends(left, right), kindOf(ends(left, right)));

describe('a group as text', () => {
  it.each([['C(O,=O)', 'C(=O,O)'], [' C ( H, H ,H ) ', 'C(H,H,H)'], ['H', 'H'], ['Cl', 'Cl'], ['C', 'C'], ['O(-H)', 'O(H)'], ['C(#N)', 'C(#N)'], ['S(C,=O,=O)', 'S(=O,=O,C)']])('%s prints as %s', (text, printed) => {
    expect(printGroup(groupOf(text))).toBe(printed);
  });
  it.each([['', 'empty'], ['?', 'empty'], ['Xx', 'element'], ['C(Xx,H,H)', 'element'], ['C(H', 'form'], ['CH3', 'form'], ['c', 'form'], ['C(H,H)', 'bonds'], ['C(=O,O,H)', 'bonds'], ['O(C,C)', 'bonds'], ['F(C)', 'bonds']])('%s is refused: %s', (text, code) => {
    expect(parseGroup(text)).toMatchObject({ fault: { code } });
  });
  it('throws where only good text may come', () => expect(() => groupOf('CH3')).toThrow(RangeError));
  it('holds presets that read, print alike and differ from one another', () => {
    const printed = GROUP_PRESETS.map((p) => printGroup(groupOf(p.text)));
    expect(new Set(printed).size).toBe(GROUP_PRESETS.length);
    expect(new Set(GROUP_PRESETS.map((p) => p.id)).size).toBe(GROUP_PRESETS.length);
    expect(groupLabel(groupOf('C(O,=O)'))).toBe('CO₂R');
    expect(groupLabel(groupOf('C(F,Cl,H)'))).toBe('C(Cl,F,H)');
  });
});

describe('priority by first atom and its set of neighbours', () => {
  it.each([
    ['Br', 'Cl'], ['O(H)', 'N(H,H)'], ['C(=O,O)', 'C(=O,H)'], ['C(=O,H)', 'C(O,H,H)'], ['C(#N)', 'C(=C,C)'], ['C(=C,C)', 'C(C,C,H)'], ['C(H,H,H)', 'H'], ['C', 'H'], ['Cl', 'C'], ['C(F,F,F)', 'C(=O,O)'],
  ])('%s ranks above %s', (a, b) => {
    expect(comparePriority(groupOf(a), groupOf(b))).toBeGreaterThan(0);
    expect(comparePriority(groupOf(b), groupOf(a))).toBeLessThan(0);
  });
  it.each([['C(=C,C)', 'C(#C)'], ['C(C,H,H)', 'C(C,H,H)'], ['C', 'C(H,H,H)'], ['C', 'C']])('%s and %s: a tie or not told', (a, b) => expect(comparePriority(groupOf(a), groupOf(b))).toBeNull());
});

describe('cis, trans, E and Z', () => {
  it('makes cis Z where each carbon bears one H', () => {
    expect(named(['H', 'C'], ['H', 'O(C)'])).toMatchObject({ descriptors: { cis: 'Z', trans: 'E' }, unusual: false });
  });
  it('has no E or Z for =CH₂', () => expect(named(['H', 'H'], ['H', 'C']).descriptors).toBeNull());
  // tiglic acid is E: its CO₂H lies cis to the =CH, ³J(C,H) 7.4; angelic acid is Z with 13.2 (NMR course notes of H. J. Reich, C–H coupling)
  it('makes cis E in tiglic acid, where the acid carbon outranks methyl', () => {
    const found = named(['C(H,H,H)', 'C(=O,O)'], ['H', 'C(H,H,H)']);
    expect(found).toMatchObject({ descriptors: { cis: 'E', trans: 'Z' }, unusual: true });
    expect(found.note).toContain('CO₂R');
  });
  it('keeps cis Z where a hetero atom outranks the measured carbon', () => {
    expect(named(['Br', 'C(=O,O)'], ['H', 'C(H,H,H)'])).toMatchObject({ descriptors: { cis: 'Z', trans: 'E' }, unusual: false });
  });
  it.each([['C(C,H,H)', 'C(C,H,H)'], ['C', 'C(=O,O)']])('gives no E or Z for %s beside %s', (a, b) => {
    const found = named([a, b], ['H', 'C(H,H,H)']);
    expect(found.descriptors).toBeNull();
    expect(found.note).toContain('cis or trans only');
  });
});

describe('the class of a double bond', () => {
  it.each([
    [['H', 'C'], ['H', 'C'], 'disubstituted', 'c-c'], [['H', 'O(C)'], ['H', 'C'], 'disubstituted', 'o'], [['H', 'N'], ['C', 'H'], 'disubstituted', 'n'], [['H', 'Br'], ['H', 'C'], 'disubstituted', 'halogen'],
    [['H', 'S'], ['H', 'C'], 'disubstituted', 's-se'], [['H', 'F'], ['H', 'C'], 'disubstituted', 'f'], [['H', 'F'], ['H', 'F'], 'disubstituted', 'two-hetero'], [['H', 'O'], ['H', 'N'], 'disubstituted', 'two-hetero'],
    [['H', 'Sn'], ['H', 'C'], 'disubstituted', 'metal'], [['H', 'B'], ['H', 'C'], 'disubstituted', 'metal'], [['H', 'Zn'], ['H', 'C'], 'disubstituted', 'metal'], [['H', 'Si'], ['H', 'O'], 'disubstituted', 'none'],
    [['H', 'P'], ['H', 'C'], 'disubstituted', 'none'], [['H', 'H'], ['H', 'C'], 'terminal', 'terminal-c'], [['H', 'H'], ['H', 'Cl'], 'terminal', 'halogen'], [['H', 'H'], ['H', 'H'], 'terminal', 'ethene'],
    [['H', 'H'], ['C', 'C'], 'terminal', 'c-c'], [['C', 'C'], ['H', 'C'], 'trisubstituted', 'none'], [['C', 'C'], ['C', 'C'], 'tetrasubstituted', 'none'],
  ] as const)('%s = %s is %s, %s', (left, right, setting, classId) => {
    expect(kindOf(ends([left[0], left[1]], [right[0], right[1]]))).toMatchObject({ setting, classId });
  });
});
