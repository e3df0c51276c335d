import { StyleSheet, View } from 'react-native';

import type { CaseRow } from '@/shared/contracts/cases';
import { dayWords, isPast, isSoon } from '@/shared/format/when';
import { STATE_WORDS } from '@/shared/format/words';
import { uiCases } from '@/shared/text/uiCases';
import type { CaseState } from '@/shared/types/case';

import { space, type ColorName } from '../../theme/tokens';
import { GRADE_FILL, Mark, StateLine } from '../../ui/Mark';
import { RichText } from '../../ui/RichText';
import { Text } from '../../ui/Text';
import { GRADE_WORDS } from '@/shared/format/words';
import type { Grade } from '@/shared/types/answer';

/** Parts that the phone's rows, the wide table and the worklist share. */
const STATE_TONE: Record<CaseState, ColorName> = { draft: 'ink', 'in-review': 'ink', queried: 'caution', signed: 'judged', superseded: 'ink', withdrawn: 'muted' };

/** The little line and its word. */
export function StateTag({ state }: { state: CaseState }) {
  return (
    <View style={styles.line}>
      <StateLine state={state} />
      <Text kind="smallStrong" tone={STATE_TONE[state]} noWrap>{STATE_WORDS[state]}</Text>
    </View>
  );
}

/** Grade (mark and word) and the answer's few words. */
export function AnswerLine({ answer, under = false }: { answer: { grade: Grade; text: string; judged?: boolean }; under?: boolean }) {
  const ink = answer.judged === false ? 'calculated' : 'judged';
  return (
    <View style={under ? styles.under : styles.line}>
      <View style={styles.grade}>
        <Mark ink={ink} fill={GRADE_FILL[answer.grade]} size={14} />
        <Text kind="denseStrong" tone={ink} noWrap>{GRADE_WORDS[answer.grade]}</Text>
      </View>
      {answer.text !== '' && <View style={under ? styles.indent : styles.words}><RichText kind={under ? 'small' : 'dense'} text={answer.text} /></View>}
    </View>
  );
}

/** Where a review is due within two days or is late, the day stands in caution. */
export function dueTone(row: Pick<CaseRow, 'dueOn' | 'state'>, now: Date): ColorName {
  if (row.dueOn === null || (row.state !== 'in-review' && row.state !== 'queried')) return 'muted';
  return isPast(row.dueOn, now) || isSoon(row.dueOn, now, 2) ? 'caution' : 'muted';
}
export const dueWords = (day: string, now: Date): string => (isPast(day, now) ? uiCases.list.overdue(dayWords(day, now)) : uiCases.list.due(dayWords(day, now)));
export const isOpen = (state: CaseState): boolean => state === 'draft' || state === 'in-review' || state === 'queried';
/** "by HAZ-0029" stands in place of an answer that another case has taken over. */
export const answerWords = (row: CaseRow): CaseRow['answer'] => (row.supersededBy === null ? row.answer : { ...row.answer, text: uiCases.list.supersededBy(row.supersededBy) });

const styles = StyleSheet.create({
  line: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: space.sm },
  grade: { flexDirection: 'row', alignItems: 'center', gap: 6 },
  under: { alignItems: 'flex-start', gap: 2 },
  indent: { paddingLeft: 20 },
  words: { flexShrink: 1, minWidth: 0 },
});
