import { richText } from '@/shared/format/richText';
import type { Face, FontBook } from './fonts';

/** How a stretch of text is set. Variables in italics take `italic`. */
export interface TextStyle {
  face: Face;
  italic: Face;
  size: number;
  leading: number;
  colour: string;
  /** figures of one width, for columns of numbers */
  tabular?: boolean;
}

export interface Piece {
  text: string;
  face: Face;
}

export interface Line {
  pieces: Piece[];
  width: number;
}

export type Measure = (text: string, face: Face, size: number, tabular: boolean) => number;

/** Stands for an underscore that somebody typed, which is no markup; of the private use area, so that no text holds it by itself. */
export const TYPED_UNDERSCORE = '\ue000';
/** Text that is set as it stands: what people typed carries no markup. */
export const literal = (typed: string): string => typed.replace(/_/g, TYPED_UNDERSCORE);
export const unliteral = (text: string): string => text.replaceAll(TYPED_UNDERSCORE, '_');

/** A character that no embedded face holds is printed by its code point: nothing that somebody typed is dropped in silence. */
export function piecesOf(marked: string, style: TextStyle, fonts: FontBook): Piece[] {
  const pieces: Piece[] = [];
  const push = (text: string, face: Face) => {
    const last = pieces[pieces.length - 1];
    if (last && last.face === face) last.text += text;
    else pieces.push({ text, face });
  };
  for (const run of richText(marked.replace(/[\u0000-\u0009\u000b-\u001f\u007f]/g, ' '))) {
    const wanted = run.italic ? style.italic : style.face;
    for (const character of run.text) {
      if (character === '\n') { push('\n', wanted); continue; }
      const shown = character === TYPED_UNDERSCORE ? '_' : character;
      const face = fonts.faceFor(wanted, shown);
      if (face) push(shown, face);
      else push(`[U+${character.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0')}]`, style.face);
    }
  }
  return pieces;
}

/** Words with the blank before them; a word may hold several faces ("_J_(2,3)"). Non-breaking spaces stay inside a word. */
function words(pieces: readonly Piece[]): { pieces: Piece[]; blankBefore: boolean; newLine: boolean }[] {
  const found: { pieces: Piece[]; blankBefore: boolean; newLine: boolean }[] = [];
  let current: Piece[] = [];
  let blank = false;
  let fresh = false;
  const close = () => {
    if (current.length > 0) found.push({ pieces: current, blankBefore: blank, newLine: fresh });
    current = [];
    blank = false;
    fresh = false;
  };
  for (const piece of pieces) {
    for (const part of piece.text.split(/([ \n]+)/)) {
      if (part === '') continue;
      if (/^[ \n]+$/.test(part)) {
        close();
        blank = true;
        fresh = part.includes('\n');
      } else {
        current.push({ text: part, face: piece.face });
      }
    }
  }
  close();
  return found;
}

/** Breaks marked-up text into lines of at most `width` points. A word longer than a line is cut. */
export function layoutText(marked: string, width: number, style: TextStyle, fonts: FontBook, measure: Measure): Line[] {
  const lines: Line[] = [];
  let line: Line = { pieces: [], width: 0 };
  const tabular = style.tabular ?? false;
  const add = (piece: Piece) => {
    const last = line.pieces[line.pieces.length - 1];
    if (last && last.face === piece.face) last.text += piece.text;
    else line.pieces.push({ ...piece });
    line.width += measure(piece.text, piece.face, style.size, tabular);
  };
  const breakLine = () => {
    lines.push(line);
    line = { pieces: [], width: 0 };
  };
  for (const word of words(piecesOf(marked, style, fonts))) {
    const wordWidth = word.pieces.reduce((sum, piece) => sum + measure(piece.text, piece.face, style.size, tabular), 0);
    const first = word.pieces[0]!;
    const blank = word.blankBefore && line.pieces.length > 0 ? measure(' ', first.face, style.size, tabular) : 0;
    if (line.pieces.length > 0 && (word.newLine || line.width + blank + wordWidth > width + 0.01)) breakLine();
    else if (blank > 0) add({ text: ' ', face: line.pieces[line.pieces.length - 1]!.face });
    if (wordWidth <= width) {
      for (const piece of word.pieces) add(piece);
      continue;
    }
    for (const piece of word.pieces) for (const character of piece.text) {
      if (line.pieces.length > 0 && line.width + measure(character, piece.face, style.size, tabular) > width) breakLine();
      add({ text: character, face: piece.face });
    }
  }
  if (line.pieces.length > 0 || lines.length === 0) lines.push(line);
  return lines;
}
