import { useEffect, useRef, useState, type CSSProperties, type ReactNode } from 'react';

import { plainText } from '@/shared/format/richText';

import { color, families, space } from '../theme/tokens';
import { RichInline } from './RichText';
import { VisuallyHidden } from './VisuallyHidden';

export interface Column<Row> {
  key: string;
  /** markup allowed; empty = a column of buttons, named by `spoken` */
  head: string;
  spoken?: string;
  numeric?: boolean;
  /** the cell that names its row */
  rowHeader?: boolean;
  cell: (row: Row) => ReactNode;
  /** the cell's text keeps to one line unless told */
  wraps?: boolean;
  tone?: 'measured' | 'calculated' | 'judged' | 'muted';
}

/**
 * A real table, dense: it scrolls sideways within its own frame, its row heads stay readable. Strings may carry our markup.
 */
export function Table<Row>({ caption, columns, rows, rowKey, rowTone }: {
  /** spoken name of the table */
  caption: string; columns: readonly Column<Row>[]; rows: readonly Row[]; rowKey: (row: Row, at: number) => string;
  rowTone?: (row: Row) => 'plain' | 'chosen' | 'query' | 'outlier';
}) {
  const [frame, scrolls] = useScrolls();
  const named = scrolls ? { tabIndex: 0, role: 'group', 'aria-label': plainText(caption) } : {};
  return (
    <div ref={frame} style={frameStyle} {...named}>
        <table style={table}>
          <caption style={hiddenCaption}>{plainText(caption)}</caption>
          <thead>
            <tr>
              {columns.map((column, at) => (
                <th key={column.key} scope="col" style={{ ...headCell, ...edge(at, columns.length), textAlign: column.numeric ? 'right' : 'left' }}>
                  {column.head ? <RichInline text={column.head} /> : <VisuallyHidden>{column.spoken ?? ''}</VisuallyHidden>}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map((row, index) => (
              <tr key={rowKey(row, index)} style={{ backgroundColor: tints[rowTone?.(row) ?? 'plain'] }}>
                {columns.map((column, at) => {
                  const content = column.cell(row);
                  const style: CSSProperties = {
                    ...bodyCell, ...edge(at, columns.length), textAlign: column.numeric ? 'right' : 'left',
                    whiteSpace: column.numeric || !column.wraps ? 'nowrap' : 'normal', color: column.tone ? color[column.tone] : undefined,
                    fontWeight: column.rowHeader || column.tone === 'measured' || column.tone === 'calculated' ? 600 : 400,
                    borderBottomWidth: index === rows.length - 1 ? 0 : 1,
                  };
                  const inner = typeof content === 'string' ? <RichInline text={content} /> : content;
                  return column.rowHeader
                    ? <th key={column.key} scope="row" style={style}>{inner}</th>
                    : <td key={column.key} style={style}>{inner}</td>;
                })}
              </tr>
            ))}
          </tbody>
        </table>
    </div>
  );
}

/** Whether the table is wider than its frame: only then is the frame a stop of the keyboard. */
function useScrolls() {
  const frame = useRef<HTMLDivElement>(null);
  const [scrolls, setScrolls] = useState(false);
  useEffect(() => {
    const box = frame.current;
    if (!box) return undefined;
    const look = () => setScrolls(box.scrollWidth > box.clientWidth + 1);
    look();
    const watch = new ResizeObserver(look);
    watch.observe(box);
    return () => watch.disconnect();
  }, []);
  return [frame, scrolls] as const;
}

const tints = { plain: 'transparent', chosen: color.measuredTint, query: color.cautionTint, outlier: color.cautionTint };
const edge = (at: number, count: number): CSSProperties => ({ paddingLeft: at === 0 ? space.lg : space.sm, paddingRight: at === count - 1 ? space.lg : space.sm });
const table: CSSProperties = { borderCollapse: 'collapse', width: '100%', fontFamily: families.sans, fontVariantNumeric: 'tabular-nums lining-nums', color: color.ink };
const headCell: CSSProperties = {
  fontSize: 13, lineHeight: '16px', fontWeight: 600, color: color.muted, paddingTop: space.sm, paddingBottom: space.sm, verticalAlign: 'bottom', whiteSpace: 'nowrap',
  borderBottom: `1px solid ${color.rule}`,
};
const bodyCell: CSSProperties = { fontSize: 15, lineHeight: '20px', paddingTop: space.sm, paddingBottom: space.sm, verticalAlign: 'top', borderBottom: `1px solid ${color.ruleSoft}` };
const hiddenCaption: CSSProperties = { position: 'absolute', width: 1, height: 1, overflow: 'hidden', clip: 'rect(0 0 0 0)', whiteSpace: 'nowrap' };
const frameStyle: CSSProperties = { minWidth: 0, maxWidth: '100%', overflowX: 'auto', position: 'relative' };
