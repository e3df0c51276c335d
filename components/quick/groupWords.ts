import { GROUP_PRESETS } from '@/shared/engine/groups/presets';
import { quickText } from '@/shared/text/quick';
import type { GroupText } from '@/shared/types/group';

import { firstAtom } from './form';

/** A group as the pickers name it: first atom, then what tells it apart. */
export function groupWords(group: GroupText): { label: string; sublabel: string } {
  if (group === '') return { label: quickText.notChosen, sublabel: '' };
  const preset = GROUP_PRESETS.find((known) => known.text === group);
  return preset ? { label: preset.label, sublabel: preset.sublabel } : { label: firstAtom(group), sublabel: group };
}

export const groupLine = (group: GroupText): string => {
  const { label, sublabel } = groupWords(group);
  return sublabel === '' ? label : sublabel.startsWith(label) || sublabel.length > 1 ? sublabel : label;
};
