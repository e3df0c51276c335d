import fc from 'fast-check';

import { applies, evaluate, quickLook, type PathGroups } from '@/shared/engine';
import { plainText } from '@/shared/format/richText';
import type { QuickLookAnswer, SingleBondInput } from '@/shared/types/answer';
import { angleRow, heldForTests } from '../../helpers/registry';

const registry = heldForTests();
const PATH: NonNullable<SingleBondInput['groups']> = { front: ['O(C)', 'C(H,H,H)'], rear: ['C(H,H,H)', 'H'] };
const HYDROCARBON: NonNullable<SingleBondInput['groups']> = { front: ['C(H,H,H)', 'H'], rear: ['C(H,H,H)', 'H'] };

function answer(j: string, more: Partial<SingleBondInput> = {}): QuickLookAnswer {
  const result = quickLook({ bond: 'single', j, ...more }, registry);
  if (result.state !== 'answered') throw new Error(`${j}: ${JSON.stringify(result)}`);
  return result;
}
const ids = (a: QuickLookAnswer): string[] => a.cautions.map((c) => c.id);

describe('the relation chosen by domain', () => {
  it('is the generalised equation when every group is given', () => {
    expect(answer('9.6', { se: '0.3', groups: PATH }).relation).toMatchObject({ id: 'vicinal-hh/generalised-1980', name: 'Haasnoot, de Leeuw, Altona 1980, set D', spreadHz: 0.5 });
  });
  it('is the plain row with 3 Hz when groups are not given', () => {
    expect(answer('12.0').relation).toMatchObject({ id: 'vicinal-hh/karplus-1963', spreadHz: 3, spreadProvenance: 'practice' });
  });
  it.each([[0, 'B'], [1, 'B'], [2, 'C'], [3, 'D'], [4, 'E']])('takes with %d groups set %s', (count, set) => {
    const texts = Array.from({ length: 4 }, (_, i) => (i < count ? 'C(H,H,H)' : 'H'));
    const groups = { front: [texts[0] ?? '', texts[1] ?? ''] as [string, string], rear: [texts[2] ?? '', texts[3] ?? ''] as [string, string] };
    expect(answer('10.0', { groups }).relation?.name).toContain(`set ${set}`);
  });
  it.each(['S(C)', 'P(C,C)', 'Si(C,C,C)', 'Sn(C,C,C)', 'B(O,O)', 'O(Si)'])('falls back to the plain row where no Δχ is held for %s', (group) => {
    const groups = { front: [group, 'H'] as [string, string], rear: ['H', 'H'] as [string, string] };
    expect(applies(angleRow('vicinal-hh/generalised-1980'), groups)).toMatchObject({ verdict: 'no', reason: 'no-dchi' });
    const a = answer('12.0', { groups });
    expect(a.relation).toMatchObject({ id: 'vicinal-hh/karplus-1963', spreadHz: 3 });
    expect(a.grade).not.toBe('assigned');
  });
  it('gives no angle where the relation that was asked for does not apply', () => {
    const a = answer('9.6', { groups: { front: ['S(C)', 'H'], rear: ['H', 'H'] }, relation: 'vicinal-hh/generalised-1980' });
    expect(a).toMatchObject({ grade: 'not-decided', single: null });
    expect(ids(a)).toContain('out-of-domain');
    expect(a.rulesOut).toEqual([]);
  });
  it('raises the spread beside an sp² group and beside CF₃', () => {
    expect(answer('9.6', { groups: { front: ['C(=O,O)', 'H'], rear: ['C(H,H,H)', 'H'] } }).relation?.spreadHz).toBe(1);
    expect(answer('9.6', { groups: { front: ['C(F,F,F)', 'H'], rear: ['C(H,H,H)', 'H'] } }).relation?.spreadHz).toBe(1);
  });
  it('allows a plain form of the user’s choice its own spread only on hydrocarbon groups', () => {
    expect(answer('12.0', { groups: HYDROCARBON, relation: 'vicinal-hh/karplus-1963' }).relation?.spreadHz).toBe(1.5);
    expect(answer('9.6', { groups: PATH, relation: 'vicinal-hh/karplus-1963' }).relation?.spreadHz).toBe(3);
    expect(answer('12.0', { relation: 'vicinal-hh/karplus-1963' }).relation?.spreadHz).toBe(3);
  });
});

