import { StyleSheet, View } from 'react-native';

import type { CaseRow } from '@/shared/contracts/cases';
import { ago } from '@/shared/format/when';
import { uiCases } from '@/shared/text/uiCases';

import { border, color, space } from '../../theme/tokens';
import { RouteLink } from '../../ui/RouteLink';
import { Text } from '../../ui/Text';
import { AnswerLine, answerWords, dueTone, dueWords, isOpen, StateTag } from './caseRowParts';

/** The log on a phone: each case is one link, four short lines. */
export function CaseRows({ rows, onDevice }: { rows: readonly CaseRow[]; onDevice: ReadonlySet<string> }) {
  const now = new Date();
  return (
    <View role="list" style={styles.list}>
      {rows.map((row) => (
        <View key={row.id} role="listitem">
          <RouteLink href={`/cases/${row.id}`} style={styles.row}>
            <View style={styles.head}>
              <Text kind="smallStrong" tone="muted">{row.code}</Text>
              <View style={styles.rest}><Text kind="small" tone="muted" oneLine>{row.compound || row.batch}</Text></View>
              {onDevice.has(row.id) && <Text kind="smallStrong" tone="caution">{uiCases.list.onDevice}</Text>}
              <Text kind="small" tone="muted" noWrap>{ago(row.changedAt, now)}</Text>
            </View>
            <Text kind="strong">{row.question}</Text>
            <AnswerLine answer={answerWords(row)} />
            <View style={styles.foot}>
              <StateTag state={row.state} />
              <Text kind="small" tone="muted">{row.author.name}</Text>
              {row.dueOn !== null && isOpen(row.state) && <Text kind="small" tone={dueTone(row, now)}>{`· ${dueWords(row.dueOn, now)}`}</Text>}
            </View>
          </RouteLink>
        </View>
      ))}
    </View>
  );
}

const styles = StyleSheet.create({
  list: { marginHorizontal: -space.lg, borderBottomWidth: border.hair, borderBottomColor: color.ruleSoft },
  row: { paddingHorizontal: space.lg, paddingVertical: space.md, gap: 2, borderTopWidth: border.hair, borderTopColor: color.ruleSoft, backgroundColor: color.card },
  head: { flexDirection: 'row', alignItems: 'center', gap: space.sm },
  rest: { flex: 1, minWidth: 0 },
  foot: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: space.sm },
});
