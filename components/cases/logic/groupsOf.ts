import { quickText } from '@/shared/text/quick';
import type { Calculation } from '@/shared/types/case';

import { groupLine } from '../../quick/groupWords';

/** What a calculation was made with, in one line: two of one reading differ in nothing else. */
export function groupsOf(calculation: Calculation): string {
  if (!calculation.groups) return `${quickText.groups} ${quickText.notGiven}`;
  if (calculation.bond === 'double') {
    const { left, right } = calculation.groups;
    return `${left.map(groupLine).join(', ')} C=C ${right.map(groupLine).join(', ')}`;
  }
  const { front, rear } = calculation.groups;
  return `${quickText.front} ${front.map(groupLine).join(', ')} · ${quickText.rear} ${rear.map(groupLine).join(', ')}`;
}
