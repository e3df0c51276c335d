import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';

import { uiCaseParts } from '@/shared/text/uiCaseParts';
import { uiCases } from '@/shared/text/uiCases';

import { space } from '../theme/tokens';
import { Button } from '../ui/Button';
import { Sheet } from '../ui/Sheet';
import { Text } from '../ui/Text';

export interface FormSheetProps {
  title: string;
  onClose: () => void;
  act: string;
  onAct: () => void;
  busy?: string | false;
  /** a second way to end: "Save and next", "Keep as typed" */
  second?: { label: string; onPress: () => void };
  /** the form is kept half-typed when it is closed; this throws it away */
  onDiscard?: () => void;
  danger?: boolean;
  /** stands under the buttons: "3 fields to mend. Nothing typed is lost." */
  foot?: string;
  actDisabledBecause?: string;
  children: ReactNode;
}

/** A sheet with a form: its fields at the page's distance, the acts fixed at its foot. */
export function FormSheet({ title, onClose, act, onAct, busy = false, second, onDiscard, danger = false, foot, actDisabledBecause, children }: FormSheetProps) {
  return (
    <Sheet title={title} onClose={onClose} actions={
      <View style={styles.foot}>
        <View style={styles.actions}>
          <Button grow={1} label={second?.label ?? (onDiscard ? uiCaseParts.readings.discard : uiCases.act.cancel)} onPress={second?.onPress ?? (() => { onDiscard?.(); onClose(); })} />
          <Button label={act} kind={danger ? 'danger' : 'primary'} busy={busy} onPress={onAct} grow={2} disabledBecause={actDisabledBecause} />
        </View>
        {foot !== undefined && <Text kind="small" tone="error" align="center">{foot}</Text>}
      </View>
    }>
      <View style={styles.body}>{children}</View>
    </Sheet>
  );
}

/** Two or more short fields side by side, under each other when there is no room. */
export function FieldRow({ children }: { children: ReactNode }) {
  return <View style={styles.row}>{children}</View>;
}
export function FieldCell({ grow = 1, children }: { grow?: number; children: ReactNode }) {
  return <View style={[styles.cell, { flexGrow: grow }]}>{children}</View>;
}

const styles = StyleSheet.create({
  body: { paddingHorizontal: space.lg, gap: space.lg },
  foot: { flex: 1, gap: space.sm },
  actions: { flexDirection: 'row', gap: space.md, alignItems: 'flex-start' },
  row: { flexDirection: 'row', flexWrap: 'wrap', gap: space.md },
  cell: { flexBasis: 128, flexShrink: 1, minWidth: 0 },
});
