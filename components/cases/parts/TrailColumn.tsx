import { Fragment } from 'react';
import { Pressable, StyleSheet, View } from 'react-native';

import { momentWords } from '@/shared/format/when';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import { uiCases } from '@/shared/text/uiCases';
import { INKS, type Ink } from '@/shared/types/trail';

import { color, radius, space } from '../../theme/tokens';
import { Heading } from '../../ui/Heading';
import { CautionIcon } from '../../ui/Glyph';
import { Mark } from '../../ui/Mark';
import { RichText } from '../../ui/RichText';
import { Text } from '../../ui/Text';
import { web } from '../../ui/webProps';
import { useCaseView } from '../caseContext';
import { numberedSteps, stepsOf, type NumberedStep } from '../logic/trailSteps';

const say = uiCaseParts.trail;
const HEAD: Record<Ink, string> = { measured: uiCases.frame.measured, calculated: uiCases.frame.calculated, judged: uiCases.frame.judged };

/** The trail as a column: one line in three inks, its steps numbered; each opens to what it used. */
export function TrailColumn() {
  const { found } = useCaseView();
  const steps = numberedSteps(found.trail, found.review.queries);
  return (
    <View role="region" aria-label={say.title} style={styles.column}>
      <Heading text={say.title} level={2} kind="h3" />
      <TrailLine steps={steps} />
    </View>
  );
}

export function TrailLine({ steps }: { steps: readonly NumberedStep[] }) {
  return (
    <View>
      {INKS.map((ink, at) => {
        const own = stepsOf(steps, ink);
        return (
          <View key={ink} style={[styles.block, at < INKS.length - 1 && styles.more]}>
            <View style={[styles.line, { backgroundColor: color[ink] }, at === INKS.length - 1 && styles.lineEnd]} />
            <View style={styles.mark}><Mark ink={ink} size={20} /></View>
            <Heading text={HEAD[ink]} level={3} kind="trailHead" tone={ink} />
            {own.map((each) => <Step key={each.step.key} {...each} />)}
            {ink === 'judged' && <Outcome from={steps.length} />}
          </View>
        );
      })}
    </View>
  );
}

function Step({ number, step, openQueries }: NumberedStep) {
  const { open } = useCaseView();
  const isQueried = openQueries.length > 0;
  return (
    <Pressable role="button" onPress={() => open({ kind: 'step', key: step.key })} {...web({ 'aria-haspopup': 'dialog' })} style={[styles.step, isQueried && styles.queried]}>
      <Text kind="caption" tone="muted" align="right">{String(number).padStart(2, '\u2007')}</Text>
      <View style={styles.words}>
        <RichText kind="denseStrong" text={step.title} />
        <RichText kind="small" tone="muted" text={step.summary} />
        {isQueried && <View style={styles.query}><CautionIcon size={13} /><Text kind="caption" tone="caution">{openQueries.map((query) => say.query(query)).join(', ')}</Text></View>}
      </View>
    </Pressable>
  );
}

/** What people did after the calculation: the review and the signatures, as the last steps of the line. */
function Outcome({ from }: { from: number }) {
  const { found, now } = useCaseView();
  const { review, signatures, addenda } = found;
  const queries = review.queries.length;
  const reviewWords = review.submittedAt === null ? say.notYet : [review.reviewer?.name, queries > 0 ? say.queries(queries) : undefined].filter(Boolean).join(', ') || uiCases.frame.review;
  const lines = [
    { title: say.review, summary: reviewWords },
    {
      title: say.signature,
      summary: signatures.length === 0 ? say.notYet : signatures.map((signature) => `${say.meaning[signature.meaning]}: ${say.signedBy(signature.name, momentWords(signature.at, now))}`).join('; '),
    },
  ];
  return (
    <Fragment>
      {lines.map((line, at) => (
        <View key={line.title} style={styles.step}>
          <Text kind="caption" tone="muted" align="right">{String(from + at + 1).padStart(2, '\u2007')}</Text>
          <View style={styles.words}><Text kind="denseStrong">{line.title}</Text><Text kind="small" tone="muted">{line.summary}</Text></View>
        </View>
      ))}
      {addenda.length > 0 && <View style={styles.step}><View style={styles.words}><Text kind="small" tone="muted">{say.addenda(addenda.length)}</Text></View></View>}
    </Fragment>
  );
}

const styles = StyleSheet.create({
  column: { gap: space.md },
  block: { position: 'relative', paddingLeft: 28 },
  more: { paddingBottom: space.lg },
  line: { position: 'absolute', left: 8, top: 12, bottom: -12, width: 4 },
  lineEnd: { bottom: space.sm },
  mark: { position: 'absolute', left: 0, top: 2, backgroundColor: color.paper, paddingVertical: 2 },
  step: { flexDirection: 'row', gap: space.sm, paddingVertical: 6, paddingHorizontal: space.sm, marginLeft: -space.sm, borderRadius: radius.control, minHeight: 48 },
  queried: { backgroundColor: color.cautionTint },
  words: { flex: 1, minWidth: 0 },
  query: { flexDirection: 'row', alignItems: 'center', gap: space.xs },
});