describe('a missing fact', () => {
  const ask = (groups: SingleBondInput['groups'], relation?: string) => quickLook({ bond: 'single', j: '9.6', groups, ...(relation ? { relation } : {}) }, registry);
  it.each([['O', 'front'], ['C', 'front']])('a bare %s on the %s carbon stops it with a question', (bare, place) => {
    expect(ask({ front: [bare, 'H'], rear: ['C(H,H,H)', 'H'] })).toMatchObject({ state: 'question', field: `groups.${place}` });
  });
  it('one missing group stops it with a question', () => {
    expect(ask({ front: ['C(H,H,H)', 'H'], rear: ['', 'H'] })).toMatchObject({ state: 'question', field: 'groups.rear' });
    expect(ask({ front: ['C(H,H,H)', 'H'], rear: ['?', 'H'] })).toMatchObject({ state: 'question', field: 'groups.rear' });
  });
  it('the generalised equation without groups asks for them', () => expect(ask(null, 'vicinal-hh/generalised-1980')).toMatchObject({ state: 'question', field: 'groups' }));
  it('a group that cannot be read is a problem at its place', () => {
    expect(ask({ front: ['CH3', 'H'], rear: ['H', 'H'] })).toMatchObject({ state: 'refused', problems: [{ field: 'groups.front', code: 'group' }] });
  });
});

describe('angles', () => {
  it('come from σ of reading and relation together', () => {
    const { single } = answer('9.6', { se: '0.3', groups: PATH });
    expect(single?.sigmaHz).toBeCloseTo(Math.hypot(0.3, 0.5), 12);
    const row = angleRow('vicinal-hh/generalised-1980');
    const edges = single?.arcs.flatMap((a) => [a.fromDeg, a.toDeg]) ?? [];
    for (const phiDeg of edges) {
      const miss = Math.abs(evaluate(row, { phiDeg, groups: PATH }) - 9.6);
      expect(miss).toBeLessThanOrEqual(1.96 * Math.hypot(0.3, 0.5) + 1e-9);
    }
    expect(edges.length).toBeGreaterThan(0);
  });
  it('are tentative at most', () => {
    fc.assert(fc.property(fc.double({ min: 0.4, max: 15.9, noNaN: true }), fc.constantFrom(null, PATH, HYDROCARBON), fc.constantFrom('free' as const, 'ring' as const, 'unknown' as const), (j, groups, turning) => {
      expect(answer(j.toFixed(2), { groups, turning }).grade).not.toBe('assigned');
    }));
  });
  it('grow with ±', () => {
    fc.assert(fc.property(fc.double({ min: 1, max: 13, noNaN: true }), fc.double({ min: 0.05, max: 2, noNaN: true }), (j, se) => {
      const width = (s: number) => answer(j.toFixed(2), { se: s.toFixed(3), groups: PATH }).single?.arcs.reduce((w, a) => w + a.toDeg - a.fromDeg, 0) ?? 0;
      expect(width(se * 1.5)).toBeGreaterThanOrEqual(width(se) - 1e-9);
    }));
  });
  it('name the eclipsed arc second in a chain, and with the others in a ring', () => {
    expect(plainText(answer('9.6', { se: '0.3', groups: PATH, turning: 'free' }).detail)).toContain('Still open: synperiplanar');
    expect(plainText(answer('9.6', { se: '0.3', groups: PATH, turning: 'ring' }).headline)).toContain('ynperiplanar');
  });
  it('of a limit hold every φ that the limit allows', () => {
    const a = answer('<1.5', { groups: PATH });
    const row = angleRow('vicinal-hh/generalised-1980');
    const bound = 1.5 + 1.96 * 0.5;
    for (let phiDeg = -179; phiDeg <= 180; phiDeg += 1) {
      const inside = a.single?.arcs.some((arc) => [phiDeg, phiDeg + 360].some((p) => p >= arc.fromDeg && p <= arc.toDeg)) ?? false;
      expect([phiDeg, inside]).toEqual([phiDeg, evaluate(row, { phiDeg, groups: PATH }) <= bound]);
    }
    expect(a.single?.roots).toEqual([]);
  });
});

