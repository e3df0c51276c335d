import PDFDocument from 'pdfkit';

import type { Ink } from '@/shared/types/trail';
import { FACES, type FontBook } from './fonts';
import { drawMark } from './marks';
import { INK_COLOUR, PAPER } from './palette';
import { layoutText, type Line, type Measure, type TextStyle } from './textLayout';

type Struct = ReturnType<PDFKit.PDFDocument['struct']>;

export const SIZES = { A4: [595.28, 841.89], Letter: [612, 792] } as const;
export type PaperSize = keyof typeof SIZES;

const text = (face: TextStyle['face'], italic: TextStyle['italic'], size: number, leading: number, colour: string): TextStyle => ({ face, italic, size, leading, colour });
/** Text styles of the sheet. Variables are set in Brygada's italic, as on the screen. */
export const STYLE = {
  title: text('B600', 'B600i', 18, 22, PAPER.ink),
  sentence: text('B600', 'B600i', 14, 18, PAPER.ink),
  section: text('S700', 'B600i', 12, 16, PAPER.ink),
  head: text('S700', 'B600i', 10, 14, PAPER.ink),
  body: text('S400', 'B500i', 9.5, 13, PAPER.ink),
  strong: text('S600', 'B600i', 9.5, 13, PAPER.ink),
  muted: text('S400', 'B500i', 9, 12.5, PAPER.muted),
  small: text('S400', 'B500i', 8, 11, PAPER.muted),
  column: text('S600', 'B600i', 8.5, 12, PAPER.muted),
} as const;

interface Furniture {
  /** drawn at the top and foot of each page once the number of pages is known; returns nothing that flows */
  head: (writer: SheetWriter, page: number, pages: number) => void;
}

/** A page that fills from the top, with tags, a trail line at the left, and furniture added at the end. */
export class SheetWriter {
  readonly doc: PDFKit.PDFDocument;
  readonly left = 42;
  readonly indent = 24;
  readonly right: number;
  readonly pageHeight: number;
  readonly top: number;
  readonly bottom: number;
  y: number;
  private readonly root: Struct;
  private parent: Struct;
  private trail: { ink: Ink; from: number } | null = null;
  private readonly done: Promise<Buffer>;

  constructor(readonly fonts: FontBook, paper: PaperSize, options: { title: string; author: string; at: Date; banner: boolean; subject: string }) {
    const [width, height] = SIZES[paper];
    this.doc = new PDFDocument({
      size: [width, height], margins: { top: 0, bottom: 0, left: 0, right: 0 }, bufferPages: true, autoFirstPage: false,
      // the file's id follows from `info`, so that the same revision gives the same bytes
      info: { Title: options.title, Author: options.author, Subject: options.subject, Creator: 'Throughbond', Producer: 'Throughbond', CreationDate: options.at, ModDate: options.at },
      tagged: true, lang: 'en', displayTitle: true, pdfVersion: '1.7',
    });
    const chunks: Buffer[] = [];
    this.done = new Promise((resolve, reject) => {
      this.doc.on('data', (chunk: Buffer) => chunks.push(chunk));
      this.doc.on('end', () => resolve(Buffer.concat(chunks)));
      this.doc.on('error', reject);
    });
    for (const face of FACES) this.doc.registerFont(face, fonts.files[face]);
    this.right = width - 42;
    this.pageHeight = height;
    this.top = options.banner ? 84 : 62;
    this.bottom = height - 46;
    this.y = this.top;
    this.root = this.doc.struct('Document');
    this.doc.addStructure(this.root);
    this.parent = this.root;
    this.doc.addPage();
  }

  get x(): number {
    return this.left + this.indent;
  }
  get width(): number {
    return this.right - this.x;
  }

  readonly measure: Measure = (string, face, size, tabular) =>
    this.doc.font(face).fontSize(size).widthOfString(string, tabular ? { features: ['tnum'] } : {});

  layout(marked: string, width: number, style: TextStyle): Line[] {
    return layoutText(marked, width, style, this.fonts, this.measure);
  }

  /** Opens a part of the document for readers that follow tags. */
  part(type: string, draw: () => void): void {
    const outer = this.parent;
    const element = this.doc.struct(type);
    outer.add(element);
    this.parent = element;
    draw();
    element.end();
    this.parent = outer;
  }

