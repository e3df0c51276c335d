import type { GroupText } from '@/shared/types/group';
import type { QuickLookAnswer } from '@/shared/types/answer';

import { DoubleBondPlots } from './DoubleBondPlots';
import type { DialSlot } from './Dial';
import { SingleBondPlots } from './SingleBondPlots';

export interface AnswerPlotsProps {
  answer: QuickLookAnswer;
  /** the groups that the answer was made with; null = not given */
  groups: { front: [GroupText, GroupText]; rear: [GroupText, GroupText] } | null;
  /** a letter on the dial was touched; left out where groups cannot be changed */
  onPickGroup?: (slot: DialSlot) => void;
  /** dial and curve next to each other where the place is wide enough, as among the evidence of a case */
  beside?: boolean;
}

/** Dial and curve, or the ladder, of one calculated answer, each with its table twin. */
export function AnswerPlots({ answer, groups, onPickGroup, beside }: AnswerPlotsProps) {
  if (answer.single && answer.relation) {
    return <SingleBondPlots finding={answer.single} relation={answer.relation} reading={answer.reading} groups={groups} onPickGroup={onPickGroup} beside={beside} />;
  }
  return answer.double && answer.double.ladder.length > 0 ? <DoubleBondPlots finding={answer.double} reading={answer.reading} decided={answer.grade !== 'not-decided'} /> : null;
}
