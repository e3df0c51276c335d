import type { CurvePoint } from '../types/answer';
import type { Arc, Root } from '../types/reading';
import { linearScale, polyline, stepFor } from './scale';

export interface CurvePlotInput {
  width: number;
  height: number;
  padding: { left: number; right: number; top: number; bottom: number };
  /** φ ascending from −180 to 180 */
  points: readonly CurvePoint[];
  spreadHz: number;
  reading: { jHz: number; seHz: number; limit: 'none' | 'upper' | 'lower' };
  roots: readonly Root[];
  arcs: readonly Arc[];
}

export interface CurvePlot {
  topHz: number;
  /** y grows downwards, as in SVG and in a PDF page drawn by pdfkit */
  line: string;
  band: string;
  measured: { y: number; top: number; height: number };
  /** allowed stretches on the axis, cut at ±180° */
  bars: { x: number; width: number; fromDeg: number; toDeg: number }[];
  /** one ring a root; roots nearer than a ring's width share a long one */
  rings: { x: number; y: number; width: number; roots: Root[] }[];
  xTicks: { x: number; deg: number }[];
  yTicks: { y: number; hz: number }[];
  axis: { x0: number; x1: number; y0: number; y1: number };
}

/** Cuts an arc at ±180° so that both ends of the axis carry their part. */
export function arcPieces(arc: { fromDeg: number; toDeg: number }): [number, number][] {
  const pieces: [number, number][] = [];
  for (const turn of [-360, 0, 360]) {
    const from = Math.max(-180, arc.fromDeg + turn);
    const to = Math.min(180, arc.toDeg + turn);
    if (to > from) pieces.push([from, to]);
  }
  return pieces;
}

const RING = 5;

/** Everything a curve plot draws, as numbers and path data: the screen and the printed sheet read the same. */
export function curvePlot(input: CurvePlotInput): CurvePlot {
  const { width, height, padding, points, spreadHz, reading } = input;
  const highest = Math.max(...points.map((p) => p.jHz + spreadHz), reading.jHz + 2 * reading.seHz, 4);
  const lowest = Math.min(...points.map((p) => p.jHz), reading.jHz - reading.seHz, 0);
  const step = stepFor(highest);
  const topHz = Math.ceil(highest / step) * step;
  const bottomHz = lowest < 0 ? Math.floor(lowest / step) * step : 0;
  const x = linearScale([-180, 180], [padding.left, width - padding.right]);
  const y = linearScale([bottomHz, topHz], [height - padding.bottom, padding.top]);
  const clamp = (hz: number) => Math.min(topHz, Math.max(bottomHz, hz));
  const upper = points.map((p) => [x(p.phiDeg), y(clamp(p.jHz + spreadHz))] as const);
  const lower = points.map((p) => [x(p.phiDeg), y(clamp(p.jHz - spreadHz))] as const).reverse();
  const rings: CurvePlot['rings'] = [];
  for (const root of [...input.roots].sort((a, b) => a.phiDeg - b.phiDeg)) {
    const at = x(root.phiDeg);
    const last = rings[rings.length - 1];
    if (last && at - (last.x + last.width / 2) < 2 * RING + 1) {
      const from = last.x - last.width / 2;
      last.x = (from + at) / 2;
      last.width = at - from;
      last.roots.push(root);
    } else {
      rings.push({ x: at, y: y(reading.jHz), width: 0, roots: [root] });
    }
  }
  const yTicks = [];
  for (let hz = bottomHz; hz <= topHz + 1e-9; hz += step) yTicks.push({ y: y(hz), hz });
  return {
    topHz,
    line: polyline(points.map((p) => [x(p.phiDeg), y(clamp(p.jHz))] as const)),
    band: `${polyline([...upper, ...lower])}Z`,
    measured: { y: y(reading.jHz), top: y(clamp(reading.jHz + reading.seHz)), height: y(clamp(reading.jHz - reading.seHz)) - y(clamp(reading.jHz + reading.seHz)) },
    bars: input.arcs.flatMap((arc) => arcPieces(arc).map(([from, to]) => ({ x: x(from), width: x(to) - x(from), fromDeg: from, toDeg: to }))),
    rings,
    xTicks: [-180, -120, -60, 0, 60, 120, 180].map((deg) => ({ x: x(deg), deg })),
    yTicks,
    axis: { x0: padding.left, x1: width - padding.right, y0: height - padding.bottom, y1: padding.top },
  };
}
