import { loadFonts } from '@/server/pdf/fonts';
import { layoutText, literal, piecesOf, type Measure } from '@/server/pdf/textLayout';
import { STYLE } from '@/server/pdf/writer';
import * as sheet from '@/shared/text/sheet';

const fonts = loadFonts(process.cwd());
/** Every character half as wide as it is high: enough to know where a line must break. */
const measure: Measure = (text, _face, size) => [...text].length * size * 0.5;
const lines = (text: string, width: number): string[] => layoutText(text, width, STYLE.body, fonts, measure).map((line) => line.pieces.map((piece) => piece.text).join(''));

it('breaks between words, keeps what is tied by a hard space, and cuts a word that is longer than a line', () => {
  const ten = 10 * STYLE.body.size * 0.5;
  expect(lines('one two three', ten)).toEqual(['one two', 'three']);
  expect(lines('J is 8.9\u00a0Hz', ten)).toEqual(['J is', '8.9\u00a0Hz']);
  expect(lines('abcdefghijklm', ten)).toEqual(['abcdefghij', 'klm']);
  expect(lines('a\nb', ten)).toEqual(['a', 'b']);
  expect(lines('', ten)).toEqual(['']);
});

it('sets variables in italics and what was typed as it stands', () => {
  expect(piecesOf('³_J_(H,H)', STYLE.body, fonts).map(({ text, face }) => [text, face])).toEqual([['³', 'S400'], ['J', 'B500i'], ['(H,H)', 'S400']]);
  expect(piecesOf(literal('a_b_c'), STYLE.body, fonts).map(({ text }) => text).join('')).toBe('a_b_c');
});

it('takes operators of a heading from the text face, and names a character that no face holds', () => {
  expect(piecesOf('cis + trans', STYLE.sentence, fonts).find(({ text }) => text === '+')?.face).toBe('S600');
  expect(piecesOf('中', STYLE.body, fonts).map(({ text }) => text).join('')).toBe('[U+4E2D]');
});

it('has a glyph for every character of the sheet\'s own words', () => {
  const words: string[] = [];
  const collect = (value: unknown): void => {
    if (typeof value === 'string') words.push(value);
    else if (typeof value === 'object' && value !== null) Object.values(value).forEach(collect);
  };
  collect(sheet.sheetText);
  for (const word of words) expect(piecesOf(word, STYLE.body, fonts).map(({ text }) => text).join('')).not.toContain('[U+');
});
