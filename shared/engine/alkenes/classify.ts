import type { Group } from '../../types/group';
import type { DoubleBondSetting } from '../../types/answer';
import { isElectropositive } from '../groups/elements';
import { isHydrogen, printGroup } from '../groups/group';

/** The groups of a double bond, sorted out. */
export interface AlkeneGroups {
  left: readonly [Group, Group];
  right: readonly [Group, Group];
}

/** Where the H sit: the setting, whether the two H share a carbon, and the class by first atoms. */
export interface AlkeneKind {
  setting: Exclude<DoubleBondSetting, 'ring' | 'not-given'>;
  /** 1,1-disubstituted: =CH₂ is the only coupled pair, so the coupling is geminal */
  geminalOnly: boolean;
  classId: string;
  /** first atoms other than H */
  elements: string[];
  /** both carbons carry the same group, neighbours told: the two H are equivalent */
  symmetric: boolean;
}

const HALOGEN_CLASS = new Set(['Cl', 'Br', 'I']);

/** The class of a bond with one or two groups by their first atoms; `none` where no compound is held. */
function classOf(elements: readonly string[]): string {
  const others = elements.filter((e) => e !== 'C');
  if (elements.length === 0) return 'ethene';
  if (others.length === 0) return elements.length === 1 ? 'terminal-c' : 'c-c';
  if (others.some(isElectropositive)) return others.length === 1 ? 'metal' : 'none';
  const known = (e: string): boolean => e === 'O' || e === 'N' || e === 'F' || e === 'S' || e === 'Se' || HALOGEN_CLASS.has(e);
  if (!others.every(known)) return 'none';
  if (others.length === 2) return 'two-hetero';
  const only = others[0] ?? '';
  if (HALOGEN_CLASS.has(only)) return 'halogen';
  return only === 'S' || only === 'Se' ? 's-se' : only.toLowerCase();
}

/** Sorts a double bond by how many groups it carries and by their first atoms. */
export function kindOf({ left, right }: AlkeneGroups): AlkeneKind {
  const heavyLeft = left.filter((g) => !isHydrogen(g));
  const heavyRight = right.filter((g) => !isHydrogen(g));
  const elements = [...heavyLeft, ...heavyRight].map((g) => g.element);
  const count = elements.length;
  const geminalOnly = count === 2 && (heavyLeft.length === 2 || heavyRight.length === 2);
  const setting = count >= 4 ? 'tetrasubstituted' : count === 3 ? 'trisubstituted' : count === 2 && !geminalOnly ? 'disubstituted' : 'terminal';
  const [a] = heavyLeft;
  const [b] = heavyRight;
  const symmetric = (count === 0) || (setting === 'disubstituted' && !!a && !!b && a.neighbours !== null && printGroup(a) === printGroup(b));
  return { setting, geminalOnly, classId: count <= 2 ? classOf(elements) : 'none', elements, symmetric };
}
