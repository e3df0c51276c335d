import type { Ink } from '@/shared/types/trail';

/** The printed sheet's own colours: the three inks on white. Every meaning also has a mark and a word, so grey is enough. */
export const PAPER = {
  ink: '#1C2430', muted: '#5D6470', rule: '#DDD5C4', rule2: '#EBE5D8', edge: '#8C8674', white: '#FFFFFF',
  caution: '#7A5300', cautionTint: '#FBF0D0',
} as const;

export const INK_COLOUR: Record<Ink, string> = { measured: '#1D4F91', calculated: '#0B6B5D', judged: '#9C3D12' };
export const INK_TINT: Record<Ink, string> = { measured: '#E6ECF4', calculated: '#E4EFEA', judged: '#F8E9DF' };
