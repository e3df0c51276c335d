import { curvePlot } from '@/shared/plots/curvePlot';
import { dialPlot } from '@/shared/plots/dialPlot';
import { ladderPlot } from '@/shared/plots/ladderPlot';
import { fixed } from '@/shared/format/number';
import type { SheetCalculation } from './model';
import { INK_COLOUR, INK_TINT, PAPER } from './palette';
import type { TextStyle } from './textLayout';
import { STYLE, type SheetWriter } from './writer';

type AnglePlot = Extract<NonNullable<SheetCalculation['plot']>, { kind: 'angle' }>;
type DoublePlot = Extract<NonNullable<SheetCalculation['plot']>, { kind: 'double' }>;

const GREEN = INK_COLOUR.calculated;
const BLUE = INK_COLOUR.measured;

function label(writer: SheetWriter, text: string, x: number, baseline: number, align: 'left' | 'centre' | 'right', style: TextStyle): void {
  const [line] = writer.layout(text, 1000, style);
  if (!line) return;
  const at = align === 'left' ? x : align === 'right' ? x - line.width : x - line.width / 2;
  writer.line(line, at, baseline, style);
}
const AXIS: TextStyle = { ...STYLE.small, leading: 10 };
const MEASURED: TextStyle = { ...STYLE.strong, size: 8.5, colour: BLUE };

/** The curve with its spread, the reading as a line with ■, allowed angles as bars on the axis, roots as open rings. */
function drawCurve(writer: SheetWriter, plot: AnglePlot, x: number, y: number, width: number, height: number): void {
  const { doc } = writer;
  const g = curvePlot({ ...plot.curve, width, height, padding: { left: 22, right: 8, top: 18, bottom: 18 } });
  doc.save().translate(x, y);
  for (const bar of g.bars) doc.rect(bar.x, g.axis.y1, bar.width, g.axis.y0 - g.axis.y1).fill(INK_TINT.calculated);
  for (const tick of g.yTicks) doc.moveTo(g.axis.x0, tick.y).lineTo(g.axis.x1, tick.y).lineWidth(0.5).stroke(PAPER.rule2);
  doc.path(g.band).fillOpacity(0.22).fill(GREEN).fillOpacity(1);
  doc.path(g.line).lineWidth(1.6).lineJoin('round').stroke(GREEN);
  if (g.measured.height > 0) doc.rect(g.axis.x0, g.measured.top, g.axis.x1 - g.axis.x0, g.measured.height).fillOpacity(0.2).fill(BLUE).fillOpacity(1);
  doc.moveTo(g.axis.x0, g.measured.y).lineTo(g.axis.x1, g.measured.y).lineWidth(1.1).stroke(BLUE);
  doc.rect(g.axis.x0 - 3.5, g.measured.y - 3.5, 7, 7).fill(BLUE);
  doc.moveTo(g.axis.x0, g.axis.y0).lineTo(g.axis.x1, g.axis.y0).lineWidth(0.75).stroke(PAPER.edge);
  for (const tick of g.xTicks) doc.moveTo(tick.x, g.axis.y0).lineTo(tick.x, g.axis.y0 + 3).lineWidth(0.5).stroke(PAPER.edge);
  for (const bar of g.bars) doc.rect(bar.x, g.axis.y0 - 2, bar.width, 4).fill(GREEN);
  for (const ring of g.rings) doc.roundedRect(ring.x - ring.width / 2 - 3.4, ring.y - 3.4, ring.width + 6.8, 6.8, 3.4).lineWidth(1.6).fillAndStroke(PAPER.white, GREEN);
  doc.restore();
  for (const tick of g.yTicks) label(writer, fixed(tick.hz, 0), x + g.axis.x0 - 5, y + tick.y + 2.8, 'right', AXIS);
  for (const tick of g.xTicks) label(writer, `${fixed(tick.deg, 0)}°`, x + tick.x, y + g.axis.y0 + 12, tick.deg === 180 ? 'right' : tick.deg === -180 ? 'left' : 'centre', AXIS);
  label(writer, '_J_ / Hz', x, y + 9, 'left', AXIS);
  label(writer, '_φ_, signed', x + width, y + 9, 'right', AXIS);
  // the word stands where the curve is lowest, above the line unless the line is at the top
  const above = g.measured.y - g.axis.y1 > 12;
  label(writer, plot.measuredLabel, x + g.axis.x0 + (g.axis.x1 - g.axis.x0) * 0.25, y + g.measured.y + (above ? -4 : 10), 'centre', MEASURED);
}

