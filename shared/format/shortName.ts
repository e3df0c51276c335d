/** "M. Adeyemi": a person's name where a column is narrow; a single name stays whole. */
export function shortName(name: string): string {
  const parts = name.trim().split(/\s+/);
  const first = parts[0];
  if (first === undefined || parts.length < 2) return name.trim();
  return `${[...first][0]!.toUpperCase()}.\u00A0${parts[parts.length - 1]!}`;
}
