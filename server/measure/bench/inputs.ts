import { drawFrom } from '../lib/draw';

/** Different quick looks, all of which can be answered: half on a single bond, half on a double bond, with and without groups. */
export function quickLookInputs(count: number): Record<string, unknown>[] {
  const draw = drawFrom(7);
  const one = <T>(list: readonly T[]): T => list[Math.floor(draw() * list.length)] as T;
  const saturated = ['H', 'C(H,H,H)', 'C(C,H,H)', 'C(C,C,H)', 'O(H)', 'O(C)', 'N(C,C)', 'F', 'Cl'];
  const onVinyl = ['C(H,H,H)', 'C(C,H,H)', 'C(=C,C)', 'C(=O,O)', 'C(=O,N)', 'C(#N)', 'O(C)', 'Cl', 'Br', 'Si(C,C,C)'];
  return Array.from({ length: count }, (_, index) => {
    // the number in the last digits makes every input another one
    const hz = (from: number, to: number): string => (from + draw() * (to - from)).toFixed(2) + String(index).padStart(3, '0');
    if (index % 2 === 0) {
      const groups = index % 4 === 0 ? { front: [one(saturated), one(saturated)], rear: [one(saturated), one(saturated)] } : null;
      return { bond: 'single', j: hz(0.5, 14), se: one(['0.1', '0.2', '0.3']), groups, turning: one(['free', 'ring', 'unknown']) };
    }
    const groups = index % 4 === 1 ? { left: [one(onVinyl), 'H'], right: [one(onVinyl), 'H'] } : null;
    return { bond: 'double', j: hz(2, 20), se: one(['0.1', '0.2', '0.3']), groups };
  });
}
