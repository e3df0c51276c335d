/** Laws of inversion, for every row that gives angles and for random groups of the generalised equation. */
import fc from 'fast-check';

import { allowedArcs, arcsBetween, bindCurve, evaluate, invert, jAt, rootsOf, sectorOf, sectorsOf, type Curve } from '@/shared/engine';
import { apartDeg, wrapDegrees } from '@/shared/engine/math/angles';
import { polynomialAt, polynomialRoots, quadraticRoots } from '@/shared/engine/math/polynomial';
import { anglesAt, anglesBetween, fromHarmonics, reachOf } from '@/shared/engine/math/periodic';
import type { AngleRow, Substituent } from '@/shared/types/relation';
import { angleRow, heldForTests } from '../../helpers/registry';

const dihedral = fc.double({ min: -180, max: 180, noNaN: true });
const tolerance = fc.double({ min: 0.05, max: 4, noNaN: true });
const dchi = fc.constantFrom(0.4, 0.85, 1.3, 1.7, 0.95, 0.75, 0.45);
const substituent: fc.Arbitrary<Substituent> = fc.record({ dchiAlpha: dchi, dchiBeta: fc.array(dchi, { maxLength: 3 }), xi: fc.constantFrom(1 as const, -1 as const) });
const substituents = fc.array(substituent, { maxLength: 4 });
const coefficient = fc.double({ min: -10, max: 10, noNaN: true });
const harmonics = fc.record({ a0: coefficient, a1: coefficient, b1: coefficient, a2: coefficient, b2: coefficient });

const angleRows = heldForTests().rows.filter((r): r is AngleRow => r.kind !== 'class-table');
const generalised = angleRow('vicinal-hh/generalised-1980');
const curveOf = (row: AngleRow) => (row.kind === 'generalised' ? substituents.map((s) => bindCurve(row, { substituents: s })) : fc.constant(bindCurve(row)));

/** Sign changes on a dense scan: what any inversion must find at least. */
function scanned(curve: Curve, jHz: number, step = 0.05): number[] {
  const out: number[] = [];
  let before = jAt(curve, -180) - jHz;
  for (let i = 1; i <= 360 / step; i += 1) {
    const phi = -180 + i * step;
    const now = jAt(curve, phi) - jHz;
    if (before < 0 !== now < 0) out.push(phi - step / 2);
    before = now;
  }
  return out;
}

describe.each(angleRows.map((r) => [r.id, r] as const))('%s', (_id, row) => {
  it('finds the angle again from its own J, and nothing but such angles', () => {
    fc.assert(fc.property(curveOf(row), dihedral, (curve, phi) => {
      const j = jAt(curve, phi);
      const roots = rootsOf(curve, j);
      // near a turn the J of two angles differs by less than rounding, so the angle itself is only as sharp as its root
      expect(roots.some((r) => apartDeg(r.phiDeg, phi) < 1e-5)).toBe(true);
      for (const r of roots) {
        expect(Math.abs(jAt(curve, r.phiDeg) - j)).toBeLessThan(1e-9);
        expect(r.phiDeg).toBeGreaterThan(-180);
        expect(r.phiDeg).toBeLessThanOrEqual(180);
      }
    }), { examples: [[bindCurve(row, row.kind === 'generalised' ? { substituents: [] } : {}), 180], [bindCurve(row, row.kind === 'generalised' ? { substituents: [] } : {}), 0], [bindCurve(row, row.kind === 'generalised' ? { substituents: [] } : {}), 90]] });
  });

  it('misses no root that a dense scan sees', () => {
    fc.assert(fc.property(curveOf(row), fc.double({ min: -1, max: 16, noNaN: true }), (curve, j) => {
      const roots = rootsOf(curve, j).map((r) => r.phiDeg);
      for (const phi of scanned(curve, j)) expect(roots.some((r) => apartDeg(r, phi) <= 0.026)).toBe(true);
      expect(roots.length).toBeLessThanOrEqual(4);
    }), { numRuns: 60 });
  });

  it('has no root outside its reach and one at each end', () => {
    fc.assert(fc.property(curveOf(row), fc.double({ min: 0.001, max: 5, noNaN: true }), (curve, beyond) => {
      const { minHz, maxHz } = curve.reach;
      expect(rootsOf(curve, maxHz + beyond)).toEqual([]);
      expect(rootsOf(curve, minHz - beyond)).toEqual([]);
      expect(rootsOf(curve, maxHz).length).toBeGreaterThan(0);
      expect(rootsOf(curve, minHz).length).toBeGreaterThan(0);
    }));
  });

  it('keeps the true angle inside the arcs, which grow with the tolerance', () => {
    fc.assert(fc.property(curveOf(row), dihedral, tolerance, (curve, phi, tol) => {
      const j = jAt(curve, phi);
      const width = (t: number) => arcsBetween(curve, j - t, j + t).reduce((w, a) => w + a.toDeg - a.fromDeg, 0);
      const arcs = arcsBetween(curve, j - tol, j + tol);
      expect(arcs.some((a) => [phi - 360, phi, phi + 360].some((p) => p >= a.fromDeg - 1e-6 && p <= a.toDeg + 1e-6))).toBe(true);
      expect(width(tol * 1.5)).toBeGreaterThanOrEqual(width(tol) - 1e-9);
      for (const a of arcs) {
        for (const at of [0.01, 0.5, 0.99]) expect(Math.abs(jAt(curve, a.fromDeg + at * (a.toDeg - a.fromDeg)) - j)).toBeLessThanOrEqual(tol + 1e-9);
        expect(a.toDeg - a.fromDeg).toBeLessThanOrEqual(360 + 1e-9);
      }
    }));
  });
});