  /** Draws one tagged piece that does not cross a page. */
  tagged(type: string, draw: () => void, alt?: string): void {
    const content = this.doc.markStructureContent(type);
    draw();
    this.doc.endMarkedContent();
    const element = this.doc.struct(type, alt === undefined ? {} : { alt }, [content]);
    this.parent.add(element);
    element.end();
  }

  /** Draws what carries no meaning of its own: rules, tints, page furniture. */
  artifact(draw: () => void, type: 'Layout' | 'Pagination' = 'Layout'): void {
    this.doc.markContent('Artifact', { type });
    draw();
    this.doc.endMarkedContent();
  }

  line(line: Line, x: number, baseline: number, style: TextStyle): void {
    let at = x;
    for (const piece of line.pieces) {
      this.doc.font(piece.face).fontSize(style.size).fillColor(style.colour)
        .text(piece.text, at, baseline, { lineBreak: false, baseline: 'alphabetic', ...(style.tabular ? { features: ['tnum'] } : {}) });
      at += this.measure(piece.text, piece.face, style.size, style.tabular ?? false);
    }
  }

  lines(lines: readonly Line[], x: number, y: number, style: TextStyle): void {
    lines.forEach((line, index) => this.line(line, x, y + index * style.leading + style.leading * 0.74, style));
  }

  room(height: number): boolean {
    return this.y + height <= this.bottom;
  }

  /** Starts a new page unless so much height is left. */
  ensure(height: number): void {
    if (!this.room(height) && this.y > this.top) this.newPage();
  }

  newPage(): void {
    const trail = this.trail;
    this.drawTrail(this.bottom);
    this.doc.addPage();
    this.y = this.top;
    if (trail) this.trail = { ink: trail.ink, from: this.top };
  }

  paragraph(marked: string, style: TextStyle, options: { x?: number; width?: number; tag?: string; after?: number } = {}): void {
    const x = options.x ?? this.x;
    const lines = this.layout(marked, options.width ?? this.right - x, style);
    const tag = options.tag ?? 'P';
    this.ensure(Math.min(lines.length, 2) * style.leading);
    let rest = lines;
    while (rest.length > 0) {
      const fits = Math.max(1, Math.floor((this.bottom - this.y) / style.leading + 1e-6));
      const now = rest.slice(0, fits);
      rest = rest.slice(fits);
      this.tagged(tag, () => this.lines(now, x, this.y, style));
      this.y += now.length * style.leading;
      if (rest.length > 0) this.newPage();
    }
    this.y += options.after ?? 0;
  }

  /** A section of the trail: its mark on the line at the left, its name in its ink, a few words beside it. */
  section(ink: Ink, title: string, summary: string, draw: () => void): void {
    this.ensure(64);
    this.part('Sect', () => {
      const style = { ...STYLE.section, colour: INK_COLOUR[ink] };
      const [head] = this.layout(title, this.width, style);
      const mid = this.y + style.leading / 2;
      this.artifact(() => drawMark(this.doc, ink, 'full', this.left + 6, mid, 6));
      this.trail = { ink, from: mid + 8 };
      const y = this.y;
      this.tagged('H2', () => this.line(head!, this.x, y + style.leading * 0.74, style));
      const beside = this.x + head!.width + 8;
      const lines = this.layout(summary, this.right - beside, STYLE.muted);
      if (summary !== '') this.tagged('P', () => lines.forEach((line, i) => this.line(line, beside, y + style.leading * 0.74 + i * STYLE.muted.leading, STYLE.muted)));
      this.y += Math.max(style.leading, (summary === '' ? 0 : lines.length) * STYLE.muted.leading + 3) + 4;
      draw();
    });
    this.drawTrail(this.y);
    this.trail = null;
    this.y += 10;
  }

  private drawTrail(to: number): void {
    const trail = this.trail;
    if (!trail || to - trail.from < 2) return;
    this.artifact(() => this.doc.rect(this.left + 4.5, trail.from, 3, to - trail.from).fill(INK_COLOUR[trail.ink]));
  }

  rule(y: number, colour: string, x = this.left, width = 0.75): void {
    this.artifact(() => this.doc.moveTo(x, y).lineTo(this.right, y).lineWidth(width).stroke(colour));
  }

  /** Adds the furniture of every page and closes the file. */
  async finish(furniture: Furniture): Promise<Buffer> {
    const { start, count } = this.doc.bufferedPageRange();
    for (let page = 0; page < count; page += 1) {
      this.doc.switchToPage(start + page);
      furniture.head(this, page + 1, count);
    }
    this.root.end();
    this.doc.end();
    return this.done;
  }
}
