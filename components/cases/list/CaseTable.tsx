import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';

import type { CaseRow } from '@/shared/contracts/cases';
import { shortName } from '@/shared/format/shortName';
import { ago, dayWords } from '@/shared/format/when';
import { uiCases } from '@/shared/text/uiCases';

import { border, color, size, space } from '../../theme/tokens';
import { Card } from '../../ui/Card';
import { RouteLink } from '../../ui/RouteLink';
import { Table } from '../../ui/Table';
import { Text } from '../../ui/Text';
import type { CaseFilter } from '../logic/listFilter';
import { AnswerLine, answerWords, dueTone, isOpen, StateTag } from './caseRowParts';
import { SortButton } from './ListHead';

const say = uiCases.list;

/** The log on a wide screen. */
export function CaseTable({ rows, onDevice, total, older, filter, change }: {
  rows: readonly CaseRow[]; onDevice: ReadonlySet<string>; total: number; older: ReactNode; filter: CaseFilter; change: (next: Partial<CaseFilter>) => void;
}) {
  const now = new Date();
  return (
    <Card flush>
      <Table caption={say.title} rows={rows} rowKey={(row) => row.id} columns={[
        {
          key: 'code', head: say.head.code, rowHeader: true, cell: (row) => (
            <RouteLink href={`/cases/${row.id}`} style={styles.code}>
              <Text kind="denseStrong" noWrap>{row.code}</Text>
              {onDevice.has(row.id) ? <Text kind="caption" tone="caution">{say.onDevice}</Text> : row.batch !== '' && <Text kind="caption" tone="muted" noWrap>{row.batch}</Text>}
            </RouteLink>
          ),
        },
        {
          key: 'question', head: say.head.question, wraps: true, cell: (row) => (
            <RouteLink href={`/cases/${row.id}`} style={styles.question}>
              <Text kind="denseStrong">{row.question}</Text>
              {row.compound !== '' && <Text kind="caption" tone="muted">{row.compound}</Text>}
            </RouteLink>
          ),
        },
        {
          key: 'reading', head: say.head.reading, cell: (row) => row.keyReading === null ? <Text kind="dense" tone="muted">–</Text> : (
            <View><Text kind="dense" tone="measured" noWrap>{row.keyReading.jText}</Text><Text kind="caption" tone="muted" noWrap>{row.keyReading.label}</Text></View>
          ),
        },
        { key: 'answer', head: say.head.answer, wraps: true, cell: (row) => <View style={styles.answer}><AnswerLine answer={answerWords(row)} under /></View> },
        { key: 'state', head: say.head.state, cell: (row) => <StateTag state={row.state} /> },
        { key: 'author', head: say.head.author, cell: (row) => <Text kind="dense" noWrap>{shortName(row.author.name)}</Text> },
        {
          key: 'due', head: say.head.due, cell: (row) => row.dueOn === null || !isOpen(row.state) ? <Text kind="dense" tone="muted">–</Text>
            : <Text kind={dueTone(row, now) === 'caution' ? 'denseStrong' : 'dense'} tone={dueTone(row, now) === 'caution' ? 'caution' : 'ink'} noWrap>{dayWords(row.dueOn, now)}</Text>,
        },
        { key: 'changed', head: say.head.changed, numeric: true, cell: (row) => <Text kind="dense" noWrap>{ago(row.changedAt, now)}</Text> },
      ]} />
      <View style={styles.foot}>
        <Text kind="dense" tone="muted">{rows.length === total ? say.allShown(total) : say.shown(rows.length, total)}</Text>
        <View style={styles.spring} />
        <SortButton filter={filter} change={change} />
        {older}
      </View>
    </Card>
  );
}

const styles = StyleSheet.create({
  code: { minHeight: size.touchDense, justifyContent: 'center' },
  question: { minHeight: size.touchDense, justifyContent: 'center', minWidth: 160, maxWidth: 264 },
  answer: { minWidth: 110, maxWidth: 184 },
  foot: { flexDirection: 'row', alignItems: 'center', gap: space.md, minHeight: size.row, paddingHorizontal: space.lg, paddingVertical: space.xs, borderTopWidth: border.hair, borderTopColor: color.ruleSoft },
  spring: { flex: 1 },
});
