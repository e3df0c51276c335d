import type { FontVariant } from 'react-native';

/**
 * The only home of raw values. Colours reach the styles as custom properties (`color.ink` = `var(--ink)`), so one style sheet
 * serves both themes and a change of theme repaints without a render. The pairs are held to their contrast by a test; the
 * `…Word` colours are a deeper cut of an ink for the grade word on its tint, which is read at arm's length (7 : 1).
 */
export const palettes = {
  light: {
    paper: '#F7F4EC', card: '#FFFDF8', field: '#FFFFFF', rule: '#DDD5C4', ruleSoft: '#EBE5D8', edge: '#8C8674',
    ink: '#1C2430', muted: '#5D6470', onInk: '#FFFDF8',
    measured: '#1D4F91', measuredTint: '#E6ECF4',
    calculated: '#0B6B5D', calculatedTint: '#E4EFEA', calculatedWord: '#08564A',
    judged: '#9C3D12', judgedTint: '#F8E9DF', judgedWord: '#7F300D',
    caution: '#7A5300', cautionTint: '#FBF0D0',
    error: '#A11C2B', errorTint: '#FBE9E7',
    dim: '#1C24308C',
  },
  dark: {
    paper: '#14181F', card: '#1B212B', field: '#12161C', rule: '#39414E', ruleSoft: '#29303B', edge: '#7F8896',
    ink: '#ECE7DC', muted: '#A9AFB9', onInk: '#14181F',
    measured: '#8DB4EA', measuredTint: '#1F2C40',
    calculated: '#6CC7B4', calculatedTint: '#18312F', calculatedWord: '#7ACFBD',
    judged: '#F0A27C', judgedTint: '#3A2A24', judgedWord: '#F4AD8A',
    caution: '#F0CE7E', cautionTint: '#372E17',
    error: '#F29AA0', errorTint: '#3B2226',
    dim: '#000000A6',
  },
} as const;

export type Scheme = keyof typeof palettes;
export type ColorName = keyof (typeof palettes)['light'];
export const COLOR_NAMES = Object.keys(palettes.light) as ColorName[];

/** The custom property that carries a colour: `ruleSoft` is `--rule-soft`. */
export const colorProperty = (name: ColorName) => `--${name.replace(/[A-Z]/g, (letter) => `-${letter.toLowerCase()}`)}`;

export const color = Object.fromEntries(COLOR_NAMES.map((name) => [name, `var(${colorProperty(name)})`])) as Record<ColorName, string>;

/** Multiples of the 4 px grid. */
export const space = { half: 2, xs: 4, sm: 8, md: 12, lg: 16, xl: 24, xxl: 32, huge: 48 } as const;
export const radius = { control: 6, card: 8, mark: 2, round: 999 } as const;
export const border = { hair: 1, strong: 2, bar: 6 } as const;

export const size = {
  touch: 48, touchDense: 40, numberField: 64, row: 48, rowTall: 64,
  tabs: 72, actions: 72, rail: 96, railItem: 80, railItemHeight: 64, top: 64,
  content: 1120, text: 680, intake: 432, aside: 400, trail: 208, evidence: 560, review: 304,
  mark: 14, markGrade: 18, icon: 16, place: 24, sign: 36,
  sheet: 560,
} as const;

/** Widths (CSS px) at which the frame and the columns change. */
export const breakpoints = { rail: 1024, threeColumns: 1180, short: 480 } as const;

const serif = '"Brygada 1918", "Source Sans 3", serif';
const sans = '"Source Sans 3", sans-serif';
const lining: FontVariant[] = ['lining-nums', 'proportional-nums'];
const tabular: FontVariant[] = ['lining-nums', 'tabular-nums'];

/** Type, size/line. Headings and large figures are set proportional, everything that may stand in a column tabular. */
export const type = {
  h1: { fontFamily: serif, fontWeight: '600', fontSize: 28, lineHeight: 32, fontVariant: lining },
  h2: { fontFamily: serif, fontWeight: '600', fontSize: 22, lineHeight: 28, fontVariant: lining },
  h3: { fontFamily: serif, fontWeight: '600', fontSize: 18, lineHeight: 24, fontVariant: lining },
  answer: { fontFamily: serif, fontWeight: '600', fontSize: 22, lineHeight: 28, fontVariant: lining },
  figure: { fontFamily: serif, fontWeight: '600', fontSize: 44, lineHeight: 48, letterSpacing: -0.5, fontVariant: lining },
  figureSmall: { fontFamily: serif, fontWeight: '600', fontSize: 28, lineHeight: 32, fontVariant: lining },
  grade: { fontFamily: sans, fontWeight: '700', fontSize: 20, lineHeight: 28, fontVariant: tabular },
  trailHead: { fontFamily: sans, fontWeight: '700', fontSize: 18, lineHeight: 24, fontVariant: tabular },
  text: { fontFamily: sans, fontWeight: '400', fontSize: 16, lineHeight: 24, fontVariant: tabular },
  strong: { fontFamily: sans, fontWeight: '600', fontSize: 16, lineHeight: 24, fontVariant: tabular },
  dense: { fontFamily: sans, fontWeight: '400', fontSize: 15, lineHeight: 20, fontVariant: tabular },
  denseStrong: { fontFamily: sans, fontWeight: '600', fontSize: 15, lineHeight: 20, fontVariant: tabular },
  small: { fontFamily: sans, fontWeight: '400', fontSize: 14, lineHeight: 20, fontVariant: tabular },
  smallStrong: { fontFamily: sans, fontWeight: '600', fontSize: 14, lineHeight: 20, fontVariant: tabular },
  caption: { fontFamily: sans, fontWeight: '400', fontSize: 13, lineHeight: 20, fontVariant: tabular },
  label: { fontFamily: sans, fontWeight: '600', fontSize: 13, lineHeight: 16, fontVariant: tabular },
  formula: { fontFamily: sans, fontWeight: '400', fontSize: 18, lineHeight: 32, fontVariant: lining },
} as const;
export type TypeName = keyof typeof type;
export const families = { serif, sans } as const;
