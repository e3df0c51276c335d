import type { Group } from '../../types/group';
import type { AngleRow, RelationRow } from '../../types/relation';
import type { Hz } from '../../types/units';
import { ELECTRONEGATIVE } from '../groups/elements';
import { groupOf, heavyNeighbours, isHydrogen, isUnsaturated } from '../groups/group';
import { asAngleRow } from './curve';
import type { PathGroups } from './generalised';

export type DomainReason =
  | 'inside' | 'groups-not-given' | 'neighbours-not-told' | 'no-dchi' | 'sp2-neighbour' | 'crowded-electronegative' | 'polar-carbon' | 'not-hydrocarbon';

/** Whether a relation may be used on a path, why, and with which spread. */
export interface Domain {
  verdict: 'yes' | 'doubtful' | 'no';
  reason: DomainReason;
  spreadHz: Hz;
  /** the elements that the reason is about */
  elements: string[];
}

const unique = (list: string[]): string[] => [...new Set(list)];

function generalisedDomain(row: Extract<AngleRow, { kind: 'generalised' }>, groups: Group[]): Domain {
  const held = row.electronegativity.values;
  const outside = (reason: DomainReason, elements: string[]): Domain => ({ verdict: 'no', reason, spreadHz: row.spreadOutsideHz, elements });
  const doubtful = (reason: DomainReason, elements: string[]): Domain => ({ verdict: 'doubtful', reason, spreadHz: row.spreadOutsideHz, elements });
  const missing = unique(groups.flatMap((g) => [g.element, ...heavyNeighbours(g)]).filter((e) => held[e] === undefined && e !== 'D'));
  if (missing.length > 0) return outside('no-dchi', missing);
  const untold = groups.filter((g) => g.neighbours === null);
  if (untold.length > 0) return outside('neighbours-not-told', unique(untold.map((g) => g.element)));
  const unsaturated = groups.filter(isUnsaturated);
  if (unsaturated.length > 0) return doubtful('sp2-neighbour', unique(unsaturated.map((g) => g.element)));
  const crowded = groups.filter((g) => heavyNeighbours(g).filter((e) => ELECTRONEGATIVE.has(e)).length >= 3);
  if (crowded.length > 0) return doubtful('crowded-electronegative', unique(crowded.flatMap(heavyNeighbours)));
  return { verdict: 'yes', reason: 'inside', spreadHz: row.spreadHz, elements: [] };
}

/**
 * The domain test of a relation on a path.
 * Generalised equation: every group with its neighbours, Δχ held for each atom; an sp² neighbour or three
 * electronegative atoms on one carbon make it doubtful. Plain forms: hydrocarbon groups; on a carbon with another
 * atom they are doubtful with a spread of at least 3 Hz; groups not given likewise.
 */
export function applies(relation: RelationRow, groups: PathGroups | null): Domain {
  const row = asAngleRow(relation);
  const outside = Math.max(3, row.spreadOutsideHz);
  if (groups === null) {
    if (row.kind === 'generalised') return { verdict: 'no', reason: 'groups-not-given', spreadHz: row.spreadOutsideHz, elements: [] };
    return { verdict: 'doubtful', reason: 'groups-not-given', spreadHz: outside, elements: [] };
  }
  const all = [...groups.front, ...groups.rear].map(groupOf).filter((g) => !isHydrogen(g));
  if (row.kind === 'generalised') return generalisedDomain(row, all);
  const polar = unique(all.map((g) => g.element).filter((e) => ELECTRONEGATIVE.has(e)));
  if (polar.length > 0) return { verdict: 'doubtful', reason: 'polar-carbon', spreadHz: outside, elements: polar };
  const other = unique(all.map((g) => g.element).filter((e) => e !== 'C'));
  if (other.length > 0) return { verdict: 'doubtful', reason: 'not-hydrocarbon', spreadHz: outside, elements: other };
  if (all.some(isUnsaturated)) return { verdict: 'doubtful', reason: 'sp2-neighbour', spreadHz: outside, elements: ['C'] };
  return { verdict: 'yes', reason: 'inside', spreadHz: row.spreadHz, elements: [] };
}
