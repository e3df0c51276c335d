import type { ReactNode } from 'react';
import { Pressable, StyleSheet, View } from 'react-native';

import { plainText } from '@/shared/format/richText';

import { border, color, radius, size, space } from '../theme/tokens';
import { Glyph } from './Glyph';
import { RichInline } from './RichText';
import { Text } from './Text';
import { web } from './webProps';

interface RowProps { label: string; detail?: string; aside?: ReactNode; onPress: () => void; disabledBecause?: string }

/** A row with a box that is checked or not. */
export function CheckRow({ checked, ...row }: RowProps & { checked: boolean }) {
  return <Row {...row} role="checkbox" checked={checked} box={<CheckBox checked={checked} />} />;
}

/** One of several rows; stands in a RadioRows. */
export function RadioRow({ chosen, ...row }: RowProps & { chosen: boolean }) {
  return <Row {...row} role="radio" checked={chosen} box={<RadioDot chosen={chosen} />} />;
}

export function RadioRows({ label, children }: { label: string; children: ReactNode }) {
  return <View role="radiogroup" aria-label={plainText(label)}>{children}</View>;
}

function Row({ label, detail, aside, onPress, disabledBecause, role, checked, box }: RowProps & { role: 'checkbox' | 'radio'; checked: boolean; box: ReactNode }) {
  const off = disabledBecause !== undefined;
  return (
    <Pressable role={role} disabled={off} onPress={off ? undefined : onPress} {...web({ 'aria-checked': checked })} style={[styles.row, role === 'radio' && checked && styles.chosen]}>
      {box}
      <View style={styles.words}>
        <Text kind="strong" tone={off ? 'muted' : 'ink'}><RichInline text={label} /></Text>
        {detail !== undefined && <Text kind="small" tone="muted"><RichInline text={detail} /></Text>}
        {off && <Text kind="small" tone="muted"><RichInline text={disabledBecause} /></Text>}
      </View>
      {aside}
    </Pressable>
  );
}

const CheckBox = ({ checked }: { checked: boolean }) => (
  <Glyph size={20} box="0 0 20 20">
    <rect x={1} y={1} width={18} height={18} rx={3} fill={checked ? color.ink : color.field} stroke={checked ? color.ink : color.edge} strokeWidth={1.5} />
    {checked && <path d="M5 10.5l3.5 3.5 6.5-7.5" fill="none" stroke={color.onInk} strokeWidth={2} strokeLinecap="round" strokeLinejoin="round" />}
  </Glyph>
);

const RadioDot = ({ chosen }: { chosen: boolean }) => (
  <Glyph size={22} box="0 0 22 22">
    <circle cx={11} cy={11} r={9.5} fill={color.field} stroke={chosen ? color.ink : color.edge} strokeWidth={2} />
    {chosen && <circle cx={11} cy={11} r={5} fill={color.ink} />}
  </Glyph>
);

const styles = StyleSheet.create({
  row: { flexDirection: 'row', alignItems: 'center', gap: space.md, minHeight: size.row, paddingHorizontal: space.lg, paddingVertical: space.sm, borderTopWidth: border.hair, borderTopColor: color.ruleSoft, borderRadius: radius.mark },
  chosen: { backgroundColor: color.measuredTint },
  words: { flex: 1, minWidth: 0 },
});
