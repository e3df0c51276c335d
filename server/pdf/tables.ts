import type { SheetTable } from './model';
import { INK_COLOUR, PAPER } from './palette';
import type { Line, TextStyle } from './textLayout';
import { STYLE, type SheetWriter } from './writer';

const GAP = 8;
const PAD = 3;

/** A ruled table that repeats its head on a new page; a row is never cut. */
export function drawTable(writer: SheetWriter, table: SheetTable, options: { x?: number; width?: number; after?: number } = {}): void {
  const x0 = options.x ?? writer.x;
  const width = options.width ?? writer.right - x0;
  const total = table.columns.reduce((sum, column) => sum + column.share, 0);
  let at = x0;
  const columns = table.columns.map((column) => {
    const w = (width * column.share) / total;
    const placed = { ...column, x: at, w: w - GAP };
    at += w;
    return placed;
  });
  const row = (cells: readonly string[], style: (column: number) => TextStyle, tag: 'TH' | 'TD') => {
    const laid = cells.map((cell, i) => writer.layout(cell, columns[i]!.w, style(i)));
    const height = Math.max(...laid.map((lines, i) => lines.length * style(i).leading)) + 2 * PAD;
    return {
      height,
      draw: () => writer.part('TR', () => laid.forEach((lines, i) => writer.tagged(tag, () => cell(writer, lines, columns[i]!, style(i))))),
    };
  };
  const headStyle = () => STYLE.column;
  const head = row(columns.map((column) => column.head), headStyle, 'TH');
  const bodies = table.rows.map(({ cells, strong }) => row(cells, (i) => {
    const { ink, align } = columns[i]!;
    const plain = strong || i === 0 || ink ? STYLE.strong : STYLE.body;
    const base = ink ? { ...plain, colour: INK_COLOUR[ink] } : plain;
    return align === 'number' ? { ...base, tabular: true } : base;
  }, 'TD'));
  writer.ensure(head.height + (bodies[0]?.height ?? 0) + 4);
  writer.part('Table', () => {
    const drawHead = () => {
      head.draw();
      writer.y += head.height;
      writer.artifact(() => writer.doc.moveTo(x0, writer.y).lineTo(x0 + width, writer.y).lineWidth(0.75).stroke(PAPER.edge));
    };
    drawHead();
    for (const body of bodies) {
      if (!writer.room(body.height) && writer.y > writer.top) {
        writer.newPage();
        drawHead();
      }
      body.draw();
      writer.y += body.height;
      writer.artifact(() => writer.doc.moveTo(x0, writer.y).lineTo(x0 + width, writer.y).lineWidth(0.5).stroke(PAPER.rule));
    }
  });
  writer.y += options.after ?? 8;
}

function cell(writer: SheetWriter, lines: readonly Line[], column: { x: number; w: number; align: 'left' | 'number' }, style: TextStyle): void {
  lines.forEach((line, index) => {
    const x = column.align === 'number' ? column.x + column.w - line.width : column.x;
    writer.line(line, x, writer.y + PAD + index * style.leading + style.leading * 0.74, style);
  });
}
