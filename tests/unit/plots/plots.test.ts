import fc from 'fast-check';

import { relationRegistry } from '@/server/relations/registry';
import { curve, quickLook } from '@/shared/engine';
import { arcPieces, curvePlot } from '@/shared/plots/curvePlot';
import { dialPlot } from '@/shared/plots/dialPlot';
import { ladderPlot } from '@/shared/plots/ladderPlot';
import { linearScale, stepFor } from '@/shared/plots/scale';
import type { LadderRow } from '@/shared/types/answer';

const registry = relationRegistry();
const PADDING = { left: 20, right: 10, top: 15, bottom: 18 };
const numbers = (path: string): number[] => (path.match(/-?\d+(\.\d+)?/g) ?? []).map(Number);

function plotOf(j: string) {
  const answer = quickLook({ bond: 'single', j, se: '0.2', groups: null, turning: 'ring' }, registry);
  if (answer.state !== 'answered' || !answer.single || !answer.relation) throw new Error('the quick look should answer');
  const row = registry.find(answer.relation.id);
  if (!row) throw new Error('the relation should be held');
  return { answer, single: answer.single, plot: curvePlot({ width: 400, height: 200, padding: PADDING, points: curve(row), spreadHz: answer.relation.spreadHz, reading: answer.reading, roots: answer.single.roots, arcs: answer.single.arcs }) };
}

describe('the curve', () => {
  it.each(['2.1', '4.5', '8.9', '11', '13', '15.5'])('draws %s Hz within its frame, with a ring for each root and the arcs on the axis', (j) => {
    const { plot, single, answer } = plotOf(j);
    for (const path of [plot.line, plot.band]) {
      const values = numbers(path);
      values.forEach((value, i) => {
        const [low, high] = i % 2 === 0 ? [plot.axis.x0, plot.axis.x1] : [plot.axis.y1, plot.axis.y0];
        expect(value).toBeGreaterThanOrEqual(low - 0.01);
        expect(value).toBeLessThanOrEqual(high + 0.01);
      });
    }
    expect(plot.rings.flatMap(({ roots }) => roots)).toHaveLength(single.roots.length);
    expect(plot.topHz).toBeGreaterThanOrEqual(answer.reading.jHz);
    const degrees = plot.bars.reduce((sum, bar) => sum + bar.toDeg - bar.fromDeg, 0);
    expect(degrees).toBeCloseTo(single.arcs.reduce((sum, arc) => sum + arc.toDeg - arc.fromDeg, 0), 6);
    expect(plot.measured.y).toBeGreaterThan(plot.axis.y1);
  });
  it('joins roots that would overlap into one long ring', () => {
    const root = (phiDeg: number) => ({ phiDeg, sector: 'sp' as const });
    const plot = curvePlot({ width: 400, height: 200, padding: PADDING, points: curve(registry.rows.find(({ kind }) => kind === 'three-term')!), spreadHz: 1, reading: { jHz: 11, seHz: 0.2, limit: 'none' }, roots: [root(-150), root(-2), root(2), root(150)], arcs: [] });
    expect(plot.rings.map(({ roots }) => roots.length)).toEqual([1, 2, 1]);
    expect(plot.rings[1]!.width).toBeGreaterThan(0);
  });
  it('cuts an arc at ±180° and loses no degree of it', () => {
    fc.assert(fc.property(fc.double({ min: -179.99, max: 180, noNaN: true }), fc.double({ min: 0.01, max: 360, noNaN: true }), (from, width) => {
      const pieces = arcPieces({ fromDeg: from, toDeg: from + width });
      for (const [a, b] of pieces) expect(a >= -180 && b <= 180 && b > a).toBe(true);
      expect(pieces.reduce((sum, [a, b]) => sum + b - a, 0)).toBeCloseTo(width, 6);
    }));
  });
});

describe('the dial', () => {
  it('puts 0° at the top, +90° at the right, and the marker at φ', () => {
    const at = (phiDeg: number) => dialPlot({ size: 200, radius: 80, phiDeg, arcs: [], groups: null }).marker;
    expect(at(0).y).toBeCloseTo(20);
    expect(at(90).x).toBeCloseTo(180);
    expect(at(-90).x).toBeCloseTo(20);
    expect(at(180).y).toBeCloseTo(180);
  });
  it('turns the rear groups with the rear H, and leaves the front ones', () => {
    const groups = { front: ['a', 'b'], rear: ['c', 'd'] } as const;
    const [one, other] = [10, 70].map((phiDeg) => dialPlot({ size: 200, radius: 80, phiDeg, arcs: [], groups }).spokes);
    const place = (spokes: typeof one, label: string) => spokes!.find((spoke) => spoke.label === label)!.at;
    expect(place(one, 'a')).toEqual(place(other, 'a'));
    expect(place(one, 'c')).not.toEqual(place(other, 'c'));
    expect(place(one, 'a').x).toBeGreaterThan(100); // +120° lies clockwise, at the right
  });
  it('draws a whole turn as two halves, since an arc from a point to itself is nothing', () => {
    const [path] = dialPlot({ size: 200, radius: 80, phiDeg: 0, arcs: [{ fromDeg: -180, toDeg: 180, sectors: [] }], groups: null }).arcs;
    expect(path!.match(/A/g)).toHaveLength(2);
  });
});

describe('the ladder', () => {
  const row = (geometry: LadderRow['geometry'], fullHz: [number, number]): LadderRow => ({ geometry, fullHz, classHz: null, compounds: [] });
  it('reaches to 20 Hz, and further with the reading', () => {
    const top = (jHz: number) => ladderPlot({ width: 300, rowHeight: 28, padding: PADDING, rows: [row('cis', [4, 12])], reading: { jHz, seHz: 0.2 } }).topHz;
    expect(top(12)).toBe(20);
    expect(top(23.9)).toBe(26);
  });
  it('keeps rows and reading in the frame, below zero too', () => {
    fc.assert(fc.property(fc.double({ min: -20, max: 40, noNaN: true }), fc.double({ min: 0.05, max: 3, noNaN: true }), (jHz, seHz) => {
      const plot = ladderPlot({ width: 300, rowHeight: 28, padding: PADDING, rows: [row('geminal', [-4, 7]), row('trans', [9, 24])], reading: { jHz, seHz } });
      for (const x of [plot.measured.left, plot.measured.left + plot.measured.width, ...plot.rows.flatMap((one) => [one.full.x, one.full.x + one.full.width])]) {
        expect(x).toBeGreaterThanOrEqual(PADDING.left - 1e-6);
        expect(x).toBeLessThanOrEqual(300 - PADDING.right + 1 + 1e-6);
      }
    }));
  });
});

it('a scale meets its ends, and ticks are between three and seven', () => {
  const scale = linearScale([-180, 180], [20, 390]);
  expect([scale(-180), scale(0), scale(180)]).toEqual([20, 205, 390]);
  for (const top of [4, 6, 12, 16, 20, 24, 60]) expect(top / stepFor(top)).toBeLessThanOrEqual(7);
});
