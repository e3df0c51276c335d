/** Each caution with an input that raises it and one that does not. */
import { caseTrail, contentFromQuickLook, quickLook, registryFrom } from '@/shared/engine';
import { CAUTION_IDS, type CautionId, type QuickLookInput, type SingleBondInput } from '@/shared/types/answer';
import type { CaseContent } from '@/shared/types/case';
import { cautionText } from '@/shared/text/engine/cautions';
import { heldForTests } from '../../helpers/registry';

const registry = heldForTests();
type Pair = [string, string];
const path: NonNullable<SingleBondInput['groups']> = { front: ['O(C)', 'C(H,H,H)'], rear: ['C(H,H,H)', 'H'] };
const hydrocarbon: NonNullable<SingleBondInput['groups']> = { front: ['C(H,H,H)', 'H'], rear: ['C(H,H,H)', 'H'] };
const single = (j: string, more: Partial<SingleBondInput> = {}): QuickLookInput => ({ bond: 'single', j, groups: path, turning: 'ring', ...more });
const double = (j: string, left: Pair | null = ['H', 'C(=O,O)'], right: Pair = ['H', 'C(=C,C)'], more: object = {}): QuickLookInput => ({ bond: 'double', j, groups: left ? { left, right } : null, ...more });

function raised(input: QuickLookInput): string[] {
  const result = quickLook(input, registry);
  if (result.state !== 'answered') throw new Error(JSON.stringify(result));
  return result.cautions.map((c) => c.id);
}

const plain = 'vicinal-hh/karplus-1963';
const quick: [CautionId, QuickLookInput, QuickLookInput][] = [
  ['relative-only', single('9.6'), single('14.8')],
  ['may-be-averaged', single('6.9', { turning: 'free' }), single('6.9', { turning: 'ring' })],
  ['several-roots', single('9.6'), single('11.8')],
  ['out-of-domain', single('12.0', { groups: { front: ['S(C)', 'H'], rear: ['H', 'H'] } }), single('9.6')],
  ['alkene-border', double('12.6'), double('15.8')],
  ['no-vicinal-path', double('1.5', ['C', 'C']), double('15.8')],
  ['sign-not-measured', double('1.1', ['H', 'H']), double('17.3', ['H', 'H'])],
  ['negative-vicinal', double('-2.0', ['H', 'F'], ['H', 'F']), double('15.8')],
  ['limit-used', single('<1.5'), single('9.6')],
  ['partner-differs', single('9.6', { partner: '8.7' }), single('9.6', { partner: '9.5' })],
  ['larger-than-usual', single('16.5'), single('15.5')],
  ['larger-than-usual', double('25.5'), double('24.5')],
  ['smaller-than-usual', double('1.5'), double('15.8')],
  ['from-memory', single('9.6'), single('12.0', { groups: null })],
  ['common-practice', single('12.0', { groups: null }), single('9.6')],
  ['cis-trans-not-ez', double('1.5', ['C(H,H,H)', 'C(=O,O)'], ['H', 'C(H,H,H)']), double('15.8')],
  ['groups-not-given', single('12.0', { groups: null }), single('9.6')],
  ['groups-not-given', double('15.8', null), double('15.8')],
  ['ring-fact', double('10.1', ['H', 'C'], ['H', 'C'], { ringSize: 6 }), double('10.1', ['H', 'C'], ['H', 'C'])],
  ['symmetric-alkene', double('15.1', ['H', 'C(H,H,H)'], ['H', 'C(H,H,H)']), double('15.1', ['H', 'C'], ['H', 'C'])],
  ['diene-single-bond', double('10.4', ['H', 'C(=C,H)']), double('15.1', ['H', 'C(=C,H)'])],
  ['polar-carbon', single('9.6', { relation: plain }), single('12.0', { relation: plain, groups: hydrocarbon })],
  ['sp2-neighbour', single('9.6', { groups: { front: ['C(=O,O)', 'H'], rear: ['C(H,H,H)', 'H'] } }), single('9.6')],
  ['beyond-reach', single('14.8'), single('9.6')],
  ['small-sample', double('15.8'), double('17.3', ['H', 'H'])],
  ['coarse-reading', single('9'), single('9.0')],
];

it.each(quick)('%s is raised by its trigger and by nothing else', (id, yes, no) => {
  expect(raised(yes)).toContain(id);
  expect(raised(no)).not.toContain(id);
});

const base = contentFromQuickLook(double('15.8'), quickLook(double('15.8'), registry));
const trail = (change: (c: CaseContent) => CaseContent, held = registry): string[] => caseTrail(change(structuredClone(base)), held).cautions.map((c) => c.id);
const withReading = (more: object) => (c: CaseContent): CaseContent => ({ ...c, readings: c.readings.map((r) => ({ ...r, ...more })) });
const superseded = registryFrom(registry.rows.map((r) => (r.id === plain ? { ...r, status: 'superseded' as const } : r)));
const onPlain = (c: CaseContent): CaseContent => ({ ...c, calculations: [{ id: 'c1', readingId: 'r1', bond: 'single', groups: null, relation: `${plain}@1` }] });

const wholeCase: [CautionId, () => string[], () => string[]][] = [
  ['one-candidate', () => trail((c) => ({ ...c, candidates: c.candidates.slice(0, 1) })), () => trail((c) => c)],
  ['untested-candidate', () => trail((c) => ({ ...c, candidates: [...c.candidates, { id: 'x', name: 'x', description: '', claims: [] }] })), () => trail((c) => c)],
  ['candidates-conflict', () => trail((c) => ({ ...c, candidates: c.candidates.map((x) => ({ ...x, claims: [{ calculationId: 'c1', kind: 'geometry' as const, geometry: 'cis' as const }] })) })), () => trail((c) => c)],
  ['exchange-partner', () => trail(withReading({ atomA: 'H3', atomB: 'OH' })), () => trail(withReading({ atomA: 'H3', atomB: 'H4' }))],
  ['second-order', () => trail(withReading({ note: 'second-order pattern' })), () => trail(withReading({ note: 'clean doublet' }))],
  ['sign-not-measured', () => trail(withReading({ path: '2J' })), () => trail(withReading({ path: '2J', sign: 'negative' }))],
  ['relative-only', () => trail((c) => ({ ...c, question: 'Is C5 R or S?' })), () => trail((c) => c)],
  ['relation-superseded', () => trail(onPlain, superseded), () => trail(onPlain)],
];

it.each(wholeCase)('%s in a case', (id, yes, no) => {
  expect(yes()).toContain(id);
  expect(no()).not.toContain(id);
});

it('has a test for every caution', () => {
  const tested = new Set([...quick.map(([id]) => id), ...wholeCase.map(([id]) => id)]);
  expect(CAUTION_IDS.filter((id) => !tested.has(id))).toEqual([]);
  for (const id of CAUTION_IDS) expect(cautionText[id].length).toBeGreaterThan(20);
});