/** The Newman projection in its ring, the rear H at the shown root. */
function drawDial(writer: SheetWriter, plot: AnglePlot, x: number, y: number, size: number): void {
  const { doc } = writer;
  const g = dialPlot({ ...plot.dial, size, radius: size * 0.36 });
  doc.save().translate(x, y);
  doc.circle(g.centre.x, g.centre.y, g.radius).lineWidth(g.ringWidth).stroke(PAPER.rule);
  for (const arc of g.arcs) doc.path(arc).lineWidth(g.ringWidth).stroke(GREEN);
  for (const tick of g.ticks) doc.moveTo(tick.from.x, tick.from.y).lineTo(tick.to.x, tick.to.y).lineWidth(0.6).stroke(PAPER.muted);
  const spokes = (roles: readonly string[], colour: string, width: number) => {
    for (const spoke of g.spokes.filter((one) => roles.includes(one.role))) {
      doc.moveTo(spoke.from.x, spoke.from.y).lineTo(spoke.to.x, spoke.to.y).lineWidth(width).lineCap('round').stroke(colour);
    }
  };
  spokes(['rear'], PAPER.edge, 1.5);
  spokes(['rear-h'], GREEN, 2);
  doc.circle(g.centre.x, g.centre.y, g.rimRadius).lineWidth(1.2).fillAndStroke(PAPER.white, PAPER.ink);
  spokes(['front', 'front-h'], PAPER.ink, 1.8);
  doc.circle(g.centre.x, g.centre.y, 2).fill(PAPER.ink);
  doc.circle(g.marker.x, g.marker.y, 4).lineWidth(1.8).fillAndStroke(PAPER.white, GREEN);
  doc.restore();
  for (const spoke of g.spokes) {
    const colour = spoke.role === 'rear' ? PAPER.muted : spoke.role === 'rear-h' ? GREEN : PAPER.ink;
    if (spoke.label !== '') label(writer, spoke.label, x + spoke.at.x, y + spoke.at.y + 3, 'centre', { ...STYLE.strong, size: 8.5, colour });
  }
  for (const sector of g.sectors) label(writer, sector.label, x + sector.at.x, y + sector.at.y + 2.8, 'centre', AXIS);
}

function drawLadder(writer: SheetWriter, plot: DoublePlot, x: number, y: number, width: number): number {
  const { doc } = writer;
  const g = ladderPlot({ ...plot.ladder, width, rowHeight: 28, padding: { left: 58, right: 8, top: 22, bottom: 18 } });
  doc.save().translate(x, y);
  for (const tick of g.xTicks) doc.moveTo(tick.x, 18).lineTo(tick.x, g.axisY).lineWidth(0.5).stroke(PAPER.rule2);
  for (const row of g.rows) {
    doc.rect(row.full.x, row.y, row.full.width, g.barHeight).fillOpacity(0.2).fill(GREEN).fillOpacity(1);
    if (row.inClass) doc.rect(row.inClass.x, row.y, row.inClass.width, g.barHeight).fill(GREEN);
    for (const tick of row.ticks) doc.moveTo(tick.x, row.y + g.barHeight + 1.5).lineTo(tick.x, row.y + g.barHeight + 5.5).lineWidth(0.9).stroke(GREEN);
  }
  doc.rect(g.measured.left, 16, g.measured.width, g.axisY - 16).fillOpacity(0.28).fill(BLUE).fillOpacity(1);
  doc.moveTo(g.measured.x, 16).lineTo(g.measured.x, g.axisY).lineWidth(1.3).stroke(BLUE);
  doc.rect(g.measured.x - 3.5, 9, 7, 7).fill(BLUE);
  doc.moveTo(g.xTicks[0]!.x, g.axisY).lineTo(width - 8, g.axisY).lineWidth(0.75).stroke(PAPER.edge);
  doc.restore();
  for (const row of g.rows) label(writer, plot.names[row.geometry] ?? row.geometry, x, y + row.y + g.barHeight - 1.5, 'left', { ...STYLE.strong, size: 9 });
  for (const tick of g.xTicks) if (tick.labelled) label(writer, fixed(tick.hz, 0), x + tick.x, y + g.axisY + 12, 'centre', AXIS);
  label(writer, '_J_ / Hz', x, y + g.axisY + 12, 'left', AXIS);
  const rightSide = g.measured.x < width * 0.7;
  label(writer, plot.measuredLabel, x + g.measured.x + (rightSide ? 7 : -7), y + 15.5, rightSide ? 'left' : 'right', MEASURED);
  return g.height;
}

export const ANGLE_HEIGHT = 132;

/** Draws a plot with its description for readers that cannot see it. */
export function drawPlot(writer: SheetWriter, plot: NonNullable<SheetCalculation['plot']>): void {
  if (plot.kind === 'angle') {
    writer.ensure(ANGLE_HEIGHT + 6);
    writer.tagged('Figure', () => {
      const dialSize = ANGLE_HEIGHT;
      drawCurve(writer, plot, writer.x, writer.y, writer.width - dialSize - 16, ANGLE_HEIGHT);
      drawDial(writer, plot, writer.right - dialSize, writer.y, dialSize);
    }, plot.alt);
    writer.y += ANGLE_HEIGHT + 6;
    return;
  }
  const height = 22 + plot.ladder.rows.length * 28 + 18;
  writer.ensure(height + 6);
  writer.tagged('Figure', () => drawLadder(writer, plot, writer.x, writer.y, writer.width), plot.alt);
  writer.y += height + 6;
}
