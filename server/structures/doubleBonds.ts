import type { RingSize } from '@/shared/types/answer';
import type { GroupText } from '@/shared/types/group';
import { groupLabel, groupOf, parseGroup, printGroup } from '@/shared/engine';

type Ocl = typeof import('openchemlib');
type Molecule = InstanceType<Ocl['Molecule']>;

/** One C=C of a structure as the quick look takes it. */
export interface DoubleBond {
  label: string;
  groups: { left: [GroupText, GroupText]; right: [GroupText, GroupText] };
  ringSize: RingSize | null;
}

export type DoubleBondsResult = { bonds: DoubleBond[]; note: string | null } | { sentence: string };

let loading: Promise<Ocl> | null = null;

/** The structure kit takes about a second to load: once, when a structure first comes. */
export function loadStructureKit(): Promise<Ocl> {
  loading ??= import('openchemlib');
  return loading;
}

const ORDER_MARKS = ['', '', '=', '#'] as const;

/** A group from the structure: the first atom and its own neighbours, the path carbon left out. */
function groupText(molecule: Molecule, atom: number, from: number): GroupText {
  const parts: string[] = [];
  for (let i = 0; i < molecule.getConnAtoms(atom); i += 1) {
    const next = molecule.getConnAtom(atom, i);
    if (next === from) continue;
    const order = molecule.getBondOrder(molecule.getConnBond(atom, i));
    parts.push(`${ORDER_MARKS[order] ?? ''}${molecule.getAtomLabel(next)}`);
  }
  const hydrogens = Array.from({ length: molecule.getAllHydrogens(atom) }, () => 'H');
  const element = molecule.getAtomLabel(atom);
  const read = parseGroup(`${element}(${[...parts, ...hydrogens].join(',')})`);
  // charged or unusual atoms do not fit the group form: then only the first atom is told
  return 'group' in read ? printGroup(read.group) : element;
}

/** The two groups of one end of a C=C; H first fills the empty places. */
function endGroups(molecule: Molecule, atom: number, partner: number): [GroupText, GroupText] | null {
  const found: GroupText[] = [];
  for (let i = 0; i < molecule.getConnAtoms(atom); i += 1) {
    const next = molecule.getConnAtom(atom, i);
    if (next === partner) continue;
    // a second double bond on the carbon is a cumulene, no alkene
    if (molecule.getBondOrder(molecule.getConnBond(atom, i)) !== 1) return null;
    found.push(groupText(molecule, next, atom));
  }
  const [a = 'H', b] = found;
  return b === undefined ? ['H', a] : [a, b];
}

/** Aromatic rings have tables of their own; a ring with C=O in it (pyrone, pyridone, uracil) couples as an alkene. */
function isAromatic(molecule: Molecule, bond: number): boolean {
  if (!molecule.isAromaticBond(bond)) return false;
  if (molecule.isDelocalizedBond(bond)) return true;
  const rings = molecule.getRingSet();
  for (let ring = 0; ring < rings.getSize(); ring += 1) {
    if (!rings.getRingBonds(ring).includes(bond)) continue;
    const atoms = rings.getRingAtoms(ring);
    const carbonyl = atoms.some((atom) => {
      for (let i = 0; i < molecule.getConnAtoms(atom); i += 1) {
        const exocyclic = !atoms.includes(molecule.getConnAtom(atom, i));
        if (exocyclic && molecule.getBondOrder(molecule.getConnBond(atom, i)) === 2) return true;
      }
      return false;
    });
    if (carbonyl) return false;
  }
  return true;
}

function ringSizeOf(molecule: Molecule, bond: number): RingSize | null {
  if (!molecule.isRingBond(bond)) return null;
  const size = molecule.getBondRingSize(bond);
  // the kit names small rings only; what it leaves at 0 is larger
  if (size === 3 || size === 4 || size === 5 || size === 6 || size === 7) return size;
  return 8;
}

const hydrogensOf = ({ groups }: DoubleBond): number => [...groups.left, ...groups.right].filter((g) => g === 'H').length;
const vicinal = ({ groups }: DoubleBond): boolean => groups.left.includes('H') && groups.right.includes('H');

