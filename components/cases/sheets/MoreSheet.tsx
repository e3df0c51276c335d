import { StyleSheet, View } from 'react-native';

import { uiCaseParts } from '@/shared/text/uiCaseParts';
import { uiCases } from '@/shared/text/uiCases';

import { space } from '../../theme/tokens';
import { FormSheet } from '../../forms/FormSheet';
import { LinkRow, PressRow } from '../../ui/Card';
import { RichText } from '../../ui/RichText';
import { Sheet } from '../../ui/Sheet';
import { Text } from '../../ui/Text';
import { TrailLine } from '../parts/TrailColumn';
import { useCaseView, type CaseSheet } from '../caseContext';
import { numberedSteps } from '../logic/trailSteps';

const say = uiCases.act;

/** Everything one may do with the case beside reading it; what is refused now says why. */
export function MoreSheet({ onClose }: { onClose: () => void }) {
  const { found, open } = useCaseView();
  const acts: { act: keyof typeof found.may & ('reopen' | 'withdraw' | 'supersede' | 'addend'); label: string; sheet: CaseSheet }[] = [
    { act: 'reopen', label: say.reopen, sheet: { kind: 'reopen' } },
    { act: 'addend', label: say.addend, sheet: { kind: 'addend' } },
    { act: 'supersede', label: say.supersede, sheet: { kind: 'supersede' } },
    { act: 'withdraw', label: say.withdraw, sheet: { kind: 'withdraw' } },
  ];
  const refused = acts.filter(({ act }) => !found.may[act] && found.may.why[act] !== undefined);
  return (
    <Sheet title={uiCases.frame.moreTitle} onClose={onClose}>
      <LinkRow href={`/cases/${found.id}/sheet`} value={uiCases.frame.sheet} />
      <LinkRow href={`/cases/${found.id}/history`} value={uiCases.frame.history} />
      <PressRow value={uiCaseParts.trail.title} detail={uiCaseParts.trail.lead} onPress={() => open({ kind: 'trail' })} />
      {acts.filter(({ act }) => found.may[act]).map(({ act, label, sheet }) => <PressRow key={act} value={label} onPress={() => open(sheet)} />)}
      {refused.length > 0 && (
        <View style={styles.refused}>
          {refused.map(({ act, label }) => <Text key={act} kind="small" tone="muted">{`${label}: ${found.may.why[act] ?? ''}`}</Text>)}
        </View>
      )}
    </Sheet>
  );
}

/** The trail on a phone, where it has no column of its own. */
export function TrailSheet({ onClose }: { onClose: () => void }) {
  const { found } = useCaseView();
  return (
    <Sheet title={uiCaseParts.trail.title} onClose={onClose}>
      <View style={styles.trail}>
        <RichText kind="small" tone="muted" text={uiCaseParts.trail.lead} />
        <TrailLine steps={numberedSteps(found.trail, found.review.queries)} />
      </View>
    </Sheet>
  );
}

export function DiscardSheet({ onClose }: { onClose: () => void }) {
  const { editor } = useCaseView();
  return (
    <FormSheet title={uiCases.kept.discardTitle} onClose={onClose} danger act={uiCases.kept.discard} onAct={() => { editor.discard(); onClose(); }} second={{ label: uiCases.kept.keep, onPress: onClose }}>
      <RichText text={uiCases.kept.discardNote} />
    </FormSheet>
  );
}

const styles = StyleSheet.create({
  refused: { paddingHorizontal: space.lg, paddingTop: space.md, gap: space.sm },
  trail: { paddingHorizontal: space.lg, gap: space.md },
});
