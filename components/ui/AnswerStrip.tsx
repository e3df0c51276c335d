import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';

import { GRADE_WORDS } from '@/shared/format/words';
import { uiText } from '@/shared/text/ui';
import type { Grade } from '@/shared/types/answer';

import { border, color, radius, size, space, type ColorName } from '../theme/tokens';
import { Heading } from './Heading';
import { GRADE_FILL, Mark } from './Mark';
import { RichInline } from './RichText';
import { Inline, Text } from './Text';

export type AnswerInk = 'calculated' | 'judged';
const WORD: Record<AnswerInk, ColorName> = { calculated: 'calculatedWord', judged: 'judgedWord' };

/**
 * The conclusion first: grade (mark, bar and word), one plain sentence, then what is left open. Calculated ink until a person
 * has judged. `stale` says why it is not the answer to what stands above.
 */
export function AnswerStrip({ grade, ink = 'calculated', headline, detail, stale, name, level = 2, children }: {
  grade: Grade; ink?: AnswerInk; headline: string; detail?: string; stale?: string;
  /** who says so, where two answers stand side by side */
  name?: string; level?: 2 | 3; children?: ReactNode;
}) {
  return (
    <View role="region" aria-label={ink === 'judged' ? uiText.judgedAnswer : uiText.calculatedAnswer} aria-busy={stale !== undefined || undefined}
      style={[styles.strip, { backgroundColor: stale ? color.card : color[ink === 'judged' ? 'judgedTint' : 'calculatedTint'] }]}>
      <View style={[styles.bar, bars[grade], { borderColor: color[ink] }, grade === 'assigned' && { backgroundColor: color[ink] }]} />
      <View style={styles.grade}>
        <Mark ink={ink} fill={GRADE_FILL[grade]} size={size.markGrade} />
        <Text kind="grade" tone={WORD[ink]}>{GRADE_WORDS[grade]}</Text>
        {name !== undefined && <Text kind="small" tone="muted"><RichInline text={name} /></Text>}
      </View>
      <Heading text={headline} level={level} kind="answer" />
      {detail !== undefined && detail !== '' && <Text><RichInline text={detail} /></Text>}
      {stale !== undefined && <Text kind="small" tone="muted"><RichInline text={stale} /></Text>}
      {children}
    </View>
  );
}

/** The same place before there is an answer: nothing typed, a value that cannot be used, or one more fact needed. */
export function AnswerAsks({ headline, detail, tone = 'empty', children }: { headline: string; detail?: string; tone?: 'empty' | 'refusal' | 'question'; children?: ReactNode }) {
  return (
    <View role="region" aria-label={uiText.calculatedAnswer} style={[styles.strip, styles.asks, asks[tone]]}>
      <View style={[styles.bar, bars['not-decided'], { borderColor: tone === 'refusal' ? color.error : color.edge }]} />
      <Heading text={headline} level={2} kind="answer" />
      {detail !== undefined && <Text tone="muted"><RichInline text={detail} /></Text>}
      {children}
    </View>
  );
}

/** A grade in a line of text or a row: mark and word. */
export function GradeWord({ grade, ink = 'calculated' }: { grade: Grade; ink?: AnswerInk }) {
  return (
    <View style={styles.word}>
      <Mark ink={ink} fill={GRADE_FILL[grade]} />
      <Text kind="strong" tone={ink} noWrap><Inline>{GRADE_WORDS[grade]}</Inline></Text>
    </View>
  );
}

const bars = StyleSheet.create({
  assigned: {},
  tentative: { borderLeftWidth: border.bar, borderStyle: 'dashed' },
  'not-decided': { borderWidth: 1.5 },
});
const asks = StyleSheet.create({ empty: {}, refusal: { borderColor: color.error }, question: { backgroundColor: color.card } });
const styles = StyleSheet.create({
  strip: { borderTopRightRadius: radius.card, borderBottomRightRadius: radius.card, paddingTop: space.md, paddingRight: space.lg, paddingBottom: space.lg, paddingLeft: 22, gap: space.half },
  bar: { position: 'absolute', left: 0, top: 0, bottom: 0, width: border.bar },
  grade: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', gap: space.sm },
  asks: { borderWidth: border.hair, borderLeftWidth: 0, borderStyle: 'dashed', borderColor: color.edge },
  word: { flexDirection: 'row', alignItems: 'center', gap: space.sm },
});
