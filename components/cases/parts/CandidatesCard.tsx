import { StyleSheet, View } from 'react-native';

import { LIMITS } from '@/shared/limits';
import { claimWords, readingName } from '@/shared/text/uiCaseFields';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import type { Candidate } from '@/shared/types/case';
import type { CandidateFinding } from '@/shared/types/trail';

import { border, color, radius, space } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { Card } from '../../ui/Card';
import { CautionIcon, Icon } from '../../ui/Glyph';
import { Mark, type Fill } from '../../ui/Mark';
import { RichText } from '../../ui/RichText';
import { ScreenState } from '../../ui/ScreenState';
import { Text } from '../../ui/Text';
import { useCaseView } from '../caseContext';

const say = uiCaseParts.candidates;
type Status = CandidateFinding['status'];
const FILL: Record<Status, Fill> = { fits: 'full', open: 'half', excluded: 'open', 'not-tested': 'open' };

/** The structures in question, what each claims, what the calculation makes of the claim; "none of these" is always one of them. */
export function CandidatesCard() {
  const { found, content, editor, mayEdit, open } = useCaseView();
  const finding = (id: string): CandidateFinding | undefined => found.trail.candidates.find((each) => each.candidateId === id);
  const chosen = content.answer?.candidateId ?? null;
  const allExcluded = content.candidates.length > 0 && content.candidates.every((candidate) => finding(candidate.id)?.status === 'excluded');
  return (
    <Card title={say.title} mark={<Mark ink="calculated" size={16} />} flush aside={editor.isDirty ? uiCaseParts.calculation.pending : undefined}>
      {content.candidates.length === 0 && <View style={styles.pad}><ScreenState kind="empty" level={3} title={say.none} hint={say.noneHint} /></View>}
      <View role="list">
        {content.candidates.map((candidate) => <Row key={candidate.id} candidate={candidate} finding={finding(candidate.id)} isChosen={chosen === candidate.id} />)}
        {content.candidates.length > 0 && (
          <View role="listitem" style={styles.row}>
            <View style={styles.head}>
              <View style={styles.words}><Text kind="strong">{say.noneOfThese}</Text></View>
              {chosen === 'none' && <Chosen />}
              <StatusWord status={allExcluded ? 'fits' : 'open'} label={allExcluded ? say.status.fits : say.noneOfTheseNote} />
            </View>
            <Text kind="small" tone="muted">{say.noneLeft}</Text>
          </View>
        )}
      </View>
      {mayEdit && (
        <View style={styles.pad}>
          <Button small={content.candidates.length > 0} label={say.add} icon={<Icon name="plus" />} opens="dialog" onPress={() => open({ kind: 'candidate', id: null })}
            disabledBecause={content.candidates.length >= LIMITS.candidates ? uiCaseParts.readings.tooMany : undefined} />
        </View>
      )}
    </Card>
  );
}

function Row({ candidate, finding, isChosen }: { candidate: Candidate; finding: CandidateFinding | undefined; isChosen: boolean }) {
  const { content, mayEdit, open } = useCaseView();
  const status = finding?.status ?? 'not-tested';
  const nameOf = (calculationId: string) => {
    const calculation = content.calculations.find((each) => each.id === calculationId);
    const reading = content.readings.find((each) => each.id === calculation?.readingId);
    return reading ? readingName(reading) : '';
  };
  return (
    <View role="listitem" style={[styles.row, status === 'not-tested' && styles.untested]}>
      <View style={styles.head}>
        <View style={styles.words}>
          <Text kind="strong">{candidate.name || '?'}</Text>
          {candidate.description.trim() !== '' && <Text kind="small" tone="muted">{candidate.description}</Text>}
        </View>
        {isChosen && <Chosen />}
        <StatusWord status={status} label={say.status[status]} />
        {mayEdit && <Button small kind="quiet" label={uiCaseParts.edit} about={candidate.name} opens="dialog" onPress={() => open({ kind: 'candidate', id: candidate.id })} />}
      </View>
      {candidate.claims.length > 0 && (
        <RichText kind="small" tone="muted" text={[...new Set(candidate.claims.map((claim) => claim.calculationId))].map((id) =>
          `${nameOf(id)}: ${candidate.claims.filter((claim) => claim.calculationId === id).map(claimWords).join(' or ')}`).join(' · ')} />
      )}
      {finding?.verdicts.filter((verdict) => verdict.why !== '' && (verdict.verdict !== 'not-tested' || status === 'not-tested')).filter((verdict, at, all) => all.findIndex((each) => each.why === verdict.why) === at).map((verdict) => <RichText key={verdict.calculationId} kind="dense" text={verdict.why} />)}
    </View>
  );
}

/** The person's choice among the candidates. */
const Chosen = () => (
  <View style={styles.status}><Mark ink="judged" size={12} /><Text kind="smallStrong" tone="judged" noWrap>{uiCaseParts.trail.answer}</Text></View>
);

function StatusWord({ status, label }: { status: Status; label: string }) {
  const tone = status === 'not-tested' ? 'caution' : status === 'excluded' ? 'muted' : 'calculated';
  return (
    <View style={styles.status}>
      {status === 'not-tested' ? <CautionIcon size={14} /> : <Mark ink="calculated" size={12} fill={FILL[status]} tone={status === 'excluded' ? 'muted' : undefined} />}
      <Text kind="denseStrong" tone={tone} noWrap struck={status === 'excluded'}>{label}</Text>
    </View>
  );
}

const styles = StyleSheet.create({
  row: { paddingHorizontal: space.lg, paddingVertical: space.md, gap: space.xs, borderTopWidth: border.hair, borderTopColor: color.ruleSoft },
  untested: { backgroundColor: color.cautionTint },
  head: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: space.md, rowGap: space.xs },
  words: { flexGrow: 1, flexShrink: 1, minWidth: 120 },
  status: { flexDirection: 'row', alignItems: 'center', gap: 6, borderRadius: radius.mark },
  pad: { padding: space.lg, paddingTop: space.md, alignItems: 'flex-start' },
});
