/** z of a two-sided 95 % interval. */
const Z = 1.959963984540054;

export interface Share {
  count: number;
  of: number;
  share: number | null;
  /** Wilson score interval, 95 % */
  interval95: [number, number] | null;
}

/** A share with its Wilson score interval (E. B. Wilson, J. Am. Stat. Assoc. 1927, 22, 209); nothing out of nothing has none. */
export function shareOf(count: number, of: number): Share {
  if (of === 0) return { count, of, share: null, interval95: null };
  const share = count / of;
  const centre = (share + (Z * Z) / (2 * of)) / (1 + (Z * Z) / of);
  const half = (Z / (1 + (Z * Z) / of)) * Math.sqrt((share * (1 - share)) / of + (Z * Z) / (4 * of * of));
  return { count, of, share: round(share), interval95: [round(Math.max(0, centre - half)), round(Math.min(1, centre + half))] };
}

const round = (value: number): number => Math.round(value * 1e4) / 1e4;
