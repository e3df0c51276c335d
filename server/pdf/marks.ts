import type { Grade } from '@/shared/types/answer';
import type { Ink } from '@/shared/types/trail';
import { INK_COLOUR, PAPER } from './palette';

type Fill = 'full' | 'half' | 'open';
export const FILL_OF: Record<Grade, Fill> = { assigned: 'full', tentative: 'half', 'not-decided': 'open' };

const shape: Record<Ink, (x: number, y: number, r: number) => string> = {
  measured: (x, y, r) => `M${x - r * 0.8} ${y - r * 0.8}h${r * 1.6}v${r * 1.6}h${-r * 1.6}Z`,
  calculated: (x, y, r) => `M${x - r} ${y}A${r} ${r} 0 1 1 ${x + r} ${y}A${r} ${r} 0 1 1 ${x - r} ${y}Z`,
  judged: (x, y, r) => `M${x} ${y - r}L${x + r} ${y}L${x} ${y + r}L${x - r} ${y}Z`,
};
const leftHalf: Record<Ink, (x: number, y: number, r: number) => string> = {
  measured: (x, y, r) => `M${x - r * 0.8} ${y - r * 0.8}h${r * 0.8}v${r * 1.6}h${-r * 0.8}Z`,
  calculated: (x, y, r) => `M${x} ${y - r}A${r} ${r} 0 0 0 ${x} ${y + r}Z`,
  judged: (x, y, r) => `M${x} ${y - r}L${x - r} ${y}L${x} ${y + r}Z`,
};

/** The mark of an ink (■ ● ◆) as a drawing: a font's own would differ from the screen's. */
export function drawMark(doc: PDFKit.PDFDocument, ink: Ink, fill: Fill, x: number, y: number, radius: number): void {
  const colour = INK_COLOUR[ink];
  const stroke = Math.max(1, radius / 4.5);
  doc.save();
  if (fill === 'full') {
    doc.path(shape[ink](x, y, radius)).fill(colour);
  } else {
    const r = radius - stroke / 2;
    doc.path(shape[ink](x, y, r)).lineWidth(stroke).fillAndStroke(PAPER.white, colour);
    if (fill === 'half') doc.path(leftHalf[ink](x, y, r)).fill(colour);
  }
  doc.restore();
}

/** The bar at the left of an answer: solid, dashed or outlined, as the mark beside the word. */
export function drawGradeBar(doc: PDFKit.PDFDocument, ink: Ink, grade: Grade, x: number, y: number, width: number, height: number): void {
  const colour = INK_COLOUR[ink];
  doc.save();
  if (grade === 'assigned') doc.rect(x, y, width, height).fill(colour);
  else if (grade === 'tentative') for (let at = 0; at < height; at += 10) doc.rect(x, y + at, width, Math.min(6, height - at)).fill(colour);
  else doc.rect(x + 0.5, y + 0.5, width - 1, height - 1).lineWidth(1).fillAndStroke(PAPER.white, colour);
  doc.restore();
}

/** The sign: three bonds from the measured to the judged end, on a field of 32. */
export function drawSign(doc: PDFKit.PDFDocument, x: number, y: number, size: number): void {
  doc.save().translate(x, y).scale(size / 32);
  doc.path('M5 22L11.5 11.5L20.5 20.5L27 10').lineWidth(2.2).lineCap('round').lineJoin('round').stroke(PAPER.ink);
  doc.circle(16, 16, 4).fill(INK_COLOUR.calculated);
  doc.rect(0.8, 18.2, 8.4, 8.4).fill(INK_COLOUR.measured);
  doc.path('M26.4 4.8l5.2 5.2l-5.2 5.2l-5.2 -5.2Z').fill(INK_COLOUR.judged);
  doc.restore();
}
