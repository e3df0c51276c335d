import { sheetText } from '@/shared/text/sheet';
import { drawPlot } from './figures';
import { drawGradeBar, drawMark, FILL_OF } from './marks';
import type { SheetAnswer, SheetCalculation, SheetModel, SheetTable } from './model';
import { INK_COLOUR, INK_TINT, PAPER } from './palette';
import { drawTable } from './tables';
import { STYLE, type SheetWriter } from './writer';

/** The conclusion with its grade, the same size for every grade. */
export function drawAnswer(writer: SheetWriter, answer: SheetAnswer): void {
  const x = writer.left + 18;
  const width = writer.right - 12 - x;
  const colour = INK_COLOUR[answer.ink];
  const gradeStyle = { ...STYLE.section, size: 13, leading: 18, colour };
  const sentence = writer.layout(answer.sentence, width, STYLE.sentence);
  const detail = answer.detail === '' ? [] : writer.layout(answer.detail, width, STYLE.body);
  const height = 10 + gradeStyle.leading + sentence.length * STYLE.sentence.leading + (detail.length > 0 ? 3 : 0) + detail.length * STYLE.body.leading + 10;
  writer.ensure(height + 8);
  const y = writer.y;
  writer.artifact(() => {
    writer.doc.roundedRect(writer.left, y, writer.right - writer.left, height, 4).fill(INK_TINT[answer.ink]);
    drawGradeBar(writer.doc, answer.ink, answer.grade, writer.left, y, 5, height);
    drawMark(writer.doc, answer.ink, FILL_OF[answer.grade], x + 6, y + 10 + gradeStyle.leading / 2, 6.5);
  });
  writer.part('Sect', () => {
    writer.tagged('H2', () => {
      const [word] = writer.layout(answer.gradeWord, width, gradeStyle);
      writer.line(word!, x + 18, y + 10 + gradeStyle.leading * 0.74, gradeStyle);
      const [label] = writer.layout(answer.label, width - 26 - word!.width, STYLE.muted);
      writer.line(label!, x + 26 + word!.width, y + 10 + gradeStyle.leading * 0.74, STYLE.muted);
    });
    writer.tagged('P', () => writer.lines(sentence, x, y + 10 + gradeStyle.leading, STYLE.sentence));
    if (detail.length > 0) writer.tagged('P', () => writer.lines(detail, x, y + 13 + gradeStyle.leading + sentence.length * STYLE.sentence.leading, STYLE.body));
  });
  writer.y = y + height + 8;
}

/** "Label. Text" lines. */
export function drawPairs(writer: SheetWriter, pairs: readonly [string, string][], after = 2): void {
  for (const [label, text] of pairs) {
    const lead = { ...STYLE.strong };
    const [head] = writer.layout(label, writer.width, lead);
    const indent = Math.max(84, head!.width + 8);
    const lines = writer.layout(text, writer.width - indent, STYLE.body);
    writer.ensure(Math.min(lines.length, 2) * STYLE.body.leading);
    const y = writer.y;
    writer.tagged('P', () => writer.line(head!, writer.x, y + lead.leading * 0.74, lead));
    writer.paragraph(text, STYLE.body, { x: writer.x + indent, after });
  }
}

const maybeTable = (writer: SheetWriter, table: SheetTable | null) => {
  if (!table) return;
  if (table.caption !== '') {
    writer.ensure(54);
    writer.paragraph(table.caption, STYLE.head, { tag: 'H3', after: 1 });
  }
  drawTable(writer, table);
};

export function drawMeasured(writer: SheetWriter, measured: SheetModel['measured']): void {
  writer.section('measured', sheetText.measured, measured.summary, () => {
    if (measured.facts.length > 0) drawPairs(writer, measured.facts);
    writer.y += 2;
    maybeTable(writer, {
      caption: '',
      columns: [
        { head: sheetText.coupling, share: 20, align: 'left' }, { head: sheetText.path, share: 13, align: 'left' }, { head: '_J_ / Hz', share: 10, align: 'number', ink: 'measured' },
        { head: '±', share: 8, align: 'number' }, { head: sheetText.atPartner, share: 12, align: 'number' }, { head: sheetText.from, share: 37, align: 'left' },
      ],
      rows: measured.readings.map((reading) => ({ cells: [reading.coupling, reading.path, reading.jTyped, reading.seTyped, reading.partnerTyped, reading.from] })),
    });
    for (const note of measured.notes) writer.paragraph(note, STYLE.muted, { after: 1 });
    maybeTable(writer, measured.files);
  });
}

function drawCalculation(writer: SheetWriter, calculation: SheetCalculation): void {
  writer.part('Sect', () => {
    writer.ensure(70);
    writer.paragraph(calculation.title, STYLE.head, { tag: 'H3' });
    if (calculation.relation !== '') writer.paragraph(calculation.relation, STYLE.muted, { after: 2 });
    if (calculation.answer) {
      const { answer } = calculation;
      const style = { ...STYLE.strong, colour: INK_COLOUR.calculated };
      const [word] = writer.layout(answer.gradeWord, writer.width, style);
      const x = writer.x + 16 + word!.width + 8;
      writer.ensure(2 * STYLE.body.leading);
      const y = writer.y;
      writer.artifact(() => drawMark(writer.doc, 'calculated', FILL_OF[answer.grade], writer.x + 5, y + STYLE.body.leading / 2, 4.5));
      writer.tagged('P', () => writer.line(word!, writer.x + 14, y + style.leading * 0.74, style));
      writer.paragraph(answer.sentence, STYLE.body, { x, after: 3 });
    }
    if (calculation.plot) drawPlot(writer, calculation.plot);
    drawPairs(writer, calculation.lines, 1);
    maybeTable(writer, calculation.table);
    writer.y += 6;
  });
}

