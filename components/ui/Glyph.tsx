import type { ReactNode } from 'react';

import { color, type ColorName } from '../theme/tokens';

/** A small drawing straight in the page (the client is a web page): icons and marks need no drawing library. */
export function Glyph({ size, height = size, box, label, children }: {
  size: number; height?: number; box: string; label?: string; children: ReactNode;
}) {
  return (
    <svg width={size} height={height} viewBox={box} style={{ display: 'block', flex: 'none' }}
      role={label ? 'img' : undefined} aria-label={label} aria-hidden={label ? undefined : true} focusable="false">
      {children}
    </svg>
  );
}

const STROKES = {
  right: 'M6 3l5 5-5 5',
  left: 'M10 3L5 8l5 5',
  down: 'M3 6l5 5 5-5',
  up: 'M3 10l5-5 5 5',
  cross: 'M3 3l10 10M13 3L3 13',
  plus: 'M8 2v12M2 8h12',
  minus: 'M2 8h12',
  check: 'M2.5 8.5l3.5 3.5 7.5-8',
  search: 'M7 2.5a4.5 4.5 0 1 0 0 9 4.5 4.5 0 0 0 0-9M10.4 10.4L14 14',
  copy: 'M5.5 5.5h8v8h-8zM10.5 5.5v-3h-8v8h3',
  undo: 'M6 3L2.5 6.5 6 10M2.5 6.5H10a3.5 3.5 0 0 1 0 7H6',
} as const;
export type IconName = keyof typeof STROKES;

export function Icon({ name, size = 16, tone = 'ink' }: { name: IconName; size?: number; tone?: ColorName }) {
  return (
    <Glyph size={size} box="0 0 16 16">
      <path d={STROKES[name]} fill="none" stroke={color[tone]} strokeWidth={2} strokeLinecap="round" strokeLinejoin="round" />
    </Glyph>
  );
}

/** The triangle of a caution. */
export function CautionIcon({ size = 18 }: { size?: number }) {
  return (
    <Glyph size={size} box="0 0 18 18">
      <path d="M9 1.8L17 16H1Z" fill="none" stroke={color.caution} strokeWidth={1.8} strokeLinejoin="round" />
      <path d="M9 7v4" stroke={color.caution} strokeWidth={1.8} strokeLinecap="round" />
      <circle cx={9} cy={13.4} r={1.1} fill={color.caution} />
    </Glyph>
  );
}

/** The ring of an error. */
export function ErrorIcon({ size = 18 }: { size?: number }) {
  return (
    <Glyph size={size} box="0 0 18 18">
      <circle cx={9} cy={9} r={7.5} fill="none" stroke={color.error} strokeWidth={1.8} />
      <path d="M9 5v5" stroke={color.error} strokeWidth={1.8} strokeLinecap="round" />
      <circle cx={9} cy={12.7} r={1.1} fill={color.error} />
    </Glyph>
  );
}

const PLACES = {
  quick: <path d="M12 4v16M4 12h16" />,
  cases: <><path d="M5 4h14v16H5z" /><path d="M9 9h6M9 13h6" /></>,
  reviews: <path d="M4 13l5 5L20 6" />,
  relations: <path d="M3 18c5 0 4-12 9-12s4 12 9 12" />,
  team: <><circle cx="8.5" cy="9" r="3.2" /><circle cx="16.5" cy="10" r="2.6" /><path d="M2.8 19c.5-4 2.8-5.4 5.7-5.4s5.2 1.4 5.7 5.4M16.6 14.6c2.6 0 4.2 1.4 4.7 4.4" /></>,
  help: <><path d="M8.5 9.2a3.5 3.5 0 1 1 5 3.2c-1 .5-1.5 1.1-1.5 2.3" /><path d="M12 18.6v.1" /></>,
  account: <><circle cx="12" cy="8.5" r="3.7" /><path d="M4.5 20c.6-4.4 3.6-6.2 7.5-6.2s6.9 1.8 7.5 6.2" /></>,
} as const;
export type PlaceName = keyof typeof PLACES;

export function PlaceIcon({ place, tone = 'ink' }: { place: PlaceName; tone?: ColorName }) {
  return (
    <Glyph size={24} box="0 0 24 24">
      <g fill="none" stroke={color[tone]} strokeWidth={2} strokeLinecap="round" strokeLinejoin="round">{PLACES[place]}</g>
    </Glyph>
  );
}

/** The sign: a path of three bonds from the measured square over the calculated circle to the judged diamond. */
export function Sign({ size = 36, small = false }: { size?: number; small?: boolean }) {
  const half = small ? 4.8 : 4.2;
  const tip = small ? 5.8 : 5.2;
  return (
    <Glyph size={size} box="0 0 32 32">
      <path d="M5 22L11.5 11.5L20.5 20.5L27 10" fill="none" stroke={color.ink} strokeWidth={small ? 3 : 2.2} strokeLinecap="round" strokeLinejoin="round" />
      <circle cx={16} cy={16} r={small ? 4.2 : 4} fill={color.calculated} />
      <rect x={5 - half} y={22.4 - half} width={2 * half} height={2 * half} fill={color.measured} />
      <path d={`M26.4 ${10 - tip}l${tip} ${tip}l-${tip} ${tip}l-${tip} -${tip}Z`} fill={color.judged} />
    </Glyph>
  );
}
