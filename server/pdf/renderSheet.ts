import { loadFonts } from './fonts';
import { plainText } from '@/shared/format/richText';
import { sheetText } from '@/shared/text/sheet';
import { drawSign } from './marks';
import type { SheetModel } from './model';
import { PAPER } from './palette';
import { drawAnswer, drawCalculated, drawClosing, drawFurniture, drawJudged, drawMeasured } from './sections';
import { unliteral } from './textLayout';
import { STYLE, SheetWriter, type PaperSize } from './writer';

/**
 * A finished report model as a PDF: tagged, selectable, fonts embedded, plots as vectors. The same model gives the same bytes.
 * @param root the folder that holds `assets/`
 */
export async function renderSheet(model: SheetModel, paper: PaperSize, root: string): Promise<Buffer> {
  const writer = new SheetWriter(loadFonts(root), paper, {
    title: `${sheetText.revisionOf(model.code, model.revision)}: ${unliteral(plainText(model.question))}`,
    author: model.author, subject: `Throughbond ${sheetText.sheet}`, at: model.at, banner: model.mark !== null,
  });
  writer.paragraph(model.question, STYLE.title, { x: writer.left, tag: 'H1', after: 1 });
  writer.paragraph(model.subtitle, STYLE.muted, { x: writer.left, after: 6 });
  for (const answer of model.answers) drawAnswer(writer, answer);
  writer.y += 4;
  drawMeasured(writer, model.measured);
  drawCalculated(writer, model);
  drawJudged(writer, model);
  writer.rule(writer.y - 4, PAPER.rule);
  writer.y += 4;
  drawClosing(writer, model);
  return writer.finish({ head: (target, page, pages) => drawFurniture(target, model, (x, y) => drawSign(target.doc, x, y, 18), page, pages) });
}
