import type { GroupText } from '../../types/group';
import type { GeneralisedRow, ParameterSet, Substituent } from '../../types/relation';
import type { Harmonics } from '../math/periodic';
import { radians } from '../math/angles';
import { groupOf, heavyNeighbours, isHydrogen } from '../groups/group';

/** The two groups on each carbon: at +120° (clockwise) and at −120° from its coupled H, as seen from the front. */
export interface PathGroups {
  front: readonly [GroupText, GroupText];
  rear: readonly [GroupText, GroupText];
}

/**
 * Groups as substituents of the equation.
 * ξ is +1 for a group 120° clockwise of its own coupled H, seen from its carbon towards the other. Seen from the
 * front, the rear carbon is looked at from behind: there the clockwise group has ξ = −1.
 * @throws RangeError when a first atom or a neighbour has no Δχ in the row, or neighbours are not told
 */
export function substituentsOf(row: GeneralisedRow, groups: PathGroups): Substituent[] {
  const places: readonly (readonly [GroupText, 1 | -1])[] = [
    [groups.front[0], 1],
    [groups.front[1], -1],
    [groups.rear[0], -1],
    [groups.rear[1], 1],
  ];
  const dchi = (element: string): number => {
    const value = row.electronegativity.values[element];
    if (value === undefined) throw new RangeError(`no electronegativity is held for ${element}`);
    return value;
  };
  return places
    .map(([text, xi]) => ({ group: groupOf(text), xi }))
    .filter(({ group }) => !isHydrogen(group))
    .map(({ group, xi }) => {
      if (group.neighbours === null) throw new RangeError(`the neighbours of ${group.element} are not told`);
      return { dchiAlpha: dchi(group.element), dchiBeta: heavyNeighbours(group).map(dchi), xi };
    });
}

/** The set made for this number of groups, otherwise the one for any number. */
export function setFor(row: GeneralisedRow, groupCount: number, wanted?: string): ParameterSet {
  const found =
    wanted === undefined
      ? (row.parameterSets.find((s) => s.groups === groupCount) ?? row.parameterSets.find((s) => s.groups === null))
      : row.parameterSets.find((s) => s.id === wanted);
  if (!found) throw new RangeError(`${row.id} has no parameter set ${wanted ?? `for ${groupCount} groups`}`);
  return found;
}

const value = (set: ParameterSet, name: string): number => {
  const found = set.values[name];
  if (found === undefined) throw new RangeError(`set ${set.id} has no parameter ${name}`);
  return found;
};

/** Δχ of a substituent less P7 times the sum over its own atoms. */
export const effectiveDchi = (set: ParameterSet, s: Substituent): number =>
  s.dchiAlpha - value(set, 'P7') * s.dchiBeta.reduce((sum, b) => sum + b, 0);

/**
 * J = P1 cos²φ + P2 cos φ + P3 + Σ Δχ [P4 + P5 cos²(ξφ + P6|Δχ|)], Δχ = Δχα − P7 ΣΔχβ, in hertz.
 * Haasnoot, de Leeuw, Altona, Tetrahedron 1980, 36, 2783. Domain: H–C(sp³)–C(sp³)–H, near-tetrahedral carbons.
 * Written out in cos φ, cos 2φ and sin 2φ, because cos²x = (1 + cos 2x)/2 and ξ² = 1.
 */
export function generalisedHarmonics(set: ParameterSet, substituents: readonly Substituent[]): Harmonics {
  const p1 = value(set, 'P1');
  const p4 = value(set, 'P4');
  const p5 = value(set, 'P5');
  const p6 = radians(value(set, 'P6'));
  const h = { a0: p1 / 2 + value(set, 'P3'), a1: value(set, 'P2'), b1: 0, a2: p1 / 2, b2: 0 };
  for (const s of substituents) {
    const d = effectiveDchi(set, s);
    const shift = 2 * p6 * Math.abs(d);
    h.a0 += d * (p4 + p5 / 2);
    h.a2 += (d * p5 * Math.cos(shift)) / 2;
    h.b2 -= (d * p5 * s.xi * Math.sin(shift)) / 2;
  }
  return h;
}
