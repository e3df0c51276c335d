import { useRef } from 'react';
import { Pressable, StyleSheet, View } from 'react-native';

import { pathShort, readingName } from '@/shared/text/uiCaseFields';
import { uiCaseParts } from '@/shared/text/uiCaseParts';
import { LIMITS } from '@/shared/limits';
import type { Reading } from '@/shared/types/case';

import { size, space } from '../../theme/tokens';
import { useLayout } from '../../theme/useLayout';
import { Button } from '../../ui/Button';
import { Card } from '../../ui/Card';
import { CautionIcon, Icon } from '../../ui/Glyph';
import { Mark } from '../../ui/Mark';
import { RichText } from '../../ui/RichText';
import { ScreenState } from '../../ui/ScreenState';
import { Table, type Column } from '../../ui/Table';
import { Text } from '../../ui/Text';
import { asElement, web, type KeyPress } from '../../ui/webProps';
import { useCaseView } from '../caseContext';
import { isOnServer, partnerState, problemsOf } from '../logic/readingState';

const say = uiCaseParts.readings;
const rowId = (reading: Reading) => `reading-${reading.id}`;

/** The measured couplings, digits as typed. Arrow keys go from row to row, Enter opens one. */
export function ReadingsCard() {
  const { found, content, editor, mayEdit, open } = useCaseView();
  const { isWide } = useLayout();
  const frame = useRef<View>(null);
  const openComments = (reading: Reading) => found.comments.filter((comment) => comment.resolvedAt === null && comment.target.startsWith(`readings/${reading.id}`)).length;
  const move = (event: KeyPress) => {
    const by = event.key === 'ArrowDown' ? 1 : event.key === 'ArrowUp' ? -1 : 0;
    const rows = [...(asElement(frame.current)?.querySelectorAll<HTMLElement>('[id^="reading-"]') ?? [])];
    const at = rows.findIndex((row) => row === document.activeElement);
    if (by === 0 || at < 0) return;
    event.preventDefault();
    rows[at + by]?.focus();
  };
  const columns: Column<Reading>[] = [
    {
      key: 'coupling', head: say.head.coupling, rowHeader: true, cell: (reading) => (
        <Pressable role="button" id={rowId(reading)} onPress={() => open({ kind: 'reading', id: reading.id })} style={styles.name} {...web({ 'aria-haspopup': 'dialog' })}>
          <Text kind="denseStrong" noWrap>{readingName(reading)}</Text>
          {reading.path !== '3J' && <RichText kind="caption" tone="muted" text={pathShort[reading.path]} />}
          <Icon name="right" size={12} tone="muted" />
        </Pressable>
      ),
    },
    { key: 'j', head: say.head.j, numeric: true, tone: 'measured', cell: (reading) => <View style={styles.cell}><Text kind="denseStrong" tone={problemsOf(reading, found.trail).length > 0 ? 'error' : 'measured'} align="right" noWrap>{reading.j.trim() || '–'}</Text></View> },
    { key: 'se', head: say.head.se, numeric: true, cell: (reading) => <View style={styles.cell}><Text kind="dense" tone={reading.se.trim() === '' ? 'muted' : 'ink'} align="right" noWrap>{reading.se.trim() || '0.2'}</Text></View> },
    // a phone has no room for both: while something waits for the server, where it is kept matters more
    ...(editor.isDirty && !isWide ? [] : [{ key: 'partner', head: say.head.partner, cell: (reading: Reading) => <View style={styles.cell}><Partner reading={reading} /></View> }]),
  ];
  if (isWide) columns.push({ key: 'where', head: say.where, wraps: true, cell: (reading) => <View style={styles.cell}><Text kind="dense" tone="muted">{reading.where.trim() || '–'}</Text></View> });
  if (editor.isDirty) {
    columns.push({ key: 'kept', head: say.head.kept, cell: (reading) => <View style={styles.cell}>{isOnServer(reading, editor.state.base.content) ? <Text kind="dense" tone="muted">{say.onServer}</Text> : <Text kind="denseStrong" tone="caution">{say.onDevice}</Text>}</View> });
  }
  if (content.readings.some((reading) => openComments(reading) > 0)) {
    columns.push({ key: 'comments', head: '', spoken: uiCaseParts.comments.title, cell: (reading) => <View style={styles.cell}>{openComments(reading) > 0 && <Text kind="dense" tone="caution" noWrap>{uiCaseParts.comments.open(openComments(reading))}</Text>}</View> });
  }
  const isFull = content.readings.length >= LIMITS.readings;
  return (
    <Card title={say.title} mark={<Mark ink="measured" size={16} />} aside={content.readings.length > 0 ? say.count(content.readings.length) : undefined} flush>
      {content.readings.length === 0
        ? <View style={styles.pad}><ScreenState kind="empty" level={3} title={say.none} hint={say.noneHint} /></View>
        : <View ref={frame} {...web({ onKeyDown: move })}><Table caption={say.title} columns={columns} rows={content.readings} rowKey={(reading) => reading.id} rowTone={(reading) => (partnerState(reading, found.trail) === 'differs' || problemsOf(reading, found.trail).length > 0 ? 'query' : 'plain')} /></View>}
      {mayEdit && (
        <View style={styles.pad}>
          <Button small={content.readings.length > 0} label={say.add} icon={<Icon name="plus" />} opens="dialog" onPress={() => open({ kind: 'reading', id: null })} disabledBecause={isFull ? say.tooMany : undefined} />
        </View>
      )}
    </Card>
  );
}

function Partner({ reading }: { reading: Reading }) {
  const { found } = useCaseView();
  const state = partnerState(reading, found.trail);
  if (problemsOf(reading, found.trail).length > 0) return <View style={styles.mark}><CautionIcon size={14} /><Text kind="dense" tone="caution" noWrap>{say.cannotRead}</Text></View>;
  if (state === 'not-read') return <View style={styles.mark}><Mark ink="measured" fill="open" size={12} tone="muted" /><Text kind="dense" tone="muted" noWrap>{say.partnerNone}</Text></View>;
  return (
    <View style={styles.mark}>
      {state === 'differs' ? <CautionIcon size={14} /> : <Mark ink="measured" size={12} />}
      <Text kind="dense" noWrap>{reading.partner.trim()}</Text>
      {state === 'differs' && <Text kind="denseStrong" tone="caution" noWrap>{say.partnerDiffers}</Text>}
    </View>
  );
}

const styles = StyleSheet.create({
  name: { flexDirection: 'row', alignItems: 'center', gap: 6, minHeight: size.touch, marginVertical: -space.sm },
  cell: { minHeight: size.touch, marginVertical: -space.sm, justifyContent: 'center' },
  mark: { flexDirection: 'row', alignItems: 'center', gap: space.sm },
  pad: { padding: space.lg, paddingTop: space.md, alignItems: 'flex-start' },
});
