/** A typed condition as a number; a decimal comma and a unit behind it are accepted. null = not a number. */
export function numberOf(typed: string, unit: RegExp): number | null {
  const text = typed.trim().replace(unit, '').trim().replace(',', '.');
  return /^\d+(\.\d+)?$/.test(text) ? Number(text) : null;
}
/** No solvent of the trade is liquid below this (common practice, no source): a smaller number was meant in °C. */
const COLDEST_K = 110;
/** Proton frequencies in use run from table-top magnets to 1.2 GHz; a smaller number is the field in tesla (common practice). */
const LOWEST_MHZ = 30;
const MHZ_PER_TESLA = 42.577;

export type ConditionProblem = { kind: 'not-a-number' } | { kind: 'too-small'; meant: string | null } | null;

/** "25" in K is meant in °C; what it should read then comes along. */
export function temperatureProblem(typed: string): ConditionProblem {
  if (typed.trim() === '') return null;
  const kelvin = numberOf(typed, /\s*k$/i);
  if (kelvin === null) {
    const celsius = /^([-−]?\d+(?:[.,]\d+)?)\s*°?\s*c$/i.exec(typed.trim())?.[1];
    return celsius === undefined ? { kind: 'not-a-number' } : { kind: 'too-small', meant: kelvinText(Number(celsius.replace('−', '-').replace(',', '.'))) };
  }
  return kelvin < COLDEST_K ? { kind: 'too-small', meant: kelvinText(kelvin) } : null;
}
const kelvinText = (celsius: number): string => String(Math.round(celsius + 273.15));

/** "11.7" in MHz is meant in tesla. */
export function fieldProblem(typed: string): ConditionProblem {
  if (typed.trim() === '') return null;
  const mhz = numberOf(typed, /\s*mhz$/i);
  if (mhz === null) return { kind: 'not-a-number' };
  if (mhz >= LOWEST_MHZ) return null;
  const meant = Math.round((mhz * MHZ_PER_TESLA) / 10) * 10;
  return { kind: 'too-small', meant: mhz >= 1 ? String(meant) : null };
}