const endLabel = (groups: readonly GroupText[]): string => groups.filter((g) => g !== 'H').map((g) => groupLabel(groupOf(g))).join(', ') || 'H';

function labelOf(groups: DoubleBond['groups'], ringSize: RingSize | null, atoms: readonly [number, number]): string {
  const carbon = (end: readonly GroupText[]): string => ['C', 'CH', 'CH₂'][end.filter((g) => g === 'H').length] ?? 'C';
  const centre = `${carbon(groups.left)}=${carbon(groups.right)}`;
  const ring = ringSize === null ? '' : ringSize === 8 ? ', in a ring of 8 or more' : `, in a ring of ${ringSize}`;
  return `${centre} between ${endLabel(groups.left)} and ${endLabel(groups.right)}${ring} (atoms ${atoms[0] + 1} and ${atoms[1] + 1})`;
}

/**
 * The C=C bonds of a SMILES, those with a vicinal H,H pair first: groups on both ends as the engine reads them, ring size.
 * Stereo marks are ignored, because the answer must come from J.
 */
export async function findDoubleBonds(smiles: string): Promise<DoubleBondsResult> {
  const text = smiles.trim();
  // the kit reads an unfinished branch without complaint and would answer for another molecule
  const open = (a: string, b: string): boolean => text.split(a).length !== text.split(b).length;
  if (open('(', ')') || open('[', ']')) return { sentence: 'The SMILES is unfinished: a bracket is opened and not closed.' };
  const ocl = await loadStructureKit();
  let molecule: Molecule;
  try {
    molecule = ocl.Molecule.fromSmiles(text);
    molecule.ensureHelperArrays(ocl.Molecule.cHelperRings);
  } catch {
    return { sentence: 'The SMILES could not be read: check brackets, ring numbers and charges.' };
  }
  if (text === '' || molecule.getAllAtoms() === 0) return { sentence: 'The SMILES holds no atom: paste one, as in OC(=O)C=Cc1ccccc1.' };
  const bonds: DoubleBond[] = [];
  for (let bond = 0; bond < molecule.getBonds(); bond += 1) {
    const a = molecule.getBondAtom(0, bond);
    const b = molecule.getBondAtom(1, bond);
    const isCC = molecule.getAtomicNo(a) === 6 && molecule.getAtomicNo(b) === 6 && molecule.getBondOrder(bond) === 2;
    if (!isCC || isAromatic(molecule, bond)) continue;
    const left = endGroups(molecule, a, b);
    const right = endGroups(molecule, b, a);
    if (!left || !right) continue;
    const ringSize = ringSizeOf(molecule, bond);
    bonds.push({ label: labelOf({ left, right }, ringSize, [a, b]), groups: { left, right }, ringSize });
  }
  if (bonds.length === 0) return { sentence: 'No C=C was found in the SMILES: aromatic bonds do not count, paste a structure with an alkene.' };
  bonds.sort((x, y) => Number(vicinal(y)) - Number(vicinal(x)) || hydrogensOf(y) - hydrogensOf(x));
  return { bonds, note: /[/\\@]/.test(text) ? 'Stereo marks in the SMILES are ignored: the answer comes from _J_ alone.' : null };
}

/**
 * The one C=C that a quick look is about: the only one, or the only one with a vicinal H,H pair.
 * @returns several bonds as a list to choose from
 */
export async function resolveAlkene(smiles: string): Promise<{ bond: DoubleBond; note: string | null } | { choose: DoubleBond[]; note: string | null } | { sentence: string }> {
  const found = await findDoubleBonds(smiles);
  if ('sentence' in found) return found;
  const pairs = found.bonds.filter(vicinal);
  const candidates = pairs.length > 0 ? pairs : found.bonds;
  const [first] = candidates;
  // bonds that differ in nothing the engine sees need no choice; left and right are only names
  const seen = ({ groups, ringSize }: DoubleBond): string => JSON.stringify([[groups.left.join(), groups.right.join()].sort(), ringSize]);
  const alike = candidates.every((b) => first && seen(b) === seen(first));
  return first && alike ? { bond: first, note: found.note } : { choose: candidates, note: found.note };
}