describe('the generalised equation', () => {
  it('gives the mirror image the same J', () => {
    fc.assert(fc.property(substituents, dihedral, (list, phiDeg) => {
      const mirrored = list.map((s): Substituent => ({ ...s, xi: s.xi === 1 ? -1 : 1 }));
      expect(evaluate(generalised, { substituents: mirrored, phiDeg: -phiDeg })).toBeCloseTo(evaluate(generalised, { substituents: list, phiDeg }), 10);
    }));
  });

  it('does not mind the order of the substituents', () => {
    fc.assert(fc.property(substituents, dihedral, (list, phiDeg) => {
      expect(evaluate(generalised, { substituents: list.toReversed(), phiDeg })).toBeCloseTo(evaluate(generalised, { substituents: list, phiDeg }), 12);
    }));
  });
});

describe('sums of harmonics', () => {
  it('are monotone between their turns, and inverted without a miss', () => {
    fc.assert(fc.property(harmonics, fc.double({ min: 0.001, max: 0.999, noNaN: true }), (h, share) => {
      const f = fromHarmonics(h);
      const [low, high] = reachOf(f);
      fc.pre(high - low > 1e-3);
      const y = low + share * (high - low);
      const found = anglesAt(f, y);
      let seen = 0;
      for (let i = 0; i < 3600; i += 1) {
        const a = f.value(-Math.PI + (2 * Math.PI * i) / 3600);
        const b = f.value(-Math.PI + (2 * Math.PI * (i + 1)) / 3600);
        if (a < y !== b < y) seen += 1;
      }
      expect(found.length).toBeGreaterThanOrEqual(Math.min(seen, 4));
      for (const phi of found) expect(Math.abs(f.value(phi) - y)).toBeLessThan(1e-10);
      for (const phi of f.turns) expect(Math.abs(f.slope(phi))).toBeLessThan(1e-6);
    }));
  });

  it('that are constant have no root and all or nothing as arc', () => {
    const flat = fromHarmonics({ a0: 3, a1: 0, b1: 0, a2: 0, b2: 0 });
    expect(anglesAt(flat, 3)).toEqual([]);
    expect(anglesBetween(flat, 2, 4)).toEqual([[-Math.PI, Math.PI]]);
    expect(anglesBetween(flat, 4, 5)).toEqual([]);
    expect(reachOf(flat)).toEqual([3, 3]);
  });

  it('keep their turns where the two charts meet', () => {
    expect(fromHarmonics({ a0: 0, a1: 0, b1: 0, a2: 5, b2: 0 }).turns.map((t) => Math.round((t * 180) / Math.PI))).toEqual([-90, 0, 90, 180]);
  });
});

