import { useState, type ReactNode } from 'react';
import { Pressable, StyleSheet, View } from 'react-native';

import { border, color, size, space } from '../theme/tokens';
import { Icon } from './Glyph';
import { RichInline } from './RichText';
import { Text } from './Text';
import { web } from './webProps';

/** A folded part: an underlined line that opens to more. Used for the table twin of every plot and for the trail. */
export function Disclosure({ label, openLabel, detail, startOpen = false, heldOpen = false, children, edge = 'top' }: {
  label: string; openLabel?: string; detail?: string; startOpen?: boolean;
  /** open whatever was pressed: something inside is filled in or needs attention */
  heldOpen?: boolean;
  children: ReactNode; edge?: 'top' | 'none';
}) {
  const [wanted, setOpen] = useState(startOpen);
  const open = wanted || heldOpen;
  return (
    <View>
      <Pressable role="button" onPress={() => setOpen(!open)} style={[styles.line, edge === 'top' && styles.edge]} {...web({ 'aria-expanded': open })}>
        <View style={styles.words}>
          <View style={styles.under}><Text kind="denseStrong"><RichInline text={open ? openLabel ?? label : label} /></Text></View>
          {detail !== undefined && <Text kind="caption" tone="muted"><RichInline text={detail} /></Text>}
        </View>
        <Icon name={open ? 'up' : 'right'} />
      </Pressable>
      {open && children}
    </View>
  );
}

const styles = StyleSheet.create({
  line: { minHeight: size.row, flexDirection: 'row', alignItems: 'center', gap: space.md, paddingHorizontal: space.lg, paddingVertical: space.sm },
  edge: { borderTopWidth: border.hair, borderTopColor: color.ruleSoft },
  words: { flex: 1, alignItems: 'flex-start' },
  under: { borderBottomWidth: 1, borderBottomColor: color.edge },
});