export function drawCalculated(writer: SheetWriter, model: SheetModel): void {
  writer.section('calculated', sheetText.calculated, model.calculatedNote, () => {
    maybeTable(writer, model.candidates);
    for (const line of model.excluded) writer.paragraph(line, STYLE.body, { after: 1 });
    if (model.excluded.length > 0) writer.y += 4;
    for (const calculation of model.calculations) drawCalculation(writer, calculation);
  });
}

export function drawJudged(writer: SheetWriter, model: SheetModel): void {
  const { judged } = model;
  writer.section('judged', sheetText.judged, judged.summary, () => {
    drawPairs(writer, judged.paragraphs);
    maybeTable(writer, judged.evidence);
    maybeTable(writer, judged.checks);
    for (const query of judged.queries) {
      writer.paragraph(query.head, STYLE.head, { tag: 'H3' });
      for (const message of query.messages) writer.paragraph(message, STYLE.body, { after: 1 });
      writer.y += 4;
    }
    if (judged.signatures) maybeTable(writer, judged.signatures);
    if (judged.unsigned !== '') writer.paragraph(judged.unsigned, STYLE.strong, { after: 4 });
    for (const addendum of judged.addenda) {
      writer.paragraph(addendum.head, STYLE.head, { tag: 'H3' });
      writer.paragraph(addendum.text, STYLE.body, { after: 4 });
    }
  });
}

/** What stays open, cautions and provenance: across the whole width, below the trail. */
export function drawClosing(writer: SheetWriter, model: SheetModel): void {
  writer.part('Sect', () => {
    writer.ensure(50);
    writer.paragraph(sheetText.open, STYLE.section, { tag: 'H2', after: 2 });
    writer.paragraph(model.open.lead, STYLE.body, { after: 3 });
    drawPairs(writer, model.open.items);
    writer.y += 6;
  });
  if (model.cautions.length > 0) {
    writer.part('Sect', () => {
      writer.ensure(50);
      writer.paragraph(sheetText.cautions, STYLE.section, { tag: 'H2', after: 2 });
      for (const caution of model.cautions) writer.paragraph(`–\u00a0${caution}`, STYLE.body, { after: 1 });
      writer.y += 6;
    });
  }
  writer.part('Sect', () => {
    writer.ensure(50);
    writer.paragraph(sheetText.provenance, STYLE.section, { tag: 'H2', after: 2 });
    drawPairs(writer, model.provenance, 1);
  });
}

/** Head and foot of a page; on an unsigned revision a dark band that says so in words. */
export function drawFurniture(writer: SheetWriter, model: SheetModel, drawSign: (x: number, y: number) => void, page: number, pages: number): void {
  const { doc, left, right } = writer;
  writer.artifact(() => {
    drawSign(left, 26);
    const name = { ...STYLE.head, face: 'B600' as const, size: 12 };
    const [brand] = writer.layout('Throughbond', 300, name);
    writer.line(brand!, left + 24, 40, name);
    const [kind] = writer.layout(sheetText.sheet, 200, STYLE.muted);
    writer.line(kind!, left + 30 + brand!.width, 40, STYLE.muted);
    const [project] = writer.layout(model.projectName, 220, STYLE.muted);
    writer.line(project!, right - project!.width, 40, STYLE.muted);
    const [code] = writer.layout(sheetText.revisionOf(model.code, model.revision), 240, STYLE.strong);
    writer.line(code!, right - project!.width - 8 - code!.width, 40, STYLE.strong);
    doc.moveTo(left, 51).lineTo(right, 51).lineWidth(0.9).stroke(PAPER.ink);
    if (model.mark) {
      doc.rect(left, 56, right - left, 20).fill(PAPER.ink);
      const wordStyle = { ...STYLE.head, size: 11, colour: PAPER.white };
      const [word] = writer.layout(model.mark.word, 200, wordStyle);
      writer.line(word!, left + 10, 70, wordStyle);
      const sentenceStyle = { ...STYLE.body, colour: PAPER.white };
      const [sentence] = writer.layout(model.mark.sentence, right - left - word!.width - 32, sentenceStyle);
      writer.line(sentence!, left + 20 + word!.width, 70, sentenceStyle);
    }
    const foot = writer.pageHeight - 36;
    doc.moveTo(left, foot).lineTo(right, foot).lineWidth(0.5).stroke(PAPER.rule);
    const line = (text: string, at: 'left' | 'centre' | 'right') => {
      const [laid] = writer.layout(text, right - left, STYLE.small);
      const x = at === 'left' ? left : at === 'right' ? right - laid!.width : (left + right - laid!.width) / 2;
      writer.line(laid!, x, foot + 14, STYLE.small);
    };
    line(model.footer.left, 'left');
    line(model.footer.middle, 'centre');
    line(sheetText.page(page, pages), 'right');
  }, 'Pagination');
}
