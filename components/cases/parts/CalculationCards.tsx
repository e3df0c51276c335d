import { StyleSheet, View } from 'react-native';

import { hz } from '@/shared/format/number';
import { readingName } from '@/shared/text/uiCaseFields';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import type { QuickLookAnswer } from '@/shared/types/answer';
import type { Calculation, Reading } from '@/shared/types/case';

import { LazyAnswerPlots } from '../../plots/LazyPlots';
import { space } from '../../theme/tokens';
import { useLayout } from '../../theme/useLayout';
import { GradeWord } from '../../ui/AnswerStrip';
import { Button } from '../../ui/Button';
import { Card, CardBody } from '../../ui/Card';
import { Disclosure } from '../../ui/Disclosure';
import { CautionIcon } from '../../ui/Glyph';
import { Heading } from '../../ui/Heading';
import { Mark } from '../../ui/Mark';
import { Notice } from '../../ui/Notice';
import { RichText } from '../../ui/RichText';
import { ScreenState } from '../../ui/ScreenState';
import { useCaseView } from '../caseContext';
import { groupsOf } from '../logic/groupsOf';
import { applyMend } from '../logic/mends';
import { same } from '../logic/versions';

const say = uiCaseParts.calculation;

/** What a relation makes of each reading: the finding in words, then curve and dial or the ladder, each with its table. */
export function CalculationCards() {
  const { content, mayEdit } = useCaseView();
  const { isWide } = useLayout();
  if (content.calculations.length === 0) {
    const vicinal = content.readings.filter((reading) => reading.path === '3J');
    return (
      <Card title={say.title} mark={<Mark ink="calculated" size={16} />} flush>
        <View style={styles.pad}><ScreenState kind="empty" level={3} title={say.none} hint={content.readings.length > 0 && vicinal.length === 0 ? say.onlyVicinal : say.noneHint} /></View>
        {mayEdit && vicinal.length > 0 && <View style={styles.pad}>{vicinal.map((reading) => <AddButton key={reading.id} reading={reading} />)}</View>}
      </Card>
    );
  }
  return content.calculations.map((calculation, at) => <CalculationCard key={calculation.id} calculation={calculation} startOpen={at === 0 && (isWide || content.calculations.length === 1)} />);
}

function AddButton({ reading }: { reading: Reading }) {
  const { open } = useCaseView();
  return <Button label={say.addOf(readingName(reading))} opens="dialog" onPress={() => open({ kind: 'calculation', readingId: reading.id, id: null })} />;
}

function CalculationCard({ calculation, startOpen }: { calculation: Calculation; startOpen: boolean }) {
  const { found, content, editor, mayEdit, open } = useCaseView();
  const reading = content.readings.find((row) => row.id === calculation.readingId);
  const result = found.trail.calculations.find((each) => each.calculationId === calculation.id)?.result;
  const server = editor.state.base.content;
  const isPending = result === undefined || !same(server.calculations.find((row) => row.id === calculation.id), calculation) || !same(server.readings.find((row) => row.id === calculation.readingId), reading);
  const name = reading ? readingName(reading) : '?';
  const aside = result?.state === 'answered' && result.relation !== null && !isPending ? `${result.relation.name} · ${say.spread(hz(result.relation.spreadHz))}` : undefined;
  return (
    <Card title={name} mark={<Mark ink="calculated" size={16} />} aside={aside} flush>
      <CardBody gap="md">
        <RichText kind="small" tone="muted" text={groupsOf(calculation)} />
        {isPending && <RichText tone="muted" text={say.pending} />}
        {!isPending && result?.state === 'answered' && <Finding answer={result} />}
        {!isPending && result?.state === 'question' && (
          <Notice text={`**${say.needs}.** ${result.question}`} detail={result.why} action={mayEdit ? result.choices.map((choice) => (
            <Button key={choice.label} small label={choice.label} onPress={() => editor.edit((before) => applyMend(before, calculation.id, choice))} />
          )) : undefined} />
        )}
        {!isPending && result?.state === 'refused' && result.problems.map((problem) => (
          <Notice key={`${problem.field}${problem.code}`} tone="error" text={problem.sentence} action={mayEdit ? problem.mends.map((mend) => (
            <Button key={mend.label} small label={mend.label} onPress={() => editor.edit((before) => applyMend(before, calculation.id, mend))} />
          )) : undefined} />
        ))}
        {mayEdit && <View style={styles.acts}><Button small label={say.edit} about={name} opens="dialog" onPress={() => open({ kind: 'calculation', readingId: calculation.readingId, id: calculation.id })} /></View>}
      </CardBody>
      {!isPending && result?.state === 'answered' && (result.single !== null || (result.double !== null && result.double.ladder.length > 0)) && (
        <Disclosure label={say.open} openLabel={say.hide} startOpen={startOpen}>
          <View style={styles.plots}><LazyAnswerPlots beside answer={result} groups={calculation.bond === 'single' ? calculation.groups ?? null : null} /></View>
        </Disclosure>
      )}
    </Card>
  );
}

function Finding({ answer }: { answer: QuickLookAnswer }) {
  return (
    <View style={styles.finding}>
      <GradeWord grade={answer.grade} ink="calculated" />
      <Heading level={3} text={answer.headline} />
      <RichText text={answer.detail} />
      {answer.notes.filter((note) => note.code !== 'default-error').map((note) => <RichText key={`${note.field}${note.code}`} kind="small" tone="muted" text={note.text} />)}
      {answer.rulesOut.map((line) => <RichText key={line} kind="dense" text={line} />)}
      {answer.cautions.map((caution) => (
        <View key={caution.id} style={styles.caution}><View style={styles.icon}><CautionIcon size={14} /></View><View style={styles.words}><RichText kind="small" text={caution.text} /></View></View>
      ))}
    </View>
  );
}

const styles = StyleSheet.create({
  pad: { padding: space.lg, paddingTop: space.md, gap: space.sm, alignItems: 'flex-start' },
  acts: { flexDirection: 'row' },
  finding: { gap: space.xs },
  plots: { padding: space.sm },
  caution: { flexDirection: 'row', gap: space.sm },
  icon: { paddingTop: 3 },
  words: { flex: 1, minWidth: 0 },
});
