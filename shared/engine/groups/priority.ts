import type { Group } from '../../types/group';
import { ATOMIC_NUMBERS } from './elements';

const numberOf = (element: string): number => (element === 'D' ? 1.5 : (ATOMIC_NUMBERS[element] ?? 0));

/** Atomic numbers of the first atom's neighbours, a multiple bond counted with its duplicates, largest first. */
function neighbourSet(group: Group): number[] | null {
  if (group.neighbours === null) return null;
  return group.neighbours.flatMap((n) => Array.from({ length: n.order }, () => numberOf(n.element))).sort((a, b) => b - a);
}

/**
 * Cahn–Ingold–Prelog order of two groups on one atom, as far as the first atom and its set of neighbours tell.
 * @returns > 0 when `a` ranks higher, < 0 when `b` does, null on a tie or when the neighbours needed were not told:
 *   then there is no E or Z here
 */
export function comparePriority(a: Group, b: Group): number | null {
  const first = numberOf(a.element) - numberOf(b.element);
  if (first !== 0) return first;
  const setA = neighbourSet(a);
  const setB = neighbourSet(b);
  if (setA === null || setB === null) return null;
  for (let i = 0; i < Math.max(setA.length, setB.length); i += 1) {
    const step = (setA[i] ?? 0) - (setB[i] ?? 0);
    if (step !== 0) return step;
  }
  return null;
}
