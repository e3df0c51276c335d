import type { DoubleBondGeometry, LadderRow } from '../types/answer';
import { linearScale } from './scale';

export interface LadderPlotInput {
  width: number;
  padding: { left: number; right: number; top: number; bottom: number };
  rowHeight: number;
  rows: readonly LadderRow[];
  reading: { jHz: number; seHz: number };
}

export interface LadderPlot {
  height: number;
  topHz: number;
  rows: {
    geometry: DoubleBondGeometry;
    y: number;
    full: { x: number; width: number };
    inClass: { x: number; width: number } | null;
    ticks: { x: number; jHz: number; name: string }[];
  }[];
  barHeight: number;
  measured: { x: number; left: number; width: number };
  xTicks: { x: number; hz: number; labelled: boolean }[];
  axisY: number;
}

/** The ladder of double-bond geometries: 0 to 20 Hz, and further when the reading or a held compound lies beyond. */
export function ladderPlot(input: LadderPlotInput): LadderPlot {
  const { width, padding, rowHeight, rows, reading } = input;
  const highest = Math.max(20, reading.jHz + reading.seHz, ...rows.map((row) => row.fullHz[1]));
  const lowest = Math.min(0, reading.jHz - reading.seHz, ...rows.map((row) => row.fullHz[0]));
  const topHz = Math.ceil(highest / 2) * 2;
  const bottomHz = Math.floor(lowest / 2) * 2;
  const x = linearScale([bottomHz, topHz], [padding.left, width - padding.right]);
  const span = ([from, to]: readonly [number, number]) => ({ x: x(from), width: Math.max(1.5, x(to) - x(from)) });
  const axisY = padding.top + rows.length * rowHeight;
  const xTicks = [];
  for (let hz = bottomHz; hz <= topHz; hz += 2) xTicks.push({ x: x(hz), hz, labelled: hz % 4 === 0 });
  return {
    height: axisY + padding.bottom, topHz, axisY, barHeight: rowHeight * 0.36, xTicks,
    rows: rows.map((row, index) => ({
      geometry: row.geometry,
      y: padding.top + index * rowHeight + rowHeight * 0.18,
      full: span(row.fullHz),
      inClass: row.classHz ? span(row.classHz) : null,
      ticks: row.compounds.map((compound) => ({ x: x(compound.jHz), jHz: compound.jHz, name: compound.name })),
    })),
    measured: { x: x(reading.jHz), left: x(reading.jHz - reading.seHz), width: Math.max(1, x(reading.jHz + reading.seHz) - x(reading.jHz - reading.seHz)) },
  };
}
