import { useState, type ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';

import { uiCaseParts } from '@/shared/text/uiCaseParts';

import { border, color, space } from '../../theme/tokens';
import { Button } from '../../ui/Button';
import { Card } from '../../ui/Card';
import { RichText } from '../../ui/RichText';
import { Text } from '../../ui/Text';
import { useCaseView } from '../caseContext';
import { differsFromComputed } from '../logic/edits';

const say = uiCaseParts.facts;
const SHOWN = 4;

/** What a reviewer must see before the details: untested alternatives, overrides, cautions, and what changed since it was sent. */
export function FactsCard() {
  const { found, content } = useCaseView();
  const { notTested, cautions, answer } = found.trail;
  const override = content.answer !== null && differsFromComputed(content.answer, answer)
    ? [content.answer.overrideReason.trim() === '' ? uiCaseParts.answer.noOverride : content.answer.overrideReason] : [];
  return (
    <Card flush>
      <Fact name={say.notTested} isFirst isAlert={notTested.length > 0} lines={notTested} none={say.nothing} />
      <Fact name={say.overrides} isAlert={override.length > 0} lines={override} none={say.none} />
      <Fact name={say.cautions} lines={cautions.map((caution) => caution.text)} none={say.none} />
      <Fact name={say.changed} lines={found.changedSinceSubmission.map((change) => `${change.label}: ${say.changedFrom(change.before ?? say.empty, change.after ?? say.empty)}`)} none={say.nothing} />
    </Card>
  );
}

function Fact({ name, lines, none, isFirst = false, isAlert = false }: { name: string; lines: readonly string[]; none: string; isFirst?: boolean; isAlert?: boolean }) {
  const [all, setAll] = useState(false);
  const shown = all ? lines : lines.slice(0, SHOWN);
  let words: ReactNode = <Text kind="dense" tone="muted">{none}</Text>;
  if (lines.length > 0) words = shown.map((line, at) => <RichText key={at} kind="dense" text={line} />);
  return (
    <View style={[styles.row, isFirst && styles.first, isAlert && styles.alert]}>
      <View style={styles.name}><Text kind="denseStrong">{name}</Text></View>
      <View style={styles.words}>
        {words}
        {lines.length > SHOWN && !all && <Button small kind="quiet" label={say.more(lines.length)} about={name} onPress={() => setAll(true)} />}
      </View>
    </View>
  );
}

const styles = StyleSheet.create({
  row: { flexDirection: 'row', flexWrap: 'wrap', columnGap: space.lg, rowGap: 2, paddingHorizontal: space.lg, paddingVertical: space.sm, borderTopWidth: border.hair, borderTopColor: color.ruleSoft },
  first: { borderTopWidth: 0 },
  alert: { backgroundColor: color.cautionTint },
  name: { width: 140 },
  words: { flex: 1, minWidth: 160, gap: space.xs },
});
