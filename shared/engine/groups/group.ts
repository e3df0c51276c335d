import type { Group, GroupNeighbour, GroupText } from '../../types/group';
import { ATOMIC_NUMBERS, BONDS_BESIDE_PATH } from './elements';

/** Why a group's text could not be read. */
export type GroupFault =
  | { code: 'empty' }
  | { code: 'form'; text: string }
  | { code: 'element'; symbol: string }
  | { code: 'bonds'; element: string; needs: number; has: number };

const ORDERS: Readonly<Record<string, 1 | 2 | 3>> = { '': 1, '-': 1, '=': 2, '#': 3 };
const MARKS: Readonly<Record<number, string>> = { 1: '', 2: '=', 3: '#' };

/**
 * Reads a group: `C(=O,O)`, `O(C)`, `H`, `Cl`; a bare `C` leaves its neighbours untold.
 * A neighbour list that leaves bonds of the first atom unsaid is a fault, because the empty place could hold anything.
 */
export function parseGroup(text: GroupText): { group: Group } | { fault: GroupFault } {
  const compact = text.replace(/\s+/g, '');
  if (compact === '' || compact === '?') return { fault: { code: 'empty' } };
  const match = /^([A-Z][a-z]?)(?:\(([^()]*)\))?$/.exec(compact);
  const element = match?.[1];
  if (!match || !element) return { fault: { code: 'form', text } };
  if (!(element in ATOMIC_NUMBERS)) return { fault: { code: 'element', symbol: element } };
  const bonds = BONDS_BESIDE_PATH[element];
  const alone = bonds?.includes(0) ?? false;
  if (match[2] === undefined) return { group: { element, neighbours: alone ? [] : null } };
  const neighbours: GroupNeighbour[] = [];
  for (const part of match[2] === '' ? [] : match[2].split(',')) {
    const piece = /^([-=#]?)([A-Z][a-z]?)$/.exec(part);
    const order = ORDERS[piece?.[1] ?? ''];
    const symbol = piece?.[2];
    if (!piece || !order || !symbol) return { fault: { code: 'form', text } };
    if (!(symbol in ATOMIC_NUMBERS)) return { fault: { code: 'element', symbol } };
    neighbours.push({ element: symbol, order });
  }
  const has = neighbours.reduce((sum, n) => sum + n.order, 0);
  if (bonds && !bonds.includes(has)) return { fault: { code: 'bonds', element, needs: Math.min(...bonds), has } };
  return { group: { element, neighbours } };
}

/** The group of a text that is known to be good (tables, presets, text that passed `parseGroup`). @throws on a fault */
export function groupOf(text: GroupText): Group {
  const read = parseGroup(text);
  if ('fault' in read) throw new RangeError(`not a group: ${text} (${read.fault.code})`);
  return read.group;
}

const byRank = (a: GroupNeighbour, b: GroupNeighbour): number =>
  b.order - a.order || (ATOMIC_NUMBERS[b.element] ?? 0) - (ATOMIC_NUMBERS[a.element] ?? 0) || a.element.localeCompare(b.element, 'en');

/** One way to write a group: multiple bonds first, then by atomic number. Two equal groups print alike. */
export function printGroup({ element, neighbours }: Group): GroupText {
  if (neighbours === null || neighbours.length === 0) return element;
  const list = [...neighbours].sort(byRank).map((n) => `${MARKS[n.order] ?? ''}${n.element}`);
  return `${element}(${list.join(',')})`;
}

export const isHydrogen = (group: Group): boolean => group.element === 'H' || group.element === 'D';

/** The first atom carries a double or triple bond (aryl, vinyl, carbonyl, nitrile, imine, nitro). */
export const isUnsaturated = (group: Group): boolean => group.neighbours?.some((n) => n.order > 1) ?? false;

/** An alkenyl group: C=C that carries an H or a chain, told from aryl only when the text says `C(=C,H)`. */
export const isVinyl = (group: Group): boolean =>
  group.element === 'C' && (group.neighbours?.some((n) => n.element === 'C' && n.order === 2) ?? false) && (group.neighbours?.some((n) => n.element === 'H') ?? false);

/** Non-H neighbours of the first atom, each once. */
export const heavyNeighbours = (group: Group): string[] =>
  (group.neighbours ?? []).filter((n) => n.element !== 'H' && n.element !== 'D').map((n) => n.element);
