import type { Root } from '../../types/reading';
import type { GeneralisedRow } from '../../types/relation';
import { degree, hz } from '../../format/number';
import { bindCurve, jAt } from '../relations/curve';
import type { PathGroups } from '../relations/generalised';

/**
 * The same bond seen from another H on it: its groups, and how far its φ is turned.
 * A group at +120° becomes the zero mark: the other group is then at +120° and the first H at −120°.
 */
function views({ front, rear }: PathGroups): { groups: PathGroups; turnDeg: number }[] {
  const isH = (text: string): boolean => text.trim() === 'H';
  return [
    ...(isH(rear[0]) ? [{ groups: { front, rear: [rear[1], 'H'] as const }, turnDeg: 120 }] : []),
    ...(isH(rear[1]) ? [{ groups: { front, rear: ['H', rear[0]] as const }, turnDeg: -120 }] : []),
    ...(isH(front[0]) ? [{ groups: { front: [front[1], 'H'] as const, rear }, turnDeg: -120 }] : []),
    ...(isH(front[1]) ? [{ groups: { front: ['H', front[0]] as const, rear }, turnDeg: 120 }] : []),
  ];
}

/** What the coupling to a second H on the bond would be at each root; [] when no second H is there or it tells nothing apart. */
export function secondCouplings(row: GeneralisedRow, groups: PathGroups, roots: readonly Root[], toleranceHz: number): string[] {
  for (const view of views(groups)) {
    const curve = bindCurve(row, { groups: view.groups });
    const found = roots.map(({ phiDeg }) => ({ phiDeg, jHz: jAt(curve, phiDeg + view.turnDeg) }));
    const values = found.map((f) => f.jHz);
    // only a coupling that parts the roots by more than its own error is worth measuring
    if (found.length > 1 && Math.max(...values) - Math.min(...values) > toleranceHz) {
      return found.map((f) => `${hz(f.jHz)} at _φ_ ${degree(f.phiDeg)}`);
    }
  }
  return [];
}
