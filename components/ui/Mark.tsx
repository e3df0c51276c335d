import type { Grade } from '@/shared/types/answer';
import type { CaseState } from '@/shared/types/case';
import type { Ink } from '@/shared/types/trail';

import { color, type ColorName } from '../theme/tokens';
import { Glyph } from './Glyph';

export type Fill = 'full' | 'half' | 'open';
export const GRADE_FILL: Record<Grade, Fill> = { assigned: 'full', tentative: 'half', 'not-decided': 'open' };

/** The mark of an ink: square measured, circle calculated, diamond judged; filled, half or open by grade. The word stands beside it. */
export function Mark({ ink, fill = 'full', size = 14, tone }: { ink: Ink; fill?: Fill; size?: number; tone?: ColorName }) {
  const paint = color[tone ?? ink];
  const line = Math.max(1.5, size / 8);
  const half = size / 2;
  return (
    <Glyph size={size} box={`0 0 ${size} ${size}`}>
      {ink === 'measured' && <Square size={size} line={line} paint={paint} fill={fill} />}
      {ink === 'calculated' && <Circle half={half} line={line} paint={paint} fill={fill} />}
      {ink === 'judged' && <Diamond half={half} line={line} paint={paint} fill={fill} />}
    </Glyph>
  );
}

interface Shape { line: number; paint: string; fill: Fill }

function Square({ size, line, paint, fill }: Shape & { size: number }) {
  const from = size * 0.1;
  const edge = size * 0.8;
  if (fill === 'full') return <rect x={from} y={from} width={edge} height={edge} fill={paint} />;
  return (
    <>
      <rect x={from + line / 2} y={from + line / 2} width={edge - line} height={edge - line} fill="none" stroke={paint} strokeWidth={line} />
      {fill === 'half' && <rect x={from} y={from} width={edge / 2} height={edge} fill={paint} />}
    </>
  );
}

function Circle({ half, line, paint, fill }: Shape & { half: number }) {
  const r = half * 0.92 - line / 2;
  return (
    <>
      <circle cx={half} cy={half} r={r} fill={fill === 'full' ? paint : 'none'} stroke={paint} strokeWidth={line} />
      {fill === 'half' && <path d={`M${half} ${half - r}A${r} ${r} 0 0 0 ${half} ${half + r}Z`} fill={paint} />}
    </>
  );
}

function Diamond({ half, line, paint, fill }: Shape & { half: number }) {
  const r = half * 0.98 - line / 2;
  return (
    <>
      <path d={`M${half} ${half - r}L${half + r} ${half}L${half} ${half + r}L${half - r} ${half}Z`} fill={fill === 'full' ? paint : 'none'} stroke={paint} strokeWidth={line} />
      {fill === 'half' && <path d={`M${half} ${half - r}L${half - r} ${half}L${half} ${half + r}Z`} fill={paint} />}
    </>
  );
}

/** How far a case has come: ■–●–◆, filled as far as it is, grey when superseded, struck through when withdrawn. */
export function StateLine({ state }: { state: CaseState }) {
  const reached = { draft: 1, 'in-review': 2, queried: 2, signed: 3, superseded: 3, withdrawn: 0 }[state];
  const grey = state === 'superseded';
  const paint = (at: number, ink: Ink) => (at > reached ? color.card : grey ? color.edge : color[ink]);
  const edge = (at: number, ink: Ink) => (at <= reached && !grey ? color[ink] : at === 3 && state === 'queried' ? color.caution : color.edge);
  return (
    <Glyph size={40} height={12} box="0 0 40 12">
      <path d="M6 6H34" stroke={state === 'signed' ? color.ink : color.edge} strokeWidth={1.5} />
      <rect x={2.4} y={2.4} width={7.2} height={7.2} fill={paint(1, 'measured')} stroke={edge(1, 'measured')} strokeWidth={1.5} />
      <circle cx={20} cy={6} r={3.9} fill={paint(2, 'calculated')} stroke={edge(2, 'calculated')} strokeWidth={1.5} />
      <path d="M34 1.2l4.8 4.8l-4.8 4.8l-4.8 -4.8Z" fill={paint(3, 'judged')} stroke={edge(3, 'judged')} strokeWidth={1.5} />
      {state === 'withdrawn' && <path d="M1 6H39" stroke={color.muted} strokeWidth={2.5} />}
    </Glyph>
  );
}
