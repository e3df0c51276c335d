import type { Group, GroupText } from '../../types/group';
import { groupOf, printGroup } from './group';

/** A common group as the pickers offer it: first atom as label, what tells it apart below. */
export interface GroupPreset {
  id: string;
  text: GroupText;
  label: string;
  sublabel: string;
}

/** Groups offered by both pickers, most used first. R is a carbon group. */
export const GROUP_PRESETS: readonly GroupPreset[] = [
  { id: 'h', text: 'H', label: 'H', sublabel: '' },
  { id: 'methyl', text: 'C(H,H,H)', label: 'C', sublabel: 'CH₃' },
  { id: 'ch2r', text: 'C(C,H,H)', label: 'C', sublabel: 'CH₂R' },
  { id: 'chr2', text: 'C(C,C,H)', label: 'C', sublabel: 'CHR₂' },
  { id: 'cr3', text: 'C(C,C,C)', label: 'C', sublabel: 'CR₃' },
  { id: 'ch2or', text: 'C(O,H,H)', label: 'C', sublabel: 'CH₂OR' },
  { id: 'chor', text: 'C(O,C,H)', label: 'C', sublabel: 'CHR(OR)' },
  { id: 'ch2n', text: 'C(N,H,H)', label: 'C', sublabel: 'CH₂NR₂' },
  { id: 'aryl', text: 'C(=C,C)', label: 'C', sublabel: 'aryl' },
  { id: 'vinyl', text: 'C(=C,H)', label: 'C', sublabel: 'CH=CR₂' },
  { id: 'alkynyl', text: 'C(#C)', label: 'C', sublabel: 'C≡CR' },
  { id: 'nitrile', text: 'C(#N)', label: 'C', sublabel: 'CN' },
  { id: 'formyl', text: 'C(=O,H)', label: 'C', sublabel: 'CHO' },
  { id: 'acyl', text: 'C(=O,C)', label: 'C', sublabel: 'C(O)R' },
  { id: 'carboxyl', text: 'C(=O,O)', label: 'C', sublabel: 'CO₂R' },
  { id: 'carbamoyl', text: 'C(=O,N)', label: 'C', sublabel: 'CONR₂' },
  { id: 'cf3', text: 'C(F,F,F)', label: 'C', sublabel: 'CF₃' },
  { id: 'hydroxy', text: 'O(H)', label: 'O', sublabel: 'OH' },
  { id: 'alkoxy', text: 'O(C)', label: 'O', sublabel: 'OR, OC(O)R' },
  { id: 'silyloxy', text: 'O(Si)', label: 'O', sublabel: 'OSiR₃' },
  { id: 'amino', text: 'N(C,C)', label: 'N', sublabel: 'NR₂' },
  { id: 'nhr', text: 'N(C,H)', label: 'N', sublabel: 'NHR, NHC(O)R' },
  { id: 'nh2', text: 'N(H,H)', label: 'N', sublabel: 'NH₂' },
  { id: 'nitro', text: 'N(=O,O)', label: 'N', sublabel: 'NO₂' },
  { id: 'fluoro', text: 'F', label: 'F', sublabel: '' },
  { id: 'chloro', text: 'Cl', label: 'Cl', sublabel: '' },
  { id: 'bromo', text: 'Br', label: 'Br', sublabel: '' },
  { id: 'iodo', text: 'I', label: 'I', sublabel: '' },
  { id: 'thio', text: 'S(C)', label: 'S', sublabel: 'SR' },
  { id: 'sulfonyl', text: 'S(=O,=O,C)', label: 'S', sublabel: 'SO₂R' },
  { id: 'seleno', text: 'Se(C)', label: 'Se', sublabel: 'SeR' },
  { id: 'silyl', text: 'Si(C,C,C)', label: 'Si', sublabel: 'SiR₃' },
  { id: 'stannyl', text: 'Sn(C,C,C)', label: 'Sn', sublabel: 'SnR₃' },
  { id: 'boryl', text: 'B(O,O)', label: 'B', sublabel: 'B(OR)₂' },
  { id: 'phosphoryl', text: 'P(=O,O,O)', label: 'P', sublabel: 'P(O)(OR)₂' },
];

/** A group as a reader writes it: `CO₂R`, `OR`, `F`; one that is no preset as its text. */
export function groupLabel(group: Group): string {
  const text = printGroup(group);
  const preset = GROUP_PRESETS.find((p) => printGroup(groupOf(p.text)) === text);
  return preset ? preset.sublabel || preset.label : text;
}