describe('the plain form', () => {
  const plain = angleRow('vicinal-hh/karplus-1963');
  it('has the roots of its quadratic in cos φ', () => {
    fc.assert(fc.property(fc.double({ min: 1.98, max: 12.999, noNaN: true }), (j) => {
      // at 11 Hz the curve touches: the tangent cases have their own test
      fc.pre(Math.abs(j - 11) > 1e-6);
      // 7 − cos φ + 5 (2 cos²φ − 1) = J
      const closed = quadraticRoots(10, -1, 2 - j).filter((x) => Math.abs(x) <= 1).flatMap((x) => [-Math.acos(x), Math.acos(x)]).map((x) => (x * 180) / Math.PI).sort((a, b) => a - b);
      const found = invert(plain, j).map((r) => r.phiDeg);
      expect(found.length).toBe(closed.length);
      found.forEach((phi, i) => expect(Math.abs(phi - (closed[i] ?? NaN))).toBeLessThan(1e-6));
    }));
  });
  it('knows the tangent, single and no-root cases', () => {
    expect(invert(plain, 13).map((r) => r.phiDeg)).toEqual([180]);
    expect(invert(plain, 1.975).map((r) => Math.round(r.phiDeg * 10) / 10)).toEqual([-87.1, 87.1]);
    expect(invert(plain, 11).map((r) => r.phiDeg)).toHaveLength(3);
    expect(invert(plain, 13.001)).toEqual([]);
  });
  it('refuses what is no number', () => {
    expect(() => invert(plain, NaN)).toThrow(RangeError);
    expect(() => allowedArcs(plain, 5, 0)).toThrow(RangeError);
    expect(() => allowedArcs(plain, Infinity, 1)).toThrow(RangeError);
    expect(() => evaluate(plain, { phiDeg: Infinity })).toThrow(RangeError);
  });
});

describe('polynomials', () => {
  it('have every root that was built in', () => {
    fc.assert(fc.property(fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 2, maxLength: 4 }), (wanted) => {
      const c = wanted.reduce<number[]>((p, r) => [...p.map((v) => -r * v), 0].map((v, i) => v + (i > 0 ? (p[i - 1] ?? 0) : 0)), [1]);
      const found = polynomialRoots(c, -1.01, 1.01);
      for (const r of wanted) expect(found.some((x) => Math.abs(x - r) < 1e-3)).toBe(true);
      for (const x of found) expect(Math.abs(polynomialAt(c, x))).toBeLessThan(1e-9);
    }));
  });
});

describe('sectors', () => {
  it.each([[0, 'sp'], [29.9, 'sp'], [30, '+sc'], [90, '+ac'], [150, 'ap'], [180, 'ap'], [-180, 'ap'], [-149.9, '-ac'], [-90, '-sc'], [-30, 'sp']])('%d° is %s', (phi, sector) => {
    expect(sectorOf(phi)).toBe(sector);
  });
  it('names every sector that a stretch enters, both at a border', () => {
    expect(sectorsOf(-157, -140)).toEqual(['ap', '-ac']);
    expect(sectorsOf(170, 200)).toEqual(['ap']);
    expect(sectorsOf(30, 90)).toEqual(['+sc']);
    expect(sectorsOf(140, 221)).toEqual(['+ac', 'ap', '-ac']);
  });
  it('brings every angle into −180 to 180', () => {
    fc.assert(fc.property(fc.double({ min: -2000, max: 2000, noNaN: true }), (phi) => {
      const w = wrapDegrees(phi);
      expect(w).toBeGreaterThan(-180);
      expect(w).toBeLessThanOrEqual(180);
      expect(apartDeg(w, phi)).toBeLessThan(1e-9);
    }));
    expect(wrapDegrees(-180)).toBe(180);
  });
});
