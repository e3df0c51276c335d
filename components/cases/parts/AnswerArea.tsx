import { StyleSheet, View } from 'react-native';

import { momentWords } from '@/shared/format/when';
import { candidateName } from '@/shared/text/uiCaseFields';
import { uiCaseParts } from '@/shared/text/uiCaseParts';

import { space } from '../../theme/tokens';
import { AnswerStrip } from '../../ui/AnswerStrip';
import { Button } from '../../ui/Button';
import { RichText } from '../../ui/RichText';
import { useCaseView } from '../caseContext';
import { differsFromComputed } from '../logic/edits';

const say = uiCaseParts.answer;

/** The answer first. A person's in judged ink; the calculated one beside it whenever the two differ, with the reason. */
export function AnswerArea() {
  const { found, content, editor, mayEdit, now, open } = useCaseView();
  const computed = found.trail.answer;
  const stale = editor.isDirty ? say.stale(momentWords(found.changedAt, now)) : undefined;
  const { answer } = content;
  if (answer === null) {
    return (
      <AnswerStrip grade={computed.grade} ink="calculated" headline={computed.headline} detail={computed.detail} stale={stale}>
        {mayEdit && <View style={styles.act}><Button label={say.write} opens="dialog" onPress={() => open({ kind: 'answer' })} /></View>}
      </AnswerStrip>
    );
  }
  const differs = differsFromComputed(answer, computed);
  return (
    <View style={styles.both}>
      <AnswerStrip grade={answer.grade} ink="judged" headline={answer.statement.trim() || candidateName(content, answer.candidateId)}
        detail={[answer.reasons, answer.leftOpen.trim() === '' ? '' : `${say.open}: ${answer.leftOpen}`].filter((part) => part.trim() !== '').join('\n')}>
        {mayEdit && <View style={styles.act}><Button small label={say.edit} opens="dialog" onPress={() => open({ kind: 'answer' })} /></View>}
      </AnswerStrip>
      {differs
        ? (
          <AnswerStrip grade={computed.grade} ink="calculated" name={say.computed} headline={computed.headline} detail={computed.detail} stale={stale} level={3}>
            <View style={styles.why}>
              <RichText kind="strong" tone="caution" text={say.differs} />
              <RichText text={answer.overrideReason.trim() === '' ? say.noOverride : say.overrideWhy(answer.overrideReason)} />
            </View>
          </AnswerStrip>
        )
        : <RichText kind="small" tone="muted" text={stale ?? say.agrees(computed.headline)} />}
    </View>
  );
}

const styles = StyleSheet.create({
  both: { gap: space.sm },
  act: { flexDirection: 'row', paddingTop: space.md },
  why: { paddingTop: space.sm, gap: space.xs },
});
