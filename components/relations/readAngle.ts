/** An angle as typed: decimal comma, true minus and a degree sign are read. null = not an angle between −360 and 360. */
export function readAngle(typed: string): number | null {
  const text = typed.trim().replace(/[\u2212\u2013]/, '-').replace(/\s*°$/, '').replace(',', '.');
  if (!/^[+-]?(\d+\.?\d*|\.\d+)$/.test(text)) return null;
  const value = Number(text);
  return Math.abs(value) <= 360 ? value : null;
}