describe('no single angle', () => {
  it('when the relation does not reach the value', () => {
    const a = answer('14.8', { se: '0.3', groups: PATH });
    expect(a).toMatchObject({ grade: 'not-decided', headline: 'No angle gives 14.8\u00a0Hz with these groups', detail: 'The relation reaches from 0.9 to 11.6\u00a0Hz, and its error is 0.5\u00a0Hz.' });
    expect(a.single?.arcs).toEqual([]);
    expect(a.checkFirst.map((c) => c.id)).toEqual(['geminal', 'field-unit', 'two-splittings', 'groups']);
  });
  it('says so when only the error reaches it', () => {
    const a = answer('11.8', { groups: PATH });
    expect(a.single?.roots).toEqual([]);
    expect(a.single?.arcs.length).toBe(1);
    expect(a.detail).toContain('exactly');
    expect(ids(a)).toContain('beyond-reach');
  });
  it.each(['5.0', '6.9', '8.5'])('when %s Hz may be an average', (j) => {
    for (const turning of ['free', 'unknown', undefined] as const) expect(answer(j, { groups: PATH, ...(turning ? { turning } : {}) }).grade).toBe('not-decided');
    expect(answer(j, { groups: PATH, turning: 'ring' }).grade).toBe('tentative');
  });
  it('when the arcs leave most of the circle', () => expect(answer('9.6').grade).toBe('not-decided'));
});

describe('the partner', () => {
  it('withholds the answer beyond 2σ of the difference', () => {
    const a = answer('9.6', { se: '0.2', partner: '8.7', groups: PATH });
    expect(a).toMatchObject({ grade: 'not-decided', single: null });
    expect(ids(a)).toEqual(['partner-differs']);
    expect(a.headline).toContain('9.6');
    expect(a.headline).toContain('8.7');
  });
  it('is flagged always beyond 2σ and never inside 1σ', () => {
    fc.assert(fc.property(fc.double({ min: 9, max: 11, noNaN: true }), fc.double({ min: 0.1, max: 1, noNaN: true }), fc.double({ min: -4, max: 4, noNaN: true }), (j, se, gap) => {
      const sigma = Math.SQRT2 * se;
      const flagged = ids(answer(String(j), { se: String(se), partner: String(j + gap * sigma), groups: PATH })).includes('partner-differs');
      if (Math.abs(gap) <= 1) expect(flagged).toBe(false);
      if (Math.abs(gap) > 2.001) expect(flagged).toBe(true);
    }));
  });
});

it('says at most three sentences', () => {
  fc.assert(fc.property(fc.double({ min: 0.4, max: 18, noNaN: true }), fc.constantFrom(null, PATH, HYDROCARBON), fc.constantFrom('free' as const, 'ring' as const, 'unknown' as const), (j, groups, turning) => {
    const a = answer(j.toFixed(1), { groups, turning });
    const sentences = `${a.headline}. ${a.detail}`.split(/[.?](?:\s|$)/).filter((s) => s.trim() !== '');
    expect(sentences.length).toBeLessThanOrEqual(3);
  }));
});

it('gives the same digits for the same input', () => {
  const input: SingleBondInput = { bond: 'single', j: '9.6', se: '0.3', groups: PATH };
  expect(JSON.stringify(quickLook(input, registry))).toBe(JSON.stringify(quickLook(structuredClone(input), registry)));
});

it('names the second coupling on the bond with its values at each root', () => {
  const groups: PathGroups & NonNullable<SingleBondInput['groups']> = PATH;
  const next = answer('9.6', { se: '0.3', groups }).measureNext.find((n) => n.id === 'other-coupling');
  // the other H sits at −120° on the rear carbon: φ′ = φ − 120, and its own neighbours are H at +120° and C at −120°
  const j = evaluate(angleRow('vicinal-hh/generalised-1980'), { phiDeg: 159.0577 - 120, groups: { front: ['O(C)', 'C(H,H,H)'], rear: ['H', 'C(H,H,H)'] } });
  expect(next?.detail).toContain(j.toFixed(1));
});
