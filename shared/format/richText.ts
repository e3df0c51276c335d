/** A run of text; italic where the markup `_x_` says so. */
export interface TextRun {
  text: string;
  italic: boolean;
}

/** Splits marked-up text into runs. An underscore without a partner is text. */
export function richText(marked: string): TextRun[] {
  const runs: TextRun[] = [];
  let rest = marked;
  while (rest !== '') {
    const open = rest.indexOf('_');
    const close = open < 0 ? -1 : rest.indexOf('_', open + 1);
    if (close < 0 || close === open + 1) {
      runs.push({ text: rest, italic: false });
      break;
    }
    if (open > 0) runs.push({ text: rest.slice(0, open), italic: false });
    runs.push({ text: rest.slice(open + 1, close), italic: true });
    rest = rest.slice(close + 1);
  }
  return runs;
}

/** The same text without markup, for copying, titles and screen readers. */
export const plainText = (marked: string): string =>
  richText(marked)
    .map((run) => run.text)
    .join('');
