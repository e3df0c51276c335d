import type { CaseContent, Reading } from '../types/case';
import { NBSP } from './number';

const PATHS: Readonly<Record<Reading['path'], string>> = { '1J': '¹J', '2J': '²J', '3J': 'J', '4J': '⁴J', '5J': '⁵J' };

/** `H2` → `2`, `H4ax` → `4ax`; a label without an H stays as it is. */
const locant = (atom: string): string => atom.replace(/^H-?(?=\d)/, '');
/** `H2` → `H-2`, as an experimental part writes it. */
const written = (atom: string): string => atom.replace(/^H(?=\d)/, 'H-');

/** The number as typed, without what stood around it; a limit keeps its sign. */
function typedValue(typed: string): { sign: string; value: string } {
  const limit = /^\s*(<=?|≤|>=?|≥)/.exec(typed)?.[1];
  const sign = limit === undefined ? '=' : limit.replace('<=', '≤').replace('>=', '≥');
  const value = (/-?\d+(?:[.,]\d+)?/.exec(typed.replace('−', '-'))?.[0] ?? typed.trim()).replace(',', '.').replace('-', '−');
  const about = /^\s*(?:ca\.?|circa|about|approx|[~≈])/i.test(typed) ? 'ca. ' : '';
  return { sign, value: `${about}${value}` };
}

function coupling(r: Reading, typed: string): string {
  const { sign, value } = typedValue(typed);
  const pair = r.atomA || r.atomB ? `(${[r.atomA, r.atomB].filter(Boolean).map(locant).join(',')})` : '';
  return `${PATHS[r.path]}${pair} ${sign} ${value}${NBSP}Hz`;
}

/** One atom's entry of one reading: the value is the same at both partners, or the difference is said. */
function entries(r: Reading): { atom: string; text: string }[] {
  const own = coupling(r, r.j);
  const differs = r.partner.trim() !== '' && typedValue(r.partner).value !== typedValue(r.j).value;
  const atPartner = differs ? `${coupling(r, r.partner)} (${typedValue(r.j).value}${NBSP}Hz at ${written(r.atomA)})` : own;
  if (!r.atomA && !r.atomB) return [{ atom: '', text: own }];
  return [...(r.atomA ? [{ atom: r.atomA, text: own }] : []), ...(r.atomB ? [{ atom: r.atomB, text: atPartner }] : [])];
}

/**
 * The readings as a journal-style line to copy, as far as they are known: `H-2: J(2,3) = 8.9 Hz; …`, atoms in natural
 * order, largest coupling first. Plain text, digits as typed, decimal point.
 */
export function siText({ readings, conditions }: CaseContent): string {
  const byAtom = new Map<string, { text: string; size: number }[]>();
  for (const r of readings.filter((one) => one.j.trim() !== '')) {
    for (const { atom, text } of entries(r)) {
      const size = Math.abs(Number(typedValue(r.j).value.replace('−', '-').replace('ca. ', '')));
      byAtom.set(atom, [...(byAtom.get(atom) ?? []), { text, size }]);
    }
  }
  const head = [conditions.fieldMHz.trim() && `${conditions.fieldMHz.trim()}${NBSP}MHz`, conditions.solvent.trim(), conditions.temperatureK.trim() && `${conditions.temperatureK.trim()}${NBSP}K`].filter(Boolean).join(', ');
  const lines = [...byAtom]
    .sort(([a], [b]) => a.localeCompare(b, 'en', { numeric: true }))
    .map(([atom, list]) => `${atom ? `${written(atom)}: ` : ''}${list.sort((x, y) => y.size - x.size).map((e) => e.text).join(', ')}`);
  return lines.length === 0 ? '' : `¹H NMR${head ? ` (${head})` : ''}: ${lines.join('; ')}.`;
}
