import type { DoubleBondFinding } from '../../types/answer';
import type { Group } from '../../types/group';
import { doubleText as say } from '../../text/engine/double';
import { isHydrogen } from '../groups/group';
import { groupLabel } from '../groups/presets';
import { comparePriority } from '../groups/priority';
import type { AlkeneGroups, AlkeneKind } from './classify';

type Descriptors = DoubleBondFinding['descriptors'];

export interface Naming {
  descriptors: Descriptors;
  note: string | null;
  /** cis is E here */
  unusual: boolean;
}

/** 0 or 1: which of two groups ranks higher; null on a tie or when it cannot be told. */
function higher([a, b]: readonly [Group, Group]): 0 | 1 | null {
  const order = comparePriority(a, b);
  return order === null ? null : order > 0 ? 0 : 1;
}

/**
 * What cis and trans are called with these groups.
 * Two H, one on each carbon: cis and trans name the places of the two H, and each other group outranks H, so cis is Z.
 * Three groups: cis and trans name the carbon group on the far carbon against the one =CH, as ³J(C,H) sees it; where
 * another group there ranks above that carbon, cis becomes E.
 */
export function nameGeometries({ left, right }: AlkeneGroups, kind: AlkeneKind): Naming {
  const none: Naming = { descriptors: null, note: null, unusual: false };
  if (kind.setting === 'terminal') return none;
  if (kind.setting === 'disubstituted') {
    const descriptors = { cis: 'Z', trans: 'E' } as const;
    return { descriptors, note: say.ezNote(descriptors), unusual: false };
  }
  const blocked = [left, right].find((end) => higher(end) === null);
  if (blocked) {
    const untold = blocked.some((g) => g.neighbours === null);
    return { ...none, note: untold ? say.untoldNote() : say.tieNote() };
  }
  if (kind.setting === 'tetrasubstituted') return none;
  const far = left.some(isHydrogen) ? right : left;
  const top = far[higher(far) ?? 0];
  const carbon = top?.element === 'C' ? top : far.find((g) => g.element === 'C');
  if (!top || !carbon) return none;
  // the =CH carries H and one group; that group outranks H and lies opposite to it
  const measuredIsTop = carbon === top;
  const descriptors = measuredIsTop ? ({ cis: 'E', trans: 'Z' } as const) : ({ cis: 'Z', trans: 'E' } as const);
  const note = measuredIsTop ? say.triNotePlain(groupLabel(carbon), descriptors) : say.triNote(groupLabel(carbon), groupLabel(top), descriptors);
  return { descriptors, note, unusual: measuredIsTop };
}
