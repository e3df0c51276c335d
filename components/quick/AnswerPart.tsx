import { StyleSheet, View } from 'react-native';

import type { QuickLookResponse } from '@/shared/contracts/quickLook';
import { inHundred } from '@/shared/format/number';
import { plainText } from '@/shared/format/richText';
import { GRADE_WORDS } from '@/shared/format/words';
import { quickText } from '@/shared/text/quick';
import { uiText } from '@/shared/text/ui';

import { space } from '../theme/tokens';
import { AnswerAsks, AnswerStrip } from '../ui/AnswerStrip';
import { Button } from '../ui/Button';
import { LiveRegion } from '../ui/LiveRegion';
import { Text } from '../ui/Text';
import type { ApiProblem } from '../data/problems';

/** The strip in each of its states: nothing typed, refused in place, one more fact needed, an answer (stale or not), no server. */
export function AnswerPart({ asked, answer, problem, waiting, setField, onRetry, onCopyText, onGroups }: {
  asked: boolean; answer: QuickLookResponse | undefined; problem: ApiProblem | null; waiting: boolean;
  setField: (field: string, value: string) => void; onRetry: () => void; onCopyText?: () => void;
  /** opens the groups, where the question is about them */
  onGroups?: () => void;
}) {
  return (
    <View>
      <LiveRegion message={waiting ? '' : spokenOf(asked, answer, problem)} />
      <Strip asked={asked} answer={answer} problem={problem} waiting={waiting} setField={setField} onRetry={onRetry} onCopyText={onCopyText} onGroups={onGroups} />
    </View>
  );
}

function spokenOf(asked: boolean, answer: QuickLookResponse | undefined, problem: ApiProblem | null): string {
  if (!asked) return '';
  if (problem) return problem.is('invalid-input') ? '' : problem.detail; // a field tells its own fault
  if (!answer) return '';
  return answer.state === 'question' ? plainText(answer.question) : quickText.spoken(GRADE_WORDS[answer.grade], plainText(answer.headline));
}

function Strip({ asked, answer, problem, waiting, setField, onRetry, onCopyText, onGroups }: Parameters<typeof AnswerPart>[0]) {
  if (!asked) return <AnswerAsks headline={quickText.begin} detail={quickText.beginDetail} />;
  if (problem?.is('invalid-input')) return <AnswerAsks tone="refusal" headline={quickText.refused} detail={quickText.refusedDetail(problem.errors.length)} />;
  if (problem) {
    return (
      <AnswerAsks tone="refusal" headline={problem.body.title} detail={problem.detail}>
        <View style={styles.buttons}><Button small label={uiText.tryAgain} onPress={onRetry} /></View>
      </AnswerAsks>
    );
  }
  if (!answer) return <AnswerAsks headline={quickText.working} />;
  if (answer.state === 'question') {
    return (
      <AnswerAsks tone="question" headline={answer.question} detail={answer.why}>
        <View style={styles.buttons}>
          {answer.choices.map((choice) => <Button key={`${choice.field}${choice.value}`} small label={choice.label} onPress={() => setField(choice.field, choice.value)} />)}
          {answer.field.startsWith('groups') && onGroups && <Button small label={quickText.groupsTitle} opens="dialog" onPress={onGroups} />}
        </View>
      </AnswerAsks>
    );
  }
  const odds = answer.double?.likelihoods ?? [];
  return (
    <AnswerStrip grade={answer.grade} headline={answer.headline} detail={answer.detail} stale={waiting ? quickText.staleAnswer : undefined}>
      {odds.length > 1 && answer.grade !== 'not-decided' && (
        <Text kind="small" tone="muted">{odds.map((entry) => quickText.odds(inHundred(entry.weight), quickText.geometry[entry.geometry])).join(' · ')}</Text>
      )}
      {onCopyText && <View style={styles.buttons}><Button small label={quickText.copyText} onPress={onCopyText} /></View>}
    </AnswerStrip>
  );
}

const styles = StyleSheet.create({ buttons: { flexDirection: 'row', flexWrap: 'wrap', gap: space.sm, paddingTop: space.sm } });
